// study.json to a study: text, schema and rules, with every fault of the file.
import type { Fault } from '../fault.ts';
import type { Study } from '../study.ts';
import { studyJsonSchema } from './json-schema.ts';
import { readJson } from './json-text.ts';
import type { JsonDocument } from './json-value.ts';
import { LARGEST_STUDY_BYTES } from './limits.ts';
import { schemaFaults } from './schema-faults.ts';
import { soilInput } from './soil-rules.ts';
import type { StudySource } from './source.ts';
import { readStudyFile } from './study-file.ts';
import { ruleFaults } from './study-rules.ts';
import { studySchema } from './study-schema.ts';

export const STUDY_FILE = 'study.json';

export interface StudyReading {
  /** the file as JSON, faulty or not */
  readonly document: JsonDocument;
  /** absent where the schema or the rules of the soil refuse the file */
  readonly study?: Study;
  readonly bytes: Uint8Array;
}

/**
 * Reads and judges study.json.
 * @param source the study
 * @param faults gets what is wrong with the file
 * @returns what could be read, or `undefined` where there is no such file or it is not JSON
 */
export function readStudyJson(source: StudySource, faults: Fault[]): StudyReading | undefined {
  const file = readStudyFile(source, STUDY_FILE, LARGEST_STUDY_BYTES, faults);
  if (file === undefined) return undefined;
  if (file.text.trim() === '') {
    const message = 'the file is empty; expected a study as a JSON object';
    faults.push({ file: STUDY_FILE, line: 1, code: 'empty-file', message });
    return undefined;
  }
  const textFaults: Fault[] = [];
  const document = readJson(STUDY_FILE, file.text, textFaults);
  for (const fault of textFaults) faults.push(fault);
  if (document === undefined) return undefined;

  const parsed = studySchema.safeParse(document.value);
  const issues = parsed.success ? [] : parsed.error.issues;
  // a number out of range is told once, where its text was read
  const toldBefore = new Set(textFaults.map((fault) => fault.place));
  const judged = schemaFaults(STUDY_FILE, document, issues, studyJsonSchema()).filter(
    ({ place }) => !toldBefore.has(place),
  );
  for (const fault of [...judged, ...ruleFaults(STUDY_FILE, document)]) faults.push(fault);
  const soil = parsed.success ? soilInput(parsed.data.soil) : undefined;
  const study = parsed.success && soil !== undefined ? { study: { ...parsed.data, soil } } : {};
  return { document, bytes: file.bytes, ...study };
}
