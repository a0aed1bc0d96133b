// The tables that take pasted rows, and their columns.
import { type ColumnSpec, conductorColumns, surveyColumns } from '@ohmstead/study';
import type { QuantityKind } from './quantity.ts';

export type PasteTable = 'layers' | 'cases' | 'seasons' | 'corners' | 'conductors' | 'readings';

export interface PasteColumn {
  /** key of the value in a row, as study.json or the program calls it */
  readonly key: string;
  /** name without unit */
  readonly stem: string;
  readonly kind: 'text' | 'yes-no' | QuantityKind;
  readonly required: boolean;
  /** trade name */
  readonly label: string;
  /** other names that a header may have */
  readonly others?: readonly string[];
}

const layers: readonly PasteColumn[] = [
  {
    ...{ key: 'resistivity_ohm_m', stem: 'resistivity', kind: 'resistivity', required: true },
    label: 'soil resistivity',
    others: ['rho', 'ρ'],
  },
  {
    ...{ key: 'thickness_m', stem: 'thickness', kind: 'length', required: false },
    label: 'layer thickness',
    others: ['h'],
  },
];

const cases: readonly PasteColumn[] = [
  { key: 'name', stem: 'name', kind: 'text', required: true, label: 'case name', others: ['case'] },
  { key: 'fault_current_A', stem: 'fault_current', kind: 'current', required: false, label: 'fault current' },
  {
    ...{ key: 'division_factor', stem: 'division_factor', kind: 'ratio', required: false },
    label: 'division factor',
    others: ['split factor'],
  },
  { key: 'grid_current_A', stem: 'grid_current', kind: 'current', required: false, label: 'grid current' },
  { key: 'x_over_r', stem: 'x_over_r', kind: 'ratio', required: false, label: 'X/R ratio', others: ['X/R'] },
  { key: 'frequency_hz', stem: 'frequency', kind: 'frequency', required: false, label: 'frequency' },
  {
    ...{ key: 'duration_s', stem: 'duration', kind: 'duration', required: true },
    label: 'fault duration',
    others: ['time'],
  },
];

const seasons: readonly PasteColumn[] = [
  { key: 'name', stem: 'name', kind: 'text', required: true, label: 'season name', others: ['season'] },
  { key: 'top_depth_m', stem: 'top_depth', kind: 'length', required: false, label: 'depth of the top' },
  {
    ...{ key: 'top_resistivity_ohm_m', stem: 'top_resistivity', kind: 'resistivity', required: false },
    label: 'resistivity of the top',
  },
  {
    key: 'below_depth_m',
    stem: 'below_depth',
    kind: 'length',
    required: false,
    label: 'depth of what is below',
  },
  {
    ...{ key: 'below_resistivity_ohm_m', stem: 'below_resistivity', kind: 'resistivity', required: false },
    label: 'resistivity below',
  },
];

const corners: readonly PasteColumn[] = [
  {
    ...{ key: 'x', stem: 'x', kind: 'coordinate', required: true },
    label: 'x of the corner',
    others: ['east', 'easting'],
  },
  {
    ...{ key: 'y', stem: 'y', kind: 'coordinate', required: true },
    label: 'y of the corner',
    others: ['north', 'northing'],
  },
];

/** Columns of lengths that may be negative. */
const PLACE = /^(?:[xy][12]|[cp][12]_x)$/;

function ofTable({ stem, kind, required, label }: ColumnSpec): PasteColumn {
  return { key: stem, stem, kind: kindOf(stem, kind), required, label };
}

function kindOf(stem: string, kind: ColumnSpec['kind']): PasteColumn['kind'] {
  if (stem === 'insulated') return 'yes-no';
  if (stem === 'diameter') return 'diameter';
  return kind === 'length' && PLACE.test(stem) ? 'coordinate' : kind;
}

/** The columns of a table, in the order in which rows without a header have them. */
export function pasteColumns(table: PasteTable): readonly PasteColumn[] {
  switch (table) {
    case 'layers':
      return layers;
    case 'cases':
      return cases;
    case 'seasons':
      return seasons;
    case 'corners':
      return corners;
    case 'conductors':
      return conductorColumns.map(ofTable);
    case 'readings':
      return surveyColumns.map(ofTable);
  }
}
