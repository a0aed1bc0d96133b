// Results → the table for people: the answer first, then the electrode, each case against its limits, what to mind.

import { answerOf, subjectVoltage, type VerdictRow, verdictRows } from '@ohmstead/sheet';
import type { CaseResult, Results } from '@ohmstead/study';
import { aligned, type Column, wrapped } from './columns.ts';
import { groundLines, seasonLines } from './ground-lines.ts';
import { labelled, WIDTH } from './lines.ts';
import { fitted, measured, order, percent, place, quantity } from './number-text.ts';
import { printable } from './printable.ts';
import { toldWarnings } from './told-warnings.ts';

const INDENT = 2;

/** Numbers are never cut; what they are about gives way. */
const COLUMNS: readonly Column[] = [
  { align: 'left', most: 'rest' },
  { align: 'right', most: 24 },
  { align: 'left', most: 26 },
  { align: 'right', most: 12 },
  { align: 'right', most: 8 },
  { align: 'left', most: 10 },
];

const HEADER: readonly string[] = ['', 'worst', 'at', 'limit', 'of limit', ''];

const FINDING_WORDS = { within: 'within', beyond: 'EXCEEDS', undecided: 'undecided' } as const;

/**
 * The table that `solve` prints.
 * @param results of a study
 * @param emphasised makes text stand out where the terminal can; gives it back as it is elsewhere
 * @returns lines of at most 100 characters
 */
export function resultTable(results: Results, emphasised: (text: string) => string): string {
  const rows = verdictRows(results);
  const lines = [
    ...wrapped(printable(results.title), WIDTH).map(emphasised),
    ...wrapped(`${answer(results)} ${governing(rows)}`, WIDTH),
    '',
    ...about(results),
    '',
    ...voltages(results, rows, emphasised),
    '',
    ...seasonLines(results),
    ...closing(results),
  ];
  return `${lines.join('\n')}\n`;
}

/** The answer for the whole study in one sentence. */
function answer(results: Results): string {
  const { subject, predicate, rest } = answerOf(results);
  const words = `${subject} ${predicate}${rest === undefined ? '' : `; ${rest}`}.`;
  return words.charAt(0).toUpperCase() + words.slice(1);
}

/** What comes nearest to its limit, or farthest beyond it. */
function governing(rows: readonly VerdictRow[]): string {
  const row = rows.reduce((a, b) => (b.share > a.share ? b : a));
  const share = `${percent(row.share)} of the limit of ${quantity(row.limit, 'V')}`;
  const lead = row.worst > row.limit ? 'Farthest beyond' : 'Nearest to its limit';
  const what = `${printable(subjectVoltage(row))}, ${printable(row.caseName)}`;
  return `${lead}: ${what}, ${measured(row.worst, row.uncertainty, 'V')}, ${share}.`;
}

function about(results: Results): readonly string[] {
  const { electrode, electrodes, limits } = results;
  const { resistance_ohm: resistance, resistance_uncertainty_ohm: uncertainty } = electrode;
  const floating = electrodes.filter(({ role }) => role === 'floating').map(({ name }) => printable(name));
  const metal = `${quantity(electrode.conductor_length_m, 'm')} of metal, ${electrode.rod_count} ${electrode.rod_count === 1 ? 'rod' : 'rods'}`;
  return [
    ...labelled('Soil', soil(results)),
    ...groundLines(results),
    ...labelled(
      'Electrode',
      `${measured(resistance, uncertainty, 'Ω')} to remote earth; ${metal}, ${electrode.segment_count} segments`,
    ),
    ...(floating.length === 0 ? [] : labelled('Floating', floating.join(', '))),
    ...labelled(
      'Limits',
      `${limits.basis}, ${limits.body_mass_kg} kg; covering factor ${quantity(limits.covering_factor, '', 3).trim()}`,
    ),
  ];
}

/** Layers as given; those of a fit to three digits, more than readings tell. */
function soil({ soil: { layers }, limits, ground }: Results): string {
  const told = (value: number, unit: string): string =>
    ground === null ? `${value} ${unit}` : fitted(value, unit);
  const parts = layers.map(({ resistivity_ohm_m, thickness_m }) => {
    const resistivity = told(resistivity_ohm_m, 'Ω·m');
    if (thickness_m !== null) return `${told(thickness_m, 'm')} of ${resistivity}`;
    return layers.length === 1 ? `uniform, ${resistivity}` : `${resistivity} below`;
  });
  const { surfacing_resistivity_ohm_m: covering, surfacing_thickness_m: depth } = limits;
  const covered = covering === null || depth === null ? '' : `; covered by ${depth} m of ${covering} Ω·m`;
  return `${parts.join(', ')}${covered}`;
}

/** One block a case, its columns aligned with those of all other cases. */
function voltages(
  { cases }: Results,
  rows: readonly VerdictRow[],
  emphasised: (text: string) => string,
): readonly string[] {
  const cells = rows.map((row) => [
    printable(row.subject),
    measured(row.worst, row.uncertainty, 'V'),
    place(row.x, row.y),
    quantity(row.limit, 'V'),
    percent(row.share),
    FINDING_WORDS[row.finding],
  ]);
  const [header, ...body] = aligned(COLUMNS, [HEADER, ...cells], WIDTH - INDENT).map(
    (line) => `${' '.repeat(INDENT)}${line}`,
  );
  return cases.flatMap((one, at) => [
    ...(at === 0 ? [] : ['']),
    ...wrapped(caseLine(one), WIDTH, 2),
    header,
    ...body.filter((_, r) => rows[r].caseIndex === at).map((line) => line.replace(/EXCEEDS$/, emphasised)),
  ]);
}

function caseLine(one: CaseResult): string {
  const current = `${quantity(one.grid_current_A, 'A')} into the ground for ${one.duration_s} s`;
  return `${printable(one.name)}: ${current}; ground potential rise (GPR) ${measured(one.gpr_V, one.gpr_uncertainty_V, 'V')}`;
}

function closing(results: Results): readonly string[] {
  const { checks, assumptions, snaps, program_version: version } = results;
  const warnings = toldWarnings(results);
  const codes = [...new Set(warnings.map(({ code }) => printable(code)))].join(', ');
  const told = warnings.length === 0 ? 'none' : `${warnings.length}, told on standard error: ${codes}`;
  return [
    ...labelled(
      'Checks',
      `current balance ${order(Math.abs(checks.current_balance))}, residual ${order(checks.residual)}, both relative`,
    ),
    ...labelled(
      'Assumed',
      `${assumptions.length} assumptions, ${snaps.length} joints snapped; listed by --json and in the review pack`,
    ),
    ...labelled('Warnings', told),
    ...labelled(
      'Mind',
      `± is the numerical uncertainty alone. These are results of a calculation from the inputs given (Ohmstead ${printable(version)}); whether the installation is acceptable is for local codes and licensed practice to decide.`,
    ),
  ];
}
