// A fit of layers to a survey → the table for people: the layers first, then the readings behind them, what to mind.
import type { FittedLayer, GroundReading, SoilFit } from '@ohmstead/study';
import { aligned, type Column, wrapped } from './columns.ts';
import { fitEnding } from './fit-ending.ts';
import { labelled, WIDTH } from './lines.ts';
import { fitted, percent, range } from './number-text.ts';
import { printable } from './printable.ts';

const INDENT = 2;
/** Digits of a distance as it was given. */
const GIVEN_DIGITS = 4;

const LAYER_COLUMNS: readonly Column[] = [
  { align: 'left', most: 8 },
  { align: 'right', most: 14 },
  { align: 'left', most: 28 },
  { align: 'right', most: 12 },
  { align: 'left', most: 26 },
];
const TRIAL_COLUMNS: readonly Column[] = [
  { align: 'right', most: 6 },
  { align: 'right', most: 16 },
  { align: 'right', most: 10 },
  { align: 'left', most: 20 },
];
const READING_COLUMNS: readonly Column[] = [
  { align: 'right', most: 6 },
  { align: 'left', most: 'rest' },
  { align: 'right', most: 12 },
  { align: 'right', most: 14 },
  { align: 'right', most: 14 },
  { align: 'right', most: 10 },
  { align: 'left', most: 8 },
];

/** What no reading tells; said with every fit. */
function fieldCautions(shortest: number, longest: number): readonly string[] {
  return [
    'Buried metal beside a traverse (pipes, cables, fences, the electrode itself) carries part of the current and makes the ground look better than it is. Readings taken along it and across it differ.',
    `The ground near the surface decides touch and step voltages: spacings as short as the electrode is deep are needed, and as long as it is wide. Here the shortest is ${distance(shortest)}, the longest ${distance(longest)}.`,
    'The readings hold for the day of the survey. Dry, frozen and wet ground differ by several times in the top metre or two; solve other seasons too.',
    'A pin in poor contact, or current and potential leads that lie side by side, falsify a reading without a trace in the table. Repeat what stands out.',
  ];
}

/**
 * The table that `soil` prints.
 * @param fit of layers to a survey
 * @param version of the program
 * @returns lines of at most 100 characters
 */
export function soilTable(fit: SoilFit, version: string): string {
  const spacings = fit.readings.map(({ spacing_m }) => spacing_m);
  const [shortest, longest] = [Math.min(...spacings), Math.max(...spacings)];
  const lines = [
    ...wrapped(heading(fit, shortest, longest), WIDTH),
    ...wrapped(sentence(fit), WIDTH),
    '',
    ...layerLines(fit.layers),
    '',
    ...trialLines(fit),
    '',
    ...readingLines(fit),
    '',
    ...labelled(
      'Family',
      `${fit.family.count} soils that fit within the scatter of the readings; ${printable(fit.family.method)}, seed ${fit.family.seed}`,
    ),
    ...labelled(
      'Depth',
      `resolved to ${fitted(fit.resolved_depth_m, 'm')}: ${printable(fit.resolved_depth_rule)}`,
    ),
    ...labelled(
      'Doubts',
      ...(fit.doubts.length === 0
        ? ['none']
        : fit.doubts.map(({ code, message }) => `${printable(message)} (${printable(code)})`)),
    ),
    ...labelled('Field', ...fieldCautions(shortest, longest)),
    ...labelled(
      'Mind',
      `A soil of flat layers is a model (Ohmstead ${printable(version)}). How many readings a site needs is for local codes and licensed practice to decide.`,
    ),
  ];
  return `${lines.join('\n')}\n`;
}

function counted(count: number, one: string): string {
  return `${count} ${one}${count === 1 ? '' : 's'}`;
}

function heading({ survey_file, readings }: SoilFit, shortest: number, longest: number): string {
  const traverses = new Set(readings.map(({ traverse }) => traverse)).size;
  const lines = traverses > 1 ? ` on ${counted(traverses, 'traverse')}` : '';
  const reach =
    shortest === longest
      ? `spacing ${distance(shortest)}`
      : `spacings ${distance(shortest)} to ${distance(longest)}`;
  return `${printable(survey_file)}: ${counted(readings.length, 'reading')}${lines}, ${reach}`;
}

function sentence({ layer_count, layer_count_proposed, rms_percent, outcome }: SoilFit): string {
  const ending = `misfit ${percent(rms_percent / 100)} rms; ${fitEnding(outcome)}.`;
  const other = layer_count === layer_count_proposed ? '' : ` The readings call for ${layer_count_proposed}.`;
  return `${counted(layer_count, 'layer')}, ${ending}${other}`;
}

/** As a field sheet has it, without the digits that a change of unit adds. */
function distance(metres: number): string {
  return `${Number(metres.toPrecision(GIVEN_DIGITS))} m`;
}

function misfit(percents: number): string {
  const text = percents.toFixed(1);
  if (Number(text) === 0) return '0.0 %';
  return `${percents > 0 ? '+' : ''}${text} %`;
}

function layerLines(layers: readonly FittedLayer[]): readonly string[] {
  const rows = layers.map(({ resistivity_ohm_m: rho, thickness_m: thick }, i) => [
    `layer ${i + 1}`,
    fitted(rho.best, 'Ω·m'),
    range(rho, 'Ω·m'),
    thick === null ? '' : fitted(thick.best, 'm'),
    thick === null ? 'to any depth' : range(thick, 'm'),
  ]);
  return indented(
    aligned(LAYER_COLUMNS, [['', 'resistivity', '5 to 95 %', 'thickness', '5 to 95 %'], ...rows]),
  );
}

function trialLines(fit: SoilFit): readonly string[] {
  const rows = fit.trials.map(({ layer_count, rms_percent, criterion }) => [
    String(layer_count),
    percent(rms_percent / 100),
    criterion.toFixed(1),
    [
      layer_count === fit.layer_count_proposed ? 'proposed' : '',
      layer_count === fit.layer_count ? 'taken' : '',
    ]
      .filter((word) => word !== '')
      .join(', '),
  ]);
  return [
    ...indented(aligned(TRIAL_COLUMNS, [['layers', 'misfit', 'criterion', ''], ...rows])),
    ...wrapped(printable(fit.layer_count_criterion), WIDTH - INDENT).map((line) => ' '.repeat(INDENT) + line),
  ];
}

function readingLines({ readings }: SoilFit): readonly string[] {
  const rows = readings.map((reading: GroundReading) => [
    String(reading.line),
    printable(reading.traverse),
    distance(reading.spacing_m),
    fitted(reading.apparent_resistivity_ohm_m, 'Ω·m'),
    fitted(reading.model_ohm_m, 'Ω·m'),
    misfit(reading.misfit_percent),
    reading.outlier ? 'OUTLIER' : '',
  ]);
  const header = ['line', 'traverse', 'spacing', 'read', 'fitted', 'misfit', ''];
  return indented(aligned(READING_COLUMNS, [header, ...rows], WIDTH - INDENT));
}

function indented(lines: readonly string[]): readonly string[] {
  return lines.map((line) => ' '.repeat(INDENT) + line);
}
