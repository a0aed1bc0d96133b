// Every doubt that results carry: about the study, and about the soil where it was fitted to readings.
import type { Results, ResultsWarning } from '@ohmstead/study';

/** Doubts in the order of the results, each once. */
export function toldWarnings({ warnings, ground }: Results): readonly ResultsWarning[] {
  const all = [...warnings, ...(ground?.fit.doubts ?? [])];
  const first = new Map(all.map((one) => [`${one.code}\n${one.message}`, one] as const));
  return [...first.values()];
}
