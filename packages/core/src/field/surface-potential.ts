// Potential of the soil surface, fast: tables in horizontal distance by depth of the metal, for maps and searches.
import type { SegmentMesh } from '../geometry/segments.ts';
import { depthClasses } from '../leakage/depth-classes.ts';
import type { SoilImages } from '../soil/image-list.ts';
import { addGroup } from './direct-sum.ts';
import type { Box } from './lattice.ts';
import { potentialAt } from './potential.ts';
import { type RodTables, rodTables } from './rod-tables.ts';
import { metalBox, type SegmentGroup, segmentGroup } from './segment-group.ts';
import { addByKernel, type PackedGroup, packGroup, surfaceKernel } from './surface-kernel.ts';
import { type SlopedMetal, type SurfaceMap, type SurfacePotential, surfaceMap } from './surface-map.ts';
import { type PlanBox, requireWithin } from './table-reach.ts';
import { uprightRests } from './upright-rests.ts';

export type { SurfacePotential } from './surface-map.ts';

/** Surface potentials of several leakages of one mesh, for hardly more than the price of one. */
export interface SurfacePotentials {
  readonly count: number;
  /**
   * Writes the potential of each leakage at a place, summed segment by segment; `into` shape [count].
   * @throws RangeError beyond the reach prepared for, as do the others
   */
  at(x: number, y: number, into: Float64Array): void;
  /** the same at many places, by the compiled kernel where there is one; `into` shape [places × count] */
  atMany(xs: Float64Array, ys: Float64Array, into: Float64Array): void;
  /**
   * Maps of a box, far metal by expansions: within about 1e-5 of the rise, the difference from `at` being stated.
   * @param spacing of the points, m
   * @param tolerances largest error of what sloped metal adds between points that are computed, one for each leakage
   * that is mapped, from the first
   */
  map(box: Box, spacing: number, tolerances: readonly number[]): SurfaceMap;
}

/**
 * Tables hold this many times the reach asked for: expansions take values between whole cells, of which the coarsest are
 * two thirds as wide as map and metal together and lie three apart, corner to corner.
 */
const TABLE_REACH = 16;

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
  const { classes, of } = depthClasses(mesh);
  const held = TABLE_REACH * reach;
  const upright = uprightRests(
    classes.filter(({ vertical }) => vertical),
    images,
    held,
  );
  const groups = classes.flatMap((depths, c) =>
    byRadius(mesh, of, c).map((members) =>
      segmentGroup(mesh, images, leakages, depths, members, held, upright),
    ),
  );
  const sloped = leakages.map((leakage) => leakage.map((current, i) => (of[i]! < 0 ? current : 0)));
  const anySloped = sloped.some((leakage) => leakage.some((current) => current !== 0));
  const count = leakages.length;
  const metal = metalBox(groups);
  const within = (places: PlanBox): void => {
    if (metal !== undefined) requireWithin(reach, metal, places);
  };
  const slopedOf: SlopedMetal = (u, x, y) => potentialAt(mesh, images, sloped[u]!, x, y, 0);
  const slopedAt = (x: number, y: number, into: Float64Array): void => {
    for (let u = 0; u < count; u++) into[u] = anySloped ? slopedOf(u, x, y) : 0;
  };
  const at = (x: number, y: number, into: Float64Array): void => {
    within([x, y, x, y]);
    slopedAt(x, y, into);
    for (const group of groups) addGroup(group, x, y, into);
  };
  let packed: readonly PackedGroup[] | undefined;
  const atMany = (xs: Float64Array, ys: Float64Array, into: Float64Array): void => {
    if (xs.length === 0) return;
    within(boxAround(xs, ys));
    const kernel = surfaceKernel();
    const each = (add: (x: number, y: number, into: Float64Array) => void): void => {
      for (let p = 0; p < xs.length; p++) add(xs[p]!, ys[p]!, into.subarray(p * count, (p + 1) * count));
    };
    if (kernel === undefined) {
      each(at);
      return;
    }
    packed ??= groups.map(packGroup);
    each(slopedAt);
    packed.forEach((group, k) => {
      if (!addByKernel(kernel, group, count, xs, ys, into))
        each((x, y, sums) => addGroup(groups[k]!, x, y, sums));
    });
  };
  let rods: readonly RodTables[] | undefined;
  return {
    count,
    at,
    atMany,
    map(box, spacing, tolerances) {
      rods ??= rodTables(
        groups.filter((group) => group.vertical),
        count,
        held,
      );
      const cases = tolerances.length;
      const metal = {
        groups: groups.filter((group) => !group.vertical).map((group) => ofFirst(group, count, cases)),
        rods: rods.map((rod) => ({ ...rod, tables: rod.tables.slice(0, cases) })),
        cases,
      };
      const sloping = anySloped ? slopedOf : undefined;
      return surfaceMap(metal, sloping, { count, at, atMany, within }, box, spacing, tolerances);
    },
  };
}

/** A group with the first of its leakages only. */
function ofFirst(group: SegmentGroup, count: number, wanted: number): SegmentGroup {
  if (wanted === count) return group;
  const strength = new Float64Array(group.count * wanted);
  for (let j = 0; j < group.count; j++)
    for (let u = 0; u < wanted; u++) strength[j * wanted + u] = group.strength[j * count + u]!;
  return { ...group, strength };
}

/** Segments of a class that leak, those of each radius together, in the order of the mesh. */
function byRadius(mesh: SegmentMesh, of: Int32Array, c: number): [number, ...number[]][] {
  const found = new Map<number, [number, ...number[]]>();
  for (let i = 0; i < mesh.count; i++) {
    if (of[i] !== c || mesh.leaking[i] !== 1) continue;
    const others = found.get(mesh.radius[i]!);
    if (others === undefined) found.set(mesh.radius[i]!, [i]);
    else others.push(i);
  }
  return [...found.values()];
}

function boxAround(xs: Float64Array, ys: Float64Array): PlanBox {
  const least = (values: Float64Array): number => values.reduce((a, b) => Math.min(a, b));
  const most = (values: Float64Array): number => values.reduce((a, b) => Math.max(a, b));
  return [least(xs), least(ys), most(xs), most(ys)];
}

/** The potential of one of several leakages, alone. */
export function onePotential(potentials: SurfacePotentials, u: number): SurfacePotential {
  const values = new Float64Array(potentials.count);
  return (x, y) => {
    potentials.at(x, y, values);
    return values[u]!;
  };
}
