// Expansions of a potential in plan: products of Chebyshev polynomials on square cells, and the matrices to a cell's quarters.

/**
 * Highest total degree kept. Sources in a cell, seen from beyond the next cell, put the nearest singularity three half
 * sides from the centre, so that each degree gains a factor 3 + √8: degree 6 leaves (3 + √8)⁻⁷ = 4e-6 of a cell's field.
 */
const DEGREE = 6;

/** Polynomials, and Chebyshev points, each way. */
export const ORDER: number = DEGREE + 1;

/** Degrees of each term T_a(ξ)·T_b(η), a + b ≤ DEGREE: by total degree, then by b, so that it stands at (a + b)(a + b + 1)/2 + b. */
export const DEGREES: readonly (readonly [a: number, b: number])[] = Array.from({ length: ORDER }, (_, d) =>
  Array.from({ length: d + 1 }, (_, b) => [d - b, b] as const),
).flat();

export const TERMS: number = DEGREES.length;

/** Chebyshev points on [−1, 1], descending. */
export const ROOTS: readonly number[] = Array.from({ length: ORDER }, (_, k) =>
  Math.cos((Math.PI * (k + 0.5)) / ORDER),
);

/** Coefficients of the interpolating polynomial from values at the points: row after row, shape [ORDER × ORDER]. */
export const FROM_VALUES: Float64Array = Float64Array.from({ length: ORDER * ORDER }, (_, at) => {
  const a = Math.floor(at / ORDER);
  return ((a === 0 ? 1 : 2) / ORDER) * Math.cos((Math.PI * a * ((at % ORDER) + 0.5)) / ORDER);
});

/** Writes T_0 … T_DEGREE at a place of [−1, 1]. */
export function polynomials(at: number, into: Float64Array): void {
  into[0] = 1;
  into[1] = at;
  for (let a = 2; a < ORDER; a++) into[a] = 2 * at * into[a - 1]! - into[a - 2]!;
}

/** Adds a multiple of every term to an expansion. */
export function addTerms(weight: number, tx: Float64Array, ty: Float64Array, into: Float64Array): void {
  let t = 0;
  for (let d = 0; d < ORDER; d++) for (let b = 0; b <= d; b++) into[t++]! += weight * tx[d - b]! * ty[b]!;
}

/** Value of an expansion that begins at an index. */
export function expansionValue(of: Float64Array, at: number, tx: Float64Array, ty: Float64Array): number {
  let t = at;
  let sum = 0;
  for (let d = 0; d < ORDER; d++) for (let b = 0; b <= d; b++) sum += of[t++]! * tx[d - b]! * ty[b]!;
  return sum;
}

/** T_a((ξ ± 1)/2) = Σ_c C[a][c]·T_c(ξ), for the lower and the upper half; shape [ORDER × ORDER]. */
const HALVES: readonly Float64Array[] = [-1, 1].map((side) => {
  const matrix = new Float64Array(ORDER * ORDER);
  const values = new Float64Array(ORDER);
  ROOTS.forEach((root, k) => {
    polynomials((root + side) / 2, values);
    for (let a = 0; a < ORDER; a++)
      for (let c = 0; c < ORDER; c++) matrix[a * ORDER + c]! += FROM_VALUES[c * ORDER + k]! * values[a]!;
  });
  return matrix;
});

/**
 * Matrices between a cell and its quarters, by quarter (east fastest, then north): `up` from a quarter's moments to the
 * cell's, `down` from the cell's field to the quarter's. Column after column, shape [TERMS × TERMS].
 */
export const quarterMatrices: readonly { readonly up: Float64Array; readonly down: Float64Array }[] = [
  0, 1, 2, 3,
].map((quarter) => {
  const [eastward, northward] = [HALVES[quarter & 1]!, HALVES[quarter >> 1]!];
  const up = new Float64Array(TERMS * TERMS);
  const down = new Float64Array(TERMS * TERMS);
  DEGREES.forEach(([a, b], cell) => {
    DEGREES.forEach(([c, d], part) => {
      const value = eastward[a * ORDER + c]! * northward[b * ORDER + d]!;
      up[part * TERMS + cell] = value;
      down[cell * TERMS + part] = value;
    });
  });
  return { up, down };
});
