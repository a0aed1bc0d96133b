// Whether places lie in an area, for areas that are asked often: edges sorted by the rows of ground that they cross.
import { ON_BOUNDARY_M, type Polygon } from '../geometry/polygon.ts';

/** Rows over the height of an area: in each there are only a few edges. */
const ROWS = 256;

/** Edges of each row, four coordinates each. */
interface EdgeRows {
  readonly south: number;
  readonly height: number;
  readonly rows: readonly Float64Array[];
}

const made = new WeakMap<readonly Polygon[], EdgeRows>();

/** The same answers as `insideArea`, from the edges at the height of the place; these are sorted at the first question. */
export function insideIndex(area: readonly Polygon[]): (x: number, y: number) => boolean {
  return (x, y) => {
    let index = made.get(area);
    if (index === undefined) {
      index = edgeRows(area);
      made.set(area, index);
    }
    const edges = index.rows[Math.floor((y - index.south) / index.height)];
    if (edges === undefined) return false;
    let inside = false;
    for (let e = 0; e < edges.length; e += 4) {
      const x1 = edges[e]!;
      const y1 = edges[e + 1]!;
      const x2 = edges[e + 2]!;
      const y2 = edges[e + 3]!;
      if (onEdge(x1, y1, x2, y2, x, y)) return true;
      if (y1 > y !== y2 > y && x < x1 + ((y - y1) / (y2 - y1)) * (x2 - x1)) inside = !inside;
    }
    return inside;
  };
}

function edgeRows(area: readonly Polygon[]): EdgeRows {
  const ys = area.flat().map(([, y]) => y);
  const lowest = ys.reduce((a, b) => Math.min(a, b), Infinity);
  const highest = ys.reduce((a, b) => Math.max(a, b), -Infinity);
  if (ys.length === 0) return { south: 0, height: 1, rows: [] };
  const height = (highest - lowest) / ROWS || 1;
  // half a row more on either side, for places on the lowest and highest edges
  const south = lowest - height / 2;
  const rows = Array.from({ length: ROWS + 2 }, (): number[] => []);
  const rowOf = (y: number): number =>
    Math.min(rows.length - 1, Math.max(0, Math.floor((y - south) / height)));
  for (const polygon of area)
    polygon.forEach(([x2, y2], k) => {
      const [x1, y1] = polygon.at(k - 1)!;
      const last = rowOf(Math.max(y1, y2) + 2 * ON_BOUNDARY_M);
      for (let row = rowOf(Math.min(y1, y2) - 2 * ON_BOUNDARY_M); row <= last; row++)
        rows[row]!.push(x1, y1, x2, y2);
    });
  return { south, height, rows: rows.map((edges) => Float64Array.from(edges)) };
}

function onEdge(x1: number, y1: number, x2: number, y2: number, x: number, y: number): boolean {
  if (x < Math.min(x1, x2) - ON_BOUNDARY_M || x > Math.max(x1, x2) + ON_BOUNDARY_M) return false;
  if (y < Math.min(y1, y2) - ON_BOUNDARY_M || y > Math.max(y1, y2) + ON_BOUNDARY_M) return false;
  const dx = x2 - x1;
  const dy = y2 - y1;
  const squared = dx * dx + dy * dy;
  const t = squared > 0 ? Math.min(1, Math.max(0, ((x - x1) * dx + (y - y1) * dy) / squared)) : 0;
  return Math.hypot(x - x1 - t * dx, y - y1 - t * dy) <= ON_BOUNDARY_M;
}
