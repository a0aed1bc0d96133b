// Where each conductor is cut by its contacts: near contacts become one cut, contacts near an end become the end.
import { meanOf } from '../numerics/mean.ts';
import type { Axis } from './conductor-axis.ts';
import { reachOf } from './contact-tolerances.ts';
import type { Contact } from './contacts.ts';

/** Cuts of all conductors, in conductor order, then along; the first and the last cut of each are its ends. */
export interface Cuts {
  /** first cut of each conductor, and one past the last, shape [conductors + 1] */
  readonly first: Int32Array;
  /** share 0 … 1 along the conductor, shape [cuts] */
  readonly share: Float64Array;
  /** cut that holds contact k on its first conductor (2k) and on its other one (2k + 1), shape [2·contacts] */
  readonly ofContact: Int32Array;
}

/** A contact as seen from one conductor. */
interface Mark {
  /** share 0 … 1 along the conductor, and the distance that makes, m */
  readonly share: number;
  readonly at: number;
  /** contact distance, m */
  readonly reach: number;
  /** index into {@link Cuts.ofContact} */
  readonly slot: number;
}

/** Contacts nearer than this to the middle of a conductor shorter than their reach belong to neither end, m: rounding. */
const MIDDLE_M = 1e-9;

export function cutConductors(axes: readonly Axis[], contacts: readonly Contact[]): Cuts {
  const marks = marksOf(axes, contacts);
  const first = new Int32Array(axes.length + 1);
  const share: number[] = [];
  const ofContact = new Int32Array(2 * contacts.length);
  axes.forEach((axis, c) => {
    first[c] = share.length;
    const groups = grouped(marks[c]!, axis.length);
    share.push(0);
    for (const mark of groups.start) ofContact[mark.slot] = first[c]!;
    for (const group of groups.between) {
      for (const mark of group) ofContact[mark.slot] = share.length;
      share.push(meanOf(group.map((mark) => mark.share)));
    }
    for (const mark of groups.end) ofContact[mark.slot] = share.length;
    share.push(1);
  });
  first[axes.length] = share.length;
  return { first, share: Float64Array.from(share), ofContact };
}

function marksOf(axes: readonly Axis[], contacts: readonly Contact[]): Mark[][] {
  const marks: Mark[][] = axes.map(() => []);
  contacts.forEach(({ conductor, other, s, t }, k) => {
    const reach = reachOf(axes[conductor]!.radius, axes[other]!.radius);
    marks[conductor]!.push({ share: s, at: s * axes[conductor]!.length, reach, slot: 2 * k });
    marks[other]!.push({ share: t, at: t * axes[other]!.length, reach, slot: 2 * k + 1 });
  });
  for (const list of marks) list.sort((p, q) => p.at - q.at || p.slot - q.slot);
  return marks;
}

interface Groups {
  readonly start: readonly Mark[];
  readonly between: readonly (readonly Mark[])[];
  readonly end: readonly Mark[];
}

/** Chains of marks that follow each other within reach; chains that come within reach of an end belong to it. */
function grouped(marks: readonly Mark[], length: number): Groups {
  const chains: Mark[][] = [];
  for (const mark of marks) {
    const chain = chains.at(-1);
    const last = chain?.at(-1);
    if (chain !== undefined && last !== undefined && mark.at - last.at <= Math.max(last.reach, mark.reach)) {
      chain.push(mark);
    } else {
      chains.push([mark]);
    }
  }
  const start: Mark[] = [];
  const between: Mark[][] = [];
  const end: Mark[] = [];
  for (const chain of chains) {
    const atStart = chain.some(({ at, reach }) => at <= reach);
    const atEnd = chain.some(({ at, reach }) => length - at <= reach);
    if (atStart && atEnd) {
      // a conductor about as short as the contact distance: its two ends stay two
      const middle = chain.filter(({ at }) => length > 0 && Math.abs(at - length / 2) <= MIDDLE_M);
      start.push(...chain.filter((mark) => !middle.includes(mark) && mark.at <= length / 2));
      end.push(...chain.filter((mark) => !middle.includes(mark) && mark.at > length / 2));
      if (middle.length > 0) between.push(middle);
    } else if (atStart) start.push(...chain);
    else if (atEnd) end.push(...chain);
    else between.push(chain);
  }
  return { start, between, end };
}
