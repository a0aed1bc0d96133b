import { describe, expect, it } from 'vitest';
import { gaussLegendre } from '../../src/numerics/gauss-legendre.ts';

describe('Gauss–Legendre rule', () => {
  it('integrates every polynomial up to degree 2n − 1 exactly', () => {
    for (const order of [1, 2, 3, 4, 6, 10, 20]) {
      const { points, weights } = gaussLegendre(order);
      for (let degree = 0; degree < 2 * order; degree++) {
        const sum = points.reduce((total, x, k) => total + weights[k]! * x ** degree, 0);
        expect(Math.abs(sum * (degree + 1) - 1)).toBeLessThan(1e-13);
      }
    }
  });

  it('has the two-point abscissae 1/2 ± 1/(2√3) (Abramowitz & Stegun 1964, table 25.4)', () => {
    const { points } = gaussLegendre(2);
    expect(points[0]).toBeCloseTo(0.5 - 0.5 / Math.sqrt(3), 15);
    expect(points[1]).toBeCloseTo(0.5 + 0.5 / Math.sqrt(3), 15);
  });
});
