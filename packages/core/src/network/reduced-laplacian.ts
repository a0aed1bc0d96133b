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

/** Unknowns of a network, and the places of its Laplacian off the diagonal. */
export interface LaplacianPattern {
  /** nodes that are not grounded */
  readonly size: number;
  /** number of each node among them; −1 for a grounded one; shape [nodeCount] */
  readonly unknown: Int32Array;
  /** two unknowns joined, and the branch that joins them */
  readonly row: Int32Array;
  readonly column: Int32Array;
  readonly branch: Int32Array;
}

/** @param grounded nodes held at zero potential besides remote earth */
export function laplacianPattern(
  { count, from, to }: Pick<Branches, 'count' | 'from' | 'to'>,
  nodeCount: number,
  grounded: readonly number[],
): LaplacianPattern {
  const unknown = new Int32Array(nodeCount);
  for (const node of grounded) unknown[node] = -1;
  let size = 0;
  for (let node = 0; node < nodeCount; node++) if (unknown[node] === 0) unknown[node] = size++;
  const numberOf = (node: number): number => (node < 0 ? -1 : unknown[node]!);
  const joining = Int32Array.from({ length: count }, (_, b) => b).filter((b) => {
    const [i, j] = [numberOf(from[b]!), numberOf(to[b]!)];
    return i >= 0 && j >= 0 && i !== j;
  });
  return {
    size,
    unknown,
    row: joining.map((b) => unknown[from[b]!]!),
    column: joining.map((b) => unknown[to[b]!]!),
    branch: joining,
  };
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
  const { size, unknown, row, column, branch } = laplacianPattern(branches, nodeCount, grounded);
  const diagonal = new Float64Array(size);
  for (let b = 0; b < branches.count; b++)
    for (const node of [branches.from[b]!, branches.to[b]!])
      if (node >= 0 && unknown[node]! >= 0) diagonal[unknown[node]!]! += branches.conductance[b]!;
  const value = Float64Array.from(branch, (b) => -branches.conductance[b]!);
  const factor = factorSparse({ size, diagonal, row, column, value });
  const places = unknown.map((own) => (own < 0 ? size : factor.place[own]!));
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
