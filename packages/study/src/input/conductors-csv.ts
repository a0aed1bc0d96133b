// conductors.csv: one straight conductor a row, to rows in SI units with every fault of the table.
import { conductorMaterials } from '@ohmstead/core';
import type { Fault } from '../fault.ts';
import type { CsvRow } from './csv-rows.ts';
import { readCsvTable } from './csv-table.ts';
import { DEFAULT_ELECTRODE, DEFAULT_MATERIAL } from './defaults.ts';
import * as limits from './limits.ts';
import { nearestName } from './nearest-name.ts';
import { figure, listed, quoted, shown } from './shown-value.ts';
import { type QuantityRule, readName, readQuantity, withinSize } from './table-cells.ts';
import { type ColumnSpec, type FoundColumn, findColumns, isRequiredColumn } from './table-columns.ts';

/** One row of the table, in metres and Ω/m. */
export interface ConductorRow {
  readonly file: string;
  readonly line: number;
  /** empty where the row has none */
  readonly id: string;
  readonly x1: number;
  readonly y1: number;
  readonly depth1: number;
  readonly x2: number;
  readonly y2: number;
  readonly depth2: number;
  readonly diameter: number;
  readonly material: string;
  readonly materialGiven: boolean;
  readonly electrode: string;
  readonly electrodeGiven: boolean;
  readonly insulated: boolean;
  /** Ω/m; NaN where material and section decide */
  readonly resistancePerMetre: number;
}

export interface ConductorRows {
  readonly rows: readonly ConductorRow[];
  /** columns whose unit is not the usual one, or that were passed over */
  readonly converted: readonly FoundColumn[];
  readonly unused: readonly string[];
}

function end(stem: string, label: string): ColumnSpec {
  return { stem, kind: 'length', usualUnit: 'm', required: true, label };
}

/** Columns that a table of conductors may have. */
export const conductorColumns: readonly ColumnSpec[] = [
  { stem: 'id', kind: 'text', required: false, label: 'name of the conductor' },
  end('x1', 'x of the first end'),
  end('y1', 'y of the first end'),
  end('depth1', 'depth of the first end'),
  end('x2', 'x of the second end'),
  end('y2', 'y of the second end'),
  end('depth2', 'depth of the second end'),
  { stem: 'diameter', kind: 'length', usualUnit: 'mm', required: true, label: 'diameter of the metal' },
  { stem: 'material', kind: 'text', required: false, label: 'conductor material' },
  { stem: 'electrode', kind: 'text', required: false, label: 'name of the electrode' },
  { stem: 'insulated', kind: 'text', required: false, label: 'insulating jacket' },
  {
    stem: 'resistance',
    kind: 'resistance-per-length',
    usualUnit: 'ohm_per_m',
    required: false,
    label: 'resistance per length',
  },
];

const coordinate = withinSize(limits.LARGEST_COORDINATE_M, 'm');

/** Depths are judged for both ends together; here only their size. */
const depthSize = withinSize(limits.LARGEST_DEPTH_M, 'm');

const diameterRule: QuantityRule = (value, text) => {
  if (value <= 0) return { code: 'diameter', message: `${shown(text)} is not a positive length` };
  const expected = `expected a diameter from ${limits.SMALLEST_DIAMETER_M} to ${limits.LARGEST_DIAMETER_M} m`;
  if (value >= limits.SMALLEST_DIAMETER_M && value <= limits.LARGEST_DIAMETER_M) return undefined;
  return {
    code: 'range',
    message: `${shown(text)} is ${value} m; ${expected}, check the unit in the column name`,
  };
};

const resistanceRule: QuantityRule = (value, text) => {
  const { SMALLEST_RESISTANCE_OHM_PER_M: least, LARGEST_RESISTANCE_OHM_PER_M: most } = limits;
  if (value >= least && value <= most) return undefined;
  if (value >= 0 && value < least) {
    const instead = 'for metal without resistance use "metal_model": "equipotential" in study.json';
    return {
      code: 'no-resistance',
      message: `${shown(text)} is no resistance that a branch of metal can have; ${instead}`,
    };
  }
  const expected = `expected a resistance per length above 0 and at most ${figure(most)} ohm/m`;
  return { code: 'range', message: `${shown(text)} is out of range; ${expected}` };
};

