// What the sheet answers: findings, their words, and the answer at the top.
import type { Results } from '@ohmstead/study';
import { describe, expect, it } from 'vitest';
import { answerOf, answerSentences } from '../../src/verdict/answer.ts';
import { findingOf, findingWords, undecidedReason } from '../../src/verdict/finding.ts';
import { governingCase, verdictRows } from '../../src/verdict/rows.ts';
import { fixtureOutcome } from '../fixture.ts';
import { withSeason } from '../fixture-season.ts';

const plain = (text: string): string => text.replace(/[\u202f\u00a0]/g, ' ');

/** Results whose cases have these worst touch voltages against 800 V, ± 10 V, and harmless step voltages. */
function touching(...worst: readonly number[]): Results {
  const { results } = fixtureOutcome({ spacing: 6, caseNames: worst.map((_, k) => `case ${k + 1}`) });
  return {
    ...results,
    electrodes: results.electrodes.map((e) => ({ ...e, touch_ratio: null })),
    cases: results.cases.map((c, k) => ({
      ...c,
      touch: { ...c.touch, worst_V: worst[k], uncertainty_V: 10, limit_V: 800, x_m: 24, y_m: 33.5 },
      step: { ...c.step, worst_V: 100, uncertainty_V: 1, limit_V: 2000 },
    })),
  };
}

describe('a finding', () => {
  it('is decided only where the margin is not smaller than the uncertainty', () => {
    expect(findingOf(700, 10, 800)).toBe('within');
    expect(findingOf(900, 10, 800)).toBe('beyond');
    expect(findingOf(795, 10, 800)).toBe('undecided');
    expect(findingOf(805, 10, 800)).toBe('undecided');
    expect(findingOf(800, 0, 800)).toBe('within');
    expect(findingOf(790, 10, 800)).toBe('within');
  });

  it('stays open where a number is missing', () => {
    expect(findingOf(Number.NaN, 1, 800)).toBe('undecided');
    expect(findingOf(100, Number.NaN, 800)).toBe('undecided');
    expect(findingOf(100, 1, 0)).toBe('undecided');
  });

  it('is told in words', () => {
    const of = (worst: number, uncertainty = 4): string =>
      plain(findingWords({ worst, uncertainty, limit: 622, finding: findingOf(worst, uncertainty, 622) }));
    expect(of(975)).toBe('exceeds the limit by 57 %');
    expect(of(412)).toBe('within the limit, 34 % margin');
    expect(of(620)).toBe('cannot be decided at this mesh');
  });

  it('says why it stays open', () => {
    const reason = undecidedReason({ worst: 838, uncertainty: 6, limit: 840, finding: 'undecided' });
    expect(plain(reason)).toBe(
      '838 ± 6 V against a limit of 840 V: the margin of 2.0 V is smaller than the numerical uncertainty, so a finer mesh has to decide.',
    );
  });
});

describe('the answer', () => {
  const words = (results: Results): string => {
    const { subject, predicate, rest } = answerOf(results);
    return [subject, predicate, rest].filter((part) => part !== undefined).join(' | ');
  };

  it('counts the cases that exceed a limit', () => {
    expect(words(touching(900, 500, 500))).toBe('one of three cases | exceeds a limit');
    expect(words(touching(900, 900, 500))).toBe('two of three cases | exceed a limit');
    expect(words(touching(900, 900))).toBe('both cases | exceed a limit');
    expect(words(touching(900))).toBe('the case | exceeds a limit');
  });

  it('says so when all are within', () => {
    expect(words(touching(500, 500, 500))).toBe('all three cases are | within their limits');
    expect(words(touching(500))).toBe('the case is | within its limits');
  });

  it('does not hide what cannot be decided', () => {
    expect(words(touching(795, 500, 500))).toBe(
      'one of three cases | cannot be decided at this mesh | the others are within the limits',
    );
    expect(words(touching(900, 805, 500))).toBe(
      'one of three cases | exceeds a limit | one more cannot be decided at this mesh',
    );
    expect(answerOf(touching(795)).finding).toBe('undecided');
  });

  it('tells the worst finding with place and limit, then the narrowest margin', () => {
    const [first, second] = answerSentences(touching(900, 600)).map(plain);
    expect(first).toBe(
      'case 1: the worst touch voltage, 900 ± 10 V at (24.0, 33.5) m, exceeds the limit of 800 V by 13 %.',
    );
    expect(second).toBe(
      'Everything else is within its limit; the narrowest margin is 25 %, touch voltage, case 2.',
    );
    expect(plain(answerSentences(touching(600))[0])).toBe(
      'The narrowest margin is 25 %, touch voltage, case 1.',
    );
  });

  it('tells at most three findings at the top and counts the rest', () => {
    const lines = answerSentences(touching(900, 901, 902, 903, 904));
    expect(lines).toHaveLength(5);
    expect(lines[3]).toBe('Two more under People.');
  });
});

describe('rows of the comparison', () => {
  it('hold floating metal to the touch limit too, by the rise of each case', () => {
    const { results } = fixtureOutcome({ spacing: 6 });
    const fence = results.electrodes[1];
    const row = verdictRows(results).find((r) => r.kind === 'floating' && r.caseIndex === 1);
    expect(row?.subject).toBe('touch at fence');
    expect(row?.worst).toBeCloseTo(Math.abs(fence.touch_ratio ?? 0) * results.cases[1].gpr_V, 9);
    expect(row?.limit).toBe(results.cases[1].touch.limit_V);
  });

  it('make a case exceed a limit when only its floating metal does', () => {
    const base = touching(500);
    const results = {
      ...base,
      electrodes: base.electrodes.map((e) => (e.role === 'floating' ? { ...e, touch_ratio: -0.9 } : e)),
    };
    expect(answerOf(results).predicate).toBe('exceeds a limit');
  });

  it('let another season govern: a case within in the soil as given exceeds a limit when it does in a dry one', () => {
    const base = { ...fixtureOutcome({ spacing: 6 }), results: touching(700, 300) };
    const dry = withSeason(base, { name: 'dry summer', times: 1.3 }).results;
    expect(answerOf(base.results).finding).toBe('within');
    expect(answerOf(dry).subject).toBe('one of two cases');
    expect(plain(answerSentences(dry)[0])).toMatch(
      /^case 1: the worst touch voltage, dry summer, 910 ± 10 V/,
    );
    const rows = verdictRows(dry).filter((r) => r.season !== undefined);
    expect(rows.map((r) => r.subject)).toEqual([
      'touch, dry summer',
      'step, dry summer',
      'touch, dry summer',
      'step, dry summer',
    ]);
    const wet = withSeason(base, { name: 'wet', times: 0.7 }).results;
    expect(verdictRows(wet).every((r) => r.season === undefined)).toBe(true);
  });

  it('choose the case that comes nearest to a limit or farthest beyond', () => {
    expect(governingCase(touching(500, 700, 600))).toBe(1);
    expect(governingCase(touching(500, 500))).toBe(0);
  });
});
