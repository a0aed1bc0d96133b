// A layered soil fitted to the readings of a survey: robust, within bounds, from several starts, saying how it ended.
import {
  LEAST_SQUARES_DEFAULTS,
  type LeastSquaresResult,
  leastSquares,
} from '../numerics/levenberg-marquardt.ts';
import { randomNumbers } from '../numerics/random.ts';
import { soilImages } from '../soil/image-list.ts';
import type { SoilModel } from '../soil/soil-model.ts';
import { parameterSpread } from './covariance.ts';
import { apparentResistivity } from './forward.ts';
import {
  FEWEST_LAYERS,
  MOST_LAYERS,
  type ModelParameter,
  modelParameters,
  type ParameterBounds,
  parameterBounds,
  parameterCount,
  soilOf,
} from './model-parameters.ts';
import type { Reading } from './readings.ts';
import { huberLoss, huberWeight, OUTLIER_RATIO, robustScale, scatterOf } from './scatter.ts';
import { startingParameters } from './starts.ts';
import { type SurveyMisfit, surveyMisfit } from './survey-misfit.ts';

export interface InversionOptions {
  /** of the chance starts; stored with the result */
  readonly seed: number;
  readonly starts: number;
  /** `huber` lets outliers pull less; `squares` is the plain least-squares optimum */
  readonly loss: 'huber' | 'squares';
  /** scatter of a reading, as standard deviation of ln ρ; found from the residuals where undefined */
  readonly scatter: number | undefined;
}

export const INVERSION_DEFAULTS: InversionOptions = {
  seed: 1,
  starts: 16,
  loss: 'huber',
  scatter: undefined,
};

export interface FittedParameter extends ModelParameter {
  /** Ω·m or m */
  readonly value: number;
  /** of ln value, from the linear model; 0 where held on a bound, very large where the readings do not tell */
  readonly standardDeviation: number;
  /** which bound holds it, and why there is one, in words */
  readonly bound: { readonly side: 'lower' | 'upper'; readonly reason: string } | undefined;
}

export interface ReadingFit {
  readonly row: number;
  /** Ω·m */
  readonly modelled: number;
  /** modelled/read − 1 */
  readonly relative: number;
  /** 1, or less where the robust loss holds the reading off */
  readonly weight: number;
  /** |ln(modelled/read)| beyond 2.5 robust standard deviations */
  readonly outlier: boolean;
}

export interface FittedSurvey {
  readonly kind: 'fitted';
  /** `at-bound`: converged with a parameter on its bound; `stalled`, `limit`: as the last step left it */
  readonly outcome: 'converged' | 'stalled' | 'limit' | 'at-bound';
  readonly soil: SoilModel;
  /** ln of resistivities, then of thicknesses, shape [2N − 1] */
  readonly x: Float64Array;
  readonly parameters: readonly FittedParameter[];
  readonly correlation: readonly Float64Array[];
  /** root mean square of modelled/read − 1 over all readings, % */
  readonly rmsPercent: number;
  /** root mean square of ln(modelled/read) over all readings */
  readonly logRms: number;
  /** in the order of the readings */
  readonly fits: readonly ReadingFit[];
  /** standard deviation of ln ρ of one reading */
  readonly scatter: number;
  readonly starts: { readonly count: number; readonly agreeing: number; readonly seed: number };
  readonly loss: InversionOptions['loss'];
  /** largest difference between the fast forward model of the fit and the image list of its result, relative */
  readonly forwardError: number;
}

/** Why there is no fit, in words. */
export interface RefusedSurvey {
  readonly kind: 'refused';
  readonly code: 'layer-count' | 'too-few-spacings';
  readonly message: string;
}

/** A start's own fit: enough to tell valleys apart. */
const SEARCH = { ...LEAST_SQUARES_DEFAULTS, limit: 40, reduction: 1e-4, negligible: 1e-5 };
/** Valleys that are followed to their end. */
const FOLLOWED = 3;
/** Two starts agree when their sums differ by less than this share, or by less than 0.1 % a reading. */
const AGREEING = 0.01;
const AGREEING_RESIDUAL = 1e-3;
/** Reweightings at most; the scale is settled after the first few, so that the rest cannot circle. */
const REWEIGHTINGS = 60;
const SCALE_REWEIGHTINGS = 8;
/** Change of a weight that moves nothing. */
const STEADY_WEIGHT = 1e-5;