/** What is wrong with the depths of a row, told at the end above the surface. */
function depthFault(
  row: CsvRow,
  [first, second]: readonly [FoundColumn, FoundColumn],
  [depth1, depth2]: readonly [number, number],
): Omit<Fault, 'file'> | undefined {
  if (!(depth1 < 0 || depth2 < 0)) return undefined;
  const [above, below, other] = depth1 < 0 ? [first, second, depth2] : [second, first, depth1];
  const text = shown(row.cells[above.index]);
  const place = above.name;
  if (other > 0) {
    const crossing = `${text} is above the soil surface and ${below.name} ${shown(row.cells[below.index])} below it`;
    const message = `${crossing}: the conductor crosses the surface; end it at depth 0, depths are positive downward`;
    return { line: row.line, place, code: 'crosses-surface', message };
  }
  const message = `${text} is above the soil surface; depths are positive downward`;
  return { line: row.line, place, code: 'above-surface', message };
}

function materialMessage(name: string): string {
  const known = [...conductorMaterials.keys()];
  const near = nearestName(name, known);
  const hint = near === undefined ? '' : `${near} is probably meant; `;
  return `${quoted(name)} is not a known conductor material; ${hint}known are ${listed(known)}`;
}

function readRow(
  file: string,
  row: CsvRow,
  found: ReadonlyMap<string, FoundColumn>,
  faults: Fault[],
): ConductorRow {
  const quantity = (stem: string, rule: QuantityRule): number => {
    const column = found.get(stem);
    return column === undefined ? Number.NaN : readQuantity(file, row, column, rule, faults);
  };
  const name = (stem: string): string => {
    const column = found.get(stem);
    return column === undefined ? '' : readName(file, row, column, faults);
  };
  const id = name('id');
  const [x1, y1, depth1] = [
    quantity('x1', coordinate),
    quantity('y1', coordinate),
    quantity('depth1', depthSize),
  ];
  const [x2, y2, depth2] = [
    quantity('x2', coordinate),
    quantity('y2', coordinate),
    quantity('depth2', depthSize),
  ];
  const [first, second] = [found.get('depth1'), found.get('depth2')];
  const depths = first && second ? depthFault(row, [first, second], [depth1, depth2]) : undefined;
  if (depths !== undefined) faults.push({ file, ...depths });

  const diameter = quantity('diameter', diameterRule);
  const material = name('material');
  if (material !== '' && !conductorMaterials.has(material)) {
    faults.push({
      file,
      line: row.line,
      place: 'material',
      code: 'material',
      message: materialMessage(material),
    });
  }
  const electrode = name('electrode');
  const insulated = name('insulated');
  if (insulated !== '' && insulated !== 'yes' && insulated !== 'no') {
    const message = `${quoted(insulated)} is not accepted; expected yes or no`;
    faults.push({ file, line: row.line, place: 'insulated', code: 'insulated', message });
  }
  const resistance = found.get('resistance');
  const resistanceGiven = resistance !== undefined && row.cells[resistance.index] !== '';
  return {
    file,
    line: row.line,
    id,
    x1,
    y1,
    depth1,
    x2,
    y2,
    depth2,
    diameter,
    material: material === '' ? DEFAULT_MATERIAL : material,
    materialGiven: material !== '',
    electrode: electrode === '' ? DEFAULT_ELECTRODE : electrode,
    electrodeGiven: electrode !== '',
    insulated: insulated === 'yes',
    resistancePerMetre: resistanceGiven ? quantity('resistance', resistanceRule) : Number.NaN,
  };
}

/**
 * Reads a table of conductors.
 * @param file name for the faults
 * @param text the whole table, line ends `\n`
 * @param faults gets every fault of the table
 * @returns its rows, usable only where no fault was added; `undefined` where there is no table to judge
 */
export function readConductorsCsv(file: string, text: string, faults: Fault[]): ConductorRows | undefined {
  const isColumn = (name: string): boolean => isRequiredColumn(conductorColumns, name);
  const table = readCsvTable(file, text, { mostRows: limits.MOST_CONDUCTORS, isColumn }, faults);
  if (table === undefined) return undefined;
  const { byStem, unused } = findColumns(table, conductorColumns, faults);
  const rows = table.rows.map((row) => readRow(file, row, byStem, faults));
  const converted = [...byStem.values()].filter(
    ({ spec, unit }) => unit !== undefined && unit.name !== spec.usualUnit,
  );
  return { rows, converted, unused };
}
