// What was taken for granted or converted while a study was read, one note for each kind.
import type { CaseInput, Note, Study } from '../study.ts';
import type { ConductorRow } from './conductors-csv.ts';
import * as defaults from './defaults.ts';
import * as limits from './limits.ts';
import { listed, quoted, shown } from './shown-value.ts';
import type { FoundColumn } from './table-columns.ts';

/** Names listed in a note at most; the rest is counted. */
const MOST_NAMES = 8;

function counted(count: number, one: string, many: string): string {
  return `${count} ${count === 1 ? one : many}`;
}

function names(all: readonly string[]): string {
  if (all.length <= MOST_NAMES) return listed(all);
  return `${all.slice(0, MOST_NAMES).join(', ')} and ${all.length - MOST_NAMES} more`;
}

function noteIf(condition: boolean, code: string, message: string): readonly Note[] {
  return condition ? [{ code, message }] : [];
}

/**
 * Notes on the columns of tables.
 * @param tables each with the columns whose unit is not the usual one and the names that were passed over
 * @returns at most one note on units and one on columns
 */
export function columnNotes(
  tables: readonly {
    readonly file: string;
    readonly converted: readonly FoundColumn[];
    readonly unused: readonly string[];
  }[],
): readonly Note[] {
  const converted = tables.flatMap(({ file, converted: found }) => {
    const labels = [...new Set(found.map(({ unit }) => unit?.label))];
    const words = labels.map((label) => {
      const inUnit = found.filter(({ unit }) => unit?.label === label).map(({ name }) => name);
      return `${listed(inUnit)} (${label})`;
    });
    return words.length === 0 ? [] : [`${file}: ${words.join(', ')}`];
  });
  const unused = tables.flatMap(({ file, unused: left }) => {
    return left.length === 0 ? [] : [`${file}: ${names(left.map((name) => quoted(name)))}`];
  });
  return [
    ...noteIf(converted.length > 0, 'units-converted', `converted to SI units: ${converted.join('; ')}`),
    ...noteIf(
      unused.length > 0,
      'columns-unused',
      `columns passed over, not part of the format: ${unused.join('; ')}`,
    ),
  ];
}

function rowNotes(rows: readonly ConductorRow[]): readonly Note[] {
  const conductors = (count: number): string => counted(count, 'conductor', 'conductors');
  const unnamed = rows.filter(({ id }) => id === '').length;
  const noMaterial = rows.filter((row) => !row.materialGiven).length;
  const noElectrode = rows.filter((row) => !row.electrodeGiven).length;
  const thin = rows.filter(({ diameter }) => diameter < limits.THIN_DIAMETER_M);
  const first = thin[0];
  const finest =
    first === undefined ? '' : `the first is ${first.diameter * 1000} mm at ${first.file}:${first.line}`;
  return [
    ...noteIf(
      unnamed > 0,
      'id-assumed',
      `${conductors(unnamed)} without id: named by place in the table, counted from 1`,
    ),
    ...noteIf(
      noMaterial > 0,
      'material-assumed',
      `${conductors(noMaterial)} without material: taken as ${defaults.DEFAULT_MATERIAL}`,
    ),
    ...noteIf(
      noElectrode > 0,
      'electrode-assumed',
      `${conductors(noElectrode)} without electrode: taken as part of ${quoted(defaults.DEFAULT_ELECTRODE)}`,
    ),
    ...noteIf(
      first !== undefined,
      'diameter-small',
      `${conductors(thin.length)} thinner than ${limits.THIN_DIAMETER_M * 1000} mm (${finest}): check the unit of the diameter`,
    ),
  ];
}

function extentNotes(rows: readonly ConductorRow[]): readonly Note[] {
  const box = { x0: Infinity, x1: -Infinity, y0: Infinity, y1: -Infinity };
  for (const row of rows) {
    box.x0 = Math.min(box.x0, row.x1, row.x2);
    box.x1 = Math.max(box.x1, row.x1, row.x2);
    box.y0 = Math.min(box.y0, row.y1, row.y2);
    box.y1 = Math.max(box.y1, row.y1, row.y2);
  }
  const extent = Math.max(box.x1 - box.x0, box.y1 - box.y0);
  const message = `the conductors extend over ${Math.round(extent)} m: check the unit in the column names`;
  return noteIf(extent > limits.WIDE_EXTENT_M, 'extent-large', message);
}

function caseNotes(cases: readonly CaseInput[]): readonly Note[] {
  const about = (
    code: string,
    applies: (faultCase: CaseInput) => boolean,
    message: string,
  ): readonly Note[] => {
    const found = cases.filter(applies).map(({ name }) => quoted(name));
    return noteIf(
      found.length > 0,
      code,
      `${found.length === 1 ? 'case' : 'cases'} ${names(found)}: ${message}`,
    );
  };
  const { LOWEST_LIMIT_FREQUENCY_HZ: lowest, HIGHEST_LIMIT_FREQUENCY_HZ: highest } = limits;
  return [
    ...about(
      'division-factor-assumed',
      (one) => one.fault_current_A !== undefined && one.division_factor === undefined,
      `no division_factor, taken as ${defaults.DEFAULT_DIVISION_FACTOR}: the whole fault current enters the ground`,
    ),
    ...about(
      'decrement-assumed',
      (one) => one.x_over_r === undefined,
      'no x_over_r, decrement factor taken as 1',
    ),
    ...about(
      'frequency-assumed',
      (one) => one.frequency_hz === undefined && one.x_over_r === undefined,
      `no frequency_hz, stated as ${defaults.DEFAULT_FREQUENCY_HZ} Hz; no result rests on it`,
    ),
    ...about(
      'frequency-unusual',
      ({ frequency_hz: hz }) => hz !== undefined && (hz < lowest || hz > highest),
      `the body-current limits of IEEE Std 80 are stated for ${lowest} to ${highest} Hz and taken as they stand`,
    ),
  ];
}

function electrodeNotes(study: Study, rows: readonly ConductorRow[]): readonly Note[] {
  const listedNames = new Set((study.electrodes ?? []).map(({ name }) => name));
  const used = new Set(rows.map(({ electrode }) => electrode));
  const others = [...used].filter((name) => !listedNames.has(name));
  const plain = used.size === 1 && others[0] === defaults.DEFAULT_ELECTRODE;
  const message = `taken as energised, not listed among the electrodes: ${names(others.map((name) => quoted(name)))}`;
  return noteIf(others.length > 0 && !plain, 'role-assumed', message);
}

/**
 * Every note on a study.
 * @param study as written
 * @param rows of all its tables
 * @param tables columns converted and passed over, by table
 * @returns notes in a fixed order, at most one of each code
 */
export function studyNotes(
  study: Study,
  rows: readonly ConductorRow[],
  tables: Parameters<typeof columnNotes>[0],
): readonly Note[] {
  return [
    ...columnNotes(tables),
    ...rowNotes(rows),
    ...extentNotes(rows),
    ...electrodeNotes(study, rows),
    ...noteIf(
      study.metal_model === undefined,
      'metal-model-assumed',
      `no metal_model, taken as ${shown(defaults.DEFAULT_METAL_MODEL)}: the series resistance of the metal counts`,
    ),
    ...caseNotes(study.cases),
  ];
}
