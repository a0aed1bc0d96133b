// What an engineer should doubt about a fitted survey, in words.
import { RESOLVED_RATIO, type SoilFamily } from './ambiguity.ts';
import { degenerateLayers } from './degeneracy.ts';
import type { FittedSurvey } from './inversion.ts';
import { medianDepth, wennerEquivalent } from './investigation-depth.ts';
import type { Reading } from './readings.ts';
import { LEAST_SCATTER } from './scatter.ts';
import { soundingOf, traversesOf } from './sounding.ts';

export interface SurveyDoubt {
  readonly code:
    | 'no-layered-model'
    | 'poor-fit'
    | 'rise-too-steep'
    | 'outliers'
    | 'inversion-not-settled'
    | 'at-bound'
    | 'degenerate-layer'
    | 'unresolved'
    | 'family-not-settled'
    | 'traverses-differ'
    | 'spacings-short'
    | 'short-spacings-missing';
  /** lower case: the quantity's trade name, the value, what was expected */
  readonly message: string;
}

/** Misfit of the readings that are not flagged, %, beyond which layers do not explain them (common practice, no source: under 5 is good, over 10 asks for more layers). */
const NO_MODEL_PERCENT = 25;
const POOR_PERCENT = 10;
/** Share of flagged readings beyond which the model is at fault rather than the readings: half of what a median bears. */
const MOST_FLAGGED = 0.25;
/** Rise beyond the steepest that layers allow which the scatter of two readings makes, at three standard deviations. */
const STEEP_MARGIN = Math.exp(3 * Math.SQRT2 * LEAST_SCATTER);
/** Mean difference of a traverse from the others that counts, in ln ρ and in standard errors. */
const SHIFT = 0.1;
const SHIFT_ERRORS = 2;
/** Depth that half of the shortest reading sees, over the electrode's: as much ground below the conductors as above. */
const SHALLOW_RATIO = 2;
const CHECK = 'look for buried metal, ground that changes along the traverse, or wrong rows before using any';

/** Every doubt about a fit and its family, gravest first. */
export function surveyDoubts(
  readings: readonly Reading[],
  fit: FittedSurvey,
  family: SoilFamily,
): readonly SurveyDoubt[] {
  return [
    ...misfitDoubts(fit),
    ...steepRises(readings),
    ...outlierDoubts(fit),
    ...endingDoubts(fit, family),
    ...layerDoubts(family),
    ...traverseDoubts(readings, fit),
  ];
}

/**
 * A survey whose spacings end before the electrode does cannot tell the ground that decides its resistance; one that
 * begins below it cannot tell the ground that decides touch and step voltage (common practice, no source).
 * @param diagonal longest distance across the electrode in plan, m
 * @param depth of its shallowest horizontal conductors, m
 */
export function spacingDoubts(
  readings: readonly Reading[],
  diagonal: number,
  depth?: number,
): readonly SurveyDoubt[] {
  const spacings = readings.map((reading) => wennerEquivalent(reading.array));
  const { shallowest, deepest } = investigationRange(readings);
  const longest = Math.max(...spacings);
  const doubts: SurveyDoubt[] = [];
  if (longest < diagonal)
    doubts.push({
      code: 'spacings-short',
      message: `spacings end at ${metres(longest)}, short of the electrode's diagonal of ${metres(diagonal)}: half of what the longest sees lies above ${metres(deepest)}, and the deep ground that decides resistance and rise is known only as far as the family tells`,
    });
  if (depth !== undefined && shallowest > SHALLOW_RATIO * depth)
    doubts.push({
      code: 'short-spacings-missing',
      message: `spacings begin at ${metres(Math.min(...spacings))}: half of what the shortest sees lies below ${metres(shallowest)}, with the electrode at ${metres(depth)}, and the shallow ground that decides touch and step voltage is hardly told`,
    });
  return doubts;
}

/** Depths that the readings reach, m: medians of investigation of the shallowest and of the deepest reading (see `medianDepth`). */
export function investigationRange(readings: readonly Reading[]): {
  readonly shallowest: number;
  readonly deepest: number;
} {
  const depths = readings.map((reading) => medianDepth(reading.array));
  return { shallowest: Math.min(...depths), deepest: Math.max(...depths) };
}

function misfitDoubts(fit: FittedSurvey): SurveyDoubt[] {
  const kept = fit.fits.filter((reading) => !reading.outlier);
  const flagged = fit.fits.length - kept.length;
  const rms =
    100 * Math.sqrt(kept.reduce((sum, { relative }) => sum + relative ** 2, 0) / Math.max(1, kept.length));
  const soil = `soil of ${layersText(fit.soil.layers.length)}`;
  if (flagged > MOST_FLAGGED * fit.fits.length)
    return [
      {
        code: 'no-layered-model',
        message: `no ${soil} fits these readings: ${flagged} of ${fit.fits.length} lie off the best one; ${CHECK}`,
      },
    ];
  if (rms > NO_MODEL_PERCENT)
    return [
      {
        code: 'no-layered-model',
        message: `no ${soil} fits these readings: misfit ${rms.toFixed(1)} % rms where ${POOR_PERCENT} % or less is expected; ${CHECK}`,
      },
    ];
  if (rms > POOR_PERCENT)
    return [
      {
        code: 'poor-fit',
        message: `the best ${soil} misses the readings by ${rms.toFixed(1)} % rms where ${POOR_PERCENT} % or less is expected; try more layers, or ${CHECK}`,
      },
    ];
  return [];
}

