// What a map became since another one: differences on the lattice that both cover, as bands to either side of nothing.
import type { CaseMap, Polygon } from '@ohmstead/study';
import { valueAt } from './coarse.ts';
import { type Band, bandsOf, type Lattice } from './contours.ts';
import type { MapKind } from './map-drawing.ts';
import { insideEvenOdd } from './polygon.ts';
import { roundStep } from './ticks.ts';

export interface Difference {
  readonly lattice: Lattice;
  /** now less before, V; touch and step as magnitudes */
  readonly values: Float64Array;
  /** what both maps together may be off by, V */
  readonly error: number;
}

export interface Extreme {
  /** V, signed */
  readonly value: number;
  readonly x: number;
  readonly y: number;
}

export interface DifferenceDrawing extends Difference {
  /** V from one band to the next */
  readonly step: number;
  /** bands in either direction; farther off than the assessed area goes, the last one goes on */
  readonly count: number;
  /** what lies at least so many volts higher; levels rising */
  readonly up: readonly Band[];
  /** what lies at least so many volts lower; levels rising, positive */
  readonly down: readonly Band[];
  /** greatest increase and greatest decrease in the assessed area; undefined where there is none */
  readonly most: Extreme | undefined;
  readonly least: Extreme | undefined;
}

/** About so many bands in the direction that changed most. */
const BANDS = 5;
/** A lattice needs so many points each way to be contoured. */
const LEAST_POINTS = 2;

/** Indices of the points of one axis that lie on the other one. */
function overlap(
  [from, step, count]: readonly [number, number, number],
  [low, high]: readonly [number, number],
): readonly [first: number, last: number] {
  const slack = 1e-9 * step;
  const first = Math.max(0, Math.ceil((low - from - slack) / step));
  return [first, Math.min(count - 1, Math.floor((high - from + slack) / step))];
}

/** Differences of a kind of voltage on the points of the newer map that the older one covers; undefined without any. */
export function differenceOf(now: CaseMap, before: CaseMap, kind: MapKind): Difference | undefined {
  const [i0, i1] = overlap([now.x0, now.dx, now.nx], [before.x0, before.x0 + (before.nx - 1) * before.dx]);
  const [j0, j1] = overlap([now.y0, now.dy, now.ny], [before.y0, before.y0 + (before.ny - 1) * before.dy]);
  const [nx, ny] = [i1 - i0 + 1, j1 - j0 + 1];
  if (nx < LEAST_POINTS || ny < LEAST_POINTS) return undefined;
  const told = (volts: number): number => (kind === 'potential' ? volts : Math.abs(volts));
  const lattice: Lattice = {
    x0: now.x0 + i0 * now.dx,
    y0: now.y0 + j0 * now.dy,
    dx: now.dx,
    dy: now.dy,
    nx,
    ny,
  };
  const values = new Float64Array(nx * ny);
  for (let j = 0; j < ny; j += 1) {
    for (let i = 0; i < nx; i += 1) {
      const then = valueAt(before, before[kind], lattice.x0 + i * now.dx, lattice.y0 + j * now.dy);
      values[j * nx + i] = told(now[kind][(j0 + j) * now.nx + i0 + i]) - told(then);
    }
  }
  return { lattice, values, error: now.error + before.error };
}

/** Greatest increase and greatest decrease, in the areas or, without any, on the whole lattice. */
function extremes(
  { lattice, values }: Difference,
  areas: readonly Polygon[],
): readonly (Extreme | undefined)[] {
  const { x0, y0, dx, dy, nx } = lattice;
  let most: Extreme | undefined;
  let least: Extreme | undefined;
  values.forEach((value, k) => {
    if (!(value > (most?.value ?? 0)) && !(value < (least?.value ?? 0))) return;
    const [x, y] = [x0 + (k % nx) * dx, y0 + Math.floor(k / nx) * dy];
    if (areas.length > 0 && !insideEvenOdd(areas, x, y)) return;
    if (value > 0) most = { value, x, y };
    else least = { value, x, y };
  });
  return [most, least];
}

/**
 * Bands by round volts to either side, fine enough for what changed in the assessed areas.
 * @param areas where it matters; the whole ground where empty
 * @returns undefined where no place of them moved by more than the maps may be off
 */
export function differenceDrawing(
  difference: Difference,
  areas: readonly Polygon[],
): DifferenceDrawing | undefined {
  const [most, least] = extremes(difference, areas);
  const farthest = Math.max(most?.value ?? 0, -(least?.value ?? 0));
  if (!(farthest > difference.error)) return undefined;
  const step = roundStep(farthest / BANDS);
  /* a level that is only just reached would have a band without ground */
  const count = Math.ceil(farthest / step) - 1;
  const levels = Array.from({ length: count }, (_, k) => (k + 1) * step);
  const { lattice, values } = difference;
  return {
    ...difference,
    step,
    count,
    up: bandsOf(lattice, values, levels),
    down: bandsOf(
      lattice,
      values.map((value) => -value),
      levels,
    ),
    most,
    least,
  };
}
