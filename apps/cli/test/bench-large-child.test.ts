// What the largest case prints in its own process is read back, and a failure there is told in the tables.
import { expect, test } from 'vitest';
import { largeByChild, partOf } from '../src/bench-large-child.ts';

const surroundings = {
  numpy: { kind: 'absent', reason: 'none' },
  full: false,
  told: () => {},
} as const;

test('lines and known findings are kept', () => {
  expect(partOf({ lines: ['a'], findings: { largestTime: 4.5, other: 1, largestMemory: 'much' } })).toEqual({
    lines: ['a'],
    findings: { largestTime: 4.5 },
  });
  expect(() => partOf({ lines: 'a', findings: {} })).toThrow('printed no lines and findings');
  expect(() => partOf(undefined)).toThrow('printed no lines and findings');
});

test('a process that dies gives a line with its last words and no findings', async () => {
  const spawner = async () => ({ status: 134, stdout: '', stderr: 'heap\nout of memory\n' });
  const part = await largeByChild('two layers', 1, { ...surroundings, spawner });
  expect(part.lines).toEqual(['**Largest case, two layers:** ended with 134: out of memory']);
  expect(part.findings).toBeUndefined();
});
