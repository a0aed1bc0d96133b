// Where a search for a worst place begins: the map's summits and places by the metal, ranked by guess, then by the exact field.
import type { Lattice } from './lattice.ts';

/** Summits of a map lower than this share of its highest are not looked at: a coarse map may miss a fifth of a sharp one. */
const WORTHWHILE = 0.8;
/** Most summits of the map whose exact value is asked for. */
const LOOKED_AT = 60;

/** Most candidates whose exact value is asked for, taken by their guess. */
const ASKED = 24;

/** A candidate with a value that is not exact, minus infinity where it is none. */
export interface Guess<T> {
  readonly candidate: T;
  readonly value: number;
}

/** The likeliest of several candidates, the first of equals; none of none. */
export function likeliest<T>(candidates: readonly T[], guess: (candidate: T) => number): Guess<T>[] {
  let best: Guess<T> | undefined;
  for (const candidate of candidates) {
    const value = guess(candidate);
    if (best === undefined || value > best.value) best = { candidate, value };
  }
  return best === undefined ? [] : [best];
}

/** The best of the likeliest candidates by the exact function, best first. */
export function bestStarts<T>(
  guesses: readonly Guess<T>[],
  exact: (candidate: T) => number,
  most: number,
): T[] {
  return highest(guesses, ASKED)
    .map(({ candidate }) => ({ candidate, value: exact(candidate) }))
    .filter(({ value }) => value > Number.NEGATIVE_INFINITY)
    .sort((a, b) => b.value - a.value)
    .slice(0, most)
    .map(({ candidate }) => candidate);
}

function highest<T>(guesses: readonly Guess<T>[], most: number): Guess<T>[] {
  return guesses
    .filter(({ value }) => value > Number.NEGATIVE_INFINITY)
    .sort((a, b) => b.value - a.value)
    .slice(0, most);
}

/** Local maxima of a lattice's magnitude among the points within, the highest first, those far below it left out. */
export function latticeSummits(lattice: Lattice, within: Uint8Array): [number, number][] {
  const { nx, ny, values, x0, y0, spacing } = lattice;
  const found: { at: [number, number]; height: number }[] = [];
  for (let j = 0; j < ny; j++)
    for (let i = 0; i < nx; i++) {
      if (within[j * nx + i] === 0) continue;
      const height = Math.abs(values[j * nx + i]!);
      let highest = true;
      for (let jj = Math.max(0, j - 1); jj <= Math.min(ny - 1, j + 1) && highest; jj++)
        for (let ii = Math.max(0, i - 1); ii <= Math.min(nx - 1, i + 1) && highest; ii++)
          highest = within[jj * nx + ii] === 0 || Math.abs(values[jj * nx + ii]!) <= height;
      if (highest) found.push({ at: [x0 + i * spacing, y0 + j * spacing], height });
    }
  found.sort((a, b) => b.height - a.height);
  const least = WORTHWHILE * (found[0]?.height ?? 0);
  return found
    .filter(({ height }) => height >= least)
    .slice(0, LOOKED_AT)
    .map(({ at }) => at);
}
