// Preconditioned conjugate gradients for a symmetric positive-definite operator.

export interface ConjugateGradientResult {
  readonly x: Float64Array;
  /** ‖b − A x‖/‖b‖, recomputed from the solution, not from the recursion */
  readonly residual: number;
  readonly iterations: number;
  readonly outcome: 'converged' | 'stalled' | 'limit';
}

export interface ConjugateGradientOptions {
  /** relative residual asked for */
  readonly tolerance: number;
  readonly limit: number;
}

export const CONJUGATE_GRADIENT_DEFAULTS: ConjugateGradientOptions = { tolerance: 1e-12, limit: 1000 };

/** Writes A x into its second argument; a promise where others help to compute it. */
export type Product = (x: Float64Array, into: Float64Array) => void | Promise<void>;

/** Iterations without a smaller residual before the rounding floor is taken as reached. */
const PATIENCE = 25;

/**
 * Solves A x = b (Hestenes and Stiefel 1952), preconditioned.
 * @param multiply writes A x into its second argument
 * @param precondition writes an approximate A⁻¹ r into its second argument; symmetric positive definite
 */
export async function conjugateGradients(
  multiply: Product,
  precondition: (r: Float64Array, into: Float64Array) => void,
  b: Float64Array,
  options: ConjugateGradientOptions = CONJUGATE_GRADIENT_DEFAULTS,
): Promise<ConjugateGradientResult> {
  const n = b.length;
  const x = new Float64Array(n);
  const r = Float64Array.from(b);
  const p = new Float64Array(n);
  const q = new Float64Array(n);
  const z = new Float64Array(n);
  const target = options.tolerance * Math.sqrt(dot(b, b));
  let previous = 0;
  let iterations = 0;
  let best = Number.POSITIVE_INFINITY;
  let bestAt = 0;
  let outcome: ConjugateGradientResult['outcome'] = 'limit';
  while (iterations < options.limit) {
    const norm = Math.sqrt(dot(r, r));
    if (norm <= target) {
      outcome = 'converged';
      break;
    }
    if (norm < best) {
      best = norm;
      bestAt = iterations;
    } else if (iterations - bestAt > PATIENCE) {
      outcome = 'stalled';
      break;
    }
    precondition(r, z);
    const rho = dot(r, z);
    const beta = iterations === 0 ? 0 : rho / previous;
    for (let i = 0; i < n; i++) p[i] = z[i]! + beta * p[i]!;
    await multiply(p, q);
    const alpha = rho / dot(p, q);
    for (let i = 0; i < n; i++) {
      x[i]! += alpha * p[i]!;
      r[i]! -= alpha * q[i]!;
    }
    previous = rho;
    iterations++;
  }
  await multiply(x, q);
  let error = 0;
  for (let i = 0; i < n; i++) error += (b[i]! - q[i]!) ** 2;
  const scale = dot(b, b);
  return { x, residual: scale === 0 ? 0 : Math.sqrt(error / scale), iterations, outcome };
}

function dot(a: Float64Array, b: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < a.length; i++) sum += a[i]! * b[i]!;
  return sum;
}
