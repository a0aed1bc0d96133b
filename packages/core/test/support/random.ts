// Seeded random numbers for tests, Park and Miller's minimal standard generator (Comm. ACM 31, 1988).

export function randomNumbers(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state * 16807) % 2147483647;
    return state / 2147483647;
  };
}
