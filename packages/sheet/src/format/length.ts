// Lengths in the units displayed: metres and millimetres, or feet and inches; the numbers behind them stay metres.
import type { DisplayUnits } from '@ohmstead/study';
import { fixed, given, NO_BREAK_SPACE, THIN_SPACE } from './number.ts';

/** A unit of length: its sign, the word for an axis, and the metres it is. */
export interface LengthUnit {
  readonly sign: string;
  readonly words: string;
  readonly metres: number;
}

const METRE: LengthUnit = { sign: 'm', words: 'metres', metres: 1 };
const MILLIMETRE: LengthUnit = { sign: 'mm', words: 'millimetres', metres: 0.001 };
/** International foot and inch, exact: NIST SP 811:2008, appendix B (from memory). */
const FOOT: LengthUnit = { sign: 'ft', words: 'feet', metres: 0.3048 };
const INCH: LengthUnit = { sign: 'in', words: 'inches', metres: 0.0254 };

/** Decimals of a given length that a change of unit brings: a thousandth of a foot is 0.3 mm, finer than any drawing. */
const CONVERTED_DECIMALS = 3;

/** Unit of distances, depths and coordinates. */
export function lengthUnit(units: DisplayUnits): LengthUnit {
  return units === 'US' ? FOOT : METRE;
}

/** Unit of diameters and gaps. */
export function smallUnit(units: DisplayUnits): LengthUnit {
  return units === 'US' ? INCH : MILLIMETRE;
}

/** Unit of the thickness of a covering. */
export function coveringUnit(units: DisplayUnits): LengthUnit {
  return units === 'US' ? INCH : METRE;
}

/** A length in a unit as a bare number, no digit added or taken in SI. */
export function givenIn(metres: number, unit: LengthUnit): string {
  if (unit === METRE) return given(metres);
  if (unit === MILLIMETRE) return given(metres * 1000);
  return given(Number((metres / unit.metres).toFixed(CONVERTED_DECIMALS)));
}

/** The same with its sign: `2.4 m`, `7.874 ft`. */
export function givenWith(metres: number, unit: LengthUnit): string {
  return `${givenIn(metres, unit)}${THIN_SPACE}${unit.sign}`;
}

/** Distance, depth or thickness of soil as it was given. */
export function givenLength(metres: number, units: DisplayUnits): string {
  return givenWith(metres, lengthUnit(units));
}

/** A computed length in the unit of distances with so many decimals. */
export function fixedLength(metres: number, decimals: number, units: DisplayUnits): string {
  return fixed(metres / lengthUnit(units).metres, decimals);
}

/** A place on the surface: `(24.0, 33.5) m`. */
export function place(x: number, y: number, units: DisplayUnits = 'SI'): string {
  return pair(fixedLength(x, 1, units), fixedLength(y, 1, units), units);
}

/** A place as it was given: `(24, 18) m`. */
export function givenPlace(x: number, y: number, units: DisplayUnits): string {
  const unit = lengthUnit(units);
  return pair(givenIn(x, unit), givenIn(y, unit), units);
}

/** Never broken across lines. */
function pair(x: string, y: string, units: DisplayUnits): string {
  return `(${x},${NO_BREAK_SPACE}${y})${THIN_SPACE}${lengthUnit(units).sign}`;
}
