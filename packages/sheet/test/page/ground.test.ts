// What the page says of a fitted soil: readings, fit, what stays open and what that does to every answer.
import { describe, expect, it } from 'vitest';
import { sheetHtml } from '../../src/index.ts';
import { fixtureOutcome } from '../fixture.ts';
import { type GroundOptions, withEquivalentUniform, withGround } from '../fixture-ground.ts';
import { withSeason } from '../fixture-season.ts';
import { partOf, textOf } from '../markup.ts';

const bare = fixtureOutcome({ spacing: 6, currents: [2500, 1650, 900] });
const page = (options: GroundOptions = {}): string => sheetHtml(withGround(bare, options));
const html = page();
const ground = textOf(partOf(html, 'ground'));

describe('the survey under Ground', () => {
  it('says what was read and fitted, with no digits that readings do not carry', () => {
    expect(ground).toContain(
      'The soil is fitted to 14 readings on two traverses in survey.csv, at spacings from 0.5 to 32 m. Two layers: 204 Ω·m for the first 2.04 m, then 50.6 Ω·m below.',
    );
    expect(html).toContain('data-input="soil.survey"');
    expect(html).not.toContain('data-input="soil.layers');
    expect(html).not.toContain('204.1');
    expect(html).not.toContain('50.63');
  });

  it('says what the readings allow', () => {
    expect(ground).toContain(
      'The readings allow 178–231 Ω·m above and 41.2–61.7 Ω·m below, the interface at 1.72–2.49 m (5–95 % of the soils that fit within their scatter).',
    );
    expect(ground).not.toContain('outside that band');
    expect(textOf(partOf(page({ lower: 30 }), 'ground'))).toContain(
      'The best fit itself lies outside that band in the resistivity of layer 2',
    );
  });

  it('says how the fit ended', () => {
    expect(ground).toContain('The fit converged; it misses the readings by 4.3 %');
    const ending = (outcome: string): string => textOf(partOf(page({ outcome }), 'ground'));
    expect(ending('stalled')).toContain('The fit stalled before its least misfit was found');
    expect(ending('limit')).toContain('The fit was stopped at the limit of its steps');
    expect(ending('at-bound')).toContain('with a layer at a bound of what was tried');
    expect(ending('<other>')).toContain('The fit ended as “<other>”');
  });

  it('says who chose the number of layers, by which criterion, among which trials', () => {
    expect(ground).toContain(
      'The number of layers, auto, was left to the readings: two, as the criterion proposes.',
    );
    expect(ground).toMatch(/161\.212\.424\.3\u{2212}40\.3proposed, taken34\.0\u{2212}36\.7/u);
    expect(ground).toContain('Least made-up criterion: 2');
    const asked = (options: GroundOptions): string => textOf(partOf(page(options), 'ground'));
    expect(asked({ asked: 2 })).toContain(
      'The number of layers, 2, was asked for; the criterion proposes as many.',
    );
    expect(asked({ asked: 2, proposed: 3 })).toContain(
      'The number of layers, 2, was asked for; the criterion would take three.',
    );
  });

  it('tells the family with count, seed and method', () => {
    expect(ground).toContain('160 soils of as many layers that fit within the scatter of the readings');
    expect(ground).toContain('Made-up draws; seed 20260101.');
  });

  it('sets the depth that the readings resolve against the size of the electrode', () => {
    expect(ground).toContain(
      'The readings resolve the ground to about 16.6 m; the diagonal of the electrode is 75.0 m.',
    );
    expect(ground).toContain('Made-up rule of depth.');
  });

  it('says where no spacing is as short as the metal is deep', () => {
    expect(ground).not.toContain('The shortest spacing');
    const buried = withGround(bare);
    const deep = sheetHtml({
      ...buried,
      plan: {
        ...buried.plan,
        conductors: buried.plan.conductors.map((c) => ({ ...c, depth1: 0.4, depth2: 0.4 })),
      },
    });
    expect(textOf(partOf(deep, 'ground'))).toContain(
      'The shortest spacing, 0.5 m, is longer than the metal is deep, 0.4 m',
    );
  });

  it('tables layers with best fit, median and band', () => {
    expect(ground).toContain('1204203178–2312.042.081.72–2.49');
    expect(ground).toContain('250.650.141.2–61.7to any depth');
    expect(textOf(partOf(page({ lower: 30 }), 'ground'))).toContain('230.0 *50.141.2–61.7');
  });

  it('tables every reading with model and misfit, outliers by word', () => {
    expect(ground).toMatch(/12access road410692\.4\u{2212}12\.7outlier/u);
    const rows = partOf(html, 'ground').match(/<tr><th scope="row">\d+<\/th><td>(north fence|access road)/g);
    expect(rows).toHaveLength(14);
  });

  it('has the sounding as a figure with its caption and tables', () => {
    const blocks = partOf(html, 'ground').split('<div class="figure">').slice(1);
    expect(blocks).toHaveLength(2);
    expect(blocks[0]).toContain('id="sounding-heading"');
    expect(textOf(blocks[0])).toContain(
      'The thin step line is another thing on the same axes: the resistivity of the fitted layers, with depth where spacing stands.',
    );
    expect(blocks[0].match(/<table>/g)?.length).toBeGreaterThanOrEqual(2);
  });

  it('lists doubts, and what no reading tells', () => {
    expect(ground).toContain('The reading in line 12 stands off the model.');
    for (const caution of [
      'Buried metal beside a traverse',
      'Spacings have to begin',
      'Drought',
      'A pin in poor contact',
    ])
      expect(ground).toContain(caution);
    const file = page({ doubts: [{ code: 'deep-pins', message: 'survey.csv:2: pin depth: 0.05 m' }] });
    expect(textOf(file)).toContain('survey.csv:2: pin depth');
    expect(textOf(file)).not.toContain('Survey.csv');
  });

  it('counts its doubts at the top with those under Assumed', () => {
    const head = textOf(html.slice(html.indexOf('<header'), html.indexOf('</header>')));
    expect(head).toContain('Two doubts are stated under Ground and Assumed.');
  });
});

