// survey.csv: readings of every array in metres and Ω·m, wrong rows named, doubts kept, nothing dropped.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { loadStudy } from '../../src/input/load-study.ts';
import { loadSurvey, type SurveyFile } from '../../src/input/load-survey.ts';
import { sourceFromMap } from '../../src/input/source.ts';
import { bytesOf, faultLinesOf, smallStudy, smallTable } from './folder-source.ts';

const SEED = 20_240_611;

function survey(text: string): SurveyFile {
  return loadSurvey(sourceFromMap(new Map([['survey.csv', bytesOf(text)]])), 'survey.csv');
}

function faults(text: string): readonly string[] {
  return faultLinesOf(() => survey(text));
}

describe('survey.csv', () => {
  test('holds Wenner readings with their lines, traverses and pin depths, in the order of the file', () => {
    const text =
      'traverse,spacing_m,apparent_resistivity_ohm_m,pin_depth_m\n\nN,2,150,0.1\n,1,200,\nN,2,155.5,0.05\n';
    const { file, readings } = survey(text);
    expect(file).toBe('survey.csv');
    expect(readings).toEqual([
      {
        row: 3,
        array: { kind: 'wenner', spacing: 2, pinDepth: 0.1 },
        traverse: 'N',
        apparentResistivity: 150,
      },
      { row: 4, array: { kind: 'wenner', spacing: 1, pinDepth: 0 }, traverse: '', apparentResistivity: 200 },
      {
        row: 5,
        array: { kind: 'wenner', spacing: 2, pinDepth: 0.05 },
        traverse: 'N',
        apparentResistivity: 155.5,
      },
    ]);
  });

  test('may mix arrays and both kinds of readings, unused cells blank, in any unit', () => {
    const text = [
      'spacing_ft,ab_half_m,mn_half_cm,c1_x_m,c2_x_m,p1_x_m,p2_x_m,apparent_resistivity_ohm_cm,resistance_milliohm,pin_depth_in',
      '10,,,,,,,15000,,4',
      ',10,50,,,,,,500,',
      ',,,0,30,10,20,,2000,',
    ].join('\n');
    const { readings } = survey(text);
    expect(readings.map(({ array }) => array)).toEqual([
      { kind: 'wenner', spacing: 3.048, pinDepth: 0.1016 },
      { kind: 'schlumberger', halfCurrent: 10, halfPotential: 0.5, pinDepth: 0 },
      { kind: 'collinear', currentPins: [0, 30], potentialPins: [10, 20], pinDepth: 0 },
    ]);
    expect(readings[0].apparentResistivity).toBe(150);
    // π·c(c + d)/d·R with c = AB/2 − MN/2, d = MN: Schlumberger–Palmer, IEEE Std 81 (from memory)
    expect(readings[1].apparentResistivity).toBeCloseTo(Math.PI * 9.5 * 10.5 * 0.5, 10);
    // Wenner, 2πaR with a = 10 m: IEEE Std 81 (from memory)
    expect(readings[2].apparentResistivity).toBeCloseTo(2 * Math.PI * 10 * 2, 10);
  });

  test('takes a resistance with the depth of the pins into account', () => {
    // 4πa/(1 + 2a/√(a² + 4b²) − a/√(a² + b²))·R with a = 1 m, b = 0.5 m: IEEE Std 81 (from memory)
    const expected = ((4 * Math.PI) / (1 + 2 / Math.SQRT2 - 1 / Math.sqrt(1.25))) * 30;
    const { readings, cautions } = survey('spacing_m,resistance_ohm,pin_depth_m\n1,30,0.5\n2,12,0.1\n');
    expect(readings[0].apparentResistivity).toBeCloseTo(expected, 9);
    expect(cautions.map(({ row, code }) => [row, code])).toEqual([[2, 'deep-pins']]);
  });

  test('uses a row that stands twice, with a caution', () => {
    const { readings, cautions } = survey('spacing_m,resistance_ohm\n1,30\n1,30\n');
    expect(readings).toHaveLength(2);
    expect(cautions).toEqual([
      {
        row: 3,
        code: 'repeated-row',
        message: 'repeats row 2 to the last digit; both are used, as two readings',
      },
    ]);
  });

  test('takes a negative resistance where the potential pins stand in reverse', () => {
    const { readings } = survey('c1_x_m,c2_x_m,p1_x_m,p2_x_m,resistance_ohm\n0,30,20,10,-2\n');
    expect(readings[0].apparentResistivity).toBeCloseTo(2 * Math.PI * 10 * 2, 10);
  });

  test('notes units, columns passed over and pins whose depth is not told', () => {
    const { notes } = survey(
      'spacing_ft,resistance_ohm,pin_depth_m,weather\n3,30,,sun\n6,20,0.1,sun\n9,15,,sun\n',
    );
    expect(notes).toEqual([
      {
        code: 'units-converted',
        message: 'converted to SI units: survey.csv: spacing_ft (international foot)',
      },
      {
        code: 'columns-unused',
        message: 'columns passed over, not part of the format: survey.csv: "weather"',
      },
      {
        code: 'pin-depth-assumed',
        message: 'survey.csv: 2 readings without pin_depth_m: the pins are taken as points on the surface',
      },
    ]);
    expect(survey('spacing_m,resistance_ohm,pin_depth_m\n3,30,0\n').notes).toEqual([]);
  });

  test.each([
    ['', ['survey.csv:1: the table is empty; expected a header row and rows under it']],
    ['spacing_m,resistance_ohm\n', ['survey.csv:1: the table has a header row and no rows under it']],
    ['1,30\n2,20\n', ['survey.csv:1: the first row holds values (1, 30); expected the column names']],
    [
      'a,rho\n1,30\n2,20\n',
      [
        'survey.csv:1: no column tells where the pins stood; expected spacing_m (Wenner), ab_half_m and mn_half_m (Schlumberger), or c1_x_m, c2_x_m, p1_x_m and p2_x_m (any four pins on a line); not read: "a" and "rho"',
        'survey.csv:1: no column holds readings; expected apparent_resistivity_ohm_m or resistance_ohm; not read: "a" and "rho"',
      ],
    ],
    [
      'spacing_m;resistance_ohm\n0,5;30\n',
      [
        'survey.csv:1: columns are separated by semicolons and numbers have a decimal comma (0,5); expected commas between columns and a decimal point, as in 1.5',
      ],
    ],
    [
      'spacing_m,resistance_ohm\n,30\n2,\n',
      [
        'survey.csv:2: spacing_m: the cell is empty; expected a plain decimal number such as 12.5',
        'survey.csv:3: resistance_ohm: the cell is empty; expected a plain decimal number such as 12.5',
      ],
    ],
    [
      'spacing_m,resistance_ohm\n20001,1\n5,1e400\n',
      [
        'survey.csv:2: spacing_m: 20001 is beyond 20000 m; check the unit in the column name',
        'survey.csv:3: resistance_ohm: 1e400 is larger than a number can be',
      ],
    ],
    [
      'spacing_m,spacing_ft,resistance_ohm\n1,3,50\n',
      ['survey.csv:1: spacing_ft: spacing of the pins is given twice, as spacing_m and spacing_ft'],
    ],
    [
      'ab_half_m,mn_half_m,resistance_ohm\n5,4.995,50\n5,0.002,50\n',
      [
        'survey.csv:2: mn_half_m: two pins stand 0.005 m from each other; expected at least 0.01 m, check the unit in the column name',
        'survey.csv:3: mn_half_m: two pins stand 0.004 m from each other; expected at least 0.01 m, check the unit in the column name',
      ],
    ],
    [
      'c1_x_m,c2_x_m,p1_x_m,p2_x_m,apparent_resistivity_ohm_m\n0,9,3,3.001,50\n',
      [
        'survey.csv:2: two pins stand 0.001 m from each other; expected at least 0.01 m, check the unit in the column name',
      ],
    ],
  ])('is refused: %j', (text, lines) => {
    expect(faults(text)).toEqual(lines);
  });

  test('is refused past 1000 readings', () => {
    expect(faults(`spacing_m,resistance_ohm\n${'1,30\n'.repeat(1001)}`)).toEqual([
      'survey.csv: the table has more than 1000 rows under its header, the most that are read',
    ]);
  });

  test('pins at the shortest distance are taken, whatever the rounding', () => {
    expect(survey('spacing_cm,resistance_ohm\n1,30\n').readings).toHaveLength(1);
    expect(survey('ab_half_m,mn_half_m,resistance_ohm\n0.3,0.29,30\n').readings).toHaveLength(1);
  });

  test('every row is a reading or is named', () => {
    const cell = fc.constantFrom('', '0', '1', '2.5', '-3', 'x');
    const rows = fc.array(fc.tuple(cell, cell, cell, cell, cell), { minLength: 1, maxLength: 6 });
    fc.assert(
      fc.property(rows, (cells) => {
        // the last column keeps a row of blanks from being passed over
        const lines = cells.map((row) => `${row.join(',')},T`);
        const text = `spacing_m,ab_half_m,mn_half_m,apparent_resistivity_ohm_m,resistance_ohm,traverse\n${lines.join('\n')}\n`;
        const named = faults(text).map((line) => Number(/^survey\.csv:(\d+):/.exec(line)?.[1]));
        const whole = cells.flatMap((row, i) => {
          const alone = `spacing_m,ab_half_m,mn_half_m,apparent_resistivity_ohm_m,resistance_ohm,traverse\n${row.join(',')},T\n`;
          return faults(alone).length === 0 && survey(alone).readings.length === 1 ? [i + 2] : [];
        });
        const all = [...new Set([...named, ...whole])].sort((a, b) => a - b);
        expect(all).toEqual(cells.map((_, i) => i + 2));
        expect(whole.filter((line) => named.includes(line))).toEqual([]);
      }),
      { seed: SEED, numRuns: 300 },
    );
  });
});

