// The chain from a loaded study to everything that the sheet, the pack and the command line show.
import type { Crew } from '@ohmstead/core';
import type { Outcome } from '../outcome.ts';
import type { LoadedStudy } from '../study.ts';
import { caseResult } from './case-results.ts';
import { consequenceOf } from './consequence.ts';
import { caseFigures, planOf, segmentTable } from './drawing.ts';
import { equivalentUniform } from './equivalent-uniform.ts';
import { assessedBox } from './extent.ts';
import type { Ground } from './ground-of.ts';
import { type Progress, type Solved, solveLevels } from './levels.ts';
import { limitsOf } from './limits-of.ts';
import { type Prepared, prepare } from './prepare.ts';
import { type Beside, NOTHING_BESIDE, resultsOf } from './results-of.ts';
import { seasonResults } from './seasons.ts';
import { noMemory, type SolveMemory } from './solve-memory.ts';
import { type SolvedField, solvedField } from './solved-field.ts';

export interface SolveOptions {
  /** shares in large work; changes no bit of the outcome */
  readonly crew?: Crew | undefined;
  /** told of long work: a stage in words and the share done, 0 to 1 */
  readonly onProgress?: Progress;
  /**
   * given an early outcome from two coarse meshes and a coarse map, with the uncertainties that these leave: without
   * seasons, without the fit's consequence, without the uniform comparison
   */
  readonly onFirst?: (first: Outcome) => void | Promise<void>;
  /** given the field of the solved study, for lines and places that are asked for later; it keeps the solution in memory */
  readonly onField?: (field: SolvedField) => void;
  /** what earlier computations of an edited study left; leave it out for numbers that are recorded */
  readonly memory?: SolveMemory;
  /** memory that may be taken, bytes; a study that needs more is refused with the figure */
  readonly memoryBytes?: number;
}

/** @throws InputFaults when the drawing has faults; SolverStalled or NotPositiveDefinite for a fault of the program */
export async function solveStudy(loaded: LoadedStudy, options: SolveOptions = {}): Promise<Outcome> {
  const progress = options.onProgress ?? (() => {});
  await progress('joining conductors', 0);
  const { onFirst, crew, memory = noMemory } = options;
  const ground = memory.ground(loaded);
  const prepared = prepare(loaded, ground.soil);
  const running = { progress, crew, memory };
  const solved = await solveLevels(prepared, {
    ...running,
    memoryBytes: options.memoryBytes,
    onFirst: onFirst && ((first) => onFirst(outcomeOf(prepared, ground, first, NOTHING_BESIDE))),
  });
  const base = judged(prepared, solved).map(({ result }) => result);
  options.onField?.(
    solvedField(
      solved,
      base.map(({ grid_current_A }) => grid_current_A),
    ),
  );
  const { fitted } = ground;
  return outcomeOf(prepared, ground, solved, {
    seasonal: await seasonResults(prepared, running),
    ground: fitted && {
      fit: fitted.fit,
      consequence: await consequenceOf(prepared, solved, base, fitted.members, running),
    },
    uniform: await equivalentUniform(prepared, solved, crew),
  });
}

function judged(prepared: Prepared, solved: Solved): ReturnType<typeof caseResult>[] {
  const { study } = prepared.loaded;
  const limits = limitsOf(study, prepared.soil.layers[0]!.resistivity);
  return study.cases.map((input, c) =>
    caseResult(input, solved.units[solved.unitOfCase[c]!]!, solved.mesh, limits),
  );
}

function outcomeOf(prepared: Prepared, ground: Ground, solved: Solved, beside: Beside): Outcome {
  const cases = judged(prepared, solved);
  const box = assessedBox(prepared);
  return {
    study: prepared.loaded.study,
    results: resultsOf(prepared, ground, solved, cases, beside),
    plan: planOf(prepared),
    segments: segmentTable(solved),
    cases: cases.map(({ result }, c) =>
      caseFigures(result.name, result.grid_current_A, solved.units[solved.unitOfCase[c]!]!, box, {
        x: result.touch.x_m,
        y: result.touch.y_m,
      }),
    ),
  };
}
