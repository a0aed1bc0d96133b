// Loading a study: what it holds, what was assumed, what is refused before reading.
import { describe, expect, test } from 'vitest';
import { LARGEST_TABLE_BYTES, MOST_ALIKE_FAULTS } from '../../src/input/limits.ts';
import { loadStudy } from '../../src/input/load-study.ts';
import { type StudySource, sourceFromMap } from '../../src/input/source.ts';
import { bytesOf, memorySource, smallStudy, smallTable, studyFaultLines } from './folder-source.ts';

const header = 'id,x1_m,y1_m,depth1_m,x2_m,y2_m,depth2_m,diameter_mm';

function withCase(part: object): object {
  return { ...smallStudy, cases: [{ ...smallStudy.cases[0], ...part }] };
}

function noteCodes(source: StudySource): readonly string[] {
  return loadStudy(source).notes.map(({ code }) => code);
}

function noteMessage(source: StudySource, code: string): string | undefined {
  return loadStudy(source).notes.find((note) => note.code === code)?.message;
}

describe('a loaded study', () => {
  test('has its conductors in SI units, row by row', () => {
    const table = [
      'id,x1_ft,y1_m,depth1_cm,x2_m,y2_yd,depth2_m,diameter_in,material,electrode,insulated,resistance_milliohm_per_m',
      'A,100,0,50,12.5,10,0.5,0.5,steel-1020,yard,yes,2.5',
      ',0,1,60,2,3,4,1,,,no,',
    ].join('\n');
    const { conductors, origins } = loadStudy(memorySource(smallStudy, table));
    expect(conductors.count).toBe(2);
    expect(conductors.id).toEqual(['A', '2']);
    expect([...conductors.x1]).toEqual([30.48, 0]);
    expect([...conductors.y1]).toEqual([0, 1]);
    expect([...conductors.depth1]).toEqual([0.5, 0.6]);
    expect([...conductors.x2]).toEqual([12.5, 2]);
    expect([...conductors.y2]).toEqual([9.144, 2.7432]);
    expect([...conductors.depth2]).toEqual([0.5, 4]);
    expect([...conductors.radius]).toEqual([0.00635, 0.0127]);
    expect(conductors.material).toEqual(['steel-1020', 'copper-annealed']);
    expect(conductors.electrode).toEqual(['yard', 'main']);
    expect([...conductors.insulated]).toEqual([1, 0]);
    expect([...conductors.resistancePerMetre]).toEqual([0.0025, Number.NaN]);
    expect(origins).toEqual([
      { file: 'conductors.csv', line: 2 },
      { file: 'conductors.csv', line: 3 },
    ]);
  });

  test('keeps the study as its file writes it, and the files as they were read', () => {
    const source = memorySource();
    const loaded = loadStudy(source);
    expect(loaded.study).toEqual(smallStudy);
    expect([...loaded.files.keys()]).toEqual(['conductors.csv', 'study.json']);
    expect(loaded.files.get('conductors.csv')).toEqual(source.read('conductors.csv'));
  });

  test('joins several tables in the order given and tells each row where it stands', () => {
    const other = 'x1_m,y1_m,depth1_m,x2_m,y2_m,depth2_m,diameter_mm\n\n5,5,0.5,5,5,3,16\n';
    const source = memorySource({ ...smallStudy, conductors: ['rods.csv', 'conductors.csv'] });
    const both: StudySource = {
      paths: [...source.paths, 'rods.csv'],
      size: (path) => (path === 'rods.csv' ? other.length : source.size(path)),
      read: (path) => (path === 'rods.csv' ? new TextEncoder().encode(other) : source.read(path)),
    };
    const { conductors, origins } = loadStudy(both);
    expect(conductors.id).toEqual(['1', 'A', 'B', 'C', 'D']);
    expect(origins[0]).toEqual({ file: 'rods.csv', line: 3 });
    expect(origins[1]).toEqual({ file: 'conductors.csv', line: 2 });
  });

  test('counts lines as an editor does, past blank rows and line breaks in quoted cells', () => {
    const table = `note,${header}\n"two\nlines",A,0,0,0.5,10,0,0.5,10\n\n,,,,,,,,\n,B,x,0,0.5,10,0,0.5,10\n`;
    expect(studyFaultLines(memorySource(smallStudy, table))).toEqual([
      'conductors.csv:6: x1_m: x is not a number; expected a plain decimal number such as 12.5',
    ]);
  });

  test('reads nothing of a table that is too large', () => {
    const source = memorySource();
    const read: string[] = [];
    const large: StudySource = {
      paths: source.paths,
      size: (path) => (path === 'conductors.csv' ? 300_000_000 : source.size(path)),
      read: (path) => {
        read.push(path);
        return source.read(path);
      },
    };
    expect(studyFaultLines(large)).toEqual([
      'conductors.csv: the file has 300.0 MB; at most 50.0 MB are read',
    ]);
    expect(read).toEqual(['study.json']);
    expect(LARGEST_TABLE_BYTES).toBe(50_000_000);
  });

  test('refuses a table with more conductors than a study may have', () => {
    const table = `${header}\n${',0,0,0.5,1,0,0.5,10\n'.repeat(100_001)}`;
    expect(studyFaultLines(memorySource(smallStudy, table))).toEqual([
      'conductors.csv: the table has more than 1e5 rows under its header, the most that are read',
    ]);
  });

  test('refuses a table with more columns than anyone reads', () => {
    const table = `${'x,'.repeat(1500)}\n1\n`;
    expect(studyFaultLines(memorySource(smallStudy, table))).toEqual([
      'conductors.csv:1: the header has 1501 columns; at most 1000 are read',
    ]);
  });

  test('takes a lone row with a cell too many for what it is, not for decimal commas', () => {
    expect(studyFaultLines(memorySource(smallStudy, `${header}\nA,0,0,0.5,10,0,0.5,10,x\n`))).toEqual([
      'conductors.csv:2: the row has 9 cells, the header 8; expected as many',
    ]);
  });

  test('does not look for crossings in an outline of too many corners', () => {
    const corners = Array.from({ length: 1001 }, (_, i) => [i % 2, i % 3]);
    const lines = studyFaultLines(memorySource({ ...smallStudy, areas: { touch: [corners] } }));
    expect(lines).toHaveLength(1);
    expect(lines[0]).toContain('areas.touch[0]: area has 1001 items; expected 3 to 1000 corners');
  });

  test('refuses a name that fills a page and a resistance beyond any conductor', () => {
    const table = `${header},resistance_ohm_per_m\n${'n'.repeat(121)},0,0,0.5,1,0,0.5,10,2e6\n`;
    expect(studyFaultLines(memorySource(smallStudy, table))).toEqual([
      `conductors.csv:2: id: ${'n'.repeat(40)}… has 121 characters; at most 120 are read`,
      'conductors.csv:2: resistance_ohm_per_m: 2e6 is out of range; expected a resistance per length above 0 and at most 1e6 ohm/m',
    ]);
  });

  // a bar of copper 5 m thick has 9e-10 Ω/m: 1.724e-8 Ω·m (IEC 60028, from memory) over π/4·5² m²
  test.each([
    ['1e-10', []],
    [
      '9e-11',
      [
        'conductors.csv:2: resistance_ohm_per_m: 9e-11 is no resistance that a branch of metal can have; for metal without resistance use "metal_model": "equipotential" in study.json',
      ],
    ],
  ])('takes a resistance from that of the thickest bar on: %s', (resistance, lines) => {
    const table = `${header},resistance_ohm_per_m\nA,0,0,0.5,1,0,0.5,10,${resistance}\n`;
    expect(studyFaultLines(memorySource(smallStudy, table))).toEqual(lines);
  });

  test('takes a conductor for bare where nothing is said of its insulation', () => {
    const table = `${header},insulated\nA,0,0,0.5,1,0,0.5,10,\nB,2,0,0.5,3,0,0.5,10,no\n`;
    expect([...loadStudy(memorySource(smallStudy, table)).conductors.insulated]).toEqual([0, 0]);
    expect([...loadStudy(memorySource()).conductors.insulated]).toEqual([0, 0, 0, 0]);
  });

  test('takes words in a later row for faulty values, not for a second header', () => {
    const table = 'x1_m,y1_m,depth1_m,x2_m,y2_m,depth2_m,diameter_mm\n0,0,0.5,1,0,0.5,10\na,b,c,d,e,f,g\n';
    const lines = studyFaultLines(memorySource(smallStudy, table));
    expect(lines).toHaveLength(7);
    expect(lines[0]).toBe(
      'conductors.csv:3: x1_m: a is not a number; expected a plain decimal number such as 12.5',
    );
  });

  test('passes over a column near to one that is there', () => {
    const table = `${header},material,materials\nA,0,0,0.5,1,0,0.5,10,steel-1020,two\n`;
    expect(noteMessage(memorySource(smallStudy, table), 'columns-unused')).toBe(
      'columns passed over, not part of the format: conductors.csv: "materials"',
    );
  });

  test('refuses tables that have too many conductors together, and reads none beyond', () => {
    const half = `${header}\n${',0,0,0.5,1,0,0.5,10\n'.repeat(60_000)}`;
    const names = ['a.csv', 'b.csv', 'c.csv'];
    const study = JSON.stringify({ ...smallStudy, conductors: names });
    const tables = names.map((name) => [name, bytesOf(half)] as const);
    expect(studyFaultLines(sourceFromMap(new Map([['study.json', bytesOf(study)], ...tables])))).toEqual([
      'b.csv: with this table the study has 120000 conductors; at most 1e5 are read',
    ]);
  });

  test('judges no electrode while a table is unread', () => {
    const study = { ...smallStudy, electrodes: [{ name: 'fence', role: 'floating' }] };
    expect(studyFaultLines(memorySource(study, ''))).toEqual([
      'conductors.csv:1: the table is empty; expected a header row and rows under it',
    ]);
  });

  test('tells quotation marks that do not pair, wherever they stand', () => {
    const table = (cell: string): string => `note,${header}\n${cell},A,0,0,0.5,1,0,0.5,10\n`;
    const lines = (cell: string): readonly string[] => studyFaultLines(memorySource(smallStudy, table(cell)));
    expect(lines('"a""b"')).toEqual([]);
    expect(lines('5" pipe')).toEqual([]);
    expect(lines('"a"b')).toEqual([
      'conductors.csv:2: text follows a closing quotation mark; write quotation marks within a quoted cell twice',
    ]);
    expect(lines('"a')).toEqual(['conductors.csv:2: a quotation mark opens in this row and is never closed']);
  });

  test('counts endless faults of one kind in place of listing them', () => {
    const table = `${header}\n${',0,0,0.5,1,0,0.5,10 mm\n'.repeat(1000)}`;
    const lines = studyFaultLines(memorySource(smallStudy, table));
    expect(lines).toHaveLength(MOST_ALIKE_FAULTS + 1);
    expect(lines[199]).toBe(
      'conductors.csv:201: diameter_mm: 10 mm has text after the number; expected the number alone',
    );
    expect(lines[200]).toBe(
      'conductors.csv:202: diameter_mm: from here on 800 more faults of this kind, not listed',
    );
  });

  test('lists the faults of all files together, study.json first', () => {
    const source = memorySource({ ...smallStudy, title: '' }, smallTable.replace('0.5,10\n', '0.5,-10\n'));
    expect(studyFaultLines(source)).toEqual([
      'study.json:4: title: title "" is not accepted; expected visible text of at most 200 characters',
      'conductors.csv:2: diameter_mm: -10 is not a positive length',
    ]);
  });

  test('refuses numbers whose unit must be wrong', () => {
    const rows = ['A,2e8,-2e8,0.5,10,0,0.5,10', 'B,0,0,20000,0,0,0.5,10000', 'C,0,0,1,0,0,2,0.001'];
    const table = `${header}\n${rows.join('\n')}\n`;
    expect(studyFaultLines(memorySource(smallStudy, table))).toEqual([
      'conductors.csv:2: x1_m: 2e8 is beyond 1e8 m; check the unit in the column name',
      'conductors.csv:2: y1_m: -2e8 is beyond 1e8 m; check the unit in the column name',
      'conductors.csv:3: depth1_m: 20000 is beyond 10000 m; check the unit in the column name',
      'conductors.csv:3: diameter_mm: 10000 is 10 m; expected a diameter from 0.00001 to 5 m, check the unit in the column name',
      'conductors.csv:4: diameter_mm: 0.001 is 0.000001 m; expected a diameter from 0.00001 to 5 m, check the unit in the column name',
    ]);
  });

  test.each([
    ['', 'study.json:1: the file is empty; expected a study as a JSON object'],
    [
      '[]',
      'study.json:1: study a list of 0 is not accepted; expected an object with format, version, title, soil, conductors, cases and limits',
    ],
    [`${'['.repeat(40)}`, 'study.json:1: brackets are nested deeper than 32'],
  ])('refuses %s as study.json', (text, line) => {
    expect(studyFaultLines(memorySource(text))).toEqual([line]);
  });

  test.each([
    [{ duration_s: 0.02 }, 'fault duration 0.02'],
    [{ duration_s: 3.01 }, 'fault duration 3.01'],
  ])('refuses a duration outside the limits: %o', (part, seen) => {
    const lines = studyFaultLines(memorySource(withCase(part)));
    expect(lines).toHaveLength(1);
    expect(lines[0]).toContain(
      `cases[0].duration_s: ${seen} is not accepted; expected a number from 0.03 to 3 s`,
    );
  });

  // IEEE Std 80-2000, clause 5.2: the energy rule holds from 0.03 s to 3.0 s (from memory)
  test.each([0.03, 3])('accepts a duration at the end of the range: %f s', (duration_s) => {
    expect(studyFaultLines(memorySource(withCase({ duration_s })))).toEqual([]);
  });

  test('refuses more soil layers than are solved', () => {
    const layers = Array.from({ length: 10 }, () => ({ resistivity_ohm_m: 100, thickness_m: 1 }));
    const study = { ...smallStudy, soil: { layers: [...layers, { resistivity_ohm_m: 10 }] } };
    expect(studyFaultLines(memorySource(study))).toEqual([
      'study.json:6: soil.layers: list of soil layers has 11 items; expected 1 to 10 layers, the top one first',
    ]);
  });

  test('refuses a table listed twice and an electrode list that misspells the fence', () => {
    const study = {
      ...smallStudy,
      conductors: ['conductors.csv', 'conductors.csv'],
      electrodes: [{ name: 'perimeter', role: 'floating' }],
    };
    const table = `${header},electrode\nA,0,0,0.5,1,0,0.5,10,main\nB,5,0,0.5,6,0,0.5,10,perimetre\n`;
    expect(studyFaultLines(memorySource(study, table))).toEqual([
      'study.json:14: conductors[1]: table "conductors.csv" is listed twice',
      'study.json:29: electrodes[0].name: no conductor belongs to the electrode "perimeter"; "perimetre" is probably meant',
    ]);
  });
});

