import { checkRows, type SurveyRow } from '@ohmstead/core';
import { describe, expect, it } from 'vitest';
import { gridBars } from '../../../core/test/support/electrodes.ts';
import { fitSurvey, type LoadedStudy, type LoadedSurvey, solveStudy } from '../../src/index.ts';
import { studyOf } from '../support/studies.ts';

function surveyOf(spacings: readonly number[], apparent: readonly number[]): LoadedSurvey {
  const rows = spacings.map(
    (spacing, i): SurveyRow => ({
      row: i + 2,
      array: { kind: 'wenner', spacing, pinDepth: 0 },
      traverse: '',
      quantity: 'apparent resistivity',
      value: apparent[i]!,
    }),
  );
  return { file: 'survey.csv', readings: checkRows(rows).readings, cautions: [] };
}

// textbook survey of Kindermann and Campagnolo, 700 over 180 Ω·m at 2.5 m (values read in secondary copies)
const textbook = surveyOf([1, 2, 4, 6, 8, 16, 32], [684, 611, 415, 294, 237, 189, 182]);
const grid = gridBars(20, 20, 2, 2, 0.5, 0.005);

function surveyed(survey: LoadedSurvey, layer_count: number | 'auto'): LoadedStudy {
  const loaded = studyOf(grid, [[1]]);
  return { ...loaded, study: { ...loaded.study, soil: { survey: survey.file, layer_count } }, survey };
}

describe('a study whose soil is a survey', async () => {
  const { results } = await solveStudy(surveyed(textbook, 'auto'));

  it('is solved in the soil that the readings fit', async () => {
    const [upper, lower] = results.soil.layers;
    expect(Math.abs(upper!.resistivity_ohm_m / 699.85 - 1)).toBeLessThan(1e-2);
    expect(Math.abs(lower!.resistivity_ohm_m / 180.24 - 1)).toBeLessThan(1e-2);
    expect(Math.abs(upper!.thickness_m! / 2.499 - 1)).toBeLessThan(1e-2);
    const layers = [[upper!.resistivity_ohm_m, upper!.thickness_m!], [lower!.resistivity_ohm_m]] as const; // biome-ignore format: two layers
    expect(results.electrode.resistance_ohm).toBe(
      (await solveStudy(studyOf(grid, layers))).results.electrode.resistance_ohm,
    );
  });

  it('carries the band of the readings to resistance, rise, touch and step, the best fit inside it', () => {
    const { consequence, fit } = results.ground!;
    expect(fit.layer_count).toBe(2);
    expect(fit.layer_count_proposed).toBe(2);
    const [only] = consequence.cases;
    for (const spread of [consequence.resistance_ohm, only!.gpr_V, only!.touch_V, only!.step_V]) {
      expect(spread.low).toBeLessThan(spread.median);
      expect(spread.median).toBeLessThan(spread.high);
      expect(spread.low).toBeLessThan(spread.best * 1.02);
      expect(spread.high).toBeGreaterThan(spread.best * 0.98);
    }
    expect(consequence.resistance_ohm.best).toBe(results.electrode.resistance_ohm);
    expect(only!.touch_V.best).toBe(results.cases[0]!.touch.worst_V);
  });

  it('is in doubt when the spacings stop short of the electrode, and not when they do not', async () => {
    const short = (await solveStudy(surveyed(surveyOf([1, 2, 4, 6, 8], [684, 611, 415, 294, 237]), 2)))
      .results;
    expect(short.warnings.map((w) => w.code)).toContain('spacings-short');
    expect(results.warnings.map((w) => w.code)).not.toContain('spacings-short');
  });

  it('shows the uniform soil that a hand calculation would use, and how far off each is', async () => {
    const names = results.equivalent_uniform.map((e) => e.name);
    expect(names).toContain('upper layer alone');
    const upper = results.equivalent_uniform.find((e) => e.name === 'upper layer alone')!;
    const alone = (await solveStudy(studyOf(grid, [[upper.resistivity_ohm_m]]))).results.electrode;
    expect(Math.abs(upper.resistance_ohm / alone.resistance_ohm - 1)).toBeLessThan(3e-3);
    expect(upper.deviation_percent).toBeCloseTo(
      100 * (upper.resistance_ohm / results.electrode.resistance_ohm - 1),
      9,
    );
    expect(upper.deviation_percent).toBeGreaterThan(50);
  });

  it('gives the same fit and family each time', () => {
    expect(JSON.stringify(fitSurvey(textbook, 2))).toBe(JSON.stringify(fitSurvey(textbook, 2)));
  });
});
