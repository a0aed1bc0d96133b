// Means of nearly equal values.
import { expect, test } from 'vitest';
import { meanOf } from '../../src/numerics/mean.ts';

test('equal values give themselves to the last bit, where summing first would not', () => {
  expect((0.1 + 0.1 + 0.1) / 3).not.toBe(0.1);
  expect(meanOf([0.1, 0.1, 0.1])).toBe(0.1);
});

test('unequal values give their mean, none gives no number', () => {
  expect(meanOf([1, 2, 6])).toBe(3);
  expect(meanOf([])).toBeNaN();
});
