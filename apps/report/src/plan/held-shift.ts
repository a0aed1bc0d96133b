// How far what is held in hand has been moved: its grip falls where a drawn point would.
import type { Point } from '@ohmstead/study';
import { nearestOn } from './hit.ts';
import type { PlanItem } from './plan-conductors.ts';
import { type Snapped, snap } from './snap.ts';

/** The point by which a conductor is held: an end that lies within reach, else the place on it. */
export function gripOf(item: PlanItem, place: Point, tolerance: number): Point {
  const { x1, y1, x2, y2 } = item.conductor;
  const ends: readonly Point[] = [
    [x1, y1],
    [x2, y2],
  ];
  const apart = ([x, y]: Point): number => Math.hypot(x - place[0], y - place[1]);
  const [end] = ends.filter((one) => apart(one) <= tolerance).sort((a, b) => apart(a) - apart(b));
  return end ?? nearestOn(item, place).at;
}

export interface HeldOptions {
  /** how far the grip may be drawn aside, m */
  readonly tolerance: number;
  /** step of the grid in which things are moved otherwise, m; 0 for none */
  readonly step: number;
  /** the grip is left where the pointer has it */
  readonly free: boolean;
}

/**
 * Where a grip goes that the pointer has moved.
 * @param others what it may fall on: nothing that is moved along
 * @param grip where it was taken up
 * @param by how far the pointer has moved, m
 */
export function heldTo(
  others: readonly PlanItem[],
  grip: Point,
  by: Point,
  { tolerance, step, free }: HeldOptions,
): Snapped {
  const to: Point = [grip[0] + by[0], grip[1] + by[1]];
  if (free) return { at: to, why: undefined };
  const fallen = snap(others, to, { tolerance, step: 0 });
  if (fallen.why !== undefined || step === 0) return fallen;
  // whole steps from where it was, so that what stands off the grid keeps its place between others
  return { at: [grip[0] + onStep(by[0], step), grip[1] + onStep(by[1], step)], why: undefined };
}

function onStep(value: number, step: number): number {
  return Number((Math.round(value / step) * step).toPrecision(12)) + 0;
}
