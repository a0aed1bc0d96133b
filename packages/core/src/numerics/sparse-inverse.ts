// A sparse factor of the inverse of a packed positive-definite matrix, to precondition iterations with.
import { NotPositiveDefinite, type PackedLower } from './packed-cholesky.ts';

/**
 * Earlier unknowns that a row of the factor keeps: 12 give 11 to 14 iterations to 1e-11 where the diagonal gives 33, and
 * more gain less than their making costs (measured on grids of 400 to 3 000 segments).
 */
export const KEPT_NEIGHBOURS = 12;

/** Writes an approximate A⁻¹ r into its second argument; symmetric positive definite. */
export type Preconditioner = (r: Float64Array, into: Float64Array) => void;

/**
 * Lower triangular G with G A Gᵀ ≈ 1, each row minimal on its own sparsity pattern: the inverse Cholesky factor of the
 * block of the pattern (Kolotilina and Yeremin 1993; nearly exact for Green's functions: Schäfer, Katzfuss and Owhadi
 * 2021). A row keeps the unknown itself and those before it that tell most of it, by a_ij²/a_jj.
 * Plain twin of the kernel in `packed-store.ts`.
 * @param a packed lower triangle, shape [n(n + 1)/2]
 * @returns r ↦ Gᵀ G r
 * @throws NotPositiveDefinite with the row whose block fails
 */
export function sparseInverse(a: PackedLower, n: number, kept: number): Preconditioner {
  const width = kept + 1;
  const column = new Int32Array(n * width);
  const value = new Float64Array(n * width);
  const reciprocal = Float64Array.from({ length: n }, (_, i) => 1 / a[(i * (i + 3)) / 2]!);
  const strength = new Float64Array(kept);
  const nearest = new Int32Array(kept);
  const block = new Float64Array(width * width);
  for (let i = 0; i < n; i++) {
    const found = strongest(a, i, reciprocal, kept, strength, nearest);
    const at = i * width;
    column.set(nearest.subarray(0, found).sort(), at);
    column[at + found] = i;
    inverseRow(a, column, at, found + 1, block, value);
  }
  return (r, into) => {
    into.fill(0);
    for (let i = 0; i < n; i++) {
      const from = i * width;
      const to = from + Math.min(i, kept) + 1;
      let sum = 0;
      for (let e = from; e < to; e++) sum += value[e]! * r[column[e]!]!;
      for (let e = from; e < to; e++) into[column[e]!]! += value[e]! * sum;
    }
  };
}

/** Columns before i of the largest a_ij²/a_jj, the nearest of equal ones; how many. */
function strongest(
  a: PackedLower,
  i: number,
  reciprocal: Float64Array,
  kept: number,
  strength: Float64Array,
  nearest: Int32Array,
): number {
  const row = (i * (i + 1)) / 2;
  let found = 0;
  let least = -1;
  for (let j = i - 1; j >= 0; j--) {
    const v = a[row + j]!;
    const s = v * v * reciprocal[j]!;
    if (found === kept && s <= least) continue;
    let k = found < kept ? found++ : kept - 1;
    for (; k > 0 && strength[k - 1]! < s; k--) {
      strength[k] = strength[k - 1]!;
      nearest[k] = nearest[k - 1]!;
    }
    strength[k] = s;
    nearest[k] = j;
    least = strength[found - 1]!;
  }
  return found;
}

/** Last row of the inverse Cholesky factor of the block on the columns at `at`: L, then g with Lᵀ g = e. */
function inverseRow(
  a: PackedLower,
  column: Int32Array,
  at: number,
  size: number,
  block: Float64Array,
  value: Float64Array,
): void {
  for (let r = 0; r < size; r++) {
    const i = column[at + r]!;
    const row = (i * (i + 1)) / 2;
    for (let c = 0; c <= r; c++) {
      let rest = a[row + column[at + c]!]!;
      for (let k = 0; k < c; k++) rest -= block[r * size + k]! * block[c * size + k]!;
      if (c < r) block[r * size + c] = rest / block[c * size + c]!;
      else {
        if (!(rest > 0)) throw new NotPositiveDefinite(i);
        block[r * size + r] = Math.sqrt(rest);
      }
    }
  }
  value.fill(0, at, at + size);
  value[at + size - 1] = 1;
  for (let r = size - 1; r >= 0; r--) {
    const g = value[at + r]! / block[r * size + r]!;
    value[at + r] = g;
    for (let c = 0; c < r; c++) value[at + c]! -= block[r * size + c]! * g;
  }
}
