// An entry of the leakage matrix by direct quadrature, image by image: the reference for what the engine computes.
import type { ImageList, SegmentMesh } from '@ohmstead/core';

/**
 * Nodes and weights of the double exponential rule on (0, 1), x = 1/(1 + e^{−π sinh u}): exact to rounding for an
 * integrand that is smooth inside and singular, or nearly, at the ends (Takahasi and Mori, Publ. RIMS 9, 1974; from memory).
 */
const STEP = 1 / 16;
const STEPS = 56;
const RULE = Array.from({ length: 2 * STEPS + 1 }, (_, k) => {
  const u = (k - STEPS) * STEP;
  const e = Math.exp(-Math.PI * Math.sinh(u));
  return { x: 1 / (1 + e), weight: (STEP * Math.PI * Math.cosh(u) * e) / (1 + e) ** 2 };
}).filter(({ weight }) => weight > 0);

/**
 * R_ij = factor·Σ weight·(1/L_i L_j)∬ ds dt/√(r² + a²), Ω: the inner integral closed, (1/L) ln[(r1 + r2 + L)/(r1 + r2 − L)],
 * the outer by the rule above. Segments must touch at their ends only.
 * @param images list of the layer that holds both segments
 */
export function referenceEntry(mesh: SegmentMesh, i: number, j: number, images: ImageList): number {
  const radius = Math.max(mesh.radius[i]!, mesh.radius[j]!);
  let sum = 0;
  for (let k = 0; k < images.count; k++) {
    const z1 = images.sign[k]! * mesh.z1[j]! + images.offset[k]!;
    const z2 = images.sign[k]! * mesh.z2[j]! + images.offset[k]!;
    for (const { x: t, weight } of RULE) {
      const x = mesh.x1[i]! + t * (mesh.x2[i]! - mesh.x1[i]!);
      const y = mesh.y1[i]! + t * (mesh.y2[i]! - mesh.y1[i]!);
      const z = mesh.z1[i]! + t * (mesh.z2[i]! - mesh.z1[i]!);
      const r1 = distance(x - mesh.x1[j]!, y - mesh.y1[j]!, z - z1, radius);
      const r2 = distance(x - mesh.x2[j]!, y - mesh.y2[j]!, z - z2, radius);
      // ln[(s + L)/(s − L)] = 2 atanh(L/s) keeps its digits where the segment is small and far
      sum += images.weight[k]! * weight * 2 * Math.atanh(mesh.length[j]! / (r1 + r2));
    }
  }
  return (images.factor * sum) / mesh.length[j]!;
}

function distance(x: number, y: number, z: number, radius: number): number {
  return Math.sqrt(x * x + y * y + z * z + radius * radius);
}
