// Tables of the fault cases: currents, rise and worst voltages; limits; profiles.
import type { CaseResult, Outcome, SeasonCase } from '@ohmstead/study';
import { type VerdictRow, verdictRows } from '../verdict/rows.ts';
import { type Column, csvOf } from './csv.ts';

const CASE_COLUMNS: readonly Column<CaseResult>[] = [
  { name: 'case', value: (c) => c.name },
  { name: 'fault_current_A', value: (c) => c.fault_current_A },
  { name: 'division_factor', value: (c) => c.division_factor },
  { name: 'x_over_r', value: (c) => c.x_over_r },
  { name: 'frequency_hz', value: (c) => c.frequency_hz },
  { name: 'duration_s', value: (c) => c.duration_s },
  { name: 'decrement_factor', value: (c) => c.decrement_factor },
  { name: 'grid_current_A', value: (c) => c.grid_current_A },
  { name: 'inject_x_m', value: (c) => c.inject.x_m },
  { name: 'inject_y_m', value: (c) => c.inject.y_m },
  { name: 'inject_depth_m', value: (c) => c.inject.depth_m },
  { name: 'resistance_ohm', value: (c) => c.resistance_ohm },
  { name: 'resistance_uncertainty_ohm', value: (c) => c.resistance_uncertainty_ohm },
  { name: 'gpr_V', value: (c) => c.gpr_V },
  { name: 'gpr_uncertainty_V', value: (c) => c.gpr_uncertainty_V },
  { name: 'touch_worst_V', value: (c) => c.touch.worst_V },
  { name: 'touch_uncertainty_V', value: (c) => c.touch.uncertainty_V },
  { name: 'touch_x_m', value: (c) => c.touch.x_m },
  { name: 'touch_y_m', value: (c) => c.touch.y_m },
  { name: 'step_worst_V', value: (c) => c.step.worst_V },
  { name: 'step_uncertainty_V', value: (c) => c.step.uncertainty_V },
  { name: 'step_from_x_m', value: (c) => c.step.from.x_m },
  { name: 'step_from_y_m', value: (c) => c.step.from.y_m },
  { name: 'step_to_x_m', value: (c) => c.step.to.x_m },
  { name: 'step_to_y_m', value: (c) => c.step.to.y_m },
];

/** One row a case. */
export function casesCsv(outcome: Outcome): string {
  return csvOf(CASE_COLUMNS, outcome.results.cases);
}

/** One row a comparison with a limit, and what the limit rests on. */
export function limitsCsv(outcome: Outcome): string {
  const { limits, cases } = outcome.results;
  const columns: readonly Column<VerdictRow>[] = [
    { name: 'case', value: (r) => r.caseName },
    { name: 'quantity', value: (r) => r.subject },
    { name: 'season', value: (r) => r.season ?? 'as given' },
    { name: 'worst_V', value: (r) => r.worst },
    { name: 'uncertainty_V', value: (r) => r.uncertainty },
    { name: 'x_m', value: (r) => r.x },
    { name: 'y_m', value: (r) => r.y },
    { name: 'limit_V', value: (r) => r.limit },
    { name: 'ground_under_feet', value: (r) => r.footing ?? 'bare soil' },
    { name: 'margin_percent', value: (r) => 100 * (1 - r.share) },
    { name: 'finding', value: (r) => r.finding },
    { name: 'duration_s', value: (r) => cases[r.caseIndex].duration_s },
    { name: 'basis', value: () => limits.basis },
    { name: 'body_mass_kg', value: () => limits.body_mass_kg },
    { name: 'soil_resistivity_ohm_m', value: () => limits.soil_resistivity_ohm_m },
    { name: 'surfacing_resistivity_ohm_m', value: () => limits.surfacing_resistivity_ohm_m },
    { name: 'surfacing_thickness_m', value: () => limits.surfacing_thickness_m },
    { name: 'covering_factor', value: () => limits.covering_factor },
  ];
  return csvOf(columns, verdictRows(outcome.results));
}

interface SeasonRow {
  readonly season: string;
  readonly resistance: readonly [value: number, uncertainty: number];
  readonly covering: number;
  readonly of: SeasonCase;
}

const SEASON_COLUMNS: readonly Column<SeasonRow>[] = [
  { name: 'season', value: (r) => r.season },
  { name: 'case', value: (r) => r.of.name },
  { name: 'resistance_ohm', value: (r) => r.resistance[0] },
  { name: 'resistance_uncertainty_ohm', value: (r) => r.resistance[1] },
  { name: 'covering_factor', value: (r) => r.covering },
  { name: 'grid_current_A', value: (r) => r.of.grid_current_A },
  { name: 'gpr_V', value: (r) => r.of.gpr_V },
  { name: 'gpr_uncertainty_V', value: (r) => r.of.gpr_uncertainty_V },
  { name: 'touch_worst_V', value: (r) => r.of.touch.worst_V },
  { name: 'touch_uncertainty_V', value: (r) => r.of.touch.uncertainty_V },
  { name: 'touch_x_m', value: (r) => r.of.touch.x_m },
  { name: 'touch_y_m', value: (r) => r.of.touch.y_m },
  { name: 'touch_limit_V', value: (r) => r.of.touch.limit_V },
  { name: 'touch_margin_percent', value: (r) => r.of.touch.margin_percent },
  { name: 'step_worst_V', value: (r) => r.of.step.worst_V },
  { name: 'step_uncertainty_V', value: (r) => r.of.step.uncertainty_V },
  { name: 'step_x_m', value: (r) => r.of.step.x_m },
  { name: 'step_y_m', value: (r) => r.of.step.y_m },
  { name: 'step_limit_V', value: (r) => r.of.step.limit_V },
  { name: 'step_margin_percent', value: (r) => r.of.step.margin_percent },
];

/** One row a case and season other than the soil as given. */
export function seasonsCsv({ results }: Outcome): string {
  const rows = results.seasons.flatMap((season) =>
    season.cases.map(
      (of): SeasonRow => ({
        season: season.name,
        resistance: [season.resistance_ohm, season.resistance_uncertainty_ohm],
        covering: season.covering_factor,
        of,
      }),
    ),
  );
  return csvOf(SEASON_COLUMNS, rows);
}

/** One row a point of the profile through the worst touch voltage of a case. */
export function profileCsv(outcome: Outcome, caseIndex: number): string {
  const { from, to, distance, potential, touch } = outcome.cases[caseIndex].profile;
  const limit = outcome.results.cases[caseIndex].touch.limit_V;
  const length = Math.hypot(to[0] - from[0], to[1] - from[1]);
  const at = (axis: 0 | 1, k: number): number =>
    length > 0 ? from[axis] + (distance[k] / length) * (to[axis] - from[axis]) : from[axis];
  const columns: readonly Column<number>[] = [
    { name: 'distance_m', value: (k) => distance[k] },
    { name: 'x_m', value: (k) => at(0, k) },
    { name: 'y_m', value: (k) => at(1, k) },
    { name: 'potential_V', value: (k) => potential[k] },
    { name: 'touch_V', value: (k) => touch[k] },
    { name: 'touch_limit_V', value: () => limit },
  ];
  return csvOf(columns, Array.from(distance.keys()));
}
