// A gate leaves room for a busy machine, and says what it saw and what it asks.
import { expect, test } from 'vitest';
import { gateLine, passes, SLACK } from '../src/bench-gates.ts';

test('a gate fails only below the usual ratio over the slack', () => {
  expect(passes({ name: 'a', found: 3 / SLACK, usual: 3 })).toBe(true);
  expect(passes({ name: 'a', found: 3 / SLACK - 0.01, usual: 3 })).toBe(false);
});

test('no figure at all fails', () => {
  expect(passes({ name: 'a', found: Number.NaN, usual: 3 })).toBe(false);
});

test('its line tells outcome, figure and limit', () => {
  expect(gateLine({ name: 'twin over engine', found: 1.2, usual: 2.4 })).toBe(
    'FAILED: twin over engine 1.20, at least 1.60 (usual 2.40 over 1.5)',
  );
  expect(gateLine({ name: 'twin over engine', found: 1.7, usual: 2.4 })).toMatch(/^passed: /);
});
