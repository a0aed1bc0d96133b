// The metal of a mesh as a network: one branch a segment, and the potential drop that leakage currents make in it.
import type { SegmentMesh } from '../geometry/segments.ts';
import type { Branches } from './branches.ts';
import { type ReducedLaplacian, reducedLaplacian } from './reduced-laplacian.ts';

/**
 * Branches of the metal, one a segment.
 * @param resistancePerMetre by conductor, Ω/m, greater than 0
 */
export function metalBranches(mesh: SegmentMesh, resistancePerMetre: Float64Array): Branches {
  const conductance = mesh.length.map((length, i) => 1 / (length * resistancePerMetre[mesh.conductor[i]!]!));
  return { count: mesh.count, from: mesh.node1, to: mesh.node2, conductance };
}

/** One reference node of each piece of metal, by component: the first of those preferred, else its first. */
export function referenceNodes(mesh: SegmentMesh, preferred: readonly number[]): Int32Array {
  const references = new Int32Array(mesh.componentCount).fill(-1);
  for (const node of preferred) {
    const component = mesh.nodeComponent[node]!;
    if (references[component]! < 0) references[component] = node;
  }
  for (let node = 0; node < mesh.nodeCount; node++) {
    const component = mesh.nodeComponent[node]!;
    if (references[component]! < 0) references[component] = node;
  }
  return references;
}

/** The metal's Laplacian with one reference node of each piece of metal grounded; the references are also returned, by component. */
export function groundedMetal(
  mesh: SegmentMesh,
  branches: Branches,
  preferred: readonly number[],
): { readonly laplacian: ReducedLaplacian; readonly references: Int32Array } {
  const references = referenceNodes(mesh, preferred);
  return { laplacian: reducedLaplacian(branches, mesh.nodeCount, Array.from(references)), references };
}

/** Bᵀ x: each leaking segment draws its current half from either end node; shape [nodeCount]. */
export function drawnFromNodes(mesh: SegmentMesh, segments: Int32Array, leakage: Float64Array): Float64Array {
  const drawn = new Float64Array(mesh.nodeCount);
  for (let k = 0; k < segments.length; k++) {
    const i = segments[k]!;
    drawn[mesh.node1[i]!]! += 0.5 * leakage[k]!;
    drawn[mesh.node2[i]!]! += 0.5 * leakage[k]!;
  }
  return drawn;
}

/** B Φ: potential of each leaking segment, the mean of its end nodes; shape [segments]. */
export function segmentPotentials(
  mesh: SegmentMesh,
  segments: Int32Array,
  nodePotential: Float64Array,
): Float64Array {
  const potential = new Float64Array(segments.length);
  for (let k = 0; k < segments.length; k++) {
    const i = segments[k]!;
    potential[k] = 0.5 * (nodePotential[mesh.node1[i]!]! + nodePotential[mesh.node2[i]!]!);
  }
  return potential;
}

/** Adds B Z Bᵀ x to `into`, V: the drop that leakage currents make in the metal on their way to the references. */
export type MetalDrop = (x: Float64Array, into: Float64Array) => void;

/** B Z Bᵀ with Z the inverse of the reduced Laplacian; its calls allocate nothing. */
export function metalDrop(mesh: SegmentMesh, segments: Int32Array, laplacian: ReducedLaplacian): MetalDrop {
  const first = Int32Array.from(segments, (i) => laplacian.place[mesh.node1[i]!]!);
  const second = Int32Array.from(segments, (i) => laplacian.place[mesh.node2[i]!]!);
  // the place after the last gathers what the grounded nodes draw, and stays at their potential
  const node = new Float64Array(laplacian.size + 1);
  return (x, into) => {
    node.fill(0);
    for (let k = 0; k < first.length; k++) {
      const half = 0.5 * x[k]!;
      node[first[k]!]! += half;
      node[second[k]!]! += half;
    }
    laplacian.solveInPlace(node);
    node[laplacian.size] = 0;
    for (let k = 0; k < first.length; k++) into[k]! += 0.5 * (node[first[k]!]! + node[second[k]!]!);
  };
}
