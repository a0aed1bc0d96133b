// Mutual resistance of two segments, straight from the image list: near images by closed form, far ones by Gauss points.
import type { SegmentMesh } from '../geometry/segments.ts';
import { gaussLegendre } from '../numerics/gauss-legendre.ts';
import type { ImageList } from '../soil/image-list.ts';
import { meanInverseDistance, selfInverseDistance, type Wire } from './wire-pair.ts';

/**
 * Distance between centres over the longer length, below which the closed double integral is used. This and the ratios
 * below avoid round numbers, which regular grids hit exactly: a tie broken by rounding would spoil symmetries.
 */
export const CLOSED_FORM_RATIO = 1.987;

/** Ratios of distance to length from which one, two and three Gauss points are enough. */
export const GAUSS_RATIOS: Float64Array = Float64Array.of(197.3, 7.93, 3.187);

/**
 * Gauss points on a segment seen from a given distance over its length, so that an entry errs by less than 3e-6:
 * the n-point rule on 1/r errs by 2/180·x⁴, 2/2 800·x⁶, 2·2.3e-5·x⁸ of the entry at length over distance x.
 */
export function gaussOrder(ratio: number): number {
  if (ratio >= GAUSS_RATIOS[0]!) return 1;
  if (ratio >= GAUSS_RATIOS[1]!) return 2;
  if (ratio >= GAUSS_RATIOS[2]!) return 3;
  return 4;
}

/**
 * (1/L_i L_j)∬ of images `from … to − 1` of segment j along segment i, without the list's factor, 1/m.
 * @param source j, the segment that leaks, in the list's source layer
 * @param field i, in the list's field layer
 */
export function imagePairSum(
  mesh: SegmentMesh,
  field: number,
  source: number,
  images: ImageList,
  from: number,
  to: number,
): number {
  const p = wireOf(mesh, field);
  const q = wireOf(mesh, source);
  const sourceZ1 = q.z1;
  const sourceZ2 = q.z2;
  const li = mesh.length[field]!;
  const lj = mesh.length[source]!;
  const longer = Math.max(li, lj);
  const radius = Math.max(mesh.radius[field]!, mesh.radius[source]!);
  const dx = (p.x1 + p.x2 - q.x1 - q.x2) / 2;
  const dy = (p.y1 + p.y2 - q.y1 - q.y2) / 2;
  let sum = 0;
  for (let k = from; k < to; k++) {
    q.z1 = images.sign[k]! * sourceZ1 + images.offset[k]!;
    q.z2 = images.sign[k]! * sourceZ2 + images.offset[k]!;
    const dz = (p.z1 + p.z2 - q.z1 - q.z2) / 2;
    const distance = Math.sqrt(dx * dx + dy * dy + dz * dz);
    let mean: number;
    if (field === source && q.z1 === sourceZ1 && q.z2 === sourceZ2) mean = selfInverseDistance(li, radius);
    else if (distance < CLOSED_FORM_RATIO * longer) mean = meanInverseDistance(p, q, radius);
    else mean = gaussMean(p, q, radius, gaussOrder(distance / li), gaussOrder(distance / lj));
    sum += images.weight[k]! * mean;
  }
  return sum;
}

function gaussMean(p: Wire, q: Wire, radius: number, orderP: number, orderQ: number): number {
  const gp = gaussLegendre(orderP);
  const gq = gaussLegendre(orderQ);
  let sum = 0;
  for (let a = 0; a < orderP; a++) {
    const t = gp.points[a]!;
    const x = p.x1 + t * (p.x2 - p.x1);
    const y = p.y1 + t * (p.y2 - p.y1);
    const z = p.z1 + t * (p.z2 - p.z1);
    for (let b = 0; b < orderQ; b++) {
      const s = gq.points[b]!;
      const dx = x - q.x1 - s * (q.x2 - q.x1);
      const dy = y - q.y1 - s * (q.y2 - q.y1);
      const dz = z - q.z1 - s * (q.z2 - q.z1);
      sum += (gp.weights[a]! * gq.weights[b]!) / Math.sqrt(dx * dx + dy * dy + dz * dz + radius * radius);
    }
  }
  return sum;
}

export function wireOf(mesh: SegmentMesh, i: number): Wire {
  return {
    x1: mesh.x1[i]!,
    y1: mesh.y1[i]!,
    z1: mesh.z1[i]!,
    x2: mesh.x2[i]!,
    y2: mesh.y2[i]!,
    z2: mesh.z2[i]!,
  };
}
