import { describe, expect, it } from 'vitest';
import { equivalentUniformResistivities } from '../../src/survey/equivalent-uniform.ts';
import { soil } from '../support/soils.ts';

describe('equivalent uniform resistivities', () => {
  const [mean, middle, upper, lower] = equivalentUniformResistivities(soil([100, 2], [900]));

  it('are the mean and the middle of apparent resistivities (IEEE Std 80-2000, 13.4.1), each with its source', () => {
    // ρa/ρ1 at a/h = 1/4, 1/2, 1, 2, 4, 8 for K = 0.8, by the two-layer series
    const k = 0.8;
    const curve = [0.25, 0.5, 1, 2, 4, 8].map((a) => {
      let sum = 0;
      for (let n = 1; n < 400; n++)
        sum += k ** n * (1 / Math.hypot(1, (2 * n) / a) - 1 / Math.hypot(2, (2 * n) / a));
      return 100 * (1 + 4 * sum);
    });
    expect(Math.abs(mean!.resistivity / (curve.reduce((s, x) => s + x, 0) / 6) - 1)).toBeLessThan(1e-6);
    expect(Math.abs(middle!.resistivity / ((curve[0]! + curve[5]!) / 2) - 1)).toBeLessThan(1e-6);
    expect(mean!.source).toContain('IEEE Std 80-2000, 13.4.1');
    expect(middle!.source).toContain('IEEE Std 80-2000, 13.4.1');
  });

  it('are bracketed by either layer alone', () => {
    expect([upper!.resistivity, lower!.resistivity]).toEqual([100, 900]);
    for (const one of [mean!, middle!]) {
      expect(one.resistivity).toBeGreaterThan(100);
      expect(one.resistivity).toBeLessThan(900);
    }
    for (const one of [upper!, lower!]) expect(one.source).toBe('common practice, no source');
  });

  it('are none for other than two layers, for which no hand rule is made', () => {
    expect(equivalentUniformResistivities(soil([100]))).toEqual([]);
    expect(equivalentUniformResistivities(soil([100, 1], [200, 2], [50]))).toEqual([]);
  });
});
