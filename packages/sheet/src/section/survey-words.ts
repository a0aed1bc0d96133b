// The sentences about a survey: what the readings allow, how the fit ended, what no reading tells.
import type { DisplayUnits, FittedLayer, SoilFit } from '@ohmstead/study';
import { band, bandQuantity, outsideBand } from '../format/fitted.ts';
import { bandLength, fittedLength, surveyedLength, surveyedNumber } from '../format/fitted-length.ts';
import { lengthUnit } from '../format/length.ts';
import { percent } from '../format/number.ts';
import { counted, countWord, listed } from '../format/words.ts';

/** `0.5 to 32 m`. */
export function spacingRange({ readings }: SoilFit, units: DisplayUnits): string {
  const spacings = readings.map((reading) => reading.spacing_m);
  return `${surveyedNumber(Math.min(...spacings), units)} to ${surveyedLength(Math.max(...spacings), units)}`;
}

export function traverseCount({ readings }: SoilFit): number {
  return new Set(readings.map((reading) => reading.traverse)).size;
}

const ORDINALS: readonly string[] = ['first', 'second', 'third', 'fourth', 'fifth'];

function ordinal(k: number): string {
  return ORDINALS[k] ?? `${k + 1}th`;
}

/** `178–231 Ω·m above and 41–62 Ω·m below, the interface at 1.4–1.8 m`. */
function allowed(layers: readonly FittedLayer[], units: DisplayUnits): string {
  const rho = layers.map((layer) => bandQuantity(layer.resistivity_ohm_m, 'Ω·m'));
  if (layers.length === 1) return rho[0];
  if (layers.length === 2) {
    const { thickness_m } = layers[0];
    const depth = thickness_m === null ? '' : `, the interface at ${bandLength(thickness_m, units)}`;
    return `${rho[0]} above and ${rho[1]} below${depth}`;
  }
  return listed(
    layers.map(({ thickness_m }, k) => {
      if (thickness_m === null) return `${rho[k]} below`;
      return `${rho[k]} in the ${ordinal(k)} layer of ${bandLength(thickness_m, units)}`;
    }),
  );
}

/** What the middle nine tenths of the soils that fit leave open. */
export function allowedSentence({ layers }: SoilFit, units: DisplayUnits): string {
  return `The readings allow ${allowed(layers, units)} (5–95\u202f% of the soils that fit within their scatter).`;
}

/** Quantities whose best fit lies outside the band; undefined where there are none. */
export function outsideSentence({ layers }: SoilFit): string | undefined {
  const outside = layers.flatMap((layer, k) => [
    ...(outsideBand(layer.resistivity_ohm_m) ? [`the resistivity of layer ${k + 1}`] : []),
    ...(layer.thickness_m !== null && outsideBand(layer.thickness_m)
      ? [`the thickness of layer ${k + 1}`]
      : []),
  ]);
  if (outside.length === 0) return undefined;
  return `The best fit itself lies outside that band in ${listed(outside)}: most soils that fit about as well lie elsewhere.`;
}

/** How the fit ended, as the beginning of a sentence. */
export function endingWords(outcome: string): string {
  switch (outcome) {
    case 'converged':
      return 'The fit converged';
    case 'at-bound':
      return 'The fit converged with a layer at a bound of what was tried';
    case 'stalled':
      return 'The fit stalled before its least misfit was found, so that closer soils may exist';
    case 'limit':
      return 'The fit was stopped at the limit of its steps, so that closer soils may exist';
    default:
      return `The fit ended as “${outcome}”`;
  }
}

/** Who chose the number of layers, behind the request: `auto: three, …`. */
export function choiceWords(fit: SoilFit, asked: number | 'auto' | undefined): string {
  const { layer_count: taken, layer_count_proposed: proposed } = fit;
  if (asked === 'auto' || asked === undefined)
    return `was left to the readings: ${countWord(taken)}, as the criterion proposes`;
  return taken === proposed
    ? `was asked for; the criterion proposes as many`
    : `was asked for; the criterion would take ${countWord(proposed)}`;
}

/** What the depth that readings resolve means beside the size of the metal. */
export function depthSentence(fit: SoilFit, diagonal: number, units: DisplayUnits): string {
  const depth = fittedLength(fit.resolved_depth_m, units);
  const size = fittedLength(diagonal, units);
  return fit.resolved_depth_m >= diagonal
    ? `The readings resolve the ground to about ${depth}, deeper than the diagonal of the electrode, ${size}.`
    : `The readings resolve the ground to about ${depth}; the diagonal of the electrode is ${size}. What lies deeper counts in its resistance and is told only by the trend of the curve.`;
}

/** Doubt where no spacing is as short as the metal is deep; undefined otherwise. Common practice, no source. */
export function shortSpacingSentence(
  fit: SoilFit,
  shallowest: number | undefined,
  units: DisplayUnits,
): string | undefined {
  const shortest = Math.min(...fit.readings.map((reading) => reading.spacing_m));
  if (shallowest === undefined || shortest <= shallowest) return undefined;
  return `The shortest spacing, ${surveyedLength(shortest, units)}, is longer than the metal is deep, ${surveyedLength(shallowest, units)}: no reading tells the top of the ground by itself, which decides touch and step voltages.`;
}

/** What no reading tells; common practice, no source. */
export const FIELD_CAUTIONS: readonly string[] = [
  'Buried metal beside a traverse – a pipe, a cable sheath, a fence, this electrode itself – carries part of the current, and the ground reads better than it is. Readings along it and across it differ.',
  'Spacings have to begin as short as the metal is deep, because the top of the ground decides touch and step voltages, and to reach as far as the electrode, because the deep ground decides its resistance.',
  'The readings hold for the day they were taken. Drought, frost and rain change the top metre or two by several times; other seasons have to be solved for themselves.',
  'A pin in poor contact, or current and potential leads laid side by side, falsify a reading and leave no trace in the table. What stands out is to be read again, not struck out.',
];

/** Facts for the margin. */
export function surveyFacts(fit: SoilFit): readonly string[] {
  const traverses = traverseCount(fit);
  return [
    `${fit.readings.length} readings${traverses > 1 ? `, ${counted(traverses, 'traverse')}` : ''}`,
    `misfit ${percent(fit.rms_percent / 100)}`,
    `${fit.family.count} soils in the family`,
  ];
}

/** `1.37–1.79`, or a word for ground without a bottom. */
export function thicknessBand({ thickness_m }: FittedLayer, units: DisplayUnits): string {
  if (thickness_m === null) return 'to any depth';
  const { metres } = lengthUnit(units);
  return band({ low: thickness_m.low / metres, high: thickness_m.high / metres });
}
