// A check in words: all confirmed, or each number and sentence that is contradicted.
import type { Reply } from '../messages.ts';
import { button, element } from './element.ts';
import { partOf, showText } from './printed.ts';

/** Contradictions listed at most; another study differs in all its numbers, and a few tell as much. */
const MOST_LISTED = 40;

export type Check = Reply & { readonly kind: 'check' };

/** A count with a narrow space between thousands, as the sheet writes numbers. */
const grouped = (count: number): string => String(count).replaceAll(/\B(?=(?:\d{3})+$)/g, '\u202f');

const counted = (count: number, one: string, many: string): string =>
  `${grouped(count)} ${count === 1 ? one : many}`;

/** The check in a sentence or two. */
export function summaryOf({ results, printed }: Check): string {
  const beyond = results.differences.length + printed.differences.length;
  const numbers = results.numbers + printed.numbers;
  if (beyond === 0)
    return (
      `All ${counted(numbers, 'number', 'numbers')} confirmed: ${grouped(printed.numbers)} printed in this sheet, ` +
      `and ${grouped(results.numbers)} of its results to the last digits that two machines share.`
    );
  return (
    `Contradicted in ${counted(beyond, 'place', 'places')} of ${counted(numbers, 'number', 'numbers')} compared: ` +
    `${grouped(printed.differences.length)} in this sheet, marked where they stand, and ` +
    `${grouped(results.differences.length)} in the results it carries.`
  );
}

/** Each contradiction with both values; those of the sheet lead to their place. */
export function contradictionList({ results, printed }: Check, texts: readonly Text[]): HTMLElement {
  const lines: Node[] = [
    ...printed.differences.map(({ kind, index, stored, computed }) => {
      const text = texts[index];
      const said =
        kind === 'number'
          ? `${stored} is printed, ${computed} is computed`
          : `“${stored}” is printed, “${computed}” follows`;
      const line = element('li', {}, `${partOf(text)}: ${said}`);
      if (text !== undefined)
        line.append(
          ' ',
          button('Show', () => showText(text)),
        );
      return line;
    }),
    ...results.differences.map((difference) =>
      element(
        'li',
        {},
        difference.kind === 'result'
          ? `Results, ${difference.path}: ${difference.stored} on record, ${difference.computed} computed`
          : difference.path,
      ),
    ),
  ];
  const more = lines.length - MOST_LISTED;
  const list = element('ul', {}, ...lines.slice(0, MOST_LISTED));
  if (more > 0) list.append(element('li', {}, `and ${grouped(more)} more`));
  return list;
}
