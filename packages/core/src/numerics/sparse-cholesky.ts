// Factor of a sparse symmetric positive-definite matrix, L D Lᵀ, eliminated in minimum-degree order.
import { type Elimination, elimination, entryAt } from './elimination.ts';
import { NotPositiveDefinite } from './packed-cholesky.ts';

/** Entries off the diagonal are given once, in either triangle; equal places add up. */
export interface SparseSymmetric {
  readonly size: number;
  readonly diagonal: Float64Array;
  readonly row: Int32Array;
  readonly column: Int32Array;
  readonly value: Float64Array;
}

export interface SparseFactor extends Elimination {
  /** D, by places */
  readonly pivot: Float64Array;
  /** L below its diagonal, entry for entry of `row` */
  readonly value: Float64Array;
}

/**
 * L D Lᵀ of a sparse matrix. On a Laplacian each step is the star–mesh transformation of the network.
 * @throws NotPositiveDefinite with the unknown at which the pivot fails
 */
export function factorSparse(matrix: SparseSymmetric): SparseFactor {
  const pattern = elimination(matrix.size, matrix.row, matrix.column);
  const { size, order, place, start, row } = pattern;
  const pivot = Float64Array.from(order, (unknown) => matrix.diagonal[unknown]!);
  const value = new Float64Array(row.length);
  for (let e = 0; e < matrix.value.length; e++) {
    const i = place[matrix.row[e]!]!;
    const j = place[matrix.column[e]!]!;
    value[entryAt(pattern, Math.max(i, j), Math.min(i, j))]! += matrix.value[e]!;
  }
  for (let k = 0; k < size; k++) {
    const p = pivot[k]!;
    if (!(p > 0)) throw new NotPositiveDefinite(order[k]!);
    for (let a = start[k]!; a < start[k + 1]!; a++) {
      const factor = value[a]! / p;
      const column = row[a]!;
      pivot[column]! -= factor * value[a]!;
      for (let b = a + 1; b < start[k + 1]!; b++)
        value[entryAt(pattern, row[b]!, column)]! -= factor * value[b]!;
      value[a] = factor;
    }
  }
  return { ...pattern, pivot, value };
}

/** Solves A x = b in place. */
export function solveSparse(factor: SparseFactor, b: Float64Array): void {
  const { size, order } = factor;
  const eliminated = Float64Array.from(order, (unknown) => b[unknown]!);
  solveEliminated(factor, eliminated);
  for (let k = 0; k < size; k++) b[order[k]!] = eliminated[k]!;
}

/** Solves A x = b in place, both by places of the elimination; allocates nothing. */
export function solveEliminated(factor: SparseFactor, b: Float64Array): void {
  const { size, pivot, start, row, value } = factor;
  for (let k = 0; k < size; k++) {
    const x = b[k]!;
    for (let e = start[k]!; e < start[k + 1]!; e++) b[row[e]!]! -= value[e]! * x;
  }
  for (let k = size - 1; k >= 0; k--) {
    let x = b[k]! / pivot[k]!;
    for (let e = start[k]!; e < start[k + 1]!; e++) x -= value[e]! * b[row[e]!]!;
    b[k] = x;
  }
}
