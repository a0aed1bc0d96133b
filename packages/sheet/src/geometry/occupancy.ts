// Remembers where lines run in a drawing, so that texts can be set beside them and not on them.
import type { Point } from '@ohmstead/study';
import type { Box } from './box.ts';

/** About how many lines pass through a box from side to side; 0 where none does. */
export type Occupancy = (box: Box) => number;

/** Side of a cell, drawing units: about a third of the height of a text. */
const CELL = 4;

/** Raster of straight lines over a drawing of a given size. */
export function occupancyOf(
  width: number,
  height: number,
  lines: Iterable<readonly [Point, Point]>,
): Occupancy {
  const across = Math.ceil(width / CELL) + 1;
  const down = Math.ceil(height / CELL) + 1;
  const cells = new Uint8Array(across * down);
  const mark = (x: number, y: number): void => {
    const [i, j] = [Math.floor(x / CELL), Math.floor(y / CELL)];
    if (i >= 0 && i < across && j >= 0 && j < down) cells[j * across + i] = 1;
  };
  for (const [a, b] of lines) {
    const steps = Math.max(1, Math.ceil(Math.hypot(b[0] - a[0], b[1] - a[1]) / (CELL / 2)));
    for (let k = 0; k <= steps; k += 1) {
      mark(a[0] + (k / steps) * (b[0] - a[0]), a[1] + (k / steps) * (b[1] - a[1]));
    }
  }
  const at = (i: number, j: number): boolean =>
    i >= 0 && i < across && j >= 0 && j < down && cells[j * across + i] === 1;
  return (box) => {
    const [left, right] = [Math.floor(box.left / CELL), Math.floor(box.right / CELL)];
    const [top, bottom] = [Math.floor(box.top / CELL), Math.floor(box.bottom / CELL)];
    let hits = 0;
    for (let j = top; j <= bottom; j += 1) for (let i = left; i <= right; i += 1) if (at(i, j)) hits += 1;
    return hits / (Math.min(right - left, bottom - top) + 1);
  };
}
