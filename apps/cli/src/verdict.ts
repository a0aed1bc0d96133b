// Every worst voltage against its limit, and the answer of a study in words.
import type { CaseResult, ElectrodeResult, Results } from '@ohmstead/study';

/** `undecided`: the limit lies within the numerical uncertainty of the voltage. */
export type Finding = 'within' | 'beyond' | 'undecided';

export interface VerdictRow {
  /** index into results.cases */
  readonly at: number;
  /** `touch`, `step`, `touch at fence` */
  readonly subject: string;
  /** magnitude, V */
  readonly worst: number;
  readonly uncertainty: number;
  readonly limit: number;
  readonly x: number;
  readonly y: number;
  readonly finding: Finding;
}

/** All comparisons, case by case: touch, step, then floating metal against the limit of touch. */
export function verdictRows({ cases, electrodes }: Results): readonly VerdictRow[] {
  return cases.flatMap((one, at) => [
    ...(['touch', 'step'] as const).map((subject) => {
      const { worst_V: worst, uncertainty_V: uncertainty, limit_V: limit, x_m: x, y_m: y } = one[subject];
      return { at, subject, worst, uncertainty, limit, x, y, finding: findingOf(worst, uncertainty, limit) };
    }),
    ...electrodes.flatMap((metal) => floatingRow(at, one, metal) ?? []),
  ]);
}

/** Floating metal states its worst voltage as a share of the rise; both carry an uncertainty. */
function floatingRow(at: number, one: CaseResult, metal: ElectrodeResult): VerdictRow | undefined {
  if (metal.touch_ratio === null) return undefined;
  const ratio = Math.abs(metal.touch_ratio);
  const worst = ratio * one.gpr_V;
  const uncertainty = metal.potential_uncertainty_ratio * one.gpr_V + ratio * one.gpr_uncertainty_V;
  const limit = one.touch.limit_V;
  const [x, y] = [metal.touch_x_m ?? Number.NaN, metal.touch_y_m ?? Number.NaN];
  const finding = findingOf(worst, uncertainty, limit);
  return { at, subject: `touch at ${metal.name}`, worst, uncertainty, limit, x, y, finding };
}

function findingOf(worst: number, uncertainty: number, limit: number): Finding {
  if (!(Math.abs(limit - worst) >= uncertainty)) return 'undecided';
  return worst <= limit ? 'within' : 'beyond';
}

/** The answer for the whole study in one sentence. */
export function answer(results: Results): string {
  const rows = verdictRows(results);
  const total = results.cases.length;
  const has = (at: number, finding: Finding): boolean =>
    rows.some((row) => row.at === at && row.finding === finding);
  const beyond = results.cases.filter((_, at) => has(at, 'beyond')).length;
  const open = results.cases.filter((_, at) => has(at, 'undecided') && !has(at, 'beyond')).length;
  const undecided = 'cannot be decided at this mesh';
  if (beyond > 0) {
    const rest = open === 0 ? '' : `; ${words(open)} more ${undecided}`;
    return `${some(beyond, total)} ${beyond === 1 ? 'exceeds' : 'exceed'} a limit${rest}.`;
  }
  if (open > 0) {
    const rest =
      open === total ? '' : `; ${total - open === 1 ? 'the other is' : 'the others are'} within the limits`;
    return `${some(open, total)} ${undecided}${rest}.`;
  }
  return total === 1 ? 'The case is within its limits.' : `${some(total, total)} are within their limits.`;
}

function some(count: number, total: number): string {
  const phrase =
    total === 1
      ? 'the case'
      : count < total
        ? `${words(count)} of ${words(total)} cases`
        : total === 2
          ? 'both cases'
          : `all ${words(total)} cases`;
  return phrase.charAt(0).toUpperCase() + phrase.slice(1);
}

const COUNTS = [
  'no',
  'one',
  'two',
  'three',
  'four',
  'five',
  'six',
  'seven',
  'eight',
  'nine',
  'ten',
  'eleven',
  'twelve',
];

function words(count: number): string {
  return COUNTS[count] ?? String(count);
}
