// Climbs to a local maximum of a function of a few variables by compass search inside a region.

export interface Summit {
  readonly at: readonly number[];
  readonly value: number;
}

/** The mesh of directions shrinks by this each time no direction climbs. */
const SHRINK = 0.5;
/** Evaluations after which a search that still climbs is cut off; hundreds suffice from a lattice's maximum. */
const EVALUATION_LIMIT = 2000;

/**
 * Compass search (Kolda, Lewis and Torczon, SIAM Review 45, 2003): takes the first direction that climbs at the present
 * step and goes on from it; when none does, halves the step, until it is below `finest` of its start.
 * @param f function to climb; −Infinity outside its region
 * @param directions moves to try, in the units of the variables, at full step
 * @param finest smallest step, as a share of the first
 */
export function climb(
  f: (at: readonly number[]) => number,
  start: readonly number[],
  directions: (at: readonly number[]) => readonly (readonly number[])[],
  finest: number,
): Summit {
  let at = start;
  let value = f(start);
  let step = 1;
  let first = 0;
  let evaluations = 1;
  while (step >= finest && evaluations < EVALUATION_LIMIT) {
    const moves = directions(at);
    let climbed = false;
    for (let k = 0; k < moves.length && !climbed; k++) {
      const move = moves[(first + k) % moves.length]!;
      const tried = at.map((coordinate, c) => coordinate + step * move[c]!);
      const there = f(tried);
      evaluations++;
      if (there > value) {
        at = tried;
        value = there;
        first = (first + k) % moves.length;
        climbed = true;
      }
    }
    if (!climbed) step *= SHRINK;
  }
  return { at, value };
}
