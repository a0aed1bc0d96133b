// Thins a line to the points that matter (Ramer–Douglas–Peucker), so that figures stay small files.
import type { Point } from '@ohmstead/study';
import { TIE_SHARE } from './ties.ts';

function squaredDistance(p: Point, a: Point, b: Point): number {
  const dx = b[0] - a[0];
  const dy = b[1] - a[1];
  const length = dx * dx + dy * dy;
  const t = length === 0 ? 0 : Math.max(0, Math.min(1, ((p[0] - a[0]) * dx + (p[1] - a[1]) * dy) / length));
  const ex = p[0] - a[0] - t * dx;
  const ey = p[1] - a[1] - t * dy;
  return ex * ex + ey * ey;
}

/**
 * An open line without the points that lie within the tolerance of what is left; both ends stay.
 * @param tolerance largest distance by which the line may move, in the unit of the points
 */
export function simplifyLine(points: readonly Point[], tolerance: number): readonly Point[] {
  const keep = new Uint8Array(points.length);
  keep[0] = 1;
  keep[points.length - 1] = 1;
  const limit = tolerance * tolerance;
  const spans: [number, number][] = [[0, points.length - 1]];
  for (let span = spans.pop(); span !== undefined; span = spans.pop()) {
    const [first, last] = span;
    let far = -1;
    let farthest = limit;
    for (let i = first + 1; i < last; i += 1) {
      const d = squaredDistance(points[i], points[first], points[last]);
      if (d > farthest * (1 + TIE_SHARE)) {
        farthest = d;
        far = i;
      }
    }
    if (far >= 0) {
      keep[far] = 1;
      spans.push([first, far], [far, last]);
    }
  }
  return points.filter((_, i) => keep[i] === 1);
}

/** A closed ring (first point not repeated) thinned the same way, cut open at its two most distant points. */
export function simplifyRing(ring: readonly Point[], tolerance: number): readonly Point[] {
  if (ring.length < 5) return ring;
  let far = 0;
  let farthest = -1;
  for (let i = 1; i < ring.length; i += 1) {
    const d = Math.hypot(ring[i][0] - ring[0][0], ring[i][1] - ring[0][1]);
    if (d > farthest * (1 + TIE_SHARE)) {
      farthest = d;
      far = i;
    }
  }
  const there = simplifyLine(ring.slice(0, far + 1), tolerance);
  const back = simplifyLine([...ring.slice(far), ring[0]], tolerance);
  return [...there, ...back.slice(1, -1)];
}
