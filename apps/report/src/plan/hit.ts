// What of the plan lies under a place or in a rectangle.
import type { Point } from '@ohmstead/study';
import type { PlanItem } from './plan-conductors.ts';

export interface Nearest {
  readonly at: Point;
  /** m */
  readonly distance: number;
}

/** Place on a straight line between two others that is nearest to a point. */
export function nearestOnLine([x1, y1]: Point, [x2, y2]: Point, [x, y]: Point): Nearest {
  const [dx, dy] = [x2 - x1, y2 - y1];
  const square = dx * dx + dy * dy;
  const share = square === 0 ? 0 : Math.min(1, Math.max(0, ((x - x1) * dx + (y - y1) * dy) / square));
  const at: Point = [x1 + share * dx, y1 + share * dy];
  return { at, distance: Math.hypot(x - at[0], y - at[1]) };
}

/** Place on a conductor in plan that is nearest to a point. */
export function nearestOn({ conductor: { x1, y1, x2, y2 } }: PlanItem, place: Point): Nearest {
  return nearestOnLine([x1, y1], [x2, y2], place);
}

/** Share of the reach within which a rod is hit before what passes through it. Reason: that is where its ring is drawn. */
const ROD_FIRST = 0.5;

/** The conductor under a place; a rod before the conductors that it stands on, of which one is always nearer. */
export function itemAt(items: readonly PlanItem[], place: Point, tolerance: number): PlanItem | undefined {
  let best: PlanItem | undefined;
  let least = Number.POSITIVE_INFINITY;
  for (const item of items) {
    const { distance } = nearestOn(item, place);
    const weighed = item.rod && distance <= ROD_FIRST * tolerance ? distance - tolerance : distance;
    if (distance <= tolerance && weighed < least) {
      best = item;
      least = weighed;
    }
  }
  return best;
}

/** Conductors that lie wholly in the rectangle between two corners. */
export function itemsIn(items: readonly PlanItem[], a: Point, b: Point): readonly PlanItem[] {
  const inside = (x: number, y: number): boolean =>
    x >= Math.min(a[0], b[0]) &&
    x <= Math.max(a[0], b[0]) &&
    y >= Math.min(a[1], b[1]) &&
    y <= Math.max(a[1], b[1]);
  return items.filter(({ conductor: { x1, y1, x2, y2 } }) => inside(x1, y1) && inside(x2, y2));
}
