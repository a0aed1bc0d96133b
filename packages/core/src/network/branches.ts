// Branches of a resistive network, their incidence on its nodes, and what Kirchhoff's laws make of them.

/** Node index that stands for remote earth, the grounded node of every network. */
export const REMOTE_EARTH = -1;

/** Shape [count] each. A branch may end at REMOTE_EARTH; its current counts positive from `from` to `to`. */
export interface Branches {
  readonly count: number;
  readonly from: Int32Array;
  readonly to: Int32Array;
  /** S, greater than 0 */
  readonly conductance: Float64Array;
}

/** Currents of the branches from node potentials (remote earth at 0), A: i = g·(φ_from − φ_to). */
export function branchCurrents(branches: Branches, potential: Float64Array): Float64Array {
  const current = new Float64Array(branches.count);
  for (let b = 0; b < branches.count; b++) {
    const from = branches.from[b]!;
    const to = branches.to[b]!;
    const difference = (from < 0 ? 0 : potential[from]!) - (to < 0 ? 0 : potential[to]!);
    current[b] = branches.conductance[b]! * difference;
  }
  return current;
}

/** Current that leaves each node through its branches, A (the incidence matrix times the branch currents); shape [nodeCount]. */
export function nodeOutflow(
  branches: Pick<Branches, 'count' | 'from' | 'to'>,
  nodeCount: number,
  current: Float64Array,
): Float64Array {
  const outflow = new Float64Array(nodeCount);
  for (let b = 0; b < branches.count; b++) {
    const from = branches.from[b]!;
    const to = branches.to[b]!;
    if (from >= 0) outflow[from]! += current[b]!;
    if (to >= 0) outflow[to]! -= current[b]!;
  }
  return outflow;
}
