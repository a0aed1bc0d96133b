// The compiled Cholesky factor against its plain twin, for sizes that fill their last tile and sizes that do not.
import { afterEach, describe, expect, it } from 'vitest';
import { useKernels } from '../../src/kernels/instance.ts';
import { factorPacked, NotPositiveDefinite } from '../../src/numerics/packed-cholesky.ts';
import { randomNumbers } from '../support/random.ts';

/** Random entries of ±½ and a diagonal that outweighs them. */
function matrix(n: number, seed: number): Float64Array {
  const random = randomNumbers(seed);
  const a = Float64Array.from({ length: (n * (n + 1)) / 2 }, () => random() - 0.5);
  for (let i = 0; i < n; i++) a[(i * (i + 3)) / 2] = n / 2 + random();
  return a;
}

afterEach(() => useKernels(true));

describe('Cholesky kernel', () => {
  it.each([96, 97, 98, 99, 203, 256])('agrees with plain code to 1e-12: %i rows', (n) => {
    const fast = matrix(n, n);
    factorPacked(fast, n);
    useKernels(false);
    const plain = matrix(n, n);
    factorPacked(plain, n);
    const worst = plain.reduce((most, v, k) => Math.max(most, Math.abs(v - fast[k]!)), 0);
    expect(worst).toBeLessThan(1e-12);
  });

  it.each([0, 5, 103, 130])('names the row that fails: %i', (row) => {
    const a = matrix(131, 3);
    a[(row * (row + 3)) / 2] = -1;
    const before = a.slice();
    expect(() => factorPacked(a, 131)).toThrow(new NotPositiveDefinite(row));
    expect(a).toEqual(before);
  });
});
