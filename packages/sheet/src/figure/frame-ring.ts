// Border of the ground of a plate.
import type { Point } from '@ohmstead/study';
import type { Plate } from '../geometry/plate.ts';

/** Four corners, drawing units. */
export function frameRing(plate: Plate): readonly Point[] {
  const { left, top, right, bottom } = plate.frame;
  return [
    [left, top],
    [right, top],
    [right, bottom],
    [left, bottom],
  ];
}
