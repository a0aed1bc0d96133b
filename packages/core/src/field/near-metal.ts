// What a map's cell is near to, as the inner loops take it: pieces of straight wire, and points that stand for others.
import type { RadialTable } from '../leakage/radial-table.ts';
import { gaussLegendre } from '../numerics/gauss-legendre.ts';
import { heightOf, type MapCells, placeIn, widthOf } from './map-cells.ts';
import type { MetalPieces } from './metal-pieces.ts';
import type { SegmentGroup } from './segment-group.ts';

/** Ratios of distance to length past which three, and two, Gauss points leave 1e-6 of a segment's potential: x⁶/2 800, x⁴/180. */
const THREE_POINTS = 3.187;
const TWO_POINTS = 7.93;

/** What Gauss points may leave of the farther images of a near segment. */
const REST_LEFT = 1e-6;
/**
 * Gauss points on a segment for a table that is smooth on some length: n points leave ρ⁻²ⁿ, ρ = q + √(q² + 1), q twice
 * the smoothness over the length (Trefethen 2013, theorem 19.3).
 * @param left share of the potential that may be left out
 */
export function pointsAlong(length: number, smoothness: number, left: number): number {
  return Math.max(2, Math.ceil(-Math.log(left) / (2 * Math.asinh((2 * smoothness) / length))));
}

/** Numbers of a piece of wire, and of a point, before its factors. */
export const WIRE = 6;
export const POINT = 2;

/** Most numbers that a segment of a group takes in one list. */
export function nearRoom({ group }: MapGroup, cases: number): number {
  const longest = group.length.reduce((most, length) => Math.max(most, length), 0);
  const most = group.rest === undefined ? 3 : Math.max(3, restPoints(longest, group.rest));
  return Math.max(WIRE + cases, most * (POINT + cases));
}

function restPoints(length: number, rest: RadialTable): number {
  return pointsAlong(length, rest.smoothness, REST_LEFT);
}

/** Horizontal metal of one depth, and how a map sums it. */
export interface MapGroup {
  readonly group: SegmentGroup;
  /** undefined where every segment is near everywhere */
  readonly pieces: MetalPieces | undefined;
  /** the farther images are so smooth that they are transferred between neighbours too */
  readonly smooth: boolean;
}

/** Segments near a cell, each once, with the part that is. Shapes [segments of the group]. */
export interface NearParts {
  count: number;
  readonly segment: Int32Array;
  readonly from: Float64Array;
  readonly to: Float64Array;
  /** where a segment stands in the list, if its mark is the present one */
  readonly place: Int32Array;
  readonly marked: Int32Array;
  mark: number;
}

export function nearParts(segments: number): NearParts {
  const whole = (): Int32Array => new Int32Array(segments);
  const real = (): Float64Array => new Float64Array(segments);
  return { count: 0, segment: whole(), from: real(), to: real(), place: whole(), marked: whole(), mark: 0 };
}

/** Gathers the metal in a cell of the finest level and its neighbours; pieces of one segment are one again. */
function gatherNear(
  pieces: MetalPieces,
  cells: MapCells,
  column: number,
  row: number,
  into: NearParts,
): void {
  const { sources } = cells.levels[0]!;
  const { start, order } = pieces;
  const west = Math.max(column - 1, sources.west);
  const east = Math.min(column + 1, sources.east);
  const north = Math.min(row + 1, sources.north);
  into.count = 0;
  into.mark++;
  if (east < west) return;
  for (let r = Math.max(row - 1, sources.south); r <= north; r++) {
    const end = start[placeIn(sources, east, r) + 1]!;
    for (let k = start[placeIn(sources, west, r)]!; k < end; k++) {
      const piece = order[k]!;
      const segment = pieces.segment[piece]!;
      const from = pieces.from[piece]!;
      const to = pieces.to[piece]!;
      if (into.marked[segment] !== into.mark) {
        into.marked[segment] = into.mark;
        into.place[segment] = into.count;
        into.segment[into.count] = segment;
        into.from[into.count] = from;
        into.to[into.count++] = to;
      } else {
        const at = into.place[segment]!;
        if (from < into.from[at]!) into.from[at] = from;
        if (to > into.to[at]!) into.to[at] = to;
      }
    }
  }
}

/** Lists for the inner loops, written from three places on, and how many were written. */
export interface NearLists {
  readonly numbers: Float64Array;
  readonly wires: number;
  /** points on the table of all images, and on that of the farther ones */
  readonly all: number;
  readonly rest: number;
  wireCount: number;
  allCount: number;
  restCount: number;
}

/** A square of points: its middle and half side, m. */
export interface Square {
  readonly x: number;
  readonly y: number;
  readonly half: number;
}

