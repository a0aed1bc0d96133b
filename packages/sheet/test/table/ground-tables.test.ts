// Table files of a fitted soil: full precision, and only where there is something to tell.
import type { Outcome } from '@ohmstead/study';
import { describe, expect, it } from 'vitest';
import { tables } from '../../src/index.ts';
import { fixtureOutcome } from '../fixture.ts';
import { withEquivalentUniform, withGround } from '../fixture-ground.ts';
import { readCsv } from '../read-csv.ts';

const bare = fixtureOutcome({ spacing: 6, caseNames: ['bus', 'line'] });
const outcome = withEquivalentUniform(withGround(bare));

function table(name: string, of: Outcome = outcome): readonly (readonly string[])[] {
  return readCsv(tables(of).find((file) => file.name === name)?.csv ?? '');
}

function names(of: Outcome): readonly string[] {
  return tables(of).map((file) => file.name);
}

describe('tables of the ground', () => {
  it('are there where there are data, sorted among the others', () => {
    const extra = [
      'equivalent-uniform.csv',
      'ground-consequence.csv',
      'ground-family.csv',
      'ground-layers.csv',
      'ground-readings.csv',
      'ground-trials.csv',
      'sounding.csv',
    ];
    expect(names(outcome).filter((name) => !names(bare).includes(name))).toEqual(extra);
    expect([...names(outcome)].sort()).toEqual(names(outcome));
    expect(names(withGround(bare))).not.toContain('equivalent-uniform.csv');
    expect(names(withEquivalentUniform(bare))).not.toContain('ground-layers.csv');
  });

  it('tell layers as best fit, median and band', () => {
    expect(table('ground-layers.csv')).toEqual([
      ['layer', 'quantity', 'best_fit', 'soils_5_percent', 'soils_median', 'soils_95_percent'],
      ['1', 'resistivity_ohm_m', '204.1372', '178', '203', '231'],
      ['1', 'thickness_m', '2.04', '1.72', '2.08', '2.49'],
      ['2', 'resistivity_ohm_m', '50.6314', '41.2', '50.1', '61.7'],
    ]);
  });

  it('tell every reading in full precision', () => {
    const rows = table('ground-readings.csv');
    const readings = outcome.results.ground?.fit.readings ?? [];
    expect(rows).toHaveLength(1 + readings.length);
    expect(Number(rows[3][3])).toBe(readings[2].apparent_resistivity_ohm_m);
    expect(rows.filter((row) => row[6] === 'yes').map((row) => row[0])).toEqual(['12']);
    expect(table('sounding.csv')).toHaveLength(25);
  });

  it('tell what the soils make of every case, with the limits', () => {
    const [header, ...rows] = table('ground-consequence.csv');
    expect(header[header.length - 1]).toBe('limit_V');
    expect(rows.map((row) => row.slice(0, 2).join(' '))).toEqual([
      'bus resistance_ohm',
      'bus gpr_V',
      'bus touch_V',
      'bus step_V',
      'line gpr_V',
      'line touch_V',
      'line step_V',
    ]);
    expect(Number(rows[2][2])).toBe(bare.results.cases[0].touch.worst_V);
    expect(Number(rows[2][6])).toBe(bare.results.cases[0].touch.limit_V);
    expect(rows[1][6]).toBe('');
  });

  it('tell family and trials: count, seed, method, what was proposed and taken', () => {
    const [header, row] = table('ground-family.csv');
    const cell = (name: string): string => row[header.indexOf(name)];
    expect([cell('family_count'), cell('family_seed'), cell('family_method')]).toEqual([
      '160',
      '20260101',
      'made-up draws',
    ]);
    expect(cell('outcome')).toBe('converged');
    const trials = table('ground-trials.csv', withGround(bare, { asked: 2, proposed: 3 }));
    expect(trials.slice(1).map((trial) => trial.slice(3, 5))).toEqual([
      ['no', 'no'],
      ['no', 'yes'],
      ['yes', 'no'],
    ]);
  });

  it('tell hand values with their source', () => {
    expect(table('equivalent-uniform.csv')[1]).toEqual([
      'mean of the readings',
      '138.3',
      String(bare.results.electrode.resistance_ohm * 1.3325),
      '33.25',
      'made-up handbook, rule 4',
    ]);
  });

  it('list the doubts of the fit with the others', () => {
    expect(table('assumptions.csv')).toContainEqual([
      'doubt of the fit',
      'outliers',
      'the reading in line 12 stands off the model',
    ]);
  });

  it('protect names from the survey', () => {
    const nasty = withGround(bare, {
      traverses: ['=1+1', '@cmd'],
      surveyFile: '+x.csv',
      doubts: [{ code: '-a', message: '=2' }],
    });
    for (const { csv } of tables(nasty))
      for (const cell of readCsv(csv).flat()) expect(/^[=+@]|^-(?!\d)/.test(cell)).toBe(false);
    expect(table('ground-readings.csv', nasty)[1][1]).toBe("'=1+1");
  });
});
