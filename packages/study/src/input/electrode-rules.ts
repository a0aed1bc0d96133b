// Electrodes named in study.json against those that the conductors belong to.
import type { Fault } from '../fault.ts';
import { items, type JsonDocument, member, placeOf } from './json-value.ts';
import { nearestName } from './nearest-name.ts';
import { listed, quoted } from './shown-value.ts';

/** Names listed in a message at most. */
const MOST_NAMES = 8;

/**
 * Judges the list of electrodes.
 * @param file name of study.json for the faults
 * @param document study.json, faulty or not
 * @param used electrodes of all conductors, each once
 * @returns faults for names without conductors, and where no electrode is energised
 */
export function electrodeFaults(
  file: string,
  document: JsonDocument,
  used: readonly string[],
): readonly Fault[] {
  const faults: Fault[] = [];
  const floating = new Set<string>();
  const known = listed(used.slice(0, MOST_NAMES).map((name) => quoted(name)));
  items(document.value, 'electrodes').forEach((electrode, i) => {
    const name = member(electrode, 'name');
    if (typeof name !== 'string') return;
    if (member(electrode, 'role') === 'floating') floating.add(name);
    if (used.includes(name)) return;
    const near = nearestName(name, used);
    const hint = near === undefined ? `conductors belong to ${known}` : `${quoted(near)} is probably meant`;
    const place = placeOf(placeOf('electrodes', i), 'name');
    const line = document.lines.get(place);
    const message = `no conductor belongs to the electrode ${quoted(name)}; ${hint}`;
    faults.push({ file, ...(line === undefined ? {} : { line }), place, code: 'electrode-empty', message });
  });
  if (used.length > 0 && used.every((name) => floating.has(name))) {
    const line = document.lines.get('electrodes');
    const message = `no electrode is energised: ${known} ${used.length === 1 ? 'is' : 'are all'} floating`;
    const place = 'electrodes';
    faults.push({ file, ...(line === undefined ? {} : { line }), place, code: 'nothing-energised', message });
  }
  return faults;
}
