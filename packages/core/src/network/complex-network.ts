// A network of complex impedances at one frequency: its branches, and its Laplacian with the grounded nodes struck out.
import { type ComplexVector, complexVector, quotient } from '../numerics/complex-vector.ts';
import { factorComplex, solveComplex } from '../numerics/sparse-complex.ts';
import { laplacianPattern } from './reduced-laplacian.ts';

/** Shape [count] each. A branch may end at REMOTE_EARTH; its current counts positive from `from` to `to`. */
export interface ComplexBranches {
  readonly count: number;
  readonly from: Int32Array;
  readonly to: Int32Array;
  /** S, real part greater than 0 */
  readonly admittance: ComplexVector;
}

/** 1/z of each. */
export function reciprocals(impedance: ComplexVector): ComplexVector {
  const found = complexVector(impedance.re.length);
  for (let i = 0; i < found.re.length; i++) {
    const { re, im } = quotient({ re: 1, im: 0 }, { re: impedance.re[i]!, im: impedance.im[i]! });
    found.re[i] = re;
    found.im[i] = im;
  }
  return found;
}

/** Currents of the branches from node potentials (remote earth at 0), A: i = y·(φ_from − φ_to). */
export function complexBranchCurrents(branches: ComplexBranches, potential: ComplexVector): ComplexVector {
  const { from, to, admittance } = branches;
  const current = complexVector(branches.count);
  const at = (part: Float64Array, node: number): number => (node < 0 ? 0 : part[node]!);
  for (let b = 0; b < branches.count; b++) {
    const re = at(potential.re, from[b]!) - at(potential.re, to[b]!);
    const im = at(potential.im, from[b]!) - at(potential.im, to[b]!);
    current.re[b] = admittance.re[b]! * re - admittance.im[b]! * im;
    current.im[b] = admittance.re[b]! * im + admittance.im[b]! * re;
  }
  return current;
}

export interface ComplexLaplacian {
  readonly size: number;
  /** place of each node among the unknowns; `size` for a grounded one; shape [nodeCount] */
  readonly place: Int32Array;
  /** replaces currents by potentials, both by place, allocating nothing; what lies from `size` on is left alone */
  solveInPlace(b: ComplexVector): void;
  /** node potentials, V, for currents injected at the nodes, A; both shape [nodeCount] */
  solve(injection: ComplexVector): ComplexVector;
}

/**
 * Builds and factors the reduced Laplacian Y = A diag(y) Aᵀ, as `reducedLaplacian` does for resistances.
 * @param grounded nodes held at zero potential besides remote earth
 * @throws SingularNetwork when a part of the network touches no grounded node
 */
export function complexLaplacian(
  branches: ComplexBranches,
  nodeCount: number,
  grounded: readonly number[],
): ComplexLaplacian {
  const { admittance } = branches;
  const { size, unknown, row, column, branch } = laplacianPattern(branches, nodeCount, grounded);
  const diagonal = complexVector(size);
  for (let b = 0; b < branches.count; b++)
    for (const node of [branches.from[b]!, branches.to[b]!])
      if (node >= 0 && unknown[node]! >= 0) {
        diagonal.re[unknown[node]!]! += admittance.re[b]!;
        diagonal.im[unknown[node]!]! += admittance.im[b]!;
      }
  const value = {
    re: Float64Array.from(branch, (b) => -admittance.re[b]!),
    im: Float64Array.from(branch, (b) => -admittance.im[b]!),
  };
  const factor = factorComplex({ size, diagonal, row, column, value });
  const place = unknown.map((own) => (own < 0 ? size : factor.place[own]!));
  const solveInPlace = (b: ComplexVector): void => solveComplex(factor, b);
  return {
    size,
    place,
    solveInPlace,
    solve(injection) {
      const b = complexVector(size + 1);
      place.forEach((at, node) => {
        b.re[at] = injection.re[node]!;
        b.im[at] = injection.im[node]!;
      });
      solveInPlace(b);
      b.re[size] = 0;
      b.im[size] = 0;
      return {
        re: Float64Array.from(place, (at) => b.re[at]!),
        im: Float64Array.from(place, (at) => b.im[at]!),
      };
    },
  };
}
