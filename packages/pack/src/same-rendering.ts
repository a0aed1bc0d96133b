// Whether an entry is what the recomputed study gives: byte by byte, but numbers of tables and of the sheet as numbers.
import { sameNumber } from './compare-results.ts';
import { compareTexts } from './compare-texts.ts';
import { aroundSheet, sheetTags, sheetTexts } from './sheet-texts.ts';

/** A number as tables write it: all its digits, perhaps with an exponent. */
const NUMBER: RegExp = /-?\d+(?:\.\d+)?(?:e[+-]?\d+)?/g;

/**
 * The last digits of a number differ between two kinds of machine, as in the results: tables hold them all, and the
 * sheet tells rounding errors such as the balance. Figures, markup and the program in a page have to be the same bytes.
 * @param path of the entry, whose ending tells what it is
 */
export function sameRendering(path: string, expected: Uint8Array, found: Uint8Array): boolean {
  if (expected.length === found.length && expected.every((byte, index) => byte === found[index])) return true;
  if (path.endsWith('.csv')) return sameTable(text(expected), text(found));
  return path.endsWith('.html') && sameSheet(text(expected), text(found));
}

function sameTable(expected: string, found: string): boolean {
  if (expected.replaceAll(NUMBER, '#') !== found.replaceAll(NUMBER, '#')) return false;
  const numbers = found.match(NUMBER) ?? [];
  return (expected.match(NUMBER) ?? []).every((one, k) => sameNumber(Number(one), Number(numbers[k])));
}

function sameSheet(expected: string, found: string): boolean {
  const [ours, theirs] = [aroundSheet(expected), aroundSheet(found)];
  if (ours === undefined || ours !== theirs) return false;
  if (sheetTags(expected).join('') !== sheetTags(found).join('')) return false;
  return compareTexts(sheetTexts(found), sheetTexts(expected)).differences.length === 0;
}

function text(content: Uint8Array): string {
  return new TextDecoder().decode(content);
}
