// The far part of a map: moments of the metal in each cell, passed up to coarser cells, across, and down to the points (Fong 2009).
import { gaussLegendre } from '../numerics/gauss-legendre.ts';
import { cellMatrices } from './cell-matrices.ts';
import type { MapArithmetic } from './map-arithmetic.ts';
import {
  type CellLevel,
  type CellRange,
  cellCount,
  common,
  heightOf,
  type MapCells,
  placeIn,
  widthOf,
} from './map-cells.ts';
import type { GroupPlaces, MapLayout } from './map-layout.ts';
import type { MetalPieces } from './metal-pieces.ts';
import { addTerms, ORDER, polynomials, quarterMatrices, TERMS } from './plan-expansion.ts';
import type { SegmentGroup } from './segment-group.ts';

/** Gauss points on a piece: exact for the highest degree. */
const MOMENT_ORDER = 4;

/** Adds each piece's even leakage times every term, summed along it, to the moments of its cell. */
export function addMoments(
  n: Float64Array,
  group: SegmentGroup,
  pieces: MetalPieces,
  cells: MapCells,
  cases: number,
  moments: readonly number[],
): void {
  const { points, weights } = gaussLegendre(MOMENT_ORDER);
  const tx = new Float64Array(ORDER);
  const ty = new Float64Array(ORDER);
  const mean = new Float64Array(TERMS);
  for (let p = 0; p < pieces.count; p++) {
    const j = pieces.segment[p]!;
    const k = pieces.level[p]!;
    const { side, sources } = cells.levels[k]!;
    const half = side / 2;
    const x = (group.cx[j]! - cells.west(k, pieces.column[p]!)) / half - 1;
    const y = (group.cy[j]! - cells.south(k, pieces.row[p]!)) / half - 1;
    const hx = group.hx[j]! / half;
    const hy = group.hy[j]! / half;
    const from = pieces.from[p]!;
    const span = pieces.to[p]! - from;
    mean.fill(0);
    for (let g = 0; g < MOMENT_ORDER; g++) {
      const t = from + points[g]! * span;
      polynomials(x + t * hx, tx);
      polynomials(y + t * hy, ty);
      addTerms((weights[g]! * span) / 2, tx, ty, mean);
    }
    const cell = moments[k]! + placeIn(sources, pieces.column[p]!, pieces.row[p]!) * TERMS;
    const perCase = cellCount(sources) * TERMS;
    for (let u = 0; u < cases; u++) {
      const strength = group.strength[j * cases + u]!;
      const at = cell + u * perCase;
      for (let term = 0; term < TERMS; term++) n[at + term]! += strength * mean[term]!;
    }
  }
}

/** Moments of quarters into those of their cells, level by level. */
export function passUp(
  a: MapArithmetic,
  cells: MapCells,
  cases: number,
  layout: MapLayout,
  moments: readonly number[],
): void {
  for (let k = 0; k + 1 < cells.levels.length; k++) {
    const fine = cells.levels[k]!.sources;
    const coarse = cells.levels[k + 1]!.sources;
    forQuarters(fine, coarse, (quarter, part, cell, columns, rows) => {
      a.numbers.set(quarterMatrices[quarter]!.up, layout.matrix);
      for (let u = 0; u < cases; u++)
        a.transfer(
          layout.matrix,
          layout.limits.full,
          steps(moments[k]!, u, fine, part, 2),
          steps(moments[k + 1]!, u, coarse, cell, 1),
          columns,
          rows,
        );
    });
  }
}

/** Fields of cells into those of their quarters, from the coarsest level to the finest. */
export function passDown(a: MapArithmetic, cells: MapCells, cases: number, layout: MapLayout): void {
  for (let k = cells.levels.length - 2; k >= 0; k--) {
    const fine = cells.levels[k]!.targets;
    const coarse = cells.levels[k + 1]!.targets;
    forQuarters(fine, coarse, (quarter, part, cell, columns, rows) => {
      a.numbers.set(quarterMatrices[quarter]!.down, layout.matrix);
      for (let u = 0; u < cases; u++)
        a.transfer(
          layout.matrix,
          layout.limits.full,
          steps(layout.expansions[k + 1]!, u, coarse, cell, 1),
          steps(layout.expansions[k]!, u, fine, part, 2),
          columns,
          rows,
        );
    });
  }
}

