// Whole numbers that a seed repeats, for choosing what is sampled.

/** Multiplier and increment of the sequence x ← (a x + c) mod 2³² (Numerical Recipes, 2nd ed., 7.1; from memory). */
const MULTIPLIER = 1664525;
const INCREMENT = 1013904223;

/** @returns a function that gives a number from 0 to `below` − 1 */
export function seeded(seed: number): (below: number) => number {
  let state = seed >>> 0;
  return (below) => {
    state = (Math.imul(state, MULTIPLIER) + INCREMENT) >>> 0;
    return Math.floor((state / 2 ** 32) * below);
  };
}
