// A polygon in its one standard form: no corner on a straight side, starting at the lowest, then leftmost corner.
import type { Polygon } from './polygon.ts';

/** A corner nearer than this to the line between its neighbours is none, m: rounding, far below the tolerance of drawing. */
const STRAIGHT_M = 1e-6;

/** Polygons in standard form, the lowest, then leftmost start first; each keeps its sense, and one that encloses nothing is left out. */
export function tidyPolygons(polygons: readonly Polygon[]): Polygon[] {
  return polygons
    .map(withoutStraightCorners)
    .filter((polygon) => polygon.length >= 3)
    .map(fromLowest)
    .sort(([p], [q]) => p![1] - q![1] || p![0] - q![0]);
}

function withoutStraightCorners(polygon: Polygon): Polygon {
  const corners: (readonly [number, number])[] = [];
  polygon.forEach((corner, i) => {
    const before = corners.at(-1) ?? polygon.at(-1)!;
    const after = polygon[(i + 1) % polygon.length]!;
    if (!straight(before, corner, after)) corners.push(corner);
  });
  return corners;
}

function fromLowest(polygon: Polygon): Polygon {
  const lowest = Math.min(...polygon.map(([, y]) => y)) + STRAIGHT_M;
  const start = polygon.reduce((best, [x, y], i) => {
    const from = polygon[best]!;
    return y <= lowest && (from[1] > lowest || x < from[0]) ? i : best;
  }, 0);
  return [...polygon.slice(start), ...polygon.slice(0, start)];
}

function straight(
  p: readonly [number, number],
  q: readonly [number, number],
  r: readonly [number, number],
): boolean {
  const dx = r[0] - p[0];
  const dy = r[1] - p[1];
  const along = Math.hypot(dx, dy);
  const off = dx * (q[1] - p[1]) - dy * (q[0] - p[0]);
  return along === 0 || Math.abs(off) <= STRAIGHT_M * along;
}
