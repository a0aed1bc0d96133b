// Where the plan is looked at: from metres on the ground to pixels on the screen and back.
import type { Point } from '@ohmstead/study';

/** The place in the middle and how large it is shown; y grows to the north, pixels grow downward. */
export interface View {
  readonly x: number;
  readonly y: number;
  /** pixels a metre */
  readonly scale: number;
}

export interface Size {
  readonly width: number;
  readonly height: number;
}

export interface Extent {
  readonly x: Point;
  readonly y: Point;
}

/** Least and most pixels a metre: a kilometre on a phone, a millimetre a pixel. */
const LEAST_SCALE = 0.02;
const MOST_SCALE = 1000;
/** Share of the window that the whole plan takes. */
const FILLED = 0.92;

export function fitView(extent: Extent, size: Size): View {
  const across = Math.max(extent.x[1] - extent.x[0], 1e-3);
  const up = Math.max(extent.y[1] - extent.y[0], 1e-3);
  return {
    x: (extent.x[0] + extent.x[1]) / 2,
    y: (extent.y[0] + extent.y[1]) / 2,
    scale: within(FILLED * Math.min(size.width / across, size.height / up)),
  };
}

function within(scale: number): number {
  return Math.min(MOST_SCALE, Math.max(LEAST_SCALE, scale));
}

export function toScreen(view: View, size: Size, [x, y]: Point): Point {
  return [size.width / 2 + (x - view.x) * view.scale, size.height / 2 - (y - view.y) * view.scale];
}

export function toGround(view: View, size: Size, [px, py]: Point): Point {
  return [view.x + (px - size.width / 2) / view.scale, view.y - (py - size.height / 2) / view.scale];
}

/** Larger or smaller by a factor, the ground at a pixel staying where it is. */
export function zoomed(view: View, size: Size, at: Point, factor: number): View {
  const [x, y] = toGround(view, size, at);
  const scale = within(view.scale * factor);
  return {
    x: x - (at[0] - size.width / 2) / scale,
    y: y + (at[1] - size.height / 2) / scale,
    scale,
  };
}

/** The ground dragged along by pixels. */
export function panned(view: View, dx: number, dy: number): View {
  return { ...view, x: view.x - dx / view.scale, y: view.y + dy / view.scale };
}

/** A place in the middle, at least so large. */
export function centred(view: View, [x, y]: Point, least: number): View {
  return { x, y, scale: within(Math.max(view.scale, least)) };
}

/** The transform of a group that is drawn in metres, y to the north. */
export function groundTransform(view: View, size: Size): string {
  return `translate(${size.width / 2} ${size.height / 2}) scale(${view.scale} ${-view.scale}) translate(${-view.x} ${-view.y})`;
}
