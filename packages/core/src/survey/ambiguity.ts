// The family of soils that the readings allow within their scatter, drawn by chance in proportion to their likelihood.
import { quantileOfSorted } from '../numerics/quantile.ts';
import { randomNumbers } from '../numerics/random.ts';
import { sampleTempered } from '../numerics/tempered-sampler.ts';
import type { SoilModel } from '../soil/soil-model.ts';
import type { FourPinArray } from './arrays.ts';
import { evidenceWeights, type FittedSurvey } from './inversion.ts';
import { type ModelParameter, modelParameters, parameterBounds, soilOf } from './model-parameters.ts';
import type { Reading } from './readings.ts';
import { scatterFreedom, studentWidening } from './scatter.ts';
import { shapesOfSoil } from './soil-shapes.ts';
import { surveyFilter } from './survey-filter.ts';
import { surveyMisfit } from './survey-misfit.ts';

export interface FamilyOptions {
  /** of the draws; stored with the family */
  readonly seed: number;
  /** soils in the family */
  readonly members: number;
  /** soils drawn for each parameter of the model; 160 repeat the bands of a degenerate soil within a tenth from seed to seed */
  readonly drawsPerParameter: number;
  /** scatter of a reading, as standard deviation of ln ρ; that of the fit, widened for few readings, where undefined */
  readonly scatter: number | undefined;
}

export const FAMILY_DEFAULTS: FamilyOptions = {
  seed: 1,
  members: 120,
  drawsPerParameter: 160,
  scatter: undefined,
};

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
  /** every draw, ln of resistivities, then of thicknesses, shape [draws][2N − 1]; members are an even selection of them */
  readonly draws: readonly Float64Array[];
  /** `limit`: the draws hardly moved at some stage and may miss part of what the readings allow */
  readonly outcome: 'mixed' | 'limit';
  /** least share of chance moves taken at any stage */
  readonly acceptance: number;
  readonly stages: number;
  readonly seed: number;
  /** standard deviation of ln ρ of one reading that the family allows */
  readonly scatter: number;
  /** Σ weight·ln²(modelled/read) that 95 % of the draws stay below: the edge of the joint 95 % region of soils */
  readonly squaresLimit: number;
}

/** How the family is drawn, in words for the reader. */
export const FAMILY_METHOD =
  'posterior density of log-parameters within bounds (Malinverno 2002), drawn by tempered particles (Del Moral, Doucet and Jasra 2006)';
/** Moves that each draw takes on average at every stage, and at the last. */
const TAKEN = 1;
const LAST_TAKEN = 3;
/** Edges of the bands. */
const LOW = 0.05;
const HIGH = 0.95;
/** Edge of the joint region. */
const REGION = 0.95;
/** high/low up to which a parameter counts as resolved: its size is known within √3 either way. */
export const RESOLVED_RATIO = 3;

/**
 * Family of soils of the fit's layer count: draws from the posterior density of ln ρ and ln t, even within their bounds,
 * with normal residuals ln(modelled/read). Their scatter is that of the fit, widened as Student's band is over the normal
 * one, so that few readings allow more. Repeated readings and traverses each count; flagged readings count as far as the
 * robust fit left them. Bayesian inversion of resistivity soundings in this form: Malinverno, Geophys. J. Int. 151 (2002)
 * (from memory); drawn by tempered particles, see `sampleTempered`.
 * @param fit of these readings
 */
export function soilFamily(
  readings: readonly Reading[],
  fit: FittedSurvey,
  options: Partial<FamilyOptions> = {},
): SoilFamily {
  const { seed, members: size, drawsPerParameter, scatter: given } = { ...FAMILY_DEFAULTS, ...options };
  const misfit = surveyMisfit(readings);
  const n = fit.x.length;
  const bounds = parameterBounds(readings, fit.soil.layers.length);
  const weights = evidenceWeights(fit.fits);
  const count = weights.reduce((sum, w) => sum + w, 0);
  const scatter = given ?? fit.scatter * studentWidening(scatterFreedom(count, n));
  const random = randomNumbers(seed);
  const shapes = shapesOfSoil(misfit, bounds, weights, scatter);
  const sampled = sampleTempered(
    {
      draw: () => shapes.draw(random),
      logLikelihood: (shape) => -shapes.squares(shape) / (2 * scatter * scatter),
    },
    random,
    { particles: 2 * Math.ceil((drawsPerParameter * n) / 2), taken: TAKEN, lastTaken: LAST_TAKEN },
  );
  const draws = sampled.particles.map((shape) => shapes.scaled(shape, random));
  const squares = draws.map((x) => misfit.squares(x, weights));
  const members = Array.from({ length: size }, (_, i): FamilyMember => {
    const draw = Math.floor(((i + 0.5) * draws.length) / size);
    return { soil: soilOf(draws[draw]!), weight: 1 / size, logRms: Math.sqrt(squares[draw]! / count) };
  }).sort((p, q) => p.logRms - q.logRms);
  return {
    members,
    parameters: parameterBands(draws, fit.soil.layers.length),
    band: soundingBand(draws.map(soilOf), misfit.arrays),
    draws,
    outcome: sampled.outcome,
    acceptance: sampled.acceptance,
    stages: sampled.stages,
    seed,
    scatter,
    squaresLimit: quantileOfSorted(Float64Array.from(squares).sort(), REGION),
  };
}

/** Sounding curves of soils as a band, over any arrays; shape [arrays]. */
export function soundingBand(
  soils: readonly SoilModel[],
  arrays: readonly FourPinArray[],
): readonly SoundingBand[] {
  const filter = surveyFilter(arrays);
  const curves = soils.map((soil) => {
    const curve = new Float64Array(arrays.length);
    filter.evaluate(soil, curve);
    return curve;
  });
  return arrays.map((array, i) => ({ array, ...bandOf(curves.map((curve) => curve[i]!)) }));
}

function parameterBands(draws: readonly Float64Array[], layers: number): readonly ParameterBand[] {
  return modelParameters(layers).map((parameter, j): ParameterBand => {
    const band = bandOf(draws.map((x) => Math.exp(x[j]!)));
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
