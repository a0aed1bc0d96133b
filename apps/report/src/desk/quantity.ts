// Quantities as they are typed, with or without a unit, to values in SI units; what is wrong is told in words.
import { type DisplayUnits, quoted } from '@ohmstead/study';
import { type DecimalMark, numberStart } from './typed-number.ts';
import { type Dimension, dimensionWords, inSi, type TypedUnit, typedUnit } from './unit-names.ts';

export type QuantityKind =
  /** thickness or depth in soil, length of a rod: m or ft */
  | 'length'
  /** thickness of a covering: m or in */
  | 'thickness'
  /** place in plan, may be negative: m or ft */
  | 'coordinate'
  /** of metal: m as a value, mm or in as typed */
  | 'diameter'
  | 'resistivity'
  | 'resistance'
  | 'resistance-per-length'
  | 'current'
  | 'duration'
  | 'voltage'
  | 'frequency'
  /** 1 as a value; 60 % is 0.6 */
  | 'ratio'
  /** per cent as a value; 60 and 60 % are 60 */
  | 'percent'
  | 'mass';

/** A quantity as read, in the SI unit of its kind, or why the text is none. */
export type Reading = { readonly value: number } | { readonly complaint: string };

export interface ReadingOptions {
  /** units of numbers without one: metres (diameters: mm) or feet (thicknesses and diameters: in) */
  readonly units: DisplayUnits;
  /** unit of numbers without one, where a table tells it */
  readonly unit?: TypedUnit | undefined;
  /** decimal mark, where a table tells it */
  readonly decimal?: DecimalMark | undefined;
}

/** What is known of a kind: its dimension, how it is called and typed, its units in either system. */
interface Kind {
  readonly dimension: Dimension;
  readonly words: string;
  readonly example: string;
  readonly si: string;
  readonly us: string;
  readonly negative?: true;
}

export const kinds: Readonly<Record<QuantityKind, Kind>> = {
  length: { dimension: 'length', words: 'a length', example: '0.6 m or 2 ft', si: 'm', us: 'ft' },
  thickness: { dimension: 'length', words: 'a thickness', example: '0.1 m or 4 in', si: 'm', us: 'in' },
  coordinate: {
    dimension: 'length',
    words: 'a coordinate',
    example: '12.5 m or 41 ft',
    si: 'm',
    us: 'ft',
    negative: true,
  },
  diameter: { dimension: 'length', words: 'a diameter', example: '12 mm or 0.5 in', si: 'mm', us: 'in' },
  resistivity: { dimension: 'resistivity', words: 'a resistivity', example: '120 Ω·m', si: 'Ω·m', us: 'Ω·m' },
  resistance: { dimension: 'resistance', words: 'a resistance', example: '2.7 Ω', si: 'Ω', us: 'Ω' },
  'resistance-per-length': {
    dimension: 'resistance-per-length',
    words: 'a resistance per length',
    example: '0.0002 Ω/m or 0.2 Ω/km',
    si: 'Ω/m',
    us: 'Ω/m',
  },
  current: { dimension: 'current', words: 'a current', example: '3200 A or 3.2 kA', si: 'A', us: 'A' },
  duration: { dimension: 'time', words: 'a time', example: '0.5 s or 500 ms', si: 's', us: 's' },
  voltage: { dimension: 'voltage', words: 'a voltage', example: '980 V or 1.2 kV', si: 'V', us: 'V' },
  frequency: { dimension: 'frequency', words: 'a frequency', example: '50 Hz', si: 'Hz', us: 'Hz' },
  ratio: { dimension: 'share', words: 'a number', example: '0.6 or 60 %', si: '', us: '' },
  percent: { dimension: 'share', words: 'a percentage', example: '60 %', si: '%', us: '%' },
  mass: { dimension: 'mass', words: 'a mass', example: '70 kg', si: 'kg', us: 'kg' },
};

/** Lengths are kept to the nanometre. Reason: 1.968503937 ft becomes 0.6 m again; nothing in the ground is finer. */
const LENGTH_DECIMALS = 9;
/** Length from which on a double is coarser than these decimals, and digits count instead, m. */
const LARGE_LENGTH_M = 1e6;
/** Digits kept of large lengths and of percentages. Reason: what every double can hold. */
const SURE_DIGITS = 15;
/** Signs as keyboards and word processors write them. */
const SIGN = /^[+\-\u2212\u2013]/;