/**
 * Fits a soil of N layers to readings: ln ρ and ln t within bounds, logarithmic residuals, Huber's loss by iterated
 * reweighting, Levenberg–Marquardt from seeded starts.
 * @param readings at least as many different arrays as parameters, 2N − 1
 * @param layers N, 1 to 5
 * @returns the fit, or in words why there is none
 */
export function invertSurvey(
  readings: readonly Reading[],
  layers: number,
  options: Partial<InversionOptions> = {},
): FittedSurvey | RefusedSurvey {
  const { seed, starts, loss, scatter } = { ...INVERSION_DEFAULTS, ...options };
  if (!Number.isInteger(layers) || layers < FEWEST_LAYERS || layers > MOST_LAYERS)
    return refuse(
      'layer-count',
      `layer count: ${layers} is not a whole number from ${FEWEST_LAYERS} to ${MOST_LAYERS}`,
    );
  const different = new Set(readings.map((reading) => JSON.stringify(reading.array))).size;
  const needed = parameterCount(layers);
  if (different < needed)
    return refuse(
      'too-few-spacings',
      `layer count: ${layers} layers have ${needed} resistivities and thicknesses; ${different} different ${different === 1 ? 'spacing gives' : 'spacings give'} no more than ${different}`,
    );
  const misfit = surveyMisfit(readings);
  const bounds = parameterBounds(readings, layers);
  const unit = new Float64Array(readings.length).fill(1);
  const searched = startingParameters(readings, layers, bounds, starts, randomNumbers(seed))
    .map((start) => leastSquares(weighted(misfit, bounds, unit), start, SEARCH))
    .sort((p, q) => p.sum - q.sum);
  const least = searched[0]!.sum;
  const near = (sum: number): boolean =>
    sum <= (1 + AGREEING) * least + readings.length * AGREEING_RESIDUAL ** 2;
  const ends = valleys(searched).map((valley) =>
    loss === 'squares' ? settle(misfit, bounds, unit, valley.x) : reweight(misfit, bounds, valley.x),
  );
  const best = bestOf(ends, loss);
  return report(misfit, bounds, best, {
    scatter,
    loss,
    starts: { count: starts, agreeing: searched.filter((fit) => near(fit.sum)).length, seed },
  });
}

function refuse(code: RefusedSurvey['code'], message: string): RefusedSurvey {
  return { kind: 'refused', code, message };
}

/** A fit with the weights that it was made with. */
interface SettledFit {
  readonly fit: LeastSquaresResult;
  readonly weights: Float64Array;
  /** ln(modelled/read), unweighted */
  readonly residuals: Float64Array;
  readonly scale: number;
  readonly outcome: LeastSquaresResult['outcome'];
}

function weighted(misfit: SurveyMisfit, bounds: ParameterBounds, weights: Float64Array) {
  const roots = weights.map(Math.sqrt);
  return {
    parameters: bounds.lower.length,
    residuals: weights.length,
    evaluate: (x: Float64Array, into: Float64Array): void => {
      misfit.residuals(x, into);
      for (let i = 0; i < into.length; i++) into[i]! *= roots[i]!;
    },
    lower: bounds.lower,
    upper: bounds.upper,
  };
}

/** The lowest fit of each valley, lowest first: fits whose sums are alike are one valley. */
function valleys(searched: readonly LeastSquaresResult[]): readonly LeastSquaresResult[] {
  const kept: LeastSquaresResult[] = [];
  for (const fit of searched)
    if (kept.length < FOLLOWED && !kept.some((other) => fit.sum <= (1 + AGREEING) * other.sum))
      kept.push(fit);
  return kept;
}

function settle(
  misfit: SurveyMisfit,
  bounds: ParameterBounds,
  weights: Float64Array,
  start: Float64Array,
): SettledFit {
  const fit = leastSquares(weighted(misfit, bounds, weights), start);
  const residuals = new Float64Array(weights.length);
  misfit.residuals(fit.x, residuals);
  return { fit, weights, residuals, scale: robustScale(residuals, fit.x.length), outcome: fit.outcome };
}

