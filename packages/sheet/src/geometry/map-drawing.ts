// What a map of one case shows, in metres: bands by share of the limit or of the rise, lines in volts.
import type { CaseMap, CaseResult, Outcome, Polygon } from '@ohmstead/study';
import { type Band, bandsOf, type Lattice } from './contours.ts';
import { ticksIn } from './ticks.ts';

export type MapKind = 'potential' | 'touch' | 'step';

export interface MapDrawing {
  readonly kind: MapKind;
  /** V that count as the whole: the limit, or the rise */
  readonly whole: number;
  /** shares at which a new band of fill begins, without 0 and the whole */
  readonly edges: readonly number[];
  readonly bands: readonly Band[];
  /** what lies beyond the limit; undefined for the potential, which has none */
  readonly beyond: Band | undefined;
  /** lines that carry volts; levels are shares */
  readonly lines: readonly Band[];
  /** V from one line to the next where the lines are round volts, else undefined: they are the edges of the fill */
  readonly roundVolts: number | undefined;
}

/** Bands of fill in one whole. */
const BANDS: Readonly<Record<MapKind, number>> = { potential: 10, touch: 5, step: 5 };
/** Where no place reaches this share of the limit, the edges of the fill say little and lines go by round volts. */
const FEW_EDGES_BELOW = 0.6;
const ROUND_LINES = 6;
/** A map with more samples than this is thinned for a small figure. */
const SMALL_ENOUGH = 12_000;

/** V that count as the whole of a map. */
export function wholeOf(kind: MapKind, of: CaseResult): number {
  return kind === 'potential' ? of.gpr_V : of[kind].limit_V;
}

/** Area in which a kind of voltage is assessed; the potential is no voltage on anybody and has none. */
export function assessedFor(outcome: Outcome, kind: MapKind): readonly Polygon[] {
  if (kind === 'potential') return [];
  return kind === 'touch' ? outcome.plan.touchArea : outcome.plan.stepArea;
}

interface Sampled {
  readonly lattice: Lattice;
  readonly values: Float64Array;
}

function every(map: CaseMap, values: Float64Array, stride: number): Sampled {
  const nx = Math.floor((map.nx - 1) / stride) + 1;
  const ny = Math.floor((map.ny - 1) / stride) + 1;
  const kept = new Float64Array(nx * ny);
  for (let j = 0; j < ny; j += 1) {
    for (let i = 0; i < nx; i += 1) kept[j * nx + i] = values[j * stride * map.nx + i * stride];
  }
  return { lattice: { ...map, dx: map.dx * stride, dy: map.dy * stride, nx, ny }, values: kept };
}

/**
 * Bands and lines of one map.
 * @param small for a figure beside others: fewer samples, no lines but the edges
 */
export function mapDrawing(outcome: Outcome, caseIndex: number, kind: MapKind, small: boolean): MapDrawing {
  const { map } = outcome.cases[caseIndex];
  const whole = wholeOf(kind, outcome.results.cases[caseIndex]);
  const stride = small ? Math.max(1, Math.ceil(Math.sqrt((map.nx * map.ny) / SMALL_ENOUGH))) : 1;
  const { lattice, values } = every(map, map[kind], stride);
  const shares = values.map((volts) => Math.abs(volts) / whole);
  const count = BANDS[kind];
  const edges = Array.from({ length: count - 1 }, (_, k) => (k + 1) / count);
  const bands = bandsOf(lattice, shares, edges);
  const beyond = kind === 'potential' ? undefined : bandsOf(lattice, shares, [1])[0];
  const largest = shares.reduce((most, share) => Math.max(most, share), 0);
  if (kind === 'potential' || small || largest >= FEW_EDGES_BELOW) {
    return { kind, whole, edges, bands, beyond, lines: bands, roundVolts: undefined };
  }
  const volts = ticksIn(0, largest * whole, ROUND_LINES).filter((v) => v > 0);
  const lines = bandsOf(
    lattice,
    shares,
    volts.map((v) => v / whole),
  );
  return {
    kind,
    whole,
    edges,
    bands,
    beyond,
    lines,
    roundVolts: volts.length > 1 ? volts[1] - volts[0] : volts[0],
  };
}
