import { describe, expect, it } from 'vitest';
import {
  LEAST_SQUARES_DEFAULTS,
  type LeastSquaresProblem,
  leastSquares,
} from '../../src/numerics/levenberg-marquardt.ts';

function problem(
  residuals: number,
  lower: readonly number[],
  upper: readonly number[],
  evaluate: LeastSquaresProblem['evaluate'],
): LeastSquaresProblem {
  return {
    parameters: lower.length,
    residuals,
    evaluate,
    lower: Float64Array.from(lower),
    upper: Float64Array.from(upper),
  };
}

// Rosenbrock (1960) as least squares: 10(y − x²), 1 − x
const valley = (lower: readonly number[], upper: readonly number[]): LeastSquaresProblem =>
  problem(2, lower, upper, (x, into) => {
    into[0] = 10 * (x[1]! - x[0]! ** 2);
    into[1] = 1 - x[0]!;
  });

describe('least squares', () => {
  it('finds the end of a bent valley, Rosenbrock (1960)', () => {
    const result = leastSquares(valley([-5, -5], [5, 5]), Float64Array.of(-1.2, 1));
    expect(result.outcome).toBe('converged');
    expect(Math.abs(result.x[0]! - 1)).toBeLessThan(1e-5);
    expect(Math.abs(result.x[1]! - 1)).toBeLessThan(1e-5);
  });

  it('meets the certified values of NIST StRD Misra1a (from memory), from both of its starts', () => {
    const y = [
      10.07, 14.73, 17.94, 23.93, 29.61, 35.18, 40.02, 44.82, 50.76, 55.05, 61.01, 66.4, 75.47, 81.78,
    ];
    const x = [77.6, 114.9, 141.1, 190.8, 239.9, 289, 332.8, 378.4, 434.8, 477.3, 536.8, 593.1, 689.1, 760];
    const misra = problem(14, [0, -20], [20, 0], (b, into) => {
      for (let i = 0; i < 14; i++)
        into[i] = Math.exp(b[0]!) * (1 - Math.exp(-Math.exp(b[1]!) * x[i]!)) - y[i]!;
    });
    for (const start of [
      [500, 1e-4],
      [250, 5e-4],
    ] as const) {
      // biome-ignore format: two starts
      const result = leastSquares(misra, Float64Array.from(start, Math.log));
      expect(result.outcome).toBe('converged');
      expect(Math.abs(result.sum / 1.2455138894e-1 - 1)).toBeLessThan(1e-8);
      expect(Math.abs(Math.exp(result.x[0]!) / 2.3894212918e2 - 1)).toBeLessThan(1e-5);
      expect(Math.abs(Math.exp(result.x[1]!) / 5.5015643181e-4 - 1)).toBeLessThan(1e-5);
    }
  });

  it('stops on a bound at the least sum that the bounds allow', () => {
    const result = leastSquares(valley([-5, -5], [0.5, 5]), Float64Array.of(-1.2, 1));
    expect(result.outcome).toBe('converged');
    expect(result.x[0]).toBe(0.5);
    expect(Math.abs(result.x[1]! - 0.25)).toBeLessThan(1e-6);
  });

  it('says when its steps run out', () => {
    const result = leastSquares(valley([-5, -5], [5, 5]), Float64Array.of(-1.2, 1), {
      ...LEAST_SQUARES_DEFAULTS,
      limit: 3,
    });
    expect(result.outcome).toBe('limit');
    expect(result.iterations).toBe(3);
  });

  it('says when no step helps although the residuals are not at right angles', () => {
    // |x| has a corner, not a stationary point, at its least
    const corner = problem(1, [-1], [1], (x, into) => {
      into[0] = 1 + Math.abs(x[0]! - 0.3);
    });
    expect(leastSquares(corner, Float64Array.of(0.8)).outcome).toBe('stalled');
  });

  it('leaves a parameter without effect where it was', () => {
    const flat = problem(1, [-9, -9], [9, 9], (x, into) => {
      into[0] = x[0]! - 2;
    });
    const result = leastSquares(flat, Float64Array.of(7, 3));
    expect(result.outcome).toBe('converged');
    expect(Math.abs(result.x[0]! - 2)).toBeLessThan(1e-5);
    expect(result.x[1]).toBe(3);
  });
});