/**
 * Writes a part of a segment: two or three Gauss points where all of the square is far for its length, else the closed
 * form and Gauss points for the farther images.
 * @param withRest false where the farther images are summed elsewhere: then the closed form alone
 */
function listPart(
  group: SegmentGroup,
  cases: number,
  j: number,
  from: number,
  to: number,
  square: Square,
  withRest: boolean,
  lists: NearLists,
): void {
  const share = (to - from) / 2;
  const t = (from + to) / 2;
  const x = group.cx[j]! + t * group.hx[j]!;
  const y = group.cy[j]! + t * group.hy[j]!;
  const hx = share * group.hx[j]!;
  const hy = share * group.hy[j]!;
  const length = share * group.length[j]!;
  const zz = group.z1 * group.z1;
  if (withRest) {
    const dx = Math.max(0, Math.abs(x - square.x) - square.half);
    const dy = Math.max(0, Math.abs(y - square.y) - square.half);
    const ratio = (dx * dx + dy * dy + zz) / (length * length);
    if (ratio > THREE_POINTS * THREE_POINTS) {
      const order = ratio > TWO_POINTS * TWO_POINTS ? 2 : 3;
      writePoints(
        lists.numbers,
        lists.all + lists.allCount * (POINT + cases),
        order,
        group,
        cases,
        j,
        x,
        y,
        hx,
        hy,
        share,
      );
      lists.allCount += order;
      return;
    }
    if (group.rest !== undefined) {
      const order = restPoints(length, group.rest);
      writePoints(
        lists.numbers,
        lists.rest + lists.restCount * (POINT + cases),
        order,
        group,
        cases,
        j,
        x,
        y,
        hx,
        hy,
        share,
      );
      lists.restCount += order;
    }
  }
  const { numbers } = lists;
  let place = lists.wires + lists.wireCount++ * (WIRE + cases);
  numbers[place++] = x - hx;
  numbers[place++] = y - hy;
  numbers[place++] = x + hx;
  numbers[place++] = y + hy;
  numbers[place++] = length;
  numbers[place++] = zz + group.radiusSquared;
  const perMetre = group.ownWeight / group.length[j]!;
  for (let u = 0; u < cases; u++) numbers[place++] = perMetre * group.strength[j * cases + u]!;
}

function writePoints(
  numbers: Float64Array,
  at: number,
  order: number,
  group: SegmentGroup,
  cases: number,
  j: number,
  x: number,
  y: number,
  hx: number,
  hy: number,
  share: number,
): void {
  const { points, weights } = gaussLegendre(order);
  let place = at;
  for (let g = 0; g < order; g++) {
    const along = 2 * points[g]! - 1;
    numbers[place++] = x + along * hx;
    numbers[place++] = y + along * hy;
    for (let u = 0; u < cases; u++) numbers[place++] = share * weights[g]! * group.strength[j * cases + u]!;
  }
}

/** The points of a cell of the finest level. */
export function squareOf(cells: MapCells, column: number, row: number): Square {
  const half = cells.levels[0]!.side / 2;
  return { x: cells.west(0, column) + half, y: cells.south(0, row) + half, half };
}

/** Lists the metal of a group that is near to a cell. */
export function listNear(
  { group, pieces, smooth }: MapGroup,
  cases: number,
  cells: MapCells,
  column: number,
  row: number,
  square: Square,
  parts: NearParts,
  lists: NearLists,
): void {
  lists.wireCount = 0;
  lists.allCount = 0;
  lists.restCount = 0;
  if (pieces === undefined) {
    for (let j = 0; j < group.count; j++) listPart(group, cases, j, -1, 1, square, true, lists);
    return;
  }
  gatherNear(pieces, cells, column, row, parts);
  for (let k = 0; k < parts.count; k++)
    listPart(group, cases, parts.segment[k]!, parts.from[k]!, parts.to[k]!, square, !smooth, lists);
}

/** Most pieces of a group that are near to one cell. */
export function mostNear({ group, pieces }: MapGroup, cells: MapCells): number {
  if (pieces === undefined) return group.count;
  const { start } = pieces;
  const { sources } = cells.levels[0]!;
  const width = widthOf(sources);
  const rows = Array.from({ length: heightOf(sources) }, (_, r) => r * width);
  let most = 0;
  for (let c = 0; c < width; c++) {
    const three = rows.map((row) => start[row + Math.min(width, c + 2)]! - start[row + Math.max(0, c - 1)]!);
    three.forEach((count, r) => {
      most = Math.max(most, count + (three[r - 1] ?? 0) + (three[r + 1] ?? 0));
    });
  }
  return most;
}
