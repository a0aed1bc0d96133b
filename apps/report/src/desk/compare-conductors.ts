// What differs between the conductors of two plans: added, removed, moved, made of something else.
import type { PlanConductor } from '@ohmstead/study';
import { makeKey } from './plan-quantities.ts';

export interface ConductorDifferences {
  readonly added: readonly PlanConductor[];
  readonly removed: readonly PlanConductor[];
  /** same id, other places */
  readonly moved: readonly ConductorPair[];
  /** same id and places, other metal or electrode */
  readonly remade: readonly ConductorPair[];
}

export interface ConductorPair {
  readonly before: PlanConductor;
  readonly after: PlanConductor;
}

/** Places are the same to a micrometre. Reason: feet and metres of one drawing differ by less. */
const SAME_PLACE_M = 1e-6;

function place(x: number, y: number, depth: number): string {
  return [x, y, depth].map((value) => String(Math.round(value / SAME_PLACE_M) + 0)).join(' ');
}

/** Both ends, whichever comes first. */
function placeKey({ x1, y1, depth1, x2, y2, depth2 }: PlanConductor): string {
  return [place(x1, y1, depth1), place(x2, y2, depth2)].sort().join(' | ');
}

function wholeKey(conductor: PlanConductor): string {
  const { electrode, insulated } = conductor;
  return [placeKey(conductor), makeKey(conductor), electrode, String(insulated)].join(' | ');
}

/** Pairs conductors that have the same key, each once; the rest of both sides. */
function paired(
  before: readonly PlanConductor[],
  after: readonly PlanConductor[],
  keyOf: (conductor: PlanConductor) => string,
): {
  readonly pairs: readonly ConductorPair[];
  readonly before: PlanConductor[];
  readonly after: PlanConductor[];
} {
  const waiting = new Map<string, PlanConductor[]>();
  for (const conductor of before) {
    const key = keyOf(conductor);
    const list = waiting.get(key);
    if (list === undefined) waiting.set(key, [conductor]);
    else list.push(conductor);
  }
  const pairs: ConductorPair[] = [];
  const left: PlanConductor[] = [];
  for (const conductor of after) {
    const match = waiting.get(keyOf(conductor))?.shift();
    if (match === undefined) left.push(conductor);
    else pairs.push({ before: match, after: conductor });
  }
  return { pairs, before: [...waiting.values()].flat(), after: left };
}

/** Compares two plans: first what is the same under the same id, then what is the same, then what has the same id. */
export function conductorDifferences(
  before: readonly PlanConductor[],
  after: readonly PlanConductor[],
): ConductorDifferences {
  const exact = paired(before, after, (one) => `${one.id} | ${wholeKey(one)}`);
  const same = paired(exact.before, exact.after, wholeKey);
  const named = paired(same.before, same.after, ({ id }) => id);
  const stays = ({ before: a, after: b }: ConductorPair): boolean => placeKey(a) === placeKey(b);
  return {
    added: named.after,
    removed: named.before,
    moved: named.pairs.filter((pair) => !stays(pair)),
    remade: named.pairs.filter(stays),
  };
}
