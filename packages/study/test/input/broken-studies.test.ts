// Every broken study of the test data against the literal lines that tell what is wrong with it.
import { readdirSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { folderSource, studyFaultLines, testDataPath } from './folder-source.ts';

const materials =
  'known are copper-annealed, copper-hard-drawn, copper-clad-steel-40, copper-clad-steel-30, ' +
  'copper-clad-steel-rod-20, aluminium-ec, aluminium-5005, aluminium-6201, aluminium-clad-steel, steel-1020, ' +
  'stainless-clad-steel-rod, zinc-coated-steel-rod and stainless-steel-304';
const lengthUnits = 'known are _m, _dm, _cm, _mm, _km, _in, _ft, _yd and _us_ft';
const inside = 'expected a path within the study folder such as conductors.csv';
const dialect = 'expected commas between columns and a decimal point, as in 1.5';
const eitherSoil = 'expected either layers, the top one first, or survey with layer_count';
const wholeOrChanged = 'expected the whole soil as layers, or the soil of the study with top, below or both';
const resistivities = 'expected one from 0.01 to 1e7 Ω·m, check the unit in the column name';
const plain = 'expected a plain decimal number such as 12.5';

const broken: Readonly<Record<string, readonly string[]>> = {
  'above-surface': [
    'conductors.csv:2: depth1_m: -0.5 is above the soil surface; depths are positive downward',
    'conductors.csv:3: depth1_m: -1.2 is above the soil surface and depth2_m 3 below it: the conductor crosses the surface; end it at depth 0, depths are positive downward',
    'conductors.csv:4: depth2_m: -0.1 is above the soil surface and depth1_m 0.5 below it: the conductor crosses the surface; end it at depth 0, depths are positive downward',
  ],
  areas: [
    'study.json:28: areas.touch[0]: area has 2 items; expected 3 to 1000 corners [x, y] in metres, in order, the first not repeated',
    'study.json:38: areas.touch[1]: the edge after corner 1 and the edge after corner 3 cross or touch; expected an outline that does not meet itself',
    'study.json:56: areas.touch[2]: the last corner (0, 0) repeats the first; leave it out, the outline closes by itself',
    'study.json:76: areas.step[0]: the outline has no area; all corners lie on one line',
    'study.json:97: areas.step[1][1][1]: y of the corner "a" is not accepted; expected a number from -1e8 to 1e8 m',
  ],
  'bad-numbers': [
    `conductors.csv:2: x1_m: zero is not a number; ${plain}`,
    'conductors.csv:3: x1_m: 1e400 is larger than a number can be',
    `conductors.csv:3: y1_m: 0x10 is not a number; ${plain}`,
    `conductors.csv:3: x2_m: NaN is not a number; ${plain}`,
    `conductors.csv:3: y2_m: Infinity is not a number; ${plain}`,
    'conductors.csv:3: diameter_mm: -5 is not a positive length',
    'conductors.csv:4: x1_m: =B2+1 is a formula; expected its value, a plain number',
    'conductors.csv:4: y1_m: 1,5 has a comma; expected a decimal point, as in 1.5, and no thousands separator',
    'conductors.csv:4: x2_m: 12 m has text after the number; expected the number alone',
    `conductors.csv:4: y2_m: the cell is empty; ${plain}`,
    'conductors.csv:4: diameter_mm: 0 is not a positive length',
    'conductors.csv:5: x1_m: −5 begins with a dash; expected the hyphen of the keyboard as minus sign',
    'conductors.csv:5: y1_m: 1e-400 is smaller than a number can be; write 0 if it is none',
    'conductors.csv:5: diameter_mm: 12 mm has text after the number; expected the number alone',
  ],
  // a byte order mark and carriage returns are no faults
  'byte-order-mark': [],
  'carriage-returns': [],
  cases: [
    'study.json:16: cases[0]: the case has no current; expected fault_current_A with division_factor, or grid_current_A',
    'study.json:23: cases[1].grid_current_A: the case has two currents; expected either fault_current_A with division_factor, or grid_current_A',
    'study.json:26: cases[2].frequency_hz: frequency is missing; the decrement factor needs it beside x_over_r, 50 or 60 Hz',
    'study.json:27: cases[2].name: case name "bus" is also that of cases[0]',
    'study.json:29: cases[2].division_factor: division factor has nothing to divide: the grid current is already the part that enters the ground',
    'study.json:31: cases[2].duration_s: fault duration 5 is not accepted; expected a number from 0.03 to 3 s, where the body-current limits of IEEE Std 80 hold',
  ],
  'control-character': [
    'conductors.csv:2: id: A<U+0007> has the invisible character U+0007; expected visible text',
    'conductors.csv:3: electrode: ma<U+202E>in has the invisible character U+202E; expected visible text',
  ],
  'decimal-commas': [
    `conductors.csv:2: 12 cells under 10 column names; numbers seem to have a decimal comma (0,5); ${dialect}`,
  ],
  'duplicate-columns': [
    'conductors.csv:1: x1_m: column 10 has the same name as column 2',
    'conductors.csv:1: x1_ft: x of the first end is given twice, as x1_m and x1_ft',
    'conductors.csv:1: y2_m: the column is missing; expected y of the second end',
  ],
  'duplicate-ids': [
    'conductors.csv:3: id: "A" is also the id of conductors.csv:2; expected each id once',
    'conductors.csv:5: id: the place "4" of this row without id is also the id of conductors.csv:4; expected each id once',
  ],
  'empty-table': ['conductors.csv:1: the table is empty; expected a header row and rows under it'],
  // names are taken as they are; whoever writes them out escapes them
  'formula-names': [],
  'header-only': ['conductors.csv:1: the table has a header row and no rows under it'],
  'quoted-decimal-commas': [`conductors.csv:2: numbers have a decimal comma (0,5); ${dialect}`],
  heights: [
    'conductors.csv:1: depth1_m: the column is missing; expected depth of the first end, positive downward; heights (z1_m and z2_m) are not read, they count the other way',
    'conductors.csv:1: depth2_m: the column is missing; expected depth of the second end, positive downward; heights (z1_m and z2_m) are not read, they count the other way',
  ],
  'insulation-and-resistance': [
    'conductors.csv:2: insulated: "true" is not accepted; expected yes or no',
    'conductors.csv:2: resistance_ohm_per_m: -0.001 is out of range; expected a resistance per length above 0 and at most 1e6 ohm/m',
    'conductors.csv:4: resistance_ohm_per_m: 0 is no resistance that a branch of metal can have; for metal without resistance use "metal_model": "equipotential" in study.json',
  ],
  'json-comment': ['study.json:3: a comment stands here; JSON has none, delete it'],
  'json-cut-off': [
    'study.json:9: expected , or } after the value of "resistivity_ohm_m", found the end of the file',
  ],
  'json-key-twice': [
    'study.json:5: title: the key stands twice, first on line 4',
    'study.json:19: cases[0].grid_current_A: 1e999 is larger than a number can be',
  ],
  'json-trailing-comma': ['study.json:14: a comma stands before ] with no item after it'],
  'latin-1': [
    'conductors.csv:2: the byte 0xFC is not UTF-8, perhaps Latin-1 or Windows-1252; save the file as UTF-8',
  ],
  'layer-without-thickness': [
    'study.json:7: soil.layers[0].thickness_m: layer thickness is missing; every layer but the last one has a thickness',
    'study.json:11: soil.layers[1].resistivity_ohm_m: soil resistivity -100 is not accepted; expected a number from 0.01 to 1e7 Ω·m',
  ],
  'missing-column': ['conductors.csv:1: diameter_mm: the column is missing; expected diameter of the metal'],
  'misspelt-column': [
    'conductors.csv:1: X2_M: no column of this table goes by this name; x2_m is probably meant',
    'conductors.csv:1: materiel: no column of this table goes by this name; material is probably meant',
  ],
  'no-header': [
    'conductors.csv:1: the first row holds values (A, 0, 0, 0.5, 10, 0, 0.5, 10, copper-ann…); expected the column names',
  ],
  'no-last-layer': [
    'study.json:13: soil.layers[1].thickness_m: layer thickness 5 is given for the last layer, which has no bottom; leave it out, or add the layer below',
  ],
  'no-soil': [`study.json:5: soil: the soil is not described; ${eitherSoil}`],
  'no-study': ['study.json: no such file in the study folder'],
  'nothing-energised': [
    'study.json:26: electrodes: no electrode is energised: "main" is floating',
    'study.json:32: electrodes[1].name: no conductor belongs to the electrode "fense"; conductors belong to "main"',
    'study.json:36: electrodes[2].name: electrode name "main" is also that of electrodes[0]',
    'study.json:37: electrodes[2].role: electrode role "live" is not accepted; expected energised or floating',
  ],
  'nul-byte': ['conductors.csv:2: a zero byte (NUL) stands here; expected plain text'],
  'open-quote': ['conductors.csv:3: a quotation mark opens in this row and is never closed'],
  paths: [
    `study.json:13: conductors[0]: path "../secret.csv" leaves the study folder; ${inside}`,
    `study.json:14: conductors[1]: path "/etc/passwd" is absolute; ${inside}`,
    `study.json:15: conductors[2]: path "C:/grid.csv" names a drive; ${inside}`,
    'study.json:16: conductors[3]: path "sub\\grid.csv" has a backslash; expected / between folder and file',
    `study.json:17: conductors[4]: path "./conductors.csv" has an empty or . part; ${inside}`,
    'absent.csv: no such file in the study folder',
    'conductor.csv: no such file in the study folder; there is conductors.csv',
  ],
  'ragged-rows': [
    'conductors.csv:2: the row has 9 cells, the header 10; expected as many',
    'conductors.csv:3: the row has 11 cells, the header 10; expected as many',
  ],
  semicolons: [
    `conductors.csv:1: columns are separated by semicolons and numbers have a decimal comma (0,5); ${dialect}`,
  ],
  seasons: [
    `study.json:27: seasons[0]: the season changes nothing; ${wholeOrChanged}`,
    'study.json:31: seasons[1].name: season name "frozen" is also that of seasons[0]',
    'study.json:40: seasons[2].layers[0].thickness_m: layer thickness is missing; every layer but the last one has a thickness',
    'study.json:45: seasons[2].layers[1].thickness_m: layer thickness 2 is given for the last layer, which has no bottom; leave it out, or add the layer below',
    `study.json:48: seasons[2].top: the season has layers and top; ${wholeOrChanged}`,
    'study.json:60: seasons[3].below.depth_m: depth 1.5 m of what is wet below is not deeper than the top, 2 m',
    'study.json:65: seasons[4].name: season name "as given" is kept for the soil of the study itself',
    'study.json:67: seasons[4].below.depth_m: depth of the change 0 is not accepted; expected a number from 0.01 to 10000 m',
    'study.json:72: seasons[5].name: season name "dry" is also that of seasons[2]',
    'study.json:73: seasons[5].topp: there is no such key here; known are name, layers, top and below',
    'study.json:80: seasons[6].top.resistivity_ohm_m: soil resistivity is missing; expected a number from 0.01 to 1e7 Ω·m',
  ],
  'survey-and-layers': [`study.json:11: soil.survey: the soil has layers already; ${eitherSoil}`],
  'survey-columns': [
    `survey.csv:1: spacing: the column name has no unit; expected one such as spacing_m, ${lengthUnits}`,
    'survey.csv:1: resistance_ohm_m: ohm_m is not a unit of resistance known here; known are _ohm, _milliohm and _kohm',
    'survey.csv:1: aparent_resistivity_ohm_m: no column of this table goes by this name; apparent_resistivity_ohm_m is probably meant',
    'survey.csv:3: ab_half_m: 0 is not a positive length',
  ],
  'survey-incomplete': [
    'survey.csv:1: mn_half_m: the column is missing; expected half the distance between the potential pins, beside ab_half_m',
    'survey.csv:1: c2_x_m: the column is missing; expected place along the line of the pin where current leaves, beside c1_x_m and p2_x_m',
    'survey.csv:1: p1_x_m: the column is missing; expected place along the line of the first potential pin, beside c1_x_m and p2_x_m',
    'survey.csv:1: no column holds readings; expected apparent_resistivity_ohm_m or resistance_ohm; not read: "resistivity" and "operator"',
  ],
  'survey-missing': ['survey.csv: no such file in the study folder'],
  'survey-path': [
    `study.json:6: soil.survey: path "../survey.csv" leaves the study folder; ${inside}`,
    'study.json:7: soil.layer_count: number of layers to fit 7 is not accepted; expected a whole number from 1 to 5, or "auto"',
  ],
  'survey-rows': [
    'survey.csv:3: apparent_resistivity_ohm_m: apparent resistivity: -110 Ω·m is not positive',
    'survey.csv:4: spacing_m: 0 is not a positive length',
    'survey.csv:5: spacing_m: -3 is not a positive length',
    'survey.csv:6: the row has no reading; expected apparent_resistivity_ohm_m or resistance_ohm',
    'survey.csv:7: the row has two readings; expected either apparent_resistivity_ohm_m or resistance_ohm',
    'survey.csv:8: the row tells no place of the pins; expected spacing_m, or ab_half_m and mn_half_m, or c1_x_m, c2_x_m, p1_x_m and p2_x_m',
    'survey.csv:9: the row gives spacing_m, ab_half_m and mn_half_m; expected the distances of one array',
    'survey.csv:10: mn_half_m: MN/2: 5 m is not less than AB/2, 5 m',
    `survey.csv:11: mn_half_m: the cell is empty; ${plain}`,
    'survey.csv:12: resistance_ohm: resistance: -2.5 Ω is not positive, as the places of the pins ask',
    'survey.csv:13: pin positions: 0, 30, 10, 10 m are not four different places',
    'survey.csv:14: pin_depth_cm: pin depth: 6 m is not less than the distance between pins, 5 m',
    `survey.csv:15: p2_x_m: the cell is empty; ${plain}`,
    'survey.csv:16: potential pins stand where uniform ground has one potential: the reading tells nothing',
    `survey.csv:17: apparent_resistivity_ohm_m: the reading is an apparent resistivity of 7e9 Ω·m; ${resistivities}`,
    `survey.csv:18: resistance_ohm: resistance 2e8 Ω gives an apparent resistivity of 1.006e10 Ω·m; ${resistivities}`,
    'survey.csv:19: spacing_m: two pins stand 0.005 m from each other; expected at least 0.01 m, check the unit in the column name',
    'survey.csv:20: spacing_m: 8 m has text after the number; expected the number alone',
    `survey.csv:20: apparent_resistivity_ohm_m: about 70 is not a number; ${plain}`,
    'survey.csv:20: pin_depth_cm: -20 is above the soil surface; depths are positive downward',
    'survey.csv:20: traverse: nor<U+0007>th has the invisible character U+0007; expected visible text',
    'survey.csv:21: pin_depth_cm: pin depth: 7 m is not less than the distance between pins, 6 m',
  ],
  tabs: [`conductors.csv:1: columns are separated by tabs; ${dialect}`],
  'title-above-header': [
    'conductors.csv:1: the column names stand on line 3; expected them in the first row, with nothing above',
  ],
  'two-header-rows': [
    'conductors.csv:2: a second header row (m, m, m, m, m, m, mm); expected one header row, with the unit in each column name, as in x1_m',
    'conductors.csv:7: the header row stands here again; expected one header row',
  ],
  'unknown-material': [
    `conductors.csv:2: material: "Copper annealed" is not a known conductor material; copper-annealed is probably meant; ${materials}`,
    `conductors.csv:3: material: "unobtanium" is not a known conductor material; ${materials}`,
  ],
  'unknown-unit': [
    `conductors.csv:1: x1_furlong: furlong is not a unit of length known here; ${lengthUnits}`,
    `conductors.csv:1: diameter: the column name has no unit; expected one such as diameter_mm, ${lengthUnits}`,
  ],
  'utf-16': ['conductors.csv: the file is UTF-16 (little endian) text; save it as UTF-8'],
  'utf-16-no-mark': ['conductors.csv: the file is UTF-16 (big endian) text; save it as UTF-8'],
  workbook: [
    'conductors.csv: the file is a zip file or a spreadsheet workbook (.xlsx); export it as text (UTF-8)',
  ],
  'wrong-keys': [
    'study.json:3: version: version of the format 2 is not accepted; expected the number 1',
    'study.json:17: cases[0].grid_current_A: grid current "1000" is not accepted; expected a number above 0 and at most 1e6 A, without quotes',
    'study.json:18: cases[0].durations_s: there is no such key here; duration_s is probably meant',
    'study.json:19: cases[0].inject.depth_m: depth of the injection is missing; expected a number from 0 to 10000 m, positive downward',
    'study.json:26: limits.basis: basis of the limits "EN 50522" is not yet offered; expected "IEEE 80"',
    'study.json:27: limits.body_mass_kg: body mass 60 is not accepted; expected the number 50 or 70, kg',
    'study.json:29: titel: there is no such key here; title is probably meant',
    'study.json:30: metal_model: model of the metal "inductive" is not yet offered; expected "resistive" or "equipotential"',
    'study.json:31: colour: there is no such key here; known are format, version, title, project, revisions, soil, seasons, surfacing, metal_model, conductors, electrodes, cases, limits, areas, notes and display_units',
    'study.json:34: surfacing.thickness_m: covering thickness 100 is not accepted; expected a number above 0 and at most 1 m',
  ],
};

describe('broken studies', () => {
  test.each(Object.entries(broken))('%s', (name, lines) => {
    expect(studyFaultLines(folderSource(`broken/${name}`))).toEqual(lines);
  });

  test('every folder of broken studies has its lines here', () => {
    expect(readdirSync(testDataPath('broken')).sort()).toEqual(Object.keys(broken).sort());
  });
});
