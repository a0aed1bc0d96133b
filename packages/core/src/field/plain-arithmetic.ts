// The inner loops of a map in plain code: oracle of the compiled ones, and what takes their place where they are missing.
import { radialValue } from '../leakage/radial-table.ts';
import { logarithm } from '../numerics/elementary.ts';
import type { CellSteps, CrossingPoints, MapArithmetic, PlacedTable } from './map-arithmetic.ts';
import { ORDER, TERMS } from './plan-expansion.ts';

/** Rows of a matrix that share a limit. */
const FOUR = 4;

export function plainArithmetic(doubles: number): MapArithmetic {
  const numbers = new Float64Array(doubles);
  return {
    numbers,
    transfer: (matrix, limits, from, to, columns, rows) =>
      transfer(numbers, matrix, limits, from, to, columns, rows),
    spread: (expansions, columns, rows, basis, side, room, values, rowStep) => {
      for (let r = 0; r < rows; r++)
        for (let c = 0; c < columns; c++) {
          const expansion = expansions + (r * columns + c) * TERMS;
          spreadOne(numbers, expansion, basis, side, room, values + r * side * rowStep + c * side, rowStep);
        }
    },
    wires: (pieces, count, cases, points) => wires(numbers, pieces, count, cases, points),
    sources: (list, count, cases, table, points) => sources(numbers, list, count, cases, table, points),
  };
}

function transfer(
  n: Float64Array,
  matrix: number,
  limits: number,
  from: CellSteps,
  to: CellSteps,
  columns: number,
  rows: number,
): void {
  for (let r = 0; r < rows; r++)
    for (let c = 0; c < columns; c++) {
      const source = from.at + r * from.northward + c * from.eastward;
      const target = to.at + r * to.northward + c * to.eastward;
      for (let four = 0; four < TERMS; four += FOUR) {
        const count = n[limits + four / FOUR]!;
        for (let t = four; t < four + FOUR; t++) {
          let sum = n[target + t]!;
          for (let k = 0; k < count; k++) sum += n[matrix + k * TERMS + t]! * n[source + k]!;
          n[target + t] = sum;
        }
      }
    }
}

function spreadOne(
  n: Float64Array,
  expansion: number,
  basis: number,
  side: number,
  room: number,
  values: number,
  rowStep: number,
): void {
  n.fill(0, room, room + ORDER * side);
  let term = expansion;
  for (let d = 0; d < ORDER; d++)
    for (let b = 0; b <= d; b++, term++)
      for (let i = 0; i < side; i++) n[room + b * side + i]! += n[term]! * n[basis + (d - b) * side + i]!;
  for (let j = 0; j < side; j++)
    for (let i = 0; i < side; i++) {
      let sum = 0;
      for (let b = 0; b < ORDER; b++) sum += n[basis + b * side + j]! * n[room + b * side + i]!;
      n[values + j * rowStep + i] = sum;
    }
}

function wires(n: Float64Array, pieces: number, count: number, cases: number, points: CrossingPoints): void {
  const { xs, ys, columns, rows, values, rowStep, caseStep } = points;
  for (let p = 0; p < count; p++) {
    const at = pieces + p * (6 + cases);
    const x1 = n[at]!;
    const y1 = n[at + 1]!;
    const x2 = n[at + 2]!;
    const y2 = n[at + 3]!;
    const length = n[at + 4]!;
    const above = n[at + 5]!;
    for (let j = 0; j < rows; j++) {
      const y = n[ys + j]!;
      const across1 = (y - y1) ** 2 + above;
      const across2 = (y - y2) ** 2 + above;
      for (let i = 0; i < columns; i++) {
        const x = n[xs + i]!;
        const ends = Math.sqrt((x - x1) ** 2 + across1) + Math.sqrt((x - x2) ** 2 + across2);
        const mean = logarithm((ends + length) / (ends - length));
        for (let u = 0; u < cases; u++) n[values + u * caseStep + j * rowStep + i]! += n[at + 6 + u]! * mean;
      }
    }
  }
}

function sources(
  n: Float64Array,
  list: number,
  count: number,
  cases: number,
  { table }: PlacedTable,
  points: CrossingPoints,
): void {
  const { xs, ys, columns, rows, values, rowStep, caseStep } = points;
  for (let s = 0; s < count; s++) {
    const at = list + s * (2 + cases);
    const x = n[at]!;
    const y = n[at + 1]!;
    for (let j = 0; j < rows; j++) {
      const dy = n[ys + j]! - y;
      for (let i = 0; i < columns; i++) {
        const dx = n[xs + i]! - x;
        const value = radialValue(table, dx * dx + dy * dy);
        for (let u = 0; u < cases; u++) n[values + u * caseStep + j * rowStep + i]! += n[at + 2 + u]! * value;
      }
    }
  }
}
