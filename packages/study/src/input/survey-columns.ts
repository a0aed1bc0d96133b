// Columns of survey.csv: which there may be, and which arrays and readings a table can hold with those it has.
import type { Fault } from '../fault.ts';
import { listed, quoted } from './shown-value.ts';
import {
  type ColumnSpec,
  type FoundColumn,
  type FoundColumns,
  isRequiredColumn,
  usualName,
} from './table-columns.ts';

/** What tells where the four pins stood. */
export interface ArrayColumns {
  readonly kind: 'wenner' | 'schlumberger' | 'collinear';
  readonly label: string;
  readonly specs: readonly ColumnSpec[];
}

function distance(stem: string, label: string): ColumnSpec {
  return { stem, kind: 'length', usualUnit: 'm', required: false, label };
}

export const arrayColumns: readonly ArrayColumns[] = [
  { kind: 'wenner', label: 'Wenner', specs: [distance('spacing', 'spacing of the pins')] },
  {
    kind: 'schlumberger',
    label: 'Schlumberger',
    specs: [
      distance('ab_half', 'half the distance between the current pins'),
      distance('mn_half', 'half the distance between the potential pins'),
    ],
  },
  {
    kind: 'collinear',
    label: 'any four pins on a line',
    specs: [
      distance('c1_x', 'place along the line of the pin where current enters'),
      distance('c2_x', 'place along the line of the pin where current leaves'),
      distance('p1_x', 'place along the line of the first potential pin'),
      distance('p2_x', 'place along the line of the second potential pin'),
    ],
  },
];

export const readingColumns: readonly ColumnSpec[] = [
  {
    stem: 'apparent_resistivity',
    kind: 'resistivity',
    usualUnit: 'ohm_m',
    required: false,
    label: 'apparent resistivity',
  },
  { stem: 'resistance', kind: 'resistance', usualUnit: 'ohm', required: false, label: 'resistance' },
];

export const surveyColumns: readonly ColumnSpec[] = [
  ...arrayColumns.flatMap(({ specs }) => specs),
  ...readingColumns,
  distance('pin_depth', 'depth to which the pins were driven'),
  { stem: 'traverse', kind: 'text', required: false, label: 'name of the traverse' },
];

/** Columns by which the header of a survey is known; none of them is in every survey. */
const telling = surveyColumns
  .filter(({ kind }) => kind !== 'text')
  .map((spec) => ({ ...spec, required: true }));

/** Whether a name is that of a quantity of a survey, its unit known or not. */
export function isSurveyColumn(name: string): boolean {
  return isRequiredColumn(telling, name);
}

/** Columns of a table that stand for these specifications. */
export function columnsFor(specs: readonly ColumnSpec[], found: FoundColumns): readonly FoundColumn[] {
  return specs.flatMap(({ stem }) => found.byStem.get(stem) ?? []);
}

/** `spacing_m (Wenner), …`: the columns that tell an array, for messages. */
function arrayWords(): string {
  const words = arrayColumns.map(({ label, specs }) => `${listed(specs.map(usualName))} (${label})`);
  return `${words.slice(0, -1).join(', ')}, or ${words.at(-1)}`;
}

/**
 * What keeps the columns of a table from being a survey.
 * @param file name for the faults
 * @param line of the header
 * @param found its columns, none of them at fault
 * @returns a fault for each column that is missing beside those there, or where no array or reading is told at all
 */
export function surveyColumnFaults(file: string, line: number, found: FoundColumns): readonly Fault[] {
  const { unused } = found;
  const others = unused.length === 0 ? '' : `; not read: ${listed(unused.map((name) => quoted(name)))}`;
  const faults = arrayColumns.flatMap(({ specs }): readonly Fault[] => {
    const there = columnsFor(specs, found);
    if (there.length === 0) return [];
    const beside = listed(there.map(({ name }) => name));
    return specs
      .filter(({ stem }) => !found.byStem.has(stem))
      .map((spec) => {
        const message = `the column is missing; expected ${spec.label}, beside ${beside}`;
        return { file, line, place: usualName(spec), code: 'missing-column', message };
      });
  });
  if (arrayColumns.every(({ specs }) => columnsFor(specs, found).length === 0)) {
    const message = `no column tells where the pins stood; expected ${arrayWords()}${others}`;
    faults.push({ file, line, code: 'missing-column', message });
  }
  if (columnsFor(readingColumns, found).length === 0) {
    const expected = readingColumns.map(usualName).join(' or ');
    const message = `no column holds readings; expected ${expected}${others}`;
    faults.push({ file, line, code: 'missing-column', message });
  }
  return faults;
}
