// Covering derating factor against evaluated tables of the standard's equation.
import { describe, expect, test } from 'vitest';
import { coveringDeratingFactor } from '../../src/safety/covering-derating.ts';

// IEEE Std 80-2000/2013, eq. 27 (from memory), evaluated: independent computation. Soil and covering given by the
// reflection factor K = (ρ − ρs)/(ρ + ρs).
const thicknesses = [0.04, 0.06, 0.08, 0.1, 0.15, 0.2, 0.3] as const;
const rows: readonly (readonly [reflection: number, factors: readonly number[]])[] = [
  [-0.2, [0.8235, 0.8571, 0.88, 0.8966, 0.9231, 0.9388, 0.9565]],
  [-0.5, [0.6471, 0.7143, 0.76, 0.7931, 0.8462, 0.8776, 0.913]],
  [-0.7, [0.564, 0.6471, 0.7035, 0.7444, 0.81, 0.8487, 0.8926]],
  [-0.9, [0.4985, 0.594, 0.6589, 0.706, 0.7814, 0.826, 0.8764]],
  [-0.98, [0.4759, 0.5758, 0.6436, 0.6928, 0.7716, 0.8182, 0.8709]],
];
const cells = rows.flatMap(([reflection, factors]) =>
  factors.map((factor, i) => [reflection, thicknesses[i]!, factor] as const),
);

describe('covering derating factor', () => {
  test.each(cells)('reflection %f, %f m thick: %f', (reflection, thickness, factor) => {
    const covering = { resistivity: 1000, thickness };
    const soil = (1000 * (1 + reflection)) / (1 - reflection);
    expect(coveringDeratingFactor(soil, covering).toFixed(4)).toBe(factor.toFixed(4));
  });

  test('the worked examples of IEEE Std 80, Annex B: 0.74', () => {
    // IEEE Std 80-2000, B.1, step 3 (from memory): ρ 400, ρs 2500, hs 0.102 m; unrounded 0.742857: independent computation
    const factor = coveringDeratingFactor(400, { resistivity: 2500, thickness: 0.102 });
    expect(factor.toFixed(2)).toBe('0.74');
    expect(factor.toFixed(6)).toBe('0.742857');
  });

  test('is 1 without covering, and with a covering like the soil', () => {
    expect(coveringDeratingFactor(400, undefined)).toBe(1);
    expect(coveringDeratingFactor(400, { resistivity: 400, thickness: 0.1 })).toBe(1);
  });

  test('refuses what is no covering', () => {
    expect(() => coveringDeratingFactor(400, { resistivity: 0, thickness: 0.1 })).toThrow(
      'covering resistivity: 0 Ω·m is not a positive number',
    );
    expect(() => coveringDeratingFactor(400, { resistivity: 2500, thickness: -0.1 })).toThrow(
      'covering thickness: -0.1 m is not a positive number',
    );
    expect(() => coveringDeratingFactor(Number.NaN, { resistivity: 2500, thickness: 0.1 })).toThrow(
      'soil resistivity: NaN Ω·m is not a positive number',
    );
  });
});