/** The unit in which a kind is typed and shown. */
export function usualUnit(kind: QuantityKind, units: DisplayUnits): TypedUnit {
  const { si, us, dimension } = kinds[kind];
  if (kind === 'ratio') return { dimension, symbol: '', numerator: 1, denominator: 1 };
  const unit = typedUnit(units === 'US' ? us : si);
  if (unit === undefined) throw new Error(`no unit of ${kind}`);
  return unit;
}

/** One number with the unit after it; `unit` is the usual one where none is typed. */
type Part =
  | { readonly value: number; readonly unit: TypedUnit; readonly typed: boolean; readonly rest: string }
  | { readonly complaint: string };

/** The first part of a text without sign. What follows a unit of length, as in 3 ft 6 in, is the rest. */
function firstPart(text: string, kind: QuantityKind, options: ReadingOptions): Part {
  const start = numberStart(text, options.decimal);
  if (start.kind === 'complaint') return { complaint: start.message };
  const { value } = start;
  const after = start.rest.trim();
  if (after === '')
    return { value, unit: options.unit ?? usualUnit(kind, options.units), typed: false, rest: '' };
  const whole = typedUnit(after);
  if (whole !== undefined) return { value, unit: whole, typed: true, rest: '' };
  const [, name = after, rest = ''] = /^(\D+?)\s*(\d.*)$/.exec(after) ?? [];
  const unit = typedUnit(name);
  if (unit === undefined) return { complaint: `${quoted(name)} is not a unit known here` };
  return { value, unit, typed: true, rest };
}

/** A number with its unit, or a length in parts, each smaller than the one before it. */
function unsigned(text: string, kind: QuantityKind, options: ReadingOptions): Reading {
  const { dimension } = kinds[kind];
  let total = 0;
  let last: TypedUnit | undefined;
  for (let rest = text; rest !== ''; ) {
    const part = firstPart(rest, kind, options);
    if ('complaint' in part) return part;
    const { value, unit } = part;
    if (unit.dimension !== dimension) {
      return { complaint: `${unit.symbol} is ${dimensionWords(unit.dimension)}` };
    }
    const fits = last === undefined || (part.typed && inSi(1, unit) < inSi(1, last));
    if (!fits || (part.rest !== '' && dimension !== 'length')) {
      return { complaint: `${quoted(text)} is more than one number` };
    }
    total += inSi(value, unit);
    last = unit;
    rest = part.rest;
  }
  return { value: total };
}

/**
 * Reads a quantity.
 * @param kind what is asked for
 * @param text as typed: `0.6`, `4 in`, `1.2 kΩ·m`, `3 ft 6 in`, `5/8 in`, `0,5 s`
 * @param options the units displayed; unit and decimal mark of a table
 * @returns the value in SI (per cent for `percent`), or a complaint that says what stands there and what was expected;
 * ranges are judged when the study is loaded
 */
export function readQuantity(
  kind: QuantityKind,
  text: string,
  options: ReadingOptions = { units: 'SI' },
): Reading {
  const trimmed = text.trim();
  const told = (complaint: string): Reading => {
    const { words, example } = kinds[kind];
    return { complaint: `${complaint}; expected ${words} such as ${example}` };
  };
  if (trimmed === '') return told('nothing is given');
  const sign = SIGN.exec(trimmed)?.[0] ?? '';
  const bare = trimmed.slice(sign.length).trim();
  const reading =
    bare === '' ? { complaint: `${quoted(trimmed)} is not a number` } : unsigned(bare, kind, options);
  if ('complaint' in reading) return told(reading.complaint);
  const negative = sign !== '' && sign !== '+' && reading.value !== 0;
  if (negative && kinds[kind].negative !== true) return told(`${quoted(trimmed)} is negative`);
  const value = rounded(reading.value, kind);
  return { value: negative ? -value : value };
}

/** Lengths to the nanometre; per cent by hundred, free of the dust of the division. */
function rounded(value: number, kind: QuantityKind): number {
  if (kind === 'percent') return Number((value * 100).toPrecision(SURE_DIGITS));
  if (kinds[kind].dimension !== 'length') return value;
  return Number(value < LARGE_LENGTH_M ? value.toFixed(LENGTH_DECIMALS) : value.toPrecision(SURE_DIGITS));
}
