// Everything a run leaves in memory: the results file plus what figures and tables are drawn from.
import type { Results } from './results.ts';
import type { Polygon, Study } from './study.ts';

/** Conductors as drawn, one an input row, in metres. */
export interface PlanConductor {
  readonly id: string;
  readonly x1: number;
  readonly y1: number;
  readonly depth1: number;
  readonly x2: number;
  readonly y2: number;
  readonly depth2: number;
  readonly diameter: number;
  readonly material: string;
  readonly electrode: string;
  /** what the joints make of it: joined to the injected metal, or not */
  readonly role: 'energised' | 'floating';
  readonly insulated: boolean;
  /** a ground rod: vertical within 10° */
  readonly rod: boolean;
}

/** Leakage and conductor current by segment, shape [count], for one ampere injected by the first case. */
export interface SegmentTable {
  readonly count: number;
  /** index into `Plan.conductors` */
  readonly conductor: Int32Array;
  readonly x1: Float64Array;
  readonly y1: Float64Array;
  readonly depth1: Float64Array;
  readonly x2: Float64Array;
  readonly y2: Float64Array;
  readonly depth2: Float64Array;
  /** current into the soil per metre, (A/m)/A */
  readonly leakage: Float64Array;
  /** mean current along the segment, first end to second, A/A */
  readonly along: Float64Array;
}

export interface Plan {
  readonly conductors: readonly PlanConductor[];
  /** joints of the metal, each [x, y, depth], m */
  readonly joints: readonly (readonly [number, number, number])[];
  /** outlines of the assessed areas; even–odd filled */
  readonly touchArea: readonly Polygon[];
  readonly stepArea: readonly Polygon[];
  /** false where the areas are the default ones */
  readonly areasGiven: { readonly touch: boolean; readonly step: boolean };
}

/** Values on a lattice of points: value (i, j) stands at (x0 + i·dx, y0 + j·dy), index j·nx + i. */
export interface CaseMap {
  readonly x0: number;
  readonly y0: number;
  readonly dx: number;
  readonly dy: number;
  readonly nx: number;
  readonly ny: number;
  /** surface potential, V */
  readonly potential: Float64Array;
  /** reachable metal minus surface, V, signed */
  readonly touch: Float64Array;
  /** largest voltage over 1 m centred here, V */
  readonly step: Float64Array;
  /** largest interpolation error of the map, V, estimated */
  readonly error: number;
}

/** Values along a straight line on the surface, shape [count]. */
export interface Profile {
  readonly from: readonly [number, number];
  readonly to: readonly [number, number];
  /** along the line from `from`, m */
  readonly distance: Float64Array;
  /** V */
  readonly potential: Float64Array;
  /** V, signed */
  readonly touch: Float64Array;
}

export interface CaseFigures {
  readonly name: string;
  readonly map: CaseMap;
  /** through the place of the worst touch voltage */
  readonly profile: Profile;
}

export interface Outcome {
  readonly study: Study;
  readonly results: Results;
  readonly plan: Plan;
  readonly segments: SegmentTable;
  /** same order as results.cases */
  readonly cases: readonly CaseFigures[];
}
