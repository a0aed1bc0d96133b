// A number at the beginning of a text as people type it: fractions, grouped digits, decimal point or comma.
import { shown } from '@ohmstead/study';

export type NumberStart =
  | { readonly kind: 'number'; readonly value: number; readonly rest: string }
  | { readonly kind: 'complaint'; readonly message: string };

/** Which of the two marks divides whole from part in a text of which that is known, e.g. a pasted table. */
export type DecimalMark = '.' | ',';

const FRACTION = /^(?:(\d+)\s+)?(\d+)\s*\/\s*(0*[1-9]\d*)/;
/** Groups of three divided by spaces of any kind, or digits with marks between them. */
const DIGITS = /^(?:\d{1,3}(?:[ \u00a0\u2009\u202f]\d{3})+(?!\d)(?:[.,]\d+)?|\d[\d.,]*|[.,]\d+)/;
const EXPONENT = /^[eE][+\-\u2212]?\d+/;
const SPACES = /[ \u00a0\u2009\u202f]/g;

function grouped(text: string, mark: DecimalMark): boolean {
  return new RegExp(`^\\d{1,3}(?:\\${mark}\\d{3})+$`).test(text);
}

/** Whether a text such as 1,500 may mean both 1.5 and 1500. */
export function isAmbiguous(text: string): boolean {
  return /^[1-9]\d{0,2},\d{3}$/.test(text);
}

/**
 * Digits with their decimal mark made a point and their groups closed; undefined where the marks make no sense.
 */
function plainDigits(text: string, decimal: DecimalMark | undefined): string | undefined {
  const last = Math.max(text.lastIndexOf('.'), text.lastIndexOf(','));
  if (last < 0) return text;
  const mark = text[last] === ',' ? ',' : '.';
  const other = mark === ',' ? '.' : ',';
  const whole = text.slice(0, last);
  // a mark that stands several times, or is not the decimal one, groups digits
  if (whole.includes(mark) || (decimal !== undefined && mark !== decimal)) {
    return grouped(text, mark) ? text.replaceAll(mark, '') : undefined;
  }
  if (whole.includes(other) && !grouped(whole, other)) return undefined;
  return `${whole.replaceAll(other, '')}.${text.slice(last + 1)}`;
}

/**
 * Reads the number that a text begins with.
 * @param text without sign and without spaces around it
 * @param decimal the decimal mark where it is known; else a comma is one unless it may as well group digits
 * @returns the number and what follows it, or what is wrong with it
 */
export function numberStart(text: string, decimal?: DecimalMark): NumberStart {
  const fraction = FRACTION.exec(text);
  if (fraction !== null) {
    const [all, whole = '0', above = '0', below = '1'] = fraction;
    const value = Number(whole) + Number(above) / Number(below);
    return { kind: 'number', value, rest: text.slice(all.length) };
  }
  const digits = DIGITS.exec(text)?.[0];
  if (digits === undefined) return { kind: 'complaint', message: `${shown(text)} is not a number` };
  if (decimal === undefined && isAmbiguous(digits)) {
    const [whole, part] = digits.split(',');
    const both = `${Number(`${whole}.${part}`)} or ${whole}${part}`;
    return { kind: 'complaint', message: `${shown(digits)} may mean ${both}; write one of them` };
  }
  const plain = plainDigits(digits.replace(SPACES, ''), decimal);
  if (plain === undefined) {
    return { kind: 'complaint', message: `${shown(digits)} has marks that divide it in no known way` };
  }
  const after = text.slice(digits.length);
  const exponent = EXPONENT.exec(after)?.[0] ?? '';
  const value = Number(`${plain}${exponent.replace('\u2212', '-')}`);
  if (!Number.isFinite(value))
    return { kind: 'complaint', message: `${shown(text)} is larger than a number can be` };
  if (value === 0 && /[1-9]/.test(plain))
    return { kind: 'complaint', message: `${shown(text)} is smaller than a number can be` };
  return { kind: 'number', value, rest: after.slice(exponent.length) };
}
