// Faults in the order in which people mend them: file by file, line by line, endless repetitions counted.
import type { Fault } from '../fault.ts';
import { MOST_ALIKE_FAULTS } from './limits.ts';

function compareText(a: string, b: string): number {
  return a < b ? -1 : a > b ? 1 : 0;
}

/** What counts as one kind: the same code in one column or one part of study.json, whichever item of a list. */
function kindOf({ file, place, code }: Fault): string {
  // the place of an unknown key is that key; all of them are of one kind
  const part = code === 'unknown-key' || place === undefined ? '' : place.replace(/\[\d+\]/g, '[]');
  return `${file}\n${part}\n${code}`;
}

/** Lists the first `MOST_ALIKE_FAULTS` of a kind at one place of one file and counts the others in one fault. */
function withRepetitionsCounted(faults: readonly Fault[]): readonly Fault[] {
  const total = new Map<string, number>();
  for (const fault of faults) total.set(kindOf(fault), (total.get(kindOf(fault)) ?? 0) + 1);
  const passed = new Map<string, number>();
  return faults.flatMap((fault) => {
    const kind = kindOf(fault);
    const before = passed.get(kind) ?? 0;
    passed.set(kind, before + 1);
    if (before < MOST_ALIKE_FAULTS) return [fault];
    if (before > MOST_ALIKE_FAULTS) return [];
    const rest = (total.get(kind) ?? 0) - MOST_ALIKE_FAULTS;
    return [{ ...fault, message: `from here on ${rest} more faults of this kind, not listed` }];
  });
}

/**
 * Faults sorted by file (study.json first, then by name) and line; within a line they keep their order.
 * @param faults as found
 * @param firstFile the file listed before all others
 * @returns a new list; past `MOST_ALIKE_FAULTS` of one kind in one column the rest is told by number
 */
export function orderedFaults(faults: readonly Fault[], firstFile: string): readonly Fault[] {
  const rank = (fault: Fault): number => (fault.file === firstFile ? 0 : 1);
  const ordered = [...faults].sort(
    (a, b) => rank(a) - rank(b) || compareText(a.file, b.file) || (a.line ?? 0) - (b.line ?? 0),
  );
  return withRepetitionsCounted(ordered);
}
