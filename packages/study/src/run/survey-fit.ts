// Field readings → layered soil with the family of soils that the readings allow, as the results tell it.
import {
  bandOf,
  FAMILY_METHOD,
  type FamilyMember,
  type FittedSurvey,
  type FourPinArray,
  invertSurvey,
  medianDepth,
  proposeLayerCount,
  type Reading,
  type SoilModel,
  soilFamily,
  soundingBand,
  spacingOf,
  surveyDoubts,
} from '@ohmstead/core';
import { InputFaults } from '../fault.ts';
import type { FittedLayer, GroundReading, SoilFit, SoundingPoint, Spread } from '../ground.ts';
import type { LoadedSurvey } from '../study.ts';

/** Draws of starts and family are seeded with this; it is stored with the result. */
const SEED = 20_260_101;
/** Points of the fitted curve and its band, a decade. */
const CURVE_POINTS_PER_DECADE = 12;
/** The curve is drawn this much past the shortest and longest spacing. */
const CURVE_MARGIN = 1.5;

export interface SurveyFit {
  readonly fit: SoilFit;
  readonly model: SoilModel;
  /** soils that fit within the readings' scatter, closest first */
  readonly members: readonly FamilyMember[];
}

/**
 * Fits layers to a survey.
 * @param layerCount as asked; `auto` takes the number that the criterion proposes
 * @throws InputFaults where the readings allow no such fit
 */
export function fitSurvey(survey: LoadedSurvey, layerCount: number | 'auto'): SurveyFit {
  const { readings, file } = survey;
  const proposal = proposeLayerCount(readings, { seed: SEED });
  const count = layerCount === 'auto' ? proposal.layers : layerCount;
  if (count === undefined) throw new InputFaults([{ file, code: 'no-readings', message: proposal.reason }]);
  const known = proposal.candidates.find((candidate) => candidate.layers === count);
  const fitted = known?.fit ?? invertSurvey(readings, count, { seed: SEED });
  if (fitted.kind === 'refused')
    throw new InputFaults([{ file, code: fitted.code, message: fitted.message }]);
  const family = soilFamily(readings, fitted, { seed: SEED });
  const curve = curveArrays(readings);
  const fittedCurve = soundingBand([fitted.soil], curve);
  const band = soundingBand(
    family.members.map(({ soil }) => soil),
    curve,
  );
  return {
    model: fitted.soil,
    members: family.members,
    fit: {
      survey_file: file,
      outcome: fitted.outcome,
      layer_count: count,
      layer_count_proposed: proposal.layers ?? count,
      layer_count_criterion: proposal.reason,
      trials: proposal.candidates.map(({ layers, fit, criterion }) => ({
        layer_count: layers,
        rms_percent: fit.rmsPercent,
        criterion,
      })),
      rms_percent: fitted.rmsPercent,
      layers: fittedLayers(fitted, family.members),
      readings: readingResults(readings, fitted),
      sounding: curve.map(
        (array, i): SoundingPoint => ({
          spacing_m: spacingOf(array),
          fitted_ohm_m: fittedCurve[i]!.median,
          low_ohm_m: band[i]!.low,
          high_ohm_m: band[i]!.high,
        }),
      ),
      family: {
        count: family.members.length,
        seed: SEED,
        method: FAMILY_METHOD,
      },
      resolved_depth_m: Math.max(...readings.map((reading) => medianDepth(reading.array))),
      resolved_depth_rule: 'median depth of investigation of the longest array (Edwards 1977)',
      doubts: [
        ...survey.cautions.map(({ row, code, message }) => ({ code, message: `${file}:${row}: ${message}` })),
        ...surveyDoubts(readings, fitted, family),
      ],
    },
  };
}

function fittedLayers(fitted: FittedSurvey, members: readonly FamilyMember[]): FittedLayer[] {
  return fitted.soil.layers.map((layer, i): FittedLayer => {
    const spread = (best: number, pick: (soil: SoilModel) => number): Spread => ({
      best,
      ...bandOf(members.map((member) => pick(member.soil))),
    });
    return {
      resistivity_ohm_m: spread(layer.resistivity, (soil) => soil.layers[i]!.resistivity),
      thickness_m: Number.isFinite(layer.thickness)
        ? spread(layer.thickness, (soil) => soil.layers[i]!.thickness)
        : null,
    };
  });
}

function readingResults(readings: readonly Reading[], fitted: FittedSurvey): GroundReading[] {
  return readings.map((reading, i): GroundReading => {
    const { modelled, relative, outlier } = fitted.fits[i]!;
    return {
      line: reading.row,
      traverse: reading.traverse,
      spacing_m: spacingOf(reading.array),
      apparent_resistivity_ohm_m: reading.apparentResistivity,
      model_ohm_m: modelled,
      misfit_percent: 100 * relative,
      outlier,
    };
  });
}

/** Wenner arrays over the range of spacings, on which the curve and its band are drawn. */
function curveArrays(readings: readonly Reading[]): FourPinArray[] {
  const spacings = readings.map((reading) => spacingOf(reading.array));
  const from = Math.min(...spacings) / CURVE_MARGIN;
  const to = Math.max(...spacings) * CURVE_MARGIN;
  const steps = Math.max(1, Math.ceil(Math.log10(to / from) * CURVE_POINTS_PER_DECADE));
  return Array.from({ length: steps + 1 }, (_, k) => ({
    kind: 'wenner',
    spacing: from * (to / from) ** (k / steps),
    pinDepth: 0,
  }));
}
