// Touch voltage: potential of the metal within reach minus the potential of the soil under the feet, and its worst place.
import { insideArea, nearestOnBoundary, type Polygon } from '../geometry/area.ts';
import { type Lattice, latticeValue } from './lattice.ts';
import { climb } from './local-search.ts';
import type { SurfacePotential } from './surface-potential.ts';

/** Potential of the metal that can be reached from a place; same unit as the surface potential. */
export type MetalPotential = (x: number, y: number) => number;

export interface WorstPlace {
  readonly x: number;
  readonly y: number;
  /** magnitude, in the unit of the potentials */
  readonly value: number;
}

/** Most places from which the search for the worst starts. */
const STARTS = 4;
/** A start lower than this share of the highest is not climbed from: a lattice that shows the field misses a summit by less. */
const WORTHWHILE = 0.95;
/** A search ends when its step is this share of the lattice's spacing, 8 mm on half a metre: a summit is flat to 1e-4 there. */
const FINEST_STEP = 1 / 64;

/**
 * Touch voltage on a lattice of surface potentials, signed.
 * @param reachable potential of the metal reached from each lattice point, shape of the lattice
 */
export function touchLattice(potential: Lattice, reachable: (place: number) => number): Lattice {
  return { ...potential, values: potential.values.map((value, place) => reachable(place) - value) };
}

/**
 * The largest touch voltage in an area: local maxima of the map, then a search on the exact field.
 * @param touch lattice of touch voltages that covers the area
 * @param within 1 where a lattice point lies in the area
 */
export function worstTouch(
  touch: Lattice,
  within: Uint8Array,
  surface: SurfacePotential,
  metal: MetalPotential,
  area: readonly Polygon[],
): WorstPlace {
  const height = (at: readonly [number, number]): number => Math.abs(latticeValue(touch, at[0], at[1]));
  const starts = worthwhile([...latticeMaxima(touch, within), ...area.flat()], height, STARTS);
  const f = (at: readonly number[]): number =>
    insideArea(area, at[0]!, at[1]!)
      ? Math.abs(metal(at[0]!, at[1]!) - surface(at[0]!, at[1]!))
      : Number.NEGATIVE_INFINITY;
  return climbFromAll(atEdges(starts, area, touch.spacing), f, area, touch.spacing);
}

/** The starts, and for each that lies near the area's edge also the nearest place on it: a maximum on the edge is climbed along it. */
function atEdges(
  starts: readonly (readonly [number, number])[],
  area: readonly Polygon[],
  near: number,
): (readonly [number, number])[] {
  const edges = starts
    .map(([x, y]) => ({ x, y, edge: nearestOnBoundary(area, x, y) }))
    .filter(({ x, y, edge }) => Math.hypot(edge[0] - x, edge[1] - y) <= near)
    .map(({ edge }) => [edge[0], edge[1]] as const);
  return [...starts, ...edges];
}

/** 1 where a lattice point lies in an area. */
export function areaMask(lattice: Lattice, area: readonly Polygon[]): Uint8Array {
  const { nx, x0, y0, spacing } = lattice;
  return Uint8Array.from(lattice.values, (_, place) =>
    insideArea(area, x0 + (place % nx) * spacing, y0 + Math.floor(place / nx) * spacing) ? 1 : 0,
  );
}

/** The highest starts, none much lower than the highest of all. */
export function worthwhile(
  starts: readonly (readonly [number, number])[],
  height: (at: readonly [number, number]) => number,
  most: number,
): (readonly [number, number])[] {
  const ranked = starts.map((at) => ({ at, height: height(at) })).sort((a, b) => b.height - a.height);
  return ranked
    .filter((start) => start.height >= WORTHWHILE * ranked[0]!.height)
    .slice(0, most)
    .map((start) => start.at);
}

/** Local maxima of a lattice's magnitude among the points within, in the order of the lattice. */
export function latticeMaxima(lattice: Lattice, within: Uint8Array): [number, number][] {
  const { nx, ny, values, x0, y0, spacing } = lattice;
  const found: [number, number][] = [];
  for (let j = 0; j < ny; j++)
    for (let i = 0; i < nx; i++) {
      if (within[j * nx + i] === 0) continue;
      const own = Math.abs(values[j * nx + i]!);
      let highest = true;
      for (let jj = Math.max(0, j - 1); jj <= Math.min(ny - 1, j + 1) && highest; jj++)
        for (let ii = Math.max(0, i - 1); ii <= Math.min(nx - 1, i + 1) && highest; ii++)
          highest = within[jj * nx + ii] === 0 || Math.abs(values[jj * nx + ii]!) <= own;
      if (highest) found.push([x0 + i * spacing, y0 + j * spacing]);
    }
  return found;
}

/** Climbs in the plane from several places, along the area's edge where that is near; the highest summit wins. */
export function climbFromAll(
  starts: readonly (readonly [number, number])[],
  f: (at: readonly number[]) => number,
  area: readonly Polygon[],
  step: number,
): WorstPlace {
  const diagonal = step * Math.SQRT1_2;
  const compass: readonly (readonly number[])[] = [
    [step, 0], [0, step], [-step, 0], [0, -step], [diagonal, diagonal], [-diagonal, diagonal], [-diagonal, -diagonal], [diagonal, -diagonal],
  ]; // biome-ignore format: eight directions
  const directions = (at: readonly number[]): readonly (readonly number[])[] => {
    const [, , tx, ty] = nearestOnBoundary(area, at[0]!, at[1]!);
    return [...compass, [step * tx, step * ty], [-step * tx, -step * ty]];
  };
  let worst: WorstPlace = { x: Number.NaN, y: Number.NaN, value: Number.NEGATIVE_INFINITY };
  for (const start of starts) {
    const { at, value } = climb(f, start, directions, FINEST_STEP);
    if (value > worst.value) worst = { x: at[0]!, y: at[1]!, value };
  }
  return worst;
}
