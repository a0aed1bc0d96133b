// Sums over single images of two segments: by Gauss points when far, by closed form when near.
import { gaussLegendre } from '../numerics/gauss-legendre.ts';
import type { ImageList } from '../soil/image-list.ts';
import { pairOrder } from './pair-potential.ts';
import { CX, CY, CZ, LENGTH, NEAR, UX, UY, UZ } from './segment-records.ts';
import { axesMean } from './wire-pair.ts';

/** Double Gauss sum of images `from` to `to` − 1 over two segments in space. */
export function pointSum(
  r: Float64Array,
  field: number,
  source: number,
  aa: number,
  orderF: number,
  orderS: number,
  { weight, sign, offset }: ImageList,
  from: number,
  to: number,
): number {
  const f = gaussLegendre(orderF);
  const s = gaussLegendre(orderS);
  const dx = r[field + CX]! - r[source + CX]!;
  const dy = r[field + CY]! - r[source + CY]!;
  const halfF = 0.5 * r[field + LENGTH]!;
  const halfS = 0.5 * r[source + LENGTH]!;
  let sum = 0;
  for (let a = 0; a < orderF; a++) {
    const t = halfF * (2 * f.points[a]! - 1);
    const px = dx + t * r[field + UX]!;
    const py = dy + t * r[field + UY]!;
    const z = r[field + CZ]! + t * r[field + UZ]!;
    for (let b = 0; b < orderS; b++) {
      const u = halfS * (2 * s.points[b]! - 1);
      const ex = px - u * r[source + UX]!;
      const ey = py - u * r[source + UY]!;
      const zs = r[source + CZ]! + u * r[source + UZ]!;
      const rr = ex * ex + ey * ey + aa;
      let mean = 0;
      for (let k = from; k < to; k++) {
        const h = z - sign[k]! * zs - offset[k]!;
        mean += weight[k]! / Math.sqrt(rr + h * h);
      }
      sum += f.weights[a]! * s.weights[b]! * mean;
    }
  }
  return sum;
}

/** Images, each by its own distance: closed form when near, Gauss points when far. */
export function imageSum(
  r: Float64Array,
  field: number,
  source: number,
  aa: number,
  list: ImageList,
): number {
  const lf = r[field + LENGTH]!;
  const ls = r[source + LENGTH]!;
  const ux = r[field + UX]!;
  const uy = r[field + UY]!;
  const uz = r[field + UZ]!;
  const vx = r[source + UX]!;
  const vy = r[source + UY]!;
  const dx = r[field + CX]! - r[source + CX]!;
  const dy = r[field + CY]! - r[source + CY]!;
  const plan = dx * dx + dy * dy;
  const near = Math.max(r[field + NEAR]!, r[source + NEAR]!);
  // from the first end of the field to that of the source
  const wx = 0.5 * (lf * ux - ls * vx) - dx;
  const wy = 0.5 * (lf * uy - ls * vy) - dy;
  let sum = 0;
  for (let k = 0; k < list.count; k++) {
    const sign = list.sign[k]!;
    const dz = r[field + CZ]! - sign * r[source + CZ]! - list.offset[k]!;
    const distance = plan + dz * dz;
    if (distance < near) {
      const vz = sign * r[source + UZ]!;
      const wz = 0.5 * (lf * uz - ls * vz) - dz;
      sum += list.weight[k]! * axesMean(wx, wy, wz, ux, uy, uz, lf, vx, vy, vz, ls, aa);
    } else {
      const orderF = pairOrder(distance, lf * lf);
      const orderS = pairOrder(distance, ls * ls);
      sum += pointSum(r, field, source, aa, orderF, orderS, list, k, k + 1);
    }
  }
  return sum;
}
