// The sentences about a survey, for any number of layers.
import type { FittedLayer, GroundReading, SoilFit, Spread } from '@ohmstead/study';
import { describe, expect, it } from 'vitest';
import {
  allowedSentence,
  depthSentence,
  outsideSentence,
  spacingRange,
} from '../../src/section/survey-words.ts';
import { fixtureOutcome } from '../fixture.ts';
import { withGround } from '../fixture-ground.ts';

const { ground } = withGround(fixtureOutcome({ spacing: 6 })).results;

function spread(low: number, high: number, best: number = (low + high) / 2): Spread {
  return { best, low, median: (low + high) / 2, high };
}

function fitOf(...layers: readonly FittedLayer[]): SoilFit {
  if (ground === null) throw new Error('the fixture has no ground');
  return { ...ground.fit, layers };
}

const plain = (text: string): string => text.replace(/[\u202f\u00a0]/g, ' ');
const last = (low: number, high: number, best?: number): FittedLayer => ({
  resistivity_ohm_m: spread(low, high, best),
  thickness_m: null,
});
const layer = (rho: Spread, thickness: Spread): FittedLayer => ({
  resistivity_ohm_m: rho,
  thickness_m: thickness,
});

describe('what the readings allow', () => {
  it('is one range in uniform soil', () => {
    expect(plain(allowedSentence(fitOf(last(95.4, 112.3)), 'SI'))).toBe(
      'The readings allow 95.4–112 Ω·m (5–95 % of the soils that fit within their scatter).',
    );
  });

  it('is told layer by layer in soils of three and more', () => {
    const fit = fitOf(
      layer(spread(126, 143), spread(1.14, 1.77)),
      layer(spread(441, 17_600), spread(0.1, 4.14)),
      last(27.7, 32.1),
    );
    expect(plain(allowedSentence(fit, 'SI'))).toContain(
      'The readings allow 126–143 Ω·m in the first layer of 1.14–1.77 m, 441–17 600 Ω·m in the second layer of 0.100–4.14 m and 27.7–32.1 Ω·m below (',
    );
  });

  it('names each quantity whose best fit lies outside', () => {
    const fit = fitOf(layer(spread(126, 143), spread(1.14, 1.77, 2)), last(27.7, 32.1, 20));
    expect(outsideSentence(fit)).toContain(
      'outside that band in the thickness of layer 1 and the resistivity of layer 2:',
    );
    expect(outsideSentence(fitOf(last(1, 3)))).toBeUndefined();
  });
});

describe('the range of the spacings', () => {
  it('is told once with its unit', () => {
    const at = (spacing_m: number): GroundReading => ({
      line: 2,
      traverse: '',
      spacing_m,
      apparent_resistivity_ohm_m: 100,
      model_ohm_m: 100,
      misfit_percent: 0,
      outlier: false,
    });
    const fit: SoilFit = { ...fitOf(last(1, 3)), readings: [at(0.6096), at(32)] };
    expect(plain(spacingRange(fit, 'SI'))).toBe('0.6096 to 32 m');
    expect(plain(spacingRange(fit, 'US'))).toBe('2 to 105 ft');
  });
});

describe('the depth that the readings resolve', () => {
  it('is set against the diagonal of the electrode', () => {
    const fit = fitOf(last(1, 3));
    expect(plain(depthSentence(fit, 10, 'SI'))).toBe(
      'The readings resolve the ground to about 16.6 m, deeper than the diagonal of the electrode, 10.0 m.',
    );
    expect(plain(depthSentence(fit, 40, 'SI'))).toContain('What lies deeper counts in its resistance');
    // 16.6 m and 10 m over 0.3048 m: NIST SP 811:2008, appendix B (from memory)
    expect(plain(depthSentence(fit, 10, 'US'))).toContain(
      'about 54.5 ft, deeper than the diagonal of the electrode, 32.8 ft',
    );
  });
});
