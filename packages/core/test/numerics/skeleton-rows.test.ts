import { describe, expect, it } from 'vitest';
import { NotPositiveDefinite } from '../../src/numerics/packed-cholesky.ts';
import { LEAST_TOLERANCE, type RowSkeleton, skeletonRows } from '../../src/numerics/skeleton-rows.ts';
import { invertPositive } from '../../src/numerics/small-inverse.ts';
import { randomNumbers } from '../support/random.ts';

function largestError(a: Float64Array, rows: number, columns: number, found: RowSkeleton): number {
  const rank = found.rows.length;
  let worst = 0;
  for (let r = 0; r < rows; r++)
    for (let c = 0; c < columns; c++) {
      let value = 0;
      for (let k = 0; k < rank; k++) value += found.weights[r * rank + k]! * a[found.rows[k]! * columns + c]!;
      worst = Math.max(worst, Math.abs(value - a[r * columns + c]!));
    }
  return worst;
}

describe('telling rows', () => {
  const smooth = Float64Array.from(
    { length: 60 * 40 },
    (_, k) =>
      1 / Math.hypot(3 + 0.02 * (k % 40) + 0.01 * Math.floor(k / 40), 0.05 * (Math.floor(k / 40) - (k % 40))),
  );

  it('give a smooth block to its tolerance, more of them the tighter it is', () => {
    const ranks = [1e-2, 1e-4, 1e-6].map((tolerance) => {
      const found = skeletonRows(smooth, 60, 40, tolerance);
      expect(largestError(smooth, 60, 40, found)).toBeLessThan(2 * tolerance * Math.max(...smooth));
      return found.rows.length;
    });
    expect(ranks[0]).toBeLessThan(ranks[1]!);
    expect(ranks[1]).toBeLessThan(ranks[2]!);
    expect(ranks[2]).toBeLessThan(12);
  });

  it('stop where single precision has nothing more to tell', () => {
    expect(skeletonRows(smooth, 60, 40, 0)).toEqual(skeletonRows(smooth, 60, 40, LEAST_TOLERANCE));
  });

  it('are as many as the rank of a product, and stand for themselves', () => {
    const product = Float64Array.from({ length: 900 }, (_, k) => {
      const [r, c] = [Math.floor(k / 30), k % 30];
      return (r + 1) * (c + 2) + Math.sin(r) * Math.cos(c);
    });
    const { rows, weights } = skeletonRows(product, 30, 30, 1e-6);
    expect(rows.length).toBe(2);
    rows.forEach((row, k) => {
      expect(Array.from(weights.subarray(row * 2, row * 2 + 2))).toEqual(
        [0, 1].map((other) => (other === k ? 1 : 0)),
      );
    });
  });

  it('are all of a block without structure, and none of one without entries or of nothing but zeros', () => {
    const noise = Float64Array.from({ length: 400 }, randomNumbers(3));
    expect(skeletonRows(noise, 20, 20, 1e-9).rows.length).toBe(20);
    expect(skeletonRows(new Float64Array(0), 20, 0, 1e-9).rows.length).toBe(0);
    expect(skeletonRows(new Float64Array(12), 3, 4, 1e-9).rows.length).toBe(0);
  });
});

describe('a small inverse', () => {
  it('names the row whose pivot is not positive', () => {
    expect(() => invertPositive(Float64Array.of(1, 2, 2, 1), 2)).toThrow(new NotPositiveDefinite(1));
  });
});
