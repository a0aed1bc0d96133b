// Draws from a probability density known up to a factor: Markov chain of an ensemble of walkers.
import type { RandomNumbers } from './random.ts';

export interface EnsembleOptions {
  /** sweeps of the whole ensemble, the first `burnIn` of which are thrown away */
  readonly sweeps: number;
  readonly burnIn: number;
}

export interface EnsembleDraws {
  /** sweep by sweep, walker by walker; shape [draws × dimension] */
  readonly x: Float64Array;
  /** log of the density, without its factor, shape [draws] */
  readonly logDensity: Float64Array;
  readonly count: number;
  /** share of proposed moves that were taken */
  readonly acceptance: number;
  /** largest potential scale reduction over the coordinates, first half of the sweeps against the second; 1 when mixed */
  readonly scaleReduction: number;
}

/** Longest stretch of a move, and one over the shortest: the value that Goodman and Weare propose. */
const STRETCH = 2;

/**
 * Affine-invariant ensemble sampler, the stretch move of Goodman and Weare (Comm. App. Math. Comp. Sci. 5, 2010): a
 * walker moves along its line to one of the other half, by z with density ∝ 1/√z on [1/2, 2], and the move is taken with
 * probability min(1, z^(n−1)·p(new)/p(old)). Long thin densities, such as those of equivalent soils, cost no more.
 * @param logDensity of a point of shape [n]; −Infinity outside the support
 * @param walkers starting points inside the support, an even number, more than 2n
 */
export function sampleEnsemble(
  logDensity: (x: Float64Array) => number,
  walkers: readonly Float64Array[],
  random: RandomNumbers,
  options: EnsembleOptions,
): EnsembleDraws {
  const n = walkers[0]!.length;
  const place = walkers.map((walker) => Float64Array.from(walker));
  const density = place.map(logDensity);
  const half = place.length / 2;
  const kept = options.sweeps - options.burnIn;
  const x = new Float64Array(kept * place.length * n);
  const logs = new Float64Array(kept * place.length);
  const trial = new Float64Array(n);
  let taken = 0;
  for (let sweep = 0; sweep < options.sweeps; sweep++) {
    for (let w = 0; w < place.length; w++) {
      const other = place[(w < half ? half : 0) + Math.floor(random.uniform() * half)]!;
      const z = (1 + (STRETCH - 1) * random.uniform()) ** 2 / STRETCH;
      const here = place[w]!;
      for (let j = 0; j < n; j++) trial[j] = other[j]! + z * (here[j]! - other[j]!);
      const chance = logDensity(trial);
      if (Math.log(1 - random.uniform()) < (n - 1) * Math.log(z) + chance - density[w]!) {
        here.set(trial);
        density[w] = chance;
        taken++;
      }
    }
    if (sweep < options.burnIn) continue;
    place.forEach((walker, w) => {
      const draw = (sweep - options.burnIn) * place.length + w;
      x.set(walker, draw * n);
      logs[draw] = density[w]!;
    });
  }
  const count = logs.length;
  return {
    x,
    logDensity: logs,
    count,
    acceptance: taken / (options.sweeps * place.length),
    scaleReduction: halvesScaleReduction(x, n, count),
  };
}

/** √(pooled variance/mean variance of the halves): Gelman and Rubin (1992) with the run's two halves as chains. */
function halvesScaleReduction(x: Float64Array, n: number, count: number): number {
  const half = Math.floor(count / 2);
  let worst = 1;
  for (let j = 0; j < n; j++) {
    const first = moments(x, n, j, 0, half);
    const second = moments(x, n, j, half, count);
    const within = (first.variance + second.variance) / 2;
    const between = ((first.mean - second.mean) / 2) ** 2;
    if (within > 0) worst = Math.max(worst, Math.sqrt(1 + between / within));
  }
  return worst;
}

function moments(
  x: Float64Array,
  n: number,
  j: number,
  from: number,
  to: number,
): { mean: number; variance: number } {
  let mean = 0;
  for (let i = from; i < to; i++) mean += x[i * n + j]! / (to - from);
  let variance = 0;
  for (let i = from; i < to; i++) variance += (x[i * n + j]! - mean) ** 2 / (to - from);
  return { mean, variance };
}
