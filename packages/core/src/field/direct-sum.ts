// The surface potential of one group of metal at a place, segment by segment, in plain code.
import { type RadialTable, radialValue } from '../leakage/radial-table.ts';
import { logarithm } from '../numerics/elementary.ts';
import { gaussLegendre } from '../numerics/gauss-legendre.ts';
import { pointsAlong } from './near-metal.ts';
import { uprightMean } from './rod-tables.ts';
import type { SegmentGroup } from './segment-group.ts';

/** Ratios of distance to length past which four, and two, Gauss points leave 1e-9 of a segment's potential: 2.3e-5·x⁸, x⁴/180. */
export const FOUR_POINTS = 3.517;
export const TWO_POINTS = 48.7;

/** What Gauss points may leave of the farther images of a near segment. */
const REST_LEFT = 1e-9;

/** Gauss points of a near segment of a length, m, on the table of its farther images. */
export function restOrder({ rest }: SegmentGroup, length: number): number {
  return rest === undefined ? 0 : pointsAlong(length, rest.smoothness, REST_LEFT);
}

/** Adds the potential of each leakage of a group; `into` shape [leakages]. */
export function addGroup(group: SegmentGroup, x: number, y: number, into: Float64Array): void {
  const { count, cx, cy, strength } = group;
  const cases = into.length;
  for (let j = 0; j < count; j++) {
    const dx = x - cx[j]!;
    const dy = y - cy[j]!;
    const value = group.vertical ? uprightMean(group, dx * dx + dy * dy) : levelMean(group, j, dx, dy);
    for (let u = 0; u < cases; u++) into[u]! += strength[j * cases + u]! * value;
  }
}

/** Gauss points on the table of all images when far; closed form, and Gauss points for the farther images, when near. */
function levelMean(group: SegmentGroup, j: number, dx: number, dy: number): number {
  const length = group.length[j]!;
  const zz = group.z1 * group.z1;
  const ratio = (dx * dx + dy * dy + zz) / (length * length);
  if (ratio > TWO_POINTS * TWO_POINTS) return pointsMean(group, group.all!, 2, j, dx, dy);
  if (ratio > FOUR_POINTS * FOUR_POINTS) return pointsMean(group, group.all!, 4, j, dx, dy);
  const ux = group.hx[j]!;
  const uy = group.hy[j]!;
  const above = zz + group.radiusSquared;
  const ends =
    Math.sqrt((dx - ux) ** 2 + (dy - uy) ** 2 + above) + Math.sqrt((dx + ux) ** 2 + (dy + uy) ** 2 + above);
  const own = (group.ownWeight * logarithm((ends + length) / (ends - length))) / length;
  if (group.rest === undefined) return own;
  return own + pointsMean(group, group.rest, restOrder(group, length), j, dx, dy);
}

function pointsMean(
  { hx, hy }: SegmentGroup,
  table: RadialTable,
  order: number,
  j: number,
  dx: number,
  dy: number,
): number {
  const { points, weights } = gaussLegendre(order);
  let sum = 0;
  for (let a = 0; a < order; a++) {
    const t = 2 * points[a]! - 1;
    const px = dx - t * hx[j]!;
    const py = dy - t * hy[j]!;
    sum += weights[a]! * radialValue(table, px * px + py * py);
  }
  return sum;
}
