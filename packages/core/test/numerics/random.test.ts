import { describe, expect, it } from 'vitest';
import { randomNumbers } from '../../src/numerics/random.ts';

describe('random numbers', () => {
  it('are repeated by their seed and differ between seeds', () => {
    const draw = (seed: number): number[] => {
      const random = randomNumbers(seed);
      return Array.from({ length: 8 }, () => random.uniform());
    };
    expect(draw(7)).toEqual(draw(7));
    expect(new Set([0, 1, 2, 3, -1].map((seed) => draw(seed).join())).size).toBe(5);
  });

  it('are even in [0, 1), one independent of the next', () => {
    const random = randomNumbers(1);
    const n = 200_000;
    const bins = new Float64Array(100);
    let product = 0;
    let previous = random.uniform();
    for (let i = 0; i < n; i++) {
      const u = random.uniform();
      bins[Math.floor(100 * u)]!++;
      product += (u - 0.5) * (previous - 0.5);
      previous = u;
    }
    // χ² with 99 degrees of freedom: mean 99, standard deviation 14
    const chi = bins.reduce((sum, count) => sum + (count - n / 100) ** 2 / (n / 100), 0);
    expect(chi).toBeGreaterThan(50);
    expect(chi).toBeLessThan(150);
    expect(Math.abs(product / n) * 12).toBeLessThan(4 / Math.sqrt(n));
  });

  it('have normals with the moments of the normal distribution: 0, 1, 0, 3', () => {
    const random = randomNumbers(2);
    const n = 200_000;
    const moments = [0, 0, 0, 0];
    for (let i = 0; i < n; i++) {
      const z = random.normal();
      for (let k = 0; k < 4; k++) moments[k]! += z ** (k + 1) / n;
    }
    [0, 1, 0, 3].forEach((expected, k) => {
      // standard errors of the first four moments: √(1, 2, 15, 96)/√n
      expect(Math.abs(moments[k]! - expected)).toBeLessThan(
        (4 * Math.sqrt([1, 2, 15, 96][k]!)) / Math.sqrt(n),
      );
    });
  });
});
