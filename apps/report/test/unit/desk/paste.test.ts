// Rows from spreadsheets: separators, decimal marks, headers and units; whatever cannot be taken is told with its place.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Draft } from '../../../src/desk/draft.ts';
import { readPaste } from '../../../src/desk/paste.ts';
import type { PasteTable } from '../../../src/desk/paste-columns.ts';
import { complaintLine } from '../../../src/desk/paste-complaint.ts';
import {
  type Pasting,
  pasteCases,
  pasteConductors,
  pasteCorners,
  pasteLayers,
  pasteList,
  pasteReadings,
  pasteSeasons,
} from '../../../src/desk/paste-into.ts';
import { demo, loaded, small, smallTable, textOf } from './drafts.ts';

function rows(table: PasteTable, text: string, units: 'SI' | 'US' = 'SI'): readonly object[] {
  const { rows: read, complaints } = readPaste(table, text, units);
  expect(complaints).toEqual([]);
  return read.map((row) => Object.fromEntries(row));
}

function complaints(table: PasteTable, text: string): readonly string[] {
  return readPaste(table, text).complaints.map(complaintLine);
}

function taken(pasting: Pasting): Draft {
  if (pasting.kind === 'complaints') throw new Error(pasting.complaints.map(complaintLine).join('\n'));
  return pasting.draft;
}

const twoLayers = [{ resistivity_ohm_m: 220, thickness_m: 2.4 }, { resistivity_ohm_m: 65 }];

describe('rows', () => {
  test.each([
    ['tabs', '220\t2.4\n65\t'],
    ['tabs and decimal commas', '220\t2,4\r\n65\t\r\n'],
    ['semicolons and decimal commas', '220;2,4\n65;'],
    ['commas', '220,2.4\n65,\n'],
    ['a header of keys', 'thickness_m\tresistivity_ohm_m\n2.4\t220\n\t65'],
    ['a header of words with units', 'Soil resistivity (ohm-m)\tLayer thickness [cm]\n220\t240\n65\t'],
    ['a header with other units', 'resistivity_ohm_cm,thickness_mm\n22000,2400\n6500,'],
    ['units in the cells', '0.22 kΩ·m\t240 cm\n65 Ωm\t'],
    ['blank rows and blank cells at the ends', '\n220\t2.4\t\t\n\t\n65\n'],
  ])('with %s', (_, text) => {
    expect(rows('layers', text)).toEqual(twoLayers);
  });

  test('bare lengths are in the units displayed, unless the header tells others', () => {
    expect(rows('layers', '220\t2\n65\t', 'US')).toEqual([
      { resistivity_ohm_m: 220, thickness_m: 0.6096 },
      twoLayers[1],
    ]);
    expect(rows('layers', 'rho\tthickness_m\n220\t2.4\n65\t', 'US')).toEqual(twoLayers);
  });

  test('of cases, of corners, of readings', () => {
    expect(rows('cases', '33 kV bus\t6,3 kA\t0,5\t\t6,5\t50\t400 ms')).toEqual([
      {
        name: '33 kV bus',
        fault_current_A: 6300,
        division_factor: 0.5,
        x_over_r: 6.5,
        frequency_hz: 50,
        duration_s: 0.4,
      },
    ]);
    expect(rows('corners', 'Easting (m), Northing (m)\n-3,0.5\n63,27')).toEqual([
      { x: -3, y: 0.5 },
      { x: 63, y: 27 },
    ]);
    expect(rows('readings', 'spacing_m\tresistance_ohm\ttraverse\n1\t43\tnorth fence')).toEqual([
      { spacing: 1, resistance: 43, traverse: 'north fence' },
    ]);
    expect(rows('readings', 'Spacing (ft)\tResistance (mΩ)\n10\t500')).toEqual([
      { spacing: 3.048, resistance: 0.5 },
    ]);
  });

  test('numbers that could be read in two ways are read as the others of their table', () => {
    expect(rows('corners', '0,5\t1,500\n1.234\t-2,250')).toEqual([
      { x: 0.5, y: 1.5 },
      { x: 1234, y: -2.25 },
    ]);
    expect(rows('corners', '0.5\t1,500\n1.234\t2,250')).toEqual([
      { x: 0.5, y: 1500 },
      { x: 1.234, y: 2250 },
    ]);
  });

  test('marks of inches in cells divided by tabs are no quotation marks', () => {
    expect(rows('corners', '3\' 6"\t12"\n1\t2')).toEqual([
      { x: 1.0668, y: 0.3048 },
      { x: 1, y: 2 },
    ]);
  });
});

