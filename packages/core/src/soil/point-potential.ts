// Potential of a point current in layered ground, straight from the image lists.

import type { SoilImages } from './image-list.ts';
import { layerAt } from './layer-kernel.ts';

/**
 * Potential at depth z of a unit current at depth d, at horizontal distance r, Ω.
 * @param sourceDepth d, m, 0 or more
 * @param fieldDepth z, m, 0 or more
 * @param distance r, m
 */
export function pointPotential(
  images: SoilImages,
  sourceDepth: number,
  fieldDepth: number,
  distance: number,
): number {
  const list = images.list(layerAt(images.depths, sourceDepth), layerAt(images.depths, fieldDepth));
  let sum = 0;
  for (let i = 0; i < list.count; i++) {
    const height = fieldDepth - list.sign[i]! * sourceDepth - list.offset[i]!;
    sum += list.weight[i]! / Math.sqrt(distance * distance + height * height);
  }
  return list.factor * sum;
}
