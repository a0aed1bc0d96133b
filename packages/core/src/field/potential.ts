// Potential at any point of the ground, straight from the image lists: exact, for few points.
import type { SegmentMesh } from '../geometry/segments.ts';
import { wireOf } from '../leakage/pair-potential.ts';
import { meanInverseDistanceToPoint } from '../leakage/wire-pair.ts';
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
    const radius = mesh.radius[j]!;
    let mean = 0;
    for (let k = 0; k < list.count; k++) {
      wire.z1 = list.sign[k]! * z1 + list.offset[k]!;
      wire.z2 = list.sign[k]! * z2 + list.offset[k]!;
      mean += list.weight[k]! * meanInverseDistanceToPoint(wire, x, y, z, radius);
    }
    sum += leakage[j]! * list.factor * mean;
  }
  return sum;
}
