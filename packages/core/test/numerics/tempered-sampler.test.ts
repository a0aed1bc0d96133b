import { describe, expect, it } from 'vitest';
import { randomNumbers } from '../../src/numerics/random.ts';
import { sampleTempered, type TemperedDraws } from '../../src/numerics/tempered-sampler.ts';

const OPTIONS = { particles: 2000, taken: 1, lastTaken: 3 };

function draws(
  logLikelihood: (x: Float64Array) => number,
  dimension: number,
  half: number,
  seed: number,
): TemperedDraws {
  const random = randomNumbers(seed);
  return sampleTempered(
    {
      draw: () => Float64Array.from({ length: dimension }, () => half * (2 * random.uniform() - 1)),
      logLikelihood: (x) =>
        x.every((value) => Math.abs(value) <= half) ? logLikelihood(x) : Number.NEGATIVE_INFINITY,
    },
    random,
    OPTIONS,
  );
}

describe('tempered particles', () => {
  it('share two narrow valleys in proportion to their weight', () => {
    // normals of scatter 0.05 in three dimensions at ±3, seven to three
    const log = (x: Float64Array, at: number): number =>
      -x.reduce((sum, value) => sum + (value - at) ** 2, 0) / (2 * 0.05 ** 2);
    const result = draws(
      (x) => {
        const a = Math.log(0.7) + log(x, 3);
        const b = Math.log(0.3) + log(x, -3);
        return Math.max(a, b) + Math.log1p(Math.exp(-Math.abs(a - b)));
      },
      3,
      10,
      4,
    );
    expect(result.outcome).toBe('mixed');
    const share = result.particles.filter((x) => x[0]! > 0).length / OPTIONS.particles;
    expect(Math.abs(share - 0.7)).toBeLessThan(0.12);
    expect(result.particles.every((x) => Math.abs(Math.abs(x[0]!) - 3) < 0.3)).toBe(true);
  });

  it('have the mean and the covariance of a long thin normal density', () => {
    // x + y known to 0.02, x − y to 1
    const result = draws(
      (x) => -((x[0]! + x[1]! - 1) ** 2) / (2 * 0.02 ** 2) - (x[0]! - x[1]!) ** 2 / 2,
      2,
      10,
      5,
    );
    const mean = (pick: (x: Float64Array) => number): number =>
      result.particles.reduce((sum, x) => sum + pick(x), 0) / result.particles.length;
    expect(Math.abs(mean((x) => x[0]! + x[1]!) - 1)).toBeLessThan(0.003);
    expect(Math.abs(mean((x) => x[0]! - x[1]!))).toBeLessThan(0.1);
    expect(Math.abs(Math.sqrt(mean((x) => (x[0]! - x[1]!) ** 2)) - 1)).toBeLessThan(0.08);
    expect(Math.abs(Math.sqrt(mean((x) => (x[0]! + x[1]! - 1) ** 2)) / 0.02 - 1)).toBeLessThan(0.08);
  });

  it('are the prior where the likelihood tells nothing', () => {
    const result = draws(() => 0, 1, 1, 6);
    const sorted = result.particles.map((x) => x[0]!).sort((a, b) => a - b);
    sorted.forEach((value, i) => {
      // Kolmogorov's distance at 2000 draws: 1.95/√2000 = 0.044 once in a thousand
      expect(Math.abs((value + 1) / 2 - (i + 0.5) / sorted.length)).toBeLessThan(0.044);
    });
  });

  it('are repeated by their seed', () => {
    const log = (x: Float64Array): number => -50 * x[0]! ** 2;
    expect(draws(log, 2, 1, 3).particles).toEqual(draws(log, 2, 1, 3).particles);
    expect(draws(log, 2, 1, 3).particles).not.toEqual(draws(log, 2, 1, 4).particles);
  });

  it('complain when the prior has no place with a likelihood', () => {
    expect(() => draws(() => Number.NEGATIVE_INFINITY, 1, 1, 1)).toThrowError(RangeError);
  });
});
