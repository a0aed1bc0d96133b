// Units in column names: which there are and what they are in SI.

/** A unit as an exact fraction, so that 12 mm and 0.012 m become the same number. */
export interface Unit {
  /** as column names write it */
  readonly name: string;
  /** for people */
  readonly label: string;
  /** one of the unit is numerator/denominator of the SI unit */
  readonly numerator: number;
  readonly denominator: number;
}

export type UnitKind = 'length' | 'resistance-per-length' | 'resistivity' | 'resistance';

type Row = readonly [name: string, label: string, numerator: number, denominator: number];

function byName(rows: readonly Row[]): ReadonlyMap<string, Unit> {
  return new Map(
    rows.map(([name, label, numerator, denominator]) => [name, { name, label, numerator, denominator }]),
  );
}

// Foot, inch and yard: international yard, 1959; US survey foot: 1200/3937 m; both in NIST SP 811:2008,
// appendix B (from memory).
const lengthUnits = byName([
  ['m', 'metre', 1, 1],
  ['dm', 'decimetre', 1, 10],
  ['cm', 'centimetre', 1, 100],
  ['mm', 'millimetre', 1, 1000],
  ['km', 'kilometre', 1000, 1],
  ['in', 'inch', 254, 10_000],
  ['ft', 'international foot', 3048, 10_000],
  ['yd', 'yard', 9144, 10_000],
  ['us_ft', 'US survey foot', 1200, 3937],
]);

const resistancePerLengthUnits = byName([
  ['ohm_per_m', 'ohm per metre', 1, 1],
  ['ohm_per_km', 'ohm per kilometre', 1, 1000],
  ['milliohm_per_m', 'milliohm per metre', 1, 1000],
  ['microohm_per_m', 'microohm per metre', 1, 1_000_000],
  ['ohm_per_ft', 'ohm per foot', 10_000, 3048],
  ['ohm_per_kft', 'ohm per thousand feet', 10, 3048],
  ['ohm_per_mi', 'ohm per mile of 5280 ft', 1000, 1_609_344],
]);

const resistivityUnits = byName([
  ['ohm_m', 'ohm metre', 1, 1],
  ['ohm_cm', 'ohm centimetre', 1, 100],
  ['ohm_ft', 'ohm foot', 3048, 10_000],
  ['kohm_m', 'kilohm metre', 1000, 1],
  ['kohm_cm', 'kilohm centimetre', 10, 1],
]);

const resistanceUnits = byName([
  ['ohm', 'ohm', 1, 1],
  ['milliohm', 'milliohm', 1, 1000],
  ['kohm', 'kilohm', 1000, 1],
]);

/** Units of a kind by the name that columns give them. */
export function unitsOf(kind: UnitKind): ReadonlyMap<string, Unit> {
  switch (kind) {
    case 'length':
      return lengthUnits;
    case 'resistance-per-length':
      return resistancePerLengthUnits;
    case 'resistivity':
      return resistivityUnits;
    case 'resistance':
      return resistanceUnits;
  }
}

/** A value in SI units: value·numerator/denominator: metres, Ω/m, Ω·m or Ω. */
export function toSi(value: number, unit: Unit): number {
  return (value * unit.numerator) / unit.denominator;
}
