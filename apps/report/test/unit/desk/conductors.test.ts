// Conductors edited in their files: own columns and units, untouched rows to the byte, every edit taken back.
import type { RowOrigin } from '@ohmstead/study';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Conductor } from '../../../src/desk/conductor.ts';
import {
  addConductors,
  conductorsAt,
  copyConductors,
  deleteConductors,
  idsOf,
  moveConductors,
  replaceConductors,
  setCell,
  setConductor,
} from '../../../src/desk/conductor-edits.ts';
import { setValue } from '../../../src/desk/set-value.ts';
import { freeIds, line, mesh, rod } from '../../../src/desk/shapes.ts';
import { recordLines, tableBytes, tableText } from '../../../src/desk/table-text.ts';
import { bytesOf, demo, loaded, opened, small, smallStudy, smallTable, textOf } from './drafts.ts';

const FILE = 'conductors.csv';
const row = (at: number): RowOrigin => ({ file: FILE, line: at });
const make = { diameter: 0.012, material: 'copper-annealed', electrode: 'main' };
const wire: Conductor = { x1: 0, y1: 0, depth1: 0.5, x2: 3, y2: 4, depth2: 0.5, diameter: 0.01 };

/** Everything that a table may have beside rows: mark, line ends of three kinds, blank and odd lines, quoted cells. */
const odd = [
  '\ufeff \r\n',
  'id,x1_ft,y1_ft,depth1_in,x2_ft,y2_ft,depth2_in,diameter_in,note\r\n',
  '"A, ""north""",0,0,18,33,0,18,0.5,"two\r\nlines"\r\n',
  ',,,,,,,,\n',
  '  B , 33 ,0,18,33,33,18,0.5,\r',
  '# not a row\n',
  'C,33,33,18,0,33,18,0.50,x',
].join('');

describe('text of a table', () => {
  test('is put together again to the byte', () => {
    const text = tableText(bytesOf(odd));
    expect(text && [...tableBytes(text)]).toEqual([...bytesOf(odd)]);
    expect(text && recordLines(text)).toEqual([1, 2, 3, 5, 6, 7, 8]);
  });

  test('whatever its lines are', () => {
    const piece = fc.constantFrom('a', ',', '\n', '\r', '\r\n', '"', '""', ' ', 'x1_m', '\ufeff', 'é');
    fc.assert(
      fc.property(fc.array(piece, { maxLength: 30 }), (pieces) => {
        const bytes = bytesOf(pieces.join(''));
        const text = tableText(bytes);
        if (text !== undefined) expect([...tableBytes(text)]).toEqual([...bytes]);
      }),
      { seed: 20_240_608, numRuns: 2000 },
    );
  });
});

