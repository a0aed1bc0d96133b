// Lists touch and step voltage of every case in every season against their limits, and marks what governs.
import type { CaseResult, Results, SeasonCase, WorstStep, WorstTouch } from '@ohmstead/study';
import { findingOf } from './finding.ts';
import { footingOf, type VerdictRow } from './rows.ts';

export interface SeasonRow extends VerdictRow {
  /** smallest margin of its case and kind over all seasons */
  readonly governs: boolean;
}

/** Name of the soil that the study was solved in first. */
export const AS_GIVEN = 'as given';

function rowOf(
  results: Results,
  caseIndex: number,
  kind: 'touch' | 'step',
  season: string,
  of: CaseResult | SeasonCase,
  governing: string | undefined,
): SeasonRow {
  const voltage: WorstTouch | WorstStep = of[kind];
  const { worst_V: worst, uncertainty_V: uncertainty, limit_V: limit } = voltage;
  return {
    caseIndex,
    caseName: of.name,
    kind,
    subject: `${kind}, ${season}`,
    season,
    worst,
    uncertainty,
    limit,
    footing: footingOf(results, voltage.on_covering),
    share: worst / limit,
    finding: findingOf(worst, uncertainty, limit),
    x: voltage.x_m,
    y: voltage.y_m,
    governs: season === governing,
  };
}

/** Case by case, touch before step, the soil as given before the seasons; empty where the study names none. */
export function seasonRows(results: Results): readonly SeasonRow[] {
  const { cases, seasons, envelope } = results;
  if (seasons.length === 0) return [];
  return cases.flatMap((given, index) =>
    (['touch', 'step'] as const).flatMap((kind) => {
      const governing = envelope[index]?.[kind].season;
      return [
        rowOf(results, index, kind, AS_GIVEN, given, governing),
        ...seasons.flatMap((season) => {
          const of = season.cases[index];
          return of === undefined ? [] : [rowOf(results, index, kind, season.name, of, governing)];
        }),
      ];
    }),
  );
}
