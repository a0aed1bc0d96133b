// Cells over a map and its metal: squares of a few lattice points, then of twice the side, level upon level.

/** A rectangle of cells, both ends included, by the cell's number eastward and northward. */
export interface CellRange {
  readonly west: number;
  readonly east: number;
  readonly south: number;
  readonly north: number;
}

export interface CellLevel {
  /** m */
  readonly side: number;
  /** cells that hold points of the map */
  readonly targets: CellRange;
  /** cells whose metal is told apart; the metal beyond is so at a coarser level */
  readonly near: CellRange;
  /** those of them in which there may be metal: moments are kept for these */
  readonly sources: CellRange;
}

export interface MapCells {
  /** finest first */
  readonly levels: readonly CellLevel[];
  /** number of the cell of the finest level, eastward or northward, that holds a place */
  column(x: number): number;
  row(y: number): number;
  /** edge of a cell of a level: west of a column, south of a row */
  west(level: number, column: number): number;
  south(level: number, row: number): number;
}

/** Number of the cell with the map's first point: large, so that numbers stay positive, and of a high power of two. */
const FIRST = 2 ** 24;
/** Cells around a target within which a level tells its metal apart. */
const APART = 3;

/**
 * @param corner south-west corner of the cell of the map's first point, m
 * @param across cells of the finest level over the map, eastward and northward
 * @param metal box around all metal: west, south, east, north, m
 */
export function mapCells(
  corner: readonly [number, number],
  side: number,
  across: readonly [number, number],
  metal: readonly [number, number, number, number],
): MapCells {
  const column = (x: number): number => FIRST + Math.floor((x - corner[0]) / side);
  const row = (y: number): number => FIRST + Math.floor((y - corner[1]) / side);
  let targets: CellRange = {
    west: FIRST,
    east: FIRST + across[0] - 1,
    south: FIRST,
    north: FIRST + across[1] - 1,
  };
  // a cell more each way: rounding may put metal on a border in either
  let all: CellRange = {
    west: column(metal[0]) - 1,
    east: column(metal[2]) + 1,
    south: row(metal[1]) - 1,
    north: row(metal[3]) + 1,
  };
  const levels: CellLevel[] = [];
  for (let k = 0; ; k++) {
    // whole quarters of coarser cells
    const near = {
      west: Math.floor((targets.west - APART) / 2) * 2,
      east: Math.floor((targets.east + APART) / 2) * 2 + 1,
      south: Math.floor((targets.south - APART) / 2) * 2,
      north: Math.floor((targets.north + APART) / 2) * 2 + 1,
    };
    levels.push({ side: side * 2 ** k, targets, near, sources: common(near, all) });
    const last =
      all.east - targets.west <= APART &&
      targets.east - all.west <= APART &&
      all.north - targets.south <= APART &&
      targets.north - all.south <= APART;
    if (last) break;
    targets = halved(targets);
    all = halved(all);
  }
  return {
    levels,
    column,
    row,
    west: (level, c) => corner[0] + (c * 2 ** level - FIRST) * side,
    south: (level, r) => corner[1] + (r * 2 ** level - FIRST) * side,
  };
}

function halved({ west, east, south, north }: CellRange): CellRange {
  const half = (cell: number): number => Math.floor(cell / 2);
  return { west: half(west), east: half(east), south: half(south), north: half(north) };
}

export function common(a: CellRange, b: CellRange): CellRange {
  return {
    west: Math.max(a.west, b.west),
    east: Math.min(a.east, b.east),
    south: Math.max(a.south, b.south),
    north: Math.min(a.north, b.north),
  };
}

export function widthOf(range: CellRange): number {
  return Math.max(0, range.east - range.west + 1);
}

export function heightOf(range: CellRange): number {
  return Math.max(0, range.north - range.south + 1);
}

export function holds(range: CellRange, column: number, row: number): boolean {
  return column >= range.west && column <= range.east && row >= range.south && row <= range.north;
}

/** Place of a cell among those of a range, row after row. */
export function placeIn(range: CellRange, column: number, row: number): number {
  return (row - range.south) * widthOf(range) + column - range.west;
}

export function cellCount(range: CellRange): number {
  return widthOf(range) * heightOf(range);
}
