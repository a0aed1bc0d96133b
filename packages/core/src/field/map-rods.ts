// Vertical metal in a map: near each rod its table at every point, farther off at the Chebyshev points of ever coarser cells.
import type { MapArithmetic, PlacedTable } from './map-arithmetic.ts';
import { type CellRange, cellCount, common, heightOf, type MapCells, widthOf } from './map-cells.ts';
import type { MapLayout } from './map-layout.ts';
import { DEGREES, FROM_VALUES, ORDER, ROOTS, TERMS } from './plan-expansion.ts';
import { COLUMNS, ROD_LEVEL, type RodPoints } from './rod-points.ts';
import type { RodTables } from './rod-tables.ts';
import { type PlanBox, radialReach, requireWithin } from './table-reach.ts';

/** Rods whose tables are read at the places of a cell of the finest level, being in none of its expansions. */
export function nearRods(
  rods: readonly RodTables[],
  cells: MapCells,
  column: number,
  row: number,
): readonly RodTables[] {
  if (cells.levels.length <= ROD_LEVEL) return rods;
  const apart = (a: number, b: number): number => Math.abs((a >> ROD_LEVEL) - (b >> ROD_LEVEL));
  return rods.filter(({ x, y }) => apart(cells.column(x), column) < 2 && apart(cells.row(y), row) < 2);
}

/** Adds each rod's field to the expansions of the cells, of every level, that are not beside it while their parents are. */
export function addFarRods(
  a: MapArithmetic,
  layout: MapLayout,
  rods: readonly RodTables[],
  cells: MapCells,
  cases: number,
): void {
  const n = a.numbers;
  if (rods.length === 0) return;
  cells.levels.forEach((level, k) => {
    const points = layout.rodPoints[k];
    if (points === undefined) return;
    const { targets, side } = level;
    for (let c = 0; c < widthOf(targets); c++)
      for (let i = 0; i < COLUMNS; i++) {
        const middle = cells.west(k, targets.west + c) + side / 2;
        n[points.xs + c * COLUMNS + i] = middle + (side / 2) * ROOTS[Math.min(i, ORDER - 1)]!;
      }
    for (let r = 0; r < heightOf(targets); r++)
      for (let j = 0; j < ORDER; j++)
        n[points.ys + r * ORDER + j] = cells.south(k, targets.south + r) + (side / 2) * (1 + ROOTS[j]!);
    n.fill(0, points.values, points.values + cases * points.columns * points.rows);
    const coarsest = k === cells.levels.length - 1;
    const box: PlanBox = [
      cells.west(k, targets.west),
      cells.south(k, targets.south),
      cells.west(k, targets.east + 1),
      cells.south(k, targets.north + 1),
    ];
    rods.forEach((rod, r) => {
      // cells may reach past the map
      requireWithin(radialReach(rod.tables[0]!), [rod.x, rod.y, rod.x, rod.y], box);
      writeSource(n, layout, rod);
      const column = cells.column(rod.x) >> k;
      const row = cells.row(rod.y) >> k;
      for (const range of around(column, row, coarsest ? targets : besideParents(column, row)))
        addAt(a, layout, common(range, targets), targets, points, layout.rods[r]!);
    });
    collect(n, points, targets, cases, layout.expansions[k]!);
  });
}

/** Cells whose parents are that of a cell or beside it. */
function besideParents(column: number, row: number): CellRange {
  const first = (cell: number): number => ((cell >> 1) - 1) * 2;
  return { west: first(column), east: first(column) + 5, south: first(row), north: first(row) + 5 };
}

/** A range without a cell and its neighbours, in four parts. */
function around(column: number, row: number, { west, east, south, north }: CellRange): CellRange[] {
  const middle = { south: Math.max(south, row - 1), north: Math.min(north, row + 1) };
  return [
    { west, east, south, north: Math.min(north, row - 2) },
    { west, east, south: Math.max(south, row + 2), north },
    { west, east: Math.min(east, column - 2), ...middle },
    { west: Math.max(west, column + 2), east, ...middle },
  ];
}

function writeSource(n: Float64Array, { one }: MapLayout, { x, y }: RodTables): void {
  n[one] = x;
  n[one + 1] = y;
  n[one + 2] = 1;
}

/** Adds a rod's tables at the Chebyshev points of a range of cells. */
function addAt(
  a: MapArithmetic,
  layout: MapLayout,
  range: CellRange,
  targets: CellRange,
  points: RodPoints,
  tables: readonly PlacedTable[],
): void {
  if (cellCount(range) === 0) return;
  const column = (range.west - targets.west) * COLUMNS;
  const row = (range.south - targets.south) * ORDER;
  tables.forEach((table, u) => {
    a.sources(layout.one, 1, 1, table, {
      xs: points.xs + column,
      ys: points.ys + row,
      columns: widthOf(range) * COLUMNS,
      rows: heightOf(range) * ORDER,
      values: points.values + (u * points.rows + row) * points.columns + column,
      rowStep: points.columns,
      caseStep: 0,
    });
  });
}

/** Adds the terms of the polynomials through the values at each cell's points to its expansion. */
function collect(
  n: Float64Array,
  points: RodPoints,
  targets: CellRange,
  cases: number,
  expansions: number,
): void {
  const rows = new Float64Array(ORDER * ORDER);
  for (let u = 0; u < cases; u++)
    for (let r = 0; r < heightOf(targets); r++)
      for (let c = 0; c < widthOf(targets); c++) {
        const from = points.values + (u * points.rows + r * ORDER) * points.columns + c * COLUMNS;
        for (let j = 0; j < ORDER; j++)
          for (let p = 0; p < ORDER; p++) {
            let sum = 0;
            for (let i = 0; i < ORDER; i++)
              sum += FROM_VALUES[p * ORDER + i]! * n[from + j * points.columns + i]!;
            rows[j * ORDER + p] = sum;
          }
        const cell = expansions + (u * cellCount(targets) + r * widthOf(targets) + c) * TERMS;
        DEGREES.forEach(([p, q], term) => {
          for (let j = 0; j < ORDER; j++)
            n[cell + term]! += FROM_VALUES[q * ORDER + j]! * rows[j * ORDER + p]!;
        });
      }
}

/** Adds each rod's tables at the points of the cells that are beside it at the finest level with Chebyshev points. */
export function addNearRods(
  a: MapArithmetic,
  layout: MapLayout,
  rods: readonly RodTables[],
  cells: MapCells,
  side: number,
): void {
  const { targets } = cells.levels[0]!;
  const all = cells.levels.length <= ROD_LEVEL;
  rods.forEach((rod, r) => {
    const beside = (cell: number): number => ((cell >> ROD_LEVEL) - 1) << ROD_LEVEL;
    const west = beside(cells.column(rod.x));
    const south = beside(cells.row(rod.y));
    const three = (3 << ROD_LEVEL) - 1;
    const range = all ? targets : common(targets, { west, east: west + three, south, north: south + three });
    if (cellCount(range) === 0) return;
    writeSource(a.numbers, layout, rod);
    const column = (range.west - targets.west) * side;
    const row = (range.south - targets.south) * side;
    layout.rods[r]!.forEach((table, u) => {
      a.sources(layout.one, 1, 1, table, {
        xs: layout.xs + column,
        ys: layout.ys + row,
        columns: widthOf(range) * side,
        rows: heightOf(range) * side,
        values: layout.values + (u * layout.rows + row) * layout.columns + column,
        rowStep: layout.columns,
        caseStep: 0,
      });
    });
  });
}
