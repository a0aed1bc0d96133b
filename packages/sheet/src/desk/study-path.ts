// Writes places of study.json, and says which section of the sheet shows them.
import type { SectionId, StudyPath } from './desk.ts';

/** `['cases', 0, 'duration_s']` → `cases[0].duration_s`. */
export function pathText(path: StudyPath): string {
  return path.reduce<string>((text, part) => {
    if (typeof part === 'number') return `${text}[${part}]`;
    return text === '' ? part : `${text}.${part}`;
  }, '');
}

const SECTION_OF: ReadonlyMap<string | number, SectionId> = new Map([
  ['soil', 'ground'],
  ['surfacing', 'ground'],
  ['conductors', 'electrode'],
  ['electrodes', 'electrode'],
  ['areas', 'electrode'],
  ['cases', 'fault'],
  ['metal_model', 'rise'],
  ['limits', 'people'],
  ['seasons', 'season'],
]);

/** The section in which an input of study.json is shown; undefined for the title, project data and the like. */
export function sectionOfInput(path: StudyPath): SectionId | undefined {
  return path.length === 0 ? undefined : SECTION_OF.get(path[0]);
}
