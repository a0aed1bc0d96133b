// The chain from a loaded study to everything that the sheet, the pack and the command line show.
import { isRod, spacingDoubts } from '@ohmstead/core';
import type { Outcome } from '../outcome.ts';
import type { Results, ResultsWarning } from '../results.ts';
import type { LoadedStudy } from '../study.ts';
import { programVersion } from '../version.ts';
import { caseResult } from './case-results.ts';
import { consequenceOf } from './consequence.ts';
import { caseFigures, planOf, segmentTable } from './drawing.ts';
import { electrodeResults } from './electrode-results.ts';
import { equivalentUniform } from './equivalent-uniform.ts';
import { assessedBox } from './extent.ts';
import { type Ground, groundOf } from './ground-of.ts';
import { type Progress, type Solved, solveLevels } from './levels.ts';
import { limitsOf } from './limits-of.ts';
import { type Prepared, prepare } from './prepare.ts';
import { conductorLength, isEnergised } from './roles.ts';
import { envelope, type Seasonal, seasonResults } from './seasons.ts';
import { layersOf } from './soil-results.ts';

export interface SolveOptions {
  /** told of long work: a stage in words and the share done, 0 to 1 */
  readonly onProgress?: Progress;
}

/** @throws InputFaults when the drawing has faults; SolverStalled or NotPositiveDefinite for a fault of the program */
export async function solveStudy(loaded: LoadedStudy, options: SolveOptions = {}): Promise<Outcome> {
  const progress = options.onProgress ?? (() => {});
  await progress('joining conductors', 0);
  const ground = groundOf(loaded);
  const prepared = prepare(loaded, ground.soil);
  const solved = await solveLevels(prepared, progress);
  const limits = limitsOf(loaded.study, prepared.soil.layers[0]!.resistivity);
  const unitOf = (c: number) => solved.units[solved.unitOfCase[c]!]!;
  const cases = loaded.study.cases.map((input, c) => caseResult(input, unitOf(c), solved.mesh, limits));
  const box = assessedBox(prepared);
  const seasonal = await seasonResults(prepared, progress);
  return {
    study: loaded.study,
    results: await resultsOf(prepared, solved, limits, cases, seasonal, ground, progress),
    plan: planOf(prepared),
    segments: segmentTable(solved),
    cases: cases.map(({ result }, c) =>
      caseFigures(result.name, result.grid_current_A, unitOf(c), box, {
        x: result.touch.x_m,
        y: result.touch.y_m,
      }),
    ),
  };
}

