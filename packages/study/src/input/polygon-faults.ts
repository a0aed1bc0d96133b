// What can be wrong with the outline of an area: corners that repeat, edges that cross, no area.
import type { Point, Polygon } from '../study.ts';

/** Twice the signed area of the triangle a, b, c, m². */
function turn(a: Point, b: Point, c: Point): number {
  return (b[0] - a[0]) * (c[1] - a[1]) - (b[1] - a[1]) * (c[0] - a[0]);
}

function same(a: Point, b: Point): boolean {
  return a[0] === b[0] && a[1] === b[1];
}

/** Whether c, on the line through a and b, lies between them. */
function between(a: Point, b: Point, c: Point): boolean {
  return (
    Math.min(a[0], b[0]) <= c[0] &&
    c[0] <= Math.max(a[0], b[0]) &&
    Math.min(a[1], b[1]) <= c[1] &&
    c[1] <= Math.max(a[1], b[1])
  );
}

/** Whether the edges a–b and c–d share a point. */
function meet(a: Point, b: Point, c: Point, d: Point): boolean {
  const [abc, abd, cda, cdb] = [turn(a, b, c), turn(a, b, d), turn(c, d, a), turn(c, d, b)];
  if (abc * abd < 0 && cda * cdb < 0) return true;
  return (
    (abc === 0 && between(a, b, c)) ||
    (abd === 0 && between(a, b, d)) ||
    (cda === 0 && between(c, d, a)) ||
    (cdb === 0 && between(c, d, b))
  );
}

/** Whether the outline turns back on itself at b, on its way from a to c. */
function foldsBack(a: Point, b: Point, c: Point): boolean {
  const forward = (b[0] - a[0]) * (c[0] - b[0]) + (b[1] - a[1]) * (c[1] - b[1]);
  return turn(a, b, c) === 0 && forward < 0;
}

function shownCorner(corner: Point): string {
  return `(${corner[0]}, ${corner[1]})`;
}

/**
 * Judges the outline of an area.
 * @param corners at least three, in order, m
 * @returns the first thing wrong with it, corners counted from 1, or `undefined` for a simple outline with area
 */
export function polygonFault(corners: Polygon): string | undefined {
  const count = corners.length;
  const corner = (i: number): Point => corners[i % count];
  if (same(corner(0), corner(count - 1))) {
    return `the last corner ${shownCorner(corner(0))} repeats the first; leave it out, the outline closes by itself`;
  }
  for (let i = 0; i + 1 < count; i++) {
    if (same(corner(i), corner(i + 1)))
      return `corners ${i + 1} and ${i + 2} are the same, ${shownCorner(corner(i))}`;
  }
  let flat = true;
  for (let i = 1; i + 1 < count; i++) if (turn(corner(0), corner(i), corner(i + 1)) !== 0) flat = false;
  if (flat) return 'the outline has no area; all corners lie on one line';
  for (let i = 0; i < count; i++) {
    if (foldsBack(corner(i), corner(i + 1), corner(i + 2))) {
      return `the outline turns back on itself at corner ${((i + 1) % count) + 1}, ${shownCorner(corner(i + 1))}`;
    }
    for (let j = i + 2; j < count; j++) {
      if (i === 0 && j === count - 1) continue;
      if (!meet(corner(i), corner(i + 1), corner(j), corner(j + 1))) continue;
      const edges = `the edge after corner ${i + 1} and the edge after corner ${j + 1}`;
      return `${edges} cross or touch; expected an outline that does not meet itself`;
    }
  }
  return undefined;
}
