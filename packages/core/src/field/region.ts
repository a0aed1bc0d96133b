// A part of the surface that is searched: polygons, or what of them lies inside or outside of others.
import { insideArea, nearestOnBoundary, type Polygon } from '../geometry/area.ts';
import type { Lattice } from './lattice.ts';

export interface Region {
  /** outlines along which a maximum may lie */
  readonly edges: readonly Polygon[];
  inside(x: number, y: number): boolean;
}

export function areaRegion(area: readonly Polygon[]): Region {
  return { edges: area, inside: (x, y) => insideArea(area, x, y) };
}

/** The part of an area inside, or outside, of another; the shared edge belongs to both. */
export function partOf(
  area: readonly Polygon[],
  side: 'inside' | 'outside',
  other: readonly Polygon[],
): Region {
  const within = side === 'inside';
  return {
    edges: [...area, ...other],
    inside: (x, y) => insideArea(area, x, y) && insideArea(other, x, y) === within,
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

/** The direction of the nearest edge at a place, both ways, of a given length. */
export function alongEdge(region: Region, x: number, y: number, length: number): [number, number][] {
  const [, , tx, ty] = nearestOnBoundary(region.edges, x, y);
  return [
    [length * tx, length * ty],
    [-length * tx, -length * ty],
  ];
}

/** The nearest place of an edge, where one is near: a maximum on the edge is climbed along it. */
export function onEdge(region: Region, x: number, y: number, near: number): [number, number][] {
  const [ex, ey] = nearestOnBoundary(region.edges, x, y);
  return Math.hypot(ex - x, ey - y) <= near ? [[ex, ey]] : [];
}

/** 1 where a lattice point lies in a region. */
export function regionMask(lattice: Lattice, region: Region): Uint8Array {
  const { nx, x0, y0, spacing } = lattice;
  return Uint8Array.from(lattice.values, (_, place) =>
    region.inside(x0 + (place % nx) * spacing, y0 + Math.floor(place / nx) * spacing) ? 1 : 0,
  );
}
