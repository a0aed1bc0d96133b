// Areas within a distance of polygons or lines, with rounded corners, merged where they meet.
import { Clipper, EndType, FillRule, JoinType, type Path64, type Paths64 } from 'clipper2-ts';
import { type Polygon, signedArea } from './polygon.ts';
import { tidyPolygons } from './tidy-polygon.ts';

/** A straight line in plan, m; its ends may be one place. */
export type PlanLine = readonly [x1: number, y1: number, x2: number, y2: number];

/** Step of the integer lattice on which areas are merged, m: ten times finer than a drawing; exact for extents up to 5 km. */
const LATTICE_M = 1e-4;

/** Largest distance between an arc and the chords that stand for it, m: far below what moves a voltage. */
const ARC_TOLERANCE_M = 1e-3;

/** Miter limit of the library; of no meaning with rounded corners. */
const MITER_LIMIT = 2;

/**
 * Area inside polygons and within a distance outside them.
 * @param distance m, not negative
 * @returns even–odd: outer boundaries counter-clockwise, holes clockwise, the lowest first
 */
export function grownOutlines(polygons: readonly Polygon[], distance: number): Polygon[] {
  const lattice = latticeOf(polygons.flat());
  const merged = Clipper.union(polygons.map(lattice.path), FillRule.EvenOdd);
  return lattice.polygons(distance === 0 ? merged : inflate(merged, distance, EndType.Polygon));
}

/**
 * Area within a distance of straight lines in plan; a line without length gives a disc.
 * @param distance m, positive
 * @returns as {@link grownOutlines}
 */
export function corridors(lines: readonly PlanLine[], distance: number): Polygon[] {
  const ends = lines.map(
    ([x1, y1, x2, y2]): Polygon => [
      [x1, y1],
      [x2, y2],
    ],
  );
  const lattice = latticeOf(ends.flat());
  return lattice.polygons(inflate(ends.map(lattice.path), distance, EndType.Round));
}

/** Area of even–odd filled polygons that may cross each other, m². */
export function areaSquareMetres(polygons: readonly Polygon[]): number {
  return grownOutlines(polygons, 0).reduce((sum, polygon) => sum + signedArea(polygon), 0);
}

function inflate(paths: Paths64, distance: number, end: EndType): Paths64 {
  const grown = Clipper.inflatePaths(
    paths,
    distance / LATTICE_M,
    JoinType.Round,
    end,
    MITER_LIMIT,
    ARC_TOLERANCE_M / LATTICE_M,
  );
  return Clipper.union(grown, FillRule.NonZero);
}

/** The integer lattice with a whole metre near the places for its origin, so that map coordinates stay exact. */
function latticeOf(places: readonly (readonly [number, number])[]): {
  path: (corners: Polygon) => Path64;
  polygons: (paths: Paths64) => Polygon[];
} {
  const originX = Math.floor(places.reduce((least, [x]) => Math.min(least, x), places[0]?.[0] ?? 0));
  const originY = Math.floor(places.reduce((least, [, y]) => Math.min(least, y), places[0]?.[1] ?? 0));
  const stepsPerMetre = 1 / LATTICE_M;
  return {
    path: (corners) =>
      corners.map(([x, y]) => ({
        x: Math.round((x - originX) * stepsPerMetre),
        y: Math.round((y - originY) * stepsPerMetre),
      })),
    polygons: (paths) =>
      tidyPolygons(
        paths.map((path) =>
          path.map(({ x, y }) => [originX + x / stepsPerMetre, originY + y / stepsPerMetre] as const),
        ),
      ),
  };
}
