// Cholesky factor of a symmetric positive-definite matrix kept as its packed lower triangle.

/** Packed lower triangle: entry (i, j ≤ i) at i(i + 1)/2 + j; shape [n(n + 1)/2]. */
export type PackedLower = Float64Array;

export class NotPositiveDefinite extends Error {
  /** row whose pivot failed */
  readonly row: number;
  constructor(row: number) {
    super(`matrix is not positive definite: pivot of row ${row} is not positive`);
    this.name = 'NotPositiveDefinite';
    this.row = row;
  }
}

/**
 * Overwrites a packed matrix with its Cholesky factor L, A = L Lᵀ, row by row (Cholesky–Banachiewicz).
 * @throws NotPositiveDefinite with the row at which the pivot fails
 */
export function factorPacked(a: PackedLower, n: number): void {
  for (let i = 0; i < n; i++) {
    const ri = (i * (i + 1)) / 2;
    for (let j = 0; j <= i; j++) {
      const rj = (j * (j + 1)) / 2;
      let s0 = 0;
      let s1 = 0;
      let s2 = 0;
      let s3 = 0;
      let k = 0;
      for (; k + 3 < j; k += 4) {
        s0 += a[ri + k]! * a[rj + k]!;
        s1 += a[ri + k + 1]! * a[rj + k + 1]!;
        s2 += a[ri + k + 2]! * a[rj + k + 2]!;
        s3 += a[ri + k + 3]! * a[rj + k + 3]!;
      }
      for (; k < j; k++) s0 += a[ri + k]! * a[rj + k]!;
      const rest = a[ri + j]! - (s0 + s1 + (s2 + s3));
      if (j < i) a[ri + j] = rest / a[rj + j]!;
      else {
        if (!(rest > 0)) throw new NotPositiveDefinite(i);
        a[ri + i] = Math.sqrt(rest);
      }
    }
  }
}

/** Solves L Lᵀ x = b in place for a factor made by `factorPacked`. */
export function solvePacked(factor: PackedLower, n: number, b: Float64Array): void {
  for (let i = 0; i < n; i++) {
    const r = (i * (i + 1)) / 2;
    let sum = b[i]!;
    for (let k = 0; k < i; k++) sum -= factor[r + k]! * b[k]!;
    b[i] = sum / factor[r + i]!;
  }
  for (let i = n - 1; i >= 0; i--) {
    const r = (i * (i + 1)) / 2;
    const value = b[i]! / factor[r + i]!;
    b[i] = value;
    for (let k = 0; k < i; k++) b[k]! -= factor[r + k]! * value;
  }
}

/** y = A x for a packed symmetric matrix. */
export function multiplyPacked(a: PackedLower, n: number, x: Float64Array, y: Float64Array): void {
  y.fill(0);
  for (let i = 0; i < n; i++) {
    const r = (i * (i + 1)) / 2;
    const xi = x[i]!;
    let sum = 0;
    for (let k = 0; k < i; k++) {
      const value = a[r + k]!;
      sum += value * x[k]!;
      y[k]! += value * xi;
    }
    y[i]! += sum + a[r + i]! * xi;
  }
}