describe('notes', () => {
  test('tell what a small study leaves open, each once', () => {
    expect(noteCodes(memorySource())).toEqual([
      'material-assumed',
      'electrode-assumed',
      'metal-model-assumed',
      'decrement-assumed',
      'frequency-assumed',
    ]);
  });

  test('fall silent where everything is given', () => {
    const study = {
      ...withCase({ x_over_r: 3, frequency_hz: 50 }),
      metal_model: 'resistive',
      electrodes: [{ name: 'main', role: 'energised' }],
    };
    const rows = smallTable.trimEnd().split('\n');
    const table = rows
      .map((row, i) => row + (i === 0 ? ',material,electrode' : ',steel-1020,main'))
      .join('\n');
    expect(noteCodes(memorySource(study, table))).toEqual([]);
  });

  test('count rows and name units and columns', () => {
    const table =
      'layer,x1_ft,y1_ft,depth1_m,x2_ft,y2_ft,depth2_m,diameter_in\nE-1,0,0,0.5,9,0,0.5,0.5\nE-1,0,5,0.5,9,5,0.5,0.02\n';
    const source = memorySource(smallStudy, table);
    expect(noteMessage(source, 'units-converted')).toBe(
      'converted to SI units: conductors.csv: x1_ft, y1_ft, x2_ft and y2_ft (international foot), diameter_in (inch)',
    );
    expect(noteMessage(source, 'columns-unused')).toBe(
      'columns passed over, not part of the format: conductors.csv: "layer"',
    );
    expect(noteMessage(source, 'id-assumed')).toBe(
      '2 conductors without id: named by place in the table, counted from 1',
    );
    expect(noteMessage(source, 'material-assumed')).toBe(
      '2 conductors without material: taken as copper-annealed',
    );
    expect(noteMessage(source, 'diameter-small')).toBe(
      '1 conductor thinner than 1 mm (the first is 0.508 mm at conductors.csv:3): check the unit of the diameter',
    );
  });

  test('ask to check the unit of a drawing in millimetres read as metres', () => {
    const table = `${header}\nA,0,0,0.6,60000,0,0.6,12\n`;
    expect(noteMessage(memorySource(smallStudy, table), 'extent-large')).toBe(
      'the conductors extend over 60000 m: check the unit in the column names',
    );
  });

  test('tell a division factor of 1, and a frequency that the limits are not stated for', () => {
    const study = {
      ...smallStudy,
      cases: [{ name: 'bus', fault_current_A: 900, x_over_r: 2, frequency_hz: 16.7, duration_s: 1 }],
    };
    expect(noteMessage(memorySource(study), 'division-factor-assumed')).toBe(
      'case "bus": no division_factor, taken as 1: the whole fault current enters the ground',
    );
    expect(noteMessage(memorySource(study), 'frequency-unusual')).toBe(
      'case "bus": the body-current limits of IEEE Std 80 are stated for 50 to 60 Hz and taken as they stand',
    );
  });

  test('tell electrodes that are energised only because nobody listed them', () => {
    const table = `${header},electrode\nA,0,0,0.5,1,0,0.5,10,main\nB,5,0,0.5,6,0,0.5,10,fence\n`;
    const study = { ...smallStudy, electrodes: [{ name: 'main', role: 'energised' }] };
    expect(noteMessage(memorySource(study, table), 'role-assumed')).toBe(
      'taken as energised, not listed among the electrodes: "fence"',
    );
  });
});
