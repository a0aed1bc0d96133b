// Units as people type them: every spelling to what it measures and how many SI units it is.
import { type Unit, unitsOf } from '@ohmstead/study';

/** What a unit measures. The last three are recognised only to say that they are not asked for. */
export type Dimension =
  | 'length'
  | 'resistivity'
  | 'resistance'
  | 'resistance-per-length'
  | 'current'
  | 'time'
  | 'voltage'
  | 'frequency'
  | 'share'
  | 'mass'
  | 'section'
  | 'gauge'
  | 'periods';

export interface TypedUnit {
  readonly dimension: Dimension;
  /** as it is shown */
  readonly symbol: string;
  /** one of the unit is numerator/denominator of the SI unit */
  readonly numerator: number;
  readonly denominator: number;
}

/** A unit of measure as a noun phrase. */
export function dimensionWords(dimension: Dimension): string {
  switch (dimension) {
    case 'length':
    case 'resistivity':
    case 'resistance':
    case 'current':
    case 'time':
    case 'voltage':
    case 'frequency':
    case 'mass':
      return `a ${dimension}`;
    case 'resistance-per-length':
      return 'a resistance per length';
    case 'share':
      return 'a share';
    case 'section':
      return 'a cross-section';
    case 'gauge':
      return 'a wire gauge';
    case 'periods':
      return 'a count of periods';
  }
}

type Row = readonly [symbol: string, numerator: number, denominator: number, ...others: readonly string[]];

const rows: readonly (readonly [Dimension, readonly Row[]])[] = [
  [
    'length',
    [
      ['m', 1, 1],
      ['dm', 1, 10],
      ['cm', 1, 100],
      ['mm', 1, 1000],
      ['μm', 1, 1_000_000, 'um'],
      ['km', 1000, 1],
    ],
  ],
  [
    'resistivity',
    [
      ['Ωm', 1, 1],
      ['mΩm', 1, 1000],
      ['MΩm', 1_000_000, 1],
    ],
  ],
  [
    'resistance',
    [
      ['μΩ', 1, 1_000_000],
      ['MΩ', 1_000_000, 1],
    ],
  ],
  [
    'current',
    [
      ['A', 1, 1, 'amp', 'amps', 'ampere', 'amperes'],
      ['kA', 1000, 1],
      ['MA', 1_000_000, 1],
      ['mA', 1, 1000],
    ],
  ],
  [
    'time',
    [
      ['s', 1, 1, 'sec', 'second', 'seconds'],
      ['ms', 1, 1000, 'msec'],
      ['min', 60, 1],
    ],
  ],
  [
    'voltage',
    [
      ['V', 1, 1, 'volt', 'volts'],
      ['kV', 1000, 1],
      ['MV', 1_000_000, 1],
      ['mV', 1, 1000],
    ],
  ],
  [
    'frequency',
    [
      ['Hz', 1, 1, 'hertz'],
      ['kHz', 1000, 1],
    ],
  ],
  ['share', [['%', 1, 100, 'percent', 'per·cent', 'pc']]],
  // pound: international avoirdupois pound, 1959; NIST SP 811:2008, appendix B (from memory)
  [
    'mass',
    [
      ['kg', 1, 1],
      ['g', 1, 1000],
      ['lb', 45_359_237, 100_000_000, 'lbs'],
    ],
  ],
  [
    'section',
    [
      ['mm²', 1, 1_000_000, 'mm2', 'mm^2', 'sqmm'],
      ['cm²', 1, 10_000, 'cm2', 'cm^2'],
    ],
  ],
  [
    'gauge',
    [
      ['AWG', 1, 1, '/0·AWG', '/0AWG'],
      ['kcmil', 1, 1, 'MCM'],
    ],
  ],
  ['periods', [['cycles', 1, 1, 'cycle', 'periods', 'period']]],
];

