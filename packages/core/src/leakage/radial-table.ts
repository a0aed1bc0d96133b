// A smooth function of horizontal distance as a table: polynomials on bins that part every doubling of 1 + r²/s² in eight.
import { inverse, Matrix } from 'ml-matrix';

/** f(r²) for 0 ≤ r² ≤ the square the table was built to. */
export interface RadialTable {
  /** 1/s², 1/m²: bins count in units of s, so that electrodes of one shape get the same bins whatever their size */
  readonly perSquare: number;
  /** bin after bin: centre, reciprocal half width, six coefficients; shape [bins × 8] */
  readonly bins: Float64Array;
  /** the function stays smooth on distances down to this, m */
  readonly smoothness: number;
  /** largest error seen when it was built, at the end of each bin that is nearest to a singularity, of the size there */
  readonly error: number;
}

/** Where a table's bins lie, in units of s². */
export interface RadialGrid {
  readonly perSquare: number;
  readonly count: number;
  /** of 1 + r²/s²; shape [count] */
  readonly centre: Float64Array;
  readonly half: Float64Array;
  /** r² from which a table is made, m²; shape [count × TERMS] */
  readonly squares: Float64Array;
}

/**
 * Leading bits of the fraction that number a bin within its octave: 2³ = 8 bins. A sum of 1/√(r² + h²), h ≥ s, has its
 * nearest singularity 17 half widths from a bin's centre, so degree 5 leaves 34⁻⁶ = 6e-10 of each image.
 */
const BIN_BITS = 3;
const SHIFT = 20 - BIN_BITS;
/** Coefficients of a bin. */
export const TERMS = 6;
/** Doubles of a bin. */
export const STRIDE = 8;

/** Chebyshev points on [−1, 1] and the matrix from values there to coefficients of powers. */
const POINTS: readonly number[] = Array.from(
  { length: TERMS },
  (_, k) => -Math.cos((Math.PI * (k + 0.5)) / TERMS),
);
const TO_POWERS: Float64Array = Float64Array.from(
  inverse(new Matrix(POINTS.map((point) => Array.from({ length: TERMS }, (_, power) => point ** power))))
    .to2DArray()
    .flat(),
);

/** One double seen as its bits: exponent and leading fraction stand in the upper word, which numbers the bins in order. */
const asNumber = new Float64Array(1);
const asWords = new Uint32Array(asNumber.buffer);
/** where the upper word is: 1 on little-endian machines */
const UPPER = new Uint8Array(new Uint16Array([1]).buffer)[0] === 1 ? 1 : 0;

function binOf(y: number): number {
  asNumber[0] = y;
  return asWords[UPPER]! >>> SHIFT;
}

/** Number of the bin that begins at 1, the least value of 1 + r²/s². */
const FIRST = binOf(1);

function binStart(bin: number): number {
  asWords[UPPER] = bin << SHIFT;
  asWords[1 - UPPER] = 0;
  return asNumber[0]!;
}

/**
 * Bins for r from 0 to a reach, and one more, so that rounding at the reach stays inside.
 * @param smoothness s, the shortest length on which the function changes, m
 * @param reach largest r, m
 * @throws RangeError where a length is not a positive number: a table read beyond its bins would tell nothing
 */
export function radialGrid(smoothness: number, reach: number): RadialGrid {
  if (!(smoothness > 0 && Number.isFinite(smoothness) && reach >= 0 && Number.isFinite(reach)))
    throw new RangeError(
      `a table needs a smoothness above 0 and a finite reach: ${smoothness} m, ${reach} m`,
    );
  const square = smoothness * smoothness;
  const count = binOf(1 + (reach * reach) / square) - FIRST + 2;
  const centre = new Float64Array(count);
  const half = new Float64Array(count);
  const squares = new Float64Array(count * TERMS);
  for (let k = 0; k < count; k++) {
    const low = binStart(FIRST + k);
    const high = binStart(FIRST + k + 1);
    centre[k] = (low + high) / 2;
    half[k] = (high - low) / 2;
    for (let p = 0; p < TERMS; p++)
      squares[k * TERMS + p] = square * Math.max(0, centre[k]! + half[k]! * POINTS[p]! - 1);
  }
  return { perSquare: 1 / square, count, centre, half, squares };
}

