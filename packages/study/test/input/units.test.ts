// Units of column names against their definitions.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { toSi, type UnitKind, unitsOf } from '../../src/input/units.ts';

const SEED = 20_240_602;

function si(kind: UnitKind, name: string, value: number): number {
  const unit = unitsOf(kind).get(name);
  if (unit === undefined) throw new Error(`no unit ${name}`);
  return toSi(value, unit);
}

describe('units', () => {
  // NIST SP 811:2008, appendix B.8 (from memory): foot, inch, yard exact; US survey foot 1200/3937 m
  test.each([
    ['length', 'm', 1],
    ['length', 'dm', 0.1],
    ['length', 'cm', 0.01],
    ['length', 'mm', 0.001],
    ['length', 'km', 1000],
    ['length', 'in', 0.0254],
    ['length', 'ft', 0.3048],
    ['length', 'yd', 0.9144],
    ['length', 'us_ft', 1200 / 3937],
    ['resistance-per-length', 'ohm_per_m', 1],
    ['resistance-per-length', 'ohm_per_km', 0.001],
    ['resistance-per-length', 'milliohm_per_m', 0.001],
    ['resistance-per-length', 'microohm_per_m', 1e-6],
    ['resistance-per-length', 'ohm_per_ft', 1 / 0.3048],
    ['resistance-per-length', 'ohm_per_kft', 1 / 304.8],
    ['resistance-per-length', 'ohm_per_mi', 1 / 1609.344],
    ['resistivity', 'ohm_m', 1],
    ['resistivity', 'ohm_cm', 0.01],
    ['resistivity', 'ohm_ft', 0.3048],
    ['resistivity', 'kohm_m', 1000],
    ['resistivity', 'kohm_cm', 10],
    ['resistance', 'ohm', 1],
    ['resistance', 'milliohm', 0.001],
    ['resistance', 'kohm', 1000],
  ] as const)('%s: one %s is %f in SI units', (kind, name, value) => {
    expect(Math.abs(si(kind, name, 1) / value - 1)).toBeLessThanOrEqual(Number.EPSILON);
  });

  test('the definitions above are all there are', () => {
    expect([...unitsOf('length').keys()]).toEqual(['m', 'dm', 'cm', 'mm', 'km', 'in', 'ft', 'yd', 'us_ft']);
    expect(unitsOf('resistance-per-length').size).toBe(7);
    expect(unitsOf('resistivity').size).toBe(5);
    expect(unitsOf('resistance').size).toBe(3);
  });

  test('metric lengths are the same number in any unit, to the last bit', () => {
    fc.assert(
      fc.property(fc.integer({ min: -1e9, max: 1e9 }), (millimetres) => {
        const metres = si('length', 'mm', millimetres);
        expect(metres).toBe(Number(`${millimetres}e-3`) + 0);
        expect(si('length', 'm', Number(`${millimetres}e-3`))).toBe(metres);
      }),
      { seed: SEED, numRuns: 1000 },
    );
  });

  test('twelve inches are a foot and three feet are a yard', () => {
    fc.assert(
      fc.property(fc.integer({ min: -1e9, max: 1e9 }), (thousandths) => {
        const feet = thousandths / 1000;
        const metres = si('length', 'ft', feet);
        const tolerance = 4 * Number.EPSILON * Math.abs(metres);
        expect(Math.abs(si('length', 'in', 12 * feet) - metres)).toBeLessThanOrEqual(tolerance);
        expect(Math.abs(si('length', 'yd', feet / 3) - metres)).toBeLessThanOrEqual(tolerance);
      }),
      { seed: SEED, numRuns: 1000 },
    );
  });
});
