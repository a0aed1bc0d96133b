// Where a drawn point falls: ends, crossings, conductors, right angles, the grid step; and why, in words.
import type { Point } from '@ohmstead/study';
import { nearestOn } from './hit.ts';
import { itemName, type PlanItem } from './plan-conductors.ts';

export interface Snapped {
  readonly at: Point;
  /** why it falls there, in words; undefined where it is left as it is */
  readonly why: string | undefined;
}

export interface SnapOptions {
  /** how far a point may be drawn aside, m */
  readonly tolerance: number;
  /** step of the grid that points fall on otherwise, m; 0 for none */
  readonly step: number;
  /** where the line that is being drawn begins */
  readonly from?: Point | undefined;
}

interface Candidate extends Snapped {
  readonly distance: number;
}

/** Ends and crossings before conductors, these before right angles, these before the grid. */
export function snap(items: readonly PlanItem[], place: Point, options: SnapOptions): Snapped {
  const { tolerance, step, from } = options;
  const near = items.filter((item) => nearestOn(item, place).distance <= tolerance);
  const groups: readonly (() => readonly Candidate[])[] = [
    () => ends(near, place),
    () => crossings(near, place),
    () => (from === undefined ? [] : squareOn(near, from, place)),
    () => near.map((item) => ({ ...nearestOn(item, place), why: `on ${itemName(item)}` })),
    () => (from === undefined ? [] : straight(from, place, step)),
  ];
  for (const group of groups) {
    const best = group()
      .filter(({ distance }) => distance <= tolerance)
      .reduce<Candidate | undefined>(
        (a, b) => (a === undefined || b.distance < a.distance ? b : a),
        undefined,
      );
    if (best !== undefined) return { at: best.at, why: best.why };
  }
  return step > 0 ? { at: onGrid(place, step), why: undefined } : { at: place, why: undefined };
}

function candidate(at: Point, place: Point, why: string): Candidate {
  return { at, distance: Math.hypot(at[0] - place[0], at[1] - place[1]), why };
}

function ends(near: readonly PlanItem[], place: Point): readonly Candidate[] {
  return near.flatMap((item) => {
    const { x1, y1, x2, y2 } = item.conductor;
    const why = item.rod ? itemName(item) : `end of ${itemName(item)}`;
    return [candidate([x1, y1], place, why), candidate([x2, y2], place, why)];
  });
}

function crossings(near: readonly PlanItem[], place: Point): readonly Candidate[] {
  const lines = near.filter(({ rod }) => !rod);
  return lines.flatMap((a, i) =>
    lines.slice(i + 1).flatMap((b) => {
      const at = crossing(a, b);
      return at === undefined ? [] : [candidate(at, place, `where ${itemName(a)} and ${itemName(b)} cross`)];
    }),
  );
}

/** Where two conductors cross in plan; undefined for parallel ones and those that do not meet. */
function crossing({ conductor: p }: PlanItem, { conductor: q }: PlanItem): Point | undefined {
  const [ux, uy, vx, vy] = [p.x2 - p.x1, p.y2 - p.y1, q.x2 - q.x1, q.y2 - q.y1];
  const cross = ux * vy - uy * vx;
  if (Math.abs(cross) < 1e-9 * Math.hypot(ux, uy) * Math.hypot(vx, vy)) return undefined;
  const [wx, wy] = [q.x1 - p.x1, q.y1 - p.y1];
  const s = (wx * vy - wy * vx) / cross;
  const t = (wx * uy - wy * ux) / cross;
  return s < 0 || s > 1 || t < 0 || t > 1 ? undefined : [p.x1 + s * ux, p.y1 + s * uy];
}

/** The foot of the perpendicular from where the line begins. */
function squareOn(near: readonly PlanItem[], from: Point, place: Point): readonly Candidate[] {
  return near
    .filter(({ rod }) => !rod)
    .flatMap((item) => {
      const { at, distance } = nearestOn(item, from);
      return distance === 0 ? [] : [candidate(at, place, `square to ${itemName(item)}`)];
    });
}

/** Due east, north, west or south of where the line begins, at a whole step of the grid. */
function straight(from: Point, place: Point, step: number): readonly Candidate[] {
  const rounded = (v: number): number => (step > 0 ? Math.round(v / step) * step : v);
  return [
    candidateLine([rounded(place[0]), from[1]], place, 'due east or west', 1),
    candidateLine([from[0], rounded(place[1])], place, 'due north or south', 0),
  ];
}

function candidateLine(at: Point, place: Point, why: string, axis: 0 | 1): Candidate {
  return { at, distance: Math.abs(at[axis] - place[axis]), why };
}

function onGrid([x, y]: Point, step: number): Point {
  const on = (v: number): number => Number((Math.round(v / step) * step).toPrecision(12)) + 0;
  return [on(x), on(y)];
}
