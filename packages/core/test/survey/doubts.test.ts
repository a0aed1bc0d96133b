import { describe, expect, it } from 'vitest';
import { soilFamily } from '../../src/survey/ambiguity.ts';
import {
  investigationRange,
  type SurveyDoubt,
  spacingDoubts,
  surveyDoubts,
} from '../../src/survey/doubts.ts';
import { invertSurvey } from '../../src/survey/inversion.ts';
import { proposeLayerCount } from '../../src/survey/layer-count.ts';
import type { Reading } from '../../src/survey/readings.ts';
import { kindermann, pirson, seedherArora3, student, wennerReadings } from '../support/surveys.ts';

function doubtsOf(readings: readonly Reading[], layers: number): readonly SurveyDoubt[] {
  const fit = invertSurvey(readings, layers);
  if (fit.kind === 'refused') throw new Error(fit.message);
  return surveyDoubts(readings, fit, soilFamily(readings, fit));
}

const codes = (doubts: readonly SurveyDoubt[]): string[] => doubts.map((doubt) => doubt.code);

describe('doubts about a survey', () => {
  it('are none about a clean survey that reaches far enough', () => {
    expect(doubtsOf(kindermann, 2)).toEqual([]);
    expect(spacingDoubts(kindermann, 30, 0.6)).toEqual([]);
  });

  it('say that no layered model fits the student survey, whatever the number of layers, and why', () => {
    for (const layers of [1, 2, 3, 4, proposeLayerCount(student).layers!]) {
      const doubts = doubtsOf(student, layers);
      expect(doubts[0]!.code).toBe('no-layered-model');
      expect(doubts[0]!.message).toMatch(
        /^no soil of (one layer|\d layers) fits these readings: .*; look for buried metal, /,
      );
    }
    const steep = doubtsOf(student, 3).filter((doubt) => doubt.code === 'rise-too-steep');
    expect(steep.map((doubt) => doubt.message)).toEqual([
      'apparent resistivity rises 2.22 times from spacing 6 m to 8 m (rows 5, 6); over horizontal layers it rises no more than the spacing, 1.33 times',
      'apparent resistivity rises 4.67 times from spacing 12 m to 16 m (rows 7, 8); over horizontal layers it rises no more than the spacing, 1.33 times',
    ]);
  });

  it('say so as well where the readings that fit do so closely but too many do not', () => {
    const spacings = [0.5, 0.75, 1, 1.5, 2, 3, 4, 6, 8, 12];
    const values = [100, 160, 101, 99, 60, 100, 101, 170, 99, 100];
    const [gravest] = doubtsOf(wennerReadings(spacings, values), 1);
    expect(gravest!.code).toBe('no-layered-model');
    expect(gravest!.message).toMatch(
      /^no soil of one layer fits these readings: 3 of 10 lie off the best one; /,
    );
  });

  it('say that layers of a degenerate soil are known only together, and that the fit stands on its bound', () => {
    const doubts = doubtsOf(pirson, 3);
    expect(codes(doubts)).toContain('at-bound');
    expect(doubts.find((doubt) => doubt.code === 'at-bound')!.message).toBe(
      'resistivity of layer 2 is held at its upper bound: the readings do not limit it from above, and more than 173000 Ω·m was not tried',
    );
    expect(
      doubts.some(({ code, message }) => code === 'degenerate-layer' && message.startsWith('layer 2 ')),
    ).toBe(true);
    // told once, as degenerate, not again as open
    expect(doubts.some(({ code, message }) => code === 'unresolved' && message.includes('layer 2'))).toBe(
      false,
    );
  });

  it('ask for more layers where the misfit is between 10 and 25 %', () => {
    const [poor] = doubtsOf(pirson, 2);
    expect(poor!.code).toBe('poor-fit');
    expect(poor!.message).toMatch(
      /^the best soil of 2 layers misses the readings by 1\d\.\d % rms where 10 % or less is expected; try more layers, /,
    );
  });

  it('name the ground that a short survey leaves open', () => {
    const open = doubtsOf(seedherArora3, 2).filter((doubt) => doubt.code === 'unresolved');
    expect(open[0]!.message).toMatch(
      /^the readings leave the resistivity of layer 2 open from \d+ to \d+ Ω·m, more than a factor of 3$/,
    );
  });

  it('name rows that stand off the model, with sign and size', () => {
    const spacings = [0.5, 0.75, 1, 1.5, 2, 3, 4, 6, 8, 12];
    const values = spacings.map(() => 100);
    values[4] = 150;
    const [outliers] = doubtsOf(wennerReadings(spacings, values), 1);
    expect(outliers).toEqual({
      code: 'outliers',
      message:
        'readings in row 6 (+49 %) stand off the model by more than 2.5 robust standard deviations; they are used with less weight, not dropped',
    });
  });

  it('tell traverses apart whose ground differs, not ones that differ within their scatter', () => {
    const spacings = [1, 2, 4, 8, 16];
    const west = wennerReadings(spacings, [100, 102, 98, 101, 99], 0, 'west');
    const east = (factor: number): Reading[] => wennerReadings(spacings, [100 * factor, 99 * factor, 102 * factor, 98 * factor, 101 * factor], 0, 'east'); // biome-ignore format: one row
    expect(codes(doubtsOf([...west, ...east(1.12)], 1))).toEqual([]);
    const doubts = doubtsOf([...west, ...east(1.8)], 1).filter((doubt) => doubt.code === 'traverses-differ');
    expect(doubts.map((doubt) => doubt.message)).toEqual([
      'traverse east reads 34 % above the geometric mean of all traverses over 5 spacings: the ground changes along the site; fit each traverse by itself too',
      'traverse west reads 25 % below the geometric mean of all traverses over 5 spacings: the ground changes along the site; fit each traverse by itself too',
    ]);
  });

  it('say when a fit did not settle', () => {
    const fit = invertSurvey(kindermann, 2);
    if (fit.kind === 'refused') throw new Error(fit.message);
    const family = soilFamily(kindermann, fit);
    const [unsettled] = surveyDoubts(kindermann, { ...fit, outcome: 'limit' }, family);
    expect(unsettled!.code).toBe('inversion-not-settled');
    expect(codes(surveyDoubts(kindermann, fit, { ...family, outcome: 'limit' }))).toEqual([
      'family-not-settled',
    ]);
  });
});

describe('the reach of a survey', () => {
  it('is in doubt when spacings stop short of the diagonal or begin below the electrode', () => {
    expect(spacingDoubts(seedherArora3, 70, 0.5).map((doubt) => doubt.message)).toEqual([
      "spacings end at 10 m, short of the electrode's diagonal of 70 m: half of what the longest sees lies above 5.19 m, and the deep ground that decides resistance and rise is known only as far as the family tells",
      'spacings begin at 2 m: half of what the shortest sees lies below 1.04 m, with the electrode at 0.5 m, and the shallow ground that decides touch and step voltage is hardly told',
    ]);
    expect(codes(spacingDoubts(seedherArora3, 70))).toEqual(['spacings-short']);
  });

  it('is from the median depth of the shortest spacing to that of the longest (Edwards 1977: 0.519 a, from memory)', () => {
    const { shallowest, deepest } = investigationRange(kindermann);
    expect(Math.abs(shallowest - 0.519)).toBeLessThan(5e-4);
    expect(Math.abs(deepest / 32 - 0.519)).toBeLessThan(5e-4);
  });
});
