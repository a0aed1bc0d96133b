// Numerical uncertainty of a result from how it moved over mesh refinements.

/**
 * What refinement cannot show, of the value: the thin-wire model with end segments of 1.5 radii against solid
 * cylinders (1e-4, independent computation) and the accuracy of entries and images (below 1e-5).
 */
export const MODEL_FLOOR = 2e-4;

/** Ratio of successive changes taken where only two meshes are known. */
const UNKNOWN_RATIO = 0.75;
/** Ratios outside are not believed: better than first order is not counted on, and a slower series has no known end. */
const LEAST_RATIO = 0.6;
const MOST_RATIO = 0.9;
/** A last change smaller than this share of the one before is taken for chance: second order leaves a quarter. */
const LEAST_SHARE = 0.25;

/**
 * What is still missing from the finest of several values, each on half the segment length of the one before: the
 * changes are taken as a geometric series of their observed ratio q, whose rest is q/(1 − q) of the last, plus the floor.
 * @param values coarse to fine, two or more; the last three count
 * @param scale the quantity whose relative floor applies: the value itself, or the rise for touch and step voltages
 */
export function refinementUncertainty(values: readonly number[], scale: number): number {
  const [before, coarse, fine] = [undefined, ...values].slice(-3) as [number | undefined, number, number];
  const last = Math.abs(fine - coarse);
  const previous = before === undefined ? undefined : Math.abs(coarse - before);
  const change = previous === undefined ? last : Math.max(last, LEAST_SHARE * previous);
  const seen = previous === undefined || previous === 0 ? UNKNOWN_RATIO : change / previous;
  const ratio = Math.min(MOST_RATIO, Math.max(LEAST_RATIO, seen));
  return (change * ratio) / (1 - ratio) + MODEL_FLOOR * Math.abs(scale);
}
