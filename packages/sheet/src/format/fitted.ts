// Writes what field readings tell: no more digits than readings carry, and ranges that are never taken for an uncertainty.
import type { Spread } from '@ohmstead/study';
import { fixed, given, MINUS, scaled, significant, THIN_SPACE } from './number.ts';

/** Digits of what is fitted to readings: already more than a few per cent of scatter leave meaning to. */
const FITTED_DIGITS = 3;

/** A number fitted to readings: three significant digits. */
export function fitted(value: number): string {
  return significant(value, FITTED_DIGITS);
}

/** A fitted quantity and its unit; volts and amperes in thousands from 10 000 on. */
export function fittedQuantity(value: number, unit: string): string {
  const [divisor, name] = scaled(value, unit);
  return `${fitted(value / divisor)}${THIN_SPACE}${name}`;
}

/** Both ends of a range, `178–231`; one number where they are shown alike. */
function ends(low: number, high: number): string {
  const [from, to] = [fitted(low), fitted(high)];
  return from === to ? from : `${from}–${to}`;
}

/** What the middle nine tenths of the soils give, without a unit: `178–231`. */
export function band({ low, high }: Pick<Spread, 'low' | 'high'>): string {
  return ends(low, high);
}

/** The same with its unit, both ends in one: `178–231 Ω·m`, `8.21–12.4 kV`. */
export function bandQuantity({ low, high }: Pick<Spread, 'low' | 'high'>, unit: string): string {
  const [divisor, name] = scaled(high, unit);
  return `${ends(low / divisor, high / divisor)}${THIN_SPACE}${name}`;
}

/** Whether the best fit lies outside the middle nine tenths of the soils. */
export function outsideBand({ best, low, high }: Spread): boolean {
  return best < low || best > high;
}

/** A distance or depth as a field sheet has it, without digits that a change of unit adds. */
export function surveyed(value: number): string {
  return given(Number(value.toPrecision(FITTED_DIGITS + 1)));
}

/** A quantity of a soil that was partly fitted and partly given: short, and nothing added to what was given. */
export function shortQuantity(value: number, unit: string): string {
  return `${given(Number(value.toPrecision(FITTED_DIGITS)))}${THIN_SPACE}${unit}`;
}

/** How far the model stands off a reading, signed per cent with one decimal: `+3.1`, `−11.1`. */
export function misfitPercent(value: number): string {
  const text = fixed(Math.abs(value), 1);
  if (Number(text) === 0 || !Number.isFinite(value)) return text;
  return `${value < 0 ? MINUS : '+'}${text}`;
}
