// Medians, spreads, ratios by round and the exponent of a growth.
import { expect, test } from 'vitest';
import { growthExponent, ratioSpread, spread } from '../src/bench-statistics.ts';

test('the median of an odd number is its middle, of an even one the mean of the middle two', () => {
  expect(spread([9, 1, 5])).toEqual({ median: 5, least: 1, most: 9 });
  expect(spread([4, 1, 9, 2])).toEqual({ median: 3, least: 1, most: 9 });
});

test('figures are sorted by size, not by their digits', () => {
  expect(spread([100, 9, 8])?.median).toBe(9);
});

test('nothing measured has no median', () => {
  expect(spread([])).toBeUndefined();
});

test('ratios are taken round by round, and a round without one of the arms counts for nothing', () => {
  expect(ratioSpread([10, 30, undefined, 8], [5, 10, 2, undefined])).toEqual({
    median: 2.5,
    least: 2,
    most: 3,
  });
  expect(ratioSpread([1, 2], [undefined, undefined])).toBeUndefined();
});

test('a power of n has its exponent whatever its factor', () => {
  const sizes = [4000, 16_000, 64_000];
  expect(growthExponent(sizes, sizes.map((n) => 7 * n ** 1.17))).toBeCloseTo(1.17, 12); // biome-ignore format: one claim
  expect(growthExponent(sizes, [3, 3, 3])).toBeCloseTo(0, 12);
});

test('n log n between 4 000 and 64 000 grows like a power a little above one', () => {
  const sizes = [4000, 16_000, 64_000];
  const exponent = growthExponent(
    sizes,
    sizes.map((n) => n * Math.log(n)),
  );
  // the secant of ln ln n over ln n between the ends: ln(ln 64 000/ln 4 000)/ln 16
  expect(exponent).toBeCloseTo(1 + Math.log(Math.log(64_000) / Math.log(4000)) / Math.log(16), 3);
});
