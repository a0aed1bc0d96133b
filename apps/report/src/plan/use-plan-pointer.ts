// Pointers on the plan: one drags the ground or what is chosen, or draws; two pinch; the wheel enlarges.
import type { Point } from '@ohmstead/study';
import { useEffect, useRef, useState } from 'preact/hooks';
import { type Drag, dragStep, type Held, pinchOf } from './pointer-drag.ts';
import { type Size, toGround, type View, zoomed } from './view.ts';

/** Factor of one notch of a wheel, for its usual 100 pixels. */
const WHEEL_FACTOR = 1.25;
const WHEEL_PX = 100;

export interface PointerDeeds<G> {
  /** a pointer that is not held; undefined where it has left, m */
  readonly hover: (place: Point | undefined, free: boolean) => void;
  /** a click that was no drag */
  readonly click: (place: Point, keys: Keys) => void;
  /** what a press at a place takes up; undefined where it drags the ground */
  readonly pickUp: (place: Point, keys: Keys) => G | undefined;
  readonly drop: (grip: G, from: Point, to: Point, free: boolean) => void;
  /** a press on what can be taken up that did not move it */
  readonly tap: (grip: G) => void;
  readonly band: (a: Point, b: Point) => void;
}

export interface Keys {
  readonly shift: boolean;
  /** points fall where they are, not where they would snap */
  readonly free: boolean;
}

export interface PlanPointer<G> {
  readonly drag: Drag<G> | undefined;
  readonly handlers: {
    readonly onPointerDown: (event: PointerEvent) => void;
    readonly onPointerMove: (event: PointerEvent) => void;
    readonly onPointerUp: (event: PointerEvent) => void;
    readonly onPointerCancel: (event: PointerEvent) => void;
    readonly onPointerLeave: (event: PointerEvent) => void;
    readonly onWheel: (event: WheelEvent) => void;
    readonly onDblClick: (event: MouseEvent) => void;
  };
}

function pixelOf(event: MouseEvent): Point {
  const box =
    event.currentTarget instanceof Element ? event.currentTarget.getBoundingClientRect() : undefined;
  return [event.clientX - (box?.left ?? 0), event.clientY - (box?.top ?? 0)];
}

function keysOf(event: MouseEvent): Keys {
  return { shift: event.shiftKey, free: event.altKey };
}

/**
 * @param look changes where the plan is looked at
 * @param deeds what pointers do to what lies there; moves reach them at most once a frame
 */
export function usePlanPointer<G>(
  view: View,
  size: Size,
  look: (change: (view: View) => View) => void,
  deeds: PointerDeeds<G>,
): PlanPointer<G> {
  const [shown, show] = useState<Drag<G>>();
  const drag = useRef<Drag<G>>(undefined);
  const down = useRef(new Map<number, Point>());
  const waiting = useRef<Omit<Held, 'down'> & { readonly frame: number }>(undefined);
  const ground = (pixel: Point): Point => toGround(view, size, pixel);
  const set = (next: Drag<G> | undefined): void => {
    drag.current = next;
    show(next);
  };
  // the frame that comes calls what was last rendered
  const step = useRef<() => void>(() => {});
  step.current = (): void => {
    const held = waiting.current;
    if (held === undefined) return;
    cancelAnimationFrame(held.frame);
    waiting.current = undefined;
    const now = drag.current;
    if (now === undefined) {
      deeds.hover(ground(held.at), held.free);
      return;
    }
    const next = dragStep(now, { ...held, down: [...down.current.values()] }, view, size);
    set(next.drag);
    if (next.view !== view) look(() => next.view);
  };
  useEffect(() => () => cancelAnimationFrame(waiting.current?.frame ?? 0), []);
  const drop = (): void => {
    cancelAnimationFrame(waiting.current?.frame ?? 0);
    waiting.current = undefined;
  };
  const begin = (event: PointerEvent): void => {
    if (event.button !== 0) return;
    drop();
    const pixel = pixelOf(event);
    if (event.currentTarget instanceof Element) event.currentTarget.setPointerCapture(event.pointerId);
    down.current.set(event.pointerId, pixel);
    const [a, b] = [...down.current.values()];
    if (a !== undefined && b !== undefined) {
      set(pinchOf(a, b));
      return;
    }
    const place = ground(pixel);
    const keys = keysOf(event);
    const grip = deeds.pickUp(place, keys);
    if (grip !== undefined)
      set({ kind: 'move', grip, begun: pixel, from: place, to: place, far: false, free: keys.free });
    else if (keys.shift) set({ kind: 'band', from: place, to: place });
    else set({ kind: 'pan', begun: pixel, last: pixel, far: false });
  };
  const move = (event: PointerEvent): void => {
    const at = pixelOf(event);
    if (down.current.has(event.pointerId)) down.current.set(event.pointerId, at);
    const frame = waiting.current?.frame ?? requestAnimationFrame(() => step.current());
    waiting.current = { at, free: event.altKey, frame };
  };
  const release = (event: PointerEvent): void => {
    const last = drag.current;
    const held: Held = { at: pixelOf(event), down: [...down.current.values()], free: event.altKey };
    drop();
    down.current.delete(event.pointerId);
    set(undefined);
    if (last === undefined || last.kind === 'pinch') return;
    const end = dragStep(last, held, view, size);
    if (end.view !== view) look(() => end.view);
    if (end.drag.kind === 'pan' && !end.drag.far) {
      if (event.pointerType === 'touch') deeds.hover(ground(held.at), held.free);
      deeds.click(ground(held.at), keysOf(event));
    }
    if (end.drag.kind === 'band') deeds.band(end.drag.from, end.drag.to);
    else if (end.drag.kind === 'move' && end.drag.far)
      deeds.drop(end.drag.grip, end.drag.from, end.drag.to, held.free);
    else if (end.drag.kind === 'move') deeds.tap(end.drag.grip);
  };
  return {
    drag: shown,
    handlers: {
      onPointerDown: begin,
      onPointerMove: move,
      onPointerUp: release,
      onPointerCancel: (event) => {
        drop();
        down.current.delete(event.pointerId);
        set(undefined);
      },
      onPointerLeave: (event) => {
        // a finger that is lifted leaves its reading where it was
        if (drag.current !== undefined || event.pointerType === 'touch') return;
        drop();
        deeds.hover(undefined, false);
      },
      onWheel: (event) => {
        // the page scrolls on under a plan that is not in use
        const inUse = event.ctrlKey || document.activeElement === event.currentTarget;
        if (!inUse) return;
        event.preventDefault();
        const at = pixelOf(event);
        look((now) => zoomed(now, size, at, WHEEL_FACTOR ** (-event.deltaY / WHEEL_PX)));
      },
      onDblClick: (event) => {
        const at = pixelOf(event);
        look((now) => zoomed(now, size, at, 2));
      },
    },
  };
}
