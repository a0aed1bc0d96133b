// The scatter of readings: from residuals, never believed to be nothing, and the weights that outliers lose.
import { medianOf } from '../numerics/quantile.ts';

/**
 * What readings usually scatter about layered ground, as a standard deviation of ln ρ: tester, places of the pins, and
 * ground that is not quite in layers; a fit under 5 % counts as good (common practice, no source).
 */
export const USUAL_SCATTER = 0.05;
/** How many readings' worth of evidence the usual scatter is. */
export const USUAL_SCATTER_READINGS = 2;
/** Least scatter: the tester's 2 % and pins that stand 1 to 2 % from their places (common practice, no source). */
export const LEAST_SCATTER = 0.03;

/** Standard deviation over median absolute deviation of a normal sample (Rousseeuw and Leroy 1987). */
const NORMAL_OVER_MEDIAN = 1.4826;
/** Residual over scale beyond which the loss grows straight: 95 % efficient on normal readings (Holland and Welsch 1977). */
const HUBER = 1.345;
/** Residual over scale beyond which a reading is flagged (Rousseeuw and Leroy 1987: 2.5). */
export const OUTLIER_RATIO = 2.5;

/**
 * Robust scale of residuals, 1.4826·median|r|·√(n/(n − p)), not below the least scatter: a few readings met exactly
 * do not make the next one an outlier.
 * @param parameters p, fitted to the residuals
 */
export function robustScale(residuals: Float64Array, parameters: number): number {
  const n = residuals.length;
  if (n <= parameters) return LEAST_SCATTER;
  const scale = NORMAL_OVER_MEDIAN * medianOf(residuals.map(Math.abs)) * Math.sqrt(n / (n - parameters));
  return Math.max(LEAST_SCATTER, scale);
}

/** Weight of a residual in the reweighted sum of squares that has Huber's loss as its fixed point (Huber 1964). */
export function huberWeight(residual: number, scale: number): number {
  const limit = HUBER * scale;
  return Math.abs(residual) <= limit ? 1 : limit / Math.abs(residual);
}

/** Huber's loss in units of squares: r² within the limit, straight beyond; Σ of it is what the fit makes least. */
export function huberLoss(residual: number, scale: number): number {
  const limit = HUBER * scale;
  const size = Math.abs(residual);
  return size <= limit ? size * size : limit * (2 * size - limit);
}

/**
 * ln of the likelihood of readings with Σ weight·residual² = squares, their common scatter unknown and integrated over a
 * scaled inverse χ² prior at the usual scatter: −(n + ν)/2·ln(ν s² + squares) (Gelman et al., Bayesian Data Analysis, from
 * memory). With a given scatter σ: −squares/2σ².
 * @param count n, sum of the weights
 */
export function logLikelihood(squares: number, count: number, given: number | undefined): number {
  if (given !== undefined) return -squares / (2 * given * given);
  const prior = USUAL_SCATTER_READINGS * USUAL_SCATTER ** 2;
  return (-(count + USUAL_SCATTER_READINGS) / 2) * Math.log(prior + squares);
}

/** Scatter that squares left by a fit of p parameters tell of, the usual scatter counted in as two readings. */
export function scatterOf(squares: number, count: number, parameters: number): number {
  const prior = USUAL_SCATTER_READINGS * USUAL_SCATTER ** 2;
  return Math.sqrt((prior + squares) / scatterFreedom(count, parameters));
}

/** Degrees of freedom of `scatterOf`. */
export function scatterFreedom(count: number, parameters: number): number {
  return USUAL_SCATTER_READINGS + Math.max(0, count - parameters);
}

/** 95 % quantile of the normal distribution. */
const NORMAL_95 = 1.6448536269514722;

/**
 * Student's 95 % quantile with ν degrees of freedom over the normal one: a normal density of so much wider scatter has
 * the 5–95 % band that a scatter known from few readings asks for. Expansion of Abramowitz and Stegun (1964) 26.7.5, within
 * 0.2 % for ν ≥ 3.
 */
export function studentWidening(freedom: number): number {
  const z = NORMAL_95;
  const first = (z ** 3 + z) / 4;
  const second = (5 * z ** 5 + 16 * z ** 3 + 3 * z) / 96;
  const third = (3 * z ** 7 + 19 * z ** 5 + 17 * z ** 3 - 15 * z) / 384;
  return 1 + (first / freedom + second / freedom ** 2 + third / freedom ** 3) / z;
}
