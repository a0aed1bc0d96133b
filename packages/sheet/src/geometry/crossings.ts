// Finds where a straight line on the surface passes over buried metal.
import type { PlanConductor, Profile } from '@ohmstead/study';

/** Directions whose cross product is smaller than this, of their lengths, count as parallel. */
const PARALLEL = 1e-9;

/** Distances from the start of the profile at which it passes over a conductor, m, rising and without repeats. */
export function crossingsOf(profile: Profile, conductors: readonly PlanConductor[]): readonly number[] {
  const [ax, ay] = profile.from;
  const dx = profile.to[0] - ax;
  const dy = profile.to[1] - ay;
  const length = Math.hypot(dx, dy);
  const found: number[] = [];
  for (const c of conductors) {
    const ex = c.x2 - c.x1;
    const ey = c.y2 - c.y1;
    const cross = dx * ey - dy * ex;
    if (Math.abs(cross) <= PARALLEL * length * Math.hypot(ex, ey)) continue;
    const t = ((c.x1 - ax) * ey - (c.y1 - ay) * ex) / cross;
    const u = ((c.x1 - ax) * dy - (c.y1 - ay) * dx) / cross;
    if (t >= 0 && t <= 1 && u >= 0 && u <= 1) found.push(Math.round(t * length * 1000) / 1000);
  }
  return [...new Set(found)].sort((a, b) => a - b);
}
