// What kind of quantity a place of study.json holds, from the unit in its key.
import type { JsonPath } from './path.ts';
import type { QuantityKind } from './quantity.ts';

const kindOfKey: ReadonlyMap<string, QuantityKind> = new Map([
  ['resistivity_ohm_m', 'resistivity'],
  ['thickness_m', 'length'],
  ['depth_m', 'length'],
  ['x_m', 'coordinate'],
  ['y_m', 'coordinate'],
  ['fault_current_A', 'current'],
  ['grid_current_A', 'current'],
  ['division_factor', 'ratio'],
  ['x_over_r', 'ratio'],
  ['frequency_hz', 'frequency'],
  ['duration_s', 'duration'],
  ['body_mass_kg', 'mass'],
]);

/**
 * The kind of quantity at a place.
 * @returns undefined for texts, choices, lists and objects
 */
export function kindOfPath(path: JsonPath): QuantityKind | undefined {
  const last = path.at(-1);
  // corners of areas are the only numbers without a key
  if (typeof last === 'number') return path.includes('areas') ? 'coordinate' : undefined;
  if (last === 'thickness_m' && path[0] === 'surfacing') return 'thickness';
  return last === undefined ? undefined : kindOfKey.get(last);
}