describe('rows', () => {
  const draft = small(smallStudy, odd);

  test('are read in the units of their columns', () => {
    expect(conductorsAt(draft, [row(6)])).toMatchObject([
      { id: 'B', x1: 10.0584, y1: 0, depth1: 0.4572, x2: 10.0584, y2: 10.0584, diameter: 0.0127 },
    ]);
  });

  test('that are not moved keep their bytes, and so do cells that are not', () => {
    const moved = moveConductors(draft, [row(6)], { dx: 0, dy: 0.3048 });
    expect(textOf(moved, FILE)).toBe(odd.replace('  B , 33 ,0,18,33,33,18,0.5,', 'B,33,1,18,33,34,18,0.5,'));
  });

  test('that are given the values they have keep their bytes', () => {
    const same = setConductor(draft, row(8), {
      diameter: 0.0127,
      x1: 10.0584,
      id: 'C',
      electrode: undefined,
    });
    expect(textOf(same, FILE)).toBe(odd);
    expect(textOf(setConductor(draft, row(6), { id: 'B', y1: 0 }), FILE)).toBe(odd);
    expect(textOf(setConductor(draft, row(8), { id: 'E', diameter: 0.0127 }), FILE)).toBe(
      odd.replace('C,', 'E,'),
    );
  });

  test('a move and the move back give the same bytes', () => {
    const shift = fc.integer({ min: -9_999_999, max: 9_999_999 }).map((n) => n / 10_000);
    const tidy = odd.replace('  B , 33 ,', 'B,33,').replace('"two\r\nlines"', 'two');
    const start = small(smallStudy, tidy);
    fc.assert(
      fc.property(shift, shift, fc.subarray([3, 5, 7]), (dx, dy, lines) => {
        const rows = lines.map(row);
        const there = moveConductors(start, rows, { dx, dy });
        const [before, after] = [conductorsAt(start, rows), conductorsAt(there, rows)];
        before.forEach(({ x1, y2 }, i) => {
          expect(Math.abs(after[i]!.x1 - x1 - dx)).toBeLessThanOrEqual(1e-9);
          expect(Math.abs(after[i]!.y2 - y2 - dy)).toBeLessThanOrEqual(1e-9);
        });
        expect(textOf(moveConductors(there, rows, { dx: -dx, dy: -dy }), FILE)).toBe(tidy);
      }),
      { seed: 20_240_608, numRuns: 500 },
    );
  });

  test('a row added and deleted leaves no trace, with and without a line end at the end', () => {
    for (const table of [odd, smallTable, smallTable.trimEnd(), `${smallTable}\n\n`]) {
      const start = small(smallStudy, table);
      const { draft: more, rows } = addConductors(start, [wire, { ...wire, x2: 9 }]);
      expect(conductorsAt(more, rows).map(({ x2 }) => Math.round(x2 * 1e8) / 1e8)).toEqual([3, 9]);
      expect(textOf(deleteConductors(more, rows), FILE)).toBe(table);
    }
  });

  test('metres are written into feet and inches so that they read back within a nanometre', () => {
    const place = fc.double({ min: -1e5, max: 1e5, noNaN: true });
    fc.assert(
      fc.property(place, place, fc.double({ min: 1e-4, max: 1, noNaN: true }), (x1, y1, diameter) => {
        const { draft: more, rows } = addConductors(draft, [{ ...wire, x1, y1, diameter }]);
        const [read] = conductorsAt(more, rows);
        expect(Math.abs(read!.x1 - x1)).toBeLessThanOrEqual(1e-9);
        expect(Math.abs(read!.y1 - y1)).toBeLessThanOrEqual(1e-9);
        expect(Math.abs(read!.diameter / diameter - 1)).toBeLessThanOrEqual(1e-9);
      }),
      { seed: 20_240_608, numRuns: 300 },
    );
  });

  test('a value without a column appends one, blank elsewhere', () => {
    const start = small();
    const copper = setConductor(start, row(3), { material: 'steel-1020', diameter: 0.01 });
    expect(textOf(copper, FILE)).toBe(
      smallTable
        .replace('diameter_mm\n', 'diameter_mm,material\n')
        .replace('0.5,10\nB,10,0,0.5,10,10,0.5,10\nC', '0.5,10,\nB,10,0,0.5,10,10,0.5,10,steel-1020\nC')
        .replace('0,10,0.5,10\nD', '0,10,0.5,10,\nD')
        .replace('D,0,10,0.5,0,0,0.5,10\n', 'D,0,10,0.5,0,0,0.5,10,\n'),
    );
    expect(loaded(copper).conductors.material).toEqual([
      'copper-annealed',
      'steel-1020',
      'copper-annealed',
      'copper-annealed',
    ]);
    const { draft: more } = addConductors(start, [
      { ...wire, id: 'E', electrode: 'fence', resistance: 0.001, insulated: true },
    ]);
    expect(textOf(more, FILE).split('\n')[0]).toBe(
      'id,x1_m,y1_m,depth1_m,x2_m,y2_m,depth2_m,diameter_mm,electrode,insulated,resistance_ohm_per_m',
    );
    expect(loaded(more).conductors).toMatchObject({ count: 5, insulated: Uint8Array.of(0, 0, 0, 0, 1) });
  });

  test('a cell takes whatever is typed, so that loading can tell what is wrong with it', () => {
    const typed = setCell(small(), row(2), 'diameter', '  half, an inch ');
    expect(textOf(typed, FILE)).toContain('A,0,0,0.5,10,0,0.5,"half, an inch"\n');
    expect(setConductor(typed, row(2), { diameter: 0.01 }).files.get(FILE)).toEqual(bytesOf(smallTable));
    // a row with a cell that cannot be read is moved all the same, and keeps that cell
    const broken = setCell(small(), row(2), 'x1', '?');
    expect(textOf(moveConductors(broken, [row(2)], { dx: 1, dy: 0, ddepth: 0.1 }), FILE)).toContain(
      'A,?,0,0.6,11,0,0.6,10\n',
    );
  });

  test('copies stand after the last row, under free ids', () => {
    const { draft: more, rows } = copyConductors(small(), [row(2), row(3)], { dx: 0, dy: -2 });
    expect(rows).toEqual([row(6), row(7)]);
    expect(conductorsAt(more, rows)).toMatchObject([
      { id: 'A-2', y1: -2 },
      { id: 'B-2', y1: -2, y2: 8 },
    ]);
    expect(conductorsAt(copyConductors(more, [row(2)], { dx: 1, dy: 1 }).draft, [row(8)])).toMatchObject([
      { id: 'A-3' },
    ]);
    expect(loaded(more).conductors.count).toBe(6);
  });

  test('a line without a conductor is a fault of the caller', () => {
    expect(() => moveConductors(small(), [row(1)], { dx: 1, dy: 0 })).toThrow(RangeError);
    expect(() => deleteConductors(small(), [{ file: 'other.csv', line: 2 }])).toThrow(RangeError);
    expect(() => conductorsAt(small(), [row(99)])).toThrow(RangeError);
  });
});

