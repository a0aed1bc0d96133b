// Potential and touch voltage of one case at places the user names.
import type { Crew } from '@ohmstead/core';
import { type Fault, InputFaults } from '../fault.ts';
import { STUDY_FILE } from '../input/read-study-json.ts';
import type { LoadedStudy } from '../study.ts';
import { caseResult } from './case-results.ts';
import { groundOf } from './ground-of.ts';
import { type Progress, solveLevels } from './levels.ts';
import { limitsOf } from './limits-of.ts';
import { prepare } from './prepare.ts';
import { type FieldPoint, type FieldValue, solvedField } from './solved-field.ts';

/**
 * @param caseName undefined for the first case
 * @throws InputFaults when no case has that name, or the drawing has faults
 */
export async function fieldAt(
  loaded: LoadedStudy,
  points: readonly FieldPoint[],
  caseName?: string,
  onProgress: Progress = () => {},
  crew?: Crew,
): Promise<FieldValue[]> {
  const at = caseName === undefined ? 0 : loaded.study.cases.findIndex((c) => c.name === caseName);
  if (at < 0) throw new InputFaults([unknownCase(loaded, caseName ?? '')]);
  const prepared = prepare(loaded, groundOf(loaded).soil);
  const solved = await solveLevels(prepared, { progress: onProgress, crew });
  const limits = limitsOf(loaded.study, prepared.soil.layers[0]!.resistivity);
  const currents = loaded.study.cases.map(
    (input, c) =>
      caseResult(input, solved.units[solved.unitOfCase[c]!]!, solved.mesh, limits).result.grid_current_A,
  );
  return solvedField(solved, currents).at(at, points);
}

function unknownCase(loaded: LoadedStudy, name: string): Fault {
  const known = loaded.study.cases.map((c) => c.name).join(', ');
  return {
    file: STUDY_FILE,
    place: 'cases',
    code: 'unknown-case',
    message: `no case is named ${name}; the study has ${known}`,
  };
}
