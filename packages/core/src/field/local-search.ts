// Climbs to a local maximum of a function of a few variables, along ridges too, inside a region.

export interface Summit {
  readonly at: readonly number[];
  readonly value: number;
  /** `limit`: it still climbed when its evaluations ran out */
  readonly outcome: 'converged' | 'limit';
}

/** The step shrinks by this each time no basis of directions climbs. */
const SHRINK = 0.5;
/** Bases tried at one step before it shrinks: the axes, then turned ones, so that a ridge askew to the axes is followed. */
const BASES = 3;
/** Evaluations after which a search that still climbs is cut off; hundreds suffice from a lattice's maximum. */
const EVALUATION_LIMIT = 6000;
/** Seed of the turned bases: the same study gives the same search. */
const SEED = 48_271;

/**
 * Generating-set search (Kolda, Lewis and Torczon, SIAM Review 45, 2003) over turned bases: takes the first direction
 * that climbs at the present step and goes on from it, tries the last success again and further, turns the basis when
 * none climbs, and halves the step when no basis does, until it is below `finest` of its start.
 * @param f function to climb; −Infinity outside its region
 * @param scale first step of each variable, in its unit
 * @param along further directions worth trying at a place, such as along an edge; in the variables' units
 * @param finest smallest step, as a share of the first
 */
export function climb(
  f: (at: readonly number[]) => number,
  start: readonly number[],
  scale: readonly number[],
  along: (at: readonly number[]) => readonly (readonly number[])[],
  finest: number,
): Summit {
  const random = seededRandom(SEED);
  let at = start;
  let value = f(start);
  let step = 1;
  let evaluations = 1;
  let last: readonly number[] | undefined;
  const tryMove = (move: readonly number[], length: number): boolean => {
    const tried = at.map((coordinate, k) => coordinate + length * move[k]!);
    const there = f(tried);
    evaluations++;
    if (!(there > value)) return false;
    at = tried;
    value = there;
    last = move;
    return true;
  };
  while (step >= finest && evaluations < EVALUATION_LIMIT) {
    let climbed = false;
    for (let turn = 0; turn < BASES && !climbed; turn++) {
      const basis = turn === 0 ? unitBasis(scale.length) : turnedBasis(scale.length, random);
      const moves = basis.flatMap((axis) => [
        axis.map((c, k) => c * scale[k]!),
        axis.map((c, k) => -c * scale[k]!),
      ]);
      const all = [...(last === undefined ? [] : [last]), ...(turn === 0 ? along(at) : []), ...moves];
      climbed = all.some((move) => tryMove(move, step));
    }
    if (climbed) while (last !== undefined && evaluations < EVALUATION_LIMIT && tryMove(last, 2 * step));
    else step *= SHRINK;
  }
  return { at, value, outcome: step < finest ? 'converged' : 'limit' };
}

/**
 * The highest of the summits reached from several starts. A start within a first step of a summit already reached would
 * only climb to it again, and is left out.
 */
export function highestSummit(
  f: (at: readonly number[]) => number,
  starts: readonly (readonly number[])[],
  scale: readonly number[],
  along: (at: readonly number[]) => readonly (readonly number[])[],
  finest: number,
): Summit | undefined {
  const reached: Summit[] = [];
  for (const start of starts) {
    const again = reached.some(({ at }) => at.every((c, k) => Math.abs(c - start[k]!) <= scale[k]!));
    if (!again) reached.push(climb(f, start, scale, along, finest));
  }
  return reached.reduce<Summit | undefined>(
    (best, summit) => (best === undefined || summit.value > best.value ? summit : best),
    undefined,
  );
}

function unitBasis(n: number): number[][] {
  return Array.from({ length: n }, (_, i) => Array.from({ length: n }, (_, k) => (i === k ? 1 : 0)));
}

/** An orthonormal basis in a random direction, by Gram–Schmidt. */
function turnedBasis(n: number, random: () => number): number[][] {
  const basis: number[][] = [];
  while (basis.length < n) {
    const vector = Array.from({ length: n }, () => random() - 0.5);
    for (const other of basis) {
      const share = vector.reduce((sum, c, k) => sum + c * other[k]!, 0);
      for (let k = 0; k < n; k++) vector[k]! -= share * other[k]!;
    }
    const length = Math.hypot(...vector);
    if (length > 1e-3) basis.push(vector.map((c) => c / length));
  }
  return basis;
}

/** Park and Miller's minimal standard generator (Comm. ACM 31, 1988). */
function seededRandom(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state * 16_807) % 2_147_483_647;
    return state / 2_147_483_647;
  };
}
