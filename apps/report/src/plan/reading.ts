// Voltages at a place, between the points of a case's maps.
import type { CaseMap, Point, Profile } from '@ohmstead/study';

export interface PlaceReading {
  /** V */
  readonly potential: number;
  /** reachable metal minus the place, V */
  readonly touch: number;
  /** largest over 1 m about the place, V */
  readonly step: number;
}

/** Undefined outside the map. */
export function readingAt(map: CaseMap, x: number, y: number): PlaceReading | undefined {
  const u = (x - map.x0) / map.dx;
  const v = (y - map.y0) / map.dy;
  if (!(u >= 0 && v >= 0 && u <= map.nx - 1 && v <= map.ny - 1)) return undefined;
  const i = Math.min(map.nx - 2, Math.floor(u));
  const j = Math.min(map.ny - 2, Math.floor(v));
  const between = (values: Float64Array): number => {
    const at = (a: number, b: number): number => values[(j + b) * map.nx + i + a]!;
    const [s, t] = [u - i, v - j];
    return (1 - t) * ((1 - s) * at(0, 0) + s * at(1, 0)) + t * ((1 - s) * at(0, 1) + s * at(1, 1));
  };
  return { potential: between(map.potential), touch: between(map.touch), step: between(map.step) };
}

/**
 * Potential and touch voltage along a straight line, at about the spacing of the map.
 * @returns the part of the line on the map, from its own beginning; undefined where that has less than two points
 */
export function profileOn(map: CaseMap, from: Point, to: Point): Profile | undefined {
  const length = Math.hypot(to[0] - from[0], to[1] - from[1]);
  const count = Math.max(2, Math.ceil(length / Math.min(map.dx, map.dy)) + 1);
  const read = Array.from({ length: count }, (_, k) => {
    const share = k / (count - 1);
    const at: Point = [from[0] + share * (to[0] - from[0]), from[1] + share * (to[1] - from[1])];
    const reading = readingAt(map, at[0], at[1]);
    return reading && { at, along: share * length, ...reading };
  }).filter((one) => one !== undefined);
  const [first] = read;
  const last = read.at(-1);
  if (first === undefined || last === undefined || last.along === first.along) return undefined;
  return {
    from: first.at,
    to: last.at,
    distance: Float64Array.from(read, ({ along }) => along - first.along),
    potential: Float64Array.from(read, ({ potential }) => potential),
    touch: Float64Array.from(read, ({ touch }) => touch),
  };
}
