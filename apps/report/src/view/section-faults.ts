// Faults of a study by the section of the sheet in which they can be mended.
import { type SectionId, type StudyPath, sectionOfInput } from '@ohmstead/sheet';
import { type Fault, faultLine, STUDY_FILE } from '@ohmstead/study';
import type { Question } from '../desk/missing.ts';

/** `cases[0].duration_s` → `['cases', 0, 'duration_s']`. */
export function pathOfPlace(place: string): StudyPath {
  return [...place.matchAll(/[^.[\]]+/g)].map(([part]) => (/^\d+$/.test(part) ? Number(part) : part));
}

/** Whether what a fault finds missing is asked for by one of the questions. */
export function isAskedFor({ file, place }: Fault, questions: readonly Question[]): boolean {
  if (file !== STUDY_FILE || place === undefined) return false;
  const at = pathOfPlace(place);
  return questions.some(
    ({ id, answers }) =>
      id === place ||
      answers.some((answer) => answer.kind !== 'table' && at.every((part, i) => answer.path[i] === part)),
  );
}

/** Section of a fault: that of its input, of its table, or of the study's assumptions. */
export function sectionOfFault({ file, place }: Fault): SectionId {
  if (file !== 'study.json') return /survey/i.test(file) ? 'ground' : 'electrode';
  return (place === undefined ? undefined : sectionOfInput(pathOfPlace(place))) ?? 'assumed';
}

/** Faults of a section in words. */
export function faultsOfSection(faults: readonly Fault[], section: SectionId): readonly string[] {
  return faults.filter((fault) => sectionOfFault(fault) === section).map(faultLine);
}

/** Complaints about exactly one input. */
export function complaintsAt(faults: readonly Fault[], path: StudyPath): readonly string[] {
  const wanted = JSON.stringify(path);
  return faults
    .filter(
      ({ file, place }) =>
        file === 'study.json' && place !== undefined && JSON.stringify(pathOfPlace(place)) === wanted,
    )
    .map(({ message }) => message);
}
