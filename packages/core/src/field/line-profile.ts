// Surface potential and touch voltage along a straight line on the surface.

import type { SurfacePotential } from './surface-potential.ts';
import type { MetalPotential } from './touch.ts';

/** Shape [count] each. */
export interface LineProfile {
  readonly from: readonly [number, number];
  readonly to: readonly [number, number];
  /** from `from`, m */
  readonly distance: Float64Array;
  readonly potential: Float64Array;
  /** reachable metal minus surface, signed */
  readonly touch: Float64Array;
}

/** @param count points, both ends included, 2 or more */
export function lineProfile(
  surface: SurfacePotential,
  metal: MetalPotential,
  from: readonly [number, number],
  to: readonly [number, number],
  count: number,
): LineProfile {
  const length = Math.hypot(to[0] - from[0], to[1] - from[1]);
  const distance = Float64Array.from({ length: count }, (_, k) => (length * k) / (count - 1));
  const potential = new Float64Array(count);
  const touch = new Float64Array(count);
  distance.forEach((_, k) => {
    const t = k / (count - 1);
    const x = from[0] + t * (to[0] - from[0]);
    const y = from[1] + t * (to[1] - from[1]);
    potential[k] = surface(x, y);
    touch[k] = metal(x, y) - potential[k]!;
  });
  return { from, to, distance, potential, touch };
}
