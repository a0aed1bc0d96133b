// What two conductors do where they come near each other: nothing, touch, or lie on top of each other.
import { type Axis, placeOn } from './conductor-axis.ts';
import { OVERLAP_REACHES, OVERLAP_SHARE, reachOf } from './contact-tolerances.ts';
import {
  type Approach,
  apart,
  crossingApproach,
  endApproach,
  endsOnto,
  endsToEnds,
} from './segment-distance.ts';
import { nearlyParallel, type Stretch, sideBySide } from './side-by-side.ts';

export type Meeting =
  | { readonly kind: 'apart' }
  | { readonly kind: 'contact'; readonly contacts: readonly Approach[] }
  /** beside each other for longer than a joint explains */
  | { readonly kind: 'overlap'; readonly stretch: Stretch }
  /** the same ends, in the same or the opposite direction */
  | { readonly kind: 'duplicate'; readonly stretch: Stretch; readonly reversed: boolean };

const APART: Meeting = { kind: 'apart' };

/**
 * Meeting of two conductors. Metal touches where the axes come within the sum of the radii and the tolerance of drawing;
 * an insulated conductor touches at its ends only, so it may lie beside another one.
 */
export function meetingOf(a: Axis, aInsulated: boolean, b: Axis, bInsulated: boolean): Meeting {
  const reach = reachOf(a.radius, b.radius);
  if (nearlyParallel(a, b)) {
    const stretch = sideBySide(a, b, reach);
    if (stretch !== undefined) {
      const ends = sameEnds(a, b, reach);
      if (ends !== undefined && aInsulated === bInsulated) {
        return { kind: 'duplicate', stretch, reversed: ends === 'reversed' };
      }
      if (!aInsulated && !bInsulated) return besideEachOther(a, b, stretch, reach);
    }
  }
  return touching(approaches(a, aInsulated, b, bInsulated), reach);
}

function besideEachOther(a: Axis, b: Axis, stretch: Stretch, reach: number): Meeting {
  const allowed = Math.min(OVERLAP_REACHES * reach, OVERLAP_SHARE * Math.min(a.length, b.length));
  if (stretch.length > allowed) return { kind: 'overlap', stretch };
  const { from, to, nearest } = stretch;
  return touching([{ s: (from.s + to.s) / 2, t: (from.t + to.t) / 2, distance: nearest }], reach);
}

function approaches(a: Axis, aInsulated: boolean, b: Axis, bInsulated: boolean): readonly Approach[] {
  if (aInsulated) return bInsulated ? endsToEnds(a, b) : endsOnto(a, b);
  if (bInsulated) return endsOnto(b, a).map(({ s, t, distance }) => ({ s: t, t: s, distance }));
  return [nearlyParallel(a, b) ? endApproach(a, b) : crossingApproach(a, b)];
}

function touching(approaches: readonly Approach[], reach: number): Meeting {
  const contacts = approaches.filter(({ distance }) => distance <= reach);
  return contacts.length === 0 ? APART : { kind: 'contact', contacts };
}

function sameEnds(a: Axis, b: Axis, reach: number): 'same' | 'reversed' | undefined {
  const [a1, a2, b1, b2] = [placeOn(a, 0), placeOn(a, 1), placeOn(b, 0), placeOn(b, 1)];
  if (apart(a1, b1) <= reach && apart(a2, b2) <= reach) return 'same';
  return apart(a1, b2) <= reach && apart(a2, b1) <= reach ? 'reversed' : undefined;
}