/** Writes the coefficients of powers of the polynomial through `TERMS` values; steps in doubles. */
export function toPowers(
  values: Float64Array,
  from: number,
  into: Float64Array,
  at: number,
  step: number,
): void {
  for (let power = 0; power < TERMS; power++) {
    let sum = 0;
    for (let p = 0; p < TERMS; p++) sum += TO_POWERS[power * TERMS + p]! * values[from + p]!;
    into[at + power * step] = sum;
  }
}

/**
 * Tabulates f.
 * @param f function of r², m²
 * @param smoothness s, the shortest length on which f changes at any r ≥ `least`, m
 * @param reach largest r, m
 * @param least r² below which the table will not be asked, m²: there f may be singular
 * @param size what the error is measured against, of r²; default |f|
 */
export function radialTable(
  f: (rr: number) => number,
  smoothness: number,
  reach: number,
  least: number = 0,
  size: (rr: number) => number = (rr) => Math.abs(f(rr)),
): RadialTable {
  const { perSquare, count, centre, half, squares } = radialGrid(smoothness, reach);
  const values = Float64Array.from(squares, f);
  const bins = new Float64Array(count * STRIDE);
  let error = 0;
  for (let k = 0; k < count; k++) {
    const at = k * STRIDE;
    bins[at] = centre[k]!;
    bins[at + 1] = 1 / half[k]!;
    toPowers(values, k * TERMS, bins, at + 2, 1);
    const low = (centre[k]! - half[k]! - 1) / perSquare;
    if (low < least) continue;
    error = Math.max(error, Math.abs(polynomial(bins, at, -1) - f(low)) / size(low));
  }
  return { perSquare, bins, smoothness, error };
}

/** f(r²) from its table. */
export function radialValue(table: RadialTable, rr: number): number {
  const y = 1 + rr * table.perSquare;
  asNumber[0] = y;
  const at = ((asWords[UPPER]! >>> SHIFT) - FIRST) * STRIDE;
  const b = table.bins;
  return polynomial(b, at, (y - b[at]!) * b[at + 1]!);
}

function polynomial(b: Float64Array, at: number, u: number): number {
  const uu = u * u;
  return (
    b[at + 2]! + u * b[at + 3]! + uu * (b[at + 4]! + u * b[at + 5]! + uu * (b[at + 6]! + u * b[at + 7]!))
  );
}

/**
 * Mean of f over a range of r² about its mean: f + variance·f″/2, the rest being of the fourth order in the range.
 * @param variance of r², m⁴
 */
export function radialMean(table: RadialTable, rr: number, variance: number): number {
  const y = 1 + rr * table.perSquare;
  asNumber[0] = y;
  const at = ((asWords[UPPER]! >>> SHIFT) - FIRST) * STRIDE;
  const b = table.bins;
  const u = (y - b[at]!) * b[at + 1]!;
  const c2 = b[at + 4]!;
  const c3 = b[at + 5]!;
  const c4 = b[at + 6]!;
  const c5 = b[at + 7]!;
  const uu = u * u;
  const value = b[at + 2]! + u * b[at + 3]! + uu * (c2 + u * c3 + uu * (c4 + u * c5));
  const bend = c2 + u * (3 * c3) + uu * (6 * c4 + u * (10 * c5));
  const stretch = table.perSquare * b[at + 1]!;
  return value + variance * (stretch * stretch) * bend;
}

/** Number of the bin of r² in a table whose first bin begins at r = 0. */
export function radialBin(perSquare: number, rr: number): number {
  return binOf(1 + rr * perSquare) - FIRST;
}

/** The table of a multiple of the function. */
export function scaledTable(table: RadialTable, by: number): RadialTable {
  if (by === 1) return table;
  return { ...table, bins: table.bins.map((value, k) => (k % STRIDE < 2 ? value : value * by)) };
}
