// What results tell of a soil that was fitted to a survey, and of other seasons, in a line each.
import type { EnvelopeCase, Results, SeasonResult } from '@ohmstead/study';
import { aligned, type Column } from './columns.ts';
import { fitEnding } from './fit-ending.ts';
import { labelled, WIDTH } from './lines.ts';
import { measured, percent, range } from './number-text.ts';
import { printable } from './printable.ts';

const COLUMNS: readonly Column[] = [
  { align: 'left', most: 'rest' },
  { align: 'right', most: 24 },
  { align: 'right', most: 16 },
  { align: 'right', most: 16 },
];
const INDENT = 2;

/** The fit and what its ignorance does to the resistance; nothing where the study gives the layers. */
export function groundLines({ ground }: Results): readonly string[] {
  if (ground === null) return [];
  const { fit, consequence } = ground;
  const layers = `${fit.layer_count} ${fit.layer_count === 1 ? 'layer' : 'layers'}`;
  return labelled(
    'Ground',
    `${layers} fitted to ${printable(fit.survey_file)}, misfit ${percent(fit.rms_percent / 100)} rms, ${fitEnding(fit.outcome)}; over the soils that the readings allow the resistance is ${range(consequence.resistance_ohm, 'Ω')} (5 to 95 %)`,
  );
}

/** Each season with its case that comes nearest to the limits, then the season that governs each case; nothing where there are none. */
export function seasonLines({ seasons, envelope }: Results): readonly string[] {
  if (seasons.length === 0) return [];
  const header = ['', 'resistance', 'touch of limit', 'step of limit'];
  const lines = aligned(COLUMNS, [header, ...seasons.map(seasonCells)], WIDTH - INDENT);
  return [
    'Other seasons',
    ...lines.map((line) => `${' '.repeat(INDENT)}${line}`),
    ...labelled('Governing', ...envelope.map(governing)),
    '',
  ];
}

function seasonCells(season: SeasonResult): readonly string[] {
  const share = (kind: 'touch' | 'step'): number =>
    Math.max(...season.cases.map((one) => one[kind].worst_V / one[kind].limit_V));
  return [
    printable(season.name),
    measured(season.resistance_ohm, season.resistance_uncertainty_ohm, 'Ω'),
    percent(share('touch')),
    percent(share('step')),
  ];
}

function governing({ name, gpr, touch, step }: EnvelopeCase): string {
  return `${printable(name)}: touch ${printable(touch.season)}, step ${printable(step.season)}, rise ${printable(gpr.season)}`;
}