describe('what the soil leaves open, beside each answer', () => {
  it('stands with resistance and rise, as median and band', () => {
    const rise = textOf(partOf(html, 'rise'));
    expect(rise).toMatch(/Over the soils that the readings allow: median 2\.87 Ω, 5–95 % 2\.50–3\.32 Ω\./);
    expect(rise.match(/Over the soils that the readings allow/g)).toHaveLength(4);
    expect(rise).not.toContain('outside');
    expect(textOf(partOf(page({ low: 0.4, median: 0.5, high: 0.7 }), 'rise'))).toContain(
      '; the best fit lies outside that band.',
    );
  });

  it('stands with touch and step against the limit, the ± at the best fit only', () => {
    const people = textOf(partOf(html, 'people'));
    expect(people).toMatch(/touch727 ± 4 V735 V640–851 V827 Vopen: some beyond the limit/);
    expect(people).toMatch(/step139\.6 ± 0\.7 V141 V123–163 V2 643 Vwithin the limit/);
    for (const [cell] of partOf(html, 'people').matchAll(/<td class="num (median|soils-range)">[^<]*/g))
      expect(cell).not.toContain('±');
  });

  it('has marks of its own, unlike the bars and the ±', () => {
    const people = partOf(html, 'people');
    const bands = people.slice(people.indexOf('<table class="verdicts bands">'));
    expect(bands).toContain('class="soils-bar"');
    expect(bands).not.toMatch(/class="bar"|class="leader"/);
    expect(people.slice(0, people.indexOf('<table class="verdicts bands">'))).not.toContain('soils-bar');
  });

  it('is told at the top where it decides', () => {
    const head = textOf(html.slice(html.indexOf('<header'), html.indexOf('</header>')));
    expect(head).toContain(
      '33 kV bus: the readings leave the worst touch voltage open across its limit of 827 V',
    );
    expect(head).toContain('at the best fit; the soil readings leave one case open');
  });

  it('is kept apart from the ± under Trust', () => {
    expect(textOf(partOf(html, 'trust'))).toContain('What the soil readings leave open is told apart');
  });
});

