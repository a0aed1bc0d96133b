// Doubts that stand under Assumed: all but those of the soil's fit, which stand under Ground.
import type { ResultsWarning } from '@ohmstead/study';

interface Told {
  readonly ground: { readonly fit: { readonly doubts: readonly ResultsWarning[] } } | null;
  readonly warnings: readonly ResultsWarning[];
}

export function otherDoubts({ ground, warnings }: Told): readonly ResultsWarning[] {
  const told = new Set(ground?.fit.doubts.map(({ code, message }) => `${code} ${message}`));
  return warnings.filter(({ code, message }) => !told.has(`${code} ${message}`));
}
