// Lengths that readings tell, in the units displayed and with no more digits than readings carry.
import type { DisplayUnits, Spread } from '@ohmstead/study';
import { bandQuantity, fitted, surveyed } from './fitted.ts';
import { lengthUnit } from './length.ts';
import { THIN_SPACE } from './number.ts';

/** A fitted length: `2.31 m`, `7.58 ft`. */
export function fittedLength(metres: number, units: DisplayUnits): string {
  const { sign, metres: size } = lengthUnit(units);
  return `${fitted(metres / size)}${THIN_SPACE}${sign}`;
}

/** Both ends of a length over the soils: `1.4–1.8 m`. */
export function bandLength({ low, high }: Pick<Spread, 'low' | 'high'>, units: DisplayUnits): string {
  const { sign, metres: size } = lengthUnit(units);
  return bandQuantity({ low: low / size, high: high / size }, sign);
}

/** A distance as a field sheet has it, without its unit. */
export function surveyedNumber(metres: number, units: DisplayUnits): string {
  return surveyed(metres / lengthUnit(units).metres);
}

/** The same with its unit. */
export function surveyedLength(metres: number, units: DisplayUnits): string {
  return `${surveyedNumber(metres, units)}${THIN_SPACE}${lengthUnit(units).sign}`;
}
