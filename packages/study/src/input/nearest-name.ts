// The known name that a misspelt one probably means.

/** Longest name worth comparing, characters. Reason: known names are short. */
const LONGEST_COMPARED = 60;
/** Characters a name must have for one slip, and for two. Reason: short names differ by one character on purpose. */
const SHORTEST_WITH_ONE_SLIP = 5;
const SHORTEST_WITH_TWO_SLIPS = 9;

/** Lower case without anything but letters and digits: `X1 (m)` and `x1_m` become one. */
function plain(name: string): string {
  return name.toLowerCase().replace(/[^\p{L}\p{N}]/gu, '');
}

/** Insertions, deletions, replacements and swaps of neighbours that turn one text into the other (optimal string alignment). */
function editDistance(a: string, b: string): number {
  let beforeLast: number[] = [];
  let last = Array.from({ length: b.length + 1 }, (_, j) => j);
  for (let i = 1; i <= a.length; i++) {
    const row = [i];
    for (let j = 1; j <= b.length; j++) {
      const same = a[i - 1] === b[j - 1];
      let best = Math.min(last[j] + 1, row[j - 1] + 1, last[j - 1] + (same ? 0 : 1));
      if (i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1]) {
        best = Math.min(best, beforeLast[j - 2] + 1);
      }
      row.push(best);
    }
    beforeLast = last;
    last = row;
  }
  return last[b.length];
}

function allowedSlips(length: number): number {
  if (length >= SHORTEST_WITH_TWO_SLIPS) return 2;
  return length >= SHORTEST_WITH_ONE_SLIP ? 1 : 0;
}

/**
 * The known name nearest to a given one.
 * @param name as written
 * @param known names to choose from; the first of equally near ones wins
 * @returns the nearest name, or `undefined` where none is near
 */
export function nearestName(name: string, known: Iterable<string>): string | undefined {
  if (name.length > LONGEST_COMPARED) return undefined;
  const given = plain(name);
  let nearest: string | undefined;
  let least = allowedSlips(given.length) + 1;
  for (const candidate of known) {
    const other = plain(candidate);
    if (Math.abs(other.length - given.length) >= least) continue;
    const distance = editDistance(given, other);
    if (distance < least) {
      least = distance;
      nearest = candidate;
    }
  }
  return nearest;
}
