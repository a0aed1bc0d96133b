// Results → the table for people: the answer first, then the electrode, each case against its limits, what to mind.
import type { CaseResult, Results } from '@ohmstead/study';
import { aligned, type Column, wrapped } from './columns.ts';
import { measured, order, percent, place, quantity } from './number-text.ts';
import { printable } from './printable.ts';
import { answer, type VerdictRow, verdictRows } from './verdict.ts';

/** Characters of a line. */
const WIDTH = 100;
const LABEL = 12;

/** The widest cells together with the gaps and the indent stay within WIDTH. */
const COLUMNS: readonly Column[] = [
  { align: 'left', most: 20 },
  { align: 'right', most: 16 },
  { align: 'left', most: 23 },
  { align: 'right', most: 9 },
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
    ...wrapped(`${answer(results)} ${governing(results, rows)}`, WIDTH),
    '',
    ...about(results),
    '',
    ...voltages(results, rows, emphasised),
    '',
    ...closing(results),
  ];
  return `${lines.join('\n')}\n`;
}

/** What comes nearest to its limit, or farthest beyond it. */
function governing({ cases }: Results, rows: readonly VerdictRow[]): string {
  const row = rows.reduce((a, b) => (b.worst / b.limit > a.worst / a.limit ? b : a));
  const subject = printable(row.subject).replace(/^(touch|step)/, '$1 voltage');
  const share = `${percent(row.worst / row.limit)} of the limit of ${quantity(row.limit, 'V')}`;
  const name = printable(cases[row.at].name);
  const lead = row.worst > row.limit ? 'Farthest beyond' : 'Nearest to its limit';
  return `${lead}: ${subject}, ${name}, ${measured(row.worst, row.uncertainty, 'V')}, ${share}.`;
}

function labelled(label: string, text: string): readonly string[] {
  return wrapped(text, WIDTH - LABEL).map(
    (line, index) => `${(index === 0 ? label : '').padEnd(LABEL)}${line}`,
  );
}

function about(results: Results): readonly string[] {
  const { electrode, electrodes, limits } = results;
  const { resistance_ohm: resistance, resistance_uncertainty_ohm: uncertainty } = electrode;
  const floating = electrodes.filter(({ role }) => role === 'floating').map(({ name }) => printable(name));
  const metal = `${quantity(electrode.conductor_length_m, 'm')} of metal, ${electrode.rod_count} ${electrode.rod_count === 1 ? 'rod' : 'rods'}`;
  return [
    ...labelled('Soil', soil(results)),
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

function soil({ soil: { layers }, limits }: Results): string {
  const parts = layers.map(({ resistivity_ohm_m: resistivity, thickness_m: thickness }) => {
    if (thickness !== null) return `${thickness} m of ${resistivity} Ω·m`;
    return layers.length === 1 ? `uniform, ${resistivity} Ω·m` : `${resistivity} Ω·m below`;
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
    percent(row.worst / row.limit),
    FINDING_WORDS[row.finding],
  ]);
  const [header, ...body] = aligned(COLUMNS, [HEADER, ...cells]).map((line) => `  ${line}`);
  return cases.flatMap((one, at) => [
    ...(at === 0 ? [] : ['']),
    ...wrapped(caseLine(one), WIDTH, 2),
    header,
    ...body.filter((_, r) => rows[r].at === at).map((line) => line.replace(/EXCEEDS$/, emphasised)),
  ]);
}

function caseLine(one: CaseResult): string {
  const current = `${quantity(one.grid_current_A, 'A')} into the ground for ${one.duration_s} s`;
  return `${printable(one.name)}: ${current}; ground potential rise (GPR) ${measured(one.gpr_V, one.gpr_uncertainty_V, 'V')}`;
}

function closing({
  checks,
  warnings,
  assumptions,
  snaps,
  program_version: version,
}: Results): readonly string[] {
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
