// Conjugate gradients for a complex symmetric operator whose preconditioner is real; several right-hand sides at once.

import {
  addScaled,
  bilinear,
  type Complex,
  type ComplexVector,
  complexNorm,
  complexVector,
  quotient,
} from './complex-vector.ts';
import type { Products } from './conjugate-gradients.ts';
import { CONJUGATE_GRADIENT_DEFAULTS, type ConjugateGradientOptions } from './conjugate-gradients.ts';

export interface ComplexGradientResult {
  readonly x: ComplexVector;
  /** ‖b − A x‖/‖b‖, recomputed from the solution */
  readonly residual: number;
  readonly iterations: number;
  readonly outcome: 'converged' | 'stalled' | 'limit';
}

/** Writes A x of each of the first vectors into the second ones. */
export type ComplexProducts = (
  xs: readonly ComplexVector[],
  into: readonly ComplexVector[],
) => void | Promise<void>;

/** Real products of complex vectors: both parts of all of them in one pass. */
export function realProducts(multiply: Products): ComplexProducts {
  const parts = (vectors: readonly ComplexVector[]): Float64Array[] =>
    vectors.flatMap(({ re, im }) => [re, im]);
  return (xs, into) => multiply(parts(xs), parts(into));
}

interface Run {
  readonly b: ComplexVector;
  readonly x: ComplexVector;
  readonly r: ComplexVector;
  readonly p: ComplexVector;
  readonly q: ComplexVector;
  readonly target: number;
  rho: Complex;
  iterations: number;
  best: number;
  bestAt: number;
  outcome: ComplexGradientResult['outcome'] | undefined;
}

/** Iterations without a smaller residual before it is given up: the residual is not monotone, and may rest for long. */
const PATIENCE = 200;

/**
 * Solves A x = b, A = Aᵀ complex, by the conjugate orthogonal conjugate gradients (van der Vorst and Melissen 1990): those
 * of Hestenes and Stiefel with products that conjugate nothing, so a real A gives the real iteration.
 * @param precondition writes an approximate A⁻¹ r of a real vector into its second argument; symmetric
 */
export async function complexGradients(
  multiply: ComplexProducts,
  precondition: (r: Float64Array, into: Float64Array) => void,
  bs: readonly ComplexVector[],
  options: ConjugateGradientOptions = CONJUGATE_GRADIENT_DEFAULTS,
): Promise<ComplexGradientResult[]> {
  const runs = bs.map((b): Run => begun(b, options.tolerance));
  const z = complexVector(bs[0]?.re.length ?? 0);
  for (;;) {
    for (const run of runs) direct(run, precondition, z, options.limit);
    const going = runs.filter((run) => run.outcome === undefined);
    if (going.length === 0) break;
    await multiply(
      going.map((run) => run.p),
      going.map((run) => run.q),
    );
    for (const run of going) {
      const alpha = quotient(run.rho, bilinear(run.p, run.q));
      addScaled(run.x, alpha, run.p);
      addScaled(run.r, { re: -alpha.re, im: -alpha.im }, run.q);
      run.iterations++;
    }
  }
  await multiply(
    runs.map((run) => run.x),
    runs.map((run) => run.q),
  );
  return runs.map(({ b, x, q, iterations, outcome }) => {
    addScaled(q, { re: -1, im: 0 }, b);
    const scale = complexNorm(b);
    return { x, residual: scale === 0 ? 0 : complexNorm(q) / scale, iterations, outcome: outcome! };
  });
}

function begun(b: ComplexVector, tolerance: number): Run {
  const n = b.re.length;
  return {
    b,
    x: complexVector(n),
    r: { re: b.re.slice(), im: b.im.slice() },
    p: complexVector(n),
    q: complexVector(n),
    target: tolerance * complexNorm(b),
    rho: { re: 0, im: 0 },
    iterations: 0,
    best: Number.POSITIVE_INFINITY,
    bestAt: 0,
    outcome: undefined,
  };
}

/** Ends a run, or gives it its next direction. */
function direct(
  run: Run,
  precondition: (r: Float64Array, into: Float64Array) => void,
  z: ComplexVector,
  limit: number,
): void {
  if (run.outcome !== undefined) return;
  const norm = complexNorm(run.r);
  if (norm < run.best) {
    run.best = norm;
    run.bestAt = run.iterations;
  }
  if (norm <= run.target) run.outcome = 'converged';
  else if (run.iterations - run.bestAt > PATIENCE) run.outcome = 'stalled';
  else if (run.iterations >= limit) run.outcome = 'limit';
  if (run.outcome !== undefined) return;
  precondition(run.r.re, z.re);
  precondition(run.r.im, z.im);
  const rho = bilinear(run.r, z);
  const beta = run.iterations === 0 ? { re: 0, im: 0 } : quotient(rho, run.rho);
  const { p } = run;
  for (let i = 0; i < p.re.length; i++) {
    const re = z.re[i]! + beta.re * p.re[i]! - beta.im * p.im[i]!;
    p.im[i] = z.im[i]! + beta.re * p.im[i]! + beta.im * p.re[i]!;
    p.re[i] = re;
  }
  run.rho = rho;
}
