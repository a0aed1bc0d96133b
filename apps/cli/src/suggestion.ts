// The known word that a mistyped one probably means.

/** Share of a word's letters that may be wrong before a suggestion misleads more than it helps. */
const WRONG_SHARE = 0.4;

/**
 * Nearest of some known words by insertions, deletions and replacements of single letters.
 * @param word as typed
 * @param known the first of equally near words wins; a word that the typed one begins counts as near
 */
export function suggestion(word: string, known: readonly string[]): string | undefined {
  const begun = known.find((candidate) => word.length > 1 && candidate.startsWith(word));
  if (begun !== undefined) return begun;
  const ranked = known
    .map((candidate) => ({ candidate, wrong: distance(word.toLowerCase(), candidate) }))
    .filter(({ candidate, wrong }) => wrong <= WRONG_SHARE * candidate.length)
    .toSorted((a, b) => a.wrong - b.wrong);
  return ranked[0]?.candidate;
}

/** Levenshtein distance, one row of the table at a time. */
function distance(a: string, b: string): number {
  let row = Array.from({ length: b.length + 1 }, (_, j) => j);
  for (let i = 1; i <= a.length; i++) {
    const next = [i];
    for (let j = 1; j <= b.length; j++) {
      next.push(Math.min(row[j] + 1, next[j - 1] + 1, row[j - 1] + (a[i - 1] === b[j - 1] ? 0 : 1)));
    }
    row = next;
  }
  return row[b.length];
}
