// What pointers that are held down do to the plan, step by step.
import type { Point } from '@ohmstead/study';
import { panned, type Size, toGround, type View, zoomed } from './view.ts';

/** What a press takes up: G tells what it is. */
export type Drag<G> =
  /** the ground is dragged along, or nothing yet: a press that has not moved */
  | { readonly kind: 'pan'; readonly last: Point; readonly begun: Point; readonly far: boolean }
  /** something is moved, from a place on the ground to another */
  | {
      readonly kind: 'move';
      readonly grip: G;
      readonly begun: Point;
      readonly from: Point;
      readonly to: Point;
      readonly far: boolean;
      readonly free: boolean;
    }
  /** a rectangle is drawn round what is to be chosen */
  | { readonly kind: 'band'; readonly from: Point; readonly to: Point }
  | { readonly kind: 'pinch'; readonly distance: number; readonly middle: Point };

/** A press that moves less than this is a click, pixels. */
const CLICK_PX = 4;

/** Distance and middle of two pointers. */
export function pinchOf(a: Point, b: Point): Extract<Drag<never>, { kind: 'pinch' }> {
  return {
    kind: 'pinch',
    distance: Math.hypot(a[0] - b[0], a[1] - b[1]),
    middle: [(a[0] + b[0]) / 2, (a[1] + b[1]) / 2],
  };
}

/** Where the pointers are now, pixels. */
export interface Held {
  /** the one that moved */
  readonly at: Point;
  /** every one that is down, in the order in which they came down */
  readonly down: readonly Point[];
  /** points fall where they are, not where they would snap */
  readonly free: boolean;
}

/** A drag one step further, and the view that it leaves. */
export function dragStep<G>(
  drag: Drag<G>,
  { at, down, free }: Held,
  view: View,
  size: Size,
): { readonly drag: Drag<G>; readonly view: View } {
  const isFar = (begun: Point): boolean => Math.hypot(at[0] - begun[0], at[1] - begun[1]) > CLICK_PX;
  switch (drag.kind) {
    case 'pan': {
      const far = drag.far || isFar(drag.begun);
      if (!far) return { drag, view };
      const by: Point = [at[0] - drag.last[0], at[1] - drag.last[1]];
      return { drag: { ...drag, last: at, far }, view: panned(view, by[0], by[1]) };
    }
    case 'move': {
      const far = drag.far || isFar(drag.begun);
      return { drag: { ...drag, to: toGround(view, size, at), far, free }, view };
    }
    case 'band':
      return { drag: { ...drag, to: toGround(view, size, at) }, view };
    case 'pinch': {
      const [a, b] = down;
      if (a === undefined || b === undefined) return { drag, view };
      const next = pinchOf(a, b);
      const along = panned(view, next.middle[0] - drag.middle[0], next.middle[1] - drag.middle[1]);
      // fingers that lie on one pixel would enlarge without bound
      const factor = Math.max(1, next.distance) / Math.max(1, drag.distance);
      return { drag: next, view: zoomed(along, size, next.middle, factor) };
    }
  }
}
