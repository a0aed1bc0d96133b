// Potential and touch voltage of one case at places the user names.
import { potentialAt } from '@ohmstead/core';
import { type Fault, InputFaults } from '../fault.ts';
import { STUDY_FILE } from '../input/read-study-json.ts';
import type { LoadedStudy } from '../study.ts';
import { caseResult } from './case-results.ts';
import { groundOf } from './ground-of.ts';
import { type Progress, solveLevels } from './levels.ts';
import { limitsOf } from './limits-of.ts';
import { prepare } from './prepare.ts';

export interface FieldPoint {
  readonly x_m: number;
  readonly y_m: number;
  readonly depth_m: number;
}

export interface FieldValue extends FieldPoint {
  readonly potential_V: number;
  /** potential of the nearest energised metal minus that of the place */
  readonly touch_V: number;
}

/**
 * @param caseName undefined for the first case
 * @throws InputFaults when no case has that name, or the drawing has faults
 */
export async function fieldAt(
  loaded: LoadedStudy,
  points: readonly FieldPoint[],
  caseName?: string,
  onProgress: Progress = () => {},
): Promise<FieldValue[]> {
  const at = caseName === undefined ? 0 : loaded.study.cases.findIndex((c) => c.name === caseName);
  if (at < 0) throw new InputFaults([unknownCase(loaded, caseName ?? '')]);
  const prepared = prepare(loaded, groundOf(loaded).soil);
  const solved = await solveLevels(prepared, { progress: onProgress });
  const unit = solved.units[solved.unitOfCase[at]!]!;
  const current = caseResult(
    loaded.study.cases[at]!,
    unit,
    solved.mesh,
    limitsOf(loaded.study, prepared.soil.layers[0]!.resistivity),
  ).result.grid_current_A;
  const { leakage } = solved.graph.units[solved.unitOfCase[at]!]!;
  return points.map((point) => {
    const potential =
      current * potentialAt(solved.mesh, solved.images, leakage, point.x_m, point.y_m, point.depth_m);
    return {
      ...point,
      potential_V: potential,
      touch_V: current * unit.metal(point.x_m, point.y_m) - potential,
    };
  });
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
