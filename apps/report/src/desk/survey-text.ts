// Readings of a survey as a table: the columns that any row fills, in the order of the format.
import { surveyColumns, usualName } from '@ohmstead/study';
import type { PastedRow } from './paste.ts';
import { csvLine } from './table-text.ts';

/** The text of survey.csv for rows in SI. */
export function readingsText(rows: readonly PastedRow[]): string {
  const used = surveyColumns.filter(({ stem }) => rows.some((row) => row.has(stem)));
  const lines = rows.map((row) => csvLine(used.map(({ stem }) => String(row.get(stem) ?? ''))));
  return [csvLine(used.map(usualName)), ...lines, ''].join('\n');
}
