// Intervals of the soils on one scale: the limit at the same place in every row, nothing off the scale.
import { describe, expect, it } from 'vitest';
import { intervalOf, intervalScale } from '../../src/geometry/interval.ts';

const of = { best: 500, low: 400, median: 520, high: 900 };

describe('an interval', () => {
  it('stands by its share of the limit', () => {
    const full = 2;
    expect(intervalOf(of, 800, full)).toEqual({
      low: 0.25,
      high: 0.5625,
      median: 0.325,
      best: 0.3125,
      limit: 0.5,
    });
  });

  it('has its scale from the largest of all rows, the best fit counted too', () => {
    const rows = [
      { of, limit: 800 },
      { of: { best: 3000, low: 1, median: 2, high: 3 }, limit: 1000 },
    ];
    expect(intervalScale(rows)).toBeCloseTo(3.06, 9);
    expect(intervalScale([{ of: { best: 1, low: 1, median: 1, high: 1 }, limit: 1000 }])).toBe(1.25);
    for (const row of rows)
      for (const place of Object.values(intervalOf(row.of, row.limit, intervalScale(rows)))) {
        expect(place).toBeGreaterThanOrEqual(0);
        expect(place).toBeLessThanOrEqual(1);
      }
  });

  it('is at nought where a number is missing', () => {
    expect(intervalOf({ ...of, high: Number.NaN }, 800, 2).high).toBe(0);
  });
});
