// Says the answer of the whole sheet in words, for the title block.
import type { DisplayUnits, Results } from '@ohmstead/study';
import { place } from '../format/length.ts';
import { measured, percent, quantity } from '../format/number.ts';
import { capital, countWord } from '../format/words.ts';
import { type Finding, findingWords } from './finding.ts';
import { type VerdictRow, verdictRows } from './rows.ts';
import { casesLeftOpen } from './soil-band.ts';

export interface Answer {
  /** `one of three cases` */
  readonly subject: string;
  /** `exceeds a limit` */
  readonly predicate: string;
  /** what the first line leaves open: `one more cannot be decided at this mesh` */
  readonly rest: string | undefined;
  readonly finding: Finding;
}

/** Worst finding of each case: beyond before undecided before within. */
function findingByCase(results: Results): readonly Finding[] {
  const rows = verdictRows(results);
  return results.cases.map((_, index) => {
    const found = rows.filter((r) => r.caseIndex === index).map((r) => r.finding);
    if (found.includes('beyond')) return 'beyond';
    return found.includes('undecided') ? 'undecided' : 'within';
  });
}

function some(count: number, total: number): string {
  if (total === 1) return 'the case';
  if (count < total) return `${countWord(count)} of ${countWord(total)} cases`;
  return total === 2 ? 'both cases' : `all ${countWord(total)} cases`;
}

/** What the first line leaves open: mesh, then soil. */
function restOf(mesh: string | undefined, results: Results): string | undefined {
  const open = casesLeftOpen(results);
  const cases = open === 1 ? 'one case' : `${countWord(open)} cases`;
  const soil = open > 0 ? `at the best fit; the soil readings leave ${cases} open` : undefined;
  const parts = [mesh, soil].filter((part) => part !== undefined);
  return parts.length > 0 ? parts.join('; ') : undefined;
}

/** The answer of the sheet from the findings of all its cases, at the best fit of the soil. */
export function answerOf(results: Results): Answer {
  const found = findingByCase(results);
  const total = found.length;
  const beyond = found.filter((f) => f === 'beyond').length;
  const open = found.filter((f) => f === 'undecided').length;
  if (beyond > 0) {
    const predicate = beyond === 1 ? 'exceeds a limit' : 'exceed a limit';
    const rest = open > 0 ? `${countWord(open)} more cannot be decided at this mesh` : undefined;
    return { subject: some(beyond, total), predicate, rest: restOf(rest, results), finding: 'beyond' };
  }
  if (open > 0) {
    const others = total - open;
    const rest =
      others > 0 ? `${others === 1 ? 'the other is' : 'the others are'} within the limits` : undefined;
    return {
      subject: some(open, total),
      predicate: 'cannot be decided at this mesh',
      rest: restOf(rest, results),
      finding: 'undecided',
    };
  }
  const [verb, whose] = total === 1 ? ['is', 'its'] : ['are', 'their'];
  return {
    subject: `${some(total, total)} ${verb}`,
    predicate: `within ${whose} limits`,
    rest: restOf(undefined, results),
    finding: 'within',
  };
}

/** `touch voltage`, `step voltage`, `touch voltage at fence`. */
export function subjectVoltage(row: VerdictRow): string {
  return row.subject.replace(/^(touch|step)/, '$1 voltage');
}

function sentence(row: VerdictRow, units: DisplayUnits): string {
  const worst = measured(row.worst, row.uncertainty, 'V');
  const against =
    row.finding === 'beyond'
      ? findingWords(row).replace('the limit', `the limit of ${quantity(row.limit, 'V')}`)
      : `cannot be decided at this mesh against the limit of ${quantity(row.limit, 'V')}`;
  return `${row.caseName}: the worst ${subjectVoltage(row)}, ${worst} at ${place(row.x, row.y, units)}, ${against}.`;
}

/** At most this many single findings are told at the top; the table under People has them all. */
const MOST_SENTENCES = 3;

/** The findings behind the answer, worst first, then the narrowest margin of what is within. */
export function answerSentences(results: Results, units: DisplayUnits = 'SI'): readonly string[] {
  const rows = [...verdictRows(results)].sort((a, b) => b.share - a.share || a.caseIndex - b.caseIndex);
  const told = rows.filter((r) => r.finding !== 'within');
  const within = rows.filter((r) => r.finding === 'within');
  const lines = told.slice(0, MOST_SENTENCES).map((row) => sentence(row, units));
  const more = told.length - lines.length;
  if (more > 0) lines.push(`${capital(countWord(more))} more under People.`);
  if (within.length > 0) {
    const near = within[0];
    const margin = percent(1 - near.share);
    const lead = told.length > 0 ? 'Everything else is within its limit; the' : 'The';
    lines.push(`${lead} narrowest margin is ${margin}, ${subjectVoltage(near)}, ${near.caseName}.`);
  }
  return lines;
}
