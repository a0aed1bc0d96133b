// What an edit did, in words, for undo and redo: `rod R-03 moved 2 m east`.
import { type DisplayUnits, type JsonValue, listed, shown } from '@ohmstead/study';
import { type Conductor, isRod } from './conductor.ts';
import type { Shift } from './conductor-edits.ts';
import { type Draft, valueAt } from './draft.ts';
import type { JsonPath } from './path.ts';
import { pathWords, valueWords } from './path-words.ts';
import { usualUnit } from './quantity.ts';
import { quantityText } from './quantity-text.ts';
import { inSi } from './unit-names.ts';

/** Decimals of a distance in a label, m or ft. Reason: nobody tells moves apart by less than a millimetre. */
const LABEL_DECIMALS = 3;

/** What `setValue(draft, path, value)` does: `soil resistivity of layer 1: 220 Ω·m → 180 Ω·m`. */
export function setLabel(
  draft: Draft,
  path: JsonPath,
  value: JsonValue | undefined,
  units: DisplayUnits = 'SI',
): string {
  const words = pathWords(draft.study, path);
  const before = valueAt(draft, path);
  if (value === undefined) return `${words} removed`;
  if (before === undefined) return `${words} set to ${valueWords(path, value, units)}`;
  if (typeof before === 'object' || typeof value === 'object') return `${words} changed`;
  return `${words}: ${valueWords(path, before, units)} → ${valueWords(path, value, units)}`;
}

/** Conductors as a subject: `rod R-03`, `4 rods`, `3 conductors and 1 rod`. */
export function conductorsWords(conductors: readonly Conductor[]): string {
  const [only] = conductors;
  if (conductors.length === 1 && only !== undefined) {
    const noun = isRod(only) ? 'rod' : 'conductor';
    return only.id === undefined ? noun : `${noun} ${shown(only.id)}`;
  }
  const rods = conductors.filter(isRod).length;
  const counted = (count: number, noun: string): readonly string[] =>
    count === 0 ? [] : [`${count} ${noun}${count === 1 ? '' : 's'}`];
  return listed([...counted(conductors.length - rods, 'conductor'), ...counted(rods, 'rod')]);
}

/** What a move does: `rod R-03 moved 2 m east and 0.5 m south`. */
export function moveLabel(
  conductors: readonly Conductor[],
  { dx, dy, ddepth = 0 }: Shift,
  units: DisplayUnits = 'SI',
): string {
  const unit = usualUnit('length', units);
  const part = (by: number, ahead: string, back: string): readonly string[] => {
    const length = inSi(Number((Math.abs(by) / inSi(1, unit)).toFixed(LABEL_DECIMALS)), unit);
    return length === 0 ? [] : [`${quantityText('length', length, units)} ${by > 0 ? ahead : back}`];
  };
  const parts = [
    ...part(dx, 'east', 'west'),
    ...part(dy, 'north', 'south'),
    ...part(ddepth, 'deeper', 'higher'),
  ];
  const subject = conductorsWords(conductors);
  return parts.length === 0
    ? `${subject} moved by less than a millimetre`
    : `${subject} moved ${listed(parts)}`;
}

/** What else is done to conductors: `mesh of 3 by 2` cannot be told from its parts and is the caller's to say. */
export function conductorsLabel(
  conductors: readonly Conductor[],
  done: 'drawn' | 'copied' | 'deleted' | 'changed',
): string {
  return `${conductorsWords(conductors)} ${done}`;
}
