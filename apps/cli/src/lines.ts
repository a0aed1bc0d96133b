// Lines of the tables that commands print: their width, and a label before text.
import { wrapped } from './columns.ts';

/** Characters of a line. */
export const WIDTH = 100;
const LABEL = 12;

/** A label and text behind it, on as many lines as it takes; more paragraphs follow without a label. */
export function labelled(label: string, ...paragraphs: readonly string[]): readonly string[] {
  return paragraphs
    .flatMap((text) => wrapped(text, WIDTH - LABEL))
    .map((line, index) => `${(index === 0 ? label : '').padEnd(LABEL)}${line}`);
}
