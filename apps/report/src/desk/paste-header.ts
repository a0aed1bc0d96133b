// The header row of pasted text: which column of the table each cell names, and in which unit.
import { listed, nearestName, quoted, shown } from '@ohmstead/study';
import type { PasteColumn } from './paste-columns.ts';
import type { PasteComplaint } from './paste-complaint.ts';
import { kinds } from './quantity.ts';
import { dimensionWords, type TypedUnit, typedUnit } from './unit-names.ts';

export interface Found {
  readonly column: PasteColumn;
  readonly unit: TypedUnit | undefined;
}

function plainName(name: string): string {
  return name.toLowerCase().replace(/[^\p{L}\p{N}]/gu, '');
}

/** The name and the unit of a header cell: `thickness_m`, `layer thickness (m)`, `thickness, ft`. */
function nameAndUnit(cell: string, columns: readonly PasteColumn[]): readonly (readonly [string, string])[] {
  const bracket =
    /^(.*?)\s*[([]\s*([^()[\]]+?)\s*[)\]]$/.exec(cell) ?? /^(.*?)\s*[,/]\s*([^,/]+)$/.exec(cell);
  const suffixes = columns.flatMap(({ stem }): readonly (readonly [string, string])[] =>
    cell.toLowerCase().startsWith(`${stem}_`) ? [[stem, cell.slice(stem.length + 1)]] : [],
  );
  return [
    ...suffixes,
    ...(bracket === null ? [] : [[bracket[1] ?? '', bracket[2] ?? ''] as const]),
    [cell, ''],
  ];
}

function columnNamed(name: string, columns: readonly PasteColumn[]): PasteColumn | undefined {
  const plain = plainName(name);
  if (plain === '') return undefined;
  return columns.find(({ key, stem, label, others = [] }) =>
    [key, stem, label, ...others].some((known) => plainName(known) === plain),
  );
}

/** The column that a header cell names, or what is wrong with the name. */
function columnOf(cell: string, columns: readonly PasteColumn[]): Found | string {
  for (const [name, unitText] of nameAndUnit(cell, columns)) {
    const column = columnNamed(name, columns);
    if (column === undefined) continue;
    if (unitText === '' || column.kind === 'text' || column.kind === 'yes-no')
      return { column, unit: undefined };
    const unit = typedUnit(unitText);
    if (unit === undefined) return `${quoted(unitText)} is not a unit known here`;
    if (unit.dimension === kinds[column.kind].dimension) return { column, unit };
    return `${unit.symbol} is ${dimensionWords(unit.dimension)}; ${column.label} is ${kinds[column.kind].words}`;
  }
  const known = columns.map(({ key }) => key);
  const near = nearestName(cell, known);
  return `no column of this table goes by this name; ${near === undefined ? `known are ${listed(known)}` : `${near} is probably meant`}`;
}

/**
 * The columns that a header tells.
 * @param complaints gets names and units that are not known, columns given twice, and columns that are missing
 * @returns by place; undefined under a blank name and one that is complained of
 */
export function headerColumns(
  { line, cells }: { readonly line: number; readonly cells: readonly string[] },
  columns: readonly PasteColumn[],
  complaints: PasteComplaint[],
): readonly (Found | undefined)[] {
  const given = new Set<string>();
  const found = cells.map((cell, i): Found | undefined => {
    if (cell === '') return undefined;
    const one = columnOf(cell, columns);
    if (typeof one === 'string') {
      complaints.push({ line, column: `column ${i + 1}`, value: cell, message: `${shown(cell)}: ${one}` });
      return undefined;
    }
    if (given.has(one.column.key)) {
      const message = `${one.column.label} is given twice; expected each column once`;
      complaints.push({ line, column: `column ${i + 1}`, value: cell, message });
      return undefined;
    }
    given.add(one.column.key);
    return one;
  });
  if (complaints.length > 0) return found;
  for (const { key, label, required } of columns) {
    if (!required || given.has(key)) continue;
    complaints.push({ line, column: key, value: '', message: `the column is missing; expected ${label}` });
  }
  return found;
}
