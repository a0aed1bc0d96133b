// The family of soils that the readings allow within their scatter, drawn by chance in proportion to their likelihood.
import { type EnsembleDraws, sampleEnsemble } from '../numerics/ensemble-sampler.ts';
import { quantileOfSorted } from '../numerics/quantile.ts';
import { type RandomNumbers, randomNumbers } from '../numerics/random.ts';
import type { SoilModel } from '../soil/soil-model.ts';
import type { FourPinArray } from './arrays.ts';
import type { FittedSurvey } from './inversion.ts';
import {
  type ModelParameter,
  modelParameters,
  parameterBounds,
  parametersOf,
  soilOf,
} from './model-parameters.ts';
import type { Reading } from './readings.ts';
import { logLikelihood } from './scatter.ts';
import { surveyFilter } from './survey-filter.ts';
import { surveyMisfit } from './survey-misfit.ts';

export interface FamilyOptions {
  /** of the draws; stored with the family */
  readonly seed: number;
  /** soils in the family */
  readonly members: number;
  /** scatter of a reading, as standard deviation of ln ρ; unknown where undefined */
  readonly scatter: number | undefined;
}

export const FAMILY_DEFAULTS: FamilyOptions = { seed: 1, members: 160, scatter: undefined };

export interface FamilyMember {
  readonly soil: SoilModel;
  /** share of the family; they sum to 1 */
  readonly weight: number;
  /** root of the weighted mean square of ln(modelled/read) */
  readonly logRms: number;
}

/** A quantity over the family: 5 %, half and 95 % of the members lie below. */
export interface FamilyBand {
  readonly low: number;
  readonly median: number;
  readonly high: number;
}

export interface ParameterBand extends ModelParameter, FamilyBand {
  /** whether high/low is no more than 3: the readings tell its size */
  readonly resolved: boolean;
}

export interface SoundingBand extends FamilyBand {
  readonly array: FourPinArray;
}

export interface SoilFamily {
  /** closest to the readings first */
  readonly members: readonly FamilyMember[];
  readonly parameters: readonly ParameterBand[];
  /** over the survey's different arrays */
  readonly band: readonly SoundingBand[];
  /** `limit`: the draws still drifted when their number ran out, and the bands are too narrow rather than too wide */
  readonly outcome: 'mixed' | 'limit';
  readonly acceptance: number;
  readonly scaleReduction: number;
  readonly draws: number;
  readonly seed: number;
  /** Σ weight·ln²(modelled/read) that 95 % of the draws stay below: the edge of the joint 95 % region of soils */
  readonly squaresLimit: number;
}

/** Walkers per parameter; Goodman and Weare ask for more than two. */
const WALKERS_PER_PARAMETER = 6;
const LEAST_WALKERS = 12;
/** Sweeps before drift is looked at, a third of them thrown away; doubled until mixed, so often. */
const SWEEPS = 3000;
const DOUBLINGS = 3;
/** Scale reduction that counts as mixed: drift adds less than a tenth to the spread (Gelman and Rubin 1992 take 1.2). */
const MIXED = 1.1;
/** First spread of the walkers, in ln: where the linear model knows none, and at most. */
const FIRST_SPREAD = 0.5;
/** Edges of the band. */
const LOW = 0.05;
const HIGH = 0.95;
/** Edge of the joint region. */
const REGION = 0.95;
/** high/low up to which a parameter counts as resolved: its size is known within √3 either way. */
export const RESOLVED_RATIO = 3;

/**
 * Family of soils of the fit's layer count: draws from the posterior density of ln ρ and ln t, even within the bounds, with
 * Gaussian residuals ln(modelled/read) of unknown common scatter (see `logLikelihood`), repeated readings and traverses
 * each counting; weights of readings as the robust fit left them. Drawn by the ensemble sampler of Goodman and Weare (2010).
 * Bayesian sounding inversion in this form: Sambridge and Mosegaard, Rev. Geophys. 40 (2002) (from memory).
 * @param fit of these readings
 */
