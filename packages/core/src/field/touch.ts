// Touch voltage: potential of the metal within reach minus the potential of the soil under the feet, and its worst place.
import type { Lattice } from './lattice.ts';
import { highestSummit } from './local-search.ts';
import { edgeDirections, edgePlaces, onEdge, type Region } from './region.ts';
import { bestStarts, type Guess, latticeSummits } from './starts.ts';
import type { SurfacePotential } from './surface-potential.ts';

/** Potential of the metal that can be reached from a place; same unit as the surface potential. */
export type MetalPotential = (x: number, y: number) => number;

type Place = readonly [number, number];

export interface WorstPlace {
  readonly x: number;
  readonly y: number;
  /** magnitude, in the unit of the potentials */
  readonly value: number;
}

/** Searches begun, from the best starts by the exact field. */
export const STARTS = 4;
/** A search ends when its step is this share of the lattice's spacing, 8 mm on half a metre: a summit is flat to 1e-4 there. */
const FINEST_STEP = 1 / 64;

/**
 * Touch voltage on a lattice of surface potentials, signed.
 * @param reachable potential of the metal reached from each lattice point
 */
export function touchLattice(potential: Lattice, reachable: (place: number) => number): Lattice {
  return { ...potential, values: potential.values.map((value, place) => reachable(place) - value) };
}

/**
 * The largest touch voltage in a region: summits of the map, corners and edges, and places by the metal, ranked; then a
 * search from the best. Undefined where the region holds no place.
 * @param touch lattice of touch voltages that covers the region
 * @param within 1 where a lattice point lies in the region
 * @param surface exact
 * @param beside places by the metal that a lattice may step over
 * @param rough a surface potential that costs less, as good as the map: it ranks places that are not beside metal
 * @param searches begun at most
 */
export function worstTouch(
  touch: Lattice,
  region: Region,
  within: Uint8Array,
  surface: SurfacePotential,
  metal: MetalPotential,
  beside: readonly (readonly [number, number])[],
  rough: SurfacePotential = surface,
  searches: number = STARTS,
): WorstPlace | undefined {
  const over =
    (potential: SurfacePotential) =>
    ([x, y]: readonly number[]): number =>
      region.inside(x!, y!) ? Math.abs(metal(x!, y!) - potential(x!, y!)) : Number.NEGATIVE_INFINITY;
  const guessed = (places: readonly Place[], value: (place: Place) => number): Guess<Place>[] =>
    places.map((candidate) => ({ candidate, value: value(candidate) }));
  const guesses = [
    ...guessed([...latticeSummits(touch, within), ...edgePlaces(region)], over(rough)),
    ...guessed(beside, over(surface)),
  ];
  return climbFromBest(guesses, over(surface), region, touch.spacing, searches);
}

/** Climbs in the plane from the best of the likeliest places, along the region's edge where that is near. */
export function climbFromBest(
  guesses: readonly Guess<Place>[],
  f: (at: readonly number[]) => number,
  region: Region,
  step: number,
  searches: number = STARTS,
): WorstPlace | undefined {
  const starts = bestStarts(guesses, f, searches).flatMap(([x, y]) => [
    [x, y] as const,
    ...onEdge(region, x, y, step),
  ]);
  const directions = edgeDirections(region, step);
  const along = ([x, y]: readonly number[]): readonly (readonly number[])[] => directions(x!, y!);
  const summit = highestSummit(f, starts, [step, step], along, FINEST_STEP);
  return summit && { x: summit.at[0]!, y: summit.at[1]!, value: summit.value };
}
