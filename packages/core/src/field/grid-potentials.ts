// Surface potentials at every point of a grid: near metal piece by piece, the rest by expansions in cells.
import { pointsOfCell, smoothAcross } from './cell-size.ts';
import { kernelArithmetic } from './kernel-arithmetic.ts';
import type { Grid } from './lattice.ts';
import type { CrossingPoints, MapArithmetic } from './map-arithmetic.ts';
import { cellCount, type MapCells, mapCells } from './map-cells.ts';
import { type MapLayout, mapLayout, writeLimits } from './map-layout.ts';
import { addFarRods, addNearRods } from './map-rods.ts';
import { addMoments, passAcross, passDown, passUp } from './map-transfers.ts';
import { metalPieces } from './metal-pieces.ts';
import { listNear, type MapGroup, type NearLists, nearParts, squareOf } from './near-metal.ts';
import { type PlaceEvaluator, placeEvaluator } from './place-evaluator.ts';
import { plainArithmetic } from './plain-arithmetic.ts';
import { ORDER, polynomials, TERMS } from './plan-expansion.ts';
import type { RodTables } from './rod-tables.ts';
import { metalBox, type SegmentGroup } from './segment-group.ts';

/** Metal as a map sums it, with the leakages of several cases. */
export interface MapMetal {
  /** horizontal metal, a depth class each */
  readonly groups: readonly SegmentGroup[];
  readonly rods: readonly RodTables[];
  readonly cases: number;
}

export interface GridPotentials {
  /** by leakage, a value at each point of the grid */
  readonly values: readonly Float64Array[];
  readonly at: PlaceEvaluator;
}

/** Values by segments one by one that cost as much as a group's own matrices. */
const WORTH_EXPANDING = 2e5;

export function gridPotentials(metal: MapMetal, grid: Grid): GridPotentials {
  const { cases } = metal;
  const worth = ({ count }: SegmentGroup): boolean => count * grid.nx * grid.ny > WORTH_EXPANDING;
  const expanded = metal.groups.filter(worth);
  const side = pointsOfCell(expanded, grid, cases);
  const cells = mapCells(
    [grid.x0 - grid.spacing / 2, grid.y0 - grid.spacing / 2],
    side * grid.spacing,
    [Math.ceil(grid.nx / side), Math.ceil(grid.ny / side)],
    metalBox(expanded) ?? [grid.x0, grid.y0, grid.x0, grid.y0],
  );
  const groups = metal.groups.map((group): MapGroup => {
    if (!worth(group)) return { group, pieces: undefined, smooth: false };
    return { group, pieces: metalPieces(group, cells), smooth: smoothAcross(group, side * grid.spacing) };
  });
  const layout = mapLayout(groups, metal.rods, cases, cells, side);
  const a = kernelArithmetic(layout.doubles) ?? plainArithmetic(layout.doubles);
  writeNumbers(a, layout, grid, side);
  groups.forEach(({ group, pieces, smooth }, g) => {
    if (pieces === undefined) return;
    const places = layout.groups[g]!;
    addMoments(a.numbers, group, pieces, cells, cases, places.moments);
    passUp(a, cells, cases, layout, places.moments);
    passAcross(a, cells, cases, layout, places, smooth);
  });
  addFarRods(a, layout, metal.rods, cells, cases);
  passDown(a, cells, cases, layout);
  const perCase = cellCount(cells.levels[0]!.targets) * TERMS;
  const first = layout.expansions[0]!;
  spreadAll(a, layout, cases, side, perCase);
  addNear(a, layout, groups, cells, cases, side);
  addNearRods(a, layout, metal.rods, cells, side);
  const expansions = a.numbers.slice(first, first + cases * perCase);
  return {
    values: Array.from({ length: cases }, (_, u) => cropped(a.numbers, layout, u, grid)),
    at: placeEvaluator(metal.rods, groups, cells, cases, expansions),
  };
}

/** Writes tables, limits, coordinates and polynomials, and clears what is summed into. */
function writeNumbers(a: MapArithmetic, layout: MapLayout, grid: Grid, side: number): void {
  const n = a.numbers;
  n.fill(0, 0, layout.cleared);
  writeLimits(a, layout.limits);
  for (const placed of [...layout.groups.flatMap(({ all, rest }) => [all, rest]), ...layout.rods.flat()])
    if (placed !== undefined) n.set(placed.table.bins, placed.at);
  for (let i = 0; i < layout.columns; i++) n[layout.xs + i] = grid.x0 + i * grid.spacing;
  for (let j = 0; j < layout.rows; j++) n[layout.ys + j] = grid.y0 + j * grid.spacing;
  const t = new Float64Array(ORDER);
  for (let i = 0; i < side; i++) {
    polynomials((2 * i + 1) / side - 1, t);
    for (let b = 0; b < ORDER; b++) n[layout.basis + b * side + i] = t[b]!;
  }
}

function spreadAll(a: MapArithmetic, layout: MapLayout, cases: number, side: number, perCase: number): void {
  const { columns, rows, basis, room, values } = layout;
  for (let u = 0; u < cases; u++) {
    const from = layout.expansions[0]! + u * perCase;
    a.spread(from, columns / side, rows / side, basis, side, room, values + u * rows * columns, columns);
  }
}

function addNear(
  a: MapArithmetic,
  layout: MapLayout,
  groups: readonly MapGroup[],
  cells: MapCells,
  cases: number,
  side: number,
): void {
  const { columns, rows } = layout;
  const { targets } = cells.levels[0]!;
  const parts = groups.map(({ group }) => nearParts(group.count));
  const lists: NearLists = {
    numbers: a.numbers,
    wires: layout.wires,
    all: layout.allPoints,
    rest: layout.restPoints,
    wireCount: 0,
    allCount: 0,
    restCount: 0,
  };
  for (let row = targets.south; row <= targets.north; row++)
    for (let column = targets.west; column <= targets.east; column++) {
      const i = (column - targets.west) * side;
      const j = (row - targets.south) * side;
      const points: CrossingPoints = {
        xs: layout.xs + i,
        ys: layout.ys + j,
        columns: side,
        rows: side,
        values: layout.values + j * columns + i,
        rowStep: columns,
        caseStep: rows * columns,
      };
      const square = squareOf(cells, column, row);
      groups.forEach((group, g) => {
        listNear(group, cases, cells, column, row, square, parts[g]!, lists);
        const { all, rest } = layout.groups[g]!;
        if (lists.wireCount > 0) a.wires(lists.wires, lists.wireCount, cases, points);
        if (lists.allCount > 0) a.sources(lists.all, lists.allCount, cases, all, points);
        if (lists.restCount > 0 && rest) a.sources(lists.rest, lists.restCount, cases, rest, points);
      });
    }
}

/** The values of the grid, without the points that only fill the last cells. */
function cropped(n: Float64Array, { values, columns, rows }: MapLayout, u: number, grid: Grid): Float64Array {
  const result = new Float64Array(grid.nx * grid.ny);
  for (let j = 0; j < grid.ny; j++) {
    const from = values + (u * rows + j) * columns;
    result.set(n.subarray(from, from + grid.nx), j * grid.nx);
  }
  return result;
}