/**
 * Rises steeper than layers can make: over horizontal layers apparent resistivity grows no faster than spacing, as over an
 * insulating basement (a branch of at most 45° on log–log paper: Zohdy, Eaton and Mabey, USGS TWRI 2-D1, 1974, from memory).
 */
function steepRises(readings: readonly Reading[]): SurveyDoubt[] {
  const { points } = soundingOf(readings);
  return points.flatMap((point, i): SurveyDoubt[] => {
    const before = points[i - 1];
    if (before === undefined || before.array.kind !== point.array.kind) return [];
    const rise = point.geometricMean / before.geometricMean;
    const most = point.spacing / before.spacing;
    if (most === 1 || rise <= most * STEEP_MARGIN) return [];
    const rows = [...before.rows, ...point.rows].join(', ');
    return [
      {
        code: 'rise-too-steep',
        message: `apparent resistivity rises ${rise.toFixed(2)} times from spacing ${metres(before.spacing)} to ${metres(point.spacing)} (rows ${rows}); over horizontal layers it rises no more than the spacing, ${most.toFixed(2)} times`,
      },
    ];
  });
}

function outlierDoubts(fit: FittedSurvey): SurveyDoubt[] {
  const flagged = fit.fits.filter((reading) => reading.outlier);
  if (flagged.length === 0) return [];
  const rows = flagged.map(({ row, relative }) => {
    const percent = 100 * (1 / (1 + relative) - 1);
    return `${row} (${percent > 0 ? '+' : '−'}${Math.abs(percent).toFixed(0)} %)`;
  });
  return [
    {
      code: 'outliers',
      message: `readings in row ${rows.join(', ')} stand off the model by more than 2.5 robust standard deviations; they are used with less weight, not dropped`,
    },
  ];
}

function endingDoubts(fit: FittedSurvey, family: SoilFamily): SurveyDoubt[] {
  const found: SurveyDoubt[] = [];
  if (fit.outcome === 'stalled' || fit.outcome === 'limit')
    found.push({
      code: 'inversion-not-settled',
      message: `the fit of ${layersText(fit.soil.layers.length)} ended without settling (${fit.outcome}): some of its numbers change together without changing the misfit; fewer layers may tell as much`,
    });
  for (const { quantity, layer, bound } of fit.parameters)
    if (bound !== undefined)
      found.push({
        code: 'at-bound',
        message: `${quantity} of layer ${layer} is held at its ${bound.side} bound: ${bound.reason}`,
      });
  if (family.outcome === 'limit')
    found.push({
      code: 'family-not-settled',
      message: 'the draws of the family hardly moved at some stage: its bands may be too narrow',
    });
  return found;
}

function layerDoubts(family: SoilFamily): SurveyDoubt[] {
  const degenerate = degenerateLayers(family);
  const open = family.parameters.filter(
    ({ resolved, layer }) => !resolved && !degenerate.some((one) => one.layer === layer),
  );
  return [
    ...degenerate.map(({ message }): SurveyDoubt => ({ code: 'degenerate-layer', message })),
    ...open.map(({ quantity, layer, low, high }): SurveyDoubt => {
      const range = `${Number(low.toPrecision(2))} to ${Number(high.toPrecision(2))} ${quantity === 'resistivity' ? 'Ω·m' : 'm'}`;
      return {
        code: 'unresolved',
        message: `the readings leave the ${quantity} of layer ${layer} open from ${range}, more than a factor of ${RESOLVED_RATIO}`,
      };
    }),
  ];
}

function traverseDoubts(readings: readonly Reading[], fit: FittedSurvey): SurveyDoubt[] {
  return traversesOf(readings).flatMap(({ name, shift, shared }): SurveyDoubt[] => {
    const error = fit.scatter / Math.sqrt(Math.max(1, shared));
    if (Math.abs(shift) <= Math.max(SHIFT, SHIFT_ERRORS * error)) return [];
    const percent = 100 * Math.expm1(shift);
    return [
      {
        code: 'traverses-differ',
        message: `traverse ${name === '' ? 'without a name' : name} reads ${Math.abs(percent).toFixed(0)} % ${percent > 0 ? 'above' : 'below'} the geometric mean of all traverses over ${shared} ${shared === 1 ? 'spacing' : 'spacings'}: the ground changes along the site; fit each traverse by itself too`,
      },
    ];
  });
}

function layersText(layers: number): string {
  return layers === 1 ? 'one layer' : `${layers} layers`;
}

function metres(value: number): string {
  return `${Number(value.toPrecision(3))} m`;
}
