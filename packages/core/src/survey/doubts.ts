// What an engineer should doubt about a fitted survey, in words.

import { bandOf, RESOLVED_RATIO, type SoilFamily } from './ambiguity.ts';
import { spacingOf } from './arrays.ts';
import type { FittedSurvey } from './inversion.ts';
import type { Reading } from './readings.ts';

export interface SurveyDoubt {
  readonly code:
    | 'no-layered-model'
    | 'poor-fit'
    | 'degenerate-layer'
    | 'unresolved'
    | 'inversion-not-settled'
    | 'at-bound'
    | 'family-not-settled'
    | 'outliers'
    | 'spacings-short';
  readonly message: string;
}

/** Misfit beyond which layers do not explain the readings, % (common practice, no source: under 5 % is good, over 10 % asks for more layers). */
const NO_MODEL_PERCENT = 25;
const POOR_PERCENT = 10;

export function surveyDoubts(
  readings: readonly Reading[],
  fit: FittedSurvey,
  family: SoilFamily,
): readonly SurveyDoubt[] {
  return [
    ...misfitDoubts(fit),
    ...endingDoubts(fit, family),
    ...layerDoubts(fit, family),
    ...outlierDoubts(readings, fit),
  ];
}

/** A survey whose spacings end before the electrode does cannot tell the ground that decides its resistance. */
export function spacingDoubts(readings: readonly Reading[], diagonal: number): readonly SurveyDoubt[] {
  const longest = Math.max(...readings.map((reading) => spacingOf(reading.array)));
  if (longest >= diagonal) return [];
  return [
    {
      code: 'spacings-short',
      message: `spacings end at ${longest} m, short of the electrode's diagonal of ${diagonal.toFixed(0)} m: the deep ground that decides its resistance is known only as far as the family tells`,
    },
  ];
}

function misfitDoubts(fit: FittedSurvey): SurveyDoubt[] {
  const rms = fit.rmsPercent.toFixed(1);
  if (fit.rmsPercent > NO_MODEL_PERCENT)
    return [
      {
        code: 'no-layered-model',
        message: `no layered model of ${fit.soil.layers.length} layers fits these readings: misfit ${rms} % rms; look for buried metal, lateral change or wrong rows before using any`,
      },
    ];
  if (fit.rmsPercent > POOR_PERCENT)
    return [
      {
        code: 'poor-fit',
        message: `the model misses the readings by ${rms} % rms; try more layers or look at the outliers`,
      },
    ];
  return [];
}

function endingDoubts(fit: FittedSurvey, family: SoilFamily): SurveyDoubt[] {
  const found: SurveyDoubt[] = [];
  if (fit.outcome === 'stalled' || fit.outcome === 'limit')
    found.push({ code: 'inversion-not-settled', message: `the fit ended without settling (${fit.outcome})` });
  for (const { quantity, layer, bound } of fit.parameters)
    if (bound !== undefined)
      found.push({
        code: 'at-bound',
        message: `${quantity} of layer ${layer} is held at its ${bound.side} bound: ${bound.reason}`,
      });
  if (family.outcome === 'limit')
    found.push({
      code: 'family-not-settled',
      message: 'the draws of the family still drifted when their number ran out: its bands may be too narrow',
    });
  return found;
}

/** Layers of which only one combination is told: ρ·t of a thin resistive one, t/ρ of a thin conductive one. */
function layerDoubts(fit: FittedSurvey, family: SoilFamily): SurveyDoubt[] {
  const soils = family.members.map((member) => member.soil);
  const resolved = (values: readonly number[]): boolean => {
    const { low, high } = bandOf(values);
    return high <= RESOLVED_RATIO * low;
  };
  return fit.soil.layers.flatMap((_, i): SurveyDoubt[] => {
    const rho = soils.map((soil) => soil.layers[i]!.resistivity);
    if (resolved(rho)) return [];
    const { low, high } = bandOf(rho);
    const range = `${low.toPrecision(3)} to ${high.toPrecision(3)} Ω·m`;
    if (i === 0 || i === fit.soil.layers.length - 1)
      return [
        {
          code: 'unresolved',
          message: `the readings leave the resistivity of layer ${i + 1} open from ${range}`,
        },
      ];
    const thickness = soils.map((soil) => soil.layers[i]!.thickness);
    const product = resolved(rho.map((r, k) => r * thickness[k]!));
    const ratio = resolved(rho.map((r, k) => thickness[k]! / r));
    if (!product && !ratio)
      return [
        {
          code: 'unresolved',
          message: `the readings leave the resistivity of layer ${i + 1} open from ${range}`,
        },
      ];
    const told = product ? 'resistivity times thickness' : 'thickness over resistivity';
    return [
      {
        code: 'degenerate-layer',
        message: `layer ${i + 1} is degenerate: the readings tell its ${told} but not its resistivity, which may be anything from ${range}; a thinner layer of more extreme resistivity fits as well`,
      },
    ];
  });
}

function outlierDoubts(readings: readonly Reading[], fit: FittedSurvey): SurveyDoubt[] {
  const rows = readings.filter((_, i) => fit.fits[i]!.outlier).map((reading) => reading.row);
  if (rows.length === 0) return [];
  return [
    {
      code: 'outliers',
      message: `readings in row ${rows.join(', ')} stand off the model by more than 2.5 robust standard deviations; they are used with less weight, not dropped`,
    },
  ];
}
