// Potential of the soil surface, fast: tables in horizontal distance by depth of the metal, for maps and searches.
import type { SegmentMesh } from '../geometry/segments.ts';
import { type DepthClass, depthClasses } from '../leakage/depth-classes.ts';
import { CLOSED_FORM_RATIO } from '../leakage/pair-potential.ts';
import { type RadialTable, radialValue } from '../leakage/radial-table.ts';
import { smoothKernel } from '../leakage/smooth-kernel.ts';
import { gaussLegendre } from '../numerics/gauss-legendre.ts';
import type { SoilImages } from '../soil/image-list.ts';
import { addFarField, clusterOrder, farClusters } from './far-clusters.ts';
import { potentialAt } from './potential.ts';
import type { SegmentGroup } from './segment-group.ts';
import { addByKernel, type PackedGroup, packGroup, surfaceKernel } from './surface-kernel.ts';

/** Surface potential at a place, V (or Ω for a leakage per ampere). */
export type SurfacePotential = (x: number, y: number) => number;

/** Surface potentials of several leakages of one mesh, for hardly more than the price of one. */
export interface SurfacePotentials {
  readonly count: number;
  /** writes the potential of each leakage at a place; `into` shape [count] */
  at(x: number, y: number, into: Float64Array): void;
  /** the same at many places, by the compiled kernel where there is one; `into` shape [places × count] */
  atMany(xs: Float64Array, ys: Float64Array, into: Float64Array): void;
}

/** Ratio of distance to length past which two, and three, Gauss points are enough (see gaussOrder). */
const TWO_POINTS = 7.93;
const THREE_POINTS = 3.187;
/** Gauss points of a near horizontal segment on the table of its farther images, per length over the table's smoothness. */
const NEAR_ORDER_LEAST = 4;
const NEAR_ORDER_MOST = 12;

/** Distance over length past which a vertical segment is a point at its middle depth. */
const UPRIGHT_FAR = CLOSED_FORM_RATIO * 100;

/** An image offset below this is none, m. */
const NO_OFFSET = 1e-12;

/**
 * Prepares the evaluation of the surface potentials of leakages.
 * @param leakages current into the soil by segment, A; shape [mesh.count] each
 * @param reach largest horizontal distance from metal to a place that will be asked for, m
 */
export function surfacePotentials(
  mesh: SegmentMesh,
  images: SoilImages,
  leakages: readonly Float64Array[],
  reach: number,
): SurfacePotentials {
  const classes = depthClasses(mesh);
  const groups = classes.classes.map((c, at) => classGroup(mesh, images, leakages, c, at, classes.of, reach));
  const sloped = leakages.map((leakage) => leakage.map((current, i) => (classes.of[i]! < 0 ? current : 0)));
  const anySloped = sloped.some((leakage) => leakage.some((current) => current !== 0));
  const count = leakages.length;
  const addSloped = (x: number, y: number, into: Float64Array): void => {
    for (let u = 0; u < count; u++) into[u] = anySloped ? potentialAt(mesh, images, sloped[u]!, x, y, 0) : 0;
  };
  const at = (x: number, y: number, into: Float64Array): void => {
    addSloped(x, y, into);
    for (const group of groups) addGroup(group, x, y, into);
  };
  let packed: readonly PackedGroup[] | undefined;
  return {
    count,
    at,
    atMany(xs, ys, into) {
      const kernel = surfaceKernel();
      const each = (add: (x: number, y: number, into: Float64Array) => void): void => {
        for (let p = 0; p < xs.length; p++) add(xs[p]!, ys[p]!, into.subarray(p * count, (p + 1) * count));
      };
      if (kernel === undefined) return each(at);
      packed ??= groups.map((group) =>
        packGroup(group, count, TWO_POINTS, THREE_POINTS, (length) => nearOrder(length, group.rest)),
      );
      each(addSloped);
      packed.forEach((group, k) => {
        if (group.count > 0 && !addByKernel(kernel, group, count, UPRIGHT_FAR, xs, ys, into))
          each((x, y, sums) => addGroup(groups[k]!, x, y, sums));
      });
    },
  };
}

