// How much a thin covering of the soil raises the resistance of the feet that stand on it.

/** A layer of crushed rock, asphalt or the like on the soil. */
export interface Covering {
  /** ρs, Ω·m, wet */
  readonly resistivity: number;
  /** hs, m */
  readonly thickness: number;
}

/** Length to which the empirical equation was fitted, about that of a foot, m (IEEE Std 80-2000/2013, eq. 27; 0.106 in the 1986 edition, from memory). */
const FITTED_LENGTH_M = 0.09;

/**
 * Covering derating factor Cs: the share of ρs that a foot on the covering meets.
 *
 * Cs = 1 − 0.09·(1 − ρ/ρs)/(2·hs + 0.09), IEEE Std 80-2000/2013, eq. 27 (empirical); 1 without covering.
 * It lies within about 3 % of the exact series for coverings of 0.08 m and more; at 0.04 m it is up to 13 % high
 * (independent computation).
 * @param soilResistivity ρ of the soil below, Ω·m
 * @param covering undefined where people stand on the soil itself
 * @throws RangeError if a resistivity or the thickness is not a positive number
 */
export function coveringDeratingFactor(soilResistivity: number, covering: Covering | undefined): number {
  if (covering === undefined) return 1;
  const { resistivity, thickness } = covering;
  requirePositive(soilResistivity, 'soil resistivity', 'Ω·m');
  requirePositive(resistivity, 'covering resistivity', 'Ω·m');
  requirePositive(thickness, 'covering thickness', 'm');
  const factor =
    1 - (FITTED_LENGTH_M * (1 - soilResistivity / resistivity)) / (2 * thickness + FITTED_LENGTH_M);
  // soil more resistive than its covering is credited with no more than the covering (common practice, no source)
  return Math.min(1, factor);
}

function requirePositive(value: number, name: string, unit: string): void {
  if (!(value > 0 && Number.isFinite(value))) {
    throw new RangeError(`${name}: ${value} ${unit} is not a positive number`);
  }
}
