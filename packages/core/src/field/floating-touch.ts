// Touch voltage on floating metal: its own potential against the soil within reach of it.

import { corridors, insideArea, type PlanLine, type Polygon } from '../geometry/area.ts';
import { REACH_M } from '../geometry/default-areas.ts';
import type { SurfacePotential } from './surface-potential.ts';
import { climbFromAll, type MetalPotential, type WorstPlace } from './touch.ts';

/** Spacing of the places that the search starts from, m. */
const SPACING = 2;
const STARTS = 8;

/** Worst magnitude within reach of the given lines of metal, and the sign of metal minus soil there. */
export function worstTouchNearLines(
  lines: readonly PlanLine[],
  surface: SurfacePotential,
  metal: MetalPotential,
): WorstPlace & { readonly signed: number } {
  const area: Polygon[] = corridors(lines, REACH_M);
  const voltage = (x: number, y: number): number => metal(x, y) - surface(x, y);
  const f = (at: readonly number[]): number =>
    insideArea(area, at[0]!, at[1]!) ? Math.abs(voltage(at[0]!, at[1]!)) : Number.NEGATIVE_INFINITY;
  const starts = lines
    .flatMap(placesBeside)
    .map(([x, y]) => ({ x, y, value: Math.abs(voltage(x, y)) }))
    .sort((a, b) => b.value - a.value)
    .slice(0, STARTS)
    .map(({ x, y }) => [x, y] as const);
  const worst = climbFromAll(starts, f, area, REACH_M / 4);
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
