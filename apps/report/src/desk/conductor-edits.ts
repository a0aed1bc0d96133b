// Edits of the conductors: added, changed, moved, copied and deleted in the files that hold them.
import { conductorTables, type RowOrigin } from '@ohmstead/study';
import type { Conductor, ConductorKey } from './conductor.ts';
import { type ConductorFile, cellNumber, cellText, conductorFile } from './conductor-file.ts';
import { newTableText, type Values, written } from './conductor-rows.ts';
import { type Draft, withFile, withoutFile } from './draft.ts';
import { insertItem, listAt, setList } from './set-value.ts';
import { recordLines, type TableText, tableBytes, withoutRecords } from './table-text.ts';

/** A draft with rows added, and where they stand. */
export interface Placed {
  readonly draft: Draft;
  readonly rows: readonly RowOrigin[];
}

/** East, north and downward, m. */
export interface Shift {
  readonly dx: number;
  readonly dy: number;
  readonly ddepth?: number | undefined;
}

const FIRST_TABLE = 'conductors.csv';
const TABLES = ['conductors'] as const;

interface Table extends ConductorFile {
  readonly path: string;
}

/** The tables of a study that can be read as tables, in their order. */
function tablesOf(draft: Draft): readonly Table[] {
  return conductorTables(draft.study).flatMap((path): readonly Table[] => {
    const bytes = draft.files.get(path);
    const file = bytes === undefined ? undefined : conductorFile(bytes);
    return file === undefined ? [] : [{ ...file, path }];
  });
}

function withText(draft: Draft, path: string, text: TableText): Draft {
  return withFile(draft, path, tableBytes(text));
}

/** Records of the rows named, by table. */
function recordsOf(
  draft: Draft,
  rows: readonly RowOrigin[],
): readonly { table: Table; records: readonly number[] }[] {
  const tables = new Map(tablesOf(draft).map((table) => [table.path, table]));
  const found = new Map<string, number[]>();
  for (const { file, line } of rows) {
    const record = tables.get(file)?.recordOnLine.get(line);
    if (record === undefined) throw new RangeError(`no conductor on line ${line} of ${file}`);
    found.set(file, [...(found.get(file) ?? []), record]);
  }
  return [...found].flatMap(([path, records]) => {
    const table = tables.get(path);
    return table === undefined ? [] : [{ table, records }];
  });
}

/** The table that new rows go to: the one asked for, the first, or a new one. */
function targetTable(draft: Draft, asked: string | undefined): { draft: Draft; table: Table } {
  const tables = tablesOf(draft);
  const table = tables.find(({ path }) => path === asked) ?? tables[0];
  if (table !== undefined) return { draft, table };
  const path = freePath(draft);
  return { draft: insertItem(draft, TABLES, listAt(draft, TABLES).length, path), table: newTable(path) };
}

/** A table with a header and no rows. */
function newTable(path: string): Table {
  const file = conductorFile(new TextEncoder().encode(newTableText()));
  if (file === undefined) throw new Error('a new table of conductors cannot be read');
  return { ...file, path };
}

function freePath(draft: Draft): string {
  const listed = conductorTables(draft.study);
  for (let n = 1; ; n++) {
    const path = n === 1 ? FIRST_TABLE : FIRST_TABLE.replace('.', `-${n}.`);
    if (!draft.files.has(path) && !listed.includes(path)) return path;
  }
}

/** Every id that a row has. */
export function idsOf(draft: Draft): ReadonlySet<string> {
  return new Set(
    tablesOf(draft).flatMap((table) =>
      [...table.recordOnLine.values()].map((record) => cellText(table, record, 'id')),
    ),
  );
}

/**
 * Adds conductors after the last row of a table.
 * @param conductors in SI; their ids are to be free (see `shapes.ts`)
 * @param path of the table; the first one where undefined, a new `conductors.csv` where the study has none
 * @returns the draft and the new rows, in the order given
 */
export function addConductors(draft: Draft, conductors: readonly Conductor[], path?: string): Placed {
  if (conductors.length === 0) return { draft, rows: [] };
  const { draft: ready, table } = targetTable(draft, path);
  const text = written(table, new Map(), conductors);
  const last = text.records.findLastIndex(({ cells }) => cells !== undefined);
  const lines = recordLines(text).slice(last + 1 - conductors.length, last + 1);
  return {
    draft: withText(ready, table.path, text),
    rows: lines.map((line) => ({ file: table.path, line })),
  };
}

/**
 * Changes values of one conductor.
 * @param values in SI; undefined blanks a cell; cells that hold the value already keep their text
 * @throws RangeError where no conductor stands on that line: a fault of the caller, as in all functions here
 */
export function setConductor(draft: Draft, row: RowOrigin, values: Values): Draft {
  return setConductors(draft, [row], () => values);
}

/** Changes values of conductors, each by its own. */
export function setConductors(
  draft: Draft,
  rows: readonly RowOrigin[],
  valuesOf: (conductor: Conductor) => Values,
): Draft {
  return recordsOf(draft, rows).reduce((next, { table, records }) => {
    const changes = new Map(records.map((record) => [record, valuesOf(conductorOf(table, record))]));
    return withText(next, table.path, written(table, changes));
  }, draft);
}

