// Step voltage: between two feet one metre apart, in the worst direction, and its worst place.
import { type Lattice, latticeValue } from './lattice.ts';
import { climb } from './local-search.ts';
import { alongEdge, edgePlaces, onEdge, type Region } from './region.ts';
import { bestStarts, latticeSummits } from './starts.ts';
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
  const values = new Float64Array(potential.values.length);
  const paces = Array.from({ length: DIRECTIONS }, (_, d) => halfPace((Math.PI * d) / DIRECTIONS));
  for (let j = 0; j < potential.ny; j++)
    for (let i = 0; i < potential.nx; i++) {
      const x = potential.x0 + i * potential.spacing;
      const y = potential.y0 + j * potential.spacing;
      let most = 0;
      for (const [ex, ey] of paces) {
        const drop = latticeValue(potential, x + ex, y + ey) - latticeValue(potential, x - ex, y - ey);
        most = Math.max(most, Math.abs(drop));
      }
      values[j * potential.nx + i] = most;
    }
  return { ...potential, values };
}

/**
 * The largest step voltage whose midpoint lies in a region: summits of the map, edges, and paces that begin by the
 * metal, ranked by the exact field; then a search over place and direction. Undefined where the region holds no place.
 * @param within 1 where a lattice point lies in the region
 * @param beside places by the metal: one foot of a pace is tried there
 */
export function worstStep(
  step: Lattice,
  region: Region,
  within: Uint8Array,
  surface: SurfacePotential,
  beside: readonly (readonly [number, number])[],
): WorstStep | undefined {
  const f = ([x, y, angle]: readonly number[]): number => {
    if (!region.inside(x!, y!)) return Number.NEGATIVE_INFINITY;
    const [ex, ey] = halfPace(angle!);
    return Math.abs(surface(x! + ex, y! + ey) - surface(x! - ex, y! - ey));
  };
  const places = [...latticeSummits(step, within), ...edgePlaces(region)];
  const starts = bestStarts([...places.flatMap(turned), ...beside.flatMap(steppedFrom)], f, STARTS).flatMap(
    ([x, y, angle]): Pace[] => [
      [x, y, angle],
      ...onEdge(region, x, y, step.spacing).map(([u, v]): Pace => [u, v, angle]),
    ],
  );
  let best: { at: readonly number[]; value: number } | undefined;
  for (const start of starts) {
    const along = ([x, y]: readonly number[]): number[][] =>
      alongEdge(region, x!, y!, step.spacing).map(([u, v]) => [u, v, 0]);
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
