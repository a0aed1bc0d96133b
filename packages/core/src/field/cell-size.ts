// How many points of a map a cell takes: few make expansions dear, many make near metal dear.
import type { Grid } from './lattice.ts';
import type { SegmentGroup } from './segment-group.ts';

/** Points of a cell each way that are tried: even, for two are worked on at once. */
const TRIED = [4, 6, 8, 10, 12, 16, 20, 24, 32, 48, 64];

// Costs in nanoseconds of one core, measured; only their ratios matter.
/** one cell's field from another's moments, and how many such a cell has, coarser levels and left-out entries considered */
const TRANSFER = 72;
const TRANSFERS = 15.5 * 1.4;
/** the same for neighbours, where the farther images are smooth */
const NEAR_TRANSFERS = 7.8;
/** a cell's lists begun, a segment listed, a piece's moments */
const CELL = 800;
const LISTED = 60;
const PIECE = 150;
/** a value by the closed form and by a point of a table, and what each leakage adds */
const CLOSED = 3;
const POINT = 2.2;
const FACTOR = 0.4;
/** table points of a segment whose farther images are not smooth across a cell */
const REST_POINTS = 4;

/**
 * Least depth of the farther images over the half side of a cell for which they are transferred between neighbours too.
 * Their singularity is then 0.8 + √1.64 from a cell, to the power of seven 6e-3 of what the near cells' farther images
 * give, which itself is a small share: maps of 120 to 10 000 segments were moved by about 1e-6 of the rise.
 */
const SMOOTH = 0.8;

/** Whether the farther images of a group are smooth across cells of a side, m. */
export function smoothAcross(group: SegmentGroup, side: number): boolean {
  return group.rest === undefined || 2 * group.rest.smoothness >= SMOOTH * side;
}

/** Points each way of the cells for which a map should cost least. */
export function pointsOfCell(groups: readonly SegmentGroup[], grid: Grid, cases: number): number {
  let best = TRIED[0]!;
  let least = Number.POSITIVE_INFINITY;
  for (const points of TRIED) {
    const cost = costOf(groups, grid, cases, points);
    if (cost < least) {
      least = cost;
      best = points;
    }
  }
  return best;
}

function costOf(groups: readonly SegmentGroup[], grid: Grid, cases: number, points: number): number {
  const side = points * grid.spacing;
  const columns = Math.ceil(grid.nx / points);
  const rows = Math.ceil(grid.ny / points);
  let cost = columns * rows * CELL;
  for (const group of groups) {
    const smooth = smoothAcross(group, side);
    const transfers = TRANSFERS + (smooth && group.rest !== undefined ? NEAR_TRANSFERS : 0);
    cost += columns * rows * transfers * TRANSFER * cases;
    const value = CLOSED + FACTOR * cases + (smooth ? 0 : (POINT + FACTOR * cases) * REST_POINTS);
    const meeting = (centre: number, half: number, first: number, count: number): number => {
      const low = Math.floor((centre - Math.abs(half) - first) / side) - 1;
      const high = Math.floor((centre + Math.abs(half) - first) / side) + 1;
      return Math.max(0, Math.min(count - 1, high) - Math.max(0, low) + 1);
    };
    let listed = 0;
    let pieces = group.count;
    for (let j = 0; j < group.count; j++)
      listed +=
        meeting(group.cx[j]!, group.hx[j]!, grid.x0, columns) *
        meeting(group.cy[j]!, group.hy[j]!, grid.y0, rows);
    for (let j = 0; j < group.count; j++)
      pieces += (2 * (Math.abs(group.hx[j]!) + Math.abs(group.hy[j]!))) / side;
    cost += listed * (LISTED + points * points * value) + pieces * PIECE * (1 + cases);
  }
  return cost;
}
