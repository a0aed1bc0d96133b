// Nonlinear least squares within bounds: Levenberg–Marquardt with differences for derivatives.
import { factorPacked, solvePacked } from './packed-cholesky.ts';

export interface LeastSquaresProblem {
  /** n */
  readonly parameters: number;
  /** m */
  readonly residuals: number;
  /** Writes the residuals at x, shape [n], into its second argument, shape [m]. */
  evaluate(x: Float64Array, into: Float64Array): void;
  /** shape [n] */
  readonly lower: Float64Array;
  readonly upper: Float64Array;
}

export interface LeastSquaresOptions {
  /** steps at most */
  readonly limit: number;
  /** Converged when the residuals' part that the linear model could still take away is less than this share of Σ r² … */
  readonly reduction: number;
  /** … or when the root of the mean square residual is below this, in the residuals' unit */
  readonly negligible: number;
  /** a step that moves no parameter by more than this, in the parameters' unit, makes no way */
  readonly step: number;
  /** length over which derivatives are taken, in the parameters' unit */
  readonly difference: number;
}

/**
 * For parameters and residuals that are logarithms of quantities known to a few per cent and computed to 1e-12: the
 * residuals stand at right angles to the model's tangent within 1e-4 (relative offset of Bates and Watts 1981).
 */
export const LEAST_SQUARES_DEFAULTS: LeastSquaresOptions = {
  limit: 200,
  reduction: 1e-8,
  negligible: 1e-6,
  step: 1e-9,
  difference: 1e-5,
};

export interface LeastSquaresResult {
  /** shape [n] */
  readonly x: Float64Array;
  /** residuals at x, shape [m] */
  readonly residuals: Float64Array;
  /** Σ residual² */
  readonly sum: number;
  readonly iterations: number;
  /** `stalled`: steps of no length, or none that gives a smaller sum, before the residuals stand at right angles */
  readonly outcome: 'converged' | 'stalled' | 'limit';
}

/** Damping at the start, of the diagonal; and beyond which a step is rounding alone. */
const FIRST_DAMPING = 1e-3;
const LARGEST_DAMPING = 1e12;
/** Damping so slight that the step is the linear model's own optimum, save along directions without effect. */
const NO_DAMPING = 1e-10;
/** Least diagonal, of the largest: keeps the factor definite where a parameter has no effect. */
const LEAST_DIAGONAL = 1e-12;

/**
 * Minimises Σ r_i(x)² for lower ≤ x ≤ upper. Damping after Marquardt (1963), its size by the gain ratio after Nielsen
 * (1999, from memory); a parameter on its bound with the gradient pointing outward is held there for the step, and
 * steps are cut at the bounds.
 * @param start shape [n]; moved within the bounds
 */
