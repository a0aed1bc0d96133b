// Means of radial tables over two segments in plan: by moments within a bin when far, by Gauss points when nearer.
import { gaussLegendre } from '../numerics/gauss-legendre.ts';
import { FARTHEST_SHARE, HALVES_RATIO, pairOrder, QUARTERS_RATIO } from './pair-potential.ts';
import { type RadialTable, radialFarMean, radialMean, radialValue } from './radial-table.ts';
import { CX, CY, HX, HY, SINGLE, THIRD } from './segment-records.ts';

/** Mean of a table of all images over two far segments, by as few places of it as their distance allows. */
export function farMean(
  r: Float64Array,
  field: number,
  source: number,
  distance: number,
  aa: number,
  table: RadialTable,
): number {
  const limit = Math.max(r[field + SINGLE]!, r[source + SINGLE]!);
  if (distance >= limit)
    return distance >= FARTHEST_SHARE ** 2 * limit
      ? farthestMean(r, field, source, aa, table)
      : wholeMean(r, field, source, aa, table);
  const longer = 12 * Math.max(r[field + THIRD]!, r[source + THIRD]!);
  if (distance >= HALVES_RATIO ** 2 * longer) return halvesMean(r, field, source, aa, table);
  if (distance >= QUARTERS_RATIO ** 2 * longer) return quartersMean(r, field, source, aa, table);
  return pointMean(r, field, source, distance, aa, table);
}

function farthestMean(
  r: Float64Array,
  field: number,
  source: number,
  aa: number,
  table: RadialTable,
): number {
  const dx = r[field + CX]! - r[source + CX]!;
  const dy = r[field + CY]! - r[source + CY]!;
  const rr = dx * dx + dy * dy + aa + (r[field + THIRD]! + r[source + THIRD]!);
  const ch = dx * r[field + HX]! + dy * r[field + HY]!;
  return radialFarMean(table, rr, ch, dx * r[source + HX]! + dy * r[source + HY]!);
}

/** Mean of a table over points in plan, as many as the distance asks for. */
export function pointMean(
  r: Float64Array,
  field: number,
  source: number,
  distance: number,
  aa: number,
  table: RadialTable,
): number {
  const orderF = pairOrder(distance, 12 * r[field + THIRD]!);
  const orderS = pairOrder(distance, 12 * r[source + THIRD]!);
  return planMean(r, field, source, aa, orderF, orderS, table);
}

/** Mean of a table over two wires in plan by one place of it. */
function wholeMean(r: Float64Array, field: number, source: number, aa: number, table: RadialTable): number {
  const dx = r[field + CX]! - r[source + CX]!;
  const dy = r[field + CY]! - r[source + CY]!;
  return partMean(r, field, source, dx, dy, 1, 1, aa, table);
}

/** The same with the wire in halves that points more to the other. */
function halvesMean(r: Float64Array, field: number, source: number, aa: number, table: RadialTable): number {
  const cx = r[field + CX]! - r[source + CX]!;
  const cy = r[field + CY]! - r[source + CY]!;
  const ofField = Math.abs(cx * r[field + HX]! + cy * r[field + HY]!);
  const ofSource = Math.abs(cx * r[source + HX]! + cy * r[source + HY]!);
  const [whole, halved, dx, dy] = ofField > ofSource ? [source, field, -cx, -cy] : [field, source, cx, cy];
  const ox = 0.5 * r[halved + HX]!;
  const oy = 0.5 * r[halved + HY]!;
  return (
    0.5 *
    (partMean(r, whole, halved, dx + ox, dy + oy, 1, 0.5, aa, table) +
      partMean(r, whole, halved, dx - ox, dy - oy, 1, 0.5, aa, table))
  );
}

/** The same with both wires in halves. */
function quartersMean(
  r: Float64Array,
  field: number,
  source: number,
  aa: number,
  table: RadialTable,
): number {
  const dx = r[field + CX]! - r[source + CX]!;
  const dy = r[field + CY]! - r[source + CY]!;
  const hx = 0.5 * r[field + HX]!;
  const hy = 0.5 * r[field + HY]!;
  const ox = 0.5 * r[source + HX]!;
  const oy = 0.5 * r[source + HY]!;
  return (
    0.25 *
    (partMean(r, field, source, dx - hx + ox, dy - hy + oy, 0.5, 0.5, aa, table) +
      partMean(r, field, source, dx - hx - ox, dy - hy - oy, 0.5, 0.5, aa, table) +
      partMean(r, field, source, dx + hx + ox, dy + hy + oy, 0.5, 0.5, aa, table) +
      partMean(r, field, source, dx + hx - ox, dy + hy - oy, 0.5, 0.5, aa, table))
  );
}

/** Mean of a table over parts of two wires, whose centres are (dx, dy) apart: shares `f` and `s` of their lengths. */
function partMean(
  r: Float64Array,
  field: number,
  source: number,
  dx: number,
  dy: number,
  f: number,
  s: number,
  aa: number,
  table: RadialTable,
): number {
  const hx = f * r[field + HX]!;
  const hy = f * r[field + HY]!;
  const ox = s * r[source + HX]!;
  const oy = s * r[source + HY]!;
  const h3 = f * f * r[field + THIRD]!;
  const k3 = s * s * r[source + THIRD]!;
  const rr = dx * dx + dy * dy + aa + (h3 + k3);
  return radialMean(table, rr, dx * hx + dy * hy, dx * ox + dy * oy, hx * ox + hy * oy, h3, k3);
}

/** Mean of a table over Gauss points of both segments in plan. */
export function planMean(
  r: Float64Array,
  field: number,
  source: number,
  aa: number,
  orderF: number,
  orderS: number,
  table: RadialTable,
): number {
  const f = gaussLegendre(orderF);
  const s = gaussLegendre(orderS);
  const dx = r[field + CX]! - r[source + CX]!;
  const dy = r[field + CY]! - r[source + CY]!;
  let sum = 0;
  for (let a = 0; a < orderF; a++) {
    const t = 2 * f.points[a]! - 1;
    const px = dx + t * r[field + HX]!;
    const py = dy + t * r[field + HY]!;
    for (let b = 0; b < orderS; b++) {
      const u = 2 * s.points[b]! - 1;
      const ex = px - u * r[source + HX]!;
      const ey = py - u * r[source + HY]!;
      sum += f.weights[a]! * s.weights[b]! * radialValue(table, ex * ex + ey * ey + aa);
    }
  }
  return sum;
}