/** Sets the text of one cell as it was typed, whether or not it can be read. */
export function setCell(draft: Draft, row: RowOrigin, key: ConductorKey, text: string): Draft {
  const typed = { [key]: text.trim() };
  return recordsOf(draft, [row]).reduce((next, { table, records }) => {
    return withText(next, table.path, written(table, new Map(records.map((record) => [record, typed]))));
  }, draft);
}

/** The conductor of a row as far as its cells can be read: numbers that cannot are NaN. */
function conductorOf(file: ConductorFile, record: number): Conductor {
  const number = (key: ConductorKey): number => cellNumber(file, record, key);
  const text = (key: ConductorKey): string | undefined => {
    const cell = cellText(file, record, key);
    return cell === '' ? undefined : cell;
  };
  const insulated = text('insulated');
  const resistance = number('resistance');
  return {
    id: text('id'),
    x1: number('x1'),
    y1: number('y1'),
    depth1: number('depth1'),
    x2: number('x2'),
    y2: number('y2'),
    depth2: number('depth2'),
    diameter: number('diameter'),
    material: text('material'),
    electrode: text('electrode'),
    insulated: insulated === 'yes' ? true : insulated === 'no' ? false : undefined,
    resistance: Number.isNaN(resistance) ? undefined : resistance,
  };
}

/** The conductors of rows, in SI. */
export function conductorsAt(draft: Draft, rows: readonly RowOrigin[]): readonly Conductor[] {
  const tables = new Map(tablesOf(draft).map((table) => [table.path, table]));
  return rows.map(({ file, line }) => {
    const table = tables.get(file);
    const record = table?.recordOnLine.get(line);
    if (table === undefined || record === undefined)
      throw new RangeError(`no conductor on line ${line} of ${file}`);
    return conductorOf(table, record);
  });
}

function shifted({ x1, y1, depth1, x2, y2, depth2 }: Conductor, { dx, dy, ddepth = 0 }: Shift): Values {
  // a cell that holds no number is left as it is
  const readable = (values: Values): Values =>
    Object.fromEntries(Object.entries(values).filter(([, value]) => !Number.isNaN(value)));
  return readable({
    x1: x1 + dx,
    y1: y1 + dy,
    depth1: depth1 + ddepth,
    x2: x2 + dx,
    y2: y2 + dy,
    depth2: depth2 + ddepth,
  });
}

/** Moves conductors. */
export function moveConductors(draft: Draft, rows: readonly RowOrigin[], shift: Shift): Draft {
  return setConductors(draft, rows, (conductor) => shifted(conductor, shift));
}

/** Copies conductors, shifted, each into the table of the one it copies and after its last row, under free ids. */
export function copyConductors(draft: Draft, rows: readonly RowOrigin[], shift: Shift): Placed {
  const ids = idsOf(draft);
  return recordsOf(draft, rows).reduce<Placed>(
    (done, { table, records }) => {
      const copies = records.map((record): Conductor => {
        const conductor = conductorOf(table, record);
        return { ...conductor, ...shifted(conductor, shift), id: copyId(conductor.id, ids) };
      });
      const placed = addConductors(done.draft, copies, table.path);
      return { draft: placed.draft, rows: [...done.rows, ...placed.rows] };
    },
    { draft, rows: [] },
  );
}

/** A free id after that of the original, `EW-01` → `EW-01-2`; none where the original has none. */
export function copyId(id: string | undefined, taken: ReadonlySet<string>): string | undefined {
  if (id === undefined) return undefined;
  for (let n = 2; ; n++) {
    const tried = `${id}-${n}`;
    if (!taken.has(tried)) return tried;
  }
}

/** Deletes conductors; a table that holds no other goes too, unless it is the only one. */
export function deleteConductors(draft: Draft, rows: readonly RowOrigin[]): Draft {
  return recordsOf(draft, rows).reduce((next, { table, records }) => {
    const gone = new Set(records);
    const paths = listAt(next, TABLES);
    if (gone.size === table.recordOnLine.size && paths.length > 1) {
      return setList(
        withoutFile(next, table.path),
        TABLES,
        paths.filter((path) => path !== table.path),
      );
    }
    return withText(next, table.path, withoutRecords(table.text, gone));
  }, draft);
}

/**
 * Replaces every conductor of a table: its header and what stands above it stay, so that columns and units are those of
 * the file; rows and the lines between them go. A file that is no table is begun anew.
 * @param path of the table; the first one where undefined, a new `conductors.csv` where the study has none
 */
export function replaceConductors(draft: Draft, conductors: readonly Conductor[], path?: string): Draft {
  const target = path ?? conductorTables(draft.study)[0];
  if (target === undefined) return addConductors(draft, conductors).draft;
  const table = tablesOf(draft).find((one) => one.path === target) ?? newTable(target);
  const { records } = table.text;
  const below = new Set(records.map((_, i) => i).filter((i) => i > table.header));
  const emptied = {
    ...table,
    text: withoutRecords(table.text, below),
    recordOnLine: new Map<number, number>(),
  };
  return withText(draft, target, written(emptied, new Map(), conductors));
}