/** The potential of one of several leakages, alone. */
export function onePotential(potentials: SurfacePotentials, u: number): SurfacePotential {
  const values = new Float64Array(potentials.count);
  return (x, y) => {
    potentials.at(x, y, values);
    return values[u]!;
  };
}

function classGroup(
  mesh: SegmentMesh,
  images: SoilImages,
  leakages: readonly Float64Array[],
  c: DepthClass,
  at: number,
  of: Int32Array,
  reach: number,
): SegmentGroup {
  const unordered = Array.from({ length: mesh.count }, (_, i) => i).filter(
    (i) => of[i] === at && mesh.leaking[i] === 1,
  );
  const members = Array.from(
    clusterOrder(
      Float64Array.from(unordered, (i) => (mesh.x1[i]! + mesh.x2[i]!) / 2),
      Float64Array.from(unordered, (i) => (mesh.y1[i]! + mesh.y2[i]!) / 2),
    ),
    (k) => unordered[k]!,
  );
  const list = images.list(c.layer, 0);
  const pick = (value: (i: number) => number): Float64Array => Float64Array.from(members, value);
  const every = Array.from({ length: list.count }, (_, k) => k);
  const own = every.filter((k) => Math.abs(list.offset[k]!) < NO_OFFSET);
  const others = every.filter((k) => Math.abs(list.offset[k]!) >= NO_OFFSET);
  const segments = {
    count: members.length,
    cx: pick((i) => (mesh.x1[i]! + mesh.x2[i]!) / 2),
    cy: pick((i) => (mesh.y1[i]! + mesh.y2[i]!) / 2),
    hx: pick((i) => (mesh.x2[i]! - mesh.x1[i]!) / 2),
    hy: pick((i) => (mesh.y2[i]! - mesh.y1[i]!) / 2),
    strength: Float64Array.from(members.flatMap((i) => leakages.map((leakage) => leakage[i]! * list.factor))),
  };
  return {
    vertical: c.vertical,
    z1: c.z1,
    z2: c.z2,
    ...segments,
    length: pick((i) => mesh.length[i]!),
    radiusSquared: pick((i) => mesh.radius[i]! ** 2),
    clusters: c.vertical ? undefined : farClusters(segments, leakages.length),
    ownWeight: own.reduce((sum, k) => sum + list.weight[k]!, 0),
    all: c.vertical ? undefined : smoothKernel(list, every, c, 0, reach),
    rest: smoothKernel(list, others, c, 0, reach),
  };
}

const TWO = Math.sqrt(1 / 3);
const THREE = Math.sqrt(3 / 5);

function addGroup(group: SegmentGroup, x: number, y: number, into: Float64Array): void {
  if (group.vertical) addUpright(group, x, y, into);
  else addLevel(group, x, y, into);
}

/** Horizontal metal: far boxes by their points, the rest segment by segment. */
function addLevel(group: SegmentGroup, x: number, y: number, into: Float64Array): void {
  if (group.clusters === undefined) return;
  addFarField(group.clusters, group.all!, x, y, into, (from, to) => addRun(group, from, to, x, y, into));
}

/** Segments one by one: Gauss points on the table of all images when far, closed form and the rest's table when near. */
function addRun(
  group: SegmentGroup,
  from: number,
  to: number,
  x: number,
  y: number,
  into: Float64Array,
): void {
  const { cx, cy, hx, hy, length, strength, all } = group;
  const table = all!;
  const zz = group.z1 * group.z1;
  for (let j = from; j < to; j++) {
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

function nearOrder(length: number, rest: RadialTable | undefined): number {
  const wanted = Math.ceil((NEAR_ORDER_LEAST * length) / (rest?.smoothness ?? length));
  return Math.min(NEAR_ORDER_MOST, Math.max(NEAR_ORDER_LEAST, wanted));
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
