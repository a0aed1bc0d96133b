// Logarithmic axes: equal ratios are equal lengths, and round numbers stand on them.
import { describe, expect, it } from 'vitest';
import { decades, logScale, logTicks } from '../../src/geometry/log-axis.ts';

describe('a logarithmic axis', () => {
  it('gives equal ratios equal lengths', () => {
    const x = logScale([0.5, 50], [100, 500]);
    expect(x(0.5)).toBeCloseTo(100, 9);
    expect(x(5)).toBeCloseTo(300, 9);
    expect(x(50)).toBeCloseTo(500, 9);
    expect(x(8) - x(4)).toBeCloseTo(x(2) - x(1), 9);
  });

  it('runs upward where its range does', () => {
    const y = logScale([10, 1000], [300, 100]);
    expect(y(100)).toBeCloseTo(200, 9);
  });

  it('letters 1, 2 and 5 over few decades and whole decades over many', () => {
    const lettered = (from: number, to: number): readonly number[] =>
      logTicks(from, to)
        .filter((tick) => tick.lettered)
        .map((tick) => tick.value);
    expect(lettered(0.3, 60)).toEqual([0.5, 1, 2, 5, 10, 20, 50]);
    expect(lettered(1, 1e5)).toEqual([1, 10, 100, 1000, 1e4, 1e5]);
    expect(lettered(20, 200)).toEqual([20, 50, 100, 200]);
  });

  it('marks every step of a decade, exact to the digit', () => {
    expect(logTicks(0.2, 1).map((tick) => tick.value)).toEqual([0.2, 0.3, 0.4, 0.5, 0.6, 0.7, 0.8, 0.9, 1]);
    expect(decades(0.5, 50)).toBeCloseTo(2, 12);
  });
});
