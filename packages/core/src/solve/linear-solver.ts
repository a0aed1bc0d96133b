// Solves the coupled leakage equations (R + B Z Bᵀ) x = b by the method that suits their size.
import type { LeakageMatrix } from '../leakage/leakage-matrix.ts';
import { conjugateGradients, type Product } from '../numerics/conjugate-gradients.ts';
import { factorPacked, type PackedLower, solvePacked } from '../numerics/packed-cholesky.ts';

/** The leakage matrix and, where the metal has resistance, what that adds to it. */
export interface LeakageOperator {
  readonly matrix: LeakageMatrix;
  /** adds B Z Bᵀ x to `into`; absent for equipotential metal */
  readonly addMetal?: (x: Float64Array, into: Float64Array) => void;
}

export interface LinearSolver {
  readonly method: 'cholesky' | 'conjugate-gradients';
  solve(b: Float64Array): Promise<{ readonly x: Float64Array; readonly iterations: number }>;
}

/** Below this the factor costs less than a dozen iterations' overhead and gives the last digit. */
const SMALL = 500;
/** Iterations that a right-hand side takes, for the choice only: 20 to 40 seen from 500 to 6 000 segments. */
const TYPICAL_ITERATIONS = 40;
/** Relative residual asked of an iteration: three digits below the tightest promise, 1e-9. */
const RESIDUAL = 1e-13;
/** The same for a compressed matrix, whose blocks are good to 1e-5. */
const COMPRESSED_RESIDUAL = 1e-10;
const ITERATION_LIMIT = 2000;

export class SolverStalled extends Error {
  constructor(residual: number) {
    super(`the leakage equations did not converge: relative residual ${residual.toExponential(2)}`);
    this.name = 'SolverStalled';
  }
}

/** Worst relative residual that is still accepted when rounding stops an iteration short of its target. */
const ACCEPTED_RESIDUAL = 1e-9;

/** A factor costs as much as this share of the size in products of the matrix with a vector: 230 of them at 1 650, measured. */
const FACTOR_IN_PRODUCTS = 1 / 7;

/**
 * Chooses between a factor and conjugate gradients: the factor when the system is small or has so many right-hand
 * sides that their iterations would cost more.
 */
export function chooseMethod(size: number, rightHandSides: number): LinearSolver['method'] {
  return size <= SMALL || rightHandSides * TYPICAL_ITERATIONS > size * FACTOR_IN_PRODUCTS
    ? 'cholesky'
    : 'conjugate-gradients';
}

/** @throws SolverStalled, NotPositiveDefinite */
export function linearSolver(operator: LeakageOperator, rightHandSides: number): LinearSolver {
  const { matrix, addMetal } = operator;
  const { size, entries } = matrix;
  if (entries !== undefined && chooseMethod(size, rightHandSides) === 'cholesky') {
    const factor = coupled(entries);
    factorPacked(factor, size);
    return {
      method: 'cholesky',
      async solve(b) {
        const x = Float64Array.from(b);
        solvePacked(factor, size, x);
        return { x, iterations: 0 };
      },
    };
  }
  const multiply: Product = async (x, into) => {
    await matrix.multiply(x, into);
    addMetal?.(x, into);
  };
  return {
    method: 'conjugate-gradients',
    async solve(b) {
      const result = await conjugateGradients(multiply, matrix.precondition, b, {
        tolerance: entries === undefined ? COMPRESSED_RESIDUAL : RESIDUAL,
        limit: ITERATION_LIMIT,
      });
      if (result.outcome !== 'converged' && !(result.residual <= ACCEPTED_RESIDUAL))
        throw new SolverStalled(result.residual);
      return { x: result.x, iterations: result.iterations };
    },
  };
  function coupled(packed: PackedLower): PackedLower {
    const dense = Float64Array.from(packed);
    if (addMetal === undefined) return dense;
    const unit = new Float64Array(size);
    const column = new Float64Array(size);
    for (let j = 0; j < size; j++) {
      unit[j] = 1;
      column.fill(0);
      addMetal(unit, column);
      unit[j] = 0;
      for (let i = j; i < size; i++) dense[(i * (i + 1)) / 2 + j]! += column[i]!;
    }
    return dense;
  }
}
