// Wenner surveys for tests: readings from spacings and values, and the published ones.
import type { Reading } from '../../src/survey/readings.ts';

export function wennerReadings(
  spacings: readonly number[],
  values: readonly number[],
  pinDepth = 0,
  traverse = '',
): Reading[] {
  return spacings.map((spacing, i) => ({
    row: i + 2,
    array: { kind: 'wenner', spacing, pinDepth },
    traverse,
    apparentResistivity: values[i]!,
  }));
}

/** Seedher and Arora, IEEE Trans. Power Delivery 7(3), 1992, cases 1 to 3 (data read): 1000/20 at 1 m, 100/1000 at 2.5 m, 100/300 at 5 m. */
export const seedherArora1: Reading[] = wennerReadings(
  [1, 2, 3, 4, 5],
  [693.74, 251.62, 84.56, 37.64, 25.32],
);
export const seedherArora2: Reading[] = wennerReadings([2, 4, 6, 8, 10], [123.33, 189.99, 258.93, 320.27, 374.13]); // biome-ignore format: one row a survey
export const seedherArora3: Reading[] = wennerReadings([2, 4, 6, 8, 10], [102.26, 113.07, 129.77, 147.52, 163.95]); // biome-ignore format: one row a survey
/** Kindermann and Campagnolo, textbook set (data read in secondary copies, and from memory): 700/180 at 2.5 m. */
export const kindermann: Reading[] = wennerReadings([1, 2, 4, 6, 8, 16, 32], [684, 611, 415, 294, 237, 189, 182]); // biome-ignore format: one row a survey
/** Field set used in several papers as an optimisation example (data read, and from memory). */
export const fieldSet: Reading[] = wennerReadings(
  [2.5, 5, 7.5, 10, 12.5, 15],
  [320, 245, 182, 162, 168, 152],
);
/** Three-layer example of Pirson's method in Brazilian textbooks (data read). */
export const pirson: Reading[] = wennerReadings([1, 2, 4, 8, 16, 32], [11938, 15770, 17341, 11058, 5026, 3820]); // biome-ignore format: one row a survey
/** A student survey of which its authors say that no layered curve fits (data read). */
export const student: Reading[] = wennerReadings([1, 2, 4, 6, 8, 12, 16, 20, 24], [1432.1, 442.3, 221.2, 45.24, 100.5, 150.8, 703.7, 754.0, 844.5]); // biome-ignore format: one row a survey
