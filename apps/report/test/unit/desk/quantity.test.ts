// Quantities as typed: values in SI, complaints in words, and digits that read back.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { type QuantityKind, readQuantity } from '../../../src/desk/quantity.ts';
import { quantityText } from '../../../src/desk/quantity-text.ts';

function value(kind: QuantityKind, text: string, units: 'SI' | 'US' = 'SI'): number | string {
  const reading = readQuantity(kind, text, { units });
  return 'value' in reading ? reading.value : reading.complaint;
}

describe('quantities with a unit', () => {
  // inch 0.0254 m, foot 0.3048 m: international yard and pound agreement, 1959 (from memory)
  test.each<[QuantityKind, string, number]>([
    ['length', '0.6', 0.6],
    ['length', '0,6', 0.6],
    ['length', '4 in', 0.1016],
    ['length', '12mm', 0.012],
    ['length', '3 ft 6 in', 1.0668],
    ['length', `3' 6"`, 1.0668],
    ['length', '3′6″', 1.0668],
    ['length', '2 FEET', 0.6096],
    ['length', '60 cm', 0.6],
    ['diameter', '12', 0.012],
    ['diameter', '5/8 in', 0.015875],
    ['diameter', '1 1/2"', 0.0381],
    ['coordinate', '-12.5', -12.5],
    ['coordinate', '−3 ft', -0.9144],
    ['coordinate', '-3 ft 6 in', -1.0668],
    ['resistivity', '1.2 kΩ·m', 1200],
    ['resistivity', '120 ohm-m', 120],
    ['resistivity', '120 Ohm m', 120],
    ['resistivity', '120 ohm_m', 120],
    ['resistivity', '120 ohm·m', 120],
    ['resistivity', '120 Ωm', 120],
    ['resistivity', '120 \u2126m', 120],
    ['resistivity', '120 ohm metres', 120],
    ['resistivity', '5000 ohm-cm', 50],
    ['resistivity', '2 kohm·m', 2000],
    ['resistance', '20 mΩ', 0.02],
    ['resistance', '20 m\u2126', 0.02],
    ['resistance', '2 MΩ', 2_000_000],
    ['current', '0.01 MA', 10_000],
    ['current', '10 mA', 0.01],
    ['resistance', '2.7 ohms', 2.7],
    ['resistance-per-length', '0.2 Ω/km', 0.0002],
    ['resistance-per-length', '0.2 ohm per km', 0.0002],
    ['current', '3.2 kA', 3200],
    ['current', '3.2ka', 3200],
    ['current', '6 300', 6300],
    ['current', '6\u202f300\u202fA', 6300],
    ['current', '12,345.5 A', 12345.5],
    ['current', '12.345,5 A', 12345.5],
    ['current', '1e3 A', 1000],
    ['duration', '100 ms', 0.1],
    ['duration', '0,5 s', 0.5],
    ['voltage', '1.2 kV', 1200],
    ['frequency', '50 Hz', 50],
    ['ratio', '0.6', 0.6],
    ['ratio', '60 %', 0.6],
    ['percent', '60', 60],
    ['percent', '60 %', 60],
    ['mass', '70 kg', 70],
  ])('%s %s', (kind, text, expected) => {
    expect(value(kind, text)).toBe(expected);
  });

  test('bare numbers are in the units displayed', () => {
    const bare = ['length', 'coordinate', 'thickness', 'diameter', 'resistivity', 'current'] as const;
    expect(bare.map((kind) => value(kind, '2', 'US'))).toEqual([0.6096, 0.6096, 0.0508, 0.0508, 2, 2]);
  });
});

