// The graph solved at a frequency: the metal's impedance is complex, the soil stays resistive.
import type { SegmentMesh } from '../geometry/segments.ts';
import type { LeakageMatrix } from '../leakage/leakage-matrix.ts';
import { nodeOutflow } from '../network/branches.ts';
import { complexDrop, complexMetalBranches } from '../network/complex-metal.ts';
import { type ComplexBranches, complexBranchCurrents, complexLaplacian } from '../network/complex-network.ts';
import { drawnFromNodes, referenceNodes, segmentPotentials } from '../network/metal.ts';
import { type ComplexProducts, complexGradients, realProducts } from '../numerics/complex-gradients.ts';
import {
  addScaled,
  type Complex,
  type ComplexVector,
  complexNorm,
  complexVector,
} from '../numerics/complex-vector.ts';
import { factorComplex, solvedComplex } from '../numerics/sparse-complex.ts';
import { ACCEPTED_RESIDUAL, iterationOptions, multiplyAll, SolverStalled } from './linear-solver.ts';
import { leakingPieces, unitAt } from './pieces.ts';

/** Response to one ampere injected at one node and taken back at remote earth; phasors against that current. */
export interface ComplexUnitSolution {
  readonly injectionNode: number;
  /** current into the soil by segment of the mesh, A/A; shape [mesh.count] */
  readonly leakage: ComplexVector;
  /** node potentials, Ω (V/A); shape [mesh.nodeCount] */
  readonly nodePotential: ComplexVector;
  /** mean current along each segment from node1 to node2, A/A; shape [mesh.count] */
  readonly along: ComplexVector;
  /** potential of the injection node, Ω */
  readonly impedance: Complex;
  /** magnitude of the current arriving at remote earth less the current injected, of the latter */
  readonly balance: number;
  /** largest failure of Kirchhoff's current law at a node of the metal, A/A */
  readonly nodeBalance: number;
  /** ‖R I − B Φ‖/‖B Φ‖ of the leakage equations */
  readonly residual: number;
}

export interface ComplexGraphSolution {
  readonly mesh: SegmentMesh;
  readonly units: readonly ComplexUnitSolution[];
  readonly iterations: number;
}

/**
 * Solves the graph as `solveGraph` does, with Z the inverse of the metal's reduced Laplacian of complex admittances:
 * (R + B Z Bᵀ) I = Σ_c φ_c 1_c + B Z J is complex symmetric with R real, and takes two real products of R a step. It is
 * iterated with the preconditioner of R: the soil's part is what makes it ill-conditioned.
 * @param injectionNodes one for each response wanted
 * @param impedancePerMetre by conductor, Ω/m: internal impedance and inductance of each conductor by itself, RMS phasors
 * with positive imaginary part for an inductance; real part greater than 0
 * @throws SolverStalled, SingularNetwork
 */
