// Compares a worst voltage with its limit, and says so in words.
import type { WorstTouch } from '@ohmstead/study';
import { measured, percent, quantity } from '../format/number.ts';

/** `undecided`: the margin is smaller than the numerical uncertainty. */
export type Finding = 'within' | 'beyond' | 'undecided';

/**
 * Finding for one voltage. Undecided where the limit lies inside worst ± uncertainty, or where a number is missing.
 * @param worst magnitude, V
 * @param uncertainty numerical, V
 * @param limit V
 */
export function findingOf(worst: number, uncertainty: number, limit: number): Finding {
  if (!Number.isFinite(worst) || !Number.isFinite(limit) || !(limit > 0)) return 'undecided';
  if (!(Math.abs(limit - worst) >= uncertainty)) return 'undecided';
  return worst <= limit ? 'within' : 'beyond';
}

/** Finding for a voltage as the results tell it. */
export function voltageFinding(of: Pick<WorstTouch, 'worst_V' | 'uncertainty_V' | 'limit_V'>): Finding {
  return findingOf(of.worst_V, of.uncertainty_V, of.limit_V);
}

export interface Compared {
  readonly worst: number;
  readonly uncertainty: number;
  readonly limit: number;
  readonly finding: Finding;
}

/** The finding as the end of a sentence: `exceeds the limit by 57 %`. */
export function findingWords(compared: Compared): string {
  const { worst, limit, finding } = compared;
  switch (finding) {
    case 'beyond':
      return `exceeds the limit by ${percent(worst / limit - 1)}`;
    case 'within':
      return `within the limit, ${percent(1 - worst / limit)} margin`;
    case 'undecided':
      return 'cannot be decided at this mesh';
  }
}

/** Why a comparison stays open, as a sentence. */
export function undecidedReason(compared: Compared): string {
  const { worst, uncertainty, limit } = compared;
  const margin = quantity(Math.abs(limit - worst), 'V', 2);
  return `${measured(worst, uncertainty, 'V')} against a limit of ${quantity(limit, 'V')}: the margin of ${margin} is smaller than the numerical uncertainty, so a finer mesh has to decide.`;
}
