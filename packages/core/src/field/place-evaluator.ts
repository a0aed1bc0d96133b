// The potential at any place of a map, from its expansions and the metal near the place's cell: for searches.
import { radialValue } from '../leakage/radial-table.ts';
import { logarithm } from '../numerics/elementary.ts';
import { holds, type MapCells, placeIn } from './map-cells.ts';
import {
  listNear,
  type MapGroup,
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

/** Potential of one of several leakages at a place; undefined outside the map's cells. */
export type PlaceEvaluator = (u: number, x: number, y: number) => number | undefined;

/** One group's lists for the cell asked for last. */
interface CellLists extends NearLists {
  readonly group: MapGroup;
  readonly parts: NearParts;
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
  let made: readonly CellLists[] | undefined;
  let cellColumn = -1;
  let cellRow = -1;
  const tx = new Float64Array(ORDER);
  const ty = new Float64Array(ORDER);
  return (u, x, y) => {
    const column = cells.column(x);
    const row = cells.row(y);
    if (!holds(targets, column, row)) return undefined;
    const square = squareOf(cells, column, row);
    made ??= groups.map((group): CellLists => emptyLists(group, cases));
    if (column !== cellColumn || row !== cellRow) {
      cellColumn = column;
      cellRow = row;
      for (const of of made) listNear(of.group, cases, cells, column, row, square, of.parts, of);
    }
    polynomials((x - square.x) / square.half, tx);
    polynomials((y - square.y) / square.half, ty);
    const first = u * perCase + placeIn(targets, column, row) * TERMS;
    let sum = expansionValue(expansions, first, tx, ty);
    for (const lists of made) sum += listedValue(lists, cases, u, x, y);
    for (const rod of rods) sum += radialValue(rod.tables[u]!, (x - rod.x) ** 2 + (y - rod.y) ** 2);
    return sum;
  };
}

function emptyLists(group: MapGroup, cases: number): CellLists {
  const room = nearRoom(group, cases) * group.group.count;
  return {
    group,
    parts: nearParts(group.group.count),
    numbers: new Float64Array(3 * room),
    wires: 0,
    all: room,
    rest: 2 * room,
    wireCount: 0,
    allCount: 0,
    restCount: 0,
  };
}

function listedValue(lists: CellLists, cases: number, u: number, x: number, y: number): number {
  const { numbers: n, group } = lists;
  let sum = 0;
  for (let k = 0, at = lists.wires; k < lists.wireCount; k++, at += WIRE + cases) {
    const ends =
      Math.sqrt((x - n[at]!) ** 2 + (y - n[at + 1]!) ** 2 + n[at + 5]!) +
      Math.sqrt((x - n[at + 2]!) ** 2 + (y - n[at + 3]!) ** 2 + n[at + 5]!);
    const length = n[at + 4]!;
    sum += n[at + WIRE + u]! * logarithm((ends + length) / (ends - length));
  }
  for (let k = 0, at = lists.all; k < lists.allCount; k++, at += POINT + cases)
    sum += n[at + POINT + u]! * radialValue(group.group.all!, (x - n[at]!) ** 2 + (y - n[at + 1]!) ** 2);
  for (let k = 0, at = lists.rest; k < lists.restCount; k++, at += POINT + cases)
    sum += n[at + POINT + u]! * radialValue(group.group.rest!, (x - n[at]!) ** 2 + (y - n[at + 1]!) ** 2);
  return sum;
}
