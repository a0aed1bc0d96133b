// A layered soil fitted to the readings of a survey: robust, within bounds, from several starts, saying how it ended.
import { randomNumbers } from '../numerics/random.ts';
import { soilImages } from '../soil/image-list.ts';
import type { SoilModel } from '../soil/soil-model.ts';
import { arrayKey } from './arrays.ts';
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
import { bestFit, type Loss, type SettledFit } from './robust-fit.ts';
import { OUTLIER_RATIO, scatterOf } from './scatter.ts';
import { startingParameters } from './starts.ts';
import { type SurveyMisfit, surveyMisfit } from './survey-misfit.ts';

export interface InversionOptions {
  /** of the chance starts; stored with the result */
  readonly seed: number;
  readonly starts: number;
  /** `huber` lets outliers pull less; `squares` is the plain least-squares optimum */
  readonly loss: Loss;
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
  const different = new Set(readings.map((reading) => arrayKey(reading.array))).size;
  const needed = parameterCount(layers);
  if (different < needed)
    return refuse(
      'too-few-spacings',
      `layer count: ${layers} layers have ${needed} resistivities and thicknesses; ${different} different ${different === 1 ? 'spacing gives' : 'spacings give'} no more than ${different}`,
    );
  const misfit = surveyMisfit(readings);
  const bounds = parameterBounds(readings, layers);
  const begin = startingParameters(readings, layers, bounds, starts, randomNumbers(seed));
  const { best, agreeing } = bestFit(misfit, bounds, begin, loss);
  return report(misfit, bounds, best, { scatter, loss, starts: { count: starts, agreeing, seed } });
}

function refuse(code: RefusedSurvey['code'], message: string): RefusedSurvey {
  return { kind: 'refused', code, message };
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
