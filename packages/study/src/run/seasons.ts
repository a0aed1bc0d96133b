// Seasonal variants of the soil: each solved as the study is, and which of them governs.
import { type SoilModel, seasonalSoil } from '@ohmstead/core';
import type {
  CaseResult,
  EnvelopeCase,
  ResultsWarning,
  SeasonCase,
  SeasonResult,
  WorstTouch,
} from '../results.ts';
import type { SeasonInput } from '../study.ts';
import { caseResult } from './case-results.ts';
import { type Running, solveLevels } from './levels.ts';
import { limitsOf } from './limits-of.ts';
import { layeredSoil, type Prepared } from './prepare.ts';
import { layersOf } from './soil-results.ts';

/** Name under which the soil of the study itself stands in the envelope. */
export const AS_GIVEN = 'as given';

/** A season's result with the doubts about its verdicts. */
export interface Seasonal {
  readonly result: SeasonResult;
  readonly warnings: readonly ResultsWarning[];
}

export async function seasonResults(prepared: Prepared, running: Running): Promise<Seasonal[]> {
  const results: Seasonal[] = [];
  for (const season of prepared.loaded.study.seasons ?? [])
    results.push(await seasonResult(prepared, season, running));
  return results;
}

async function seasonResult(prepared: Prepared, season: SeasonInput, running: Running): Promise<Seasonal> {
  const { study } = prepared.loaded;
  const soil = soilIn(season, prepared.soil);
  const solved = await solveLevels(
    { ...prepared, soil },
    { ...running, progress: (stage, share) => running.progress(`${season.name}: ${stage}`, share) },
  );
  const limits = limitsOf(study, soil.layers[0]!.resistivity);
  const first = solved.units[solved.unitOfCase[0]!]!;
  const cases = study.cases.map((input, c) =>
    caseResult(input, solved.units[solved.unitOfCase[c]!]!, solved.mesh, limits),
  );
  return {
    result: {
      name: season.name,
      layers: layersOf(soil),
      covering_factor: limits.covering_factor,
      resistance_ohm: first.resistance,
      resistance_uncertainty_ohm: first.resistanceUncertainty,
      segment_count: solved.mesh.count,
      cases: cases.map(({ result: { name, grid_current_A, gpr_V, gpr_uncertainty_V, touch, step } }) => ({
        name,
        grid_current_A,
        gpr_V,
        gpr_uncertainty_V,
        touch,
        step,
      })),
    },
    warnings: cases.flatMap(({ warnings }) =>
      warnings.map(({ code, message }) => ({ code, message: `${season.name}: ${message}` })),
    ),
  };
}

function soilIn(season: SeasonInput, base: SoilModel): SoilModel {
  const start = season.layers === undefined ? base : layeredSoil(season.layers);
  const dried =
    season.top === undefined
      ? start
      : seasonalSoil(start, {
          kind: 'top',
          depth: season.top.depth_m,
          resistivity: season.top.resistivity_ohm_m,
        });
  return season.below === undefined
    ? dried
    : seasonalSoil(dried, {
        kind: 'below',
        depth: season.below.depth_m,
        resistivity: season.below.resistivity_ohm_m,
      });
}

/** By case, what governs over the soil as given and every season: the highest rise and the smallest margins. */
export function envelope(base: readonly CaseResult[], seasons: readonly SeasonResult[]): EnvelopeCase[] {
  return base.map((given, c): EnvelopeCase => {
    const all: { season: string; of: SeasonCase }[] = [
      { season: AS_GIVEN, of: given },
      ...seasons.map((season) => ({ season: season.name, of: season.cases[c]! })),
    ];
    const highest = all.reduce((a, b) => (b.of.gpr_V > a.of.gpr_V ? b : a));
    const narrowest = (pick: (one: SeasonCase) => WorstTouch): (typeof all)[number] =>
      all.reduce((a, b) => (pick(b.of).margin_percent < pick(a.of).margin_percent ? b : a));
    const touch = narrowest((one) => one.touch);
    const step = narrowest((one) => one.step);
    return {
      name: given.name,
      gpr: { season: highest.season, gpr_V: highest.of.gpr_V },
      touch: { ...touch.of.touch, season: touch.season },
      step: { ...step.of.step, season: step.season },
    };
  });
}
