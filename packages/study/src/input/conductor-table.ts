// Rows of all tables as one conductor table, ids unique.
import type { ConductorTable } from '@ohmstead/core';
import type { Fault } from '../fault.ts';
import type { ConductorRow } from './conductors-csv.ts';
import { quoted } from './shown-value.ts';

/** Name of a row: its id, or its place in the table as text. */
function idOf(row: ConductorRow, index: number): string {
  return row.id === '' ? String(index + 1) : row.id;
}

/**
 * Faults of ids over all tables: two rows of one name, given or counted.
 * @param rows of all tables in order
 * @returns one fault for each row whose name another has before it
 */
export function idFaults(rows: readonly ConductorRow[]): readonly Fault[] {
  const first = new Map<string, ConductorRow>();
  return rows.flatMap((row, index): readonly Fault[] => {
    const id = idOf(row, index);
    const other = first.get(id);
    if (other === undefined) {
      first.set(id, row);
      return [];
    }
    const where = `${other.file}:${other.line}`;
    const counted = row.id === '' ? `the place ${quoted(id)} of this row without id` : quoted(id);
    const message = `${counted} is also the ${other.id === '' ? 'place' : 'id'} of ${where}; expected each id once`;
    return [{ file: row.file, line: row.line, place: 'id', code: 'id-twice', message }];
  });
}

/**
 * The conductor table of a study.
 * @param rows of all tables in order, without faults
 * @returns struct of arrays, shape [rows.length]; SI units
 */
export function conductorTable(rows: readonly ConductorRow[]): ConductorTable {
  const column = (of: (row: ConductorRow) => number): Float64Array => Float64Array.from(rows, of);
  return {
    count: rows.length,
    id: rows.map(idOf),
    x1: column((row) => row.x1),
    y1: column((row) => row.y1),
    depth1: column((row) => row.depth1),
    x2: column((row) => row.x2),
    y2: column((row) => row.y2),
    depth2: column((row) => row.depth2),
    radius: column((row) => row.diameter / 2),
    material: rows.map((row) => row.material),
    electrode: rows.map((row) => row.electrode),
    insulated: Uint8Array.from(rows, (row) => (row.insulated ? 1 : 0)),
    resistancePerMetre: column((row) => row.resistancePerMetre),
  };
}
