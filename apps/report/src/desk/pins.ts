// States of a study that are kept to be compared with.
import type { Outcome, PlanConductor, Results } from '@ohmstead/study';
import type { Draft } from './draft.ts';

export interface Pin {
  /** one of its own among the pins */
  readonly name: string;
  readonly draft: Draft;
  readonly results: Results;
  readonly conductors: readonly PlanConductor[];
  /** everything to draw figures from; not kept where a pin was stored and read again */
  readonly outcome?: Outcome | undefined;
}

/** Most pins. Reason: a list that can be read. */
export const MOST_PINS = 20;

/** A state as it is compared: pinned, or the one worked at. */
export function stateOf(name: string, draft: Draft, outcome: Outcome): Pin {
  return { name, draft, results: outcome.results, conductors: outcome.plan.conductors, outcome };
}

function freeName(pins: readonly Pin[], name: string): string {
  const taken = new Set(pins.map((pin) => pin.name));
  for (let n = 1; ; n++) {
    const tried = n === 1 ? name : `${name} ${n}`;
    if (!taken.has(tried)) return tried;
  }
}

/** Pins with one more at the end, under a free name; the same list where there are as many as are kept. */
export function addPin(pins: readonly Pin[], pin: Pin): readonly Pin[] {
  if (pins.length >= MOST_PINS) return pins;
  return [...pins, { ...pin, name: freeName(pins, pin.name.trim() === '' ? 'state' : pin.name.trim()) }];
}

/** A pin renamed, under a free name; a blank name changes nothing. */
export function renamePin(pins: readonly Pin[], at: number, name: string): readonly Pin[] {
  const pin = pins[at];
  if (pin === undefined || name.trim() === '') return pins;
  return pins.with(at, { ...pin, name: freeName(pins.toSpliced(at, 1), name.trim()) });
}

export function removePin(pins: readonly Pin[], at: number): readonly Pin[] {
  return pins.toSpliced(at, 1);
}
