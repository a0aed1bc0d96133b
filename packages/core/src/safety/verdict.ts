// Whether a voltage is within its limit, and whether the numbers are sure enough to say so.

export interface Verdict {
  /** undecided where the uncertainty is greater than what separates the voltage from its limit */
  readonly outcome: 'within' | 'beyond' | 'undecided';
  /** of the number itself, whatever its uncertainty */
  readonly withinLimit: boolean;
  /** (limit − worst)/limit, %; negative beyond the limit */
  readonly marginPercent: number;
}

/**
 * Judges a worst voltage against its limit.
 * @param worst V, its magnitude
 * @param uncertainty of that voltage, V
 * @param limit V
 * @throws RangeError if the limit is not positive or a voltage is negative or no number: no verdict can be had from those
 */
export function judge(worst: number, uncertainty: number, limit: number): Verdict {
  if (!(limit > 0)) throw new RangeError(`limit: ${limit} V is not a positive voltage`);
  if (!(worst >= 0)) throw new RangeError(`worst voltage: ${worst} V is not a magnitude`);
  if (!(uncertainty >= 0)) throw new RangeError(`uncertainty: ${uncertainty} V is not a magnitude`);
  const withinLimit = worst <= limit;
  const undecided = Math.abs(limit - worst) < uncertainty;
  return {
    outcome: undecided ? 'undecided' : withinLimit ? 'within' : 'beyond',
    withinLimit,
    marginPercent: (100 * (limit - worst)) / limit,
  };
}
