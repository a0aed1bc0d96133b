// How many layers the readings call for, by an information criterion.
import { arrayKey } from './arrays.ts';
import { type FittedSurvey, type InversionOptions, invertSurvey } from './inversion.ts';
import { MOST_LAYERS, parameterCount } from './model-parameters.ts';
import type { Reading } from './readings.ts';
import { huberLoss, logLikelihood, robustScale } from './scatter.ts';

export interface LayerCandidate {
  readonly layers: number;
  readonly fit: FittedSurvey;
  /** BIC, least is best */
  readonly criterion: number;
}

export interface LayerProposal {
  /** undefined where there are no readings */
  readonly layers: number | undefined;
  /** 1, 2, … as far as the readings allow */
  readonly candidates: readonly LayerCandidate[];
  /** how the number was found, in words */
  readonly reason: string;
}

/** Difference of BIC that is not worth more than a bare mention (Kass and Raftery 1995): the fewer layers are kept. */
export const BARE_MENTION = 2;

/**
 * Proposes the number of layers by the Bayesian information criterion, −2 ln L + p ln n with p = 2N − 1 (Schwarz 1978); L
 * with the scatter integrated out over a prior of 5 %, so that fits closer than readings can be win nothing. Squares are
 * Huber's losses at one scale, that of the most layers, so that outliers call for no layer. A candidate has fewer
 * parameters than there are different spacings.
 */
export function proposeLayerCount(
  readings: readonly Reading[],
  options: Partial<InversionOptions> = {},
): LayerProposal {
  const spacings = new Set(readings.map((reading) => arrayKey(reading.array))).size;
  const fits: FittedSurvey[] = [];
  for (let layers = 1; layers <= MOST_LAYERS; layers++) {
    if (parameterCount(layers) >= spacings && layers > 1) break;
    const fit = invertSurvey(readings, layers, options);
    if (fit.kind === 'fitted') fits.push(fit);
  }
  if (fits.length === 0) return { layers: undefined, candidates: [], reason: 'there are no readings' };
  const logs = (fit: FittedSurvey): Float64Array =>
    Float64Array.from(fit.fits, (f) => Math.log1p(f.relative));
  const last = fits[fits.length - 1]!;
  const scale = robustScale(logs(last), last.x.length);
  const candidates = fits.map((fit): LayerCandidate => {
    const losses = logs(fit).reduce((sum, residual) => sum + huberLoss(residual, scale), 0);
    const likelihood = logLikelihood(losses, readings.length, options.scatter);
    const criterion = -2 * likelihood + parameterCount(fit.soil.layers.length) * Math.log(readings.length);
    return { layers: fit.soil.layers.length, fit, criterion };
  });
  const least = Math.min(...candidates.map((candidate) => candidate.criterion));
  const chosen = candidates.find((candidate) => candidate.criterion <= least + BARE_MENTION)!;
  return { layers: chosen.layers, candidates, reason: reasonFor(chosen, candidates, spacings) };
}

function reasonFor(chosen: LayerCandidate, candidates: readonly LayerCandidate[], spacings: number): string {
  const values = candidates.map(({ layers, criterion }) => `${layers}: ${criterion.toFixed(1)}`).join(', ');
  const most = candidates.length;
  const limit =
    most < MOST_LAYERS
      ? `; more than ${most} would have as many parameters as there are spacings, ${spacings}`
      : '';
  return `least Bayesian information criterion, the fewer layers where it differs by less than ${BARE_MENTION}: ${chosen.layers} (${values}${limit})`;
}
