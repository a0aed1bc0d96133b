// Rounds of a case become rows with ratios to the engine, and figures for the goals of its size.
import { expect, test } from 'vitest';
import { ENGINE, PRODUCT, TWIN } from '../src/bench-engine.ts';
import { NODE_SHARED, ROW_BLOCKED, WHOLE_ARRAY } from '../src/bench-numpy.ts';
import type { Rounds, Run } from '../src/bench-rounds.ts';
import { SYSTEM_HEADER, systemFindings, systemRows, twinOverEngine } from '../src/bench-system-rows.ts';

const run = (wallMs: number, resistance = 2): Run => ({
  wallMs,
  cpuMs: wallMs / 2,
  solveMs: wallMs / 4,
  resistance,
});
const rounds: Rounds = new Map([
  [ENGINE, [run(10), run(20, 2.000002)]],
  [PRODUCT, [run(12, 4), run(30, 4)]],
  [TWIN, [run(40), run(60)]],
  [WHOLE_ARRAY, [run(1000, 1.99), undefined]],
  [ROW_BLOCKED, [run(500), run(800)]],
]);
const exactOf = (arm: string): number => (arm === PRODUCT ? 4.00004 : 2);

test('a row tells rounds, times, ratio by round, resistance and how far it is off', () => {
  const rows = systemRows(rounds, exactOf, undefined);
  expect(rows).toHaveLength(5);
  for (const row of rows) expect(row).toHaveLength(SYSTEM_HEADER.length);
  expect(rows[0]).toEqual([ENGINE, '2', '15.0 (10.0–20.0)', '3.75 (2.50–5.00)', '7.50 (5.00–10.0)', '1', '1', '2.000001', '5.0e-7']); // biome-ignore format: one row
  expect(rows[3]).toEqual([WHOLE_ARRAY, '1', '1000', '250', '500', '100×', '100×', '1.990000', '5.0e-3']);
  expect(rows[4]![5]).toBe('45.0× (40.0–50.0)');
});

test('scripts that did not run have rows with the reason', () => {
  const rows = systemRows(rounds, exactOf, 'python3 has no numpy');
  expect(rows.at(-1)!.slice(0, 4)).toEqual([NODE_SHARED, '0', 'python3 has no numpy', '–']);
  expect(rows.at(-1)).toHaveLength(SYSTEM_HEADER.length);
  expect(rows).toHaveLength(6);
});

test('an arm that failed each time says so', () => {
  const rows = systemRows(new Map([[ENGINE, [undefined]]]), exactOf, undefined);
  expect(rows[0]).toEqual([ENGINE, '0', '–', '–', '–', '1', '1', 'failed', '–']);
});

test('ratios speak for the goals of their size only, and the worst round of both engine arms for accuracy', () => {
  const { resistance, ...ratios } = systemFindings(2024, rounds, exactOf);
  expect(ratios).toEqual({ whole2000: 100, rows2000: 45 });
  expect(resistance).toBeCloseTo(1e-5, 8);
  expect(systemFindings(9800, rounds, exactOf)).toMatchObject({ whole10000: 100, rows10000: 45 });
  expect(Object.keys(systemFindings(440, rounds, exactOf))).toEqual(['resistance']);
});

test('the gate’s ratio is of processor time', () => {
  expect(twinOverEngine(rounds)).toBe(3.5);
  expect(twinOverEngine(new Map([[ENGINE, [run(1)]]]))).toBeUndefined();
});