export async function solveGraphComplex(
  mesh: SegmentMesh,
  matrix: LeakageMatrix,
  injectionNodes: readonly number[],
  impedancePerMetre: ComplexVector,
): Promise<ComplexGraphSolution> {
  const { segments, size } = matrix;
  const branches = complexMetalBranches(mesh, impedancePerMetre);
  const references = referenceNodes(mesh, injectionNodes);
  const laplacian = complexLaplacian(branches, mesh.nodeCount, Array.from(references));
  const { pieces, ones, net } = leakingPieces(mesh, segments);
  const distinct = [...new Set(injectionNodes)];
  const away = distinct.filter((node) => !references.includes(node));
  const addMetal = complexDrop(mesh, segments, laplacian);
  const soil = realProducts((xs, into) => multiplyAll(matrix, xs, into));
  const coupled: ComplexProducts = async (xs, into) => {
    await soil(xs, into);
    xs.forEach((x, c) => {
      addMetal(x, into[c]!);
    });
  };
  const ofSegments = (potential: ComplexVector): ComplexVector => ({
    re: segmentPotentials(mesh, segments, potential.re),
    im: segmentPotentials(mesh, segments, potential.im),
  });
  const injected = (node: number): ComplexVector => ({
    re: unitAt(mesh.nodeCount, node),
    im: new Float64Array(mesh.nodeCount),
  });
  const solved = await complexGradients(
    coupled,
    matrix.precondition,
    [
      ...ones.map((re) => ({ re, im: new Float64Array(size) })),
      ...away.map((node) => ofSegments(laplacian.solve(injected(node)))),
    ],
    iterationOptions(matrix),
  );
  for (const { outcome, residual } of solved)
    if (outcome !== 'converged' && !(residual <= ACCEPTED_RESIDUAL)) throw new SolverStalled(residual);
  const xs = solved.map(({ x }) => x);
  const nets = (x: ComplexVector): ComplexVector => ({ re: net(x.re), im: net(x.im) });
  const levels = pieceLevels(xs.slice(0, pieces.length).map(nets));

  const unit = (
    node: number,
  ): Omit<ComplexUnitSolution, 'residual'> & { readonly current: ComplexVector } => {
    const wanted = complexVector(pieces.length);
    wanted.re[pieces.indexOf(mesh.nodeComponent[node]!)] = 1;
    const current = complexVector(size);
    const extra = away.includes(node) ? xs[pieces.length + away.indexOf(node)] : undefined;
    if (extra !== undefined) {
      addScaled(wanted, { re: -1, im: 0 }, nets(extra));
      addScaled(current, { re: 1, im: 0 }, extra);
    }
    const level = levels(wanted);
    pieces.forEach((_, p) => {
      addScaled(current, { re: level.re[p]!, im: level.im[p]! }, xs[p]!);
    });
    const drawn = {
      re: drawnFromNodes(mesh, segments, current.re),
      im: drawnFromNodes(mesh, segments, current.im),
    };
    const rest = injected(node);
    addScaled(rest, { re: -1, im: 0 }, drawn);
    const nodePotential = laplacian.solve(rest);
    const along = complexBranchCurrents(branches, nodePotential);
    for (let at = 0; at < mesh.nodeCount; at++) {
      const p = pieces.indexOf(mesh.nodeComponent[at]!);
      nodePotential.re[at]! += level.re[p] ?? 0;
      nodePotential.im[at]! += level.im[p] ?? 0;
    }
    const leakage = complexVector(mesh.count);
    segments.forEach((i, k) => {
      leakage.re[i] = current.re[k]!;
      leakage.im[i] = current.im[k]!;
    });
    return {
      injectionNode: node,
      current,
      leakage,
      nodePotential,
      along,
      impedance: { re: nodePotential.re[node]!, im: nodePotential.im[node]! },
      balance: Math.hypot(sum(current.re) - 1, sum(current.im)),
      nodeBalance: kirchhoffFailure(branches, along, rest),
    };
  };
  const found = distinct.map(unit);
  const products = found.map(() => complexVector(size));
  await soil(
    found.map(({ current }) => current),
    products,
  );
  const units = found.map(({ current: _, ...one }, u): ComplexUnitSolution => {
    const potential = ofSegments(one.nodePotential);
    const scale = complexNorm(potential);
    addScaled(products[u]!, { re: -1, im: 0 }, potential);
    return { ...one, residual: complexNorm(products[u]!) / scale };
  });
  return {
    mesh,
    units: injectionNodes.map((node) => units[distinct.indexOf(node)]!),
    iterations: solved.reduce((total, { iterations }) => total + iterations, 0),
  };
}

/** Solves the small symmetric system of net currents between pieces for their reference potentials. */
function pieceLevels(nets: readonly ComplexVector[]): (wanted: ComplexVector) => ComplexVector {
  const size = nets.length;
  const pairs = nets.flatMap((_, i) => Array.from({ length: i }, (__, j) => [i, j] as const));
  const mean = (part: 're' | 'im') => (i: number, j: number) =>
    0.5 * (nets[j]![part][i]! + nets[i]![part][j]!);
  const vector = (entries: readonly (readonly [number, number])[]): ComplexVector => ({
    re: Float64Array.from(entries, ([i, j]) => mean('re')(i, j)),
    im: Float64Array.from(entries, ([i, j]) => mean('im')(i, j)),
  });
  const factor = factorComplex({
    size,
    diagonal: vector(nets.map((_, i) => [i, i] as const)),
    row: Int32Array.from(pairs, ([i]) => i),
    column: Int32Array.from(pairs, ([, j]) => j),
    value: vector(pairs),
  });
  return (wanted) => solvedComplex(factor, wanted);
}

/** Largest magnitude of outflow along the metal less what is injected and not drawn, over the nodes. */
function kirchhoffFailure(branches: ComplexBranches, along: ComplexVector, rest: ComplexVector): number {
  const re = nodeOutflow(branches, rest.re.length, along.re);
  const im = nodeOutflow(branches, rest.re.length, along.im);
  return re.reduce(
    (most, out, node) => Math.max(most, Math.hypot(out - rest.re[node]!, im[node]! - rest.im[node]!)),
    0,
  );
}

function sum(part: Float64Array): number {
  return part.reduce((total, value) => total + value, 0);
}