describe('a study with a survey', () => {
  const study = { ...smallStudy, soil: { survey: 'field/north.csv', layer_count: 'auto' } };
  const load = (text: string, soil: object = study.soil): ReturnType<typeof loadStudy> =>
    loadStudy(
      sourceFromMap(
        new Map([
          ['study.json', bytesOf(JSON.stringify({ ...study, soil }))],
          ['conductors.csv', bytesOf(smallTable)],
          ['field/north.csv', bytesOf(text)],
        ]),
      ),
    );

  test('has its readings, its notes among those of the study, and the file among its files', () => {
    const loaded = load('spacing_ft,resistance_ohm\n10,30\n');
    expect(loaded.study.soil).toEqual({ survey: 'field/north.csv', layer_count: 'auto' });
    expect(loaded.survey).toEqual({
      file: 'field/north.csv',
      readings: [expect.objectContaining({ row: 2 })],
      cautions: [],
    });
    expect([...loaded.files.keys()]).toEqual(['conductors.csv', 'field/north.csv', 'study.json']);
    const codes = loaded.notes.map(({ code }) => code);
    expect(codes.filter((code) => code === 'units-converted' || code === 'pin-depth-assumed')).toEqual([
      'units-converted',
      'pin-depth-assumed',
    ]);
    expect(loaded.notes.find(({ code }) => code === 'units-converted')?.message).toContain(
      'field/north.csv: spacing_ft',
    );
  });

  test.each([1, 2, 3, 4, 5, 'auto'])('takes %s layers', (layer_count) => {
    const { soil } = load('spacing_m,resistance_ohm\n1,3\n', { ...study.soil, layer_count }).study;
    expect(soil.layer_count).toBe(layer_count);
  });

  test.each([
    [
      { layer_count: 2 },
      'study.json:1: soil.survey: path of a survey is missing; layer_count says how many layers are fitted to its readings',
    ],
    [
      { survey: 'field/north.csv' },
      'study.json:1: soil.layer_count: number of layers to fit is missing; expected a whole number from 1 to 5, or "auto"',
    ],
    [
      { survey: 'field/north.csv', layers_count: 2 },
      'study.json:1: soil.layers_count: there is no such key here; layer_count is probably meant',
    ],
    [
      { survey: 'field/north.csv', layer_count: 2.5 },
      'study.json:1: soil.layer_count: number of layers to fit 2.5 is not accepted; expected a whole number from 1 to 5, or "auto"',
    ],
    [
      { layers: [{ resistivity_ohm_m: 100 }], layer_count: 1 },
      'study.json:1: soil.layer_count: the soil has layers already; expected either layers, the top one first, or survey with layer_count',
    ],
    [
      { survey: '', layer_count: 2 },
      'study.json:1: soil.survey: path of a survey "" is not accepted; expected a path within the study folder',
    ],
    [{ layer: [] }, 'study.json:1: soil.layer: there is no such key here; layers is probably meant'],
  ])('is refused with the soil %j', (soil, line) => {
    expect(faultLinesOf(() => load('spacing_m,resistance_ohm\n1,3\n', soil))).toEqual([line]);
  });

  test('is refused with the faults of its survey, after those of study.json', () => {
    expect(
      faultLinesOf(() => load('spacing_m,resistance_ohm\n1,x\n', { ...study.soil, layer_count: 0 })),
    ).toEqual([
      'study.json:1: soil.layer_count: number of layers to fit 0 is not accepted; expected a whole number from 1 to 5, or "auto"',
      'field/north.csv:2: resistance_ohm: x is not a number; expected a plain decimal number such as 12.5',
    ]);
  });
});
