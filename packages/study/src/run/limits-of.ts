// The tolerable voltages that the study's basis gives a case.
import { coveringDeratingFactor, tolerableStepVoltage, tolerableTouchVoltage } from '@ohmstead/core';
import type { LimitsResult } from '../results.ts';
import type { Study } from '../study.ts';
import type { Footing } from './zones.ts';

/** @param soil resistivity of the top layer, Ω·m */
export function limitsOf(study: Study, soil: number): LimitsResult {
  const covering = study.surfacing;
  return {
    basis: 'IEEE 80',
    body_mass_kg: study.limits.body_mass_kg,
    soil_resistivity_ohm_m: soil,
    surfacing_resistivity_ohm_m: covering?.resistivity_ohm_m ?? null,
    surfacing_thickness_m: covering?.thickness_m ?? null,
    covering_factor: coveringDeratingFactor(
      soil,
      covering === undefined
        ? undefined
        : { resistivity: covering.resistivity_ohm_m, thickness: covering.thickness_m },
    ),
  };
}

export interface CaseLimits {
  readonly touch: number;
  readonly step: number;
}

/** Tolerable voltages where people stand on the covering, or on bare soil. @param duration of the shock, s */
export function caseLimits(limits: LimitsResult, duration: number, footing: Footing): CaseLimits {
  const under =
    footing === 'covering' && limits.surfacing_resistivity_ohm_m !== null
      ? { resistivity: limits.surfacing_resistivity_ohm_m, coveringFactor: limits.covering_factor }
      : { resistivity: limits.soil_resistivity_ohm_m, coveringFactor: 1 };
  return {
    touch: tolerableTouchVoltage(limits.body_mass_kg, duration, under),
    step: tolerableStepVoltage(limits.body_mass_kg, duration, under),
  };
}
