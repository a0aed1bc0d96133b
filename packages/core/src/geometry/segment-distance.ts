// The nearest places of two straight pieces, and of a place and a straight piece.
import { type Axis, type Place, placeOn } from './conductor-axis.ts';

/** Shares 0 … 1 along the first and the second piece, and the distance between those places, m. */
export interface Approach {
  readonly s: number;
  readonly t: number;
  readonly distance: number;
}

/** Share along the axis of the place nearest to (x, y, z). */
export function nearestShare(axis: Axis, [x, y, z]: Place): number {
  const dx = axis.x2 - axis.x1;
  const dy = axis.y2 - axis.y1;
  const dz = axis.z2 - axis.z1;
  const squared = dx * dx + dy * dy + dz * dz;
  if (squared === 0) return 0;
  return clamp(((x - axis.x1) * dx + (y - axis.y1) * dy + (z - axis.z1) * dz) / squared);
}

/**
 * Nearest places of two pieces that are not parallel: the perpendicular foot of the one line on the other, held to the
 * first piece, then its foot on the second piece, held to that, and back once more.
 */
export function crossingApproach(a: Axis, b: Axis): Approach {
  const ux = a.x2 - a.x1;
  const uy = a.y2 - a.y1;
  const uz = a.z2 - a.z1;
  const vx = b.x2 - b.x1;
  const vy = b.y2 - b.y1;
  const vz = b.z2 - b.z1;
  const wx = a.x1 - b.x1;
  const wy = a.y1 - b.y1;
  const wz = a.z1 - b.z1;
  const uu = ux * ux + uy * uy + uz * uz;
  const vv = vx * vx + vy * vy + vz * vz;
  const uv = ux * vx + uy * vy + uz * vz;
  const uw = ux * wx + uy * wy + uz * wz;
  const vw = vx * wx + vy * wy + vz * wz;
  const determinant = uu * vv - uv * uv;
  const s = determinant > 0 ? clamp((uv * vw - vv * uw) / determinant) : 0;
  const t = vv > 0 ? clamp((uv * s + vw) / vv) : 0;
  const back = uu > 0 ? clamp((uv * t - uw) / uu) : 0;
  const dx = wx + back * ux - t * vx;
  const dy = wy + back * uy - t * vy;
  const dz = wz + back * uz - t * vz;
  return { s: back, t, distance: Math.sqrt(dx * dx + dy * dy + dz * dz) };
}

/** Nearest of the four approaches that have an end of one of the pieces for one of their places. */
export function endApproach(a: Axis, b: Axis): Approach {
  const approaches = [
    ...endsOnto(a, b),
    ...endsOnto(b, a).map(({ s, t, distance }) => ({ s: t, t: s, distance })),
  ];
  return approaches.reduce((best, next) => (next.distance < best.distance ? next : best));
}

/** Approaches of the first and the second end of `a` to the piece `b`. */
export function endsOnto(a: Axis, b: Axis): readonly [Approach, Approach] {
  return [endOnto(a, 0, b), endOnto(a, 1, b)];
}

/** The four pairs of an end of `a` and an end of `b`. */
export function endsToEnds(a: Axis, b: Axis): readonly Approach[] {
  return [0, 1].flatMap((s) => [0, 1].map((t) => ({ s, t, distance: apart(placeOn(a, s), placeOn(b, t)) })));
}

/** Distance of two places, m. */
export function apart(p: Place, q: Place): number {
  const dx = q[0] - p[0];
  const dy = q[1] - p[1];
  const dz = q[2] - p[2];
  return Math.sqrt(dx * dx + dy * dy + dz * dz);
}

function endOnto(a: Axis, s: 0 | 1, b: Axis): Approach {
  const end = placeOn(a, s);
  const t = nearestShare(b, end);
  return { s, t, distance: apart(end, placeOn(b, t)) };
}

function clamp(share: number): number {
  return Math.min(1, Math.max(0, share));
}
