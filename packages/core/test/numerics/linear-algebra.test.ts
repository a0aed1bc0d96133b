import { describe, expect, it } from 'vitest';
import { conjugateGradients } from '../../src/numerics/conjugate-gradients.ts';
import {
  factorPacked,
  multiplyPacked,
  NotPositiveDefinite,
  solvePacked,
} from '../../src/numerics/packed-cholesky.ts';
import { factorSparse, solveSparse } from '../../src/numerics/sparse-cholesky.ts';
import { randomNumbers } from '../support/random.ts';

/** A random symmetric matrix made positive definite by its diagonal, packed. */
function randomPositive(n: number, seed: number): Float64Array {
  const random = randomNumbers(seed);
  const packed = Float64Array.from({ length: (n * (n + 1)) / 2 }, () => random() - 0.5);
  for (let i = 0; i < n; i++) packed[(i * (i + 3)) / 2]! += n;
  return packed;
}

const byDiagonal =
  (diagonal: Float64Array) =>
  (r: Float64Array, into: Float64Array): void => {
    r.forEach((value, i) => {
      into[i] = value / diagonal[i]!;
    });
  };

describe('packed Cholesky', () => {
  it('solves a random positive-definite system to rounding', () => {
    for (const n of [1, 2, 7, 40]) {
      const matrix = randomPositive(n, 11 + n);
      const random = randomNumbers(5);
      const x = Float64Array.from({ length: n }, random);
      const b = new Float64Array(n);
      multiplyPacked(matrix, n, x, b);
      factorPacked(matrix, n);
      solvePacked(matrix, n, b);
      b.forEach((value, i) => {
        expect(Math.abs(value - x[i]!)).toBeLessThan(1e-13);
      });
    }
  });

  it('names the row whose pivot fails', () => {
    const indefinite = Float64Array.from([1, 2, 1]);
    expect(() => factorPacked(indefinite, 2)).toThrowError(NotPositiveDefinite);
    try {
      factorPacked(Float64Array.from([1, 2, 1]), 2);
    } catch (error) {
      expect((error as NotPositiveDefinite).row).toBe(1);
    }
  });
});

describe('conjugate gradients', () => {
  it('agrees with the factor and reports a residual recomputed from the solution', async () => {
    const n = 60;
    const matrix = randomPositive(n, 3);
    const b = Float64Array.from({ length: n }, randomNumbers(9));
    const diagonal = Float64Array.from({ length: n }, (_, i) => matrix[(i * (i + 3)) / 2]!);
    const multiply = (x: Float64Array, into: Float64Array): void => multiplyPacked(matrix, n, x, into);
    const result = await conjugateGradients(multiply, byDiagonal(diagonal), b);
    expect(result.outcome).toBe('converged');
    expect(result.residual).toBeLessThan(1e-12);
    const direct = Float64Array.from(b);
    const factor = Float64Array.from(matrix);
    factorPacked(factor, n);
    solvePacked(factor, n, direct);
    result.x.forEach((value, i) => {
      expect(Math.abs(value - direct[i]!)).toBeLessThan(1e-12);
    });
  });

  it('says so when it reaches its limit', async () => {
    const n = 60;
    const matrix = randomPositive(n, 3);
    const b = Float64Array.from({ length: n }, randomNumbers(9));
    const multiply = (x: Float64Array, into: Float64Array): void => multiplyPacked(matrix, n, x, into);
    const result = await conjugateGradients(multiply, byDiagonal(new Float64Array(n).fill(1)), b, {
      tolerance: 1e-12,
      limit: 2,
    });
    expect(result.outcome).toBe('limit');
    expect(result.iterations).toBe(2);
    expect(result.residual).toBeGreaterThan(1e-12);
  });
});

describe('sparse Cholesky', () => {
  it('solves a grounded lattice like the dense factor', () => {
    const side = 9;
    const n = side * side;
    const random = randomNumbers(17);
    const row: number[] = [];
    const column: number[] = [];
    const value: number[] = [];
    const diagonal = new Float64Array(n).fill(1e-3);
    const packed = new Float64Array((n * (n + 1)) / 2);
    const join = (i: number, j: number): void => {
      const g = 0.1 + random();
      row.push(i);
      column.push(j);
      value.push(-g);
      diagonal[i]! += g;
      diagonal[j]! += g;
      packed[(Math.max(i, j) * (Math.max(i, j) + 1)) / 2 + Math.min(i, j)]! -= g;
    };
    for (let y = 0; y < side; y++)
      for (let x = 0; x < side; x++) {
        if (x + 1 < side) join(y * side + x, y * side + x + 1);
        if (y + 1 < side) join(y * side + x, (y + 1) * side + x);
      }
    diagonal.forEach((d, i) => {
      packed[(i * (i + 3)) / 2] = d;
    });
    const b = Float64Array.from({ length: n }, random);
    const dense = Float64Array.from(b);
    factorPacked(packed, n);
    solvePacked(packed, n, dense);
    const factor = factorSparse({
      size: n,
      diagonal,
      row: Int32Array.from(row),
      column: Int32Array.from(column),
      value: Float64Array.from(value),
    });
    solveSparse(factor, b);
    b.forEach((found, i) => {
      expect(Math.abs(found / dense[i]! - 1)).toBeLessThan(1e-11);
    });
    expect(factor.value.length).toBeLessThan(n * 8);
  });
});
