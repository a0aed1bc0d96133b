// The inner loops of a map, over one array that holds all its numbers: compiled where that is possible, plain otherwise.
import type { RadialTable } from '../leakage/radial-table.ts';

/** Cells taken in steps: places are counted in doubles. */
export interface CellSteps {
  /** the first cell's expansion, and the steps to the next one eastward and northward */
  readonly at: number;
  readonly eastward: number;
  readonly northward: number;
}

/** Points that are the crossings of some columns with some rows; values row after row. */
export interface CrossingPoints {
  /** places of their coordinates, even `columns` */
  readonly xs: number;
  readonly ys: number;
  readonly columns: number;
  readonly rows: number;
  /** place of the first value, and steps to the next row and to the next leakage */
  readonly values: number;
  readonly rowStep: number;
  readonly caseStep: number;
}

/** A radial table and the place of its bins. */
export interface PlacedTable {
  readonly table: RadialTable;
  readonly at: number;
}

export interface MapArithmetic {
  /** all numbers; places below are indices into it */
  readonly numbers: Float64Array;
  /**
   * Adds a matrix [TERMS × TERMS], columns one after another, times each source's expansion to its target's.
   * @param limits columns of the matrix that count, for each four of its rows, shape [TERMS / 4], never growing
   */
  transfer(
    matrix: number,
    limits: number,
    from: CellSteps,
    to: CellSteps,
    columns: number,
    rows: number,
  ): void;
  /**
   * Writes the values of expansions at each cell's points, the same in every cell: `side` each way, even.
   * @param basis polynomials at a cell's points, shape [ORDER × side]; `room` for as many numbers
   */
  spread(
    expansions: number,
    columns: number,
    rows: number,
    basis: number,
    side: number,
    room: number,
    values: number,
    rowStep: number,
  ): void;
  /**
   * Adds evenly leaking pieces of straight wire by their closed form, ln[(e + L)/(e − L)] with e the sum of the distances
   * to the ends, height included. A piece: x1, y1, x2, y2, L, height², then a factor for each leakage.
   */
  wires(pieces: number, count: number, cases: number, points: CrossingPoints): void;
  /** Adds sources that are points in plan, by a table. A source: x, y, then a factor for each leakage. */
  sources(list: number, count: number, cases: number, table: PlacedTable, points: CrossingPoints): void;
}
