// How well a fit pins its parameters down: standard deviations and correlations from the linear model at the optimum.
import { Matrix, SVD } from 'ml-matrix';

export interface ParameterSpread {
  /** of the parameters, as logarithms; very large where the readings do not tell, 0 where held on a bound; shape [n] */
  readonly standardDeviation: Float64Array;
  /** 1 on the diagonal, 0 with a parameter that is held; shape [n][n] */
  readonly correlation: readonly Float64Array[];
}

/** Length over which derivatives are taken, in logarithm; central, so good to its square. */
const DIFFERENCE = 1e-4;
/** Singular value over the largest, below which a combination of parameters has no effect on any reading. */
const NO_EFFECT = 1e-9;

/**
 * Covariance s²(JᵀWJ)⁻¹ of nonlinear least squares, by singular values of √W·J.
 * @param residuals of parameters, written into its second argument of shape [m]
 * @param weights shape [m]
 * @param scatter s, of one reading of weight 1
 * @param held parameters on a bound, shape [n]
 */
export function parameterSpread(
  residuals: (x: Float64Array, into: Float64Array) => void,
  x: Float64Array,
  weights: Float64Array,
  scatter: number,
  held: readonly boolean[],
): ParameterSpread {
  const n = x.length;
  const free = held.flatMap((isHeld, j) => (isHeld ? [] : [j]));
  const covariance = Matrix.zeros(n, n);
  if (free.length > 0) {
    const jacobian = weightedJacobian(residuals, x, weights, free);
    const svd = new SVD(jacobian, { autoTranspose: true });
    const singular = svd.diagonal;
    const v = svd.rightSingularVectors;
    free.forEach((j, a) => {
      free.forEach((k, b) => {
        let sum = 0;
        for (let q = 0; q < free.length; q++) {
          const size = Math.max(singular[q] ?? 0, NO_EFFECT * singular[0]!);
          sum += (v.get(a, q) * v.get(b, q)) / (size * size);
        }
        covariance.set(j, k, scatter * scatter * sum);
      });
    });
  }
  const standardDeviation = Float64Array.from({ length: n }, (_, j) => Math.sqrt(covariance.get(j, j)));
  const correlation = Array.from({ length: n }, (_, j) =>
    Float64Array.from({ length: n }, (__, k) => {
      if (j === k) return 1;
      const both = standardDeviation[j]! * standardDeviation[k]!;
      return both === 0 ? 0 : covariance.get(j, k) / both;
    }),
  );
  return { standardDeviation, correlation };
}

function weightedJacobian(
  residuals: (x: Float64Array, into: Float64Array) => void,
  x: Float64Array,
  weights: Float64Array,
  free: readonly number[],
): Matrix {
  const m = weights.length;
  // no fewer rows than columns, so that every direction has a singular value
  const jacobian = Matrix.zeros(Math.max(m, free.length), free.length);
  const moved = Float64Array.from(x);
  const above = new Float64Array(m);
  const below = new Float64Array(m);
  free.forEach((j, column) => {
    moved[j] = x[j]! + DIFFERENCE;
    residuals(moved, above);
    moved[j] = x[j]! - DIFFERENCE;
    residuals(moved, below);
    moved[j] = x[j]!;
    for (let i = 0; i < m; i++)
      jacobian.set(i, column, (Math.sqrt(weights[i]!) * (above[i]! - below[i]!)) / (2 * DIFFERENCE));
  });
  return jacobian;
}
