// Entries of the leakage matrix by another road: every image by itself, one wire closed, the other by adaptive integration.
import type { SegmentMesh } from '../../src/geometry/segments.ts';
import { gaussLegendre } from '../../src/numerics/gauss-legendre.ts';
import type { SoilImages } from '../../src/soil/image-list.ts';

export type Point = readonly [x: number, y: number, z: number];
export type Axis = readonly [from: Point, to: Point];

/** Part of the integral below which halving a piece changes nothing that is asked for. */
const TOLERANCE = 1e-12;
/** Halvings that lead from a kilometre to below a micrometre. */
const DEPTH = 40;

/** (1/L_p L_q)∬ 1/√(r² + a²), 1/m. */
export function integratedMean(p: Axis, q: Axis, radius: number): number {
  const { points, weights } = gaussLegendre(8);
  const sum = (from: number, to: number): number => {
    let total = 0;
    for (let k = 0; k < points.length; k++) {
      const t = from + points[k]! * (to - from);
      total += weights[k]! * pointMean(q, along(p, t), radius);
    }
    return total * (to - from);
  };
  const halved = (from: number, to: number, whole: number, depth: number): number => {
    const middle = (from + to) / 2;
    const [left, right] = [sum(from, middle), sum(middle, to)];
    if (depth === 0 || Math.abs(left + right - whole) <= TOLERANCE * Math.abs(first)) return left + right;
    return halved(from, middle, left, depth - 1) + halved(middle, to, right, depth - 1);
  };
  const first = sum(0, 1);
  return halved(0, 1, first, DEPTH);
}

function along([from, to]: Axis, t: number): Point {
  return [from[0] + t * (to[0] - from[0]), from[1] + t * (to[1] - from[1]), from[2] + t * (to[2] - from[2])];
}

/** Mean over a wire seen from a point, by the foot of the perpendicular: (1/L)[asinh(x2/w) − asinh(x1/w)]. */
function pointMean([from, to]: Axis, point: Point, radius: number): number {
  const d = [0, 1, 2].map((k) => to[k]! - from[k]!);
  const w = [0, 1, 2].map((k) => point[k]! - from[k]!);
  const length = Math.hypot(...d);
  const foot = (w[0]! * d[0]! + w[1]! * d[1]! + w[2]! * d[2]!) / length;
  const across = Math.hypot(
    (w[1]! * d[2]! - w[2]! * d[1]!) / length,
    (w[2]! * d[0]! - w[0]! * d[2]!) / length,
    (w[0]! * d[1]! - w[1]! * d[0]!) / length,
    radius,
  );
  // far along the axis the two arc sines agree in their leading digits: their difference as one logarithm
  const [x1, x2] = [-foot, length - foot];
  if (x1 * x2 < 0) return (Math.asinh(x2 / across) - Math.asinh(x1 / across)) / length;
  const [low, high] = x1 >= 0 ? [x1, x2] : [-x2, -x1];
  const [rl, rh] = [Math.hypot(low, across), Math.hypot(high, across)];
  return Math.log1p((high - low + ((high - low) * (high + low)) / (rh + rl)) / (low + rl)) / length;
}

export function axisOf(mesh: SegmentMesh, i: number): Axis {
  return [
    [mesh.x1[i]!, mesh.y1[i]!, mesh.z1[i]!],
    [mesh.x2[i]!, mesh.y2[i]!, mesh.z2[i]!],
  ];
}

/** R_ij, Ω, from the image list. */
export function integratedEntry(mesh: SegmentMesh, images: SoilImages, i: number, j: number): number {
  const [field, source] = mesh.layer[i]! >= mesh.layer[j]! ? [i, j] : [j, i];
  const list = images.list(mesh.layer[source]!, mesh.layer[field]!);
  const radius = Math.max(mesh.radius[i]!, mesh.radius[j]!);
  const axis = axisOf(mesh, field);
  const [from, to] = axisOf(mesh, source);
  let sum = 0;
  for (let k = 0; k < list.count; k++) {
    const image = ([x, y, z]: Point): Point => [x, y, list.sign[k]! * z + list.offset[k]!];
    sum += list.weight[k]! * integratedMean(axis, [image(from), image(to)], radius);
  }
  return list.factor * sum;
}
