// A number as text of a table: plain decimal with a point, everything else refused with its reason.
import { shown } from './shown-value.ts';

export type NumberReading =
  | { readonly kind: 'number'; readonly value: number }
  | { readonly kind: 'fault'; readonly code: string; readonly message: string };

const PLAIN = /^[+-]?(?:\d+(?:\.\d*)?|\.\d+)(?:[eE][+-]?\d+)?$/;
const NONZERO_MANTISSA = /^[^eE]*[1-9]/;
const COMMA = /^[+-]?[\d.' ]*\d,[\d.,]*$/;
const NUMBER_THEN_UNIT = /^[+-]?(?:\d+(?:\.\d*)?|\.\d+)\s*(?:[\p{L}"'°µΩ%][^\d]*)$/u;
/** U+2010 to U+2015 and U+2212: dashes and the mathematical minus, as word processors write them. */
const DASHED_MINUS = /^[\u2010-\u2015\u2212]\s*[\d.]/;

/** Longest text worth reading as a number, characters. Reason: doubles need 25, padded exports some more. */
const LONGEST_NUMBER = 100;
const EXPECTED = 'expected a plain decimal number such as 12.5';

function fault(code: string, message: string): NumberReading {
  return { kind: 'fault', code, message };
}

/**
 * Reads a number as tables write it: digits with an optional decimal point, sign and exponent.
 * @param text the cell without spaces around it
 * @returns the number (never −0, never infinite), or what is wrong with the text, with the text shown
 */
export function readNumber(text: string): NumberReading {
  if (text === '') return fault('number-empty', `the cell is empty; ${EXPECTED}`);
  if (text.length > LONGEST_NUMBER)
    return fault('number-text', `${shown(text)} is not a number; ${EXPECTED}`);
  if (PLAIN.test(text)) {
    const value = Number(text);
    if (!Number.isFinite(value)) {
      return fault('number-range', `${shown(text)} is larger than a number can be`);
    }
    if (value === 0 && NONZERO_MANTISSA.test(text)) {
      return fault('number-range', `${shown(text)} is smaller than a number can be; write 0 if it is none`);
    }
    return { kind: 'number', value: value + 0 };
  }
  if (text.startsWith('=')) {
    return fault('number-formula', `${shown(text)} is a formula; expected its value, a plain number`);
  }
  if (COMMA.test(text)) {
    const expected = 'expected a decimal point, as in 1.5, and no thousands separator';
    return fault('number-comma', `${shown(text)} has a comma; ${expected}`);
  }
  if (DASHED_MINUS.test(text)) {
    return fault(
      'number-dash',
      `${shown(text)} begins with a dash; expected the hyphen of the keyboard as minus sign`,
    );
  }
  if (NUMBER_THEN_UNIT.test(text)) {
    return fault('number-unit', `${shown(text)} has text after the number; expected the number alone`);
  }
  return fault('number-text', `${shown(text)} is not a number; ${EXPECTED}`);
}
