// What differs between the results of two states: resistance, rise, worst voltages and what governs.
import type { CaseResult, EnvelopeCase, Results, WorstTouch } from '@ohmstead/study';
import { type Difference, differing } from './difference.ts';

/** The narrowest margin of a state: in which case, by which voltage, where and in which season. */
interface Governing {
  readonly words: string;
  readonly marginPercent: number;
}

/** The worst of a case over the seasons, where there are any; met by place, as the envelope lists the cases. */
function worstOf(results: Results, at: number): Pick<EnvelopeCase, 'touch' | 'step'> | CaseResult {
  return results.envelope[at] ?? results.cases[at]!;
}

function isSeasonal(worst: WorstTouch): worst is WorstTouch & { readonly season: string } {
  return 'season' in worst && typeof worst.season === 'string';
}

/** Decimals of a place in words, m, as in the sheet. */
const PLACE_DECIMALS = 1;

function governing(results: Results): Governing | undefined {
  const all = results.cases.flatMap(({ name }, i) => {
    const { touch, step } = worstOf(results, i);
    return [
      { name, voltage: 'touch', worst: touch },
      { name, voltage: 'step', worst: step },
    ];
  });
  const [first, ...others] = all;
  if (first === undefined) return undefined;
  const least = others.reduce((a, b) => (b.worst.margin_percent < a.worst.margin_percent ? b : a), first);
  const { name, voltage, worst } = least;
  const place = `(${worst.x_m.toFixed(PLACE_DECIMALS)}, ${worst.y_m.toFixed(PLACE_DECIMALS)}) m`;
  const season = isSeasonal(worst) ? `, ${worst.season}` : '';
  return { words: `${voltage} voltage of ${name} at ${place}${season}`, marginPercent: worst.margin_percent };
}

function sum(a: number | undefined, b: number | undefined): number | undefined {
  return a === undefined || b === undefined ? undefined : a + b;
}

function voltageLines(
  what: string,
  before: WorstTouch | undefined,
  after: WorstTouch | undefined,
): readonly Difference[] {
  const share = (one: WorstTouch | undefined): number | undefined => one && (100 * one.worst_V) / one.limit_V;
  const shareBand = (one: WorstTouch | undefined): number | undefined =>
    one && (100 * one.uncertainty_V) / one.limit_V;
  const verdict = (one: WorstTouch | undefined): string | undefined =>
    one && (one.within_limit ? 'within the limit' : 'beyond the limit');
  return [
    ...differing({
      what: `worst ${what}`,
      kind: 'voltage',
      before: before?.worst_V,
      after: after?.worst_V,
      uncertainty: sum(before?.uncertainty_V, after?.uncertainty_V),
    }),
    ...differing({
      what: `limit of the ${what}`,
      kind: 'voltage',
      before: before?.limit_V,
      after: after?.limit_V,
    }),
    ...differing({
      what: `${what}, share of its limit`,
      kind: 'percent',
      before: share(before),
      after: share(after),
      uncertainty: sum(shareBand(before), shareBand(after)),
    }),
    ...differing({
      what: `verdict on the ${what}`,
      kind: 'text',
      before: verdict(before),
      after: verdict(after),
    }),
  ];
}

function caseLines(before: Results, after: Results, name: string): readonly Difference[] {
  const find = ({ cases }: Results): number => cases.findIndex((one) => one.name === name);
  const [i, j] = [find(before), find(after)];
  const [was, is] = [before.cases[i], after.cases[j]];
  const [wasWorst, isWorst] = [was && worstOf(before, i), is && worstOf(after, j)];
  return [
    ...differing({
      what: `grid current of ${name}`,
      kind: 'current',
      before: was?.grid_current_A,
      after: is?.grid_current_A,
    }),
    ...differing({
      what: `ground potential rise of ${name}`,
      kind: 'voltage',
      before: was?.gpr_V,
      after: is?.gpr_V,
      uncertainty: sum(was?.gpr_uncertainty_V, is?.gpr_uncertainty_V),
    }),
    ...voltageLines(`touch voltage of ${name}`, wasWorst?.touch, isWorst?.touch),
    ...voltageLines(`step voltage of ${name}`, wasWorst?.step, isWorst?.step),
  ];
}

/** What differs in the results, in the order of the sheet; cases are met by their names. */
export function resultDifferences(before: Results, after: Results): readonly Difference[] {
  const names = [...new Set([...after.cases, ...before.cases].map(({ name }) => name))];
  const [was, is] = [governing(before), governing(after)];
  return [
    ...differing({
      what: 'resistance',
      kind: 'resistance',
      before: before.electrode.resistance_ohm,
      after: after.electrode.resistance_ohm,
      uncertainty: before.electrode.resistance_uncertainty_ohm + after.electrode.resistance_uncertainty_ohm,
    }),
    ...names.flatMap((name) => caseLines(before, after, name)),
    ...differing({ what: 'what governs', kind: 'text', before: was?.words, after: is?.words }),
    ...differing({
      what: 'narrowest margin',
      kind: 'percent',
      before: was?.marginPercent,
      after: is?.marginPercent,
    }),
  ];
}
