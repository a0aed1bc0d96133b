// Solves the coupled leakage equations (R + B Z Bᵀ) x = b by the method that suits their size.
import type { LeakageMatrix } from '../leakage/leakage-matrix.ts';
import type { MetalDrop } from '../network/metal.ts';
import {
  type ConjugateGradientOptions,
  type Products,
  simultaneousGradients,
} from '../numerics/conjugate-gradients.ts';
import type { PackedLower } from '../numerics/packed-cholesky.ts';
import { packedFactor } from '../numerics/packed-factor.ts';

/** The leakage matrix and, where the metal has resistance, what that adds to it. */
export interface LeakageOperator {
  readonly matrix: LeakageMatrix;
  /** adds B Z Bᵀ x to `into`; absent for equipotential metal */
  readonly addMetal?: MetalDrop;
}

export interface LinearSolution {
  /** one for each right-hand side */
  readonly xs: readonly Float64Array[];
  readonly iterations: number;
}

export interface LinearSolver {
  readonly method: 'cholesky' | 'conjugate-gradients';
  solve(bs: readonly Float64Array[]): Promise<LinearSolution>;
}

/** Relative residual asked of an iteration: two digits below the tightest promise, 1e-9; one more costs an iteration. */
const RESIDUAL = 1e-11;
/** The same for a compressed matrix, whose blocks are good to 1e-5. */
const COMPRESSED_RESIDUAL = 1e-10;
const ITERATION_LIMIT = 2000;

export class SolverStalled extends Error {
  constructor(residual: number) {
    super(`the leakage equations did not converge: relative residual ${residual.toExponential(2)}`);
    this.name = 'SolverStalled';
  }
}

/** What is asked of an iteration with this matrix. */
export function iterationOptions(matrix: LeakageMatrix): ConjugateGradientOptions {
  const tolerance = matrix.entries === undefined ? COMPRESSED_RESIDUAL : RESIDUAL;
  return { tolerance, limit: ITERATION_LIMIT };
}

/** Worst relative residual that is still accepted when rounding stops an iteration short of its target. */
export const ACCEPTED_RESIDUAL = 1e-9;

/** Below this either way takes two milliseconds, and the factor gives the last digit. */
const SMALL = 300;
/** Iterations that a right-hand side takes, for the choice only: 10 to 14 seen from 400 to 3 000 segments. */
const TYPICAL_ITERATIONS = 12;
/** The factor, the metal's drops added, costs as much as this share of the size in iterations of one vector: 0.18 to 0.21, measured from 900 to 1 650. */
const FACTOR_IN_ITERATIONS = 0.2;

/**
 * Chooses between a factor and conjugate gradients: the factor when the system is small or has so many right-hand
 * sides that their iterations would cost more.
 */
export function chooseMethod(size: number, rightHandSides: number): LinearSolver['method'] {
  return size <= SMALL || rightHandSides * TYPICAL_ITERATIONS > size * FACTOR_IN_ITERATIONS
    ? 'cholesky'
    : 'conjugate-gradients';
}

/** @throws SolverStalled, NotPositiveDefinite */
export function linearSolver(operator: LeakageOperator, rightHandSides: number): LinearSolver {
  const { matrix } = operator;
  return matrix.entries !== undefined && chooseMethod(matrix.size, rightHandSides) === 'cholesky'
    ? direct(matrix.entries, operator)
    : iterative(operator);
}

function direct(entries: PackedLower, { matrix: { size }, addMetal }: LeakageOperator): LinearSolver {
  const factor = packedFactor(addMetal === undefined ? entries : withDrops(entries, size, addMetal), size);
  return {
    method: 'cholesky',
    async solve(bs) {
      const xs = bs.map((b) => b.slice());
      factor.solve(xs);
      return { xs, iterations: 0 };
    },
  };
}

/** A packed matrix with B Z Bᵀ added, row by row: what one ampere from segment i drops at those before it. */
function withDrops(packed: PackedLower, size: number, addMetal: MetalDrop): PackedLower {
  const sum = packed.slice();
  const unit = new Float64Array(size);
  const drop = new Float64Array(size);
  for (let i = 0; i < size; i++) {
    unit[i] = 1;
    drop.fill(0);
    addMetal(unit, drop);
    unit[i] = 0;
    const row = (i * (i + 1)) / 2;
    for (let j = 0; j <= i; j++) sum[row + j]! += drop[j]!;
  }
  return sum;
}

function iterative({ matrix, addMetal }: LeakageOperator): LinearSolver {
  const multiply: Products = async (xs, into) => {
    await multiplyAll(matrix, xs, into);
    if (addMetal !== undefined)
      xs.forEach((x, c) => {
        addMetal(x, into[c]!);
      });
  };
  return {
    method: 'conjugate-gradients',
    async solve(bs) {
      const results = await simultaneousGradients(
        multiply,
        matrix.precondition,
        bs,
        iterationOptions(matrix),
      );
      for (const { outcome, residual } of results)
        if (outcome !== 'converged' && !(residual <= ACCEPTED_RESIDUAL)) throw new SolverStalled(residual);
      return {
        xs: results.map(({ x }) => x),
        iterations: results.reduce((sum, { iterations }) => sum + iterations, 0),
      };
    },
  };
}

/** R x of several vectors, in one pass where the matrix offers that. */
export async function multiplyAll(
  matrix: LeakageMatrix,
  xs: readonly Float64Array[],
  into: readonly Float64Array[],
): Promise<void> {
  if (matrix.multiplyAll !== undefined) await matrix.multiplyAll(xs, into);
  else for (let c = 0; c < xs.length; c++) await matrix.multiply(xs[c]!, into[c]!);
}
