// An outcome with another season, by a factor on its voltages: nobody's numbers.
import type { CaseResult, Outcome } from '@ohmstead/study';

export interface SeasonOptions {
  readonly name: string;
  /** voltages in that season, times those in the soil as given */
  readonly times: number;
}

/** The outcome with one other season whose voltages are larger or smaller by a factor. */
export function withSeason(outcome: Outcome, { name, times }: SeasonOptions): Outcome {
  const { results } = outcome;
  const scaled = <T extends CaseResult['touch']>(of: T): T => ({
    ...of,
    worst_V: of.worst_V * times,
    within_limit: of.worst_V * times <= of.limit_V,
    margin_percent: 100 * (1 - (of.worst_V * times) / of.limit_V),
  });
  const cases = results.cases.map((c) => ({
    name: c.name,
    grid_current_A: c.grid_current_A,
    gpr_V: c.gpr_V * times,
    gpr_uncertainty_V: c.gpr_uncertainty_V,
    touch: scaled(c.touch),
    step: scaled(c.step),
  }));
  const season = times > 1 ? name : 'as given';
  const envelope = results.cases.map((c, k) => {
    const of = times > 1 ? cases[k] : c;
    return {
      name: c.name,
      gpr: { season, gpr_V: of.gpr_V },
      touch: { ...of.touch, season },
      step: { ...of.step, season },
    };
  });
  const dry = {
    name,
    layers: [
      { resistivity_ohm_m: 900, thickness_m: 1.5 },
      { resistivity_ohm_m: 100, thickness_m: null },
    ],
    covering_factor: 0.8,
    resistance_ohm: 3.2,
    resistance_uncertainty_ohm: 0.01,
    segment_count: 300,
    cases,
  };
  return { ...outcome, results: { ...results, seasons: [dry], envelope } };
}
