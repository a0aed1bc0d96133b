// The compiled product and sparse inverse against their plain twins, which give the same bits.
import { afterEach, describe, expect, it } from 'vitest';
import { useKernels } from '../../src/kernels/instance.ts';
import { NotPositiveDefinite } from '../../src/numerics/packed-cholesky.ts';
import { type PackedStore, packedStore } from '../../src/numerics/packed-store.ts';
import { randomNumbers } from '../support/random.ts';

afterEach(() => useKernels(true));

/** Random entries of ±½, and a diagonal that outweighs them. */
function filled(n: number, seed: number): PackedStore {
  const store = packedStore(n);
  const random = randomNumbers(seed);
  for (let k = 0; k < store.entries.length; k++) store.entries[k] = random() - 0.5;
  for (let i = 0; i < n; i++) store.entries[(i * (i + 3)) / 2] = n / 2 + 1 + random();
  return store;
}

function twins(n: number, seed: number): readonly [kernel: PackedStore, plain: PackedStore] {
  const kernel = filled(n, seed);
  useKernels(false);
  const plain = filled(n, seed);
  useKernels(true);
  return [kernel, plain];
}

function vectors(n: number, count: number, seed: number): Float64Array[] {
  const random = randomNumbers(seed);
  return Array.from({ length: count }, () => Float64Array.from({ length: n }, () => random() - 0.5));
}

describe('product kernel', () => {
  // more than 10 000 random right-hand sides in all
  it.each([1, 2, 3, 4, 5, 6, 7, 8, 9, 96, 127, 128, 129])(
    'gives the bits of its plain twin, one vector or many: %i rows',
    (n) => {
      const rounds = n < 10 ? 100 : 3;
      for (let round = 1; round <= rounds; round++) {
        const [kernel, plain] = twins(n, 7 * n + round);
        for (const count of [1, 2, 8, 9]) {
          const xs = vectors(n, count, 31 * round + count);
          const fast = xs.map(() => new Float64Array(n).fill(Number.NaN));
          const slow = xs.map(() => new Float64Array(n));
          kernel.multiply(xs, fast);
          plain.multiply(xs, slow);
          expect(fast).toEqual(slow);
        }
      }
    },
  );

  it('multiplies by the symmetric matrix: unit vectors bring out its columns', () => {
    const n = 11;
    const { multiply, entries } = filled(n, 5);
    for (let j = 0; j < n; j++) {
      const y = new Float64Array(n);
      multiply([Float64Array.from({ length: n }, (_, k) => (k === j ? 1 : 0))], [y]);
      for (let i = 0; i < n; i++)
        expect(y[i]).toBe(i >= j ? entries[(i * (i + 1)) / 2 + j] : entries[(j * (j + 1)) / 2 + i]);
    }
  });
});

describe('sparse inverse kernel', () => {
  it.each([1, 2, 3, 4, 5, 6, 7, 8, 9, 12, 13, 14, 96, 127, 128, 129])(
    'gives the bits of its plain twin: %i rows',
    (n) => {
      for (let round = 1; round <= 20; round++) {
        const [kernel, plain] = twins(n, n + round);
        const [fast, slow] = [kernel.preconditioner(), plain.preconditioner()];
        for (const r of vectors(n, 3, round)) {
          const [a, b] = [new Float64Array(n).fill(Number.NaN), new Float64Array(n)];
          fast(r, a);
          slow(r, b);
          expect(a).toEqual(b);
        }
      }
    },
  );

  it('chooses among equal columns as its plain twin does', () => {
    const even = (): PackedStore => {
      const store = packedStore(40);
      store.entries.fill(1);
      for (let i = 0; i < 40; i++) store.entries[(i * (i + 3)) / 2] = 2;
      return store;
    };
    const kernel = even();
    useKernels(false);
    const plain = even();
    const r = vectors(40, 1, 3)[0]!;
    const [a, b] = [new Float64Array(40), new Float64Array(40)];
    kernel.preconditioner()(r, a);
    plain.preconditioner()(r, b);
    expect(a).toEqual(b);
  });

  it.each([true, false])('names the row whose block is not positive definite, kernels %s', (on) => {
    useKernels(on);
    const store = filled(50, 4);
    store.entries[(31 * 34) / 2] = -1;
    expect(() => store.preconditioner()).toThrow(new NotPositiveDefinite(31));
  });
});
