// Step voltage: between two feet one metre apart, in the worst direction, and its worst place.
import type { Lattice } from './lattice.ts';
import { climb } from './local-search.ts';
import { paceStencil, steepestDrops } from './pace-stencils.ts';
import { edgeDirections, edgePlaces, onEdge, type Region } from './region.ts';
import { bestStarts, latticeSummits, likeliest } from './starts.ts';
import type { SurfacePotential } from './surface-potential.ts';
import type { WorstPlace } from './touch.ts';

/** Distance between the feet, m (IEEE Std 80-2013, 3, step voltage). */
export const PACE_M = 1;

export interface WorstStep extends WorstPlace {
  /** foot at the higher potential, m; x, y is the place midway */
  readonly from: readonly [number, number];
  readonly to: readonly [number, number];
}

/** Directions tried over half a turn: the worst falls between two by at most 1 − cos 7.5° = 0.9 %. */
const DIRECTIONS = 12;
const STARTS = 4;
const FINEST_STEP = 1 / 64;
/** First turn of the search, rad. */
const TURN = Math.PI / 12;

/** Midpoint and direction of a pace: [x, y, angle]. */
type Pace = readonly [number, number, number];

/** Largest voltage over one metre centred at each lattice point, from a lattice of surface potentials. */
export function stepLattice(potential: Lattice): Lattice {
  const stencils = Array.from({ length: DIRECTIONS }, (_, d) => {
    const [ex, ey] = halfPace((Math.PI * d) / DIRECTIONS);
    return paceStencil(ex / potential.spacing, ey / potential.spacing);
  });
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
 */
export function worstStep(
  step: Lattice,
  region: Region,
  within: Uint8Array,
  surface: SurfacePotential,
  beside: readonly (readonly [number, number])[],
  rough: SurfacePotential = surface,
): WorstStep | undefined {
  const voltage = ([x, y, angle]: Pace, over: SurfacePotential): number => {
    const [ex, ey] = halfPace(angle);
    return region.inside(x, y) ? drop(over, x, y, ex, ey) : Number.NEGATIVE_INFINITY;
  };
  // one pace a place: the likeliest direction about a midpoint, and from a foot by the metal
  const likely = [...latticeSummits(step, within), ...edgePlaces(region)].flatMap((midpoint) =>
    likeliest(turned(midpoint), (pace) => voltage(pace, rough)),
  );
  for (const [x, y] of beside) {
    const here = surface(x, y);
    const fromHere = ([mx, my]: Pace): number =>
      region.inside(mx, my) ? Math.abs(rough(2 * mx - x, 2 * my - y) - here) : Number.NEGATIVE_INFINITY;
    likely.push(...likeliest(steppedFrom([x, y]), fromHere));
  }
  const f = (at: readonly number[]): number => voltage(at as Pace, surface);
  const starts = bestStarts(likely, f, STARTS).flatMap(([x, y, angle]): Pace[] => [
    [x, y, angle],
    ...onEdge(region, x, y, step.spacing).map(([u, v]): Pace => [u, v, angle]),
  ]);
  const directions = edgeDirections(region, step.spacing);
  const along = ([x, y]: readonly number[]): number[][] => directions(x!, y!).map(([u, v]) => [u, v, 0]);
  let best: { at: readonly number[]; value: number } | undefined;
  for (const start of starts) {
    const summit = climb(f, start, [step.spacing, step.spacing, TURN], along, FINEST_STEP);
    if (summit.value > (best?.value ?? Number.NEGATIVE_INFINITY)) best = summit;
  }
  if (best === undefined) return undefined;
  const [x, y, angle] = best.at as Pace;
  const [ex, ey] = halfPace(angle);
  const ahead = [x + ex, y + ey] as const;
  const behind = [x - ex, y - ey] as const;
  const falls = surface(ahead[0], ahead[1]) >= surface(behind[0], behind[1]);
  return { x, y, value: best.value, from: falls ? ahead : behind, to: falls ? behind : ahead };
}

/** Paces in every direction about a midpoint. */
function turned([x, y]: readonly [number, number]): Pace[] {
  return Array.from({ length: DIRECTIONS }, (_, d) => [x, y, (Math.PI * d) / DIRECTIONS]);
}

/** Paces with one foot at a place, all the way round. */
function steppedFrom([x, y]: readonly [number, number]): Pace[] {
  return Array.from({ length: DIRECTIONS }, (_, d) => {
    const angle = (2 * Math.PI * d) / DIRECTIONS;
    const [ex, ey] = halfPace(angle);
    return [x + ex, y + ey, angle];
  });
}

function halfPace(angle: number): [number, number] {
  return [(PACE_M / 2) * Math.cos(angle), (PACE_M / 2) * Math.sin(angle)];
}
