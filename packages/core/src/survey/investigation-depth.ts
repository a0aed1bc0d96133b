// How deep a four-pin reading looks.
import { type FourPinArray, overPins, pinDistances } from './arrays.ts';

/** Halvings of the bracket: from metres to below a millionth of one. */
const HALVINGS = 60;

/**
 * Median depth of investigation, m: half of the reading over uniform ground comes from above it, half from below.
 * The part from above depth z of the signal between two points at distance r is 1 − r/√(r² + 4z²) of 1/r (Roy and Apparao,
 * Geophysics 36, 1971); the depth where the four together reach half is Edwards' (Geophysics 42, 1977), 0.519 a for
 * Wenner and 0.19 of AB for Schlumberger with close potential pins (both from memory). Pins count as on the surface.
 */
export function medianDepth(array: FourPinArray): number {
  const whole = overPins(array, (r) => 1 / r);
  const fromBelow = (z: number): number => overPins(array, (r) => 1 / Math.sqrt(r * r + 4 * z * z)) / whole;
  let low = 0;
  let high = Math.max(...pinDistances(array).distance);
  while (fromBelow(high) > 0.5) high *= 2;
  for (let i = 0; i < HALVINGS; i++) {
    const middle = (low + high) / 2;
    if (fromBelow(middle) > 0.5) low = middle;
    else high = middle;
  }
  return high;
}

/** Median depth of a Wenner array over its spacing. */
export const WENNER_MEDIAN_DEPTH: number = medianDepth({ kind: 'wenner', spacing: 1, pinDepth: 0 });

/** Spacing of the Wenner array that looks as deep, m: by it readings of different arrays are put on one axis. */
export function wennerEquivalent(array: FourPinArray): number {
  return array.kind === 'wenner' ? array.spacing : medianDepth(array) / WENNER_MEDIAN_DEPTH;
}
