// Sorts the segments of the electrode by how much current they pass to the soil, and sums them by conductor.
import type { Outcome, Point } from '@ohmstead/study';

/**
 * Upper ends of the classes, times the mean leakage per metre of the energised metal. The mean and not the largest is
 * the measure: at free ends and corners the leakage of a thin wire peaks without bound as the mesh is refined.
 */
export const LEAKAGE_STEPS: readonly number[] = [0.5, 1, 1.5, 2, Number.POSITIVE_INFINITY];

type Piece = readonly [Point, Point];

export interface LeakageClass {
  /** times the mean at the upper end of the class */
  readonly upTo: number;
  /** pieces in plan that pass current into the soil, m */
  readonly out: readonly Piece[];
  /** pieces in plan that take current from the soil, m */
  readonly in: readonly Piece[];
}

export interface RodLeakage {
  readonly x: number;
  readonly y: number;
  /** mean along the rod, times the mean of the energised metal, signed */
  readonly times: number;
}

export interface LeakageDrawing {
  /** of the energised metal, (A/m)/A */
  readonly mean: number;
  readonly classes: readonly LeakageClass[];
  readonly rods: readonly RodLeakage[];
}

export interface ConductorCurrent {
  readonly length: number;
  /** into the soil, share of the injected current */
  readonly leakage: number;
  /** largest current along the conductor, share of the injected current, magnitude */
  readonly along: number;
}

function segmentLength(outcome: Outcome, s: number): number {
  const { x1, y1, depth1, x2, y2, depth2 } = outcome.segments;
  return Math.hypot(x2[s] - x1[s], y2[s] - y1[s], depth2[s] - depth1[s]);
}

/** Length, leakage and largest current of each conductor, one a conductor of the plan. */
export function conductorCurrents(outcome: Outcome): readonly ConductorCurrent[] {
  const { segments, plan } = outcome;
  const length = new Float64Array(plan.conductors.length);
  const leakage = new Float64Array(plan.conductors.length);
  const along = new Float64Array(plan.conductors.length);
  for (let s = 0; s < segments.count; s += 1) {
    const c = segments.conductor[s];
    const piece = segmentLength(outcome, s);
    length[c] += piece;
    leakage[c] += segments.leakage[s] * piece;
    along[c] = Math.max(along[c], Math.abs(segments.along[s]));
  }
  return plan.conductors.map((_, c) => ({ length: length[c], leakage: leakage[c], along: along[c] }));
}

/** Leakage of the energised metal over the length that may leak, (A/m)/A; 0 without such metal. */
function meanLeakage(outcome: Outcome, currents: readonly ConductorCurrent[]): number {
  let current = 0;
  let length = 0;
  outcome.plan.conductors.forEach((c, k) => {
    if (c.role !== 'energised' || c.insulated) return;
    current += currents[k].leakage;
    length += currents[k].length;
  });
  return length > 0 ? current / length : 0;
}

interface GrowingClass extends LeakageClass {
  readonly out: Piece[];
  readonly in: Piece[];
}

/** Segments by class of leakage, and the rods, which in plan are points. */
export function leakageDrawing(outcome: Outcome): LeakageDrawing {
  const { segments, plan } = outcome;
  const currents = conductorCurrents(outcome);
  const mean = meanLeakage(outcome, currents);
  const times = (leakage: number): number => (mean > 0 ? leakage / mean : 0);
  const classes = LEAKAGE_STEPS.map((upTo): GrowingClass => ({ upTo, out: [], in: [] }));
  for (let s = 0; s < segments.count; s += 1) {
    const { rod, insulated } = plan.conductors[segments.conductor[s]];
    if (rod || insulated) continue;
    const value = times(segments.leakage[s]);
    const group = classes[LEAKAGE_STEPS.findIndex((upTo) => Math.abs(value) <= upTo)];
    const piece: Piece = [
      [segments.x1[s], segments.y1[s]],
      [segments.x2[s], segments.y2[s]],
    ];
    group?.[value < 0 ? 'in' : 'out'].push(piece);
  }
  const rods = plan.conductors.flatMap((rod, c): readonly RodLeakage[] => {
    if (!rod.rod || !(currents[c].length > 0)) return [];
    return [{ x: rod.x1, y: rod.y1, times: times(currents[c].leakage / currents[c].length) }];
  });
  return { mean, classes, rods };
}