export function leastSquares(
  problem: LeastSquaresProblem,
  start: Float64Array,
  options: LeastSquaresOptions = LEAST_SQUARES_DEFAULTS,
): LeastSquaresResult {
  const { parameters: n, residuals: m, lower, upper } = problem;
  let x = start.map((value, j) => Math.min(upper[j]!, Math.max(lower[j]!, value)));
  let r = new Float64Array(m);
  problem.evaluate(x, r);
  let sum = dot(r, r);
  let trial = new Float64Array(n);
  let trialResiduals = new Float64Array(m);
  let damping = FIRST_DAMPING;
  let growth = 2;
  let iterations = 0;
  while (iterations < options.limit) {
    iterations++;
    const jacobian = differences(problem, x, r, options.difference);
    const gradient = jacobian.map((column) => dot(column, r));
    const free = range(n).filter(
      (j) => !(x[j] === lower[j] && gradient[j]! > 0) && !(x[j] === upper[j] && gradient[j]! < 0),
    );
    const promise = expectedReduction(jacobian, r, dampedStep(jacobian, gradient, free, NO_DAMPING));
    if (promise <= options.reduction * sum || sum <= m * options.negligible ** 2)
      return { x, residuals: r, sum, iterations, outcome: 'converged' };
    for (let accepted = false; !accepted; ) {
      const step = dampedStep(jacobian, gradient, free, damping);
      let largest = 0;
      for (let j = 0; j < n; j++) {
        trial[j] = Math.min(upper[j]!, Math.max(lower[j]!, x[j]! + step[j]!));
        step[j] = trial[j]! - x[j]!;
        largest = Math.max(largest, Math.abs(step[j]!));
      }
      if (largest <= options.step || damping > LARGEST_DAMPING)
        return { x, residuals: r, sum, iterations, outcome: 'stalled' };
      problem.evaluate(trial, trialResiduals);
      const trialSum = dot(trialResiduals, trialResiduals);
      accepted = trialSum < sum;
      if (accepted) {
        const gain = (sum - trialSum) / Math.max(expectedReduction(jacobian, r, step), sum - trialSum);
        [x, trial] = [trial, x];
        [r, trialResiduals] = [trialResiduals, r];
        sum = trialSum;
        damping *= Math.max(1 / 3, 1 - (2 * gain - 1) ** 3);
        growth = 2;
      } else {
        damping *= growth;
        growth *= 2;
      }
    }
  }
  return { x, residuals: r, sum, iterations, outcome: 'limit' };
}

/** Columns ∂r/∂x_j, by forward differences, backward where the bound is in the way. */
function differences(
  problem: LeastSquaresProblem,
  x: Float64Array,
  r: Float64Array,
  length: number,
): Float64Array[] {
  const moved = Float64Array.from(x);
  return range(problem.parameters).map((j) => {
    const h = x[j]! + length > problem.upper[j]! ? -length : length;
    moved[j] = x[j]! + h;
    const column = new Float64Array(problem.residuals);
    problem.evaluate(moved, column);
    moved[j] = x[j]!;
    for (let i = 0; i < column.length; i++) column[i] = (column[i]! - r[i]!) / h;
    return column;
  });
}

/** (JᵀJ + damping·diag)·step = −Jᵀr over the free parameters; 0 for the others. */
function dampedStep(
  jacobian: readonly Float64Array[],
  gradient: readonly number[],
  free: readonly number[],
  damping: number,
): Float64Array {
  const step = new Float64Array(jacobian.length);
  const size = free.length;
  if (size === 0) return step;
  const normal = new Float64Array((size * (size + 1)) / 2);
  let largest = 0;
  free.forEach((j, row) => {
    for (let column = 0; column <= row; column++)
      normal[(row * (row + 1)) / 2 + column] = dot(jacobian[j]!, jacobian[free[column]!]!);
    largest = Math.max(largest, normal[(row * (row + 3)) / 2]!);
  });
  if (largest === 0) return step;
  for (let row = 0; row < size; row++) {
    const at = (row * (row + 3)) / 2;
    normal[at] = normal[at]! + damping * Math.max(normal[at]!, LEAST_DIAGONAL * largest);
  }
  const right = Float64Array.from(free, (j) => -gradient[j]!);
  factorPacked(normal, size);
  solvePacked(normal, size, right);
  free.forEach((j, row) => {
    step[j] = right[row]!;
  });
  return step;
}

/** ‖r‖² − ‖r + J·step‖², what the linear model promises. */
function expectedReduction(jacobian: readonly Float64Array[], r: Float64Array, step: Float64Array): number {
  let less = 0;
  for (let i = 0; i < r.length; i++) {
    let change = 0;
    for (let j = 0; j < step.length; j++) change += jacobian[j]![i]! * step[j]!;
    less -= change * (2 * r[i]! + change);
  }
  return less;
}

function dot(a: Float64Array, b: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < a.length; i++) sum += a[i]! * b[i]!;
  return sum;
}

function range(n: number): number[] {
  return Array.from({ length: n }, (_, j) => j);
}
