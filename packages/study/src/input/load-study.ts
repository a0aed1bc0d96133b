// A study folder to a checked study with its tables, or all faults of all its files together.
import { type Fault, InputFaults } from '../fault.ts';
import type { LoadedStudy, LoadedSurvey } from '../study.ts';
import { conductorTable, idFaults } from './conductor-table.ts';
import { type ConductorRow, type ConductorRows, readConductorsCsv } from './conductors-csv.ts';
import { electrodeFaults } from './electrode-rules.ts';
import { orderedFaults } from './fault-order.ts';
import { LARGEST_TABLE_BYTES, MOST_CONDUCTORS } from './limits.ts';
import { readStudyJson, STUDY_FILE } from './read-study-json.ts';
import { figure } from './shown-value.ts';
import { surveyPath } from './soil-rules.ts';
import type { StudySource } from './source.ts';
import { readStudyFile } from './study-file.ts';
import { studyNotes } from './study-notes.ts';
import { conductorTables } from './study-rules.ts';
import { readSurveyCsv, type SurveyTable, surveyNotes } from './survey-csv.ts';

/**
 * Loads a study: study.json and the tables that it names.
 * @param source the files of the study
 * @returns the study as written, its conductors and readings in SI units, where each was read, notes on what was assumed or
 * converted, and the files as read
 * @throws InputFaults with every fault of every file, study.json first, then by file and line
 */
export function loadStudy(source: StudySource): LoadedStudy {
  const faults: Fault[] = [];
  const reading = readStudyJson(source, faults);
  if (reading === undefined) throw new InputFaults(orderedFaults(faults, STUDY_FILE));

  const files = new Map([[STUDY_FILE, reading.bytes]]);
  const paths = conductorTables(reading.document.value);
  const tables: (ConductorRows & { readonly file: string })[] = [];
  const rows: ConductorRow[] = [];
  for (const path of paths) {
    const file = readStudyFile(source, path, LARGEST_TABLE_BYTES, faults);
    if (file === undefined) continue;
    files.set(path, file.bytes);
    const table = readConductorsCsv(path, file.text, faults);
    if (table === undefined) continue;
    tables.push({ file: path, ...table });
    for (const row of table.rows) rows.push(row);
    if (rows.length <= MOST_CONDUCTORS) continue;
    const message = `with this table the study has ${rows.length} conductors; at most ${figure(MOST_CONDUCTORS)} are read`;
    faults.push({ file: path, code: 'too-many-rows', message });
    break;
  }
  for (const fault of idFaults(rows)) faults.push(fault);
  const survey = readSurvey(source, surveyPath(reading.document.value), files, faults);
  // with a table unread, which electrodes have conductors is not known
  if (paths.length > 0 && tables.length === paths.length) {
    const used = [...new Set(rows.map(({ electrode }) => electrode))];
    for (const fault of electrodeFaults(STUDY_FILE, reading.document, used)) faults.push(fault);
  }
  const { study } = reading;
  if (faults.length > 0 || study === undefined) throw new InputFaults(orderedFaults(faults, STUDY_FILE));
  return {
    study,
    conductors: conductorTable(rows),
    origins: rows.map(({ file, line }) => ({ file, line })),
    ...(survey === undefined ? {} : { survey: surveyOf(survey) }),
    notes: [
      ...studyNotes(study, rows, survey === undefined ? tables : [...tables, survey]),
      ...(survey === undefined ? [] : surveyNotes(survey)),
    ],
    files: new Map([...files].sort(([a], [b]) => (a < b ? -1 : 1))),
  };
}

function readSurvey(
  source: StudySource,
  path: string | undefined,
  files: Map<string, Uint8Array>,
  faults: Fault[],
): SurveyTable | undefined {
  const file = path === undefined ? undefined : readStudyFile(source, path, LARGEST_TABLE_BYTES, faults);
  if (path === undefined || file === undefined) return undefined;
  files.set(path, file.bytes);
  return readSurveyCsv(path, file.text, faults);
}

function surveyOf({ file, readings, cautions }: SurveyTable): LoadedSurvey {
  return { file, readings, cautions };
}
