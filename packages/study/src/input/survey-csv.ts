// survey.csv: readings of a four-pin survey, one a row, every wrong row named and none dropped.
import { checkRows, type FourPinArray, type Reading, type RowFinding, type SurveyRow } from '@ohmstead/core';
import type { Fault } from '../fault.ts';
import type { LoadedSurvey, Note } from '../study.ts';
import { readCsvTable } from './csv-table.ts';
import {
  LARGEST_SOIL_RESISTIVITY_OHM_M,
  MOST_READINGS,
  SMALLEST_PIN_DISTANCE_M,
  SMALLEST_SOIL_RESISTIVITY_OHM_M,
} from './limits.ts';
import { figure } from './shown-value.ts';
import { isSurveyColumn, surveyColumnFaults, surveyColumns } from './survey-columns.ts';
import { judgeSurveyCells, readSurveyRow } from './survey-row.ts';
import { type FoundColumn, type FoundColumns, findColumns } from './table-columns.ts';

export interface SurveyTable extends LoadedSurvey {
  /** columns whose unit is not the usual one, or that were passed over */
  readonly converted: readonly FoundColumn[];
  readonly unused: readonly string[];
  /** rows that say nothing of the depth of the pins */
  readonly withoutPinDepth: number;
}

/** Digits of a computed number in a message. */
const SHOWN_DIGITS = 4;
/** Rounding of distances worked out from others. */
const DISTANCE_SLACK = 1e-9;

/** Column that a finding about distances stands at; pins at places along a line share the blame. */
const spacingStem: Readonly<Record<FourPinArray['kind'], string | undefined>> = {
  wenner: 'spacing',
  schlumberger: 'mn_half',
  collinear: undefined,
};

/** Column that a finding about a whole row is about, if it is one. */
function placeOf(finding: RowFinding, row: SurveyRow, found: FoundColumns): { readonly place?: string } {
  const stem = (): string | undefined => {
    switch (finding.code) {
      case 'pin-depth':
      case 'deep-pins':
        return 'pin_depth';
      case 'value':
        return row.quantity === 'resistance' ? 'resistance' : 'apparent_resistivity';
      case 'spacing':
        return spacingStem[row.array.kind];
      case 'null-array':
      case 'repeated-row':
        return undefined;
    }
  };
  const name = found.byStem.get(stem() ?? '')?.name;
  return name === undefined ? {} : { place: name };
}

/** Shortest distance between any two pins, m. */
function shortestDistance(array: FourPinArray): number {
  switch (array.kind) {
    case 'wenner':
      return array.spacing;
    case 'schlumberger':
      return Math.min(array.halfCurrent - array.halfPotential, 2 * array.halfPotential);
    case 'collinear': {
      const pins = [...array.currentPins, ...array.potentialPins].sort((a, b) => a - b);
      return Math.min(...pins.slice(1).map((pin, i) => pin - pins[i]));
    }
  }
}

function rounded(value: number): string {
  return figure(Number(value.toPrecision(SHOWN_DIGITS)));
}

/** Distances and resistivities that no survey has: the unit of a column must be wrong. */
function sizeFaults(row: SurveyRow, reading: Reading): readonly RowFinding[] {
  const findings: RowFinding[] = [];
  const distance = shortestDistance(row.array);
  if (distance < SMALLEST_PIN_DISTANCE_M * (1 - DISTANCE_SLACK)) {
    const expected = `expected at least ${SMALLEST_PIN_DISTANCE_M} m, check the unit in the column name`;
    const message = `two pins stand ${rounded(distance)} m from each other; ${expected}`;
    findings.push({ row: row.row, code: 'spacing', message });
  }
  const resistivity = reading.apparentResistivity;
  if (!(resistivity >= SMALLEST_SOIL_RESISTIVITY_OHM_M && resistivity <= LARGEST_SOIL_RESISTIVITY_OHM_M)) {
    const given =
      row.quantity === 'resistance' ? `resistance ${rounded(row.value)} Ω gives` : 'the reading is';
    const range = `from ${SMALLEST_SOIL_RESISTIVITY_OHM_M} to ${figure(LARGEST_SOIL_RESISTIVITY_OHM_M)} Ω·m`;
    const expected = `expected one ${range}, check the unit in the column name`;
    const message = `${given} an apparent resistivity of ${rounded(resistivity)} Ω·m; ${expected}`;
    findings.push({ row: row.row, code: 'value', message });
  }
  return findings;
}

/**
 * Reads a table of readings.
 * @param file name for the faults
 * @param text the whole table, line ends `\n`
 * @param faults gets every fault of the table
 * @returns its readings, usable only where no fault was added; `undefined` where there is no table to judge
 */
export function readSurveyCsv(file: string, text: string, faults: Fault[]): SurveyTable | undefined {
  const table = readCsvTable(file, text, { mostRows: MOST_READINGS, isColumn: isSurveyColumn }, faults);
  if (table === undefined) return undefined;
  const before = faults.length;
  const found = findColumns(table, surveyColumns, faults);
  if (faults.length > before) {
    // with a column misnamed, what a row lacks is not known; its other cells are judged all the same
    for (const row of table.rows) judgeSurveyCells(file, row, found, faults);
    return undefined;
  }
  const missing = surveyColumnFaults(file, table.headerLine, found);
  faults.push(...missing);
  if (missing.length > 0) return undefined;

  const rows = table.rows.flatMap((row) => readSurveyRow(file, row, found, faults) ?? []);
  const checked = checkRows(rows);
  const rowOn = new Map(rows.map((row) => [row.row, row] as const));
  const findings = checked.readings.flatMap((reading) => {
    const row = rowOn.get(reading.row);
    return row === undefined ? [] : sizeFaults(row, reading);
  });
  for (const finding of [...checked.faults, ...findings]) {
    const { row: line, code, message } = finding;
    const row = rowOn.get(line);
    const place = row === undefined ? {} : placeOf(finding, row, found);
    faults.push({ file, line, ...place, code, message });
  }
  const depth = found.byStem.get('pin_depth');
  return {
    file,
    readings: checked.readings,
    cautions: checked.cautions,
    converted: [...found.byStem.values()].filter(
      ({ spec, unit }) => unit !== undefined && unit.name !== spec.usualUnit,
    ),
    unused: found.unused,
    withoutPinDepth: table.rows.filter(({ cells }) => depth === undefined || cells[depth.index] === '')
      .length,
  };
}

/** What a table leaves to be taken for granted. */
export function surveyNotes({ file, withoutPinDepth: count }: SurveyTable): readonly Note[] {
  if (count === 0) return [];
  const readings = `${count} ${count === 1 ? 'reading' : 'readings'}`;
  const message = `${file}: ${readings} without pin_depth_m: the pins are taken as points on the surface`;
  return [{ code: 'pin-depth-assumed', message }];
}