describe('complaints', () => {
  test.each<[PasteTable, string, readonly string[]]>([
    ['layers', '', ['line 1: nothing is pasted; expected rows with soil resistivity']],
    ['layers', 'resistivity\tthickness', ['line 1: a header row is pasted and no rows under it']],
    [
      'layers',
      '220\tdeep\n\n\t3\n65\t\t7',
      [
        'line 1, thickness_m: deep is not a number; expected a length such as 0.6 m or 2 ft',
        'line 3, resistivity_ohm_m: the cell is empty; expected soil resistivity',
        'line 4, column 3: 7 stands beyond the last column; expected at most 2 cells',
      ],
    ],
    [
      'layers',
      'resistivity\tthicknes_m\tcolour\n220\t2\tred',
      [
        'line 1, column 2: thicknes_m: no column of this table goes by this name; thickness_m is probably meant',
        'line 1, column 3: colour: no column of this table goes by this name; known are resistivity_ohm_m and thickness_m',
      ],
    ],
    [
      'layers',
      'resistivity (kA)\tthickness (furlong)\n220\t2',
      [
        'line 1, column 1: resistivity (kA): kA is a current; soil resistivity is a resistivity',
        'line 1, column 2: thickness (furlong): "furlong" is not a unit known here',
      ],
    ],
    [
      'layers',
      'thickness\tthickness_m\n2\t2',
      ['line 1, column 2: layer thickness is given twice; expected each column once'],
    ],
    [
      'layers',
      'thickness\n2',
      ['line 1, resistivity_ohm_m: the column is missing; expected soil resistivity'],
    ],
    ['layers', 'resistivity\t\n2\t5', ['line 2, column 2: 5 stands under no name of the table']],
    [
      'corners',
      '1,500\t2,250',
      [
        'line 1, x: 1,500 may mean 1.5 or 1500; write one of them; expected a coordinate such as 12.5 m or 41 ft',
        'line 1, y: 2,250 may mean 2.25 or 2250; write one of them; expected a coordinate such as 12.5 m or 41 ft',
      ],
    ],
    ['corners', '1;2\n"3;4', ['line 2: a quotation mark opens in this row and is never closed']],
    [
      'conductors',
      'A,0,0,0.5,1,0,-0.5,10,,,maybe',
      [
        'line 1, depth2: "-0.5" is negative; expected a length such as 0.6 m or 2 ft',
        'line 1, insulated: maybe is not accepted; expected yes or no',
      ],
    ],
  ])('%s %j', (table, text, expected) => {
    expect(complaints(table, text)).toEqual(expected);
  });

  test('every cell is taken or told', () => {
    const cell = fc.constantFrom('1', '2,5', '3 m', 'x', '', '4 kA', '1,500', '3"', 'resistivity');
    fc.assert(
      fc.property(fc.array(fc.array(cell, { minLength: 2, maxLength: 4 }), { maxLength: 4 }), (table) => {
        const read = readPaste('layers', table.map((row) => row.join('\t')).join('\n'));
        const given = table.flat().filter((one) => one !== '').length;
        const values = read.rows.reduce((sum, row) => sum + row.size, 0);
        if (read.complaints.length === 0) {
          const header = table.find((row) => row.some((one) => one !== ''))?.includes('resistivity') ? 1 : 0;
          expect(values + header).toBe(given);
        } else expect(read.complaints.every(({ line }) => line >= 1)).toBe(true);
      }),
      { seed: 20_240_608, numRuns: 2000 },
    );
  });
});

