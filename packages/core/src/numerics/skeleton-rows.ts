// A few rows of a matrix from which all its rows are combined: elimination with full pivoting, stopped at a tolerance.
import { blocksBytes } from '../kernels/blocks-bytes.ts';
import { doublesAt, kernelOf, place } from '../kernels/instance.ts';

/** A ≈ W A[rows, :], W shape [count × rank], row after row; in a chosen row W is a row of the identity. */
export interface RowSkeleton {
  /** rows chosen, the most telling first; shape [rank] */
  readonly rows: Int32Array;
  readonly weights: Float64Array;
}

/**
 * Chooses rows by Gaussian elimination with full pivoting until what is left is small; by the compiled kernel where
 * there is one.
 * @param a shape [count × columns], row after row; may be overwritten
 * @param tolerance of the largest entry left, of the largest entry
 */
export function skeletonRows(
  a: Float64Array,
  count: number,
  columns: number,
  tolerance: number,
): RowSkeleton {
  const most = Math.min(count, columns);
  const { rank, order, lower } =
    eliminatedByKernel(a, count, columns, most, tolerance) ?? eliminated(a, count, columns, most, tolerance);
  return { rows: order.slice(0, rank), weights: weightsOf(order, lower, count, most, rank) };
}

interface Elimination {
  readonly rank: number;
  /** rows, the chosen ones first */
  readonly order: Int32Array;
  /** multipliers by place in `order`; shape [count × most] */
  readonly lower: Float64Array;
}

function eliminatedByKernel(
  a: Float64Array,
  count: number,
  columns: number,
  most: number,
  tolerance: number,
): Elimination | undefined {
  const kernel = kernelOf(blocksBytes);
  if (kernel === undefined) return undefined;
  const even = columns + (columns & 1);
  const at = place(kernel, [even === columns ? a : widened(a, count, columns, even)], count * (most + 2));
  if (at === undefined) return undefined;
  const [rows = 0, lower = 0] = at;
  const largest = lower + count * most * Float64Array.BYTES_PER_ELEMENT;
  const order = largest + count * Float64Array.BYTES_PER_ELEMENT;
  const rank = kernel.call('skeleton', rows, count, even, tolerance, most, order, lower, largest);
  return {
    rank,
    order: new Int32Array(kernel.memory.buffer, order, count).slice(),
    lower: doublesAt(kernel, lower, count * most),
  };
}

function widened(a: Float64Array, count: number, columns: number, width: number): Float64Array {
  const wide = new Float64Array(count * width);
  for (let r = 0; r < count; r++) wide.set(a.subarray(r * columns, (r + 1) * columns), r * width);
  return wide;
}

function eliminated(
  a: Float64Array,
  count: number,
  columns: number,
  most: number,
  tolerance: number,
): Elimination {
  const order = Int32Array.from({ length: count }, (_, r) => r);
  const lower = new Float64Array(count * most);
  const largest = Float64Array.from({ length: count }, (_, r) => largestOf(a, r * columns, columns));
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
      const share = a[own + column]! / pivot;
      lower[k * most + rank] = share;
      let left = 0;
      for (let c = 0; c < columns; c++) {
        const value = a[own + c]! - share * a[start + c]!;
        a[own + c] = value;
        left = Math.max(left, Math.abs(value));
      }
      largest[order[k]!] = left;
    }
  }
  return { rank, order, lower };
}

function largestOf(a: Float64Array, from: number, columns: number): number {
  let most = 0;
  for (let c = from; c < from + columns; c++) most = Math.max(most, Math.abs(a[c]!));
  return most;
}

/** W = L_rest L_chosen⁻¹, L the unit lower triangle of multipliers. */
function weightsOf(
  order: Int32Array,
  lower: Float64Array,
  count: number,
  most: number,
  rank: number,
): Float64Array {
  const weights = new Float64Array(count * rank);
  for (let k = 0; k < count; k++) {
    const into = order[k]! * rank;
    if (k < rank) {
      weights[into + k] = 1;
      continue;
    }
    for (let j = rank - 1; j >= 0; j--) {
      let value = lower[k * most + j]!;
      for (let i = j + 1; i < rank; i++) value -= weights[into + i]! * lower[i * most + j]!;
      weights[into + j] = value;
    }
  }
  return weights;
}
