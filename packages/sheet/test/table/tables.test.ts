// Tables as CSV: RFC 4180, full precision, and no cell that a spreadsheet would evaluate.
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { tables } from '../../src/index.ts';
import { csvCell, csvOf } from '../../src/table/csv.ts';
import { fixtureOutcome } from '../fixture.ts';
import { withSeason } from '../fixture-season.ts';
import { readCsv } from '../read-csv.ts';

const outcome = fixtureOutcome({ spacing: 2 });
const files = tables(outcome);

function table(name: string): readonly (readonly string[])[] {
  return readCsv(files.find((f) => f.name === name)?.csv ?? '');
}

function column(name: string, of: string): readonly string[] {
  const [header, ...rows] = table(name);
  return rows.map((row) => row[header.indexOf(of)]);
}

describe('a cell', () => {
  it('that a spreadsheet would take for a formula is text with a leading apostrophe', () => {
    for (const start of ['=', '+', '-', '@', '\t', '\r']) {
      expect(csvCell(`${start}1+1`).replace(/^"/, '')).toMatch(/^'/);
    }
    expect(csvCell('=HYPERLINK("http://x","y")')).toBe(`"'=HYPERLINK(""http://x"",""y"")"`);
  });

  it('keeps negative numbers numbers, in full precision', () => {
    expect(csvCell(-0.1)).toBe('-0.1');
    expect(csvCell(0.1 + 0.2)).toBe('0.30000000000000004');
    expect(csvCell(-0)).toBe('0');
    expect(csvCell(Number.NaN)).toBe('');
    expect(csvCell(null)).toBe('');
    expect(csvCell(true)).toBe('yes');
  });

  it('reads back as it was, whatever the text', () => {
    fc.assert(
      fc.property(fc.array(fc.string({ unit: 'grapheme' }), { minLength: 1, maxLength: 5 }), (texts) => {
        const csv = csvOf(
          [
            { name: 'a', value: (t: string) => t },
            { name: 'b', value: () => 1 },
          ],
          texts,
        );
        const read = readCsv(csv)
          .slice(1)
          .map(([cell]) => cell);
        expect(read).toEqual(texts.map((t) => (/^[=+\-@\t\r]/.test(t) ? `'${t}` : t)));
      }),
    );
  });
});

describe('table files', () => {
  it('are all there, sorted, each ended by CR LF and of one width', () => {
    expect(files.map((f) => f.name)).toEqual([
      'assumptions.csv',
      'cases.csv',
      'conductors.csv',
      'electrodes.csv',
      'limits.csv',
      'mesh.csv',
      'profile-11-kv-side.csv',
      'profile-33-kv-bus.csv',
      'profile-33-kv-line-end.csv',
      'segments.csv',
      'snaps.csv',
      'soil.csv',
    ]);
    for (const { csv } of files) {
      expect(csv.endsWith('\r\n')).toBe(true);
      expect(csv.replaceAll('\r\n', '')).not.toMatch(/[\r\n]/);
      const [header, ...rows] = readCsv(csv);
      for (const row of rows) expect(row).toHaveLength(header.length);
    }
  });

  it('tell results in full precision', () => {
    expect(Number(column('cases.csv', 'touch_worst_V')[0])).toBe(outcome.results.cases[0].touch.worst_V);
    expect(Number(column('segments.csv', 'leakage_A_per_m_A')[7])).toBe(outcome.segments.leakage[7]);
    expect(Number(column('profile-33-kv-bus.csv', 'potential_V')[9])).toBe(
      outcome.cases[0].profile.potential[9],
    );
  });

  it('sum leakage by conductor to the injected current', () => {
    const sum = column('conductors.csv', 'leakage_A_per_A').reduce((total, cell) => total + Number(cell), 0);
    expect(sum).toBeCloseTo(1, 9);
  });

  it('tell the finding of every comparison', () => {
    expect(column('limits.csv', 'finding')).toContain('beyond');
    expect(column('limits.csv', 'quantity').slice(0, 3)).toEqual(['touch', 'step', 'touch at fence']);
    expect(Number(column('limits.csv', 'margin_percent')[0])).toBeLessThan(0);
  });

  it('tell the depth of each layer, and nothing for the thickness of the last', () => {
    expect(table('soil.csv')).toEqual([
      ['season', 'layer', 'top_depth_m', 'thickness_m', 'resistivity_ohm_m'],
      ['as given', '1', '0', '2', '300'],
      ['as given', '2', '2', '', '100'],
    ]);
  });

  it('tell every case in every other season', () => {
    const seasonal = tables(withSeason(outcome, { name: 'dry summer', times: 1.3 }));
    const seasons = readCsv(seasonal.find((f) => f.name === 'seasons.csv')?.csv ?? '');
    expect(seasons).toHaveLength(1 + outcome.results.cases.length);
    expect(seasons[1][0]).toBe('dry summer');
    expect(seasonal.find((f) => f.name === 'soil.csv')?.csv).toContain('dry summer,1,0,1.5,900\r\n');
    expect(seasonal.find((f) => f.name === 'limits.csv')?.csv).toContain('"touch, dry summer",dry summer,');
  });

  it('protect names from the study', () => {
    const nasty = tables(
      fixtureOutcome({ spacing: 6, caseNames: ['=1+1', '@cmd', 'plain, with comma'], fenceName: '+fence' }),
    );
    const all = nasty.map((f) => f.csv).join('');
    expect(all).toContain("'=1+1,");
    expect(all).toContain("'@cmd,");
    expect(all).toContain('"plain, with comma"');
    expect(all).toContain("'+fence");
    for (const { csv } of nasty) {
      for (const cell of readCsv(csv).flat()) expect(/^[=+@]|^-(?!\d)/.test(cell)).toBe(false);
    }
  });

  it('have the same bytes for the same outcome', () => {
    expect(tables(fixtureOutcome({ spacing: 2 }))).toEqual(files);
  });
});
