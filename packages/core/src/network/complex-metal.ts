// The metal of a mesh as a network of complex impedances, and the potential drop that leakage currents make in it.
import type { SegmentMesh } from '../geometry/segments.ts';
import type { ComplexVector } from '../numerics/complex-vector.ts';
import { type ComplexBranches, type ComplexLaplacian, reciprocals } from './complex-network.ts';

/**
 * Branches of the metal, one a segment.
 * @param impedancePerMetre by conductor, Ω/m, real part greater than 0
 */
export function complexMetalBranches(mesh: SegmentMesh, impedancePerMetre: ComplexVector): ComplexBranches {
  const part = (perMetre: Float64Array): Float64Array =>
    mesh.length.map((length, i) => length * perMetre[mesh.conductor[i]!]!);
  const admittance = reciprocals({ re: part(impedancePerMetre.re), im: part(impedancePerMetre.im) });
  return { count: mesh.count, from: mesh.node1, to: mesh.node2, admittance };
}

/** Adds B Z Bᵀ x to `into`, V. */
export type ComplexDrop = (x: ComplexVector, into: ComplexVector) => void;

/** B Z Bᵀ with Z the inverse of the reduced Laplacian; its calls allocate nothing. */
export function complexDrop(
  mesh: SegmentMesh,
  segments: Int32Array,
  laplacian: ComplexLaplacian,
): ComplexDrop {
  const { size } = laplacian;
  const first = Int32Array.from(segments, (i) => laplacian.place[mesh.node1[i]!]!);
  const second = Int32Array.from(segments, (i) => laplacian.place[mesh.node2[i]!]!);
  // the place after the last gathers what the grounded nodes draw, and stays at their potential
  const node = { re: new Float64Array(size + 1), im: new Float64Array(size + 1) };
  const parts = [node.re, node.im] as const;
  return (x, into) => {
    [x.re, x.im].forEach((part, c) => {
      const held = parts[c]!.fill(0);
      for (let k = 0; k < first.length; k++) {
        held[first[k]!]! += 0.5 * part[k]!;
        held[second[k]!]! += 0.5 * part[k]!;
      }
    });
    laplacian.solveInPlace(node);
    [into.re, into.im].forEach((part, c) => {
      const held = parts[c]!;
      held[size] = 0;
      for (let k = 0; k < first.length; k++) part[k]! += 0.5 * (held[first[k]!]! + held[second[k]!]!);
    });
  };
}
