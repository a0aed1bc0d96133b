// The page: self-contained, escaped, readable by all, the same bytes each time, and never a verdict it cannot give.
import type { Outcome } from '@ohmstead/study';
import { describe, expect, it } from 'vitest';
import { sheetCss, sheetHtml } from '../../src/index.ts';
import { fixtureOutcome } from '../fixture.ts';
import { withSeason } from '../fixture-season.ts';
import { partOf, textOf } from '../markup.ts';

const outcome = fixtureOutcome({ spacing: 2 });
const html = sheetHtml(outcome);

describe('the page', () => {
  it('needs nothing else: no script, no request, a policy that forbids both', () => {
    expect(html.startsWith('<!doctype html>\n<html lang="en">')).toBe(true);
    expect(html).toContain(`content="default-src 'none'; style-src 'unsafe-inline'; img-src data:"`);
    expect(html).not.toMatch(/<script|<link|<img|<iframe|@import|\ssrc=|\son[a-z]+=/);
    expect(html).not.toMatch(/url\((?!#)/);
    for (const [, target] of html.matchAll(/href="([^"]*)"/g)) expect(target.startsWith('#')).toBe(true);
  });

  it('keeps its style rules as they are, which HTML reads raw', () => {
    expect(html).toContain(sheetCss);
    expect(sheetCss).not.toContain('</');
  });

  it('has one first heading and no level left out', () => {
    const levels = [...html.matchAll(/<h([1-6])[\s>]/g)].map((m) => Number(m[1]));
    expect(levels.filter((l) => l === 1)).toHaveLength(1);
    expect(levels[0]).toBe(1);
    for (let k = 1; k < levels.length; k += 1) expect(levels[k] - levels[k - 1]).toBeLessThanOrEqual(1);
  });

  it('has its parts in the order of the reasoning, each named', () => {
    const parts = [...html.matchAll(/<section class="part" id="([a-z]+)" aria-labelledby="([a-z-]+)"/g)];
    expect(parts.map((m) => m[1])).toEqual([
      'ground',
      'electrode',
      'fault',
      'rise',
      'surface',
      'people',
      'trust',
      'assumed',
      'cautions',
    ]);
    for (const [, , label] of parts) expect(html).toContain(`<h2 id="${label}">`);
  });

  it('has identifiers only once, and every reference has its target', () => {
    const ids = [...html.matchAll(/\sid="([^"]+)"/g)].map((m) => m[1]);
    expect(new Set(ids).size).toBe(ids.length);
    const used = [
      ...[...html.matchAll(/aria-labelledby="([^"]+)"/g)].flatMap((m) => m[1].split(' ')),
      ...[...html.matchAll(/href="#([^"]+)"/g)].map((m) => m[1]),
      ...[...html.matchAll(/url\(#([^)]+)\)/g)].map((m) => m[1]),
    ];
    expect(used.length).toBeGreaterThan(30);
    for (const id of used) expect(ids).toContain(id);
  });

  it('has landmarks and a way past the head', () => {
    expect(html).toContain('<a class="skip" href="#sheet">');
    for (const tag of ['<main id="sheet">', '<header', '<nav aria-label='])
      expect(html.split(tag)).toHaveLength(2);
  });

  it('gives every figure a title, a caption and the same as a table', () => {
    const blocks = html.split('<div class="figure">').slice(1);
    expect(blocks).toHaveLength(9);
    for (const block of blocks) {
      expect(block).toMatch(/^<figure aria-labelledby="([^"]+)"><h3 id="\1">[^<]+<\/h3><svg/);
      expect(block).toMatch(/role="img" aria-labelledby="[^"]+"[^>]*><title/);
      expect(block).toMatch(/<figcaption>[^<]{10,}/);
      expect(block.slice(block.indexOf('<details'))).toMatch(/<table><caption>[^<]+<\/caption><thead>/);
    }
  });

  it('captions every table and gives every header cell its scope', () => {
    for (const [table] of html.matchAll(/<table[\s\S]*?<\/table>/g))
      expect(table).toMatch(/^<table[^>]*><caption>[^<]+/);
    for (const [cell] of html.matchAll(/<th[^>]*>/g))
      if (!cell.startsWith('<thead')) expect(cell).toMatch(/scope="(col|row|rowgroup)"/);
  });

  it('tells inputs with their place in the study', () => {
    expect(html).toContain('<data class="in" value="0.5" data-input="cases[0].duration_s">');
    expect(html).toContain('data-input="soil.layers[1].resistivity_ohm_m"');
  });

  it('has the same bytes for the same outcome', () => {
    expect(sheetHtml(fixtureOutcome({ spacing: 2 }))).toBe(html);
  });
});

describe('escaping', () => {
  const nasty = '<script>alert("x")</script>';
  const outcomeOf = fixtureOutcome({
    spacing: 6,
    title: nasty,
    caseNames: [nasty, '=1+1', '\'"><img src=x onerror=y>'],
    fenceName: '</style><b>',
  });
  const page = sheetHtml({
    ...outcomeOf,
    plan: {
      ...outcomeOf.plan,
      conductors: outcomeOf.plan.conductors.map((c) => ({ ...c, id: `${nasty}${c.id}`, material: '<i>' })),
    },
    results: { ...outcomeOf.results, assumptions: [{ code: '<u>', message: '<script>2</script>' }] },
  });

  it('leaves no name as markup', () => {
    expect(page).not.toMatch(/<script|<img|<u>|<b>|<i>&lt;/);
    expect(page.split('</style>')).toHaveLength(2);
    expect(page).toContain('&lt;script>alert(&quot;x&quot;)&lt;/script>');
  });

  it('shows names as they were written', () => {
    expect(textOf(page)).toContain('<script>alert("x")</script>');
    expect(textOf(page)).toContain('=1+1');
  });
});

describe('what the page says', () => {
  it('answers at the top, in words', () => {
    const head = textOf(html.slice(html.indexOf('<header'), html.indexOf('</header>')));
    expect(head).toContain('one of three cases exceeds a limit');
    expect(head).toMatch(
      /33 kV bus: the worst touch voltage, \d+ ± \d+ V at \(\d+\.\d, \d+\.\d\) m, exceeds the limit of 827 V by \d+ %\./,
    );
  });

  it('says that all are within, where they are', () => {
    const page = sheetHtml(fixtureOutcome({ spacing: 4, currents: [900, 800, 700] }));
    expect(textOf(page)).toContain('all three cases are within their limits');
    expect(textOf(page)).not.toContain('exceeds the limit');
    expect(page).toContain('class="answer within"');
  });

  it('says that a margin smaller than the uncertainty cannot be decided', () => {
    const { results } = fixtureOutcome({ spacing: 4 });
    const { worst_V, limit_V } = results.cases[0].touch;
    const near = (3180 * limit_V * 0.999) / worst_V;
    const page = textOf(
      sheetHtml(fixtureOutcome({ spacing: 4, currents: [near, 300, 200], uncertainty: 0.01 })),
    );
    expect(page).toContain('one of three cases cannot be decided at this mesh');
    expect(page).toMatch(
      /touch: 826 ± 9 V against a limit of 827 V: the margin of 0\.83 V is smaller than the numerical uncertainty/,
    );
    expect(page).not.toMatch(/exceeds the limit/);
  });

  it('never calls anything safe', () => {
    expect(textOf(html)).not.toMatch(/\b(un)?safe(ly|ty)?\b/i);
  });

  it('defers to local codes and licensed practice, and asks for a measurement', () => {
    expect(textOf(partOf(html, 'cautions'))).toMatch(
      /Local codes.*licensed engineer decide.*Measure before energising/s,
    );
  });

  it('unfolds each limit to formula, clause and inputs', () => {
    const people = textOf(partOf(html, 'people'));
    expect(people).toContain('Etouch = (1000 + 1.5 Csρs)·0.157/√ts');
    expect(people).toContain('clauses 8.3–8.4, eq. 29–33 (clause from memory)');
    expect(textOf(partOf(html, 'fault'))).toContain('clause 15.10, eq. 79 (clause from memory)');
  });

  it('says so when the balance does not close', () => {
    const broken: Outcome = {
      ...outcome,
      results: { ...outcome.results, checks: { ...outcome.results.checks, current_balance: -0.02 } },
    };
    expect(textOf(partOf(sheetHtml(broken), 'trust'))).toContain(
      'The balance does not close, and no figure of this sheet may be relied on.',
    );
    expect(textOf(partOf(html, 'trust'))).not.toContain('relied on');
  });

  it('tells how the answer moved with the mesh, and what the uncertainty is not', () => {
    const trust = textOf(partOf(html, 'trust'));
    expect(trust).toContain('From 122 to 214 segments the resistance moved by 0.6 %');
    expect(trust).toContain('It says nothing of the soil readings');
  });

  it('lists doubts, assumptions and bridged contacts', () => {
    const assumed = textOf(partOf(html, 'assumed'));
    expect(assumed).toContain('its resistivity when wet has to be confirmed by measurement.');
    expect(assumed).toContain('The fence is taken as one continuous piece of metal.');
    expect(assumed).toMatch(/R3E1\(60\.0, 0\.0\) m0\.612/);
  });
});

describe('other studies', () => {
  const variant = (change: (o: Outcome) => Outcome): string =>
    textOf(sheetHtml(change(fixtureOutcome({ spacing: 6, caseNames: ['only case'] }))));

  it('uniform soil, no covering, no rods, one case', () => {
    const text = variant((o) => ({
      ...o,
      plan: { ...o.plan, conductors: o.plan.conductors.map((c) => ({ ...c, rod: false })) },
      results: {
        ...o.results,
        soil: { layers: [{ resistivity_ohm_m: 120, thickness_m: null }] },
        limits: {
          ...o.results.limits,
          surfacing_resistivity_ohm_m: null,
          surfacing_thickness_m: null,
          covering_factor: 1,
        },
        snaps: [],
        warnings: [],
        assumptions: [],
        mesh: o.results.mesh.slice(0, 1),
        checks: { ...o.results.checks, image_error: 0 },
      },
    }));
    expect(text).toContain('The soil is taken as uniform, 120 Ω·m at every depth.');
    expect(text).toContain('No covering is stated');
    expect(text).toContain('There are no rods.');
    expect(text).toContain('One mesh was solved');
    expect(text).toContain('Nothing beyond what the study states was taken for granted.');
    expect(text).toContain('The soil is represented exactly, by 96 images.');
  });

  it('a current given as it enters the ground, without X/R and place', () => {
    const text = variant((o) => ({
      ...o,
      study: { ...o.study, cases: [{ name: 'only case', grid_current_A: 950, duration_s: 0.5 }] },
      results: {
        ...o.results,
        cases: o.results.cases.map((c) => ({
          ...c,
          fault_current_A: null,
          division_factor: null,
          x_over_r: null,
        })),
      },
    }));
    expect(text).toContain(
      'only case: 950 A enter the ground, as given, for 0.5 s; no X/R is given, so the direct-current offset is left out',
    );
    expect(text).toContain('It enters at the node nearest the centroid of the metal, (24, 18) m.');
  });

  it('other seasons, of which one governs', () => {
    const page = sheetHtml(
      withSeason(fixtureOutcome({ spacing: 6, currents: [2000, 300, 200] }), {
        name: 'dry summer',
        times: 1.5,
      }),
    );
    const season = textOf(partOf(page, 'season'));
    expect(season).toContain(
      'dry summer: Two layers: 900 Ω·m for the first 1.5 m, then 100 Ω·m below. The resistance is 3.200 ± 0.010 Ω',
    );
    expect(season).toContain(
      '33 kV bus: dry summer governs touch and step; the rise is highest in dry summer',
    );
    expect(textOf(partOf(page, 'people'))).toContain('touch, dry summer');
    expect(page).toContain('<a href="#season">');
    expect(html).not.toContain('#season');
  });

  it('floating metal in several pieces, areas given', () => {
    const text = variant((o) => ({
      ...o,
      plan: { ...o.plan, areasGiven: { touch: true, step: true } },
      results: { ...o.results, electrodes: o.results.electrodes.map((e) => ({ ...e, piece_count: 4 })) },
    }));
    expect(text).toContain('Fence, 4 pieces that no joint connects, floats at most at 72 % of the rise');
    expect(text).toContain('Touch voltage is assessed in the area given, step voltage in the area given.');
  });
});
