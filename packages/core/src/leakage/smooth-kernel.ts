// Some images of a depth class, seen from a fixed depth, as a table in horizontal distance.
import type { ImageList } from '../soil/image-list.ts';
import type { DepthClass } from './depth-classes.ts';
import { type RadialTable, radialTable } from './radial-table.ts';

/** Images past the primary ones, as indices into the list. */
export function smoothImages(images: ImageList): number[] {
  return Array.from({ length: images.count - images.primaryCount }, (_, k) => images.primaryCount + k);
}

/**
 * Mean over a vertical source (or value for a horizontal one) of Σ weight/√(r² + h²) over the chosen images, for a
 * field point at depth z; undefined where none is chosen. For a vertical extent the mean is
 * ln[(h2 + √(r² + h2²))/(h1 + √(r² + h1²))]/(h2 − h1), both heights on one side of zero.
 * @param chosen indices of images that keep a distance from the field depth
 * @param source horizontal or vertical class
 * @param fieldDepth z, m
 * @param reach largest horizontal distance asked of the table, m
 */
export function smoothKernel(
  images: ImageList,
  chosen: readonly number[],
  source: DepthClass,
  fieldDepth: number,
  reach: number,
): RadialTable | undefined {
  const count = chosen.length;
  if (count === 0) return undefined;
  const near = new Float64Array(count);
  const far = new Float64Array(count);
  const weight = Float64Array.from(chosen, (image) => images.weight[image]!);
  let smoothness = Number.POSITIVE_INFINITY;
  for (let k = 0; k < count; k++) {
    const sign = images.sign[chosen[k]!]!;
    const offset = images.offset[chosen[k]!]!;
    const h1 = Math.abs(fieldDepth - sign * source.z1 - offset);
    const h2 = Math.abs(fieldDepth - sign * source.z2 - offset);
    near[k] = Math.min(h1, h2);
    far[k] = Math.max(h1, h2);
    smoothness = Math.min(smoothness, near[k]!);
  }
  const level = (rr: number): number => {
    let sum = 0;
    for (let k = 0; k < count; k++) sum += weight[k]! / Math.sqrt(rr + near[k]! * near[k]!);
    return sum;
  };
  const upright = (rr: number): number => {
    let sum = 0;
    for (let k = 0; k < count; k++) {
      const h1 = near[k]!;
      const h2 = far[k]!;
      const ratio = (h2 + Math.sqrt(rr + h2 * h2)) / (h1 + Math.sqrt(rr + h1 * h1));
      sum += (weight[k]! * Math.log(ratio)) / (h2 - h1);
    }
    return sum;
  };
  return radialTable(source.vertical ? upright : level, smoothness, reach);
}