async function resultsOf(
  prepared: Prepared,
  solved: Solved,
  limits: Results['limits'],
  cases: readonly ReturnType<typeof caseResult>[],
  seasonal: readonly Seasonal[],
  ground: Ground,
  progress: Progress,
): Promise<Results> {
  const base = cases.map(({ result }) => result);
  const seasons = seasonal.map(({ result }) => result);
  const { loaded, joints } = prepared;
  const table = loaded.conductors;
  const energised = Array.from({ length: table.count }, (_, i) => i).filter((i) => isEnergised(prepared, i));
  const first = solved.units[solved.unitOfCase[0]!]!;
  const worst = (of: (unit: Solved['graph']['units'][number]) => number): number =>
    solved.graph.units.reduce((most, unit) => Math.max(most, Math.abs(of(unit))), 0);
  const images = usedImages(solved);
  return {
    format: 'ohmstead-results',
    version: 1,
    program_version: programVersion,
    title: loaded.study.title,
    metal_model: loaded.study.metal_model ?? 'resistive',
    electrode: {
      resistance_ohm: first.resistance,
      resistance_uncertainty_ohm: first.resistanceUncertainty,
      segment_count: solved.mesh.count,
      node_count: joints.nodeCount,
      conductor_count: energised.length,
      rod_count: energised.filter((i) => isRod(table, i)).length,
      conductor_length_m: energised.reduce((sum, i) => sum + conductorLength(table, i), 0),
    },
    electrodes: electrodeResults(prepared, solved),
    checks: {
      current_balance: worst((unit) => unit.balance),
      residual: worst((unit) => unit.residual),
      node_balance: worst((unit) => unit.nodeBalance),
      solver_iterations: solved.graph.iterations,
      image_error: images.error,
      image_count: images.count,
    },
    soil: { layers: layersOf(prepared.soil) },
    ground:
      ground.fitted === undefined
        ? null
        : {
            fit: ground.fitted.fit,
            consequence: await consequenceOf(prepared, solved, base, ground.fitted.members, progress),
          },
    equivalent_uniform: await equivalentUniform(prepared, solved),
    limits,
    mesh: solved.levels,
    seasons,
    envelope: seasons.length === 0 ? [] : envelope(base, seasons),
    cases: base,
    snaps: joints.snaps.map((snap) => ({
      id: table.id[snap.conductor]!,
      other_id: table.id[snap.other]!,
      x_m: snap.x,
      y_m: snap.y,
      depth_m: snap.depth,
      distance_m: snap.distance,
    })),
    assumptions: [...loaded.notes, ...prepared.assumptions],
    warnings: [
      ...prepared.warnings,
      ...groundDoubts(prepared, ground),
      ...doubts(loaded, prepared.soil.layers[0]!.resistivity),
      ...[...cases, ...seasonal].flatMap(({ warnings }) => warnings),
    ],
  };
}

/** Images of all layer pairs that the mesh and the surface use, and the largest error of their fits. */
function usedImages(solved: Solved): { count: number; error: number } {
  const layers = [...new Set(solved.mesh.layer)].sort((a, b) => a - b);
  let count = 0;
  let error = 0;
  for (const source of layers)
    for (const field of new Set([0, ...layers])) {
      const list = solved.images.list(source, field);
      count += list.count;
      error = Math.max(error, list.error);
    }
  return { count, error };
}

/** Doubts about the survey itself, and about it against the electrode that it is used for. */
function groundDoubts({ loaded, joints, energised }: Prepared, ground: Ground): readonly ResultsWarning[] {
  if (loaded.survey === undefined || ground.fitted === undefined) return [];
  const nodes = Array.from({ length: joints.nodeCount }, (_, n) => n).filter((n) =>
    energised.has(joints.nodeComponent[n]!),
  );
  const extent = (values: Float64Array): number =>
    nodes.reduce((most, n) => Math.max(most, values[n]!), Number.NEGATIVE_INFINITY) -
    nodes.reduce((least, n) => Math.min(least, values[n]!), Number.POSITIVE_INFINITY);
  const shallowest = nodes.reduce(
    (least, n) => Math.min(least, joints.nodeDepth[n]!),
    Number.POSITIVE_INFINITY,
  );
  const diagonal = Math.hypot(extent(joints.nodeX), extent(joints.nodeY));
  return [
    ...ground.fitted.fit.doubts,
    ...spacingDoubts(loaded.survey.readings, diagonal, shallowest > 0 ? shallowest : undefined),
  ];
}

function doubts(loaded: LoadedStudy, soil: number): ResultsWarning[] {
  const { surfacing } = loaded.study;
  if (surfacing === undefined) return [];
  const poor: ResultsWarning[] =
    surfacing.resistivity_ohm_m >= soil
      ? []
      : [
          {
            code: 'soil-more-resistive-than-covering',
            message: `the covering, ${surfacing.resistivity_ohm_m} Ω·m, conducts better than the soil under it, ${soil} Ω·m: the covering factor is held at 1`,
          },
        ];
  return [
    ...poor,
    {
      code: 'surfacing-assumed-wet',
      message: `the covering is taken at ${surfacing.resistivity_ohm_m} Ω·m in its worst, wet state and present wherever it is said to lie`,
    },
  ];
}
