// The compiled Cholesky factor against its plain twin, for sizes that fill their last tile and sizes that do not.
import { afterEach, describe, expect, it } from 'vitest';
import { useKernels } from '../../src/kernels/instance.ts';
import { factorPacked, NotPositiveDefinite } from '../../src/numerics/packed-cholesky.ts';
import { packedFactor } from '../../src/numerics/packed-factor.ts';
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
  it.each([96, 97, 98, 99, 127, 128, 129, 203, 256, 257, 300])(
    'agrees with plain code to 1e-12: %i rows',
    (n) => {
      const fast = matrix(n, n);
      factorPacked(fast, n);
      useKernels(false);
      const plain = matrix(n, n);
      factorPacked(plain, n);
      const worst = plain.reduce((most, v, k) => Math.max(most, Math.abs(v - fast[k]!)), 0);
      expect(worst).toBeLessThan(1e-12);
    },
  );

  it.each([0, 5, 103, 130])('names the row that fails: %i', (row) => {
    const a = matrix(131, 3);
    a[(row * (row + 3)) / 2] = -1;
    const before = a.slice();
    expect(() => factorPacked(a, 131)).toThrow(new NotPositiveDefinite(row));
    expect(a).toEqual(before);
  });
});

describe('factor kept in the kernel', () => {
  // more than 10 000 random right-hand sides in all, in passes of eight and what is left
  it.each([1, 2, 3, 4, 5, 6, 7, 8, 9, 96, 127, 128, 129, 300])(
    'solves as plain code does, to 1e-12: %i rows',
    (n) => {
      const rounds = n < 10 ? 100 : 2;
      for (let round = 1; round <= rounds; round++) {
        const a = matrix(n, 7 * n + round);
        const before = a.slice();
        const random = randomNumbers(n + round);
        const bs = Array.from({ length: 13 }, () => Float64Array.from({ length: n }, () => random() - 0.5));
        const fast = bs.map((b) => b.slice());
        packedFactor(a, n).solve(fast);
        useKernels(false);
        const slow = bs.map((b) => b.slice());
        packedFactor(a, n).solve(slow);
        useKernels(true);
        expect(a).toEqual(before);
        const worst = slow.flatMap((x, c) => [...x].map((v, i) => Math.abs(v - fast[c]![i]!)));
        expect(worst.reduce((most, v) => Math.max(most, v), 0)).toBeLessThan(1e-12);
      }
    },
  );

  it.each([true, false])('names the row that fails, kernels %s', (on) => {
    useKernels(on);
    const a = matrix(9, 3);
    a[(6 * 9) / 2] = -1;
    expect(() => packedFactor(a, 9)).toThrow(new NotPositiveDefinite(6));
  });
});