describe('complaints', () => {
  test.each<[QuantityKind, string, string]>([
    ['length', '4 kA', 'kA is a current; expected a length such as 0.6 m or 2 ft'],
    ['length', '', 'nothing is given; expected a length such as 0.6 m or 2 ft'],
    ['length', 'deep', 'deep is not a number; expected a length such as 0.6 m or 2 ft'],
    ['length', '-0.5', '"-0.5" is negative; expected a length such as 0.6 m or 2 ft'],
    ['length', '3 furlongs', '"furlongs" is not a unit known here; expected a length such as 0.6 m or 2 ft'],
    [
      'length',
      '1,500',
      '1,500 may mean 1.5 or 1500; write one of them; expected a length such as 0.6 m or 2 ft',
    ],
    ['length', '3 in 2 ft', '"3 in 2 ft" is more than one number; expected a length such as 0.6 m or 2 ft'],
    ['length', '3 ft 6', '"3 ft 6" is more than one number; expected a length such as 0.6 m or 2 ft'],
    [
      'length',
      '1.2.3',
      '1.2.3 has marks that divide it in no known way; expected a length such as 0.6 m or 2 ft',
    ],
    ['length', '1/0 in', '"/" is not a unit known here; expected a length such as 0.6 m or 2 ft'],
    ['length', '1e999', '1e999 is larger than a number can be; expected a length such as 0.6 m or 2 ft'],
    ['length', '1e-999', '1e-999 is smaller than a number can be; expected a length such as 0.6 m or 2 ft'],
    ['length', '-', '"-" is not a number; expected a length such as 0.6 m or 2 ft'],
    ['resistivity', '12 Ω', 'Ω is a resistance; expected a resistivity such as 120 Ω·m'],
    ['resistance', '12 Ω·m', 'Ω·m is a resistivity; expected a resistance such as 2.7 Ω'],
    ['diameter', '95 mm²', 'mm² is a cross-section; expected a diameter such as 12 mm or 0.5 in'],
    ['diameter', '4/0 AWG', 'AWG is a wire gauge; expected a diameter such as 12 mm or 0.5 in'],
    ['diameter', '500 kcmil', 'kcmil is a wire gauge; expected a diameter such as 12 mm or 0.5 in'],
    ['duration', '25 cycles', 'cycles is a count of periods; expected a time such as 0.5 s or 500 ms'],
    [
      'current',
      '3.2 kA 5',
      '"3.2 kA 5" is more than one number; expected a current such as 3200 A or 3.2 kA',
    ],
    ['mass', '70 %', '% is a share; expected a mass such as 70 kg'],
  ])('%s %s', (kind, text, expected) => {
    expect(value(kind, text)).toBe(expected);
  });
});

describe('texts', () => {
  test.each<[QuantityKind, number, 'SI' | 'US', string]>([
    ['length', 0.6, 'SI', '0.6\u202fm'],
    ['length', 0.6096, 'US', '2\u202fft'],
    ['length', 0.6, 'US', '1.968503937\u202fft'],
    ['thickness', 0.1016, 'US', '4\u202fin'],
    ['diameter', 0.012, 'SI', '12\u202fmm'],
    ['diameter', 0.015875, 'US', '0.625\u202fin'],
    ['coordinate', -1234.5, 'SI', '\u22121\u202f234.5\u202fm'],
    ['current', 6300, 'SI', '6\u202f300\u202fA'],
    ['current', 25_000, 'SI', '25\u202fkA'],
    ['ratio', 0.6, 'SI', '0.6'],
    ['percent', 60, 'SI', '60\u202f%'],
    ['resistivity', 2500, 'US', '2\u202f500\u202fΩ·m'],
  ])('%s %d in %s', (kind, si, units, expected) => {
    expect(quantityText(kind, si, units)).toBe(expected);
  });

  const kinds = [
    'length',
    'thickness',
    'coordinate',
    'diameter',
    'resistivity',
    'resistance',
    'resistance-per-length',
    'current',
    'duration',
    'voltage',
    'frequency',
    'ratio',
    'percent',
    'mass',
  ] as const;

  test('read back to the same value', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...kinds),
        fc.constantFrom('SI' as const, 'US' as const),
        fc.integer({ min: 0, max: 999_999_999 }),
        fc.integer({ min: -9, max: 0 }),
        (kind, units, digits, exponent) => {
          const si = Number(`${digits}e${exponent}`);
          expect(value(kind, quantityText(kind, si, units), units)).toBe(si);
        },
      ),
      { seed: 20_240_608, numRuns: 3000 },
    );
  });

  test('any length reads back within a nanometre', () => {
    fc.assert(
      fc.property(
        fc.constantFrom('SI' as const, 'US' as const),
        fc.double({ min: -1e5, max: 1e5, noNaN: true }),
        (units, si) => {
          const read = value('coordinate', quantityText('coordinate', si, units), units);
          expect(Math.abs(Number(read) - si)).toBeLessThanOrEqual(0.501e-9);
        },
      ),
      { seed: 20_240_608, numRuns: 1000 },
    );
  });

  test('whatever is typed gives a value or a complaint, and never anything else', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...kinds),
        fc.string({ unit: fc.constantFrom(...'0123456789.,-+ /\'"eEmftinkΩ·A%\u202f') }),
        (kind, text) => {
          const reading = readQuantity(kind, text);
          if ('value' in reading) expect(Number.isFinite(reading.value)).toBe(true);
          else expect(reading.complaint).toMatch(/; expected an? /);
        },
      ),
      { seed: 20_240_608, numRuns: 3000 },
    );
  });
});
