// The results file: headline numbers of a study with units in every key. Names are fixed by contract; adding is free.

import type { EquivalentUniform, GroundResult } from './ground.ts';
import type { ResultsWarning } from './results-warning.ts';

export type { ResultsWarning };

export interface WorstTouch {
  readonly worst_V: number;
  /** numerical, from mesh refinement */
  readonly uncertainty_V: number;
  readonly x_m: number;
  readonly y_m: number;
  /** whether the feet stand on the covering there; the limit is that of the ground under them */
  readonly on_covering: boolean;
  readonly limit_V: number;
  readonly within_limit: boolean;
  /** (limit − worst)/limit, % ; negative beyond the limit */
  readonly margin_percent: number;
}

export interface WorstStep extends WorstTouch {
  /** the two feet; x_m, y_m is the place midway */
  readonly from: { readonly x_m: number; readonly y_m: number };
  readonly to: { readonly x_m: number; readonly y_m: number };
}

export interface CaseResult {
  readonly name: string;
  readonly fault_current_A: number | null;
  readonly division_factor: number | null;
  readonly decrement_factor: number;
  readonly duration_s: number;
  readonly frequency_hz: number;
  readonly x_over_r: number | null;
  /** current that enters the ground, decrement included */
  readonly grid_current_A: number;
  readonly inject: { readonly x_m: number; readonly y_m: number; readonly depth_m: number };
  /** seen at this case's place of injection */
  readonly resistance_ohm: number;
  readonly resistance_uncertainty_ohm: number;
  readonly gpr_V: number;
  readonly gpr_uncertainty_V: number;
  /** limits on bare soil, and on the covering where there is one */
  readonly bare_touch_limit_V: number;
  readonly bare_step_limit_V: number;
  readonly covering_touch_limit_V: number | null;
  readonly covering_step_limit_V: number | null;
  readonly touch: WorstTouch;
  readonly step: WorstStep;
}

export interface ElectrodeResult {
  readonly name: string;
  readonly role: 'energised' | 'floating';
  /** pieces of metal that no joint connects */
  readonly piece_count: number;
  /** of the ground potential rise; floating metal: the potential of its piece that takes most */
  readonly potential_ratio: number;
  readonly potential_uncertainty_ratio: number;
  /** of the injected current, net into the soil */
  readonly leakage_ratio: number;
  readonly conductor_count: number;
  readonly rod_count: number;
  readonly conductor_length_m: number;
  /** floating metal: the worst voltage to the soil within 1 m of it, of the rise, signed, and where; null for energised */
  readonly touch_ratio: number | null;
  readonly touch_uncertainty_ratio: number | null;
  readonly touch_on_covering: boolean | null;
  readonly touch_x_m: number | null;
  readonly touch_y_m: number | null;
}

export interface LimitsResult {
  readonly basis: 'IEEE 80';
  readonly body_mass_kg: 50 | 70;
  readonly soil_resistivity_ohm_m: number;
  readonly surfacing_resistivity_ohm_m: number | null;
  readonly surfacing_thickness_m: number | null;
  /** covering derating factor Cs */
  readonly covering_factor: number;
}

/** One case in one season. */
export interface SeasonCase {
  readonly name: string;
  readonly grid_current_A: number;
  readonly gpr_V: number;
  readonly gpr_uncertainty_V: number;
  readonly touch: WorstTouch;
  readonly step: WorstStep;
}

/** The study solved in another season's soil; same order of cases as the study. */
export interface SeasonResult {
  readonly name: string;
  readonly layers: readonly { readonly resistivity_ohm_m: number; readonly thickness_m: number | null }[];
  readonly covering_factor: number;
  readonly resistance_ohm: number;
  readonly resistance_uncertainty_ohm: number;
  readonly segment_count: number;
  readonly cases: readonly SeasonCase[];
}

/** Over the soil as given and every season, by case: the value that governs and the season it comes from. */
export interface EnvelopeCase {
  readonly name: string;
  readonly gpr: { readonly season: string; readonly gpr_V: number };
  /** smallest margin, not largest voltage: limits change with the season too */
  readonly touch: WorstTouch & { readonly season: string };
  readonly step: WorstStep & { readonly season: string };
}

export interface MeshLevel {
  readonly segment_count: number;
  readonly resistance_ohm: number;
  readonly worst_touch_ratio: number;
  readonly worst_step_ratio: number;
}

export interface Results {
  readonly format: 'ohmstead-results';
  readonly version: 1;
  readonly program_version: string;
  readonly title: string;
  readonly metal_model: 'resistive' | 'equipotential';
  readonly electrode: {
    readonly resistance_ohm: number;
    readonly resistance_uncertainty_ohm: number;
    readonly segment_count: number;
    readonly node_count: number;
    readonly conductor_count: number;
    readonly rod_count: number;
    readonly conductor_length_m: number;
  };
  readonly electrodes: readonly ElectrodeResult[];
  readonly checks: {
    /** (current arriving at remote earth − current injected)/current injected */
    readonly current_balance: number;
    /** of the leakage equations, relative */
    readonly residual: number;
    /** largest failure of Kirchhoff's current law at a node of the metal, of the current injected */
    readonly node_balance: number;
    readonly solver_iterations: number;
    /** largest error of the image lists against the exact layer kernel, of the kernel's scale */
    readonly image_error: number;
    readonly image_count: number;
  };
  readonly soil: {
    readonly layers: readonly { readonly resistivity_ohm_m: number; readonly thickness_m: number | null }[];
  };
  /** where the soil was fitted to field readings */
  readonly ground: GroundResult | null;
  /** hand values of an equivalent uniform soil; empty in uniform soil */
  readonly equivalent_uniform: readonly EquivalentUniform[];
  readonly limits: LimitsResult;
  readonly mesh: readonly MeshLevel[];
  /** empty where the study names none */
  readonly seasons: readonly SeasonResult[];
  readonly envelope: readonly EnvelopeCase[];
  readonly cases: readonly CaseResult[];
  readonly snaps: readonly {
    readonly id: string;
    readonly other_id: string;
    readonly x_m: number;
    readonly y_m: number;
    readonly depth_m: number;
    readonly distance_m: number;
  }[];
  /** what was taken for granted */
  readonly assumptions: readonly ResultsWarning[];
  /** doubts of engineering */
  readonly warnings: readonly ResultsWarning[];
}
