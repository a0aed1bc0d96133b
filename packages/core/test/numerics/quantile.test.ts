import { describe, expect, it } from 'vitest';
import { medianOf, quantileOfSorted } from '../../src/numerics/quantile.ts';

describe('quantiles', () => {
  it('lie straight between order statistics (Hyndman and Fan 1996, type 7)', () => {
    expect(quantileOfSorted([1, 2, 4, 8], 0)).toBe(1);
    expect(quantileOfSorted([1, 2, 4, 8], 0.5)).toBe(3);
    expect(quantileOfSorted([1, 2, 4, 8], 0.75)).toBe(5);
    expect(quantileOfSorted([1, 2, 4, 8], 1)).toBe(8);
    expect(quantileOfSorted([5], 0.3)).toBe(5);
  });

  it('give the middle of an unsorted sample', () => {
    expect(medianOf([9, 1, 5])).toBe(5);
    expect(medianOf([9, 1, 5, 7])).toBe(6);
    expect(medianOf([])).toBeNaN();
  });
});
