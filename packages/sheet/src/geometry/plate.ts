// Fits a rectangle of ground into a drawing: metres to drawing units, y upward.
import type { Point } from '@ohmstead/study';
import type { Box } from './box.ts';

export interface Extent {
  readonly x: Point;
  readonly y: Point;
}

export interface Plate {
  /** whole drawing, drawing units */
  readonly width: number;
  readonly height: number;
  /** where the ground is drawn, drawing units */
  readonly frame: Box;
  /** drawing units per metre */
  readonly scale: number;
  readonly extent: Extent;
  readonly x: (metres: number) => number;
  readonly y: (metres: number) => number;
  /** the way back: drawing units to metres */
  readonly east: (x: number) => number;
  readonly north: (y: number) => number;
}

export interface PlateSize {
  readonly width: number;
  /** greatest height of the ground's frame */
  readonly most: number;
  /** least height of the ground's frame, so that notes find room beside a narrow strip */
  readonly least: number;
  readonly margin: {
    readonly left: number;
    readonly right: number;
    readonly top: number;
    readonly bottom: number;
  };
}

/** Largest plate that shows the extent within the size; the ground keeps its proportions and stands at the left. */
export function plateOf(extent: Extent, size: PlateSize): Plate {
  const { margin } = size;
  const across = extent.x[1] - extent.x[0];
  const up = extent.y[1] - extent.y[0];
  const room = size.width - margin.left - margin.right;
  const scale = Math.min(room / across, size.most / up);
  const tall = up * scale;
  const height = margin.top + Math.max(size.least, tall) + margin.bottom;
  const bottom = height - margin.bottom;
  const frame: Box = { left: margin.left, right: margin.left + across * scale, top: bottom - tall, bottom };
  return {
    width: size.width,
    height,
    frame,
    scale,
    extent,
    x: (metres) => frame.left + (metres - extent.x[0]) * scale,
    y: (metres) => frame.bottom - (metres - extent.y[0]) * scale,
    east: (x) => extent.x[0] + (x - frame.left) / scale,
    north: (y) => extent.y[0] + (frame.bottom - y) / scale,
  };
}
