// One fault case: current into the ground, rise, and the worst touch and step voltages against their limits.
import {
  decrementFactor,
  gridCurrent,
  judge,
  type SegmentMesh,
  type Verdict,
  type WorstPlace,
} from '@ohmstead/core';
import { DEFAULT_DIVISION_FACTOR, DEFAULT_FREQUENCY_HZ } from '../input/defaults.ts';
import type { CaseResult, LimitsResult, ResultsWarning, WorstTouch } from '../results.ts';
import type { CaseInput } from '../study.ts';
import type { Uncertain, UnitField, ZoneWorst } from './levels.ts';
import { type CaseLimits, caseLimits } from './limits-of.ts';
import type { Footing } from './zones.ts';

export function caseResult(
  input: CaseInput,
  unit: UnitField,
  mesh: SegmentMesh,
  limits: LimitsResult,
): { readonly result: CaseResult; readonly warnings: readonly ResultsWarning[] } {
  const frequency = input.frequency_hz ?? DEFAULT_FREQUENCY_HZ;
  const decrement = decrementFactor(input.x_over_r, frequency, input.duration_s);
  const division = input.division_factor ?? DEFAULT_DIVISION_FACTOR;
  const current = gridCurrent(
    input.grid_current_A === undefined
      ? { faultCurrent: input.fault_current_A!, divisionFactor: division, decrementFactor: decrement }
      : { faultCurrent: input.grid_current_A, divisionFactor: 1, decrementFactor: decrement },
  );
  const bare = caseLimits(limits, input.duration_s, 'bare');
  const covered = caseLimits(limits, input.duration_s, 'covering');
  const on = (footing: Footing): CaseLimits => (footing === 'covering' ? covered : bare);
  const touch = governing(
    unit.zones,
    current,
    (zone) => zone.touch,
    (footing) => on(footing).touch,
  );
  const step = governing(
    unit.zones,
    current,
    (zone) => zone.step,
    (footing) => on(footing).step,
  );
  const node = unit.injectionNode;
  const { from, to } = step.place;
  return {
    result: {
      name: input.name,
      fault_current_A: input.fault_current_A ?? null,
      division_factor: input.fault_current_A === undefined ? null : division,
      decrement_factor: decrement,
      duration_s: input.duration_s,
      frequency_hz: frequency,
      x_over_r: input.x_over_r ?? null,
      grid_current_A: current,
      inject: { x_m: mesh.nodeX[node]!, y_m: mesh.nodeY[node]!, depth_m: mesh.nodeZ[node]! },
      resistance_ohm: unit.resistance,
      resistance_uncertainty_ohm: unit.resistanceUncertainty,
      gpr_V: current * unit.resistance,
      gpr_uncertainty_V: current * unit.resistanceUncertainty,
      bare_touch_limit_V: bare.touch,
      bare_step_limit_V: bare.step,
      covering_touch_limit_V: limits.surfacing_resistivity_ohm_m === null ? null : covered.touch,
      covering_step_limit_V: limits.surfacing_resistivity_ohm_m === null ? null : covered.step,
      touch: touch.worst,
      step: { ...step.worst, from: { x_m: from[0], y_m: from[1] }, to: { x_m: to[0], y_m: to[1] } },
    },
    warnings: [
      ...undecided(input.name, 'touch', touch.verdict),
      ...undecided(input.name, 'step', step.verdict),
    ],
  };
}

interface Governing<T> {
  readonly worst: WorstTouch;
  readonly verdict: Verdict;
  readonly place: T;
}

/** The zone whose worst place comes nearest to, or farthest beyond, its own limit. */
function governing<T extends WorstPlace>(
  zones: readonly ZoneWorst[],
  current: number,
  pick: (zone: ZoneWorst) => Uncertain<T> | undefined,
  limitOn: (footing: Footing) => number,
): Governing<T> {
  const judged = zones.flatMap((zone): Governing<T>[] => {
    const place = pick(zone);
    if (place === undefined) return [];
    const limit = limitOn(zone.footing);
    const value = current * place.value;
    const uncertainty = current * place.uncertainty;
    const verdict = judge(value, uncertainty, limit);
    const worst: WorstTouch = {
      worst_V: value,
      uncertainty_V: uncertainty,
      x_m: place.x,
      y_m: place.y,
      on_covering: zone.footing === 'covering',
      limit_V: limit,
      within_limit: verdict.withinLimit,
      margin_percent: verdict.marginPercent,
    };
    return [{ place, verdict, worst }];
  });
  return judged.reduce((a, b) => (b.verdict.marginPercent < a.verdict.marginPercent ? b : a));
}

function undecided(name: string, quantity: string, verdict: Verdict): ResultsWarning[] {
  if (verdict.outcome !== 'undecided') return [];
  return [
    {
      code: 'margin-below-uncertainty',
      message: `case ${name}: the worst ${quantity} voltage lies nearer to its limit than its numerical uncertainty`,
    },
  ];
}
