// What a sounding shows, in metres and Ω·m: readings, fitted curve, band of the family, staircase of the layers.
import type { GroundReading, Point, SoilFit } from '@ohmstead/study';
import { decades } from './log-axis.ts';

export interface SoundingMark {
  /** place in `traverses` */
  readonly traverse: number;
  readonly reading: GroundReading;
}

export interface SoundingDrawing {
  /** along the axis of spacings and depths, m */
  readonly spacing: Point;
  /** Ω·m */
  readonly resistivity: Point;
  /** names in the order of the readings */
  readonly traverses: readonly string[];
  readonly marks: readonly SoundingMark[];
  /** [spacing, Ω·m] */
  readonly curve: readonly Point[];
  /** [spacing, 5 %, 95 %], Ω·m */
  readonly band: readonly (readonly [spacing: number, low: number, high: number])[];
  /** [depth, Ω·m], from one end of the axis to the other */
  readonly stairs: readonly Point[];
  /** depth to which the readings resolve the ground, m */
  readonly resolved: number;
  /** of the electrode, m; undefined where it lies off the axis */
  readonly diagonal: number | undefined;
  /** resistivities of layers that lie off the axis, Ω·m */
  readonly offScale: readonly number[];
}

/** Room beyond the outermost value, factor on it. */
const ROOM = 1.25;
/** The axis of spacings reaches at most this many times past the longest one, to show an electrode that is larger. */
const FARTHEST = 8;
/** A layer's resistivity is kept on the axis up to this many times beyond readings and curve: more would flatten them. */
const LAYER_ROOM = 6;

function range(values: readonly number[]): Point {
  const kept = values.filter((value) => value > 0 && Number.isFinite(value));
  if (kept.length === 0) return [1, 10];
  return [kept.reduce((a, b) => Math.min(a, b)), kept.reduce((a, b) => Math.max(a, b))];
}

/** Resistivity against depth as a step line over the whole axis. */
function stairsOf(layers: SoilFit['layers'], [from, to]: Point): readonly Point[] {
  const points: Point[] = [];
  let top = from;
  let depth = 0;
  for (const { resistivity_ohm_m, thickness_m } of layers) {
    depth = thickness_m === null ? Number.POSITIVE_INFINITY : depth + thickness_m.best;
    const bottom = Math.min(depth, to);
    if (bottom <= top) continue;
    points.push([top, resistivity_ohm_m.best], [bottom, resistivity_ohm_m.best]);
    top = bottom;
  }
  return points;
}

/**
 * The sounding of a fit.
 * @param diagonal of the electrode, m, which spacings are set against
 */
export function soundingDrawing(fit: SoilFit, diagonal: number): SoundingDrawing {
  const { sounding, readings, layers } = fit;
  const spacings = range([...sounding.map((p) => p.spacing_m), ...readings.map((r) => r.spacing_m)]);
  const farthest = spacings[1] * FARTHEST;
  const shown = [fit.resolved_depth_m, diagonal].filter((value) => value <= farthest);
  const wide = range([...spacings, ...shown.map((value) => value * ROOM)]);
  const spacing: Point = [Math.min(spacings[0], wide[0]), wide[1]];
  const told = range([
    ...readings.flatMap((r) => [r.apparent_resistivity_ohm_m, r.model_ohm_m]),
    ...sounding.flatMap((p) => [p.fitted_ohm_m, p.low_ohm_m, p.high_ohm_m]),
  ]);
  const best = layers.map((layer) => layer.resistivity_ohm_m.best);
  const near = best.filter((rho) => rho >= told[0] / LAYER_ROOM && rho <= told[1] * LAYER_ROOM);
  const whole = range([...told, ...near]);
  const traverses = [...new Set(readings.map((reading) => reading.traverse))];
  return {
    spacing,
    resistivity: [whole[0] / ROOM, whole[1] * ROOM],
    traverses,
    marks: readings.map((reading) => ({ traverse: traverses.indexOf(reading.traverse), reading })),
    curve: sounding.map((p): Point => [p.spacing_m, p.fitted_ohm_m]),
    band: sounding.map((p) => [p.spacing_m, p.low_ohm_m, p.high_ohm_m] as const),
    stairs: stairsOf(layers, spacing),
    resolved: fit.resolved_depth_m,
    diagonal: diagonal > 0 && diagonal <= spacing[1] ? diagonal : undefined,
    offScale: best.filter((rho) => !near.includes(rho)),
  };
}

/** A range of resistivities widened evenly to at least so many decades. */
export function atLeastDecades([low, high]: Point, least: number): Point {
  const missing = Math.max(0, least - decades(low, high)) / 2;
  return [low / 10 ** missing, high * 10 ** missing];
}
