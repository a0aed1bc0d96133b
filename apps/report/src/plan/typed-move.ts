// A length or a place typed while drawing: `12`, `12 @ 30`, `12, 5`.
import type { DisplayUnits, Point } from '@ohmstead/study';
import { readQuantity } from '../desk/quantity.ts';

export type TypedEnd = { readonly at: Point } | { readonly complaint: string };

/** How a typed end is written, for the page's words. */
export const TYPED_END_WORDS: string =
  'a length (12 m), a length @ an angle north of east (12 m @ 30), or so far east, so far north (12 m; −5 m)';

/**
 * Where a line ends whose end is typed.
 * @param from where it begins
 * @param towards where the pointer is, which gives the direction of a bare length
 */
export function typedEnd(text: string, from: Point, towards: Point, units: DisplayUnits): TypedEnd {
  const polar = text.split('@');
  if (polar.length === 2) {
    const length = quantity(polar[0]!, units);
    const angle = Number(polar[1]!.trim().replace('\u2212', '-').replace(/°$/, ''));
    if ('complaint' in length) return length;
    if (!Number.isFinite(angle) || polar[1]!.trim() === '')
      return { complaint: `${polar[1]!.trim()} is no angle; expected degrees north of east, such as 30` };
    const turn = (angle * Math.PI) / 180;
    return { at: [from[0] + length.value * Math.cos(turn), from[1] + length.value * Math.sin(turn)] };
  }
  const parts = text.split(';');
  if (parts.length === 2) {
    const [east, north] = parts.map((part) => quantity(part, units));
    if ('complaint' in east!) return east;
    if ('complaint' in north!) return north;
    return { at: [from[0] + east!.value, from[1] + north!.value] };
  }
  const length = quantity(text, units);
  if ('complaint' in length) return length;
  const [dx, dy] = [towards[0] - from[0], towards[1] - from[1]];
  const distance = Math.hypot(dx, dy);
  if (distance === 0)
    return { complaint: 'the direction is not told; point somewhere, or add @ and an angle' };
  return { at: [from[0] + (length.value * dx) / distance, from[1] + (length.value * dy) / distance] };
}

function quantity(text: string, units: DisplayUnits): ReturnType<typeof readQuantity> {
  return readQuantity('coordinate', text.trim(), { units });
}
