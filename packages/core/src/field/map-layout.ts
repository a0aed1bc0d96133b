// Where the numbers of a map stand in one array, so that the inner loops can be compiled ones on their own memory.
import { MATRIX_ROOM } from './cell-matrices.ts';
import type { MapArithmetic, PlacedTable } from './map-arithmetic.ts';
import { type CellRange, cellCount, heightOf, type MapCells, widthOf } from './map-cells.ts';
import { type MapGroup, mostNear, nearRoom } from './near-metal.ts';
import { DEGREES, ORDER, TERMS } from './plan-expansion.ts';
import { ROD_LEVEL, type RodPoints, rodPoints } from './rod-points.ts';
import type { RodTables } from './rod-tables.ts';

export interface GroupPlaces {
  readonly all: PlacedTable;
  readonly rest: PlacedTable | undefined;
  /** by level, shape [cases × sources × TERMS] */
  readonly moments: readonly number[];
}

/** Places of column limits: nothing left out; two cells away, three, and neighbours. */
export interface LimitPlaces {
  readonly full: number;
  readonly two: number;
  readonly three: number;
  readonly near: number;
}

export interface MapLayout {
  readonly doubles: number;
  readonly limits: LimitPlaces;
  readonly matrix: number;
  readonly matrixRoom: number;
  /** by level, shape [cases × targets × TERMS] */
  readonly expansions: readonly number[];
  /** end of what begins at nothing: moments and expansions stand before all else */
  readonly cleared: number;
  readonly groups: readonly GroupPlaces[];
  /** by level from ROD_LEVEL on; none where there are no rods */
  readonly rodPoints: readonly (RodPoints | undefined)[];
  /** by rod and leakage */
  readonly rods: readonly (readonly PlacedTable[])[];
  /** coordinates of the points of all cells, and how many there are each way */
  readonly xs: number;
  readonly ys: number;
  readonly columns: number;
  readonly rows: number;
  /** shape [ORDER × side] each */
  readonly basis: number;
  readonly room: number;
  /** shape [cases × rows × columns] */
  readonly values: number;
  readonly wires: number;
  readonly allPoints: number;
  readonly restPoints: number;
  /** a source by itself */
  readonly one: number;
}

/** @param side points of a cell each way */
export function mapLayout(
  groups: readonly MapGroup[],
  rods: readonly RodTables[],
  cases: number,
  cells: MapCells,
  side: number,
): MapLayout {
  let next = 0;
  const take = (doubles: number): number => {
    const at = next;
    next += doubles + (doubles & 1);
    return at;
  };
  const perCell = (range: CellRange): number => take(cases * cellCount(range) * TERMS);
  const expansions = cells.levels.map(({ targets }) => perCell(targets));
  const moments = groups.map(({ pieces }) =>
    pieces === undefined ? [] : cells.levels.map(({ sources }) => perCell(sources)),
  );
  const cleared = next;
  const columns = widthOf(cells.levels[0]!.targets) * side;
  const rows = heightOf(cells.levels[0]!.targets) * side;
  const list = groups.reduce((room, g) => Math.max(room, nearRoom(g, cases) * mostNear(g, cells)), 0);
  const four = (): number => take(TERMS / ROWS);
  return {
    expansions,
    cleared,
    groups: groups.map(({ group }, g) => ({
      all: { table: group.all!, at: take(group.all!.bins.length) },
      rest: group.rest && { table: group.rest, at: take(group.rest.bins.length) },
      moments: moments[g]!,
    })),
    rodPoints: cells.levels.map(({ targets }, k) =>
      k < ROD_LEVEL || rods.length === 0 ? undefined : rodPoints(targets, cases, take),
    ),
    rods: rods.map((rod) => rod.tables.map((table) => ({ table, at: take(table.bins.length) }))),
    limits: { full: four(), two: four(), three: four(), near: four() },
    matrix: take(TERMS * TERMS),
    matrixRoom: take(MATRIX_ROOM),
    xs: take(columns),
    ys: take(rows),
    columns,
    rows,
    basis: take(ORDER * side),
    room: take(ORDER * side),
    values: take(cases * columns * rows),
    wires: take(list),
    allPoints: take(list),
    restPoints: take(list),
    one: take(POINT_NUMBERS),
    doubles: next,
  };
}

/** Rows of a matrix that share a limit, as the inner loops take them. */
const ROWS = 4;
const POINT_NUMBERS = 3;

/**
 * Entries of a matrix fall with the sum of the degrees of source and target, faster the farther the cells: those above
 * these sums are left out, which moves a map by less than a tenth of what the highest degree leaves.
 */
const MOST_DEGREES = { two: 9, three: 6, near: 10 } as const;

export function writeLimits({ numbers }: MapArithmetic, limits: LimitPlaces): void {
  const write = (at: number, most: number): void => {
    for (let four = 0; four < TERMS; four += ROWS) {
      const [a, b] = DEGREES[four]!;
      numbers[at + four / ROWS] = DEGREES.filter(([c, d]) => a + b + c + d <= most).length;
    }
  };
  write(limits.full, Number.POSITIVE_INFINITY);
  write(limits.two, MOST_DEGREES.two);
  write(limits.three, MOST_DEGREES.three);
  write(limits.near, MOST_DEGREES.near);
}
