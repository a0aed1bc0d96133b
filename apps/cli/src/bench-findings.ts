// Figures of several parts together: of an accuracy the worst counts.
import { type Findings, goals } from './bench-claims.ts';

export function mergedFindings(parts: readonly (Findings | undefined)[]): Findings {
  const merged = new Map<string, number>();
  for (const part of parts)
    for (const [key, value] of Object.entries(part ?? {}))
      merged.set(key, Math.max(value, merged.get(key) ?? Number.NEGATIVE_INFINITY));
  return Object.fromEntries([...merged].filter(([key]) => key in goals));
}
