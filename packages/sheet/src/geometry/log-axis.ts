// Logarithmic axes: round numbers on them, and the way from a quantity to its place.
import { scaleLog } from 'd3-scale';

export interface LogTick {
  readonly value: number;
  /** lettered, or a mark only */
  readonly lettered: boolean;
}

/** Over more decades than this, only whole decades are lettered. */
const LETTERED_DECADES = 3.4;
/** Lettered within a decade where there is room: about equal steps. */
const ROUND: readonly number[] = [1, 2, 5];
/** A tick this close to an end of the axis still stands on it, share of the tick. */
const EDGE = 1e-9;

/** Decades between two positive values. */
export function decades(from: number, to: number): number {
  return Math.log10(to / from);
}

/** 1, 2, 3, … 9 of every decade within the range, 1, 2 and 5 lettered. */
export function logTicks(from: number, to: number): readonly LogTick[] {
  const few = decades(from, to) <= LETTERED_DECADES;
  const ticks: LogTick[] = [];
  for (let power = Math.floor(Math.log10(from)); power <= Math.ceil(Math.log10(to)); power += 1) {
    for (let lead = 1; lead <= 9; lead += 1) {
      /* read back from digits, so that 3·10⁻¹ is 0.3 and not its neighbour */
      const value = Number(`${lead}e${power}`);
      if (value < from * (1 - EDGE) || value > to * (1 + EDGE)) continue;
      ticks.push({ value, lettered: lead === 1 || (few && ROUND.includes(lead)) });
    }
  }
  return ticks;
}

/** The way from a positive quantity to its place between two ends of an axis. */
export function logScale(
  domain: readonly [number, number],
  range: readonly [number, number],
): (value: number) => number {
  const scale = scaleLog().domain(domain).range(range);
  return (value) => scale(value);
}
