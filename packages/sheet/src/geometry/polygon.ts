// Tests of points against polygons in plan, even–odd as areas are filled.
import type { Point, Polygon } from '@ohmstead/study';

/** Whether a point lies inside an odd number of the polygons' rings. */
export function insideEvenOdd(polygons: readonly Polygon[], x: number, y: number): boolean {
  let inside = false;
  for (const polygon of polygons) {
    for (let i = 0, j = polygon.length - 1; i < polygon.length; j = i, i += 1) {
      const [xi, yi] = polygon[i];
      const [xj, yj] = polygon[j];
      if (yi > y !== yj > y && x < ((xj - xi) * (y - yi)) / (yj - yi) + xi) inside = !inside;
    }
  }
  return inside;
}

/** Twice the signed area of a ring; positive where it runs anticlockwise with y upward, m². */
export function signedDoubleArea(ring: readonly Point[]): number {
  let sum = 0;
  for (let i = 0, j = ring.length - 1; i < ring.length; j = i, i += 1) {
    sum += ring[j][0] * ring[i][1] - ring[i][0] * ring[j][1];
  }
  return sum;
}
