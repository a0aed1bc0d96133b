import { describe, expect, it } from 'vitest';
import { complexGradients, realProducts } from '../../src/numerics/complex-gradients.ts';
import { type ComplexVector, complexNorm, complexVector } from '../../src/numerics/complex-vector.ts';
import { simultaneousGradients } from '../../src/numerics/conjugate-gradients.ts';
import { randomNumbers } from '../support/random.ts';

const n = 40;
const random = randomNumbers(21);
/** symmetric, the real part outweighed by its diagonal; whole */
const matrix = complexVector(n * n);
for (let i = 0; i < n; i++)
  for (let j = 0; j <= i; j++)
    for (const part of [matrix.re, matrix.im]) {
      part[i * n + j] = random() - 0.5;
      part[j * n + i] = part[i * n + j]!;
    }
for (let i = 0; i < n; i++) matrix.re[i * n + i]! += n / 2;

const unscaled = (r: Float64Array, into: Float64Array): void => into.set(r);

function product(x: ComplexVector, into: ComplexVector): void {
  for (let i = 0; i < n; i++) {
    into.re[i] = 0;
    into.im[i] = 0;
    for (let j = 0; j < n; j++) {
      const [ar, ai] = [matrix.re[i * n + j]!, matrix.im[i * n + j]!];
      into.re[i]! += ar * x.re[j]! - ai * x.im[j]!;
      into.im[i]! += ar * x.im[j]! + ai * x.re[j]!;
    }
  }
}

const products = (xs: readonly ComplexVector[], into: readonly ComplexVector[]): void =>
  xs.forEach((x, c) => {
    product(x, into[c]!);
  });

const vector = (): ComplexVector => ({
  re: Float64Array.from({ length: n }, () => random() - 0.5),
  im: Float64Array.from({ length: n }, () => random() - 0.5),
});

describe('complex conjugate gradients', () => {
  it('solve a complex symmetric system, several right-hand sides at once', async () => {
    const wanted = [vector(), vector()];
    const bs = wanted.map(() => complexVector(n));
    products(wanted, bs);
    const results = await complexGradients(products, unscaled, bs);
    results.forEach(({ x, outcome, residual, iterations }, c) => {
      expect(outcome).toBe('converged');
      expect(residual).toBeLessThan(2e-12);
      expect(iterations).toBeLessThanOrEqual(n);
      for (let i = 0; i < n; i++)
        expect(Math.hypot(x.re[i]! - wanted[c]!.re[i]!, x.im[i]! - wanted[c]!.im[i]!)).toBeLessThan(1e-11);
    });
  });

  it('are the real ones where nothing is imaginary', async () => {
    const real = (xs: readonly Float64Array[], into: readonly Float64Array[]): void =>
      xs.forEach((x, c) => {
        for (let i = 0; i < n; i++) {
          let sum = 0;
          for (let j = 0; j < n; j++) sum += matrix.re[i * n + j]! * x[j]!;
          into[c]![i] = sum;
        }
      });
    const b = vector().re;
    const [alone] = await simultaneousGradients(real, unscaled, [b]);
    const [both] = await complexGradients(realProducts(real), unscaled, [{ re: b, im: new Float64Array(n) }]);
    expect(both!.iterations).toBe(alone!.iterations);
    expect(complexNorm({ re: both!.x.im, im: new Float64Array(n) })).toBe(0);
    alone!.x.forEach((value, i) => {
      expect(Math.abs(both!.x.re[i]! - value)).toBeLessThan(1e-14);
    });
  });

  it('say so when they reach their limit', async () => {
    const [result] = await complexGradients(products, unscaled, [vector()], { tolerance: 1e-12, limit: 2 });
    expect(result!.outcome).toBe('limit');
    expect(result!.residual).toBeGreaterThan(1e-12);
  });
});
