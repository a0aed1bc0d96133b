// Writes points as SVG path data, two decimals.
import type { Point, Polygon } from '@ohmstead/study';
import { area, curveLinearClosed, curveMonotoneX, line } from 'd3-shape';
import type { Plate } from '../geometry/plate.ts';

/** Decimals of drawing units: a hundredth is far below what is seen. */
const DIGITS = 2;

const open = line<Point>().digits(DIGITS);
const closed = line<Point>().curve(curveLinearClosed).digits(DIGITS);

const smooth = line<Point>().curve(curveMonotoneX).digits(DIGITS);
const ribbon = area<readonly [x: number, low: number, high: number]>()
  .curve(curveMonotoneX)
  .x((p) => p[0])
  .y0((p) => p[1])
  .y1((p) => p[2])
  .digits(DIGITS);

/** Rounded for attributes, in drawing units. */
export function px(value: number): number {
  return Math.round(value * 100) / 100;
}

/** Points on the ground in drawing units. */
export function onPlate(plate: Plate, points: readonly Point[]): readonly Point[] {
  return points.map(([x, y]): Point => [plate.x(x), plate.y(y)]);
}

/** An open line through points in drawing units. */
export function linePath(points: readonly Point[]): string {
  return open(points) ?? '';
}

/** A smooth line through points in drawing units whose x grows; it makes no hump that they do not have. */
export function smoothPath(points: readonly Point[]): string {
  return smooth(points) ?? '';
}

/** The ground between two smooth lines over the same x, drawing units. */
export function ribbonPath(points: readonly (readonly [x: number, low: number, high: number])[]): string {
  return ribbon(points) ?? '';
}

/** Closed outlines in drawing units, to be filled even–odd. */
export function ringPath(rings: readonly (readonly Point[])[]): string {
  return rings.map((ring) => closed(ring) ?? '').join('');
}

/** Outlines on the ground. */
export function polygonPath(plate: Plate, polygons: readonly Polygon[]): string {
  return ringPath(polygons.map((polygon) => onPlate(plate, polygon)));
}

/** Separate straight pieces on the ground. */
export function piecesPath(plate: Plate, pieces: readonly (readonly [Point, Point])[]): string {
  return pieces.map((piece) => linePath(onPlate(plate, piece))).join('');
}