describe('into a draft', () => {
  test('layers replace those of the soil, a survey, or those of a season', () => {
    const text = '220\t2.4\n65\t';
    for (const draft of [small(), demo('brackwater')]) {
      expect(loaded(taken(pasteLayers(draft, ['soil', 'layers'], text))).study.soil).toEqual({
        layers: twoLayers,
      });
    }
    const season = taken(pasteSeasons(small(), 'dry\t1\t500\nwet\t\t\t2\t50'));
    expect(loaded(taken(pasteList(small(), 'seasons', 'wet\t\t\t2\t50'))).study.seasons).toHaveLength(1);
    expect(taken(pasteList(small(), 'cases', 'a\t\t\t1\t\t\t1')).study.cases).toMatchObject([{ name: 'a' }]);
    expect(taken(pasteList(small(), 'layers', text)).study.soil).toEqual({ layers: twoLayers });
    expect(loaded(season).study.seasons).toEqual([
      { name: 'dry', top: { depth_m: 1, resistivity_ohm_m: 500 } },
      { name: 'wet', below: { depth_m: 2, resistivity_ohm_m: 50 } },
    ]);
    const whole = taken(pasteLayers(small(), ['seasons', 0, 'layers'], text));
    expect(whole.study.seasons).toEqual([{ layers: twoLayers }]);
  });

  test('a case of the same name keeps its place of injection', () => {
    const draft = taken(pasteCases(demo('aldermoor'), 'new\t\t\t900\t\t\t1\n33 kV busbar\t\t\t800\t\t\t1'));
    expect(loaded(draft).study.cases).toEqual([
      { name: 'new', grid_current_A: 900, duration_s: 1 },
      {
        name: '33 kV busbar',
        grid_current_A: 800,
        duration_s: 1,
        inject: { x_m: 43, y_m: 12, depth_m: 0.6 },
      },
    ]);
  });

  test('corners make an area, or replace one', () => {
    const triangle = taken(pasteCorners(small(), { kind: 'touch' }, '0\t0\n9\t0\n9\t9'));
    expect(loaded(triangle).study.areas).toEqual({
      touch: [
        [
          [0, 0],
          [9, 0],
          [9, 9],
        ],
      ],
    });
    const moved = taken(pasteCorners(triangle, { kind: 'touch', polygon: 0 }, '0\t0\n8\t0\n8\t8'));
    expect(loaded(moved).study.areas).toEqual({
      touch: [
        [
          [0, 0],
          [8, 0],
          [8, 8],
        ],
      ],
    });
  });

  test('conductors replace a table in its own columns', () => {
    const text = smallTable.replaceAll(',', '\t').replaceAll('.', ',');
    expect(
      textOf(
        taken(pasteConductors(small(undefined, smallTable.replace('D,0,10', 'D,5,5')), text)),
        'conductors.csv',
      ),
    ).toBe(smallTable);
    const feet =
      'id\tx1_ft\ty1_ft\tdepth1_in\tx2_ft\ty2_ft\tdepth2_in\tdiameter_in\nA\t0\t0\t18\t10\t0\t18\t0.5';
    expect(textOf(taken(pasteConductors(small(), feet)), 'conductors.csv').split('\n')[1]).toBe(
      'A,0,0,0.4572,3.048,0,0.4572,12.7',
    );
  });

  test('readings fill the survey, or begin one', () => {
    const text = 'spacing_m\tresistance_ohm\n1\t43\n2\t20\n4\t9\n8\t4\n16\t2';
    expect(loaded(taken(pasteReadings(demo('brackwater'), text))).survey?.readings).toHaveLength(5);
    const begun = taken(pasteReadings(small(), text));
    expect(begun.study.soil).toEqual({ survey: 'survey.csv', layer_count: 'auto' });
    expect(loaded(begun).survey?.readings[0]?.apparentResistivity).toBeCloseTo(2 * Math.PI * 43, 9);
  });

  test('with a complaint nothing is changed', () => {
    expect(pasteLayers(small(), ['soil', 'layers'], '220\tdeep')).toMatchObject({
      kind: 'complaints',
      complaints: [{ line: 1, value: 'deep' }],
    });
  });
});
