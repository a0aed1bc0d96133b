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
  /** largest error seen when it was built, at ends of bins that are nearest to a singularity, of the size there */
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
/** One bin of so many is checked: the first of each half octave, whose low end is nearest to a singularity for its width. */
const CHECKED = 4;
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
 * @param least r² below which the table will not be asked, m²: there f may be singular, and the table gives no number
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
  const values = new Float64Array(TERMS);
  const bins = new Float64Array(count * STRIDE);
  let error = 0;
  for (let k = 0; k < count; k++) {
    const at = k * STRIDE;
    bins[at] = centre[k]!;
    bins[at + 1] = 1 / half[k]!;
    if ((centre[k]! + half[k]! - 1) / perSquare < least) {
      bins.fill(Number.NaN, at + 2, at + STRIDE);
      continue;
    }
    for (let p = 0; p < TERMS; p++) values[p] = f(squares[k * TERMS + p]!);
    toPowers(values, 0, bins, at + 2, 1);
    const low = (centre[k]! - half[k]! - 1) / perSquare;
    if (low < least || k % CHECKED !== 0) continue;
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
 * Mean of f over two wires far from each other, to the fourth order in length over distance. With c from the one centre
 * to the other, h and k the half vectors, r² = |c + t h − s k|² (+ a²) for t and s in [−1, 1] has the moments about its mean
 * E₂ = (4/3)[(c·h)² + (c·k)²] + (4/45)(h⁴ + k⁴) + (4/9)(h·k)²,
 * E₃ = (16/15)[(c·h)² h² + (c·k)² k²] + (16/3)(c·h)(c·k)(h·k),
 * E₄ = (16/5)[(c·h)² + (c·k)²]² + (64/15)(c·h)²(c·k)², and what is left out is of the sixth order. A bin's polynomial in
 * u, linear in r², then has the mean Σ c_k·m_k, m_k the moments of u.
 * @param rr mean of r², m²
 * @param ch c·h, m²
 * @param ck c·k, m²
 * @param hk h·k, m²
 * @param h3 |h|²/3, m²
 * @param k3 |k|²/3, m²
 */
export function radialMean(
  table: RadialTable,
  rr: number,
  ch: number,
  ck: number,
  hk: number,
  h3: number,
  k3: number,
): number {
  // biome-ignore format: one row
  const y = 1 + rr * table.perSquare;
  asNumber[0] = y;
  const at = ((asWords[UPPER]! >>> SHIFT) - FIRST) * STRIDE;
  const b = table.bins;
  const scale = b[at + 1]!;
  const u = (y - b[at]!) * scale;
  const stretch = table.perSquare * scale;
  const p = stretch * ch;
  const q = stretch * ck;
  const r = stretch * hk;
  const t = stretch * h3;
  const v = stretch * k3;
  const both = p * p + q * q;
  const e2 = (4 / 3) * both + (0.8 * (t * t + v * v) + (4 / 9) * (r * r));
  const e3 = 3.2 * (p * p * t + q * q * v) + (16 / 3) * (p * q * r);
  const e4 = 3.2 * (both * both) + (64 / 15) * (p * q * (p * q));
  const uu = u * u;
  const m3 = u * (uu + 3 * e2) + e3;
  const m4 = uu * (uu + 6 * e2) + (4 * (u * e3) + e4);
  const m5 = u * (uu * (uu + 10 * e2) + (10 * (u * e3) + 5 * e4));
  return (
    b[at + 2]! +
    u * b[at + 3]! +
    ((uu + e2) * b[at + 4]! + m3 * b[at + 5]! + (m4 * b[at + 6]! + m5 * b[at + 7]!))
  );
}

/** The same to the second order, for wires so far that E₂ = (4/3)[(c·h)² + (c·k)²] alone counts. */
export function radialFarMean(table: RadialTable, rr: number, ch: number, ck: number): number {
  const y = 1 + rr * table.perSquare;
  asNumber[0] = y;
  const at = ((asWords[UPPER]! >>> SHIFT) - FIRST) * STRIDE;
  const b = table.bins;
  const scale = b[at + 1]!;
  const u = (y - b[at]!) * scale;
  const stretch = table.perSquare * scale;
  const e = stretch * stretch * (4 / 3) * (ch * ch + ck * ck);
  const uu = u * u;
  const odd = b[at + 3]! + (uu + 3 * e) * b[at + 5]! + uu * (uu + 10 * e) * b[at + 7]!;
  const even = b[at + 2]! + (uu + e) * b[at + 4]! + uu * (uu + 6 * e) * b[at + 6]!;
  return even + u * odd;
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