/** Huber's loss: weights from the residuals, a fit with these weights, and so on until they stand still. */
function reweight(misfit: SurveyMisfit, bounds: ParameterBounds, start: Float64Array): SettledFit {
  let current = settle(misfit, bounds, new Float64Array(misfit.readings.length).fill(1), start);
  let scale = current.scale;
  for (let round = 0; round < REWEIGHTINGS; round++) {
    if (round < SCALE_REWEIGHTINGS) scale = current.scale;
    const weights = current.residuals.map((residual) => huberWeight(residual, scale));
    const change = weights.reduce((most, w, i) => Math.max(most, Math.abs(w - current.weights[i]!)), 0);
    if (change < STEADY_WEIGHT) return { ...current, scale };
    current = settle(misfit, bounds, weights, current.fit.x);
  }
  return { ...current, scale, outcome: 'limit' };
}

function bestOf(ends: readonly SettledFit[], loss: InversionOptions['loss']): SettledFit {
  const scale = Math.min(...ends.map((end) => end.scale));
  const total = (end: SettledFit): number =>
    loss === 'squares' ? end.fit.sum : end.residuals.reduce((sum, r) => sum + huberLoss(r, scale), 0);
  return ends.reduce((best, end) => (total(end) < total(best) ? end : best));
}

function report(
  misfit: SurveyMisfit,
  bounds: ParameterBounds,
  best: SettledFit,
  how: Pick<FittedSurvey, 'starts' | 'loss'> & Pick<InversionOptions, 'scatter'>,
): FittedSurvey {
  const { x } = best.fit;
  const soil = soilOf(x);
  const images = soilImages(soil);
  const exact = misfit.arrays.map((array) => apparentResistivity(images, array));
  const fast = new Float64Array(exact.length);
  misfit.filter.evaluate(soil, fast);
  const fits = misfit.readings.map(({ row, apparentResistivity: read }, i): ReadingFit => {
    const modelled = exact[misfit.arrayOf[i]!]!;
    return {
      row,
      modelled,
      relative: modelled / read - 1,
      weight: best.weights[i]!,
      outlier: Math.abs(Math.log(modelled / read)) > OUTLIER_RATIO * best.scale,
    };
  });
  const evidence = evidenceWeights(fits);
  const squares = best.residuals.reduce((sum, r, i) => sum + evidence[i]! * r * r, 0);
  const count = evidence.reduce((sum, w) => sum + w, 0);
  const scatter = how.scatter ?? scatterOf(squares, count, x.length);
  const side = (j: number): 'lower' | 'upper' | undefined =>
    x[j] === bounds.lower[j] ? 'lower' : x[j] === bounds.upper[j] ? 'upper' : undefined;
  const held = Array.from(x, (_, j) => side(j) !== undefined);
  const spread = parameterSpread(misfit.residuals, x, evidence, scatter, held);
  const parameters = modelParameters(soil.layers.length).map((parameter, j): FittedParameter => {
    const at = side(j);
    return {
      ...parameter,
      value: Math.exp(x[j]!),
      standardDeviation: spread.standardDeviation[j]!,
      bound: at === undefined ? undefined : { side: at, reason: bounds.reasons[parameter.quantity][at] },
    };
  });
  return {
    kind: 'fitted',
    outcome: best.outcome === 'converged' && held.includes(true) ? 'at-bound' : best.outcome,
    soil,
    x,
    parameters,
    correlation: spread.correlation,
    rmsPercent: 100 * rootMeanSquare(fits.map((fit) => fit.relative)),
    logRms: rootMeanSquare(fits.map((fit) => Math.log1p(fit.relative))),
    fits,
    scatter,
    starts: how.starts,
    loss: how.loss,
    forwardError: exact.reduce((most, value, i) => Math.max(most, Math.abs(fast[i]! / value - 1)), 0),
  };
}

/** What each reading counts as evidence of the scatter: in full, save flagged ones, which count as the robust loss left them. */
export function evidenceWeights(fits: readonly ReadingFit[]): Float64Array {
  return Float64Array.from(fits, (fit) => (fit.outlier ? fit.weight : 1));
}

function rootMeanSquare(values: readonly number[]): number {
  return Math.sqrt(values.reduce((sum, value) => sum + value * value, 0) / values.length);
}
