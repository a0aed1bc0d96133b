// Complex numbers in bulk: real and imaginary parts side by side.

/** Shape [n] each. */
export interface ComplexVector {
  readonly re: Float64Array;
  readonly im: Float64Array;
}

export interface Complex {
  readonly re: number;
  readonly im: number;
}

export function complexVector(length: number): ComplexVector {
  return { re: new Float64Array(length), im: new Float64Array(length) };
}

/** Σ a_i b_i, nothing conjugated. */
export function bilinear(a: ComplexVector, b: ComplexVector): Complex {
  let re = 0;
  let im = 0;
  for (let i = 0; i < a.re.length; i++) {
    re += a.re[i]! * b.re[i]! - a.im[i]! * b.im[i]!;
    im += a.re[i]! * b.im[i]! + a.im[i]! * b.re[i]!;
  }
  return { re, im };
}

/** ‖a‖, the root of Σ |a_i|². */
export function complexNorm(a: ComplexVector): number {
  let sum = 0;
  for (let i = 0; i < a.re.length; i++) sum += a.re[i]! * a.re[i]! + a.im[i]! * a.im[i]!;
  return Math.sqrt(sum);
}

/** into += factor·a. */
export function addScaled(into: ComplexVector, factor: Complex, a: ComplexVector): void {
  for (let i = 0; i < a.re.length; i++) {
    into.re[i]! += factor.re * a.re[i]! - factor.im * a.im[i]!;
    into.im[i]! += factor.re * a.im[i]! + factor.im * a.re[i]!;
  }
}

export function quotient(a: Complex, b: Complex): Complex {
  const square = b.re * b.re + b.im * b.im;
  return { re: (a.re * b.re + a.im * b.im) / square, im: (a.im * b.re - a.re * b.im) / square };
}
