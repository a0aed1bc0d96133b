// Main results beside those on record, of which nothing is trusted.
import { expect, test } from 'vitest';
import { fixtureOutcome } from '../../../../../packages/sheet/test/fixture.ts';
import { withSeason } from '../../../../../packages/sheet/test/fixture-season.ts';
import { besideRows } from '../../../src/engine/beside-rows.ts';

const { results } = fixtureOutcome({ spacing: 6, caseNames: ['bus'] });

test('resistance, rise, touch and step of each case, equal to a record of the same results', () => {
  const rows = besideRows(JSON.parse(JSON.stringify(results)), results);
  expect(rows.map(({ name }) => name)).toEqual([
    'Resistance',
    'bus: rise',
    'bus: worst touch voltage',
    'bus: worst step voltage',
  ]);
  for (const { record, computed } of rows) expect(record).toBe(computed);
  const plain = (text: string | undefined): string | undefined => text?.replaceAll('\u202f', ' ');
  expect(plain(rows[0]?.computed)).toMatch(/^[\d.]+ ± [\d.]+ Ω$/);
  expect(Number.parseFloat(rows[0]!.computed)).toBeCloseTo(results.electrode.resistance_ohm, 2);
  expect(plain(rows[2]?.computed)).toMatch(/^[\d .]+ ± [\d.]+ k?V, \d+ % of the limit$/);
});

test('seasons add the voltages of the season that governs', () => {
  const seasonal = withSeason(fixtureOutcome({ spacing: 6, caseNames: ['bus'] }), {
    name: 'dry',
    times: 1.5,
  });
  expect(besideRows({}, seasonal.results).map(({ name }) => name)).toContain(
    'bus: touch voltage, governing season',
  );
});

test.each([
  [undefined],
  [null],
  [7],
  [{ electrode: { resistance_ohm: 'two' }, cases: 'none' }],
  [{ cases: [{ touch: {} }] }],
])('a record of %j says nothing', (record) => {
  expect(besideRows(record, results).map((row) => row.record)).toEqual(['—', '—', '—', '—']);
});
