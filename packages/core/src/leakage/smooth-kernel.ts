// Some images of a depth class, seen from a fixed depth, as a table in horizontal distance.
import type { ImageList } from '../soil/image-list.ts';
import type { DepthClass } from './depth-classes.ts';
import { type RadialTable, radialTable } from './radial-table.ts';

/** Tables kept of each list. Reason: meshes of one electrode, coarse to fine, ask for the same depths. */
const MOST_KEPT = 64;
const known = new WeakMap<ImageList, Map<string, RadialTable | undefined>>();

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
  const made = known.get(images) ?? new Map<string, RadialTable | undefined>();
  known.set(images, made);
  const key = [source.z1, source.z2, source.vertical, fieldDepth, reach, ...chosen].join(' ');
  if (!made.has(key)) {
    const [oldest] = made.keys();
    if (made.size >= MOST_KEPT && oldest !== undefined) made.delete(oldest);
    made.set(key, tabulated(images, chosen, source, fieldDepth, reach));
  }
  return made.get(key);
}

function tabulated(
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
  const sum = (rr: number, weights: Float64Array): number => {
    let total = 0;
    if (source.vertical)
      for (let k = 0; k < count; k++) total += weights[k]! * extentMean(near[k]!, far[k]!, rr);
    else for (let k = 0; k < count; k++) total += weights[k]! / Math.sqrt(rr + near[k]! * near[k]!);
    return total;
  };
  // images of both signs may cancel: an error counts against their sizes
  const sizes = weight.map(Math.abs);
  return radialTable(
    (rr) => sum(rr, weight),
    smoothness,
    reach,
    0,
    (rr) => sum(rr, sizes),
  );
}

/** (1/(h2 − h1))∫ dh/√(r² + h²), 0 ≤ h1 < h2. */
function extentMean(h1: number, h2: number, rr: number): number {
  return Math.log((h2 + Math.sqrt(rr + h2 * h2)) / (h1 + Math.sqrt(rr + h1 * h1))) / (h2 - h1);
}
