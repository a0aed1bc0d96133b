// Potential at any point of the ground, straight from the image lists: exact, for few points.
import type { SegmentMesh } from '../geometry/segments.ts';
import { CLOSED_FORM_RATIO, gaussOrder, wireOf } from '../leakage/pair-potential.ts';
import { meanInverseDistanceToPoint } from '../leakage/wire-pair.ts';
import { gaussLegendre } from '../numerics/gauss-legendre.ts';
import type { SoilImages } from '../soil/image-list.ts';
import { layerAt } from '../soil/layer-kernel.ts';

/**
 * Potential at a point, V (or Ω for a leakage per ampere): Σ_j I_j·factor·Σ_images weight·(1/L)∫ ds/√(r² + a²).
 * @param leakage current into the soil by segment, A; shape [mesh.count]
 * @param z depth, m, 0 or more
 */
export function potentialAt(
  mesh: SegmentMesh,
  images: SoilImages,
  leakage: Float64Array,
  x: number,
  y: number,
  z: number,
): number {
  const fieldLayer = layerAt(images.depths, z);
  let sum = 0;
  for (let j = 0; j < mesh.count; j++) {
    if (leakage[j] === 0) continue;
    const list = images.list(mesh.layer[j]!, fieldLayer);
    const wire = wireOf(mesh, j);
    const { z1, z2 } = wire;
    const length = mesh.length[j]!;
    const radius = mesh.radius[j]!;
    const dx = x - (wire.x1 + wire.x2) / 2;
    const dy = y - (wire.y1 + wire.y2) / 2;
    let mean = 0;
    for (let k = 0; k < list.count; k++) {
      wire.z1 = list.sign[k]! * z1 + list.offset[k]!;
      wire.z2 = list.sign[k]! * z2 + list.offset[k]!;
      const dz = z - (wire.z1 + wire.z2) / 2;
      const ratio = Math.sqrt(dx * dx + dy * dy + dz * dz) / length;
      let one: number;
      if (ratio < CLOSED_FORM_RATIO) one = meanInverseDistanceToPoint(wire, x, y, z, radius);
      else {
        const { points, weights } = gaussLegendre(gaussOrder(ratio));
        one = 0;
        for (let a = 0; a < points.length; a++) {
          const t = points[a]!;
          const px = x - wire.x1 - t * (wire.x2 - wire.x1);
          const py = y - wire.y1 - t * (wire.y2 - wire.y1);
          const pz = z - wire.z1 - t * (wire.z2 - wire.z1);
          one += weights[a]! / Math.sqrt(px * px + py * py + pz * pz + radius * radius);
        }
      }
      mean += list.weight[k]! * one;
    }
    sum += leakage[j]! * list.factor * mean;
  }
  return sum;
}
