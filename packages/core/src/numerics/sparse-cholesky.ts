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
  const graph: Neighbours[] = Array.from({ length: n }, () => ({ unknowns: [], values: [] }));
  for (let e = 0; e < matrix.value.length; e++) {
    addTo(graph[matrix.row[e]!]!, matrix.column[e]!, matrix.value[e]!);
    addTo(graph[matrix.column[e]!]!, matrix.row[e]!, matrix.value[e]!);
  }
  const diagonal = Float64Array.from(matrix.diagonal);
  const queue = degreeQueue(graph);
  const done = new Uint8Array(n);
  const order = new Int32Array(n);
  const pivot = new Float64Array(n);
  const start = new Int32Array(n + 1);
  const rows: number[] = [];
  const values: number[] = [];
  for (let k = 0; k < n; k++) {
    const v = queue.next(done);
    const p = diagonal[v]!;
    if (!(p > 0)) throw new NotPositiveDefinite(v);
    done[v] = 1;
    order[k] = v;
    pivot[k] = p;
    const around = graph[v]!;
    for (const i of around.unknowns) remove(graph[i]!, v);
    for (let a = 0; a < around.unknowns.length; a++) {
      const i = around.unknowns[a]!;
      const wi = around.values[a]!;
      const factor = wi / p;
      rows.push(i);
      values.push(factor);
      diagonal[i]! -= factor * wi;
      for (let b = a + 1; b < around.unknowns.length; b++) {
        const j = around.unknowns[b]!;
        const change = -factor * around.values[b]!;
        addTo(graph[i]!, j, change);
        addTo(graph[j]!, i, change);
      }
    }
    for (const i of around.unknowns) queue.push(i);
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

/** Neighbours of an unknown and the entries that join them; few, so that looking through them is quickest. */
interface Neighbours {
  readonly unknowns: number[];
  readonly values: number[];
}

function addTo({ unknowns, values }: Neighbours, other: number, change: number): void {
  const at = unknowns.indexOf(other);
  if (at >= 0) values[at]! += change;
  else {
    unknowns.push(other);
    values.push(change);
  }
}

function remove({ unknowns, values }: Neighbours, other: number): void {
  const at = unknowns.indexOf(other);
  const last = unknowns.pop()!;
  const value = values.pop()!;
  if (at === unknowns.length) return;
  unknowns[at] = last;
  values[at] = value;
}

interface DegreeQueue {
  push(unknown: number): void;
  next(done: Uint8Array): number;
}

/** Unknowns in buckets by degree; stale entries are passed over when they come up. */
function degreeQueue(graph: readonly Neighbours[]): DegreeQueue {
  const buckets: number[][] = [];
  let least = 0;
  const push = (unknown: number): void => {
    const degree = graph[unknown]!.unknowns.length;
    while (buckets.length <= degree) buckets.push([]);
    buckets[degree]!.push(unknown);
    least = Math.min(least, degree);
  };
  for (let i = graph.length - 1; i >= 0; i--) push(i);
  return {
    push,
    next(done) {
      for (;;) {
        const unknown = buckets[least]!.pop();
        if (unknown === undefined) least++;
        else if (done[unknown] === 0 && graph[unknown]!.unknowns.length === least) return unknown;
      }
    },
  };
}