/** Spellings of units that column names know too, by the name that columns give them. */
const columnSpellings: ReadonlyMap<string, readonly [symbol: string, ...others: readonly string[]]> = new Map(
  [
    ['in', ['in', 'inch', 'inches', '"', "''"]],
    ['ft', ['ft', 'foot', 'feet', "'"]],
    ['yd', ['yd', 'yard', 'yards']],
    ['us_ft', ['US ft', 'us·ft', 'us·survey·ft', 'us·survey·foot', 'ftUS']],
    ['ohm_cm', ['Ωcm']],
    ['ohm_ft', ['Ωft']],
    ['kohm_m', ['kΩm']],
    ['kohm_cm', ['kΩcm']],
    ['ohm', ['Ω']],
    ['milliohm', ['mΩ']],
    ['kohm', ['kΩ']],
    ['ohm_per_m', ['Ω/m']],
    ['ohm_per_km', ['Ω/km']],
    ['milliohm_per_m', ['mΩ/m']],
    ['microohm_per_m', ['μΩ/m']],
    ['ohm_per_ft', ['Ω/ft']],
    ['ohm_per_kft', ['Ω/kft']],
    ['ohm_per_mi', ['Ω/mi']],
  ],
);

const COLUMN_DIMENSIONS = ['length', 'resistivity', 'resistance', 'resistance-per-length'] as const;

function shownSymbol(spelling: string): string {
  return spelling.replace(/Ω(m|cm|ft)$/, 'Ω·$1');
}

const exact = new Map<string, TypedUnit>();
const anyCase = new Map<string, TypedUnit>();

function add(spellings: readonly string[], unit: TypedUnit): void {
  for (const spelling of spellings) {
    exact.set(spelling, unit);
    const lower = spelling.toLowerCase();
    if (!anyCase.has(lower)) anyCase.set(lower, unit);
  }
}

for (const [dimension, units] of rows) {
  for (const [symbol, numerator, denominator, ...others] of units) {
    add([symbol, ...others], { dimension, symbol: shownSymbol(symbol), numerator, denominator });
  }
}
for (const dimension of COLUMN_DIMENSIONS) {
  for (const [name, { numerator, denominator }] of unitsOf(dimension)) {
    const spellings = columnSpellings.get(name);
    if (spellings === undefined) continue;
    add(spellings, { dimension, symbol: shownSymbol(spellings[0]), numerator, denominator });
  }
}

/** One spelling for all: signs that look alike made one, words made symbols, no sign between Ω and its length. */
function plain(text: string): string {
  return text
    .trim()
    .replaceAll('\u2126', 'Ω')
    .replaceAll('\u00b5', 'μ')
    .replace(/[\u2032\u2018\u2019]/g, "'")
    .replace(/[\u2033\u201c\u201d]/g, '"')
    .replace(/\.$/, '')
    .replace(/[\s_.\-*×·⋅\u2010\u2011\u2012\u2013\u2212]+/g, '·')
    .replace(/milli·?ohms?/i, 'mΩ')
    .replace(/micro·?ohms?/i, 'μΩ')
    .replace(/kil+o?·?ohms?|kohms?/i, 'kΩ')
    .replace(/mega?·?ohms?/i, 'MΩ')
    .replace(/ohm(?:s\b)?/i, 'Ω')
    .replace(/met(?:re|er)s?$/i, 'm')
    .replace(/·per·/i, '/')
    .replace(/Ωs?·(?=[a-z])/i, 'Ω')
    .replace(/^\((.*)\)$/, '$1');
}

/**
 * The unit that a text names.
 * @param text a unit alone, in any usual spelling: `kΩ·m`, `ohm-m`, `ohm_m`, `inches`, `"`
 * @returns undefined where it names none; the case of letters counts only where it tells units apart (mΩ, MΩ)
 */
export function typedUnit(text: string): TypedUnit | undefined {
  const spelling = plain(text);
  return exact.get(spelling) ?? anyCase.get(spelling.toLowerCase());
}

/** A value in SI units. */
export function inSi(
  value: number,
  { numerator, denominator }: Pick<Unit, 'numerator' | 'denominator'>,
): number {
  return (value * numerator) / denominator;
}
