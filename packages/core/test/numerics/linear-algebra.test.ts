import { describe, expect, it } from 'vitest';
import { conjugateGradients, simultaneousGradients } from '../../src/numerics/conjugate-gradients.ts';
import { factorPacked, NotPositiveDefinite, solvePacked } from '../../src/numerics/packed-cholesky.ts';
import { multiplyPacked } from '../../src/numerics/packed-product.ts';
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

describe('simultaneous conjugate gradients', () => {
  const n = 60;
  const matrix = randomPositive(n, 3);
  const diagonal = Float64Array.from({ length: n }, (_, i) => matrix[(i * (i + 3)) / 2]!);
  const random = randomNumbers(9);
  const bs = [0, 1, 2, 3].map((c) => Float64Array.from({ length: n }, () => (c === 2 ? 0 : random() - 0.5)));
  /** counts passes over the matrix and the vectors they served */
  const counted = () => {
    const served: number[] = [];
    const multiply = (xs: readonly Float64Array[], into: readonly Float64Array[]): void => {
      served.push(xs.length);
      xs.forEach((x, c) => {
        multiplyPacked(matrix, n, x, into[c]!);
      });
    };
    return { served, multiply };
  };

  it('solves each right-hand side as it would be alone, sharing the passes; one that is done drops out', async () => {
    const { served, multiply } = counted();
    const options = { tolerance: 1e-12, limit: 100 };
    const together = await simultaneousGradients(multiply, byDiagonal(diagonal), bs, options);
    for (const [c, b] of bs.entries()) {
      const product = (x: Float64Array, into: Float64Array): void => multiplyPacked(matrix, n, x, into);
      expect(together[c]).toEqual(await conjugateGradients(product, byDiagonal(diagonal), b, options));
    }
    expect(together.map(({ outcome }) => outcome)).toEqual(new Array(4).fill('converged'));
    expect(together[2]!.iterations).toBe(0);
    expect(served.length).toBe(Math.max(...together.map(({ iterations }) => iterations)) + 1);
    expect(served[0]).toBe(3);
    expect(served.at(-1)).toBe(4);
  });

  it('starts from a guess: none is needed at the solution, fewer iterations near it', async () => {
    const { multiply } = counted();
    const options = { tolerance: 1e-10, limit: 100 };
    const cold = await simultaneousGradients(multiply, byDiagonal(diagonal), bs, options);
    const exact = cold.map(({ x }) => x);
    const again = await simultaneousGradients(
      multiply,
      byDiagonal(diagonal),
      bs,
      { ...options, tolerance: 2e-10 },
      exact,
    );
    expect(again.map(({ iterations }) => iterations)).toEqual([0, 0, 0, 0]);
    const near = exact.map((x) => x.map((value) => value * (1 + 1e-5)));
    const warm = await simultaneousGradients(multiply, byDiagonal(diagonal), bs, options, near);
    expect(warm[0]!.iterations).toBeLessThan(cold[0]!.iterations);
    warm[0]!.x.forEach((value, i) => {
      expect(Math.abs(value - exact[0]![i]!)).toBeLessThan(1e-10);
    });
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
