// Factor of a sparse complex symmetric matrix, L D Lᵀ with nothing conjugated, eliminated in minimum-degree order.
import type { ComplexVector } from './complex-vector.ts';
import { type Elimination, elimination, entryAt } from './elimination.ts';

/** Entries off the diagonal are given once, in either triangle; equal places add up. */
export interface SparseComplex {
  readonly size: number;
  readonly diagonal: ComplexVector;
  readonly row: Int32Array;
  readonly column: Int32Array;
  readonly value: ComplexVector;
}

export interface ComplexFactor extends Elimination {
  /** 1/D, by places */
  readonly reciprocal: ComplexVector;
  /** L below its diagonal, entry for entry of `row` */
  readonly value: ComplexVector;
}

/** A pivot that is nothing, or no number: a part of the network that touches no grounded node. */
export class SingularNetwork extends Error {
  readonly unknown: number;
  constructor(unknown: number) {
    super(`matrix is singular: no pivot for unknown ${unknown}`);
    this.name = 'SingularNetwork';
    this.unknown = unknown;
  }
}

/** A pivot below this share of its diagonal entry is rounding: of 1e-16 a step, some thousand steps. */
const ROUNDING = 1e-13;

/**
 * L D Lᵀ without pivoting: stable where the real part is positive definite, as that of a network of passive branches is.
 * @throws SingularNetwork
 */
export function factorComplex(matrix: SparseComplex): ComplexFactor {
  const pattern = elimination(matrix.size, matrix.row, matrix.column);
  const { size, order, place, start, row } = pattern;
  const dr = Float64Array.from(order, (unknown) => matrix.diagonal.re[unknown]!);
  const di = Float64Array.from(order, (unknown) => matrix.diagonal.im[unknown]!);
  const least = dr.map((re, k) => ROUNDING * Math.hypot(re, di[k]!));
  const vr = new Float64Array(row.length);
  const vi = new Float64Array(row.length);
  for (let e = 0; e < matrix.row.length; e++) {
    const i = place[matrix.row[e]!]!;
    const j = place[matrix.column[e]!]!;
    const at = entryAt(pattern, Math.max(i, j), Math.min(i, j));
    vr[at]! += matrix.value.re[e]!;
    vi[at]! += matrix.value.im[e]!;
  }
  for (let k = 0; k < size; k++) {
    const square = dr[k]! * dr[k]! + di[k]! * di[k]!;
    if (!(Math.sqrt(square) > least[k]!)) throw new SingularNetwork(order[k]!);
    const pr = dr[k]! / square;
    const pi = -di[k]! / square;
    dr[k] = pr;
    di[k] = pi;
    for (let a = start[k]!; a < start[k + 1]!; a++) {
      const fr = vr[a]! * pr - vi[a]! * pi;
      const fi = vr[a]! * pi + vi[a]! * pr;
      const column = row[a]!;
      dr[column]! -= fr * vr[a]! - fi * vi[a]!;
      di[column]! -= fr * vi[a]! + fi * vr[a]!;
      for (let b = a + 1; b < start[k + 1]!; b++) {
        const at = entryAt(pattern, row[b]!, column);
        vr[at]! -= fr * vr[b]! - fi * vi[b]!;
        vi[at]! -= fr * vi[b]! + fi * vr[b]!;
      }
      vr[a] = fr;
      vi[a] = fi;
    }
  }
  return { ...pattern, reciprocal: { re: dr, im: di }, value: { re: vr, im: vi } };
}

/** A⁻¹ b, both by unknowns. */
export function solvedComplex(factor: ComplexFactor, b: ComplexVector): ComplexVector {
  const { order, place } = factor;
  const x = {
    re: Float64Array.from(order, (unknown) => b.re[unknown]!),
    im: Float64Array.from(order, (unknown) => b.im[unknown]!),
  };
  solveComplex(factor, x);
  return { re: Float64Array.from(place, (at) => x.re[at]!), im: Float64Array.from(place, (at) => x.im[at]!) };
}

/** Solves A x = b in place, both by places of the elimination; allocates nothing. */
export function solveComplex(factor: ComplexFactor, b: ComplexVector): void {
  const { size, start, row, reciprocal, value } = factor;
  const { re, im } = b;
  for (let k = 0; k < size; k++) {
    const xr = re[k]!;
    const xi = im[k]!;
    for (let e = start[k]!; e < start[k + 1]!; e++) {
      re[row[e]!]! -= value.re[e]! * xr - value.im[e]! * xi;
      im[row[e]!]! -= value.re[e]! * xi + value.im[e]! * xr;
    }
  }
  for (let k = size - 1; k >= 0; k--) {
    let xr = re[k]! * reciprocal.re[k]! - im[k]! * reciprocal.im[k]!;
    let xi = re[k]! * reciprocal.im[k]! + im[k]! * reciprocal.re[k]!;
    for (let e = start[k]!; e < start[k + 1]!; e++) {
      xr -= value.re[e]! * re[row[e]!]! - value.im[e]! * im[row[e]!]!;
      xi -= value.re[e]! * im[row[e]!]! + value.im[e]! * re[row[e]!]!;
    }
    re[k] = xr;
    im[k] = xi;
  }
}
