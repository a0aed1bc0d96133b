// Files that were opened, to a draft: those of a study, however faulty, or bare tables.
import { decodeText, type Fault, isObject, readJson, STUDY_FILE } from '@ohmstead/study';
import { bareDraft } from './bare-study.ts';
import type { Opening } from './opening.ts';

/**
 * Opens files to work at: those of a study, or bare tables, for which a study.json is begun.
 * @param files by path within the study's folder
 * @returns the draft, however faulty the study is; faults only where there is no study.json to edit: it is no text, no
 * JSON object, or would lose something when written again (a key given twice, a number out of range), or there is
 * neither study.json nor a table
 */
export function openDraft(files: ReadonlyMap<string, Uint8Array>): Opening {
  const bytes = files.get(STUDY_FILE);
  if (bytes === undefined) return bareDraft(files);
  const fault = (code: string, message: string, line?: number): Opening => ({
    kind: 'faults',
    faults: [{ file: STUDY_FILE, ...(line === undefined ? {} : { line }), code, message }],
  });
  const reading = decodeText(bytes);
  if (reading.kind === 'fault') return fault(reading.code, reading.message, reading.line);
  if (reading.text.trim() === '') {
    return fault('empty-file', 'the file is empty; expected a study as a JSON object', 1);
  }
  const faults: Fault[] = [];
  const document = readJson(STUDY_FILE, reading.text, faults);
  if (document === undefined || faults.length > 0) return { kind: 'faults', faults };
  if (!isObject(document.value))
    return fault('kind', 'the file holds no JSON object; expected a study as one', 1);
  return { kind: 'draft', draft: { files, study: document.value } };
}
