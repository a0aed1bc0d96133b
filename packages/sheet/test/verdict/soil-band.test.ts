// What the soil readings leave open of the limits, in words; and which season governs.
import type { Results } from '@ohmstead/study';
import { describe, expect, it } from 'vitest';
import { answerOf } from '../../src/verdict/answer.ts';
import { seasonRows } from '../../src/verdict/season-rows.ts';
import { casesLeftOpen, reachWords, soilBandRows, soilBandSentences } from '../../src/verdict/soil-band.ts';
import { fixtureOutcome } from '../fixture.ts';
import { withGround } from '../fixture-ground.ts';
import { withSeason } from '../fixture-season.ts';

const plain = (text: string): string => text.replace(/[\u202f\u00a0]/g, ' ');

/** One case with this worst touch voltage against 800 V, and a band from `low` to `high` times it. */
function banded(worst: number, low: number, high: number, names: readonly string[] = ['bus']): Results {
  const { results } = fixtureOutcome({ spacing: 6, caseNames: names });
  const outcome = fixtureOutcome({ spacing: 6, caseNames: names });
  const touching = {
    ...outcome,
    results: {
      ...results,
      electrodes: results.electrodes.map((e) => ({ ...e, touch_ratio: null })),
      cases: results.cases.map((c) => ({
        ...c,
        touch: { ...c.touch, worst_V: worst, uncertainty_V: 1, limit_V: 800 },
        step: { ...c.step, worst_V: 100, uncertainty_V: 1, limit_V: 2000 },
      })),
    },
  };
  return withGround(touching, { low, high }).results;
}

function touchWords(worst: number, low: number, high: number): string {
  return reachWords(soilBandRows(banded(worst, low, high))[0]);
}

describe('a band of soils against a limit', () => {
  it('is within, beyond or open', () => {
    expect(touchWords(500, 0.9, 1.2)).toBe('within the limit');
    expect(touchWords(1000, 0.9, 1.2)).toBe('beyond the limit');
    expect(touchWords(750, 0.9, 1.2)).toBe('open: some beyond the limit');
    expect(touchWords(850, 0.9, 1.2)).toBe('open: some within the limit');
  });

  it('is open too where all of it lies on the other side than the best fit', () => {
    expect(touchWords(700, 1.2, 1.4)).toBe('beyond the limit, best fit within');
    expect(touchWords(900, 0.5, 0.8)).toBe('within the limit, best fit beyond');
  });

  it('counts a limit that is just met as within', () => {
    expect(touchWords(800, 1, 1)).toBe('within the limit');
  });

  it('is open where a number is missing', () => {
    expect(soilBandRows(banded(500, Number.NaN, 1.2))[0].reach).toBe('open');
  });

  it('is not told where the soil was given', () => {
    const { results } = fixtureOutcome({ spacing: 6 });
    expect(soilBandRows(results)).toEqual([]);
    expect(soilBandSentences(results)).toEqual([]);
    expect(casesLeftOpen(results)).toBe(0);
  });
});

describe('the answer over the soils', () => {
  it('says at the top which limits the readings leave open', () => {
    expect(soilBandSentences(banded(750, 0.9, 1.2)).map(plain)).toEqual([
      'bus: the readings leave the worst touch voltage open across its limit of 800 V: 750 V at the best fit, 675–900 V over the soils that the readings allow (5–95 %).',
    ]);
    expect(soilBandSentences(banded(500, 0.9, 1.2))).toEqual([]);
  });

  it('names two and counts the rest', () => {
    const sentences = soilBandSentences(banded(750, 0.9, 1.2, ['a', 'b', 'c', 'd']));
    expect(sentences).toHaveLength(3);
    expect(sentences[2]).toBe('Two more that the readings leave open under People.');
  });

  it('limits the first line to the best fit where the soils leave a case open, and only there', () => {
    expect(answerOf(banded(750, 0.9, 1.2)).rest).toBe(
      'at the best fit; the soil readings leave one case open',
    );
    expect(answerOf(banded(750, 0.9, 1.2)).finding).toBe('within');
    expect(answerOf(banded(850, 0.9, 1.2, ['a', 'b'])).rest).toBe(
      'at the best fit; the soil readings leave two cases open',
    );
    expect(answerOf(banded(500, 0.9, 1.2)).rest).toBeUndefined();
  });

  it('keeps what the mesh leaves open beside what the soil leaves open', () => {
    const results = banded(799.5, 0.9, 1.2, ['a', 'b']);
    const one = {
      ...results,
      cases: results.cases.map((c, k) => (k === 0 ? c : { ...c, touch: { ...c.touch, worst_V: 300 } })),
    };
    expect(answerOf(one).rest).toMatch(/^the other is within the limits; at the best fit;/);
  });
});

describe('seasons', () => {
  const outcome = fixtureOutcome({ spacing: 6, caseNames: ['bus'] });

  it('are listed by kind, the soil as given first, and the governing one marked', () => {
    const rows = seasonRows(withSeason(outcome, { name: 'dry summer', times: 1.3 }).results);
    expect(rows.map((r) => [r.subject, r.governs])).toEqual([
      ['touch, as given', false],
      ['touch, dry summer', true],
      ['step, as given', false],
      ['step, dry summer', true],
    ]);
    expect(rows[1].worst).toBeCloseTo(1.3 * rows[0].worst, 9);
  });

  it('leave the soil as given governing where no season is worse', () => {
    const rows = seasonRows(withSeason(outcome, { name: 'wet spring', times: 0.8 }).results);
    expect(rows.filter((r) => r.governs).map((r) => r.subject)).toEqual([
      'touch, as given',
      'step, as given',
    ]);
  });

  it('are none where the study names none', () => {
    expect(seasonRows(outcome.results)).toEqual([]);
  });
});
