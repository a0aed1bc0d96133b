// Ids in a sentence, the first few named and the rest counted.

const NAMED = 8;

export function listed(ids: readonly string[]): string {
  const shown = ids.slice(0, NAMED).join(', ');
  return ids.length > NAMED ? `${shown} and ${ids.length - NAMED} more` : shown;
}
