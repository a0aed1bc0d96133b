// Turns a lattice of values into filled bands and the lines between them, in metres.
import type { CaseMap, Point } from '@ohmstead/study';
import { contours } from 'd3-contour';
import { simplifyRing } from './simplify.ts';

export type Lattice = Pick<CaseMap, 'x0' | 'y0' | 'dx' | 'dy' | 'nx' | 'ny'>;

/** All that reaches a level. */
export interface Band {
  readonly level: number;
  /** closed outlines of where value ≥ level, first point not repeated; to be filled even–odd, m */
  readonly rings: readonly (readonly Point[])[];
  /** the lines value = level alone, without the runs along the border of the lattice; m */
  readonly lines: readonly Isoline[];
}

export interface Isoline {
  readonly points: readonly Point[];
  readonly closed: boolean;
}

/** Contours may be drawn this far off, of the lattice spacing: below what is seen, half the bytes. */
const SIMPLIFY_SHARE = 0.06;

/** Rectangle that the lattice spans, m. */
export function latticeExtent(lattice: Lattice): { readonly x: Point; readonly y: Point } {
  const { x0, y0, dx, dy, nx, ny } = lattice;
  return { x: [x0, x0 + (nx - 1) * dx], y: [y0, y0 + (ny - 1) * dy] };
}

/**
 * From the contour generator's raster coordinates to metres. There sample (i, j) stands at (i + ½, j + ½), and rings
 * close half a cell outside the samples; here they are shifted back and clipped to the lattice.
 */
function toMetres(lattice: Lattice, ring: readonly (readonly number[])[]): readonly Point[] {
  const { x0, y0, dx, dy, nx, ny } = lattice;
  const points = ring.slice(0, -1).map(([u, v]): Point => {
    const i = Math.min(nx - 1, Math.max(0, u - 0.5));
    const j = Math.min(ny - 1, Math.max(0, v - 0.5));
    return [x0 + i * dx, y0 + j * dy];
  });
  return simplifyRing(points, SIMPLIFY_SHARE * Math.min(dx, dy));
}

/** Whether both points lie on the same side of the rectangle, so that the piece between them is border, not contour. */
function alongBorder(lattice: Lattice, a: Point, b: Point): boolean {
  const { x, y } = latticeExtent(lattice);
  return (
    (a[0] === b[0] && (a[0] === x[0] || a[0] === x[1])) || (a[1] === b[1] && (a[1] === y[0] || a[1] === y[1]))
  );
}

/** Cuts a ring at its runs along the border. */
function isolinesOf(lattice: Lattice, ring: readonly Point[]): readonly Isoline[] {
  const count = ring.length;
  const border = ring.map((p, i) => alongBorder(lattice, p, ring[(i + 1) % count]));
  const first = border.indexOf(true);
  if (first < 0) return [{ points: ring, closed: true }];
  const lines: Isoline[] = [];
  let open: Point[] = [];
  for (let k = 1; k <= count; k += 1) {
    const i = (first + k) % count;
    open.push(ring[i]);
    if (border[i]) {
      if (open.length > 1) lines.push({ points: open, closed: false });
      open = [];
    }
  }
  return lines;
}

/**
 * Filled bands of a lattice of values, one a level.
 * @param values shape [ny·nx], value (i, j) at index j·nx + i
 * @param levels rising, in the unit of the values
 */
export function bandsOf(
  lattice: Lattice,
  values: ArrayLike<number>,
  levels: readonly number[],
): readonly Band[] {
  const list = Array.from(values);
  const generator = contours().size([lattice.nx, lattice.ny]);
  return levels.map((level) => {
    const rings = generator
      .contour(list, level)
      .coordinates.flat()
      .map((ring) => toMetres(lattice, ring))
      .filter((ring) => ring.length > 2);
    return { level, rings, lines: rings.flatMap((ring) => isolinesOf(lattice, ring)) };
  });
}
