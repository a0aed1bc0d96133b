// Numbers as a terminal shows them: those of the sheet, with plain signs and blanks that copy well.
import * as sheet from '@ohmstead/sheet';

/** Thin blanks group digits and stand before units; no-break blanks keep pairs together. */
function plain(text: string): string {
  return text
    .replace(/(?<=\d)\u202f(?=\d)/g, '')
    .replace(/[\u202f\u00a0]/g, ' ')
    .replace(/\u2212/g, '-');
}

/** A number without an uncertainty of its own, and its unit. */
export function quantity(value: number, unit: string, digits?: number): string {
  return plain(sheet.quantity(value, unit, digits));
}

/** Digits of what is fitted to readings: more than they tell. */
const FITTED_DIGITS = 3;

/** A number that readings were fitted with, and its unit. */
export function fitted(value: number, unit: string): string {
  return quantity(Number(value.toPrecision(FITTED_DIGITS)), unit, FITTED_DIGITS);
}

/** A range of fitted values: 98.8 to 185 Ω·m. */
export function range({ low, high }: { readonly low: number; readonly high: number }, unit: string): string {
  const [from, to] = [low, high].map((value) => fitted(value, unit));
  const same = from.slice(from.lastIndexOf(' ')) === to.slice(to.lastIndexOf(' '));
  return `${same ? from.slice(0, from.lastIndexOf(' ')) : from} to ${to}`;
}

/** A result and its uncertainty at one common place: 975 ± 4 V. */
export function measured(value: number, uncertainty: number, unit: string): string {
  return plain(sheet.measured(value, uncertainty, unit));
}

/** A share as per cent. */
export function percent(share: number): string {
  return plain(sheet.percent(share));
}

/** A place on the surface. */
export function place(x: number, y: number): string {
  return plain(sheet.place(x, y));
}

/** A small number by its order of size: 3e-13. */
export function order(value: number): string {
  return value === 0 ? '0' : value.toExponential(0);
}
