// One fault case: current into the ground, rise, and the worst touch and step voltages against their limits.
import { decrementFactor, gridCurrent, judge, type SegmentMesh, type Verdict } from '@ohmstead/core';
import { DEFAULT_DIVISION_FACTOR, DEFAULT_FREQUENCY_HZ } from '../input/defaults.ts';
import type { CaseResult, LimitsResult, ResultsWarning, WorstTouch } from '../results.ts';
import type { CaseInput } from '../study.ts';
import type { UnitField } from './levels.ts';
import { caseLimits } from './limits-of.ts';

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
  const limit = caseLimits(limits, input.duration_s);
  const touch = judge(current * unit.worstTouch.value, current * unit.touchUncertainty, limit.touch);
  const step = judge(current * unit.worstStep.value, current * unit.stepUncertainty, limit.step);
  const node = unit.injectionNode;
  const { from, to } = unit.worstStep;
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
      touch: worst(
        touch,
        current * unit.worstTouch.value,
        current * unit.touchUncertainty,
        limit.touch,
        unit.worstTouch,
      ),
      step: {
        ...worst(
          step,
          current * unit.worstStep.value,
          current * unit.stepUncertainty,
          limit.step,
          unit.worstStep,
        ),
        from: { x_m: from[0], y_m: from[1] },
        to: { x_m: to[0], y_m: to[1] },
      },
    },
    warnings: [...undecided(input.name, 'touch', touch), ...undecided(input.name, 'step', step)],
  };
}

function worst(
  verdict: Verdict,
  value: number,
  uncertainty: number,
  limit: number,
  place: { readonly x: number; readonly y: number },
): WorstTouch {
  return {
    worst_V: value,
    uncertainty_V: uncertainty,
    x_m: place.x,
    y_m: place.y,
    limit_V: limit,
    within_limit: verdict.withinLimit,
    margin_percent: verdict.marginPercent,
  };
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
