// The conductors of a draft as the plan shows them: those whose places can be read, with the rows that hold them.
import { conductorTables, type RowOrigin } from '@ohmstead/study';
import { type Conductor, isRod } from '../desk/conductor.ts';
import { conductorsAt } from '../desk/conductor-edits.ts';
import { conductorFile } from '../desk/conductor-file.ts';
import type { Draft } from '../desk/draft.ts';

export interface PlanItem {
  readonly row: RowOrigin;
  /** tells rows apart: `file:line` */
  readonly key: string;
  readonly conductor: Conductor;
  readonly rod: boolean;
}

export function rowKey({ file, line }: RowOrigin): string {
  return `${file}:${line}`;
}

/** In the order of the tables; a row whose places cannot be read is only in its table. */
export function planItems(draft: Draft): readonly PlanItem[] {
  const rows = conductorTables(draft.study).flatMap((file): RowOrigin[] => {
    const bytes = draft.files.get(file);
    const table = bytes === undefined ? undefined : conductorFile(bytes);
    return table === undefined ? [] : [...table.recordOnLine.keys()].map((line) => ({ file, line }));
  });
  return conductorsAt(draft, rows).flatMap((conductor, k): PlanItem[] => {
    const { x1, y1, x2, y2 } = conductor;
    const row = rows[k]!;
    if (![x1, y1, x2, y2].every(Number.isFinite)) return [];
    return [{ row, key: rowKey(row), conductor, rod: isRod(conductor) }];
  });
}

/** What a conductor is called: its id, or where it stands. */
export function itemName({ conductor: { id }, rod, row }: PlanItem): string {
  return `${rod ? 'rod' : 'conductor'} ${id ?? `in row ${row.line} of ${row.file}`}`;
}

/** Rows that still hold a conductor, after an edit or its undoing. */
export function standing(draft: Draft, rows: readonly RowOrigin[]): readonly RowOrigin[] {
  return rows.filter(({ file, line }) => {
    const bytes = draft.files.get(file);
    return bytes !== undefined && conductorFile(bytes)?.recordOnLine.has(line) === true;
  });
}
