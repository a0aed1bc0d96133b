// Ties: what differs by rounding alone is told in the order of the tables, not of the rounding.
import { expect, test } from 'vitest';
import { worstIn } from '../../src/geometry/coarse.ts';
import { levelled } from '../../src/geometry/ties.ts';

const square = [
  [-1, -1],
  [3, -1],
  [3, 3],
  [-1, 3],
] as const;

function mapOf(values: readonly number[]) {
  const potential = Float64Array.from(values);
  const map = {
    x0: 0,
    y0: 0,
    dx: 1,
    dy: 1,
    nx: 2,
    ny: 2,
    potential,
    touch: potential,
    step: potential,
    error: 0,
  };
  return worstIn(map, potential, square);
}

test('of places that differ by rounding alone the first is the worst', () => {
  expect(mapOf([800, 5, 5, 800 * (1 + 4e-16)])).toEqual({ value: 800, x: 0, y: 0 });
  expect(mapOf([800, 5, 5, 800.001])).toEqual({ value: 800.001, x: 1, y: 1 });
});

test('levelled values of a mirrored pair are equal, others are not', () => {
  expect(levelled(0.152345 * (1 + 4e-16))).toBe(levelled(0.152345));
  expect(levelled(0.152345)).not.toBe(levelled(0.152346));
});