describe('one resistivity in place of the layers', () => {
  it('is tabled with how far off it is and its source', () => {
    const rise = textOf(partOf(sheetHtml(withEquivalentUniform(bare)), 'rise'));
    expect(rise).toContain('has a resistance between 27 % too low and 33 % too high.');
    expect(rise).toMatch(/mean of the readings138 Ω·m3\.784 Ω\+33 %made-up handbook, rule 4/);
    expect(rise).toMatch(/lower layer alone50\.6 Ω·m2\.061 Ω\u{2212}27 %common practice, no source/u);
  });

  it('is not told where there is none', () => {
    expect(textOf(html)).not.toContain('hand calculation');
  });
});

describe('seasons', () => {
  const season = (options?: GroundOptions): string => {
    const of = options === undefined ? bare : withGround(bare, options);
    return textOf(partOf(sheetHtml(withSeason(of, { name: 'dry summer', times: 1.3 })), 'season'));
  };

  it('show touch and step of each case by season, and mark what governs per quantity', () => {
    expect(season()).toMatch(/touch, as given727 ± 4 V827 Vwithin the limit/);
    expect(season()).toMatch(/touch, dry summer, governs945 ± 4 V827 Vexceeds the limit by 14 %/);
    expect(season()).toMatch(/step, dry summer, governs/);
    expect(season()).toMatch(/dry summer3\.200 ± 0\.010 Ω5 681 ± 9 V, highest/);
    expect(season()).not.toContain('as given, governs');
  });

  it('say that what the readings leave open is told for the soil as given', () => {
    expect(season({})).toContain('what the readings leave open is told for the soil as given only');
    expect(season()).not.toContain('leave open');
  });
});

describe('a soil that was given', () => {
  const given = sheetHtml(bare);

  it('has nothing of a survey', () => {
    expect(textOf(given)).not.toMatch(/5–95|soils that|survey|family|sounding|Doubts of the fit/i);
    /* the words of the style rules are there in any case */
    expect(given.slice(given.indexOf('</style>'))).not.toMatch(/class="[^"]*soils/);
    expect(given).toContain('data-input="soil.layers[0].resistivity_ohm_m"');
  });
});

describe('names from the survey', () => {
  const nasty = page({
    traverses: ['<script>1</script>', '"><img src=x onerror=y>'],
    surveyFile: '</style><b>.csv',
    outcome: '<u>',
    doubts: [{ code: '<i>', message: '<script>2</script>' }],
  });

  it('stay text', () => {
    expect(nasty).not.toMatch(/<script|<img|<u>|<b>|<i>&lt;/);
    expect(nasty.split('</style>')).toHaveLength(2);
    expect(textOf(nasty)).toContain('"><img src=x onerror=y>');
  });

  it('keep identifiers unique and every reference at its target', () => {
    const whole = sheetHtml(
      withEquivalentUniform(withGround(withSeason(bare, { name: 'dry summer', times: 1.3 }))),
    );
    for (const of of [nasty, whole]) {
      const ids = [...of.matchAll(/\sid="([^"]+)"/g)].map((m) => m[1]);
      expect(new Set(ids).size).toBe(ids.length);
      for (const [, used] of of.matchAll(/url\(#([^)]+)\)/g)) expect(ids).toContain(used);
    }
  });
});

describe('the page with a ground', () => {
  it('captions every table, scopes every header cell and keeps heading levels', () => {
    for (const [table] of html.matchAll(/<table[\s\S]*?<\/table>/g))
      expect(table).toMatch(/^<table[^>]*><caption>[^<]+/);
    for (const [cell] of html.matchAll(/<th[^>]*>/g))
      if (!cell.startsWith('<thead')) expect(cell).toMatch(/scope="(col|row|rowgroup)"/);
    const levels = [...html.matchAll(/<h([1-6])[\s>]/g)].map((m) => Number(m[1]));
    for (let k = 1; k < levels.length; k += 1) expect(levels[k] - levels[k - 1]).toBeLessThanOrEqual(1);
  });

  it('never claims an exact result nor calls anything safe', () => {
    expect(textOf(html)).not.toMatch(/± ?0(\.0+)?(?![.\d])/);
    expect(textOf(html)).not.toMatch(/\b(un)?safe(ly|ty)?\b/i);
  });

  it('has the same bytes for the same outcome', () => {
    expect(page()).toBe(html);
  });
});
