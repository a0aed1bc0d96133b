// What a pointer that is held down does to the plan.
import type { Point } from '@ohmstead/study';

export type Drag =
  /** the ground is dragged along, or nothing yet: a press that has not moved */
  | { readonly kind: 'pan'; readonly last: Point; readonly begun: Point; readonly far: boolean }
  /** what is chosen is moved, from a place on the ground */
  | { readonly kind: 'move'; readonly from: Point }
  /** a rectangle is drawn round what is to be chosen */
  | { readonly kind: 'band'; readonly from: Point; readonly to: Point }
  | { readonly kind: 'pinch'; readonly distance: number; readonly middle: Point };

/** A press that moves less than this is a click, pixels. */
const CLICK_PX = 4;

/** A pan one step further; it is far when it can no longer be a click. */
export function panStep(
  drag: Extract<Drag, { kind: 'pan' }>,
  to: Point,
): { readonly drag: Drag; readonly by: Point } {
  const far = drag.far || Math.hypot(to[0] - drag.begun[0], to[1] - drag.begun[1]) > CLICK_PX;
  return {
    drag: { ...drag, last: to, far },
    by: far ? [to[0] - drag.last[0], to[1] - drag.last[1]] : [0, 0],
  };
}

/** Distance and middle of two pointers. */
export function pinchOf(a: Point, b: Point): Extract<Drag, { kind: 'pinch' }> {
  return {
    kind: 'pinch',
    distance: Math.hypot(a[0] - b[0], a[1] - b[1]),
    middle: [(a[0] + b[0]) / 2, (a[1] + b[1]) / 2],
  };
}
