// What a solved study comes to, as results.json holds it.
import { isRod, spacingDoubts } from '@ohmstead/core';
import type { EquivalentUniform, GroundResult } from '../ground.ts';
import type { Results, ResultsWarning } from '../results.ts';
import type { LoadedStudy } from '../study.ts';
import { programVersion } from '../version.ts';
import type { caseResult } from './case-results.ts';
import { electrodeResults } from './electrode-results.ts';
import type { Ground } from './ground-of.ts';
import type { Solved } from './levels.ts';
import { limitsOf } from './limits-of.ts';
import type { Prepared } from './prepare.ts';
import { conductorLength, isEnergised } from './roles.ts';
import { envelope, type Seasonal } from './seasons.ts';
import { layersOf } from './soil-results.ts';

/** What is solved beside the study's own soil. */
export interface Beside {
  readonly seasonal: readonly Seasonal[];
  /** fit of a survey and its consequence */
  readonly ground: GroundResult | undefined;
  readonly uniform: readonly EquivalentUniform[];
}

export const NOTHING_BESIDE: Beside = { seasonal: [], ground: undefined, uniform: [] };

export function resultsOf(
  prepared: Prepared,
  ground: Ground,
  solved: Solved,
  cases: readonly ReturnType<typeof caseResult>[],
  beside: Beside,
): Results {
  const base = cases.map(({ result }) => result);
  const seasons = beside.seasonal.map(({ result }) => result);
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
    ground: beside.ground ?? null,
    equivalent_uniform: beside.uniform,
    limits: limitsOf(loaded.study, prepared.soil.layers[0]!.resistivity),
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
      ...[...cases, ...beside.seasonal].flatMap(({ warnings }) => warnings),
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
