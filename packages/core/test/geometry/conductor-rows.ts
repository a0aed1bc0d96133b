// Builds small conductor tables for tests.
import type { ConductorTable } from '../../src/geometry/conductors.ts';

export interface Row {
  readonly from: readonly [x: number, y: number, depth: number];
  readonly to: readonly [x: number, y: number, depth: number];
  readonly radius?: number;
  readonly electrode?: string;
  readonly insulated?: boolean;
}

/** Rows named c1, c2, …; radius 5 mm unless given. */
export function conductorTable(rows: readonly Row[]): ConductorTable {
  const column = (value: (row: Row) => number): Float64Array => Float64Array.from(rows, value);
  return {
    count: rows.length,
    id: rows.map((_, i) => `c${i + 1}`),
    x1: column(({ from }) => from[0]),
    y1: column(({ from }) => from[1]),
    depth1: column(({ from }) => from[2]),
    x2: column(({ to }) => to[0]),
    y2: column(({ to }) => to[1]),
    depth2: column(({ to }) => to[2]),
    radius: column(({ radius = 0.005 }) => radius),
    material: rows.map(() => 'copper-annealed'),
    electrode: rows.map(({ electrode = 'main' }) => electrode),
    insulated: Uint8Array.from(rows, ({ insulated = false }) => (insulated ? 1 : 0)),
    resistancePerMetre: new Float64Array(rows.length).fill(Number.NaN),
  };
}

/** A wire at one depth, 0.5 m unless given. */
export function wire(x1: number, y1: number, x2: number, y2: number, depth = 0.5): Row {
  return { from: [x1, y1, depth], to: [x2, y2, depth] };
}

/** A vertical rod of 3 m. */
export function rod(x: number, y: number, top = 0.5): Row {
  return { from: [x, y, top], to: [x, y, top + 3], radius: 0.008 };
}

/** Lines of a lattice with `columns` × `rows` meshes of the given side, drawn whole. */
export function lattice(columns: number, rows: number, side: number): Row[] {
  const along = Array.from({ length: rows + 1 }, (_, j) => wire(0, j * side, columns * side, j * side));
  const across = Array.from({ length: columns + 1 }, (_, i) => wire(i * side, 0, i * side, rows * side));
  return [...along, ...across];
}

/** The same lines, each cut into one row per mesh side. */
export function cutLattice(columns: number, rows: number, side: number): Row[] {
  const cut: Row[] = [];
  for (let j = 0; j <= rows; j++) {
    for (let i = 0; i < columns; i++) cut.push(wire(i * side, j * side, (i + 1) * side, j * side));
  }
  for (let i = 0; i <= columns; i++) {
    for (let j = 0; j < rows; j++) cut.push(wire(i * side, j * side, i * side, (j + 1) * side));
  }
  return cut;
}
