// Moves texts on one column apart so that none overlaps another.

/** Heights for texts that want to stand at `wanted`, at least `gap` apart and within a range, order kept. */
export function keptApart(
  wanted: readonly number[],
  gap: number,
  range: readonly [number, number],
): readonly number[] {
  const order = wanted.map((_, k) => k).sort((a, b) => wanted[a] - wanted[b] || a - b);
  const placed = [...wanted];
  let least = range[0];
  for (const k of order) {
    placed[k] = Math.max(placed[k], least);
    least = placed[k] + gap;
  }
  let most = range[1];
  for (const k of [...order].reverse()) {
    placed[k] = Math.min(placed[k], most);
    most = placed[k] - gap;
  }
  return placed;
}
