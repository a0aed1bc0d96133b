import { describe, expect, it } from 'vitest';
import { conjugateGradients } from '../../src/numerics/conjugate-gradients.ts';
import { factorPacked, solvePacked } from '../../src/numerics/packed-cholesky.ts';
import { multiplyPacked } from '../../src/numerics/packed-product.ts';
import { sparseInverse } from '../../src/numerics/sparse-inverse.ts';
import { randomNumbers } from '../support/random.ts';

/** 1/distance between random places in a square, with a diagonal like that of thin wires. */
function greensFunction(n: number, seed: number): Float64Array {
  const random = randomNumbers(seed);
  const x = Float64Array.from({ length: n }, random);
  const y = Float64Array.from({ length: n }, random);
  const packed = new Float64Array((n * (n + 1)) / 2);
  for (let i = 0; i < n; i++)
    for (let j = 0; j <= i; j++)
      packed[(i * (i + 1)) / 2 + j] = 1 / Math.sqrt((x[i]! - x[j]!) ** 2 + (y[i]! - y[j]!) ** 2 + 1e-4);
  return packed;
}

describe('sparse inverse', () => {
  it('is the inverse itself where every column is kept', () => {
    const n = 25;
    const a = greensFunction(n, 3);
    const r = Float64Array.from({ length: n }, randomNumbers(8));
    const found = new Float64Array(n);
    sparseInverse(a, n, n)(r, found);
    const exact = Float64Array.from(r);
    factorPacked(a, n);
    solvePacked(a, n, exact);
    const scale = Math.max(...exact.map(Math.abs));
    found.forEach((value, i) => {
      expect(Math.abs(value - exact[i]!) / scale).toBeLessThan(1e-11);
    });
  });

  it('scales to the reciprocal diagonal where none is kept', () => {
    const a = greensFunction(9, 3);
    const found = new Float64Array(9);
    sparseInverse(a, 9, 0)(new Float64Array(9).fill(1), found);
    found.forEach((value, i) => {
      expect(Math.abs(value * a[(i * (i + 3)) / 2]! - 1)).toBeLessThan(1e-15);
    });
  });

  it('halves the iterations of the diagonal for a Green’s function', async () => {
    const n = 400;
    const a = greensFunction(n, 5);
    const b = new Float64Array(n).fill(1);
    const [diagonal, sparse] = await Promise.all(
      [0, 12].map(async (kept) => {
        const precondition = sparseInverse(a, n, kept);
        const options = { tolerance: 1e-11, limit: 1000 };
        return (await conjugateGradients((x, y) => multiplyPacked(a, n, x, y), precondition, b, options))
          .iterations;
      }),
    );
    expect(sparse!).toBeLessThan(diagonal! / 2);
  });
});