export function soilFamily(
  readings: readonly Reading[],
  fit: FittedSurvey,
  options: Partial<FamilyOptions> = {},
): SoilFamily {
  const { seed, members: size, scatter } = { ...FAMILY_DEFAULTS, ...options };
  const misfit = surveyMisfit(readings);
  const layers = fit.soil.layers.length;
  const bounds = parameterBounds(readings, layers);
  const weights = Float64Array.from(fit.fits, (reading) => reading.weight);
  const count = weights.reduce((sum, w) => sum + w, 0);
  const logDensity = (x: Float64Array): number => {
    for (let j = 0; j < x.length; j++)
      if (!(x[j]! >= bounds.lower[j]! && x[j]! <= bounds.upper[j]!)) return Number.NEGATIVE_INFINITY;
    return logLikelihood(misfit.squares(x, weights), count, scatter);
  };
  const random = randomNumbers(seed);
  let walkers = firstWalkers(fit, bounds.lower, bounds.upper, random);
  let draws: EnsembleDraws | undefined;
  for (let sweeps = SWEEPS, round = 0; round <= DOUBLINGS; sweeps *= 2, round++) {
    draws = sampleEnsemble(logDensity, walkers, random, { sweeps, burnIn: Math.floor(sweeps / 3) });
    if (draws.scaleReduction <= MIXED) break;
    walkers = lastWalkers(draws, walkers.length, fit.x.length);
  }
  const last = draws!;
  const n = fit.x.length;
  const drawn = Array.from({ length: size }, (_, i) => {
    const draw = Math.floor(((i + 0.5) * last.count) / size);
    return last.x.slice(draw * n, (draw + 1) * n);
  });
  const members = drawn
    .map(
      (x): FamilyMember => ({
        soil: soilOf(x),
        weight: 1 / size,
        logRms: Math.sqrt(misfit.squares(x, weights) / count),
      }),
    )
    .sort((p, q) => p.logRms - q.logRms);
  const byDensity = Array.from(last.logDensity.keys()).sort(
    (p, q) => last.logDensity[q]! - last.logDensity[p]!,
  );
  const edge = byDensity[Math.floor(REGION * (last.count - 1))]!;
  return {
    members,
    parameters: parameterBands(members, layers),
    band: soundingBand(members, misfit.arrays),
    outcome: last.scaleReduction <= MIXED ? 'mixed' : 'limit',
    acceptance: last.acceptance,
    scaleReduction: last.scaleReduction,
    draws: last.count,
    seed,
    squaresLimit: misfit.squares(last.x.slice(edge * n, (edge + 1) * n), weights),
  };
}

/** Sounding curves of the members as a band, over any arrays; shape [arrays]. */
export function soundingBand(
  members: readonly FamilyMember[],
  arrays: readonly FourPinArray[],
): readonly SoundingBand[] {
  const filter = surveyFilter(arrays);
  const curves = members.map(({ soil }) => {
    const curve = new Float64Array(arrays.length);
    filter.evaluate(soil, curve);
    return curve;
  });
  return arrays.map((array, i) => ({ array, ...bandOf(curves.map((curve) => curve[i]!)) }));
}

function parameterBands(members: readonly FamilyMember[], layers: number): readonly ParameterBand[] {
  const values = members.map(({ soil }) => parametersOf(soil));
  return modelParameters(layers).map((parameter, j): ParameterBand => {
    const band = bandOf(values.map((x) => Math.exp(x[j]!)));
    return { ...parameter, ...band, resolved: band.high <= RESOLVED_RATIO * band.low };
  });
}

/** 5 %, 50 % and 95 % of values of equal weight. */
export function bandOf(values: readonly number[]): FamilyBand {
  const sorted = Float64Array.from(values).sort();
  return {
    low: quantileOfSorted(sorted, LOW),
    median: quantileOfSorted(sorted, 0.5),
    high: quantileOfSorted(sorted, HIGH),
  };
}

/** About the fit, as wide as the linear model says, inside the bounds. */
function firstWalkers(
  fit: FittedSurvey,
  lower: Float64Array,
  upper: Float64Array,
  random: RandomNumbers,
): Float64Array[] {
  const n = fit.x.length;
  const count = Math.max(LEAST_WALKERS, WALKERS_PER_PARAMETER * n);
  return Array.from({ length: count }, () =>
    fit.x.map((value, j) => {
      const known = fit.parameters[j]!.standardDeviation;
      const spread = known > 0 ? Math.min(FIRST_SPREAD, known) : FIRST_SPREAD;
      // folded back at a bound, so that a parameter that stands there spreads inward
      const moved = value + spread * random.normal();
      const folded =
        moved < lower[j]! ? 2 * lower[j]! - moved : moved > upper[j]! ? 2 * upper[j]! - moved : moved;
      return Math.min(upper[j]!, Math.max(lower[j]!, folded));
    }),
  );
}

function lastWalkers(draws: EnsembleDraws, count: number, n: number): Float64Array[] {
  return Array.from({ length: count }, (_, w) => {
    const draw = draws.count - count + w;
    return draws.x.slice(draw * n, (draw + 1) * n);
  });
}
