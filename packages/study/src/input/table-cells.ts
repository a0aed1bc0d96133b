// Cells of a table as quantities in SI units and as names, faults located by line and column.
import type { Fault } from '../fault.ts';
import type { CsvRow } from './csv-rows.ts';
import { LONGEST_NAME } from './limits.ts';
import { readNumber } from './number-text.ts';
import { figure, invisibleCharacter, shown } from './shown-value.ts';
import type { FoundColumn } from './table-columns.ts';
import { toSi } from './units.ts';

/** Says what is wrong with a value that is a number: `value` in SI units, `text` as the cell has it. */
export type QuantityRule = (value: number, text: string) => { code: string; message: string } | undefined;

/** A rule for plan coordinates and the like: at most `largest` in size, `unit` for the message. */
export function withinSize(largest: number, unit: string): QuantityRule {
  return (value, text) => {
    if (Math.abs(value) <= largest) return undefined;
    return {
      code: 'range',
      message: `${shown(text)} is beyond ${figure(largest)} ${unit}; check the unit in the column name`,
    };
  };
}

/**
 * Reads the cell of a quantity.
 * @param file name for the faults
 * @param row the row
 * @param column its column, with unit
 * @param rule judges the value
 * @param faults gets what is wrong with the cell
 * @returns the value in SI units; NaN after a fault
 */
export function readQuantity(
  file: string,
  row: CsvRow,
  column: FoundColumn,
  rule: QuantityRule,
  faults: Fault[],
): number {
  const text = row.cells[column.index];
  const reading = readNumber(text);
  const place = column.name;
  if (reading.kind === 'fault') {
    faults.push({ file, line: row.line, place, code: reading.code, message: reading.message });
    return Number.NaN;
  }
  const value = column.unit === undefined ? reading.value : toSi(reading.value, column.unit);
  const broken = rule(value, text);
  if (broken === undefined) return value;
  faults.push({ file, line: row.line, place, ...broken });
  return Number.NaN;
}

/**
 * Reads the cell of a name. Names are taken as they are; only what cannot be seen, or fills a page, is refused.
 * @returns the name, empty where the cell is blank or after a fault
 */
export function readName(file: string, row: CsvRow, column: FoundColumn, faults: Fault[]): string {
  const text = row.cells[column.index];
  const invisible = invisibleCharacter(text);
  const add = (code: string, message: string): string => {
    faults.push({ file, line: row.line, place: column.name, code, message });
    return '';
  };
  if (invisible !== undefined) {
    return add(
      'name-character',
      `${shown(text)} has the invisible character ${invisible}; expected visible text`,
    );
  }
  if (text.length > LONGEST_NAME) {
    return add(
      'name-length',
      `${shown(text)} has ${text.length} characters; at most ${LONGEST_NAME} are read`,
    );
  }
  return text;
}
