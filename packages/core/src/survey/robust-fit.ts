// The best soil for readings under a robust loss: many short fits, the lowest valleys followed to their end.
import {
  LEAST_SQUARES_DEFAULTS,
  type LeastSquaresProblem,
  type LeastSquaresResult,
  leastSquares,
} from '../numerics/levenberg-marquardt.ts';
import type { ParameterBounds } from './model-parameters.ts';
import { huberLoss, huberWeight, robustScale } from './scatter.ts';
import type { SurveyMisfit } from './survey-misfit.ts';

/** `huber` lets outliers pull less; `squares` is the plain least-squares optimum. */
export type Loss = 'huber' | 'squares';

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

/** A fit with the weights that it was made with. */
export interface SettledFit {
  readonly fit: LeastSquaresResult;
  readonly weights: Float64Array;
  /** ln(modelled/read), unweighted */
  readonly residuals: Float64Array;
  readonly scale: number;
  readonly outcome: LeastSquaresResult['outcome'];
}

/**
 * Plain least-squares fits from every start; the lowest of different valleys are then fitted under the loss, and the best
 * of them is kept.
 * @param starts parameters, at least one
 * @returns also how many starts ended as low as the lowest
 */
export function bestFit(
  misfit: SurveyMisfit,
  bounds: ParameterBounds,
  starts: readonly Float64Array[],
  loss: Loss,
): { readonly best: SettledFit; readonly agreeing: number } {
  const unit = new Float64Array(misfit.readings.length).fill(1);
  const searched = starts
    .map((start) => leastSquares(weighted(misfit, bounds, unit), start, SEARCH))
    .sort((p, q) => p.sum - q.sum);
  const least = searched[0]!.sum;
  const near = (sum: number): boolean => sum <= (1 + AGREEING) * least + unit.length * AGREEING_RESIDUAL ** 2;
  const ends = valleys(searched).map((valley) =>
    loss === 'squares' ? settle(misfit, bounds, unit, valley.x) : reweight(misfit, bounds, valley.x),
  );
  return { best: bestOf(ends, loss), agreeing: searched.filter((fit) => near(fit.sum)).length };
}

function weighted(misfit: SurveyMisfit, bounds: ParameterBounds, weights: Float64Array): LeastSquaresProblem {
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

function bestOf(ends: readonly SettledFit[], loss: Loss): SettledFit {
  const scale = Math.min(...ends.map((end) => end.scale));
  const total = (end: SettledFit): number =>
    loss === 'squares' ? end.fit.sum : end.residuals.reduce((sum, r) => sum + huberLoss(r, scale), 0);
  return ends.reduce((best, end) => (total(end) < total(best) ? end : best));
}
