// A few rows of a matrix from which all its rows are combined: elimination with full pivoting, stopped at a tolerance.
import { blocksBytes } from '../kernels/blocks-bytes.ts';
import { doublesAt, kernelOf, place } from '../kernels/instance.ts';

/** A ≈ W A[rows, :], W shape [count × rank], row after row; in a chosen row W is a row of the identity. */
export interface RowSkeleton {
  /** rows chosen, the most telling first; shape [rank] */
  readonly rows: Int32Array;
  readonly weights: Float64Array;
}

/** Least tolerance: elimination runs in single precision, which leaves a few of its units in the last place, 6e-8. */
export const LEAST_TOLERANCE = 5e-7;

/**
 * Chooses rows by Gaussian elimination with full pivoting until what is left is small; by the compiled kernel where
 * there is one.
 * @param a shape [count × columns], row after row
 * @param tolerance of the largest entry left, of the largest entry
 */
export function skeletonRows(
  a: Float64Array,
  count: number,
  columns: number,
  tolerance: number,
): RowSkeleton {
  const least = Math.max(tolerance, LEAST_TOLERANCE);
  const found = byKernel(a, count, columns, least) ?? plain(a, count, columns, least);
  const { rank, order, lower } = found;
  const most = Math.min(count, columns);
  const weights = new Float64Array(count * rank);
  for (let k = 0; k < count; k++) {
    const into = order[k]! * rank;
    if (k < rank) weights[into + k] = 1;
    else for (let j = 0; j < rank; j++) weights[into + j] = lower[k * most + j]!;
  }
  return { rows: order.slice(0, rank), weights };
}

interface Elimination {
  readonly rank: number;
  /** rows, the chosen ones first */
  readonly order: Int32Array;
  /** by place in `order`, the lesser of count and columns a row: multipliers of the chosen rows, then weights of the rest */
  readonly lower: Float64Array;
}

/** Columns that the kernel takes at once. */
const LANES = 4;

function byKernel(
  a: Float64Array,
  count: number,
  columns: number,
  tolerance: number,
): Elimination | undefined {
  const kernel = kernelOf(blocksBytes);
  if (kernel === undefined) return undefined;
  const most = Math.min(count, columns);
  const width = Math.ceil(columns / LANES) * LANES;
  const at = place(kernel, [], count * (width + most + 1 + 1));
  if (at === undefined) return undefined;
  const [rows = 0] = at;
  const held = doublesAt(kernel, rows, count * width);
  if (width === columns) held.set(a.subarray(0, count * columns));
  else
    for (let r = 0; r < count; r++) {
      held.set(a.subarray(r * columns, (r + 1) * columns), r * width);
      held.fill(0, r * width + columns, (r + 1) * width);
    }
  const lower = rows + held.byteLength;
  const largest = lower + count * most * Float64Array.BYTES_PER_ELEMENT;
  const order = largest + count * Float64Array.BYTES_PER_ELEMENT;
  const rank = kernel.call('skeleton', rows, count, width, tolerance, most, order, lower, largest);
  return {
    rank,
    order: new Int32Array(kernel.memory.buffer, order, count),
    lower: doublesAt(kernel, lower, count * most),
  };
}

function plain(given: Float64Array, count: number, columns: number, tolerance: number): Elimination {
  const a = Float32Array.from(given.subarray(0, count * columns));
  const most = Math.min(count, columns);
  const order = Int32Array.from({ length: count }, (_, r) => r);
  const lower = new Float64Array(count * most);
  const largest = Float32Array.from({ length: count }, (_, r) => largestOf(a, r * columns, columns));
  let rank = 0;
  let first = 0;
  for (; rank < most; rank++) {
    let at = rank;
    for (let k = rank + 1; k < count; k++) if (largest[order[k]!]! > largest[order[at]!]!) at = k;
    const row = order[at]!;
    if (rank === 0) first = largest[row]!;
    if (!(largest[row]! > tolerance * first)) break;
    order[at] = order[rank]!;
    order[rank] = row;
    for (let k = 0; k < rank; k++) {
      const other = lower[at * most + k]!;
      lower[at * most + k] = lower[rank * most + k]!;
      lower[rank * most + k] = other;
    }
    const start = row * columns;
    let column = 0;
    while (Math.abs(a[start + column]!) !== largest[row]!) column++;
    const pivot = a[start + column]!;
    for (let k = rank + 1; k < count; k++) {
      const own = order[k]! * columns;
      const share = Math.fround(a[own + column]! / pivot);
      lower[k * most + rank] = share;
      for (let c = 0; c < columns; c++) a[own + c]! -= Math.fround(share * a[start + c]!);
      largest[order[k]!] = largestOf(a, own, columns);
    }
  }
  for (let k = rank; k < count; k++)
    for (let j = rank - 1; j > 0; j--) {
      const weight = lower[k * most + j]!;
      for (let i = 0; i < j; i++) lower[k * most + i]! -= weight * lower[j * most + i]!;
    }
  return { rank, order, lower };
}

function largestOf(a: Float32Array, from: number, columns: number): number {
  let most = 0;
  for (let c = from; c < from + columns; c++) most = Math.max(most, Math.abs(a[c]!));
  return most;
}
