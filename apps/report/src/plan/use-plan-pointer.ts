// Pointers on the plan: one drags the ground or what is chosen, or draws; two pinch; the wheel enlarges.
import type { Point } from '@ohmstead/study';
import { useRef, useState } from 'preact/hooks';
import { type Drag, panStep, pinchOf } from './pointer-drag.ts';
import { panned, type Size, toGround, type View, zoomed } from './view.ts';

/** Factor of one notch of a wheel, for its usual 100 pixels. */
const WHEEL_FACTOR = 1.25;
const WHEEL_PX = 100;

export interface PointerDeeds {
  /** a pointer that is not held, or a click about to happen, m */
  readonly hover: (place: Point | undefined, free: boolean) => void;
  /** a click that was no drag */
  readonly click: (place: Point, keys: Keys) => void;
  /** whether a press at a place picks up what is chosen, after choosing it if it was not */
  readonly pickUp: (place: Point, keys: Keys) => boolean;
  readonly drop: (from: Point, to: Point, free: boolean) => void;
  readonly band: (a: Point, b: Point) => void;
}

export interface Keys {
  readonly shift: boolean;
  /** points fall where they are, not where they would snap */
  readonly free: boolean;
}

export interface PlanPointer {
  readonly drag: Drag | undefined;
  /** where what is moved is held now, m */
  readonly held: Point | undefined;
  readonly handlers: {
    readonly onPointerDown: (event: PointerEvent) => void;
    readonly onPointerMove: (event: PointerEvent) => void;
    readonly onPointerUp: (event: PointerEvent) => void;
    readonly onPointerCancel: (event: PointerEvent) => void;
    readonly onPointerLeave: () => void;
    readonly onWheel: (event: WheelEvent) => void;
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

export function usePlanPointer(
  view: View,
  size: Size,
  look: (change: (view: View) => View) => void,
  deeds: PointerDeeds,
): PlanPointer {
  const [drag, setDrag] = useState<Drag>();
  const [held, setHeld] = useState<Point>();
  const down = useRef(new Map<number, Point>());
  const ground = (pixel: Point): Point => toGround(view, size, pixel);
  const end = (): void => {
    setDrag(undefined);
    setHeld(undefined);
  };
  const begin = (event: PointerEvent): void => {
    if (event.button !== 0) return;
    const pixel = pixelOf(event);
    if (event.currentTarget instanceof Element) event.currentTarget.setPointerCapture(event.pointerId);
    down.current.set(event.pointerId, pixel);
    const [a, b] = [...down.current.values()];
    if (a !== undefined && b !== undefined) {
      setHeld(undefined);
      setDrag(pinchOf(a, b));
      return;
    }
    const place = ground(pixel);
    const keys = keysOf(event);
    if (deeds.pickUp(place, keys)) setDrag({ kind: 'move', from: place });
    else if (keys.shift) setDrag({ kind: 'band', from: place, to: place });
    else setDrag({ kind: 'pan', begun: pixel, last: pixel, far: false });
  };
  const move = (event: PointerEvent): void => {
    const pixel = pixelOf(event);
    if (down.current.has(event.pointerId)) down.current.set(event.pointerId, pixel);
    switch (drag?.kind) {
      case undefined:
        deeds.hover(ground(pixel), event.altKey);
        return;
      case 'pan': {
        const { drag: next, by } = panStep(drag, pixel);
        setDrag(next);
        if (by[0] !== 0 || by[1] !== 0) look((now) => panned(now, by[0], by[1]));
        return;
      }
      case 'move':
        setHeld(ground(pixel));
        return;
      case 'band':
        setDrag({ ...drag, to: ground(pixel) });
        return;
      case 'pinch': {
        const [a, b] = [...down.current.values()];
        if (a === undefined || b === undefined) return;
        const next = pinchOf(a, b);
        setDrag(next);
        look((now) =>
          zoomed(
            panned(now, next.middle[0] - drag.middle[0], next.middle[1] - drag.middle[1]),
            size,
            next.middle,
            next.distance / Math.max(1, drag.distance),
          ),
        );
      }
    }
  };
  const release = (event: PointerEvent): void => {
    const pixel = pixelOf(event);
    down.current.delete(event.pointerId);
    const place = ground(pixel);
    if (drag?.kind === 'pan' && !drag.far) deeds.click(place, keysOf(event));
    else if (drag?.kind === 'move') {
      if (held !== undefined) deeds.drop(drag.from, held, event.altKey);
    } else if (drag?.kind === 'band') deeds.band(drag.from, place);
    end();
  };
  return {
    drag,
    held,
    handlers: {
      onPointerDown: begin,
      onPointerMove: move,
      onPointerUp: release,
      onPointerCancel: (event) => {
        down.current.delete(event.pointerId);
        end();
      },
      onPointerLeave: () => {
        if (drag === undefined) deeds.hover(undefined, false);
      },
      onWheel: (event) => {
        event.preventDefault();
        const at = pixelOf(event);
        look((now) => zoomed(now, size, at, WHEEL_FACTOR ** (-event.deltaY / WHEEL_PX)));
      },
    },
  };
}
