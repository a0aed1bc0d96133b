// One row of survey.csv: where the pins stood and what was read, in SI units.
import type { FourPinArray, SurveyRow } from '@ohmstead/core';
import type { Fault } from '../fault.ts';
import type { CsvRow } from './csv-rows.ts';
import { LARGEST_COORDINATE_M, LARGEST_PIN_DISTANCE_M } from './limits.ts';
import { listed, shown } from './shown-value.ts';
import { type ArrayColumns, arrayColumns, columnsFor, readingColumns } from './survey-columns.ts';
import { type QuantityRule, readName, readQuantity, withinSize } from './table-cells.ts';
import type { FoundColumn, FoundColumns } from './table-columns.ts';

const distanceSize = withinSize(LARGEST_PIN_DISTANCE_M, 'm');
const distanceRule: QuantityRule = (value, text) => {
  if (value > 0) return distanceSize(value, text);
  return { code: 'spacing', message: `${shown(text)} is not a positive length` };
};
const placeRule = withinSize(LARGEST_COORDINATE_M, 'm');
const pinDepthRule: QuantityRule = (value, text) => {
  if (value >= 0) return distanceSize(value, text);
  return {
    code: 'above-surface',
    message: `${shown(text)} is above the soil surface; depths are positive downward`,
  };
};
/** Signs and sizes are judged with the places of the pins. */
const anyNumber: QuantityRule = () => undefined;

const rules: ReadonlyMap<string, QuantityRule> = new Map([
  ['spacing', distanceRule],
  ['ab_half', distanceRule],
  ['mn_half', distanceRule],
  ...['c1_x', 'c2_x', 'p1_x', 'p2_x'].map((stem) => [stem, placeRule] as const),
  ['pin_depth', pinDepthRule],
]);

function quantity(file: string, row: CsvRow, column: FoundColumn, faults: Fault[]): number {
  return readQuantity(file, row, column, rules.get(column.spec.stem) ?? anyNumber, faults);
}

function filled(row: CsvRow, columns: readonly FoundColumn[]): readonly FoundColumn[] {
  return columns.filter(({ index }) => row.cells[index] !== '');
}

function namesOf(columns: readonly FoundColumn[]): string {
  return listed(columns.map(({ name }) => name));
}

/** Arrays of which a table has every column. */
function offered(found: FoundColumns): readonly ArrayColumns[] {
  return arrayColumns.filter(({ specs }) => columnsFor(specs, found).length === specs.length);
}

/** The array whose cells a row fills, or a fault where it is none or more than one. */
function chosenArray(row: CsvRow, found: FoundColumns): ArrayColumns | Pick<Fault, 'code' | 'message'> {
  const arrays = offered(found);
  const used = arrays.filter(({ specs }) => filled(row, columnsFor(specs, found)).length > 0);
  const chosen = used[0] ?? arrays[0];
  if (used.length === 1 || (used.length === 0 && arrays.length === 1)) return chosen;
  if (used.length === 0) {
    const words = arrays.map(({ specs }) => namesOf(columnsFor(specs, found)));
    return {
      code: 'no-array',
      message: `the row tells no place of the pins; expected ${words.join(', or ')}`,
    };
  }
  const given = namesOf(used.flatMap(({ specs }) => filled(row, columnsFor(specs, found))));
  return { code: 'two-arrays', message: `the row gives ${given}; expected the distances of one array` };
}

function arrayOf(kind: ArrayColumns['kind'], lengths: readonly number[], pinDepth: number): FourPinArray {
  const [first, second, third, fourth] = lengths;
  switch (kind) {
    case 'wenner':
      return { kind, spacing: first, pinDepth };
    case 'schlumberger':
      return { kind, halfCurrent: first, halfPotential: second, pinDepth };
    case 'collinear':
      return { kind, currentPins: [first, second], potentialPins: [third, fourth], pinDepth };
  }
}

/** The column of the reading of a row, or a fault where a row fills none of two or both. */
function readingColumn(row: CsvRow, found: FoundColumns): FoundColumn | Pick<Fault, 'code' | 'message'> {
  const columns = columnsFor(readingColumns, found);
  const given = filled(row, columns);
  if (columns.length === 1 || given.length === 1) return given[0] ?? columns[0];
  const either = columns.map(({ name }) => name).join(' or ');
  return given.length === 0
    ? { code: 'no-reading', message: `the row has no reading; expected ${either}` }
    : { code: 'two-readings', message: `the row has two readings; expected either ${either}` };
}

/**
 * Reads a row.
 * @param file name for the faults
 * @param row its cells
 * @param found columns of the table; with every column of an array and one of readings
 * @param faults gets what is wrong with single cells, and a row with no or two arrays or readings
 * @returns the row, or `undefined` after a fault; what lengths mean to each other is not yet judged
 */
export function readSurveyRow(
  file: string,
  row: CsvRow,
  found: FoundColumns,
  faults: Fault[],
): SurveyRow | undefined {
  const before = faults.length;
  const { line } = row;
  const array = chosenArray(row, found);
  if ('code' in array) faults.push({ file, line, ...array });
  const columns = 'code' in array ? [] : columnsFor(array.specs, found);
  const lengths = columns.map((column) => quantity(file, row, column, faults));

  const reading = readingColumn(row, found);
  if ('code' in reading) faults.push({ file, line, ...reading });
  const value = 'code' in reading ? Number.NaN : quantity(file, row, reading, faults);

  const depth = found.byStem.get('pin_depth');
  const depthGiven = depth !== undefined && row.cells[depth.index] !== '';
  const pinDepth = depthGiven ? quantity(file, row, depth, faults) : 0;
  const name = found.byStem.get('traverse');
  const traverse = name === undefined ? '' : readName(file, row, name, faults);
  if (faults.length > before || 'code' in array || 'code' in reading) return undefined;
  return {
    row: line,
    array: arrayOf(array.kind, lengths, pinDepth),
    traverse,
    quantity: reading.spec.kind === 'resistance' ? 'resistance' : 'apparent resistivity',
    value,
  };
}

/** Judges the cells of a row that are filled, each by itself, where its columns are too few to make a reading of it. */
export function judgeSurveyCells(file: string, row: CsvRow, found: FoundColumns, faults: Fault[]): void {
  for (const column of filled(row, [...found.byStem.values()])) {
    if (column.spec.kind === 'text') readName(file, row, column, faults);
    else quantity(file, row, column, faults);
  }
}
