// Draws from a posterior density with any number of modes: particles led from the prior to it by tempering.
import type { RandomNumbers } from './random.ts';

export interface TemperedProblem {
  /** One draw from the prior, which is even on its region. */
  draw(): Float64Array;
  /** ln of the likelihood up to a constant; −Infinity outside the prior's region. */
  logLikelihood(x: Float64Array): number;
}

export interface TemperedOptions {
  /** even */
  readonly particles: number;
  /** moves that a particle shall have taken, on average, at every temperature and at the last one */
  readonly taken: number;
  readonly lastTaken: number;
}

export interface TemperedDraws {
  readonly particles: readonly Float64Array[];
  readonly logLikelihood: Float64Array;
  readonly stages: number;
  /** least share of proposed moves taken at any temperature */
  readonly acceptance: number;
  /** `limit`: at some temperature particles hardly moved, or temperatures ran out; the draws may miss part of the density */
  readonly outcome: 'mixed' | 'limit';
}

/** Particles' worth of weight that a step of temperature may cost: half stay effective (Del Moral, Doucet and Jasra 2006). */
const EFFECTIVE_SHARE = 0.5;
/** Steps at most; each takes a constant share of the prior's volume, so dozens serve any survey. */
const STAGE_LIMIT = 200;
/** Halvings that find the next power: to 1e-15 of its range, as the first is that small where most soils are far off. */
const HALVINGS = 50;
/** Moves proposed to a particle at one temperature, at most. */
const PROPOSAL_LIMIT = 120;
/** Tries for a first place of a particle inside the region. */
const DRAW_LIMIT = 10_000;
/** Length of a difference move over that of the difference, for one coordinate; falls with the root of their number (ter Braak 2006). */
const DIFFERENCE_LENGTH = 2.38 / Math.SQRT2;
/** Shortest and longest such move over that length, by chance between: valleys bend, and long steps leave them. */
const SHORTEST_MOVE = 0.3;
const LONGEST_MOVE = 1.2;
/** Share of difference moves of full length, which lead from one mode to another (ter Braak 2006: a tenth). */
const FULL_LENGTH_SHARE = 0.1;
/** Chance part of a move, in the coordinates' unit: makes every place reachable. */
const JITTER = 1e-4;

/**
 * Sequential Monte Carlo (Del Moral, Doucet and Jasra, J. R. Stat. Soc. B 68, 2006): likelihood^power, power from 0 to 1 in
 * steps that keep half of the particles effective; at each step systematic resampling, then Metropolis moves along the
 * difference of two particles of the other half (ter Braak, Stat. Comput. 16, 2006), over a chance part of the coordinates
 * (Vrugt et al. 2009). All sources from memory. Meant for likelihoods whose logarithm falls at least like a square: with
 * longer tails, powers do not lead the particles from wide valleys into narrow ones.
 */
export function sampleTempered(
  problem: TemperedProblem,
  random: RandomNumbers,
  options: TemperedOptions,
): TemperedDraws {
  let particles = Array.from({ length: options.particles }, () => firstPlace(problem));
  let logs = Float64Array.from(particles, (x) => problem.logLikelihood(x));
  let power = 0;
  let stages = 0;
  let acceptance = 1;
  let moved = true;
  while (power < 1 && stages < STAGE_LIMIT) {
    stages++;
    const next = nextPower(logs, power);
    const chosen = resampled(stepWeights(logs, next - power), random);
    power = next;
    particles = chosen.map((i) => Float64Array.from(particles[i]!));
    logs = Float64Array.from(chosen, (i) => logs[i]!);
    const aim = power === 1 ? options.lastTaken : options.taken;
    let proposals = 0;
    let taken = 0;
    while (taken < aim && proposals < PROPOSAL_LIMIT) {
      proposals++;
      taken += moveAll(problem, particles, logs, power, random) / particles.length;
    }
    acceptance = Math.min(acceptance, taken / proposals);
    moved &&= taken >= aim;
  }
  const outcome = power === 1 && moved ? 'mixed' : 'limit';
  return { particles, logLikelihood: logs, stages, acceptance, outcome };
}

