import { describe, expect, it } from 'vitest';
import { gridBars } from '../../../core/test/support/electrodes.ts';
import { solveStudy } from '../../src/index.ts';
import { studyOf } from '../support/studies.ts';

const grid = gridBars(20, 20, 2, 2, 0.5, 0.005);

describe('seasons of a study', async () => {
  const seasons = [
    { name: 'frozen to 0.8 m', top: { depth_m: 0.8, resistivity_ohm_m: 2000 } },
    { name: 'water at 3 m', below: { depth_m: 3, resistivity_ohm_m: 20 } },
    { name: 'another year', layers: [{ resistivity_ohm_m: 70 }] },
  ];
  const { results } = await solveStudy(studyOf(grid, [[100, 2], [300]], { seasons }));

  it('gives each the result of a study with that soil', async () => {
    const soils = [
      [[2000, 0.8], [100, 1.2], [300]],
      [[100, 2], [300, 1], [20]],
      [[70]],
    ] as const; // biome-ignore format: three soils
    for (const [k, layers] of soils.entries()) {
      const alone = (await solveStudy(studyOf(grid, layers))).results;
      expect(results.seasons[k]!.resistance_ohm).toBe(alone.electrode.resistance_ohm);
      expect(results.seasons[k]!.cases[0]!.touch).toEqual(alone.cases[0]!.touch);
      expect(results.seasons[k]!.covering_factor).toBe(alone.limits.covering_factor);
    }
  });

  it('names the season that governs each quantity: the highest rise, the narrowest margin', () => {
    const [governing] = results.envelope;
    expect(governing!.gpr.season).toBe('frozen to 0.8 m');
    expect(governing!.gpr.gpr_V).toBe(results.seasons[0]!.cases[0]!.gpr_V);
    const margins = [results.cases[0]!, ...results.seasons.map((season) => season.cases[0]!)].map(
      (c) => c.touch.margin_percent,
    );
    expect(governing!.touch.margin_percent).toBe(Math.min(...margins));
    expect(results.cases[0]!.gpr_V).toBeLessThan(governing!.gpr.gpr_V);
  });

  it('has no envelope where the study names no season', async () => {
    expect((await solveStudy(studyOf(grid, [[100]]))).results.envelope).toEqual([]);
  });
});
