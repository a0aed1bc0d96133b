// Goals are judged by their sense, and what was not measured is said to be so.
import { expect, test } from 'vitest';
import { claimRows, goals, judge } from '../src/bench-claims.ts';
import { mergedFindings } from '../src/bench-findings.ts';

test('a ratio must reach its limit, a time must stay below it', () => {
  expect(judge(goals.whole2000, 25, 25)).toBe('met');
  expect(judge(goals.whole2000, 25, 24.9)).toBe('not met');
  expect(judge(goals.largestTime, 5, 5)).toBe('met');
  expect(judge(goals.largestTime, 5, 5.1)).toBe('not met');
});

test('without a figure or a limit nothing is claimed', () => {
  expect(judge(goals.start, 400, undefined)).toBe('not measured');
  expect(judge(goals.entries, undefined, 1e-9)).toBe('not measured');
});

test('every goal has a row, in which must and stretch are judged apart', () => {
  const rows = claimRows({ cholesky: 41.26, growthMemory: 1.153, entries: 3.42e-7, mapLarge: 700 });
  expect(rows).toHaveLength(Object.keys(goals).length);
  const row = (start: string): string[] => rows.find(([name]) => name!.startsWith(start))!.slice(1);
  expect(row('packed Cholesky')).toEqual(['41.3×', '40.0×: met', '65.0×: not met']);
  expect(row('growth 4k → 64k: memory')).toEqual(['n^1.15', 'n^1.20: met', 'n^1.10: not met']);
  expect(row('accuracy: worst sampled entry')).toEqual(['3.4e-7', '1.0e-6: met', '–']);
  expect(row('map 1000')).toEqual(['700 ms', '600 ms: not met', '150 ms: not met']);
  expect(row('50 000 segments: memory')).toEqual(['–', '350 MB: not measured', '180 MB: not measured']);
});

test('of figures found twice the worst counts, and strangers are dropped', () => {
  expect(
    mergedFindings([{ entries: 1e-7 }, undefined, { entries: 4e-7, start: 300 }, { entries: 2e-7 }]),
  ).toEqual({ entries: 4e-7, start: 300 });
});
