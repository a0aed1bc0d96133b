// Writes numbers for people: digits from the uncertainty, thin spaces, a proper minus, SI units.

export const THIN_SPACE = '\u202f';
export const NO_BREAK_SPACE = '\u00a0';
export const MINUS = '\u2212';
const SUPERSCRIPTS = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/** More digits than this are never shown, however small the stated uncertainty: nobody reads them in a sentence. */
const MOST_DIGITS = 6;
/** Places after the point beyond which nothing of a grounding study has meaning: nanovolts, nano-ohms. */
const MOST_DECIMALS = 9;
/** A result without its own uncertainty is shown with this many significant digits. */
export const RESULT_DIGITS = 4;
/** From this value on, volts and amperes are written as kV and kA, V or A. */
const KILO_FROM = 10_000;
/** What is smaller than this counts as zero when a decimal place is chosen by rounding up, share of the last place. */
const ROUND_UP_SLACK = 1e-6;

/** Exponent of the leading decimal digit; 0 for zero. */
export function exponentOf(value: number): number {
  return value === 0 ? 0 : Number(value.toExponential().split('e')[1]);
}

function grouped(digits: string): string {
  return digits.replace(/\B(?=(\d{3})+$)/g, THIN_SPACE);
}

/** Rounds to a place before the point where `decimals` is negative. */
function roundTo(value: number, decimals: number): number {
  if (decimals >= 0) return Number(value.toFixed(Math.min(decimals, 100)));
  const unit = 10 ** -decimals;
  return Math.round(value / unit) * unit;
}

/**
 * A number with a fixed count of decimals, thousands grouped by thin spaces from four digits on.
 * @param decimals places after the point; negative rounds to tens, hundreds, …
 * @returns an em dash where the value is not finite
 */
export function fixed(value: number, decimals: number): string {
  if (!Number.isFinite(value)) return '—';
  const text = Math.abs(roundTo(value, decimals)).toFixed(Math.max(0, Math.min(decimals, 100)));
  if (text.includes('e')) return powerOfTen(value);
  const [whole, part] = text.split('.');
  const sign = value < 0 && Number(text) !== 0 ? MINUS : '';
  return `${sign}${grouped(whole)}${part === undefined ? '' : `.${part}`}`;
}

/** A number with so many significant digits, e.g. 1 912 or 0.06214. */
export function significant(value: number, digits: number = RESULT_DIGITS): string {
  const rounded = Number.isFinite(value) ? Number(value.toPrecision(digits)) : value;
  return fixed(value, digits - 1 - exponentOf(rounded));
}

/** Volts that stand for a limit, a contour line or a map: whole from 10 V on, two digits below. */
export function volts(value: number): string {
  const text = Math.abs(value) >= 10 || value === 0 ? fixed(value, 0) : significant(value, 2);
  return joined(text, 'V');
}

/** A number as it was given: no digit added and none taken away up to ten. */
export function given(value: number): string {
  if (!Number.isFinite(value)) return '—';
  const short = Number(value.toPrecision(10));
  const size = Math.abs(short);
  if (size !== 0 && (size < 1e-4 || size >= 1e9)) return powerOfTen(short);
  const decimals = (String(short).split('.')[1] ?? '').length;
  return fixed(short, decimals);
}

/** A small or large number as 3·10⁻¹³, one significant digit, for orders of size. */
export function powerOfTen(value: number): string {
  if (!Number.isFinite(value)) return '—';
  if (value === 0) return '0';
  const [digit, exponent] = Math.abs(value).toExponential(0).split('e');
  const raised = [...String(Math.abs(Number(exponent)))].map((c) => SUPERSCRIPTS[Number(c)]).join('');
  return `${value < 0 ? MINUS : ''}${digit}·10${Number(exponent) < 0 ? '⁻' : ''}${raised}`;
}

/**
 * Places after the point that an uncertainty leaves meaning to: one digit of the uncertainty is kept, two where it
 * begins with 1 (then one digit would be coarse), and never more than six digits of the value.
 */
export function decimalsFor(value: number, uncertainty: number): number {
  const most = Math.min(MOST_DIGITS - 1 - exponentOf(value), MOST_DECIMALS);
  if (!(uncertainty > 0) || !Number.isFinite(uncertainty))
    return Math.min(RESULT_DIGITS - 1 - exponentOf(value), most);
  const exponent = exponentOf(uncertainty);
  const leading = uncertainty / 10 ** exponent;
  return Math.min(leading < 2 ? 1 - exponent : -exponent, most);
}

/**
 * A value and its uncertainty at one common decimal place; the uncertainty is rounded up, so that rounding never
 * narrows what is claimed. No result is exact: one of nought is rounded up to the last place shown, and one that is
 * missing is an em dash.
 */
export function valueAndUncertainty(value: number, uncertainty: number): readonly [string, string] {
  const decimals = decimalsFor(value, uncertainty);
  const unit = 10 ** -decimals;
  const up = Math.max(1, Math.ceil(uncertainty / unit - ROUND_UP_SLACK)) * unit;
  return [fixed(value, decimals), fixed(up, decimals)];
}

/** Volts and amperes of 10 000 and more are told in thousands; every other unit stays. */
export function scaled(value: number, unit: string): readonly [divisor: number, unit: string] {
  const kilo = (unit === 'V' || unit === 'A') && Math.abs(value) >= KILO_FROM;
  return kilo ? [1000, `k${unit}`] : [1, unit];
}

function joined(text: string, unit: string): string {
  return unit === '' ? text : `${text}${THIN_SPACE}${unit}`;
}

/** A computed quantity without its own uncertainty: four significant digits, but whole from 100 on, and its unit. */
export function quantity(value: number, unit: string, digits: number = RESULT_DIGITS): string {
  const [divisor, name] = scaled(value, unit);
  const told = value / divisor;
  return joined(divisor === 1 && Math.abs(told) >= 100 ? fixed(told, 0) : significant(told, digits), name);
}

/** A quantity as it was given, with its unit. */
export function givenQuantity(value: number, unit: string): string {
  const [divisor, name] = scaled(value, unit);
  return joined(given(value / divisor), name);
}

/** A result with its uncertainty: 975 ± 4 V. */
export function measured(value: number, uncertainty: number, unit: string): string {
  const [divisor, name] = scaled(value, unit);
  const [middle, band] = valueAndUncertainty(value / divisor, uncertainty / divisor);
  return joined(`${middle}${THIN_SPACE}±${THIN_SPACE}${band}`, name);
}

/** A share as per cent: whole from 10 % on, one decimal below, and never a rounded nought. */
export function percent(share: number): string {
  const value = Math.abs(share) * 100;
  if (!Number.isFinite(value)) return '—';
  const sign = share < 0 ? MINUS : '';
  if (value === 0) return `0${THIN_SPACE}%`;
  if (value < 0.05) return `less than 0.1${THIN_SPACE}%`;
  return `${sign}${fixed(value, value < 9.95 ? 1 : 0)}${THIN_SPACE}%`;
}
