// Maps of the surface potentials of several leakages, with what they differ by from the direct sum.
import { type GridPotentials, gridPotentials, type MapMetal } from './grid-potentials.ts';
import { adaptiveLattices, type Box, type Grid, gridOver, type Lattice } from './lattice.ts';
import type { PlanBox } from './table-reach.ts';

/** Surface potential at a place, V (or Ω for a leakage per ampere). */
export type SurfacePotential = (x: number, y: number) => number;

export interface SurfaceMap {
  /** one a leakage; `error` is the largest difference from the direct sum at a sample of points */
  readonly lattices: readonly Lattice[];
  /** the potential of one leakage at any place, as exact as the map inside it, by the direct sum outside */
  potential(u: number): SurfacePotential;
}

/** The same potentials without expansions. */
export interface DirectSum {
  /** leakages, of which maps may be asked for the first few */
  readonly count: number;
  at(x: number, y: number, into: Float64Array): void;
  atMany(xs: Float64Array, ys: Float64Array, into: Float64Array): void;
  /** @throws RangeError when a place of a box is beyond the tables */
  within(places: PlanBox): void;
}

export type SlopedMetal = (u: number, x: number, y: number) => number;

/** Points of a map that are compared with the direct sum. */
const SAMPLE = 64;

/** @param sloped what sloped metal adds to one leakage at a place; undefined where there is none */
export function surfaceMap(
  metal: MapMetal,
  sloped: SlopedMetal | undefined,
  direct: DirectSum,
  box: Box,
  spacing: number,
  tolerances: readonly number[],
): SurfaceMap {
  const grid = gridOver(box, spacing);
  direct.within([grid.x0, grid.y0, grid.x0 + (grid.nx - 1) * spacing, grid.y0 + (grid.ny - 1) * spacing]);
  const { values, at } = gridPotentials(metal, grid);
  const all = (x: number, y: number, into: Float64Array): void => {
    for (let u = 0; u < into.length; u++) into[u] = sloped?.(u, x, y) ?? 0;
  };
  const added = sloped && adaptiveLattices(all, tolerances, box, spacing);
  added?.forEach((lattice, u) => {
    lattice.values.forEach((value, place) => {
      values[u]![place]! += value;
    });
  });
  const errors = differences(values, grid, direct);
  return {
    lattices: values.map((of, u) => ({ ...grid, values: of, evaluated: of.length, error: errors[u]! })),
    potential: (u) => potentialOf(at, sloped, direct, u),
  };
}

function potentialOf(
  at: GridPotentials['at'],
  sloped: SlopedMetal | undefined,
  direct: DirectSum,
  u: number,
): SurfacePotential {
  const all = new Float64Array(direct.count);
  return (x, y) => {
    const value = at(u, x, y);
    if (value === undefined) {
      direct.at(x, y, all);
      return all[u]!;
    }
    return value + (sloped?.(u, x, y) ?? 0);
  };
}

/** Largest difference of each leakage's values from the direct sum, at points strewn evenly over the map. */
function differences(values: readonly Float64Array[], grid: Grid, direct: DirectSum): number[] {
  const count = grid.nx * grid.ny;
  // steps of the golden section leave no point alone and no pattern
  const golden = (Math.sqrt(5) - 1) / 2;
  const places = Array.from({ length: Math.min(SAMPLE, count) }, (_, k) =>
    Math.floor(((k * golden) % 1) * count),
  );
  const xs = Float64Array.from(places, (place) => grid.x0 + (place % grid.nx) * grid.spacing);
  const ys = Float64Array.from(places, (place) => grid.y0 + Math.floor(place / grid.nx) * grid.spacing);
  const sums = new Float64Array(places.length * direct.count);
  direct.atMany(xs, ys, sums);
  return values.map((of, u) =>
    places.reduce((most, place, p) => Math.max(most, Math.abs(of[place]! - sums[p * direct.count + u]!)), 0),
  );
}
