// Writes an input with its unit, as it was given, in the units displayed.
import type { DisplayUnits } from '@ohmstead/study';
import type { QuantityKind } from '../desk/desk.ts';
import { coveringUnit, givenLength, givenWith } from './length.ts';
import { given, givenQuantity } from './number.ts';

/**
 * An input as the sheet shows it: `220 Ω·m`, `2.4 m` or `7.874 ft`, `6 300 A`.
 * @param value in SI
 */
export function quantityText(kind: QuantityKind, value: number, units: DisplayUnits): string {
  switch (kind) {
    case 'resistivity':
      return givenQuantity(value, 'Ω·m');
    case 'length':
    case 'coordinate':
      return givenLength(value, units);
    case 'thickness':
      return givenWith(value, coveringUnit(units));
    case 'current':
      return givenQuantity(value, 'A');
    case 'duration':
      return givenQuantity(value, 's');
    case 'frequency':
      return givenQuantity(value, 'Hz');
    case 'ratio':
      return given(value);
  }
}
