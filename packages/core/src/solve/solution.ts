// The graph solved: for one ampere injected at a node, where it leaks and what potential the metal takes.
import type { SegmentMesh } from '../geometry/segments.ts';
import type { LeakageMatrix } from '../leakage/leakage-matrix.ts';
import { branchCurrents, nodeOutflow } from '../network/branches.ts';
import {
  drawnFromNodes,
  groundedMetal,
  metalBranches,
  metalDrop,
  segmentPotentials,
} from '../network/metal.ts';
import { factorPacked, solvePacked } from '../numerics/packed-cholesky.ts';
import { linearSolver, multiplyAll } from './linear-solver.ts';
import { leakingPieces, unitAt } from './pieces.ts';

export type MetalModel = 'resistive' | 'equipotential';

/** Response to one ampere injected at one node and taken back at remote earth. */
export interface UnitSolution {
  readonly injectionNode: number;
  /** current into the soil by segment of the mesh, A/A; shape [mesh.count] */
  readonly leakage: Float64Array;
  /** node potentials, Ω (V/A); shape [mesh.nodeCount] */
  readonly nodePotential: Float64Array;
  /** mean current along each segment from node1 to node2, A/A; shape [mesh.count] */
  readonly along: Float64Array;
  /** potential of the injection node, Ω */
  readonly resistance: number;
  /** current arriving at remote earth less the current injected, of the latter: the equation struck out of the Laplacian */
  readonly balance: number;
  /** largest failure of Kirchhoff's current law at a node of the metal, A/A */
  readonly nodeBalance: number;
  /** ‖R I − B Φ‖/‖B Φ‖ of the leakage equations */
  readonly residual: number;
}

export interface GraphSolution {
  readonly mesh: SegmentMesh;
  readonly units: readonly UnitSolution[];
  readonly iterations: number;
}

/**
 * Solves the graph: R I = B Φ couples every leaking segment with the soil, Y Φ + Bᵀ I = J is Kirchhoff's law in the metal,
 * remote earth is the grounded node. With one reference node of each piece of metal struck out and Z the inverse of
 * the metal's reduced Laplacian, Φ = φ_c + Z(J − Bᵀ I), so (R + B Z Bᵀ) I = Σ_c φ_c 1_c + B Z J, and the reference potentials
 * φ_c follow from the net current of each piece: what is injected, zero for metal that floats.
 * @param injectionNodes one for each response wanted
 * @param resistancePerMetre by conductor, Ω/m; used in the equipotential model only to share the currents along the metal
 * @throws SolverStalled, NotPositiveDefinite
 */
export async function solveGraph(
  mesh: SegmentMesh,
  matrix: LeakageMatrix,
  injectionNodes: readonly number[],
  resistancePerMetre: Float64Array,
  model: MetalModel,
): Promise<GraphSolution> {
  const { segments, size } = matrix;
  const resistive = model === 'resistive';
  const branches = metalBranches(mesh, resistancePerMetre);
  const { laplacian, references } = groundedMetal(mesh, branches, injectionNodes);
  const { pieces, ones, net } = leakingPieces(mesh, segments);
  const distinct = [...new Set(injectionNodes)];
  const away = resistive ? distinct.filter((node) => !references.includes(node)) : [];
  const solver = linearSolver(
    resistive ? { matrix, addMetal: metalDrop(mesh, segments, laplacian) } : { matrix },
    pieces.length + away.length,
  );
  const { xs, iterations } = await solver.solve([
    ...ones,
    ...away.map((node) => segmentPotentials(mesh, segments, laplacian.solve(unitAt(mesh.nodeCount, node)))),
  ]);
  const response = xs.slice(0, pieces.length);
  const gram = packPieces(response.map(net));

  /** Current from each segment, and the reference potentials by piece that impose the net currents. */
  const leakageOf = (node: number): { readonly current: Float64Array; readonly level: Float64Array } => {
    const extra = away.includes(node) ? xs[pieces.length + away.indexOf(node)] : undefined;
    const level = new Float64Array(pieces.length);
    level[pieces.indexOf(mesh.nodeComponent[node]!)] = 1;
    if (extra !== undefined) net(extra).forEach((sum, p) => { level[p]! -= sum; }); // biome-ignore format: one line of algebra
    solvePacked(gram, pieces.length, level);
    const current = extra === undefined ? new Float64Array(size) : extra.slice();
    response.forEach((x, p) => {
      for (let k = 0; k < size; k++) current[k]! += level[p]! * x[k]!;
    });
    return { current, level };
  };
  const unit = (
    node: number,
    { current, level }: ReturnType<typeof leakageOf>,
  ): Omit<UnitSolution, 'residual'> => {
    const injection = unitAt(mesh.nodeCount, node);
    const drawn = drawnFromNodes(mesh, segments, current);
    const relative = laplacian.solve(injection.map((j, at) => j - drawn[at]!));
    const levelOf = new Map(pieces.map((c, p) => [c, level[p]!]));
    const nodePotential = relative.map(
      (v, at) => (levelOf.get(mesh.nodeComponent[at]!) ?? 0) + (resistive ? v : 0),
    );
    const along = branchCurrents(branches, relative);
    const leakage = new Float64Array(mesh.count);
    segments.forEach((i, k) => {
      leakage[i] = current[k]!;
    });
    return {
      injectionNode: node,
      leakage,
      nodePotential,
      along,
      resistance: nodePotential[node]!,
      balance: current.reduce((sum, i) => sum + i, 0) - 1,
      nodeBalance: kirchhoffFailure(nodeOutflow(branches, mesh.nodeCount, along), drawn, injection),
    };
  };
  const leakages = distinct.map(leakageOf);
  const products = leakages.map(() => new Float64Array(size));
  await multiplyAll(
    matrix,
    leakages.map(({ current }) => current),
    products,
  );
  const units = distinct.map((node, u): UnitSolution => {
    const solved = unit(node, leakages[u]!);
    const potential = segmentPotentials(mesh, segments, solved.nodePotential);
    return { ...solved, residual: relativeDifference(products[u]!, potential) };
  });
  return { mesh, units: injectionNodes.map((node) => units[distinct.indexOf(node)]!), iterations };
}

/** Cholesky factor of the small matrix of net currents between pieces: symmetric positive definite as K⁻¹ is. */
function packPieces(nets: readonly Float64Array[]): Float64Array {
  const n = nets.length;
  const packed = new Float64Array((n * (n + 1)) / 2);
  for (let i = 0; i < n; i++)
    for (let j = 0; j <= i; j++) packed[(i * (i + 1)) / 2 + j] = 0.5 * (nets[j]![i]! + nets[i]![j]!);
  factorPacked(packed, n);
  return packed;
}

/** Largest |outflow along the metal + leakage drawn − injection| over the nodes. */
function kirchhoffFailure(outflow: Float64Array, drawn: Float64Array, injection: Float64Array): number {
  return outflow.reduce(
    (most, out, node) => Math.max(most, Math.abs(out + drawn[node]! - injection[node]!)),
    0,
  );
}

/** ‖found − wanted‖/‖wanted‖. */
function relativeDifference(found: Float64Array, wanted: Float64Array): number {
  let error = 0;
  let scale = 0;
  for (let k = 0; k < wanted.length; k++) {
    error += (found[k]! - wanted[k]!) ** 2;
    scale += wanted[k]! ** 2;
  }
  return Math.sqrt(error / scale);
}
