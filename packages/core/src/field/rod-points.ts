// Chebyshev points of a map's cells, at which the tables of rods are read, and where their numbers stand.
import { type CellRange, heightOf, widthOf } from './map-cells.ts';
import { ORDER } from './plan-expansion.ts';

/** The finest level whose cells take a rod's field from Chebyshev points; below, points of the map are not many more. */
export const ROD_LEVEL = 1;

/** Columns of Chebyshev points a cell takes: even, the last one twice. */
export const COLUMNS: number = ORDER + 1;

/** Chebyshev points of all cells of a level: places of their coordinates and values, the latter by leakage. */
export interface RodPoints {
  readonly xs: number;
  readonly ys: number;
  readonly columns: number;
  readonly rows: number;
  readonly values: number;
}

export function rodPoints(range: CellRange, cases: number, take: (doubles: number) => number): RodPoints {
  const columns = widthOf(range) * COLUMNS;
  const rows = heightOf(range) * ORDER;
  return { xs: take(columns), ys: take(rows), columns, rows, values: take(cases * columns * rows) };
}
