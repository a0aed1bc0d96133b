// Doubts that stand under Assumed: all but those of the soil's fit, which stand under Ground.
import type { Results, ResultsWarning } from '@ohmstead/study';

export function otherDoubts({ ground, warnings }: Results): readonly ResultsWarning[] {
  const told = new Set(ground?.fit.doubts.map(({ code, message }) => `${code} ${message}`));
  return warnings.filter(({ code, message }) => !told.has(`${code} ${message}`));
}
