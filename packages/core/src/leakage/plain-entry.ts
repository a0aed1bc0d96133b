// One entry of the leakage matrix by plain code: the twin of assembly/leakage.ts, and what runs where kernels cannot.
import { gaussLegendre } from '../numerics/gauss-legendre.ts';
import type { ImageList } from '../soil/image-list.ts';
import { nodeReader } from './depth-nodes.ts';
import type { DepthPairs } from './depth-pairs.ts';
import { FARTHEST_SHARE, HALVES_RATIO, pairOrder, QUARTERS_RATIO, smoothOrder } from './pair-potential.ts';
import { type RadialTable, radialFarMean, radialMean, radialValue } from './radial-table.ts';
import {
  AA,
  CX,
  CY,
  CZ,
  HX,
  HY,
  LEAST,
  LENGTH,
  NEAR,
  RANK,
  RECORD,
  SINGLE,
  THIRD,
  UX,
  UY,
  UZ,
} from './segment-records.ts';
import { axesMean } from './wire-pair.ts';

/** R_ij of two segments of the mesh, Ω. */
export type LeakageEntry = (i: number, j: number) => number;

/**
 * R_ij = factor·Σ_images weight·(1/L_i L_j)∬ ds dt/√(r² + a²), a the larger radius. Far pairs by a table of all images
 * over Gauss points in plan, or by one place of it; near ones by closed form for the primary images and a table for the
 * rest; image by image where there is no table.
 */
export function plainEntry(records: Float64Array, { count, classOf, pairs }: DepthPairs): LeakageEntry {
  const r = records;
  const nodeMean = nodeReader();
  return (i, j) => {
    // the shallower layer is the source, and of one layer the segment that comes first: R_ij and R_ji are the same sum
    const first = r[i * RECORD + RANK]! <= r[j * RECORD + RANK]!;
    const source = (first ? i : j) * RECORD;
    const field = (first ? j : i) * RECORD;
    const { list, singly, far, rest, nodes, weights } = pairs[classOf[i]! * count + classOf[j]!]!;
    const { factor } = list;
    const dx = r[field + CX]! - r[source + CX]!;
    const dy = r[field + CY]! - r[source + CY]!;
    const dz = r[field + CZ]! - r[source + CZ]!;
    const plan = dx * dx + dy * dy;
    const distance = plan + dz * dz;
    const aa = Math.max(r[field + AA]!, r[source + AA]!);
    const lf = r[field + LENGTH]!;
    const ls = r[source + LENGTH]!;
    if (distance >= Math.max(r[field + NEAR]!, r[source + NEAR]!)) {
      if (far !== undefined && plan >= Math.max(r[field + LEAST]!, r[source + LEAST]!))
        return factor * farMean(r, field, source, distance, aa, far);
      let sum = pointSum(r, field, source, aa, pairOrder(distance, lf * lf), pairOrder(distance, ls * ls), singly, 0, singly.count); // biome-ignore format: one call
      if (nodes !== undefined) sum += nodeMean(nodes, weights!, plan + aa);
      if (rest !== undefined) sum += pointMean(r, field, source, distance, aa, rest);
      return factor * sum;
    }
    if (rest !== undefined) {
      const gap = leastGap(r, field, source, dx, dy, dz, distance);
      const smooth = gap * gap + rest.smoothness ** 2;
      const orderF = r[field + THIRD]! > 0 ? smoothOrder(smooth, lf) : 1;
      const orderS = r[source + THIRD]! > 0 ? smoothOrder(smooth, ls) : 1;
      // images that are too close for points: all by closed form
      if (orderF === 0 || orderS === 0) return factor * imageSum(r, field, source, aa, list);
      return (
        factor *
        (imageSum(r, field, source, aa, singly) + planMean(r, field, source, aa, orderF, orderS, rest))
      );
    }
    const sum = imageSum(r, field, source, aa, singly);
    return factor * (nodes === undefined ? sum : sum + nodeMean(nodes, weights!, plan + aa));
  };
}

/** Mean of a table of all images over two far segments, by as few places of it as their distance allows. */
function farMean(
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
function pointMean(
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

/** A distance that no two points of the segments fall below: along the line of their centres. */
function leastGap(
  r: Float64Array,
  field: number,
  source: number,
  dx: number,
  dy: number,
  dz: number,
  distance: number,
): number {
  if (distance === 0) return 0;
  const along = (at: number): number =>
    0.5 * r[at + LENGTH]! * Math.abs(dx * r[at + UX]! + dy * r[at + UY]! + dz * r[at + UZ]!);
  return Math.max(0, distance - along(field) - along(source)) / Math.sqrt(distance);
}

/** Mean of a table over Gauss points of both segments in plan. */
function planMean(
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

/** Double Gauss sum of images `from` to `to` − 1 over two segments in space. */
function pointSum(
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
function imageSum(r: Float64Array, field: number, source: number, aa: number, list: ImageList): number {
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
