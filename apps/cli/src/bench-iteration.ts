// Conjugate gradients on an assembled leakage matrix, to a residual that the benchmark names.
import type { LeakageMatrix } from '@ohmstead/core';

/** Iterations at which the benchmark gives up: ten times what its largest case takes. */
const LIMIT = 500;

export interface Iterated {
  /** leakage at one volt, A */
  readonly current: Float64Array;
  readonly iterations: number;
}

/**
 * Leakage of all metal at one volt, R x = 1 (Hestenes 1952), with the matrix's own preconditioner.
 * @param residual ‖1 − R x‖/‖1‖ at which to stop
 * @throws Error when the limit is reached first
 */
export async function leakageAtOneVolt(matrix: LeakageMatrix, residual: number): Promise<Iterated> {
  const n = matrix.size;
  const x = new Float64Array(n);
  const r = new Float64Array(n).fill(1);
  const [p, q, z] = [0, 1, 2].map(() => new Float64Array(n));
  const target = residual * Math.sqrt(n);
  let previous = Number.POSITIVE_INFINITY;
  for (let iterations = 0; iterations < LIMIT; iterations++) {
    if (Math.sqrt(dot(r, r)) <= target) return { current: x, iterations };
    await matrix.precondition(r, z!);
    const rho = dot(r, z!);
    for (let i = 0; i < n; i++) p![i] = z![i]! + (rho / previous) * p![i]!;
    await matrix.multiply(p!, q!);
    const step = rho / dot(p!, q!);
    for (let i = 0; i < n; i++) {
      x[i]! += step * p![i]!;
      r[i]! -= step * q![i]!;
    }
    previous = rho;
  }
  throw new Error(`no residual of ${residual} within ${LIMIT} iterations`);
}

function dot(a: Float64Array, b: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < a.length; i++) sum += a[i]! * b[i]!;
  return sum;
}
