// Step voltage: between two feet one metre apart, in the worst direction, and its worst place.
import { insideArea, nearestOnBoundary, type Polygon } from '../geometry/area.ts';
import { type Lattice, latticeValue } from './lattice.ts';
import { climb } from './local-search.ts';
import type { SurfacePotential } from './surface-potential.ts';
import { latticeMaxima, type WorstPlace, worthwhile } from './touch.ts';

/** Distance between the feet, m (IEEE Std 80-2013, 3, step voltage). */
export const PACE_M = 1;

export interface WorstStep extends WorstPlace {
  /** foot at the higher potential, m */
  readonly from: readonly [number, number];
  readonly to: readonly [number, number];
}

/** Directions tried on the map over half a turn: the worst falls between two by at most 1 − cos 7.5° = 0.9 %. */
const MAP_DIRECTIONS = 12;
const STARTS = 3;
const FINEST_STEP = 1 / 64;
/** First turn of the search, rad. */
const TURN = Math.PI / 12;

/** Largest voltage over one metre centred at each lattice point, from a lattice of surface potentials. */
export function stepLattice(potential: Lattice): Lattice {
  const values = new Float64Array(potential.values.length);
  for (let j = 0; j < potential.ny; j++)
    for (let i = 0; i < potential.nx; i++) {
      const x = potential.x0 + i * potential.spacing;
      const y = potential.y0 + j * potential.spacing;
      let most = 0;
      for (let d = 0; d < MAP_DIRECTIONS; d++) {
        const [ex, ey] = halfPace((Math.PI * d) / MAP_DIRECTIONS);
        most = Math.max(
          most,
          Math.abs(latticeValue(potential, x + ex, y + ey) - latticeValue(potential, x - ex, y - ey)),
        );
      }
      values[j * potential.nx + i] = most;
    }
  return { ...potential, values };
}

/** The largest step voltage whose midpoint lies in an area: maxima of the map, then a search on the exact field. */
export function worstStep(
  step: Lattice,
  within: Uint8Array,
  surface: SurfacePotential,
  area: readonly Polygon[],
): WorstStep {
  const inside = (x: number, y: number): boolean => insideArea(area, x, y);
  const voltage = (at: readonly number[]): number => {
    const [ex, ey] = halfPace(at[2]!);
    return Math.abs(surface(at[0]! + ex, at[1]! + ey) - surface(at[0]! - ex, at[1]! - ey));
  };
  const f = (at: readonly number[]): number =>
    inside(at[0]!, at[1]!) ? voltage(at) : Number.NEGATIVE_INFINITY;
  const s = step.spacing;
  const directions = (at: readonly number[]): readonly (readonly number[])[] => {
    const [, , tx, ty] = nearestOnBoundary(area, at[0]!, at[1]!);
    return [[s, 0, 0], [-s, 0, 0], [0, s, 0], [0, -s, 0], [0, 0, TURN], [0, 0, -TURN], [s * tx, s * ty, 0], [-s * tx, -s * ty, 0]];
  }; // biome-ignore format: moves
  let worst = { at: [Number.NaN, Number.NaN, 0] as readonly number[], value: Number.NEGATIVE_INFINITY };
  const height = (at: readonly [number, number]): number => latticeValue(step, at[0], at[1]);
  for (const [x, y] of worthwhile(latticeMaxima(step, within), height, STARTS)) {
    let start = [x, y, 0];
    for (let d = 1; d < MAP_DIRECTIONS; d++) {
      const turned = [x, y, (Math.PI * d) / MAP_DIRECTIONS];
      if (voltage(turned) > voltage(start)) start = turned;
    }
    const summit = climb(f, start, directions, FINEST_STEP);
    if (summit.value > worst.value) worst = summit;
  }
  const [x, y, angle] = worst.at as readonly [number, number, number];
  const [ex, ey] = halfPace(angle);
  const ahead = [x + ex, y + ey] as const;
  const behind = [x - ex, y - ey] as const;
  const falls = surface(ahead[0], ahead[1]) >= surface(behind[0], behind[1]);
  return { x, y, value: worst.value, from: falls ? ahead : behind, to: falls ? behind : ahead };
}

function halfPace(angle: number): [number, number] {
  return [(PACE_M / 2) * Math.cos(angle), (PACE_M / 2) * Math.sin(angle)];
}
