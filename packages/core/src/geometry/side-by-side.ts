// How far two nearly parallel conductors run within contact of each other.
import type { Axis } from './conductor-axis.ts';
import { NEARLY_PARALLEL_SINE } from './contact-tolerances.ts';

/** A stretch of two conductors that lie beside each other within the contact distance. */
export interface Stretch {
  /** length along the first conductor, m */
  readonly length: number;
  /** shares along the first and the second conductor where the stretch begins and ends */
  readonly from: { readonly s: number; readonly t: number };
  readonly to: { readonly s: number; readonly t: number };
  /** smallest and largest distance of the axes on the stretch, m */
  readonly nearest: number;
  readonly farthest: number;
}

/** Change of the axes' distance over a stretch below which they count as exactly parallel, m: rounding of coordinates. */
const PARALLEL_DRIFT_M = 1e-9;

/** Whether the angle between two conductors is too flat to call their meeting a crossing. */
export function nearlyParallel(a: Axis, b: Axis): boolean {
  if (a.length === 0 || b.length === 0) return false;
  const [ux, uy, uz] = direction(a);
  const [vx, vy, vz] = direction(b);
  return Math.hypot(uy * vz - uz * vy, uz * vx - ux * vz, ux * vy - uy * vx) < NEARLY_PARALLEL_SINE;
}

/**
 * The part of `a` whose foot on the line of `b` lies within `b` and no farther than `reach` from it; undefined if there is none.
 * With e(s) the vector from foot to axis, linear in s, the part is where |e(s)|² ≤ reach².
 * @param reach contact distance, m
 */
export function sideBySide(a: Axis, b: Axis, reach: number): Stretch | undefined {
  const [ux, uy, uz] = direction(a);
  const [vx, vy, vz] = direction(b);
  const wx = a.x1 - b.x1;
  const wy = a.y1 - b.y1;
  const wz = a.z1 - b.z1;
  const foot0 = wx * vx + wy * vy + wz * vz;
  const cosine = ux * vx + uy * vy + uz * vz;
  const atStart = -foot0 / cosine;
  const atEnd = (b.length - foot0) / cosine;
  const low = Math.max(0, Math.min(atStart, atEnd));
  const high = Math.min(a.length, Math.max(atStart, atEnd));
  if (!(low <= high)) return undefined;

  const offset = (s: number): readonly [number, number, number] => {
    const foot = foot0 + s * cosine;
    return [wx + s * ux - foot * vx, wy + s * uy - foot * vy, wz + s * uz - foot * vz];
  };
  const within = withinReach(offset(low), offset(high), reach);
  if (within === undefined) return undefined;
  const from = low + within.from * (high - low);
  const to = low + within.to * (high - low);
  const shares = (s: number): { s: number; t: number } => ({
    s: share(s / a.length),
    t: share((foot0 + s * cosine) / b.length),
  });
  return {
    length: to - from,
    from: shares(from),
    to: shares(to),
    nearest: within.nearest,
    farthest: Math.max(Math.hypot(...offset(from)), Math.hypot(...offset(to))),
  };
}

/** Where on the way from vector p to vector q (shares 0 … 1) the vector is no longer than `reach`. */
function withinReach(
  p: readonly [number, number, number],
  q: readonly [number, number, number],
  reach: number,
): { from: number; to: number; nearest: number } | undefined {
  const [dx, dy, dz] = [q[0] - p[0], q[1] - p[1], q[2] - p[2]];
  const drift = Math.hypot(dx, dy, dz);
  const start = Math.hypot(...p);
  if (drift < PARALLEL_DRIFT_M) return start <= reach ? { from: 0, to: 1, nearest: start } : undefined;
  const centre = -(p[0] * dx + p[1] * dy + p[2] * dz) / (drift * drift);
  const miss = Math.hypot(p[0] + centre * dx, p[1] + centre * dy, p[2] + centre * dz);
  if (miss > reach) return undefined;
  const half = Math.sqrt(reach * reach - miss * miss) / drift;
  const from = Math.max(0, centre - half);
  const to = Math.min(1, centre + half);
  if (from > to) return undefined;
  const closest = Math.min(Math.max(centre, from), to);
  const nearest = Math.hypot(p[0] + closest * dx, p[1] + closest * dy, p[2] + closest * dz);
  return { from, to, nearest };
}

function direction(axis: Axis): readonly [number, number, number] {
  return [
    (axis.x2 - axis.x1) / axis.length,
    (axis.y2 - axis.y1) / axis.length,
    (axis.z2 - axis.z1) / axis.length,
  ];
}

function share(value: number): number {
  return Math.min(1, Math.max(0, value));
}
