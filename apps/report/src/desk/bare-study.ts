// A study begun from bare tables: what they tell, and nothing that they do not.
import {
  conductorColumns,
  csvRows,
  decodeText,
  isRequiredColumn,
  isSurveyColumn,
  type JsonObject,
  STUDY_FILE,
} from '@ohmstead/study';
import { canonicalJson } from './canonical-json.ts';
import type { Opening } from './opening.ts';

type TableKind = 'conductors' | 'survey' | 'unknown';

/** Separators by which a table may be divided; all but the comma are told as faults when the study is loaded. */
const SEPARATORS = [',', ';', '\t'];
/** Rows looked at for the column names. Reason: title, subject, date and blank rows above them. */
const HEADER_SEARCH_ROWS = 6;
/** Columns by which a table is known. Reason: one name may be there by chance. */
const TELLING_COLUMNS = 2;
/** Name of the case that a new study begins with; its current and duration are asked for. */
const FIRST_CASE = 'ground fault';

function tableKind(bytes: Uint8Array): TableKind {
  const reading = decodeText(bytes);
  if (reading.kind === 'fault') return 'unknown';
  for (const separator of SEPARATORS) {
    for (const { cells } of csvRows(reading.text, HEADER_SEARCH_ROWS, separator).rows) {
      const count = (isColumn: (name: string) => boolean): number => cells.filter(isColumn).length;
      if (count((name) => isRequiredColumn(conductorColumns, name)) >= TELLING_COLUMNS) return 'conductors';
      if (count(isSurveyColumn) >= TELLING_COLUMNS) return 'survey';
    }
  }
  return 'unknown';
}

function titleOf(path: string): string {
  return path.replace(/^.*\//, '').replace(/\.[^.]*$/, '');
}

/**
 * Begins a study from tables without a study.json. Soil, currents, duration and body mass are left out to be asked
 * for; a survey among the tables becomes the soil, its number of layers left to the fit.
 * @param files by path
 * @returns the draft, or a fault where no file is a table
 */
export function bareDraft(files: ReadonlyMap<string, Uint8Array>): Opening {
  const tables = [...files].filter(([path]) => /\.(?:csv|txt|tsv)$/i.test(path));
  const kinds = tables.map(([path, bytes]) => ({ path, kind: tableKind(bytes) }));
  const ofKind = (kind: TableKind): readonly string[] =>
    kinds.flatMap((one) => (one.kind === kind ? one.path : []));
  // a single table that is not known as one is opened all the same: reading it tells what is wrong with it
  const conductors =
    kinds.length === 1 && kinds[0]!.kind === 'unknown' ? [kinds[0]!.path] : ofKind('conductors');
  const [survey] = ofKind('survey');
  const first = conductors[0] ?? survey;
  if (first === undefined) {
    const message =
      'no such file here, nor a table of conductors; expected a study folder, its zip, or a conductor table';
    return { kind: 'faults', faults: [{ file: STUDY_FILE, code: 'file-missing', message }] };
  }
  const study: JsonObject = {
    format: 'ohmstead-study',
    version: 1,
    title: titleOf(first),
    ...(survey === undefined ? {} : { soil: { survey, layer_count: 'auto' } }),
    ...(conductors.length === 0 ? {} : { conductors }),
    cases: [{ name: FIRST_CASE }],
    limits: { basis: 'IEEE 80' },
  };
  const bytes = new TextEncoder().encode(canonicalJson(study));
  return { kind: 'draft', draft: { files: new Map(files).set(STUDY_FILE, bytes), study } };
}