describe('tables', () => {
  test('a study without one gets one', () => {
    const { conductors: _, ...bare } = smallStudy;
    const draft = opened(new Map([['study.json', bytesOf(JSON.stringify(bare))]]));
    const { draft: more, rows } = addConductors(draft, [{ ...wire, ...make, id: 'L-01' }]);
    expect(rows).toEqual([row(2)]);
    expect(textOf(more, FILE)).toBe(
      'id,x1_m,y1_m,depth1_m,x2_m,y2_m,depth2_m,diameter_mm,material,electrode\nL-01,0,0,0.5,3,4,0.5,12,copper-annealed,main\n',
    );
    expect(loaded(more).conductors.count).toBe(1);
  });

  test('a table that cannot be read is left alone, new rows go to one of their own', () => {
    const draft = small(smallStudy, 'a;b\n1;2\n');
    const { draft: more, rows } = addConductors(draft, [wire]);
    expect(rows[0]).toEqual({ file: 'conductors-2.csv', line: 2 });
    expect(more.study.conductors).toEqual([FILE, 'conductors-2.csv']);
    expect(textOf(more, FILE)).toBe('a;b\n1;2\n');
  });

  test('emptied, one of several goes, a lone one keeps its header', () => {
    const two = setValue(small(), ['conductors', 1], 'b.csv');
    const draft = {
      ...two,
      files: new Map(two.files).set('b.csv', bytesOf(smallTable.replace(/^([A-D]),/gm, 'b$1,'))),
    };
    const rows = [2, 3, 4, 5].map((at) => ({ file: 'b.csv', line: at }));
    const left = deleteConductors(draft, rows);
    expect([left.study.conductors, left.files.has('b.csv')]).toEqual([[FILE], false]);
    const none = deleteConductors(left, [2, 3, 4, 5].map(row));
    expect(textOf(none, FILE)).toBe(`${smallTable.split('\n')[0]}\n`);
    expect(conductorsAt(addConductors(none, [wire]).draft, [row(2)])).toMatchObject([{ x2: 3 }]);
  });

  test('replaced whole, a table keeps its columns and units', () => {
    const next = replaceConductors(small(smallStudy, odd), [
      { ...wire, id: 'E', x2: 3.048, electrode: 'main' },
    ]);
    expect(textOf(next, FILE)).toBe(
      '\ufeff \r\nid,x1_ft,y1_ft,depth1_in,x2_ft,y2_ft,depth2_in,diameter_in,note,electrode\r\n' +
        'E,0,0,19.6850394,10,13.12335958,19.6850394,0.3937007874,,main',
    );
    const broken = replaceConductors(small(smallStudy, 'a;b\n'), [wire]);
    expect(loaded(broken).conductors.count).toBe(1);
  });
});

describe('shapes', () => {
  test('a mesh of 3 by 2 is three conductors across and four up', () => {
    const drawn = mesh({ from: [30, 20], to: [0, 0], depth: 0.5, nx: 3, ny: 2 }, make, new Set(['EW-02']));
    expect(drawn.map(({ id, x1, y1, x2, y2 }) => [id, x1, y1, x2, y2])).toEqual([
      ['EW-01', 0, 0, 30, 0],
      ['EW-03', 0, 10, 30, 10],
      ['EW-04', 0, 20, 30, 20],
      ['NS-01', 0, 0, 0, 20],
      ['NS-02', 10, 0, 10, 20],
      ['NS-03', 20, 0, 20, 20],
      ['NS-04', 30, 0, 30, 20],
    ]);
    expect(
      drawn.every(({ depth1, depth2, diameter }) => depth1 === 0.5 && depth2 === 0.5 && diameter === 0.012),
    ).toBe(true);
  });

  test('a line and a rod', () => {
    const taken = new Set(['L-01']);
    expect(line([0, 1], [2, 3], 0.6, make, taken)).toMatchObject({
      id: 'L-02',
      x1: 0,
      y1: 1,
      depth1: 0.6,
      x2: 2,
      y2: 3,
      depth2: 0.6,
    });
    expect(rod([5, 6], { top: 0.5, length: 3 }, make, taken)).toMatchObject({
      id: 'R-01',
      x1: 5,
      y1: 6,
      depth1: 0.5,
      x2: 5,
      y2: 6,
      depth2: 3.5,
    });
    expect(freeIds(new Set(['R-01', 'R-03']), 'R', 3)).toEqual(['R-02', 'R-04', 'R-05']);
  });

  test('drawn into the demonstration study, they load', () => {
    const draft = demo('aldermoor');
    const count = loaded(draft).conductors.count;
    const shapes = mesh({ from: [70, 0], to: [80, 10], depth: 0.6, nx: 2, ny: 2 }, make, idsOf(draft));
    const { draft: more, rows } = addConductors(draft, shapes);
    const after = loaded(more);
    expect(after.conductors.count).toBe(count + 6);
    expect(after.origins.slice(-6)).toEqual(rows);
    expect(textOf(more, FILE).startsWith(textOf(draft, FILE))).toBe(true);
    expect(more.files.get('study.json')).toBe(draft.files.get('study.json'));
  });
});
