// The ground under the feet: limits on the covering and on bare soil, and which of them a voltage is set against.
import type { Outcome } from '@ohmstead/study';
import { describe, expect, it } from 'vitest';
import { figures, sheetHtml, tables, verdictRows } from '../../src/index.ts';
import { fixtureOutcome } from '../fixture.ts';
import { partOf, textOf } from '../markup.ts';

const covered = fixtureOutcome({ spacing: 6, caseNames: ['bus'] });

/** The step voltage governs on bare soil, and the fence stands there too. */
const mixed: Outcome = {
  ...covered,
  results: {
    ...covered.results,
    electrodes: covered.results.electrodes.map((e) => ({
      ...e,
      touch_on_covering: e.role === 'floating' ? false : null,
    })),
    cases: covered.results.cases.map((c) => ({
      ...c,
      step: { ...c.step, on_covering: false, limit_V: c.bare_step_limit_V },
    })),
  },
};

const bare: Outcome = {
  ...covered,
  results: {
    ...covered.results,
    limits: {
      ...covered.results.limits,
      surfacing_resistivity_ohm_m: null,
      surfacing_thickness_m: null,
      covering_factor: 1,
    },
    cases: covered.results.cases.map((c) => ({
      ...c,
      covering_touch_limit_V: null,
      covering_step_limit_V: null,
      touch: { ...c.touch, on_covering: false },
      step: { ...c.step, on_covering: false },
    })),
  },
};

const part = (of: Outcome, id: string): string => textOf(partOf(sheetHtml(of), id));

describe('limits by the ground under the feet', () => {
  it('are told for the covering and for bare soil', () => {
    expect(part(mixed, 'people')).toContain(
      'bus: over 0.5 s, on the covering touch 827 V and step 2 643 V, on bare soil touch 331 V and step 529 V.',
    );
    expect(part(mixed, 'people')).toContain(
      '827 V touch, 2 643 V step; on bare soil 331 V touch, 529 V step',
    );
  });

  it('are one pair where there is no covering', () => {
    expect(part(bare, 'people')).toContain('bus: over 0.5 s, touch 331 V and step 529 V.');
    expect(part(bare, 'people')).not.toMatch(/on bare soil|covering factor/);
  });

  it('stand with each comparison that is made on bare soil', () => {
    expect(verdictRows(mixed.results).map((row) => row.footing)).toEqual([
      'covering',
      'bare soil',
      'bare soil',
    ]);
    expect(verdictRows(mixed.results)[2].limit).toBe(mixed.results.cases[0].bare_touch_limit_V);
    expect(part(mixed, 'people')).toMatch(/step, on bare soil[\d. ]+±/);
    expect(part(mixed, 'people')).toMatch(/touch at fence, on bare soil/);
    expect(part(covered, 'people')).not.toMatch(/step, on bare soil/);
    expect(verdictRows(bare.results).map((row) => row.footing)).toEqual([undefined, undefined, undefined]);
    const limits = figures(mixed).find((file) => file.name === 'limits.svg')?.svg ?? '';
    expect(textOf(limits)).toContain('step, on bare soil');
  });

  it('stand in the table of limits', () => {
    const csv = tables(mixed).find((file) => file.name === 'limits.csv')?.csv ?? '';
    const [header, ...rows] = csv.trim().split('\r\n');
    const at = header.split(',').indexOf('ground_under_feet');
    expect(rows.map((row) => row.split(',')[at])).toEqual(['covering', 'bare soil', 'bare soil']);
  });

  it('are named under the maps with the one that holds elsewhere', () => {
    const surface = part(mixed, 'surface');
    expect(surface).toContain('The limit is that of the covering; where there is none it is 331 V.');
    expect(surface).toContain('on bare soil, where the worst lies)');
    expect(surface).toContain('On the covering the limit is 2 643 V.');
    expect(part(bare, 'surface')).not.toMatch(/On the covering|that of the covering/);
  });
});

describe('the covering', () => {
  it('lies where the study says', () => {
    expect(part(covered, 'ground')).toContain(
      '0.1 m thick, lies over the area where touch voltage is assessed.',
    );
    const surfacing = { resistivity_ohm_m: 2500, thickness_m: 0.1, areas: [] };
    expect(part({ ...covered, study: { ...covered.study, surfacing } }, 'ground')).toContain(
      '0.1 m thick, lies in the areas given.',
    );
  });
});
