// Differences of maps: exact on linear fields whatever the lattices, only on common ground, and none below the maps' own error.
import type { CaseMap, Polygon } from '@ohmstead/study';
import { describe, expect, it } from 'vitest';
import { differenceDrawing, differenceOf } from '../../src/geometry/difference.ts';

/** A map whose touch voltage is linear in x and y. */
function linear(
  at: { x0: number; y0: number; spacing: number; n: number },
  a: number,
  b: number,
  c: number,
): CaseMap {
  const { x0, y0, spacing, n } = at;
  const touch = Float64Array.from(
    { length: n * n },
    (_, k) => a + b * (x0 + (k % n) * spacing) + c * (y0 + Math.floor(k / n) * spacing),
  );
  return {
    x0,
    y0,
    dx: spacing,
    dy: spacing,
    nx: n,
    ny: n,
    potential: touch.map((v) => -v),
    touch,
    step: touch,
    error: 0.5,
  };
}

const now = linear({ x0: 0, y0: 0, spacing: 1, n: 11 }, 100, 5, 0);

describe('difference of two maps', () => {
  it('is exact where both fields are linear, on the ground that both cover', () => {
    const before = linear({ x0: 2.5, y0: -3, spacing: 0.7, n: 9 }, 100, 0, 2);
    const found = differenceOf(now, before, 'touch');
    expect(found?.lattice).toMatchObject({ x0: 3, y0: 0, nx: 6, ny: 3 });
    found?.values.forEach((value, k) => {
      const [x, y] = [3 + (k % 6), Math.floor(k / 6)];
      expect(value).toBeCloseTo(5 * x - 2 * y, 10);
    });
    expect(found?.error).toBe(1);
  });

  it('compares magnitudes of touch voltage, and signs of potential', () => {
    const turned = linear({ x0: 0, y0: 0, spacing: 1, n: 11 }, -100, -5, 0);
    const largest = (kind: 'touch' | 'potential'): number =>
      Math.max(...(differenceOf(now, turned, kind)?.values.map(Math.abs) ?? [Number.NaN]));
    expect(largest('touch')).toBe(0);
    expect(largest('potential')).toBe(300);
  });

  it('is none where the maps cover other ground', () => {
    expect(
      differenceOf(now, linear({ x0: 10.5, y0: 0, spacing: 1, n: 5 }, 0, 0, 0), 'touch'),
    ).toBeUndefined();
  });
});

describe('drawing of a difference', () => {
  const drawn = (a: number, b: number, areas: readonly Polygon[] = []) => {
    const found = differenceOf(now, linear({ x0: 0, y0: 0, spacing: 1, n: 11 }, a, b, 0), 'touch');
    return found && differenceDrawing(found, areas);
  };

  it('has bands by round volts to either side', () => {
    // now − before = 5x − 20: from −20 V to +30 V
    const found = drawn(120, 0);
    expect(found?.step).toBe(10);
    expect(found?.up.map((band) => band.level)).toEqual([10, 20]);
    expect(found?.up.map((band) => band.rings.length > 0)).toEqual([true, true]);
    expect(found?.down.map((band) => band.rings.length > 0)).toEqual([true, false]);
    expect(found?.most).toEqual({ value: 30, x: 10, y: 0 });
    expect(found?.least).toEqual({ value: -20, x: 0, y: 0 });
  });

  it('is as fine as what changed on assessed ground asks', () => {
    const area: Polygon = [
      [3.5, -1],
      [5.5, -1],
      [5.5, 11],
      [3.5, 11],
    ];
    // now − before = 5x − 20: at most 5 V at x = 5, nothing lower
    const found = drawn(120, 0, [area]);
    expect(found?.step).toBe(1);
    expect(found?.most).toEqual({ value: 5, x: 5, y: 0 });
    expect(found?.least).toBeUndefined();
  });

  it('is none where nothing moved by more than both maps may be off', () => {
    expect(drawn(100.9, 5)).toBeUndefined();
    expect(drawn(101.1, 5)?.most).toBeUndefined();
  });
});
