// Preconditioned conjugate gradients for a symmetric positive-definite operator and several right-hand sides at once.

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

/** Writes A x of each of the first vectors into the second ones, in one pass over the operator. */
export type Products = (xs: readonly Float64Array[], into: readonly Float64Array[]) => void | Promise<void>;

/** Iterations without a smaller residual before the rounding floor is taken as reached. */
const PATIENCE = 25;

/** Solves A x = b for one right-hand side; see `simultaneousGradients`. */
export async function conjugateGradients(
  multiply: Product,
  precondition: (r: Float64Array, into: Float64Array) => void,
  b: Float64Array,
  options: ConjugateGradientOptions = CONJUGATE_GRADIENT_DEFAULTS,
): Promise<ConjugateGradientResult> {
  const products: Products = ([x], [into]) => multiply(x!, into!);
  const [result] = await simultaneousGradients(products, precondition, [b], options);
  return result!;
}

/** One right-hand side on its way. */
interface Run {
  readonly b: Float64Array;
  readonly x: Float64Array;
  readonly r: Float64Array;
  readonly p: Float64Array;
  readonly q: Float64Array;
  readonly target: number;
  rho: number;
  iterations: number;
  best: number;
  bestAt: number;
  outcome: ConjugateGradientResult['outcome'] | undefined;
}

/**
 * Solves A x = b (Hestenes and Stiefel 1952), preconditioned, for several b: each takes its own steps, all share the passes
 * over the operator, and one that is done drops out.
 * @param multiply writes A x of several vectors
 * @param precondition writes an approximate A⁻¹ r into its second argument; symmetric positive definite
 * @param starts first guesses, one for each b; zeros where absent
 */
export async function simultaneousGradients(
  multiply: Products,
  precondition: (r: Float64Array, into: Float64Array) => void,
  bs: readonly Float64Array[],
  options: ConjugateGradientOptions = CONJUGATE_GRADIENT_DEFAULTS,
  starts?: readonly Float64Array[],
): Promise<ConjugateGradientResult[]> {
  const runs = bs.map((b, c) => begun(b, options.tolerance, starts?.[c]));
  if (starts !== undefined) {
    await multiply(
      runs.map((run) => run.x),
      runs.map((run) => run.q),
    );
    for (const { r, q } of runs) for (let i = 0; i < r.length; i++) r[i]! -= q[i]!;
  }
  const z = new Float64Array(bs[0]?.length ?? 0);
  for (;;) {
    for (const run of runs) direct(run, precondition, z, options.limit);
    const going = runs.filter((run) => run.outcome === undefined);
    if (going.length === 0) break;
    await multiply(
      going.map((run) => run.p),
      going.map((run) => run.q),
    );
    for (const run of going) step(run);
  }
  await multiply(
    runs.map((run) => run.x),
    runs.map((run) => run.q),
  );
  return runs.map(({ b, x, q, iterations, outcome }) => {
    let error = 0;
    for (let i = 0; i < b.length; i++) error += (b[i]! - q[i]!) ** 2;
    const scale = dot(b, b);
    return { x, residual: scale === 0 ? 0 : Math.sqrt(error / scale), iterations, outcome: outcome! };
  });
}

function begun(b: Float64Array, tolerance: number, start: Float64Array | undefined): Run {
  const n = b.length;
  return {
    b,
    x: start === undefined ? new Float64Array(n) : start.slice(),
    r: b.slice(),
    p: new Float64Array(n),
    q: new Float64Array(n),
    target: tolerance * Math.sqrt(dot(b, b)),
    rho: 0,
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
  z: Float64Array,
  limit: number,
): void {
  if (run.outcome !== undefined) return;
  const { r, p } = run;
  const norm = Math.sqrt(dot(r, r));
  if (norm < run.best) {
    run.best = norm;
    run.bestAt = run.iterations;
  }
  if (norm <= run.target) run.outcome = 'converged';
  else if (run.iterations - run.bestAt > PATIENCE) run.outcome = 'stalled';
  else if (run.iterations >= limit) run.outcome = 'limit';
  if (run.outcome !== undefined) return;
  precondition(r, z);
  const rho = dot(r, z);
  const beta = run.iterations === 0 ? 0 : rho / run.rho;
  for (let i = 0; i < p.length; i++) p[i] = z[i]! + beta * p[i]!;
  run.rho = rho;
}

function step(run: Run): void {
  const { x, r, p, q } = run;
  const alpha = run.rho / dot(p, q);
  for (let i = 0; i < x.length; i++) {
    x[i]! += alpha * p[i]!;
    r[i]! -= alpha * q[i]!;
  }
  run.iterations++;
}

function dot(a: Float64Array, b: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < a.length; i++) sum += a[i]! * b[i]!;
  return sum;
}
