// Factor of a sparse symmetric positive-definite matrix, L D Lᵀ, eliminated in minimum-degree order.
import { NotPositiveDefinite } from './packed-cholesky.ts';

/** Entries above the diagonal are given once; equal places add up. */
export interface SparseSymmetric {
  readonly size: number;
  readonly diagonal: Float64Array;
  readonly row: Int32Array;
  readonly column: Int32Array;
  readonly value: Float64Array;
}

export interface SparseFactor {
  readonly size: number;
  /** place k of the elimination holds unknown order[k] */
  readonly order: Int32Array;
  readonly pivot: Float64Array;
  /** column k of L below its diagonal: entries start[k] … start[k + 1] − 1, rows as places of the elimination */
  readonly start: Int32Array;
  readonly row: Int32Array;
  readonly value: Float64Array;
}

/**
 * Eliminates the unknowns one by one, always one with the fewest neighbours left (Tinney and Walker, Proc. IEEE 55,
 * 1967, scheme 2). On a Laplacian each step is the star–mesh transformation of the network.
 * @throws NotPositiveDefinite with the unknown at which the pivot fails
 */
export function factorSparse(matrix: SparseSymmetric): SparseFactor {
  const n = matrix.size;
  const neighbours: Map<number, number>[] = Array.from({ length: n }, () => new Map());
  for (let e = 0; e < matrix.value.length; e++) {
    const i = matrix.row[e]!;
    const j = matrix.column[e]!;
    neighbours[i]!.set(j, (neighbours[i]!.get(j) ?? 0) + matrix.value[e]!);
    neighbours[j]!.set(i, (neighbours[j]!.get(i) ?? 0) + matrix.value[e]!);
  }
  const diagonal = Float64Array.from(matrix.diagonal);
  const queue = degreeQueue(neighbours);
  const done = new Uint8Array(n);
  const order = new Int32Array(n);
  const pivot = new Float64Array(n);
  const start = new Int32Array(n + 1);
  const rows: number[] = [];
  const values: number[] = [];
  for (let k = 0; k < n; k++) {
    const v = queue.next(done, neighbours);
    const p = diagonal[v]!;
    if (!(p > 0)) throw new NotPositiveDefinite(v);
    done[v] = 1;
    order[k] = v;
    pivot[k] = p;
    const around = [...neighbours[v]!];
    for (const [i] of around) neighbours[i]!.delete(v);
    for (let a = 0; a < around.length; a++) {
      const [i, wi] = around[a]!;
      const factor = wi / p;
      rows.push(i);
      values.push(factor);
      diagonal[i]! -= factor * wi;
      for (let b = a + 1; b < around.length; b++) {
        const [j, wj] = around[b]!;
        const change = -factor * wj;
        neighbours[i]!.set(j, (neighbours[i]!.get(j) ?? 0) + change);
        neighbours[j]!.set(i, (neighbours[j]!.get(i) ?? 0) + change);
      }
    }
    for (const [i] of around) queue.push(i, neighbours[i]!.size);
    neighbours[v]!.clear();
    start[k + 1] = rows.length;
  }
  const place = new Int32Array(n);
  for (let k = 0; k < n; k++) place[order[k]!] = k;
  const row = Int32Array.from(rows, (i) => place[i]!);
  return { size: n, order, pivot, start, row, value: Float64Array.from(values) };
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

interface DegreeQueue {
  push(unknown: number, degree: number): void;
  next(done: Uint8Array, neighbours: readonly Map<number, number>[]): number;
}

/** Unknowns in buckets by degree; stale entries are passed over when they come up. */
function degreeQueue(neighbours: readonly Map<number, number>[]): DegreeQueue {
  const buckets: number[][] = [];
  let least = 0;
  const push = (unknown: number, degree: number): void => {
    while (buckets.length <= degree) buckets.push([]);
    buckets[degree]!.push(unknown);
    least = Math.min(least, degree);
  };
  for (let i = neighbours.length - 1; i >= 0; i--) push(i, neighbours[i]!.size);
  return {
    push,
    next(done, now) {
      for (;;) {
        const bucket = buckets[least]!;
        const unknown = bucket.pop();
        if (unknown === undefined) least++;
        else if (done[unknown] === 0 && now[unknown]!.size === least) return unknown;
      }
    },
  };
}
