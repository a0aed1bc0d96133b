// What a pointer takes up on the plan: what is chosen, a corner of the area in hand, an end of the profile, or a new line.
import type { Point, Polygon, RowOrigin } from '@ohmstead/study';
import { gripOf, type HeldOptions, heldTo } from './held-shift.ts';
import { itemAt } from './hit.ts';
import { type AreaGrip, gripAt, type PlanArea } from './plan-areas.ts';
import type { PlanItem } from './plan-conductors.ts';
import type { Drag } from './pointer-drag.ts';
import type { Snapped } from './snap.ts';

export type ProfileLine = readonly [Point, Point];

export type Grip =
  | { readonly kind: 'items'; readonly row: RowOrigin; readonly at: Point }
  | (AreaGrip & { readonly kind: 'corner' })
  | { readonly kind: 'profile'; readonly end: 0 | 1; readonly at: Point }
  /** a profile begun here */
  | { readonly kind: 'line'; readonly at: Point };

export interface Grips {
  readonly items: readonly PlanItem[];
  readonly area: PlanArea | undefined;
  readonly profile: ProfileLine | undefined;
}

/** Corners before ends of the profile, these before metal. */
export function gripUnder(grips: Grips, place: Point, tolerance: number): Grip | undefined {
  const { items, area, profile } = grips;
  const corner = area && gripAt(area.corners, place, tolerance);
  if (corner !== undefined) return { kind: 'corner', ...corner };
  const end = profile?.findIndex(([x, y]) => Math.hypot(place[0] - x, place[1] - y) <= tolerance);
  if (profile !== undefined && (end === 0 || end === 1)) return { kind: 'profile', end, at: profile[end] };
  const item = itemAt(items, place, tolerance);
  return item && { kind: 'items', row: item.row, at: gripOf(item, place, tolerance) };
}

/** Where a grip is while it is dragged; undefined where nothing is. */
export function heldAt(
  drag: Drag<Grip> | undefined,
  items: readonly PlanItem[],
  chosen: ReadonlySet<string>,
  options: Omit<HeldOptions, 'free'>,
): Snapped | undefined {
  if (drag?.kind !== 'move' || !drag.far) return undefined;
  const { grip, from, to, free } = drag;
  const others = grip.kind === 'items' ? items.filter(({ key }) => !chosen.has(key)) : items;
  return heldTo(others, grip.at, [to[0] - from[0], to[1] - from[1]], { ...options, free });
}

/** Corners with one of them dragged to a place. */
export function draggedCorners(corners: Polygon, { corner, fresh }: AreaGrip, to: Point): Polygon {
  return corners.toSpliced(corner, fresh ? 0 : 1, to);
}

/** A profile with one of its ends dragged to a place. */
export function draggedProfile([from, to]: ProfileLine, end: 0 | 1, at: Point): ProfileLine {
  return end === 0 ? [at, to] : [from, at];
}
