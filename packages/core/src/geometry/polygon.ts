// Areas in plan as polygons, and questions to ask of them.

/** Corners in order, m; closed without repeating the first. Outer boundaries run counter-clockwise, holes clockwise. */
export type Polygon = readonly (readonly [number, number])[];

/** Places this near to a boundary lie on it, m: rounding of coordinates, far below any drawing. */
export const ON_BOUNDARY_M = 1e-9;

/** Whether a place lies in the area (even–odd: inside an odd number of polygons) or on its boundary. */
export function insideArea(polygons: readonly Polygon[], x: number, y: number): boolean {
  let inside = false;
  for (const polygon of polygons) {
    let [x1, y1] = polygon.at(-1) ?? [Number.NaN, Number.NaN];
    for (const [x2, y2] of polygon) {
      if (onSide(x1, y1, x2, y2, x, y)) return true;
      if (y1 > y !== y2 > y && x < x1 + ((y - y1) / (y2 - y1)) * (x2 - x1)) inside = !inside;
      x1 = x2;
      y1 = y2;
    }
  }
  return inside;
}

/**
 * Place on the boundary nearest to (x, y), and the unit tangent there, in the direction in which the polygon runs.
 * Of places equally near the first one in the order of the polygons.
 * @throws RangeError if there is no boundary
 */
export function nearestOnBoundary(
  polygons: readonly Polygon[],
  x: number,
  y: number,
): readonly [x: number, y: number, tangentX: number, tangentY: number] {
  let best: readonly [number, number, number, number] | undefined;
  let least = Number.POSITIVE_INFINITY;
  for (const polygon of polygons) {
    let [x1, y1] = polygon.at(-1) ?? [Number.NaN, Number.NaN];
    for (const [x2, y2] of polygon) {
      const side = Math.hypot(x2 - x1, y2 - y1);
      const t = footOn(x1, y1, x2, y2, x, y);
      const footX = x1 + t * (x2 - x1);
      const footY = y1 + t * (y2 - y1);
      const distance = Math.hypot(x - footX, y - footY);
      if (side > 0 && distance < least) {
        least = distance;
        best = [footX, footY, (x2 - x1) / side, (y2 - y1) / side];
      }
      x1 = x2;
      y1 = y2;
    }
  }
  if (best === undefined) throw new RangeError('an area without boundary has no nearest place on it');
  return best;
}

/** Area that the corners enclose, m²; positive where they run counter-clockwise (shoelace formula). */
export function signedArea(polygon: Polygon): number {
  const [originX, originY] = polygon[0] ?? [0, 0];
  let twice = 0;
  let [x1, y1] = polygon.at(-1) ?? [0, 0];
  for (const [x2, y2] of polygon) {
    twice += (x1 - originX) * (y2 - originY) - (x2 - originX) * (y1 - originY);
    x1 = x2;
    y1 = y2;
  }
  return twice / 2;
}

function onSide(x1: number, y1: number, x2: number, y2: number, x: number, y: number): boolean {
  const margin = ON_BOUNDARY_M;
  if (x < Math.min(x1, x2) - margin || x > Math.max(x1, x2) + margin) return false;
  if (y < Math.min(y1, y2) - margin || y > Math.max(y1, y2) + margin) return false;
  const t = footOn(x1, y1, x2, y2, x, y);
  return Math.hypot(x - x1 - t * (x2 - x1), y - y1 - t * (y2 - y1)) <= margin;
}

/** Share along a side of the place nearest to (x, y). */
function footOn(x1: number, y1: number, x2: number, y2: number, x: number, y: number): number {
  const dx = x2 - x1;
  const dy = y2 - y1;
  const squared = dx * dx + dy * dy;
  return squared > 0 ? Math.min(1, Math.max(0, ((x - x1) * dx + (y - y1) * dy) / squared)) : 0;
}
