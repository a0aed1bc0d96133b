// Numerical uncertainty of a result from the change that one mesh refinement makes.

/**
 * Share of the last change taken as what is still missing. For a method of first order it is the whole change; the half
 * more covers meshes that have not reached their order yet (conductors close to a far better conducting layer).
 */
const CHANGE_SHARE = 1.5;
/**
 * What refinement cannot show, of the value: the thin-wire model with end segments of 1.5 radii against solid
 * cylinders (1e-4, independent computation) and the accuracy of entries and images (below 1e-5).
 */
export const MODEL_FLOOR = 2e-4;

/**
 * Numerical uncertainty of a value computed on two meshes, the second with half the segment length.
 * @param scale the quantity whose relative floor applies: the value itself, or the rise for touch and step voltages
 */
export function refinementUncertainty(coarse: number, fine: number, scale: number): number {
  return CHANGE_SHARE * Math.abs(fine - coarse) + MODEL_FLOOR * Math.abs(scale);
}
