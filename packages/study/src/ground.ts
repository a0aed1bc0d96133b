// What field readings make of the ground: the fit, the family of models they allow, and what that does to the answer.
import type { ResultsWarning } from './results-warning.ts';

/** 5 %, 50 % and 95 % of a family of models beside the best fit. */
export interface Spread {
  readonly best: number;
  readonly low: number;
  readonly median: number;
  readonly high: number;
}

export interface GroundReading {
  /** line of the survey file */
  readonly line: number;
  readonly traverse: string;
  /** pin spacing (Wenner) or half the distance of the current pins (Schlumberger) */
  readonly spacing_m: number;
  readonly apparent_resistivity_ohm_m: number;
  /** of the fitted model, same array */
  readonly model_ohm_m: number;
  /** model over reading, less 1 */
  readonly misfit_percent: number;
  readonly outlier: boolean;
}

export interface FittedLayer {
  readonly resistivity_ohm_m: Spread;
  /** null for the last layer */
  readonly thickness_m: Spread | null;
}

/** How a number of layers did. */
export interface LayerCountTrial {
  readonly layer_count: number;
  readonly rms_percent: number;
  /** of the published criterion that proposes the number; lower is better */
  readonly criterion: number;
}

/** Apparent resistivity against spacing: fitted curve and 5–95 % band of the family. */
export interface SoundingPoint {
  readonly spacing_m: number;
  readonly fitted_ohm_m: number;
  readonly low_ohm_m: number;
  readonly high_ohm_m: number;
}

export interface CaseConsequence {
  readonly name: string;
  readonly gpr_V: Spread;
  readonly touch_V: Spread;
  readonly step_V: Spread;
}

/** Hand value of an equivalent uniform soil, and how far off it is. */
export interface EquivalentUniform {
  readonly name: string;
  readonly source: string;
  readonly resistivity_ohm_m: number;
  /** of the electrode in that uniform soil */
  readonly resistance_ohm: number;
  /** against the resistance in the layered soil */
  readonly deviation_percent: number;
}

/** The fit alone, without an electrode. */
export interface SoilFit {
  readonly survey_file: string;
  readonly outcome: string;
  readonly layer_count: number;
  /** what the criterion proposes, whatever was asked */
  readonly layer_count_proposed: number;
  readonly layer_count_criterion: string;
  readonly trials: readonly LayerCountTrial[];
  readonly rms_percent: number;
  readonly layers: readonly FittedLayer[];
  readonly readings: readonly GroundReading[];
  readonly sounding: readonly SoundingPoint[];
  readonly family: { readonly count: number; readonly seed: number; readonly method: string };
  /** depth to which the readings resolve the ground, and the rule */
  readonly resolved_depth_m: number;
  readonly resolved_depth_rule: string;
  readonly doubts: readonly ResultsWarning[];
}

export interface GroundResult {
  readonly fit: SoilFit;
  readonly consequence: {
    readonly resistance_ohm: Spread;
    readonly cases: readonly CaseConsequence[];
  };
}
