// The compiled inner loops of a map against their plain twins, on random numbers, and against closed forms.
import { describe, expect, it } from 'vitest';
import { kernelArithmetic } from '../../src/field/kernel-arithmetic.ts';
import type { CrossingPoints, MapArithmetic } from '../../src/field/map-arithmetic.ts';
import { plainArithmetic } from '../../src/field/plain-arithmetic.ts';
import { ORDER, TERMS } from '../../src/field/plan-expansion.ts';
import { radialTable } from '../../src/leakage/radial-table.ts';
import { randomNumbers } from '../support/random.ts';

const DOUBLES = 200_000;

/** Both on the same numbers; the largest difference of a run of results, of the largest of them. */
function difference(
  prepare: (n: Float64Array) => void,
  work: (a: MapArithmetic) => void,
  from: number,
  count: number,
): number {
  const [compiled, plain] = [kernelArithmetic(DOUBLES), plainArithmetic(DOUBLES)].map((a) => {
    a!.numbers.fill(0);
    prepare(a!.numbers);
    work(a!);
    return a!.numbers.slice(from, from + count);
  });
  const scale = plain!.reduce((most, v) => Math.max(most, Math.abs(v)), 0);
  expect(scale).toBeGreaterThan(0);
  return plain!.reduce((most, v, k) => Math.max(most, Math.abs(v - compiled![k]!)), 0) / scale;
}

const filled = (n: Float64Array, from: number, count: number, seed: number): void => {
  const random = randomNumbers(seed);
  for (let k = from; k < from + count; k++) n[k] = 2 * random() - 1;
};

/** Columns and rows of points: 26 × 25 for each of 16 sources are over 10 000 values. */
const points: CrossingPoints = { xs: 0, ys: 100, columns: 26, rows: 25, values: 10_000, rowStep: 30, caseStep: 1000 }; // biome-ignore format: one row
const SOURCES = 16;

function coordinates(n: Float64Array): void {
  for (let k = 0; k < 26; k++) [n[k], n[100 + k]] = [k * 0.5, k * 0.4 - 3];
}

describe('the compiled inner loops of a map agree with plain code to 1e-12', () => {
  it.each([1, 2, 5, 13])('passing expansions between cells, %i in a row', (columns) => {
    const prepare = (n: Float64Array): void => {
      filled(n, 0, TERMS * TERMS, 3);
      n.set([28, 28, 21, 15, 10, 10, 6], 1000);
      filled(n, 2000, 3 * 30 * TERMS, 4);
    };
    const work = (a: MapArithmetic): void =>
      a.transfer(
        0,
        1000,
        { at: 2000, eastward: 2 * TERMS, northward: 30 * TERMS },
        { at: 10_000, eastward: TERMS, northward: 20 * TERMS },
        columns,
        3,
      );
    expect(difference(prepare, work, 10_000, 60 * TERMS)).toBeLessThan(1e-12);
  });

  it.each([2, 6, 16])('spreading expansions over cells of %i points each way', (side) => {
    const prepare = (n: Float64Array): void => {
      filled(n, 0, 12 * TERMS, 5);
      filled(n, 1000, ORDER * side, 6);
    };
    const work = (a: MapArithmetic): void => a.spread(0, 4, 3, 1000, side, 5000, 10_000, 4 * side + 2);
    expect(difference(prepare, work, 10_000, 3 * side * (4 * side + 2))).toBeLessThan(1e-12);
  });

  it.each([1, 3])('summing wires of any length and depth for %i leakages', (cases) => {
    const random = randomNumbers(8);
    const wires = Array.from({ length: SOURCES }, () => {
      const [x, y, length, turn] = [13 * random(), 8 * random() - 3, 20 * 1e-4 ** random(), 7 * random()];
      const [dx, dy] = [length * Math.cos(turn), length * Math.sin(turn)];
      return [x, y, x + dx, y + dy, length, 4 * 1e-5 ** random(), ...Array.from({ length: cases }, random)];
    });
    const prepare = (n: Float64Array): void => {
      coordinates(n);
      n.set(wires.flat(), 500);
    };
    const work = (a: MapArithmetic): void => a.wires(500, SOURCES, cases, points);
    expect(difference(prepare, work, 10_000, 3000)).toBeLessThan(1e-12);
  });

  it.each([1, 3])('summing points by a table for %i leakages', (cases) => {
    const table = radialTable((rr) => 1 / Math.sqrt(rr + 0.25) + 0.5 / Math.sqrt(rr + 9), 0.5, 400);
    const prepare = (n: Float64Array): void => {
      const random = randomNumbers(9);
      coordinates(n);
      n.set(table.bins, 20_000);
      for (let k = 0; k < SOURCES * (2 + cases); k++) n[500 + k] = 200 * random() ** 4;
    };
    const work = (a: MapArithmetic): void => a.sources(500, SOURCES, cases, { table, at: 20_000 }, points);
    expect(difference(prepare, work, 10_000, 3000)).toBeLessThan(1e-12);
  });
});

describe('the compiled closed form of a wire', () => {
  it.each([
    ['right over a wire', [1, 2, 6, 2, 5, 0.25], 3, 2],
    ['at its end', [1, 2, 6, 2, 5, 0.25], 6, 2],
    ['on its axis beyond', [1, 2, 6, 2, 5, 0.25], 9, 2],
    ['on its skin', [1, 2, 6, 2, 5, 2.5e-5], 4, 2],
    ['over a very short one', [1, 2, 1.001, 2, 0.001, 0.64], 1, 2],
    ['over a very long one', [-5000, 2, 5000, 2, 10_000, 0.64], 40, 3],
    ['very far away', [0, 0, 3, 4, 5, 0.25], 20_000, 10_000],
  ] as const)('is asinh of its ends over the distance from its axis, to 1e-9: %s', (_, wire, x, y) => {
    const a = kernelArithmetic(100)!;
    a.numbers.fill(0);
    a.numbers.set([x, x, y], 0);
    a.numbers.set([...wire, 1], 10);
    a.wires(10, 1, 1, { xs: 0, ys: 2, columns: 2, rows: 1, values: 50, rowStep: 2, caseStep: 0 });
    const [x1, y1, x2, y2, length, above] = wire;
    const [tx, ty] = [(x2 - x1) / length, (y2 - y1) / length];
    // ∫ ds/√(s² + d²) from −along to length − along: independent of the form in the kernel
    const along = (x - x1) * tx + (y - y1) * ty;
    const d = Math.sqrt(((x - x1) * ty - (y - y1) * tx) ** 2 + above);
    const exact = Math.asinh((length - along) / d) + Math.asinh(along / d);
    expect(Math.abs(a.numbers[50]! / exact - 1)).toBeLessThan(1e-9);
  });
});
