// Round numbers along an axis, and the length of a scale bar.
import { scaleLinear } from 'd3-scale';

/** Round values within a range, about so many. */
export function ticksIn(from: number, to: number, count: number): readonly number[] {
  return scaleLinear().domain([from, to]).ticks(count);
}

/** Largest of 1, 2 or 5 times a power of ten that does not exceed a length. */
export function roundLength(most: number): number {
  const power = 10 ** Math.floor(Math.log10(most));
  const lead = most / power;
  return power * (lead >= 5 ? 5 : lead >= 2 ? 2 : 1);
}

/** Smallest of 1, 2 or 5 times a power of ten that is not below a length. */
export function roundStep(least: number): number {
  const power = 10 ** Math.floor(Math.log10(least));
  const lead = least / power;
  return power * (lead <= 1 ? 1 : lead <= 2 ? 2 : lead <= 5 ? 5 : 10);
}
