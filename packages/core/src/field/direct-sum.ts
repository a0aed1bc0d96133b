// The surface potential of one group of metal at a place, segment by segment, in plain code.
import { CLOSED_FORM_RATIO } from '../leakage/pair-potential.ts';
import { radialValue } from '../leakage/radial-table.ts';
import { gaussLegendre } from '../numerics/gauss-legendre.ts';
import { nearOrder, THREE_POINTS, TWO_POINTS } from './near-metal.ts';
import type { SegmentGroup } from './segment-group.ts';

/** Distance over length past which a vertical segment is a point at its middle depth. */
export const UPRIGHT_FAR: number = CLOSED_FORM_RATIO * 100;

const TWO = Math.sqrt(1 / 3);
const THREE = Math.sqrt(3 / 5);

/** Adds the potential of each leakage of a group; `into` shape [leakages]. */
export function addGroup(group: SegmentGroup, x: number, y: number, into: Float64Array): void {
  if (group.vertical) addUpright(group, x, y, into);
  else addLevel(group, x, y, into);
}

/** Gauss points on the table of all images when far, closed form and the rest's table when near. */
function addLevel(group: SegmentGroup, x: number, y: number, into: Float64Array): void {
  const { cx, cy, hx, hy, length, strength } = group;
  const table = group.all!;
  const zz = group.z1 * group.z1;
  for (let j = 0; j < group.count; j++) {
    const dx = x - cx[j]!;
    const dy = y - cy[j]!;
    const ux = hx[j]!;
    const uy = hy[j]!;
    const distance = dx * dx + dy * dy;
    const ratio = (distance + zz) / (length[j]! * length[j]!);
    let value: number;
    if (ratio > TWO_POINTS * TWO_POINTS) {
      const across = 2 * TWO * (dx * ux + dy * uy);
      const base = distance + TWO * TWO * (ux * ux + uy * uy);
      value = 0.5 * (radialValue(table, base + across) + radialValue(table, base - across));
    } else if (ratio > THREE_POINTS * THREE_POINTS) {
      const across = 2 * THREE * (dx * ux + dy * uy);
      const base = distance + THREE * THREE * (ux * ux + uy * uy);
      const outer = radialValue(table, base + across) + radialValue(table, base - across);
      value = (5 * outer + 8 * radialValue(table, distance)) / 18;
    } else value = nearLevel(group, j, dx, dy);
    addScaled(strength, j, value, into);
  }
}

function addScaled(strength: Float64Array, j: number, value: number, into: Float64Array): void {
  const count = into.length;
  for (let u = 0; u < count; u++) into[u]! += strength[j * count + u]! * value;
}

function nearLevel(group: SegmentGroup, j: number, dx: number, dy: number): number {
  const ux = group.hx[j]!;
  const uy = group.hy[j]!;
  const above = group.z1 * group.z1 + group.radiusSquared[j]!;
  const length = group.length[j]!;
  const ends =
    Math.sqrt((dx - ux) ** 2 + (dy - uy) ** 2 + above) + Math.sqrt((dx + ux) ** 2 + (dy + uy) ** 2 + above);
  const own = (group.ownWeight * Math.log((ends + length) / (ends - length))) / length;
  if (group.rest === undefined) return own;
  const { points, weights } = gaussLegendre(nearOrder(length, group.rest));
  let rest = 0;
  for (let a = 0; a < points.length; a++) {
    const t = 2 * points[a]! - 1;
    const px = dx - t * ux;
    const py = dy - t * uy;
    rest += weights[a]! * radialValue(group.rest, px * px + py * py);
  }
  return own + rest;
}

/** Vertical metal is one place in plan: closed form for its own distance, the table's mean for the rest. */
function addUpright(group: SegmentGroup, x: number, y: number, into: Float64Array): void {
  const { z1, z2, ownWeight, rest } = group;
  for (let j = 0; j < group.count; j++) {
    const dx = x - group.cx[j]!;
    const dy = y - group.cy[j]!;
    const rr = dx * dx + dy * dy;
    const aa = group.radiusSquared[j]!;
    const length = group.length[j]!;
    const ends = Math.sqrt(rr + aa + z1 * z1) + Math.sqrt(rr + aa + z2 * z2);
    const own =
      rr > (UPRIGHT_FAR * length) ** 2
        ? ownWeight / Math.sqrt(rr + ((z1 + z2) / 2) ** 2)
        : (ownWeight * Math.log((ends + length) / (ends - length))) / length;
    addScaled(group.strength, j, own + (rest === undefined ? 0 : radialValue(rest, rr)), into);
  }
}
