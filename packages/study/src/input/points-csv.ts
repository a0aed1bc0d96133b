// points.csv: places at which a potential is asked for.
import { type Fault, InputFaults } from '../fault.ts';
import type { Note } from '../study.ts';
import { readCsvTable } from './csv-table.ts';
import { orderedFaults } from './fault-order.ts';
import { LARGEST_COORDINATE_M, LARGEST_DEPTH_M, LARGEST_TABLE_BYTES, MOST_POINTS } from './limits.ts';
import { shown } from './shown-value.ts';
import type { StudySource } from './source.ts';
import { readStudyFile } from './study-file.ts';
import { columnNotes } from './study-notes.ts';
import { type QuantityRule, readQuantity, withinSize } from './table-cells.ts';
import { type ColumnSpec, findColumns, isRequiredColumn } from './table-columns.ts';

/** Points, shape [count] each, metres; depth is positive downward. */
export interface PointTable {
  readonly count: number;
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly depth: Float64Array;
  /** conversions and columns passed over */
  readonly notes: readonly Note[];
}

const columns: readonly ColumnSpec[] = [
  { stem: 'x', kind: 'length', usualUnit: 'm', required: true, label: 'x of the point' },
  { stem: 'y', kind: 'length', usualUnit: 'm', required: true, label: 'y of the point' },
  { stem: 'depth', kind: 'length', usualUnit: 'm', required: false, label: 'depth of the point' },
];

const coordinate = withinSize(LARGEST_COORDINATE_M, 'm');
const depthSize = withinSize(LARGEST_DEPTH_M, 'm');
const depthRule: QuantityRule = (value, text) => {
  if (value >= 0) return depthSize(value, text);
  return {
    code: 'above-surface',
    message: `${shown(text)} is above the soil surface; depths are positive downward`,
  };
};

/**
 * Reads a table of points.
 * @param source where the table is; it need not hold a study
 * @param path of the table in the source
 * @returns points in the order of the rows; depth 0, the surface, where the table has no depth or a blank one
 * @throws InputFaults with every fault of the table
 */
export function loadPoints(source: StudySource, path: string): PointTable {
  const faults: Fault[] = [];
  const file = readStudyFile(source, path, LARGEST_TABLE_BYTES, faults);
  const isColumn = (name: string): boolean => isRequiredColumn(columns, name);
  const table = file && readCsvTable(path, file.text, { mostRows: MOST_POINTS, isColumn }, faults);
  if (table === undefined) throw new InputFaults(orderedFaults(faults, path));

  const { byStem, unused } = findColumns(table, columns, faults);
  const read = (stem: string, rule: QuantityRule, blank: number): Float64Array => {
    const column = byStem.get(stem);
    return Float64Array.from(table.rows, (row) => {
      if (column === undefined) return blank;
      const given = row.cells[column.index] !== '' || column.spec.required;
      return given ? readQuantity(path, row, column, rule, faults) : blank;
    });
  };
  const [x, y, depth] = [
    read('x', coordinate, Number.NaN),
    read('y', coordinate, Number.NaN),
    read('depth', depthRule, 0),
  ];
  if (faults.length > 0) throw new InputFaults(orderedFaults(faults, path));
  const converted = [...byStem.values()].filter(
    ({ spec, unit }) => unit !== undefined && unit.name !== spec.usualUnit,
  );
  return { count: table.rows.length, x, y, depth, notes: columnNotes([{ file: path, converted, unused }]) };
}
