// The potential at any place of a map, from its expansions and the metal near the place's cell: for searches.
import { type RadialTable, radialValue } from '../leakage/radial-table.ts';
import { logarithm } from '../numerics/elementary.ts';
import { holds, type MapCells, placeIn } from './map-cells.ts';
import { nearRods } from './map-rods.ts';
import {
  listNear,
  type MapGroup,
  mostNear,
  type NearLists,
  type NearParts,
  nearParts,
  nearRoom,
  POINT,
  squareOf,
  WIRE,
} from './near-metal.ts';
import { expansionValue, ORDER, polynomials, TERMS } from './plan-expansion.ts';
import type { RodTables } from './rod-tables.ts';
import type { SegmentGroup } from './segment-group.ts';

/** Potential of one of several leakages at a place; undefined outside the map's cells. */
export type PlaceEvaluator = (u: number, x: number, y: number) => number | undefined;

/** Metal of one group near a cell, as lists; and the rods that are. */
interface CellMetal {
  readonly lists: readonly {
    readonly group: SegmentGroup;
    readonly wires: Float64Array;
    readonly all: Float64Array;
    readonly rest: Float64Array;
  }[];
  readonly rods: readonly RodTables[];
}

/** @param expansions of the finest level, shape [cases × targets × TERMS] */
export function placeEvaluator(
  rods: readonly RodTables[],
  groups: readonly MapGroup[],
  cells: MapCells,
  cases: number,
  expansions: Float64Array,
): PlaceEvaluator {
  const perCase = expansions.length / cases;
  const { targets } = cells.levels[0]!;
  // a search goes to and fro between few cells
  const known = new Map<number, CellMetal>();
  let scratch: readonly Scratch[] | undefined;
  const metalOf = (column: number, row: number): CellMetal => {
    scratch ??= groups.map((group) => scratchOf(group, cells, cases));
    const square = squareOf(cells, column, row);
    const lists = scratch.map(({ group, parts, lists: of }) => {
      listNear(group, cases, cells, column, row, square, parts, of);
      const taken = (from: number, count: number, each: number): Float64Array =>
        of.numbers.slice(from, from + count * (each + cases));
      return {
        group: group.group,
        wires: taken(of.wires, of.wireCount, WIRE),
        all: taken(of.all, of.allCount, POINT),
        rest: taken(of.rest, of.restCount, POINT),
      };
    });
    return { lists, rods: nearRods(rods, cells, column, row) };
  };
  const tx = new Float64Array(ORDER);
  const ty = new Float64Array(ORDER);
  return (u, x, y) => {
    const column = cells.column(x);
    const row = cells.row(y);
    if (!holds(targets, column, row)) return undefined;
    const place = placeIn(targets, column, row);
    let metal = known.get(place);
    if (metal === undefined) {
      metal = metalOf(column, row);
      known.set(place, metal);
    }
    const half = cells.levels[0]!.side / 2;
    polynomials((x - cells.west(0, column)) / half - 1, tx);
    polynomials((y - cells.south(0, row)) / half - 1, ty);
    let sum = expansionValue(expansions, u * perCase + place * TERMS, tx, ty);
    for (const { group, wires, all, rest } of metal.lists) {
      sum += wiresValue(wires, cases, u, x, y);
      if (all.length > 0) sum += pointsValue(all, group.all!, cases, u, x, y);
      if (rest.length > 0) sum += pointsValue(rest, group.rest!, cases, u, x, y);
    }
    for (const rod of metal.rods) sum += radialValue(rod.tables[u]!, (x - rod.x) ** 2 + (y - rod.y) ** 2);
    return sum;
  };
}

/** Room for one group's lists of any cell. */
interface Scratch {
  readonly group: MapGroup;
  readonly parts: NearParts;
  readonly lists: NearLists;
}

function scratchOf(group: MapGroup, cells: MapCells, cases: number): Scratch {
  const room = nearRoom(group, cases) * mostNear(group, cells);
  const numbers = new Float64Array(3 * room);
  return {
    group,
    parts: nearParts(group.group.count),
    lists: { numbers, wires: 0, all: room, rest: 2 * room, wireCount: 0, allCount: 0, restCount: 0 },
  };
}

function wiresValue(n: Float64Array, cases: number, u: number, x: number, y: number): number {
  let sum = 0;
  for (let at = 0; at < n.length; at += WIRE + cases) {
    const above = n[at + 5]!;
    const ends =
      Math.sqrt((x - n[at]!) ** 2 + (y - n[at + 1]!) ** 2 + above) +
      Math.sqrt((x - n[at + 2]!) ** 2 + (y - n[at + 3]!) ** 2 + above);
    const length = n[at + 4]!;
    sum += n[at + WIRE + u]! * logarithm((ends + length) / (ends - length));
  }
  return sum;
}

function pointsValue(
  n: Float64Array,
  table: RadialTable,
  cases: number,
  u: number,
  x: number,
  y: number,
): number {
  let sum = 0;
  for (let at = 0; at < n.length; at += POINT + cases)
    sum += n[at + POINT + u]! * radialValue(table, (x - n[at]!) ** 2 + (y - n[at + 1]!) ** 2);
  return sum;
}
