// A part of the surface that is searched: polygons, or what of them lies inside or outside of others.
import { nearestOnBoundary, type Polygon } from '../geometry/area.ts';
import { insideIndex } from './inside-index.ts';
import type { Grid } from './lattice.ts';

export interface Region {
  /** outlines along which a maximum may lie */
  readonly edges: readonly Polygon[];
  inside(x: number, y: number): boolean;
}

export function areaRegion(area: readonly Polygon[]): Region {
  return { edges: area, inside: insideIndex(area) };
}

/** The part of an area inside, or outside, of another; the shared edge belongs to both. */
export function partOf(
  area: readonly Polygon[],
  side: 'inside' | 'outside',
  other: readonly Polygon[],
): Region {
  const within = side === 'inside';
  const [inArea, inOther] = [insideIndex(area), insideIndex(other)];
  return {
    edges: [...area, ...other],
    inside: (x, y) => inArea(x, y) && inOther(x, y) === within,
  };
}

/** Most places taken of a region's edges: rounded corners have corners by the hundred. */
const MOST_EDGE_PLACES = 60;

/** Corners and edge midpoints, evenly thinned: places that a lattice may step over. */
export function edgePlaces(region: Region): [number, number][] {
  const all = region.edges.flatMap((polygon) =>
    polygon.flatMap(([x, y], k): [number, number][] => {
      const [u, v] = polygon[(k + 1) % polygon.length]!;
      return [
        [x, y],
        [(x + u) / 2, (y + v) / 2],
      ];
    }),
  );
  const stride = Math.max(1, Math.ceil(all.length / MOST_EDGE_PLACES));
  return all.filter((_, k) => k % stride === 0);
}

/**
 * The direction of the nearest edge at a place, both ways, of a given length. A search asks again at the place where it
 * stays, so that the last answer is kept.
 */
export function edgeDirections(
  region: Region,
  length: number,
): (x: number, y: number) => readonly (readonly [number, number])[] {
  let [lastX, lastY] = [Number.NaN, Number.NaN];
  let last: readonly (readonly [number, number])[] = [];
  return (x, y) => {
    if (x === lastX && y === lastY) return last;
    const [, , tx, ty] = nearestOnBoundary(region.edges, x, y);
    [lastX, lastY] = [x, y];
    last = [
      [length * tx, length * ty],
      [-length * tx, -length * ty],
    ];
    return last;
  };
}

/** The nearest place of an edge, where one is near: a maximum on the edge is climbed along it. */
export function onEdge(region: Region, x: number, y: number, near: number): [number, number][] {
  const [ex, ey] = nearestOnBoundary(region.edges, x, y);
  return Math.hypot(ex - x, ey - y) <= near ? [[ex, ey]] : [];
}

/** Columns next to where an edge crosses a row are asked one by one; this much more of a spacing, for rounding. */
const BESIDE = 1e-3;

/** 1 where a lattice point lies in a region: along a row the answer holds until an edge is crossed. */
export function regionMask(lattice: Grid, region: Region): Uint8Array {
  const { nx, ny, x0, y0, spacing } = lattice;
  const mask = new Uint8Array(nx * ny);
  const crossings = edgeCrossings(lattice, region);
  const near = new Uint8Array(nx);
  for (let j = 0; j < ny; j++) {
    near.fill(0);
    for (const [from, to] of crossings[j]!) near.fill(1, Math.max(0, from), Math.max(0, to + 1));
    for (let i = 0; i < nx; i++) {
      const same = i > 0 && near[i] === 0 && near[i - 1] === 0;
      if (same) mask[j * nx + i] = mask[j * nx + i - 1]!;
      else mask[j * nx + i] = region.inside(x0 + i * spacing, y0 + j * spacing) ? 1 : 0;
    }
  }
  return mask;
}

/** For each row of a lattice, the runs of columns that an edge of a region crosses or passes beside. */
function edgeCrossings({ ny, x0, y0, spacing }: Grid, region: Region): [from: number, to: number][][] {
  const rows = Array.from({ length: ny }, (): [number, number][] => []);
  for (const polygon of region.edges)
    polygon.forEach(([x2, y2], k) => {
      const [x1, y1] = polygon.at(k - 1)!;
      const rowOf = (y: number): number => (y - y0) / spacing;
      const first = Math.max(0, Math.ceil(rowOf(Math.min(y1, y2)) - BESIDE));
      const last = Math.min(ny - 1, Math.floor(rowOf(Math.max(y1, y2)) + BESIDE));
      for (let j = first; j <= last; j++) {
        const along = (row: number): number =>
          y1 === y2 ? 0 : Math.min(1, Math.max(0, (y0 + row * spacing - y1) / (y2 - y1)));
        const [a, b] =
          y1 === y2 ? [x1, x2] : [j - BESIDE, j + BESIDE].map((row) => x1 + along(row) * (x2 - x1));
        const column = (x: number): number => (x - x0) / spacing;
        rows[j]!.push([
          Math.floor(column(Math.min(a!, b!)) - BESIDE),
          Math.ceil(column(Math.max(a!, b!)) + BESIDE),
        ]);
      }
    });
  return rows;
}
