// Numbers as tables write them: every plain one round trips, everything else is refused with its text.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { readNumber } from '../../src/input/number-text.ts';

const SEED = 20_240_601;

function messageOf(text: string): string | undefined {
  const reading = readNumber(text);
  return reading.kind === 'fault' ? reading.message : undefined;
}

describe('readNumber', () => {
  test.each([
    ['0', 0],
    ['-0', 0],
    ['+12', 12],
    ['.5', 0.5],
    ['5.', 5],
    ['-0.25', -0.25],
    ['1e3', 1000],
    ['2.5E-3', 0.0025],
    ['0e999', 0],
    ['007', 7],
  ])('reads %s', (text, value) => {
    expect(readNumber(text)).toEqual({ kind: 'number', value });
  });

  test('any finite number written plainly is read back to the last bit', () => {
    const numbers = fc.double({ noNaN: true, noDefaultInfinity: true });
    fc.assert(
      fc.property(numbers, (value) => {
        expect(readNumber(String(value))).toEqual({ kind: 'number', value: value + 0 });
      }),
      { seed: SEED, numRuns: 1000 },
    );
  });

  test('decimals of any length are read as the language reads them', () => {
    const digits = fc.stringMatching(/^[+-]?\d{1,20}\.\d{1,20}$/);
    fc.assert(
      fc.property(digits, (text) => {
        expect(readNumber(text)).toEqual({ kind: 'number', value: Number(text) + 0 });
      }),
      { seed: SEED, numRuns: 500 },
    );
  });

  test('of texts that look like numbers those are read that the language reads, save other notations', () => {
    const lookalikes = fc.string({ unit: fc.constantFrom(...'0123456789+-.eExbo ,_n'), maxLength: 8 });
    fc.assert(
      fc.property(lookalikes, (text) => {
        const value = Number(text);
        const vanished = value === 0 && /[1-9]/.test(text.split(/[eE]/)[0]);
        const plain = /^[-+.\deE]+$/.test(text) && Number.isFinite(value) && !vanished;
        const reading = readNumber(text);
        if (plain) expect(reading).toEqual({ kind: 'number', value: value + 0 });
        else expect(reading.kind).toBe('fault');
      }),
      { seed: SEED, numRuns: 5000 },
    );
  });

  test('a cell of a million digits is refused at once', () => {
    expect(messageOf(`${'1'.repeat(1_000_000)}x`)).toBe(
      `${'1'.repeat(40)}… is not a number; expected a plain decimal number such as 12.5`,
    );
  });

  test.each([
    ['', 'the cell is empty; expected a plain decimal number such as 12.5'],
    ['1e400', '1e400 is larger than a number can be'],
    ['-1e400', '-1e400 is larger than a number can be'],
    ['1e-400', '1e-400 is smaller than a number can be; write 0 if it is none'],
    ['0x10', '0x10 is not a number; expected a plain decimal number such as 12.5'],
    ['1_000', '1_000 is not a number; expected a plain decimal number such as 12.5'],
    ['NaN', 'NaN is not a number; expected a plain decimal number such as 12.5'],
    ['Infinity', 'Infinity is not a number; expected a plain decimal number such as 12.5'],
    ['1e', '1e has text after the number; expected the number alone'],
    ['1,5', '1,5 has a comma; expected a decimal point, as in 1.5, and no thousands separator'],
    ['1,234.5', '1,234.5 has a comma; expected a decimal point, as in 1.5, and no thousands separator'],
    ['1.234,5', '1.234,5 has a comma; expected a decimal point, as in 1.5, and no thousands separator'],
    ['12 mm', '12 mm has text after the number; expected the number alone'],
    ['5"', '5" has text after the number; expected the number alone'],
    ['−3', '−3 begins with a dash; expected the hyphen of the keyboard as minus sign'],
    ['=A1', '=A1 is a formula; expected its value, a plain number'],
    ['1 2', '1 2 is not a number; expected a plain decimal number such as 12.5'],
    ['１２', '１２ is not a number; expected a plain decimal number such as 12.5'],
    ['x'.repeat(50), `${'x'.repeat(40)}… is not a number; expected a plain decimal number such as 12.5`],
  ])('refuses %s', (text, message) => {
    expect(messageOf(text)).toBe(message);
  });
});
