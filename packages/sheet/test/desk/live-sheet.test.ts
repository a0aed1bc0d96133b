// The sheet on a desk: inputs are fields where they stand, sections tell their state, results their change.
import type { Outcome } from '@ohmstead/study';
import { h } from 'preact';
import { renderToString } from 'preact-render-to-string';
import { describe, expect, it } from 'vitest';
import { type Desk, DeskContext, Questions, Sheet, sheetHtml } from '../../src/index.ts';
import { fixtureOutcome } from '../fixture.ts';
import { withSeason } from '../fixture-season.ts';
import { partOf, textOf } from '../markup.ts';
import { deskOf } from './desk-of.ts';

const outcome = fixtureOutcome({ spacing: 6 });

function live(desk: Desk, of: Outcome = outcome): string {
  return renderToString(h(DeskContext.Provider, { value: desk, children: h(Sheet, { outcome: of }) }));
}

function section(markup: string, id: string): string {
  const from = markup.search(new RegExp(`<section class="part [a-z]+" id="${id}"`));
  expect(from).toBeGreaterThanOrEqual(0);
  const to = markup.indexOf('<section class="part', from + 1);
  return markup.slice(from, to < 0 ? undefined : to);
}

/** The field of an input by its place in the study. */
function fieldAt(markup: string, place: string): string | undefined {
  return [...markup.matchAll(/<(?:input|select)(?:[^>"]|"[^"]*")*>/g)]
    .map(([tag]) => tag)
    .find((tag) => tag.includes(`data-input="${place}"`));
}

describe('inputs on a desk', () => {
  const page = live(deskOf(outcome.study));

  it('are fields with a name, where the frozen sheet marks them', () => {
    const frozen = [...sheetHtml(outcome).matchAll(/data-input="([^"]+)"/g)].map((m) => m[1]);
    /* tables and places are edited on the plan, or number by number */
    const apart = new Set(['conductors', 'cases[0].inject', 'cases[1].inject', 'cases[2].inject']);
    const edited = frozen.filter((place) => !apart.has(place));
    expect(edited.length).toBeGreaterThan(15);
    for (const place of edited) expect(fieldAt(page, place), place).toMatch(/aria-label="[^"]+"/);
    for (const place of ['title', 'cases[1].name', 'cases[1].frequency_hz', 'cases[0].inject.x_m'])
      expect(fieldAt(page, place), place).toBeDefined();
  });

  it('show the draft and not what was solved', () => {
    const desk = deskOf({ ...outcome.study, soil: { layers: [{ resistivity_ohm_m: 450 }] } });
    const ground = section(live(desk), 'ground');
    expect(fieldAt(ground, 'soil.layers[0].resistivity_ohm_m')).toContain('value="450\u202fΩ·m"');
    expect(textOf(ground)).toContain('The soil is taken as uniform');
  });

  it('are empty where nothing is stated yet, and keep what is no number in sight', () => {
    const desk = deskOf({ soil: { layers: [{}, { resistivity_ohm_m: 'much' }] } });
    const ground = section(live(desk), 'ground');
    expect(fieldAt(ground, 'soil.layers[0].resistivity_ohm_m')).toMatch(/ value(?=[ /])/);
    expect(fieldAt(ground, 'soil.layers[1].resistivity_ohm_m')).toContain('value="much"');
  });

  it('carry their complaint in words beside them', () => {
    const complaints: Desk['complaints'] = (path) =>
      path.join(' ') === 'soil layers 0 thickness_m' ? ['layer thickness −1 is not accepted'] : [];
    const ground = section(live(deskOf(outcome.study, { complaints })), 'ground');
    const field = fieldAt(ground, 'soil.layers[0].thickness_m');
    expect(field).toContain('aria-invalid="true"');
    const id = /aria-describedby="([^"]+)"/.exec(field ?? '')?.[1];
    expect(ground).toContain(`id="${id}">layer thickness −1 is not accepted</span>`);
  });

  it('can be asked for before anything was solved', () => {
    const page = renderToString(
      h(DeskContext.Provider, { value: deskOf({ cases: [{ name: 'bus' }] }), children: h(Questions, {}) }),
    );
    expect(textOf(page)).toContain('The soil is not stated yet.');
    for (const place of ['cases[0].duration_s', 'metal_model', 'limits.body_mass_kg'])
      expect(fieldAt(page, place), place).toBeDefined();
    expect(page).toMatch(/data-input="limits.body_mass_kg"[^>]*><option[^>]*value="-1"[^>]*>choose/);
  });
});

