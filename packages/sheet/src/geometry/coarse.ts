// Reads a map as a coarse table: values every few metres, and the worst value of each area.
import type { CaseMap, Polygon } from '@ohmstead/study';
import type { Lattice } from './contours.ts';
import { insideEvenOdd } from './polygon.ts';
import { roundStep } from './ticks.ts';
import { TIE_SHARE } from './ties.ts';

export interface CoarseGrid {
  /** metres, rising */
  readonly xs: readonly number[];
  /** metres, falling, so that the table reads like the plan */
  readonly ys: readonly number[];
  /** values[row][column], in the unit of the field */
  readonly values: readonly (readonly number[])[];
}

/** Most columns of the coarse table: what a printed page carries. */
const MOST_COLUMNS = 12;
/** The table is never finer than this, in the unit in which its coordinates are round. */
const FINEST_STEP = 5;

function multiples(from: number, to: number, step: number): readonly number[] {
  const list: number[] = [];
  for (let k = Math.ceil(from / step - 1e-9); k * step <= to + 1e-9 * step; k += 1)
    list.push(k === 0 ? 0 : k * step);
  return list;
}

/** Value between the samples by bilinear interpolation; places outside take the border's value. */
export function valueAt(map: Lattice, field: Float64Array, x: number, y: number): number {
  const u = Math.min(map.nx - 1, Math.max(0, (x - map.x0) / map.dx));
  const v = Math.min(map.ny - 1, Math.max(0, (y - map.y0) / map.dy));
  const i = Math.min(Math.floor(u), Math.max(0, map.nx - 2));
  const j = Math.min(Math.floor(v), Math.max(0, map.ny - 2));
  const at = (di: number, dj: number): number =>
    field[Math.min(map.ny - 1, j + dj) * map.nx + Math.min(map.nx - 1, i + di)];
  const s = u - i;
  const t = v - j;
  return (1 - t) * ((1 - s) * at(0, 0) + s * at(1, 0)) + t * ((1 - s) * at(0, 1) + s * at(1, 1));
}

/**
 * Values at round coordinates, at most twelve columns.
 * @param unit in which coordinates are round, m
 */
export function coarseGrid(map: Lattice, field: Float64Array, unit: number = 1): CoarseGrid {
  const right = map.x0 + (map.nx - 1) * map.dx;
  const top = map.y0 + (map.ny - 1) * map.dy;
  const longest = Math.max(right - map.x0, top - map.y0);
  const step = unit * Math.max(FINEST_STEP, roundStep(longest / unit / MOST_COLUMNS));
  const xs = multiples(map.x0, right, step);
  const ys = [...multiples(map.y0, top, step)].reverse();
  return { xs, ys, values: ys.map((y) => xs.map((x) => valueAt(map, field, x, y))) };
}

export interface AreaWorst {
  readonly value: number;
  readonly x: number;
  readonly y: number;
}

/** Largest magnitude of a field on the samples inside one area; undefined where no sample lies in it. */
export function worstIn(map: CaseMap, field: Float64Array, area: Polygon): AreaWorst | undefined {
  let worst: AreaWorst | undefined;
  for (let j = 0; j < map.ny; j += 1) {
    for (let i = 0; i < map.nx; i += 1) {
      const value = Math.abs(field[j * map.nx + i]);
      if (worst !== undefined && !(value > worst.value * (1 + TIE_SHARE))) continue;
      const x = map.x0 + i * map.dx;
      const y = map.y0 + j * map.dy;
      if (insideEvenOdd([area], x, y)) worst = { value, x, y };
    }
  }
  return worst;
}
