// conductors.csv as a property: order of columns, units and quoting change nothing.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Fault } from '../../src/fault.ts';
import { type ConductorRow, readConductorsCsv } from '../../src/input/conductors-csv.ts';

const SEED = 20_240_603;

function read(text: string): readonly ConductorRow[] {
  const faults: Fault[] = [];
  const table = readConductorsCsv('conductors.csv', text, faults);
  expect(faults).toEqual([]);
  return table?.rows ?? [];
}

function csv(columns: readonly (readonly string[])[]): string {
  const rows = columns[0].map((_, i) => columns.map((column) => column[i]).join(','));
  return `${rows.join('\n')}\n`;
}

const coordinate = fc.double({ min: -1e7, max: 1e7, noNaN: true });
const depth = fc.double({ min: 0, max: 100, noNaN: true });
const name = fc
  .string({ unit: 'grapheme', minLength: 1, maxLength: 12 })
  .filter((text) => text.trim() === text && !/[\p{Cc}\u200e\u200f]/u.test(text));

const row = fc.record({
  x1: coordinate,
  y1: coordinate,
  depth1: depth,
  x2: coordinate,
  y2: coordinate,
  depth2: depth,
  diameter: fc.double({ min: 0.1, max: 1000, noNaN: true }),
  electrode: name,
});
const rows = fc.array(row, { minLength: 1, maxLength: 8 });

type Row = typeof row extends fc.Arbitrary<infer T> ? T : never;

function quotedCell(text: string): string {
  return `"${text.replaceAll('"', '""')}"`;
}

function columnsOf(all: readonly Row[]): readonly (readonly string[])[] {
  const numbers = ['x1', 'y1', 'depth1', 'x2', 'y2', 'depth2'] as const;
  return [
    ...numbers.map((key) => [`${key}_m`, ...all.map((one) => String(one[key]))]),
    ['diameter_mm', ...all.map((one) => String(one.diameter))],
    ['electrode', ...all.map((one) => quotedCell(one.electrode))],
  ];
}

describe('conductors.csv', () => {
  test('every number and name is read back as it was written', () => {
    fc.assert(
      fc.property(rows, (all) => {
        const table = read(csv(columnsOf(all)));
        expect(table.map(({ x1, y1, depth1 }) => [x1, y1, depth1])).toEqual(
          all.map(({ x1, y1, depth1 }) => [x1 + 0, y1 + 0, depth1 + 0]),
        );
        expect(table.map(({ x2, y2, depth2 }) => [x2, y2, depth2])).toEqual(
          all.map(({ x2, y2, depth2 }) => [x2 + 0, y2 + 0, depth2 + 0]),
        );
        expect(table.map(({ diameter }) => diameter)).toEqual(all.map(({ diameter }) => diameter / 1000));
        expect(table.map(({ electrode }) => electrode)).toEqual(all.map(({ electrode }) => electrode));
      }),
      { seed: SEED, numRuns: 300 },
    );
  });

  test('the order of the columns does not matter', () => {
    const shuffled = rows.chain((all) => {
      const columns = columnsOf(all);
      const some = { minLength: columns.length, maxLength: columns.length };
      return fc.tuple(fc.constant(columns), fc.shuffledSubarray([...columns], some));
    });
    fc.assert(
      fc.property(shuffled, ([columns, others]) => {
        expect(read(csv(others))).toEqual(read(csv(columns)));
      }),
      { seed: SEED, numRuns: 300 },
    );
  });

  test('feet and inches give the same conductor as metres and millimetres', () => {
    const feet = fc.integer({ min: -1_000_000, max: 1_000_000 });
    const mils = fc.integer({ min: 10, max: 10_000 });
    fc.assert(
      fc.property(feet, mils, (hundredths, thousandths) => {
        const tail = ',0,0.5,1,1,0.5,';
        const header = 'y1_m,depth1_m,x2_m,y2_m,depth2_m';
        const imperial = `x1_ft,${header},diameter_in\n${hundredths / 100}${tail}${thousandths / 1000}\n`;
        const metric = `x1_m,${header},diameter_mm\n${(hundredths * 3048) / 1e6}${tail}${(thousandths * 254) / 1e4}\n`;
        const [a] = read(imperial);
        const [b] = read(metric);
        expect(Math.abs(a.x1 - b.x1)).toBeLessThanOrEqual(4 * Number.EPSILON * Math.abs(b.x1));
        expect(Math.abs(a.diameter - b.diameter)).toBeLessThanOrEqual(4 * Number.EPSILON * b.diameter);
      }),
      { seed: SEED, numRuns: 500 },
    );
  });

  test('spaces around cells and quotation marks around numbers are nothing', () => {
    const text = ' x1_m , y1_m,depth1_m,x2_m,y2_m,depth2_m,diameter_mm\n "1" ,2, 0.5,"3",4,\t0.5,10 \n';
    expect(read(text.replaceAll(' "1" ', '" 1 "'))[0]).toMatchObject({
      x1: 1,
      x2: 3,
      depth2: 0.5,
      diameter: 0.01,
    });
  });

  test.each([
    ['X1 (m)', 'x1_m'],
    ['x1m', 'x1_m'],
    ['X1_FT', 'x1_ft'],
  ])('a column called %s is told to be %s', (written, meant) => {
    const faults: Fault[] = [];
    const text = `${written},y1_m,depth1_m,x2_m,y2_m,depth2_m,diameter_mm\n1,2,0.5,3,4,0.5,10\n`;
    readConductorsCsv('conductors.csv', text, faults);
    expect(faults.map(({ place, message }) => `${place}: ${message}`)).toEqual([
      `${written}: no column of this table goes by this name; ${meant} is probably meant`,
    ]);
  });

  test('a column without a name is passed over while it is blank, and told when it is not', () => {
    const header = 'x1_m,y1_m,depth1_m,x2_m,y2_m,depth2_m,diameter_mm,';
    expect(read(`${header}\n1,2,0.5,3,4,0.5,10,\n`)).toHaveLength(1);
    const faults: Fault[] = [];
    readConductorsCsv('conductors.csv', `${header}\n1,2,0.5,3,4,0.5,10,\n1,2,0.5,3,4,0.5,10,spare\n`, faults);
    expect(faults.map(({ line, message }) => `${line}: ${message}`)).toEqual([
      '1: column 8 has no name, but "spare" on line 3',
    ]);
  });
});
