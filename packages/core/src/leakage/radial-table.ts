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
}

/**
 * Leading bits of the fraction that number a bin within its octave: 2³ = 8 bins. A sum of 1/√(r² + h²), h ≥ s, has its
 * nearest singularity 17 half widths from a bin's centre, so degree 5 leaves 34⁻⁶ = 6e-10 of each image.
 */
const BIN_BITS = 3;
const SHIFT = 20 - BIN_BITS;
const TERMS = 6;
const STRIDE = 8;

/** Chebyshev points on [−1, 1] and the matrix from values there to coefficients of powers. */
const POINTS: readonly number[] = Array.from(
  { length: TERMS },
  (_, k) => -Math.cos((Math.PI * (k + 0.5)) / TERMS),
);
const TO_POWERS: readonly (readonly number[])[] = inverse(
  new Matrix(POINTS.map((point) => Array.from({ length: TERMS }, (_, power) => point ** power))),
).to2DArray();

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
 * Tabulates f.
 * @param f function of r², m²
 * @param smoothness s, the shortest length on which f changes, m
 * @param reach largest r, m
 */
export function radialTable(f: (rr: number) => number, smoothness: number, reach: number): RadialTable {
  const square = smoothness * smoothness;
  const count = binOf(1 + (reach * reach) / square) - FIRST + 2;
  const bins = new Float64Array(count * STRIDE);
  const values = new Float64Array(TERMS);
  for (let k = 0; k < count; k++) {
    const low = binStart(FIRST + k);
    const high = binStart(FIRST + k + 1);
    const centre = (low + high) / 2;
    const half = (high - low) / 2;
    for (let p = 0; p < TERMS; p++) values[p] = f(square * Math.max(0, centre + half * POINTS[p]! - 1));
    const at = k * STRIDE;
    bins[at] = centre;
    bins[at + 1] = 1 / half;
    for (let power = 0; power < TERMS; power++) {
      let sum = 0;
      for (let p = 0; p < TERMS; p++) sum += TO_POWERS[power]![p]! * values[p]!;
      bins[at + 2 + power] = sum;
    }
  }
  return { perSquare: 1 / square, bins, smoothness };
}

/** f(r²) from its table. */
export function radialValue(table: RadialTable, rr: number): number {
  const y = 1 + rr * table.perSquare;
  asNumber[0] = y;
  const at = ((asWords[UPPER]! >>> SHIFT) - FIRST) * STRIDE;
  const b = table.bins;
  const u = (y - b[at]!) * b[at + 1]!;
  return (
    b[at + 2]! + u * (b[at + 3]! + u * (b[at + 4]! + u * (b[at + 5]! + u * (b[at + 6]! + u * b[at + 7]!))))
  );
}

/** The table of a multiple of the function. */
export function scaledTable(table: RadialTable, by: number): RadialTable {
  if (by === 1) return table;
  return { ...table, bins: table.bins.map((value, k) => (k % STRIDE < 2 ? value : value * by)) };
}
