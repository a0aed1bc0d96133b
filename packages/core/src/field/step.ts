// Step voltage: between two feet one metre apart, in the worst direction, and its worst place.
import type { Lattice } from './lattice.ts';
import { highestSummit } from './local-search.ts';
import { paceStencil, steepestDrops } from './pace-stencils.ts';
import { edgeDirections, edgePlaces, onEdge, type Region } from './region.ts';
import { bestStarts, type Guess, latticeSummits, likeliest } from './starts.ts';
import type { SurfacePotential } from './surface-potential.ts';
import { STARTS, type WorstPlace } from './touch.ts';

/** Distance between the feet, m (IEEE Std 80-2013, 3, step voltage). */
export const PACE_M = 1;

export interface WorstStep extends WorstPlace {
  /** foot at the higher potential, m; x, y is the place midway */
  readonly from: readonly [number, number];
  readonly to: readonly [number, number];
}

/** Directions tried over half a turn: the worst falls between two by at most 1 − cos 7.5° = 0.9 %. */
const DIRECTIONS = 12;
const FINEST_STEP = 1 / 64;
/** First turn of the search, rad. */
const TURN = Math.PI / 12;

/** From the midpoint of a pace to its foot ahead, and the direction. */
type HalfPace = readonly [ex: number, ey: number, angle: number];

/** Half paces evenly over a turn, or half of one: then the foot behind has the other half. */
function halfPaces(turn: number): HalfPace[] {
  return Array.from({ length: DIRECTIONS }, (_, d) => {
    const angle = (turn * d) / DIRECTIONS;
    return [...halfPace(angle), angle];
  });
}
const HALF_TURN = halfPaces(Math.PI);
const FULL_TURN = halfPaces(2 * Math.PI);

/** Midpoint and direction of a pace: [x, y, angle]. */
type Pace = readonly [number, number, number];

/** Largest voltage over one metre centred at each lattice point, from a lattice of surface potentials. */
export function stepLattice(potential: Lattice): Lattice {
  const { spacing } = potential;
  const stencils = HALF_TURN.map(([ex, ey]) => paceStencil(ex / spacing, ey / spacing));
  return { ...potential, values: steepestDrops(potential, stencils) };
}

function drop(surface: SurfacePotential, x: number, y: number, ex: number, ey: number): number {
  return Math.abs(surface(x + ex, y + ey) - surface(x - ex, y - ey));
}

/**
 * The largest step voltage whose midpoint lies in a region: summits of the map, edges, and paces that begin by the
 * metal, ranked and then searched over place and direction. Undefined where the region holds no place.
 * @param within 1 where a lattice point lies in the region
 * @param surface exact
 * @param beside places by the metal: one foot of a pace is tried there
 * @param rough a surface potential that costs less, as good as the map: it stands for the exact one away from metal
 * when paces are ranked at first
 * @param searches begun at most
 */
export function worstStep(
  step: Lattice,
  region: Region,
  within: Uint8Array,
  surface: SurfacePotential,
  beside: readonly (readonly [number, number])[],
  rough: SurfacePotential = surface,
  searches: number = STARTS,
): WorstStep | undefined {
  const voltage = ([x, y, angle]: Pace, over: SurfacePotential): number => {
    const [ex, ey] = halfPace(angle);
    return region.inside(x, y) ? drop(over, x, y, ex, ey) : Number.NEGATIVE_INFINITY;
  };
  // one pace a place: in the likeliest direction about a midpoint, and from a foot by the metal
  const likely: Guess<Pace>[] = [];
  for (const [x, y] of [...latticeSummits(step, within), ...edgePlaces(region)]) {
    if (!region.inside(x, y)) continue;
    for (const { candidate, value } of likeliest(HALF_TURN, ([ex, ey]) => drop(rough, x, y, ex, ey)))
      likely.push({ candidate: [x, y, candidate[2]], value });
  }
  for (const [x, y] of beside) {
    const inside = FULL_TURN.filter(([ex, ey]) => region.inside(x + ex, y + ey));
    if (inside.length === 0) continue;
    const here = surface(x, y);
    for (const { candidate, value } of likeliest(inside, ([ex, ey]) =>
      Math.abs(rough(x + 2 * ex, y + 2 * ey) - here),
    ))
      likely.push({ candidate: [x + candidate[0], y + candidate[1], candidate[2]], value });
  }
  const f = (at: readonly number[]): number => voltage(at as Pace, surface);
  const starts = bestStarts(likely, f, searches).flatMap(([x, y, angle]): Pace[] => [
    [x, y, angle],
    ...onEdge(region, x, y, step.spacing).map(([u, v]): Pace => [u, v, angle]),
  ]);
  const directions = edgeDirections(region, step.spacing);
  const along = ([x, y]: readonly number[]): number[][] => directions(x!, y!).map(([u, v]) => [u, v, 0]);
  const best = highestSummit(f, starts, [step.spacing, step.spacing, TURN], along, FINEST_STEP);
  if (best === undefined) return undefined;
  const [x, y, angle] = best.at as Pace;
  const [ex, ey] = halfPace(angle);
  const ahead = [x + ex, y + ey] as const;
  const behind = [x - ex, y - ey] as const;
  const falls = surface(ahead[0], ahead[1]) >= surface(behind[0], behind[1]);
  return { x, y, value: best.value, from: falls ? ahead : behind, to: falls ? behind : ahead };
}

function halfPace(angle: number): [number, number] {
  return [(PACE_M / 2) * Math.cos(angle), (PACE_M / 2) * Math.sin(angle)];
}
