// Texts of a sheet as it stands against those of the sheet drawn again: every printed number, and the words between.
import { sameNumber } from './compare-results.ts';

export interface TextDifference {
  /** whether one printed number differs, or the words */
  readonly kind: 'number' | 'words';
  /** which of the texts as they stand */
  readonly index: number;
  readonly stored: string;
  readonly computed: string;
}

export interface TextComparison {
  readonly differences: readonly TextDifference[];
  /** printed numbers that stand where they should, whether they agree or not */
  readonly numbers: number;
}

/** A number as sheets print it: thin spaces between thousands, a proper minus, perhaps a power of ten. */
const PRINTED: RegExp = /[−-]?\d(?:[\d\u202f]*\d)?(?:\.\d+)?(?:·10⁻?[⁰¹²³⁴⁵⁶⁷⁸⁹]+)?/g;
const SUPERSCRIPTS = '⁰¹²³⁴⁵⁶⁷⁸⁹';
/** Words shown of a long stretch that has no counterpart. */
const MOST_SHOWN = 160;

/**
 * Compares texts pair by pair. Numbers that are rounding errors themselves, such as a balance, may differ between two
 * kinds of machine; the same tolerance as for results holds.
 * @param stored in the order of the page
 * @param computed of the sheet drawn again
 * @returns differences in the order of the page; a stretch that has more or fewer texts than its counterpart is one
 * difference of words
 */
export function compareTexts(stored: readonly string[], computed: readonly string[]): TextComparison {
  const differences: TextDifference[] = [];
  let numbers = 0;
  const pair = (index: number, a: string, b: string): void => {
    numbers += printedNumbers(a).length;
    differences.push(...pairDifferences(index, a, b));
  };
  if (stored.length === computed.length) {
    stored.forEach((text, index) => {
      pair(index, text, computed[index]!);
    });
    return { differences, numbers };
  }
  const shorter = Math.min(stored.length, computed.length);
  const same = (a: string | undefined, b: string | undefined): boolean =>
    a !== undefined && b !== undefined && pairDifferences(0, a, b).length === 0;
  let before = 0;
  while (before < shorter && same(stored[before], computed[before])) before++;
  let after = 0;
  while (after < shorter - before && same(stored.at(-1 - after), computed.at(-1 - after))) after++;
  const stretch = stored.slice(before, stored.length - after);
  for (const text of [...stored.slice(0, before), ...stored.slice(stored.length - after)])
    numbers += printedNumbers(text).length;
  differences.push({
    kind: 'words',
    index: Math.min(before, Math.max(0, stored.length - 1)),
    stored: shown(stretch),
    computed: shown(computed.slice(before, computed.length - after)),
  });
  return { differences, numbers };
}

function pairDifferences(index: number, a: string, b: string): TextDifference[] {
  if (a === b) return [];
  const [ours, theirs] = [printedNumbers(a), printedNumbers(b)];
  if (a.replaceAll(PRINTED, '#') !== b.replaceAll(PRINTED, '#'))
    return [{ kind: 'words', index, stored: shown([a]), computed: shown([b]) }];
  return ours.flatMap((stored, k): TextDifference[] => {
    const computed = theirs[k]!;
    return sameNumber(printedValue(stored), printedValue(computed))
      ? []
      : [{ kind: 'number', index, stored, computed }];
  });
}

function printedNumbers(text: string): readonly string[] {
  return text.match(PRINTED) ?? [];
}

function printedValue(printed: string): number {
  const [digits, power] = printed.replaceAll('\u202f', '').replace('−', '-').split('·10');
  const exponent = (power ?? '')
    .replace('⁻', '-')
    .replaceAll(/[⁰-⁹¹²³]/g, (c) => `${SUPERSCRIPTS.indexOf(c)}`);
  return Number(`${digits}e${exponent === '' ? '0' : exponent}`);
}

function shown(texts: readonly string[]): string {
  const text = texts.join(' ').trim();
  return text.length > MOST_SHOWN ? `${text.slice(0, MOST_SHOWN)}…` : text;
}
