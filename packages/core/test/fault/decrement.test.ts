// Decrement factor against the printed table of the standard.
import { describe, expect, test } from 'vitest';
import { decrementFactor } from '../../src/fault/decrement.ts';

const ratios = [10, 20, 30, 40] as const;

// IEEE Std 80-2000, table of typical decrement factors, 60 Hz (from memory; every digit reproduced by independent computation).
const printed: readonly (readonly [duration: number, factors: readonly number[]])[] = [
  [0.00833, [1.576, 1.648, 1.675, 1.688]],
  [0.05, [1.232, 1.378, 1.462, 1.515]],
  [0.1, [1.125, 1.232, 1.316, 1.378]],
  [0.2, [1.064, 1.125, 1.181, 1.232]],
  [0.3, [1.043, 1.085, 1.125, 1.163]],
  [0.4, [1.033, 1.064, 1.095, 1.125]],
  [0.5, [1.026, 1.052, 1.077, 1.101]],
  [0.75, [1.018, 1.035, 1.052, 1.068]],
  [1, [1.013, 1.026, 1.039, 1.052]],
];

// The same equation at 50 Hz: independent computation.
const at50: readonly (readonly [duration: number, factors: readonly number[]])[] = [
  [0.05, [1.2685, 1.4172, 1.4965, 1.5445]],
  [0.1, [1.1479, 1.2685, 1.3555, 1.4172]],
  [0.2, [1.0766, 1.1479, 1.2125, 1.2685]],
  [0.5, [1.0313, 1.0618, 1.0913, 1.1201]],
  [1, [1.0158, 1.0313, 1.0467, 1.0618]],
];

const cells = (rows: typeof printed): (readonly [number, number, number])[] =>
  rows.flatMap(([duration, factors]) => factors.map((factor, i) => [duration, ratios[i]!, factor] as const));

describe('decrement factor', () => {
  test.each(cells(printed))('60 Hz, %f s, X/R %i: %f', (duration, xOverR, factor) => {
    expect(decrementFactor(xOverR, 60, duration).toFixed(3)).toBe(factor.toFixed(3));
  });

  test.each(cells(at50))('50 Hz, %f s, X/R %i: %f', (duration, xOverR, factor) => {
    expect(decrementFactor(xOverR, 50, duration).toFixed(4)).toBe(factor.toFixed(4));
  });

  test('of the worked examples of IEEE Std 80, Annex B, which round it to 1.0', () => {
    // X/R 3.33 at 115 kV and 16.2 at 13 kV, 0.5 s, 60 Hz: IEEE Std 80-2000, B.1 (from memory); factors: independent computation
    expect(decrementFactor(3.33, 60, 0.5).toFixed(3)).toBe('1.009');
    expect(decrementFactor(16.2, 60, 0.5).toFixed(3)).toBe('1.042');
  });

  test('is 1 where there is no offset to count', () => {
    expect(decrementFactor(undefined, 60, 0.5)).toBe(1);
    expect(decrementFactor(0, 60, 0.5)).toBe(1);
  });

  test('goes from √3 for the shortest fault to 1 for the longest', () => {
    // a fully offset wave that has not decayed: 1 + 2 = 3 times the heating
    expect(decrementFactor(40, 60, 1e-9)).toBeCloseTo(Math.sqrt(3), 6);
    expect(decrementFactor(1e-6, 60, 3)).toBeCloseTo(1, 8);
  });

  test('refuses what has no meaning', () => {
    expect(() => decrementFactor(-1, 60, 0.5)).toThrow('X/R: -1 is negative');
    expect(() => decrementFactor(10, 0, 0.5)).toThrow('frequency: 0 Hz is not positive');
    expect(() => decrementFactor(10, 60, 0)).toThrow('fault duration: 0 s is not positive');
  });
});
