// Quantities as they are shown for editing: in the units displayed, with digits that read back to the same value.
import type { DisplayUnits } from '@ohmstead/study';
import { kinds, type QuantityKind, readQuantity, usualUnit } from './quantity.ts';
import { inSi, type TypedUnit, typedUnit } from './unit-names.ts';

const NARROW_SPACE = '\u202f';
const MINUS = '\u2212';
/** From this value on, amperes and volts are written as kA and kV, as in the sheet. */
const KILO_FROM = 10_000;
/** Digits that tell every double apart. */
const MOST_DIGITS = 17;

/** Plain decimal digits of a number, never with an exponent, thousands grouped by narrow spaces. */
function digitsText(value: number): string {
  const text = Math.abs(value).toString();
  if (text.includes('e')) return `${value < 0 ? '-' : ''}${text}`;
  const [whole = '', part] = text.split('.');
  const grouped = whole.replace(/\B(?=(\d{3})+$)/g, NARROW_SPACE);
  return `${value < 0 ? MINUS : ''}${grouped}${part === undefined ? '' : `.${part}`}`;
}

function unitFor(kind: QuantityKind, value: number, units: DisplayUnits): TypedUnit {
  const usual = usualUnit(kind, units);
  const kilo = (kind === 'current' || kind === 'voltage') && Math.abs(value) >= KILO_FROM;
  return (kilo ? typedUnit(`k${usual.symbol}`) : undefined) ?? usual;
}

/**
 * Writes a quantity.
 * @param kind what it is
 * @param value in SI (per cent for `percent`), finite
 * @param units in which it is shown
 * @returns the fewest digits that `readQuantity` reads back as the same value, with the unit; for a length that is no
 * whole number of nanometres, as the nearest that is
 */
export function quantityText(kind: QuantityKind, value: number, units: DisplayUnits = 'SI'): string {
  const unit = unitFor(kind, value, units);
  const inUnit = kind === 'percent' ? value : value / inSi(1, unit);
  const suffix = unit.symbol === '' ? '' : `${NARROW_SPACE}${unit.symbol}`;
  const target = nearestReadable(kind, value, units);
  for (let digits = 1; digits < MOST_DIGITS; digits++) {
    const text = `${digitsText(Number(inUnit.toPrecision(digits)))}${suffix}`;
    const reading = readQuantity(kind, text, { units });
    if ('value' in reading && reading.value === target) return text;
  }
  return `${digitsText(inUnit)}${suffix}`;
}

/** The value itself, or the nanometre next to it for a length. */
function nearestReadable(kind: QuantityKind, value: number, units: DisplayUnits): number {
  if (kinds[kind].dimension !== 'length') return value;
  const reading = readQuantity('coordinate', `${value} m`, { units });
  return 'value' in reading ? reading.value : value;
}