function firstPlace(problem: TemperedProblem): Float64Array {
  for (let attempt = 0; attempt < DRAW_LIMIT; attempt++) {
    const x = problem.draw();
    if (problem.logLikelihood(x) > Number.NEGATIVE_INFINITY) return x;
  }
  throw new RangeError(`prior: no place with a likelihood in ${DRAW_LIMIT} draws`);
}

/** Largest next power that keeps the effective part of the particles, (Σw)²/Σw² over their number. */
function nextPower(logs: Float64Array, power: number): number {
  const enough = (next: number): boolean =>
    effective(stepWeights(logs, next - power)) >= EFFECTIVE_SHARE * logs.length;
  if (enough(1)) return 1;
  let low = power;
  let high = 1;
  for (let i = 0; i < HALVINGS; i++) {
    const middle = (low + high) / 2;
    if (enough(middle)) low = middle;
    else high = middle;
  }
  return high;
}

/** likelihood^step, the largest being 1. */
function stepWeights(logs: Float64Array, step: number): Float64Array {
  const top = logs.reduce((most, log) => Math.max(most, log), Number.NEGATIVE_INFINITY);
  return logs.map((log) => Math.exp(step * (log - top)));
}

function effective(weights: Float64Array): number {
  let sum = 0;
  let squares = 0;
  for (const weight of weights) {
    sum += weight;
    squares += weight * weight;
  }
  return (sum * sum) / squares;
}

/** Systematic resampling in proportion to weights, then shuffled so that either half is a sample of its own. */
function resampled(weights: Float64Array, random: RandomNumbers): number[] {
  const total = weights.reduce((sum, w) => sum + w, 0);
  const offset = random.uniform();
  const chosen: number[] = [];
  let reached = weights[0]!;
  let i = 0;
  for (let q = 0; q < weights.length; q++) {
    const aim = ((q + offset) / weights.length) * total;
    while (reached < aim && i < weights.length - 1) reached += weights[++i]!;
    chosen.push(i);
  }
  for (let q = chosen.length - 1; q > 0; q--) {
    const other = Math.floor(random.uniform() * (q + 1));
    [chosen[q], chosen[other]] = [chosen[other]!, chosen[q]!];
  }
  return chosen;
}

/** One Metropolis move of each particle; returns how many were taken. */
function moveAll(
  problem: TemperedProblem,
  particles: readonly Float64Array[],
  logs: Float64Array,
  power: number,
  random: RandomNumbers,
): number {
  const half = particles.length / 2;
  const trial = new Float64Array(particles[0]!.length);
  let taken = 0;
  particles.forEach((here, q) => {
    const other = (): Float64Array => particles[(q < half ? half : 0) + Math.floor(random.uniform() * half)]!;
    propose(here, other(), other(), random, trial);
    const log = problem.logLikelihood(trial);
    if (Math.log(1 - random.uniform()) < power * (log - logs[q]!)) {
      here.set(trial);
      logs[q] = log;
      taken++;
    }
  });
  return taken;
}

/** here + length·(a − b) over a third, two thirds or all of the coordinates by chance, at least one. */
function propose(
  here: Float64Array,
  a: Float64Array,
  b: Float64Array,
  random: RandomNumbers,
  into: Float64Array,
): void {
  const n = here.length;
  const share = Math.ceil(3 * (1 - random.uniform())) / 3;
  const sure = Math.floor(random.uniform() * n);
  const chosen: number[] = [];
  for (let j = 0; j < n; j++) if (j === sure || random.uniform() < share) chosen.push(j);
  const bent = SHORTEST_MOVE + (LONGEST_MOVE - SHORTEST_MOVE) * random.uniform();
  const length =
    random.uniform() < FULL_LENGTH_SHARE ? 1 : (bent * DIFFERENCE_LENGTH) / Math.sqrt(chosen.length);
  into.set(here);
  for (const j of chosen) into[j]! += length * (a[j]! - b[j]!) + JITTER * random.normal();
}
