// Numbers for people: digits from the uncertainty, thin spaces, a proper minus, SI units.
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  decimalsFor,
  fixed,
  given,
  givenQuantity,
  measured,
  percent,
  powerOfTen,
  quantity,
  significant,
  valueAndUncertainty,
  volts,
} from '../../src/format/number.ts';

/** Back from what people read to a number. */
function read(text: string): number {
  return Number(text.replaceAll('\u202f', '').replace('\u2212', '-'));
}

const finite = fc.double({ min: -1e7, max: 1e7, noNaN: true, noDefaultInfinity: true });
const positive = fc.double({ min: 1e-6, max: 1e7, noNaN: true, noDefaultInfinity: true });

describe('fixed', () => {
  it('groups thousands by thin spaces from four digits on, and writes a true minus', () => {
    expect(fixed(1912.4, 0)).toBe('1\u202f912');
    expect(fixed(-1234567.891, 2)).toBe('\u22121\u202f234\u202f567.89');
    expect(fixed(999, 0)).toBe('999');
  });

  it('never writes a negative nought and rounds before the point', () => {
    expect(fixed(-0.004, 2)).toBe('0.00');
    expect(fixed(51_944, -2)).toBe('51\u202f900');
    expect(fixed(Number.NaN, 2)).toBe('—');
  });

  it('reads back within half a unit of the last place, with no ASCII minus or group sign', () => {
    fc.assert(
      fc.property(finite, fc.integer({ min: 0, max: 6 }), (value, decimals) => {
        const text = fixed(value, decimals);
        expect(text).not.toMatch(/[-, ]/);
        expect(Math.abs(read(text) - value)).toBeLessThanOrEqual(0.5 * 10 ** -decimals * (1 + 1e-6) + 1e-9);
      }),
    );
  });
});

describe('digits from the uncertainty', () => {
  it('keeps one digit of the uncertainty, two where it begins with 1', () => {
    expect(valueAndUncertainty(975.3, 4.2)).toEqual(['975', '5']);
    expect(valueAndUncertainty(975.34, 1.2)).toEqual(['975.3', '1.2']);
    expect(valueAndUncertainty(0.97831, 0.0009)).toEqual(['0.9783', '0.0009']);
    expect(valueAndUncertainty(12345, 230)).toEqual(['12\u202f300', '300']);
  });

  it('never shows more than six digits however small the uncertainty, and never rounds it to nothing', () => {
    expect(valueAndUncertainty(2.7212345678, 1e-12)).toEqual(['2.72123', '0.00001']);
    expect(decimalsFor(2.72, 0)).toBe(3);
  });

  it('never claims an exact result: nought is rounded up to the last place shown, what is missing is a dash', () => {
    expect(valueAndUncertainty(2.7212, 0)).toEqual(['2.721', '0.001']);
    expect(valueAndUncertainty(0, 0)).toEqual(['0.000', '0.001']);
    expect(measured(975.26, 0, 'V')).toBe('975.3\u202f±\u202f0.1\u202fV');
    expect(valueAndUncertainty(2.7212, Number.NaN)).toEqual(['2.721', '—']);
    fc.assert(
      fc.property(finite, fc.double({ min: 0, max: 1e-6, noNaN: true }), (value, uncertainty) => {
        expect(read(valueAndUncertainty(value, uncertainty)[1])).toBeGreaterThan(0);
      }),
    );
  });

  it('shows value and uncertainty at one place, and a band no narrower than the computed one', () => {
    fc.assert(
      fc.property(positive, positive, (value, uncertainty) => {
        const [middle, band] = valueAndUncertainty(value, uncertainty);
        expect(middle.split('.')[1]?.length).toBe(band.split('.')[1]?.length);
        expect(read(band)).toBeGreaterThanOrEqual(uncertainty * (1 - 1e-5));
        const places = decimalsFor(value, uncertainty);
        expect(Math.abs(read(middle) - value)).toBeLessThanOrEqual(0.5 * 10 ** -places * (1 + 1e-6));
      }),
    );
  });
});

describe('quantities', () => {
  it('tells volts and amperes in thousands from 10 000 on, and nothing else', () => {
    expect(quantity(9_999, 'V')).toBe('9\u202f999\u202fV');
    expect(quantity(12_340, 'V')).toBe('12.34\u202fkV');
    expect(quantity(31_500, 'A')).toBe('31.50\u202fkA');
    expect(quantity(12_340, 'Ω·m')).toBe('12\u202f340\u202fΩ·m');
    expect(givenQuantity(25_000, 'A')).toBe('25\u202fkA');
    expect(measured(12_340, 56, 'V')).toBe('12.34\u202f±\u202f0.06\u202fkV');
  });

  it('tells results without their own uncertainty in four digits, whole from 100 on', () => {
    expect(quantity(827.32, 'V')).toBe('827\u202fV');
    expect(quantity(86.454, 'V')).toBe('86.45\u202fV');
    expect(significant(0.0621449, 3)).toBe('0.0621');
    expect(volts(503.7)).toBe('504\u202fV');
    expect(volts(4.26)).toBe('4.3\u202fV');
  });

  it('repeats an input as it was given', () => {
    expect(given(0.6)).toBe('0.6');
    expect(given(0.1 + 0.2)).toBe('0.3');
    expect(given(-2.5)).toBe('\u22122.5');
    expect(given(3e-7)).toBe('3·10⁻⁷');
    fc.assert(
      fc.property(
        fc.integer({ min: -999_999, max: 999_999 }),
        fc.integer({ min: 0, max: 3 }),
        (n, decimals) => {
          const value = Number((n / 10 ** decimals).toFixed(decimals));
          expect(read(given(value))).toBe(value === 0 ? 0 : value);
        },
      ),
    );
  });
});

describe('shares and orders of size', () => {
  it('tells whole per cent from 10 on, one decimal below, and never a rounded nought', () => {
    expect(percent(0.5672)).toBe('57\u202f%');
    expect(percent(0.0345)).toBe('3.5\u202f%');
    expect(percent(0.0996)).toBe('10\u202f%');
    expect(percent(0.0002)).toBe('less than 0.1\u202f%');
    expect(percent(0)).toBe('0\u202f%');
  });

  it('tells orders of size as powers of ten', () => {
    expect(powerOfTen(3.1e-13)).toBe('3·10⁻¹³');
    expect(powerOfTen(-4e12)).toBe('\u22124·10¹²');
    expect(powerOfTen(0)).toBe('0');
  });
});
