// Touch voltage on floating metal: its own potential against the soil within reach of it.

import { corridors, type PlanLine } from '../geometry/area.ts';
import { REACH_M } from '../geometry/default-areas.ts';
import { areaRegion } from './region.ts';
import type { SurfacePotential } from './surface-potential.ts';
import { climbFromBest, type MetalPotential, type WorstPlace } from './touch.ts';

/** Spacing of the places that the search starts from, m. */
const SPACING = 2;

/** Worst magnitude within reach of the given lines of metal, and the sign of metal minus soil there. */
export function worstTouchNearLines(
  lines: readonly PlanLine[],
  surface: SurfacePotential,
  metal: MetalPotential,
): WorstPlace & { readonly signed: number } {
  const region = areaRegion(corridors(lines, REACH_M));
  const voltage = (x: number, y: number): number => metal(x, y) - surface(x, y);
  const f = ([x, y]: readonly number[]): number =>
    region.inside(x!, y!) ? Math.abs(voltage(x!, y!)) : Number.NEGATIVE_INFINITY;
  const guesses = lines.flatMap(placesBeside).map((candidate) => ({ candidate, value: f(candidate) }));
  const worst = climbFromBest(guesses, f, region, REACH_M / 4);
  if (worst === undefined) throw new Error('no place lies within reach of the metal');
  return { ...worst, signed: voltage(worst.x, worst.y) };
}

/** Places on both sides of a line, just within reach. */
function placesBeside([x1, y1, x2, y2]: PlanLine): [number, number][] {
  const length = Math.hypot(x2 - x1, y2 - y1);
  const within = 0.98 * REACH_M;
  if (length === 0) return [[x1 + within, y1], [x1 - within, y1], [x1, y1 + within], [x1, y1 - within]]; // biome-ignore format: four sides
  const count = Math.max(1, Math.ceil(length / SPACING));
  const nx = (-(y2 - y1) / length) * within;
  const ny = ((x2 - x1) / length) * within;
  return Array.from(
    { length: count + 1 },
    (_, k) => [x1 + ((x2 - x1) * k) / count, y1 + ((y2 - y1) * k) / count] as const,
  ).flatMap(([x, y]): [number, number][] => [
    [x + nx, y + ny],
    [x - nx, y - ny],
  ]);
}
