// Touch voltage: potential of the metal within reach minus the potential of the soil under the feet, and its worst place.
import { insideArea, nearestOnBoundary, type Polygon } from '../geometry/area.ts';
import { latticeValue, type Lattice } from './lattice.ts';
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

/** Places from which the search for the worst starts: the highest points of the map, and the corners of the area. */
const STARTS = 12;
/** A search ends when its step is this share of the lattice's spacing: a millimetre on half a metre. */
const FINEST_STEP = 1 / 512;

/** Touch voltage on a lattice of surface potentials, signed. */
export function touchLattice(potential: Lattice, metal: MetalPotential): Lattice {
  const values = new Float64Array(potential.values.length);
  for (let j = 0; j < potential.ny; j++)
    for (let i = 0; i < potential.nx; i++) {
      const place = j * potential.nx + i;
      values[place] = metal(potential.x0 + i * potential.spacing, potential.y0 + j * potential.spacing) - potential.values[place]!;
    }
  return { ...potential, values };
}

/**
 * The largest touch voltage in an area: local maxima of the map, then a search on the exact field.
 * @param touch lattice of touch voltages that covers the area
 */
export function worstTouch(
  touch: Lattice,
  surface: SurfacePotential,
  metal: MetalPotential,
  area: readonly Polygon[],
): WorstPlace {
  const inside = (x: number, y: number): boolean => insideArea(area, x, y);
  const starts = [
    ...latticeMaxima(touch, inside).slice(0, STARTS),
    ...area.flat().map(([x, y]) => [x, y] as const).sort((a, b) => Math.abs(latticeValue(touch, b[0], b[1])) - Math.abs(latticeValue(touch, a[0], a[1]))).slice(0, STARTS / 2),
  ]; // biome-ignore format: two lists of starts
  const f = (at: readonly number[]): number =>
    inside(at[0]!, at[1]!) ? Math.abs(metal(at[0]!, at[1]!) - surface(at[0]!, at[1]!)) : Number.NEGATIVE_INFINITY;
  return climbFromAll(starts, f, area, touch.spacing);
}

/** Local maxima of a lattice's magnitude inside a region, highest first. */
export function latticeMaxima(lattice: Lattice, inside: (x: number, y: number) => boolean): [number, number][] {
  const { nx, ny, values } = lattice;
  const found: { x: number; y: number; value: number }[] = [];
  const magnitude = (i: number, j: number): number =>
    i < 0 || j < 0 || i >= nx || j >= ny ? Number.NEGATIVE_INFINITY : Math.abs(values[j * nx + i]!);
  const within = new Uint8Array(nx * ny);
  for (let j = 0; j < ny; j++)
    for (let i = 0; i < nx; i++)
      within[j * nx + i] = inside(lattice.x0 + i * lattice.spacing, lattice.y0 + j * lattice.spacing) ? 1 : 0;
  for (let j = 0; j < ny; j++)
    for (let i = 0; i < nx; i++) {
      if (within[j * nx + i] === 0) continue;
      const own = magnitude(i, j);
      let highest = true;
      for (let b = -1; b <= 1 && highest; b++)
        for (let a = -1; a <= 1 && highest; a++) {
          const ii = i + a;
          const jj = j + b;
          if (ii >= 0 && jj >= 0 && ii < nx && jj < ny && within[jj * nx + ii] === 1) highest = magnitude(ii, jj) <= own;
        }
      if (highest) found.push({ x: lattice.x0 + i * lattice.spacing, y: lattice.y0 + j * lattice.spacing, value: own });
    }
  return found.sort((a, b) => b.value - a.value).map(({ x, y }) => [x, y]);
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
