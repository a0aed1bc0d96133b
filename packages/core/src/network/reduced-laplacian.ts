// The Laplacian of a network with its grounded nodes struck out, factored once and solved for any injection.
import { factorSparse, solveEliminated } from '../numerics/sparse-cholesky.ts';
import type { Branches } from './branches.ts';

export interface ReducedLaplacian {
  readonly nodeCount: number;
  /** nodes that are not grounded */
  readonly size: number;
  /** place of each node among the unknowns; `size` for a grounded one; shape [nodeCount] */
  readonly place: Int32Array;
  /** replaces currents by potentials, both by place, allocating nothing; what lies from `size` on is left alone */
  solveInPlace(b: Float64Array): void;
  /**
   * Node potentials, V, for currents injected at the nodes, A, and taken back at the grounded nodes; those stay at 0.
   * @param injection shape [nodeCount]
   */
  solve(injection: Float64Array): Float64Array;
}

/**
 * Builds and factors the reduced Laplacian Y = A diag(g) Aᵀ of the nodes that are not grounded. The full Laplacian is
 * singular, its potentials being free up to a constant for each connected part; every part must hold a grounded node
 * or a branch to remote earth.
 * @param grounded nodes held at zero potential besides remote earth
 * @throws NotPositiveDefinite when a part of the network touches no grounded node
 */
export function reducedLaplacian(
  branches: Branches,
  nodeCount: number,
  grounded: readonly number[],
): ReducedLaplacian {
  const place = new Int32Array(nodeCount);
  for (const node of grounded) place[node] = -1;
  let size = 0;
  for (let node = 0; node < nodeCount; node++) if (place[node] === 0) place[node] = size++;
  const diagonal = new Float64Array(size);
  const rows: number[] = [];
  const columns: number[] = [];
  const values: number[] = [];
  for (let b = 0; b < branches.count; b++) {
    const from = branches.from[b]! < 0 ? -1 : place[branches.from[b]!]!;
    const to = branches.to[b]! < 0 ? -1 : place[branches.to[b]!]!;
    const g = branches.conductance[b]!;
    if (from >= 0) diagonal[from]! += g;
    if (to >= 0) diagonal[to]! += g;
    if (from >= 0 && to >= 0 && from !== to) {
      rows.push(from);
      columns.push(to);
      values.push(-g);
    }
  }
  const factor = factorSparse({
    size,
    diagonal,
    row: Int32Array.from(rows),
    column: Int32Array.from(columns),
    value: Float64Array.from(values),
  });
  const eliminated = new Int32Array(size);
  factor.order.forEach((unknown, k) => {
    eliminated[unknown] = k;
  });
  const places = place.map((unknown) => (unknown < 0 ? size : eliminated[unknown]!));
  const solveInPlace = (b: Float64Array): void => solveEliminated(factor, b);
  return {
    nodeCount,
    size,
    place: places,
    solveInPlace,
    solve(injection) {
      const b = new Float64Array(size + 1);
      places.forEach((at, node) => {
        b[at] = injection[node]!;
      });
      solveInPlace(b);
      b[size] = 0;
      return Float64Array.from(places, (at) => b[at]!);
    },
  };
}