function steps(
  first: number,
  u: number,
  range: CellRange,
  place: number,
  step: number,
  stepNorth: number = step,
): { at: number; eastward: number; northward: number } {
  return {
    at: first + (u * cellCount(range) + place) * TERMS,
    eastward: step * TERMS,
    northward: stepNorth * widthOf(range) * TERMS,
  };
}

/** For each quarter: places of the first fine cell of its kind and of its cell, and how many of them there are each way. */
function forQuarters(
  fine: CellRange,
  coarse: CellRange,
  each: (quarter: number, part: number, cell: number, columns: number, rows: number) => void,
): void {
  for (let quarter = 0; quarter < 4; quarter++) {
    const [e, n] = [quarter & 1, quarter >> 1];
    const both = common(coarse, {
      west: Math.ceil((fine.west - e) / 2),
      east: Math.floor((fine.east - e) / 2),
      south: Math.ceil((fine.south - n) / 2),
      north: Math.floor((fine.north - n) / 2),
    });
    if (cellCount(both) === 0) continue;
    const part = placeIn(fine, 2 * both.west + e, 2 * both.south + n);
    each(quarter, part, placeIn(coarse, both.west, both.south), widthOf(both), heightOf(both));
  }
}

/** Farthest cells, counted in cells, whose parents may be neighbours. */
const FARTHEST = 3;
const OFFSETS: readonly (readonly [across: number, up: number])[] = Array.from(
  { length: (2 * FARTHEST + 1) ** 2 },
  (_, k) => [(k % (2 * FARTHEST + 1)) - FARTHEST, Math.floor(k / (2 * FARTHEST + 1)) - FARTHEST],
);

/**
 * Moments into fields: of cells that are not neighbours while their parents are, at every level, and at the finest of
 * neighbours by the table of the farther images where that is smooth.
 */
export function passAcross(
  a: MapArithmetic,
  cells: MapCells,
  cases: number,
  layout: MapLayout,
  { all, rest, moments }: GroupPlaces,
  smooth: boolean,
): void {
  const { limits, matrix } = layout;
  cells.levels.forEach((level, k) => {
    const coarsest = k === cells.levels.length - 1;
    const pass = (
      across: number,
      up: number,
      limit: number,
      write: ReturnType<typeof cellMatrices>['write'],
    ) => {
      const stepX = !coarsest && Math.abs(across) === FARTHEST ? 2 : 1;
      const stepY = !coarsest && Math.abs(up) === FARTHEST ? 2 : 1;
      const both = reached(level, across, up, stepX, stepY);
      const columns = Math.ceil(widthOf(both) / stepX);
      const rows = Math.ceil(heightOf(both) / stepY);
      if (columns === 0 || rows === 0) return;
      write(across, up, matrix);
      const source = placeIn(level.sources, both.west - across, both.south - up);
      const target = placeIn(level.targets, both.west, both.south);
      for (let u = 0; u < cases; u++)
        a.transfer(
          matrix,
          limit,
          steps(moments[k]!, u, level.sources, source, stepX, stepY),
          steps(layout.expansions[k]!, u, level.targets, target, stepX, stepY),
          columns,
          rows,
        );
    };
    const half = level.side / 2;
    const far = cellMatrices(a, all, half, layout.matrixRoom, limits.full);
    for (const [across, up] of OFFSETS) {
      const apart = Math.max(Math.abs(across), Math.abs(up));
      if (apart >= 2) pass(across, up, apart === 2 ? limits.two : limits.three, far.write);
    }
    if (k > 0 || rest === undefined || !smooth) return;
    const near = cellMatrices(a, rest, half, layout.matrixRoom, limits.full);
    for (const [across, up] of OFFSETS)
      if (Math.max(Math.abs(across), Math.abs(up)) < 2) pass(across, up, limits.near, near.write);
  });
}

/** Targets whose source, so many cells back, may hold metal and, where that is three cells, has a near parent. */
function reached(
  { targets, sources }: CellLevel,
  across: number,
  up: number,
  stepX: number,
  stepY: number,
): CellRange {
  const both = common(targets, {
    west: sources.west + across,
    east: sources.east + across,
    south: sources.south + up,
    north: sources.north + up,
  });
  // three cells east of its source a target must be an eastern quarter, three cells west a western one
  const odd = (first: number, step: number, offset: number): number =>
    step === 2 && (first & 1) !== (offset > 0 ? 1 : 0) ? first + 1 : first;
  return { ...both, west: odd(both.west, stepX, across), south: odd(both.south, stepY, up) };
}
