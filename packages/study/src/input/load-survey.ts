// A survey table by itself, without a study: its readings, or every fault of the table.
import { type Fault, InputFaults } from '../fault.ts';
import type { LoadedSurvey, Note } from '../study.ts';
import { orderedFaults } from './fault-order.ts';
import { LARGEST_TABLE_BYTES } from './limits.ts';
import type { StudySource } from './source.ts';
import { readStudyFile } from './study-file.ts';
import { columnNotes } from './study-notes.ts';
import { readSurveyCsv, surveyNotes } from './survey-csv.ts';

/** A survey that was read without a study, which would list its notes. */
export interface SurveyFile extends LoadedSurvey {
  /** conversions, columns passed over and what was taken for granted */
  readonly notes: readonly Note[];
}

/**
 * Reads a table of readings.
 * @param source where the table is; it need not hold a study
 * @param path of the table in the source
 * @returns its readings in the order of the rows
 * @throws InputFaults with every fault of the table
 */
export function loadSurvey(source: StudySource, path: string): SurveyFile {
  const faults: Fault[] = [];
  const file = readStudyFile(source, path, LARGEST_TABLE_BYTES, faults);
  const table = file && readSurveyCsv(path, file.text, faults);
  if (faults.length > 0 || table === undefined) throw new InputFaults(orderedFaults(faults, path));
  const { readings, cautions } = table;
  return { file: path, readings, cautions, notes: [...columnNotes([table]), ...surveyNotes(table)] };
}
