// The distances that decide whether metal touches, each with its reason.

/** m; axes that miss by no more than this beyond the sum of the radii touch: the rounding of a drawing. Common practice, no source. */
export const CONTACT_TOLERANCE_M = 0.005;

/** m; a free end this near to other metal was probably meant to reach it: a slip of the hand, not a design. Common practice, no source. */
export const NEAR_MISS_GAP_M = 0.15;

/** m; axes nearer than this meet, and the joint needs no mention: far above rounding of coordinates of 1e6 m, far below any drawing. */
export const SNAP_FLOOR_M = 1e-6;

/** sine of the angle below which two conductors run side by side rather than cross (5.7°): a crossing flatter than this would lie in contact over more than twenty times the contact distance. */
export const NEARLY_PARALLEL_SINE = 0.1;

/** Side by side for longer than this many contact distances is an overlap; less is an end drawn past the joint. */
export const OVERLAP_REACHES = 2;

/** … or for more than this share of the shorter conductor, which then has hardly any soil of its own. */
export const OVERLAP_SHARE = 0.5;

/** Contact distance: axes that come this near touch, m. */
export function reachOf(radius1: number, radius2: number): number {
  return radius1 + radius2 + CONTACT_TOLERANCE_M;
}