describe('sections on a desk', () => {
  it('tell their state in words, and their faults', () => {
    const page = live(
      deskOf(outcome.study, {
        state: (id) => (id === 'ground' ? 'fault' : id === 'rise' ? 'computing' : 'stale'),
        faults: (id) => (id === 'ground' ? ['soil.layers[0]: <b> missing'] : []),
      }),
    );
    const words = (id: string): string =>
      textOf(/<p class="state" aria-live="polite">[^<]*<\/p>/.exec(section(page, id))?.[0] ?? '');
    expect([words('ground'), words('rise'), words('people')]).toEqual([
      'at fault',
      'computing',
      'out of date',
    ]);
    expect(section(page, 'ground')).toContain('<li>soil.layers[0]: &lt;b> missing</li>');
    expect(section(page, 'rise')).toContain('aria-busy="true"');
    expect(page).toContain('<header class="title-block stale">');
  });

  it('take the instrument, the note and the downloads that the page lends', () => {
    const page = live(
      deskOf(outcome.study, {
        instrument: (figure) => h('p', {}, `instrument of ${figure}`),
        note: (id) => h('p', {}, `note of ${id}`),
        download: () => undefined,
      }),
    );
    expect(section(page, 'electrode')).toContain('instrument of electrode');
    expect(section(page, 'electrode')).not.toContain('id="electrode-plan-title"');
    expect(section(page, 'surface')).toContain('instrument of surface');
    expect(section(page, 'trust')).toContain('note of trust');
    for (const file of ['leakage.svg', 'limits.csv', 'mesh.csv', 'conductors.csv'])
      expect(page).toContain(`<span class="unseen"> ${file}</span>`);
    expect(live(deskOf(outcome.study))).not.toContain('class="download"');
  });

  it('offer the way to a place, which a frozen sheet tells as text', () => {
    const { x_m, y_m } = outcome.results.cases[0].touch;
    const people = section(live(deskOf(outcome.study)), 'people');
    expect(people).toMatch(
      /<button type="button" class="word to-place"><span class="unseen">show on the plan <\/span>\(/,
    );
    expect(textOf(people)).toContain(`(${x_m.toFixed(1)}, ${y_m.toFixed(1)}) m`);
    expect(sheetHtml(outcome)).not.toContain('<button');
  });

  it('show seasons though none is stated, so that one can be added', () => {
    expect(textOf(section(live(deskOf(outcome.study)), 'season'))).toContain('add a season');
    expect(sheetHtml(outcome)).not.toContain('id="season"');
  });
});

describe('before and after', () => {
  const before = fixtureOutcome({ spacing: 6, currents: [2000, 1650, 900] });
  const page = live(deskOf(outcome.study, { before }));

  it('tells the change of each result', () => {
    expect(textOf(section(page, 'rise'))).toMatch(/rises to 5 559 ± 12 V \(2 063 more than pinned\)\./);
    expect(textOf(section(page, 'rise'))).toMatch(/2\.840 ± 0\.006 Ω \(as pinned\), with/);
    expect(textOf(section(page, 'fault'))).toMatch(/1 958 A \(726 more than pinned\)\./);
  });

  it('sets a hollow tick at the pinned value of each bar', () => {
    const people = section(page, 'people');
    expect(people.match(/class="pinned-tick"/g)).toHaveLength(
      people.match(/class="limit-tick"/g)?.length ?? -1,
    );
    expect(live(deskOf(outcome.study))).not.toContain('class="pinned-tick"');
  });

  it('says so where the pinned state had no such result', () => {
    const other = fixtureOutcome({ spacing: 6, caseNames: ['another'] });
    expect(textOf(section(live(deskOf(outcome.study, { before: other })), 'fault'))).toContain(
      'not in the pinned state',
    );
  });

  it('maps the change of touch voltage, and says so where there is none', () => {
    const surface = section(page, 'surface');
    expect(surface).toContain('id="change-33-kv-bus-heading"');
    expect(textOf(surface)).toMatch(/Farthest from the pinned state.*higher\+\d+ Vshow on the plan \(/s);
    const same = section(live(deskOf(outcome.study, { before: outcome })), 'surface');
    expect(same).not.toContain('id="change-');
    expect(textOf(same)).toContain('touch voltage moved nowhere by more than the maps are good to');
  });

  it('compares seasons by name', () => {
    const dry = withSeason(outcome, { name: 'dry', times: 1.5 });
    const drier = withSeason(outcome, { name: 'dry', times: 1.2 });
    const season = textOf(section(live(deskOf(dry.study, { before: drier }), dry), 'season'));
    expect(season).toMatch(/8 338 ± 12 V \(1 668 more than pinned\), highest/);
    expect(season).toMatch(/4 326 ± 6 V \(865 more than pinned\), highest/);
  });
});

describe('the engineer’s own words', () => {
  const nasty = '<img src=x onerror=alert(1)>';
  const study: Outcome['study'] = {
    ...outcome.study,
    project: { client: nasty, checked_by: 'R. Hale' },
    revisions: [{ mark: 'A', date: '2 May', text: nasty, by: 'RH' }],
    notes: { rise: `${nasty}\n\nsecond paragraph` },
  };

  it('stand in the frozen sheet, escaped, and only where they are given', () => {
    const page = sheetHtml({ ...outcome, study });
    expect(page).not.toContain('<img');
    expect(textOf(page)).toContain(`client ${nasty}`.replace('client ', 'client'));
    expect(textOf(partOf(page, 'rise'))).toContain(`Note${nasty}second paragraph`);
    expect(page).toMatch(/<table class="revisions">.*<th scope="row">A<\/th>/s);
    const bare = sheetHtml(outcome);
    for (const word of ['class="project"', 'class="revisions"', 'class="note"'])
      expect(bare).not.toContain(word);
  });

  it('are fields on a desk', () => {
    const page = live(deskOf(study));
    expect(fieldAt(page, 'project.client')).toContain('value="&lt;img');
    expect(fieldAt(page, 'project.site')).toMatch(/ value(?=[ /])/);
    expect(fieldAt(page, 'revisions[0].text')).toBeDefined();
  });
});

describe('US customary display', () => {
  const us: Outcome = { ...outcome, study: { ...outcome.study, display_units: 'US' } };

  it('tells lengths in feet and inches on the whole frozen sheet, and electrical units unchanged', () => {
    const page = sheetHtml(us);
    const text = textOf(page);
    expect(text).toContain('for the first 6.562 ft');
    expect(text).toContain('3.937 in thick');
    expect(text).toContain('300 Ω·m');
    expect(text).toContain('depth in feet, drawn');
    expect(text).not.toContain('metres');
    /* the definition of a step, the reach of a hand and the formula of the covering keep their metres */
    const metres = [...page.matchAll(/[\d.)]+\u202fm(?![a-zA-Z])/g)].map(([told]) => told);
    expect(new Set(metres)).toEqual(new Set(['1\u202fm', '0.1\u202fm']));
  });

  it('follows the desk in a live one', () => {
    const page = live(deskOf(outcome.study, { units: 'US' }));
    expect(textOf(section(page, 'electrode'))).toContain('Axes in feet.');
    expect(textOf(section(live(deskOf(us.study)), 'electrode'))).toContain('Axes in metres.');
  });
});
