// Whatever bytes come in: a study is loaded or refused with faults, nothing else.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { InputFaults } from '../../src/fault.ts';
import { loadStudy } from '../../src/input/load-study.ts';
import { loadSurvey } from '../../src/input/load-survey.ts';
import { loadPoints } from '../../src/input/points-csv.ts';
import { sourceFromMap } from '../../src/input/source.ts';
import { bytesOf, smallStudy, smallTable } from './folder-source.ts';

const SEED = 20_240_608;
const goodStudy = bytesOf(
  JSON.stringify(
    {
      ...smallStudy,
      areas: {
        touch: [
          [
            [0, 0],
            [9, 0],
            [9, 9],
          ],
        ],
      },
    },
    null,
    1,
  ),
);
const goodTable = bytesOf(smallTable);

/** Loads, and passes over faults; any other error fails the test. */
function outcome(study: Uint8Array, table: Uint8Array): 'loaded' | 'refused' {
  try {
    const files = new Map([
      ['study.json', study],
      ['conductors.csv', table],
    ]);
    const { conductors } = loadStudy(sourceFromMap(files));
    for (const column of [conductors.x1, conductors.y1, conductors.depth1, conductors.radius]) {
      expect(column.every(Number.isFinite)).toBe(true);
    }
    return 'loaded';
  } catch (error) {
    if (!(error instanceof InputFaults)) throw error;
    expect(error.faults.length).toBeGreaterThan(0);
    for (const { message } of error.faults)
      expect(message).not.toMatch(/undefined|NaN is not acc|\[object|\n/);
    return 'refused';
  }
}

/** Good bytes with some of them replaced, removed or doubled. */
function damaged(good: Uint8Array): fc.Arbitrary<Uint8Array> {
  const cut = fc.record({
    at: fc.nat({ max: good.length - 1 }),
    remove: fc.nat({ max: 6 }),
    insert: fc.oneof(
      fc.uint8Array({ maxLength: 4 }),
      fc.constantFrom(...'",;\n[]{}-.eE=0 1'.split('').map(bytesOf)),
    ),
  });
  return fc.array(cut, { minLength: 1, maxLength: 4 }).map((cuts) =>
    cuts.reduce<Uint8Array>((bytes, { at, remove, insert }) => {
      return Uint8Array.from([...bytes.subarray(0, at), ...insert, ...bytes.subarray(at + remove)]);
    }, good),
  );
}

describe('random bytes', () => {
  test('as study.json', () => {
    fc.assert(
      fc.property(fc.uint8Array({ maxLength: 200 }), (bytes) => {
        expect(outcome(bytes, goodTable)).toBe('refused');
      }),
      { seed: SEED, numRuns: 1000 },
    );
  });

  test('as conductors.csv', () => {
    fc.assert(
      fc.property(fc.uint8Array({ maxLength: 200 }), (bytes) => {
        expect(outcome(goodStudy, bytes)).toBe('refused');
      }),
      { seed: SEED, numRuns: 1000 },
    );
  });

  test('within a good study', () => {
    const outcomes = new Set<string>();
    fc.assert(
      fc.property(damaged(goodStudy), (bytes) => {
        outcomes.add(outcome(bytes, goodTable));
      }),
      { seed: SEED, numRuns: 2000 },
    );
    expect(outcomes).toEqual(new Set(['loaded', 'refused']));
  });

  test('within a good table', () => {
    const outcomes = new Set<string>();
    fc.assert(
      fc.property(damaged(goodTable), (bytes) => {
        outcomes.add(outcome(goodStudy, bytes));
      }),
      { seed: SEED, numRuns: 2000 },
    );
    expect(outcomes).toEqual(new Set(['loaded', 'refused']));
  });

  test('any JSON in place of any part of a study', () => {
    const keys = fc.constantFrom(
      ...Object.keys(smallStudy),
      'areas',
      'electrodes',
      'seasons',
      'surfacing',
      'metal_model',
    );
    fc.assert(
      fc.property(keys, fc.jsonValue({ maxDepth: 3 }), (key, value) => {
        outcome(bytesOf(JSON.stringify({ ...smallStudy, [key]: value })), goodTable);
      }),
      { seed: SEED, numRuns: 2000 },
    );
  });

  test('as survey.csv', () => {
    const good = [
      'spacing_m,ab_half_m,mn_half_m,apparent_resistivity_ohm_m,resistance_ohm,pin_depth_m,traverse',
      '1,,,100,,0.1,N',
      '2,,,,5.5,,N',
      ',10,1,80,,0.2,E',
      '',
    ].join('\n');
    const outcomes = new Set<string>();
    fc.assert(
      fc.property(damaged(bytesOf(good)), (bytes) => {
        try {
          const { readings } = loadSurvey(sourceFromMap(new Map([['survey.csv', bytes]])), 'survey.csv');
          expect(readings.length).toBeGreaterThan(0);
          expect(readings.every(({ apparentResistivity }) => Number.isFinite(apparentResistivity))).toBe(
            true,
          );
          outcomes.add('loaded');
        } catch (error) {
          if (!(error instanceof InputFaults)) throw error;
          for (const { message } of error.faults) expect(message).not.toMatch(/undefined|NaN|\[object|\n/);
          outcomes.add('refused');
        }
      }),
      { seed: SEED, numRuns: 2000 },
    );
    expect(outcomes).toEqual(new Set(['loaded', 'refused']));
  });

  test('as points.csv', () => {
    fc.assert(
      fc.property(damaged(bytesOf('x_m,y_m,depth_m\n1,2,0\n3,4,0.5\n')), (bytes) => {
        try {
          const table = loadPoints(sourceFromMap(new Map([['points.csv', bytes]])), 'points.csv');
          expect([...table.x, ...table.y, ...table.depth].every(Number.isFinite)).toBe(true);
        } catch (error) {
          if (!(error instanceof InputFaults)) throw error;
        }
      }),
      { seed: SEED, numRuns: 1000 },
    );
  });
});
