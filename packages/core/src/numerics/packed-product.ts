// The product of a packed symmetric matrix with a vector: the plain twin of the compiled one in packed-store.ts.
import type { PackedLower } from './packed-cholesky.ts';

/** Rows read together. */
const TOGETHER = 4;

/**
 * y = A x for a packed symmetric matrix; four rows at a time, so that y is read and written once for four entries. Sums
 * of even and of odd columns are kept apart, as the kernel's two lanes do: both give the same bits.
 */
export function multiplyPacked(a: PackedLower, n: number, x: Float64Array, y: Float64Array): void {
  y.fill(0);
  const fours = n - (n % TOGETHER);
  for (let i = 0; i < fours; i += TOGETHER) multiplyStrip(a, i, x, y);
  for (let i = fours; i < n; i++) {
    const r = rowStart(i);
    const xi = x[i]!;
    let sum = 0;
    for (let k = 0; k < i; k++) {
      sum += a[r + k]! * x[k]!;
      y[k]! += a[r + k]! * xi;
    }
    y[i]! += sum + a[r + i]! * xi;
  }
}

/** Rows i … i + 3, i a multiple of four: their own sums, and what they give to the columns before them. */
function multiplyStrip(a: PackedLower, i: number, x: Float64Array, y: Float64Array): void {
  const r0 = rowStart(i);
  const r1 = rowStart(i + 1);
  const r2 = rowStart(i + 2);
  const r3 = rowStart(i + 3);
  const x0 = x[i]!;
  const x1 = x[i + 1]!;
  const x2 = x[i + 2]!;
  const x3 = x[i + 3]!;
  let s0 = 0, s1 = 0, s2 = 0, s3 = 0; // biome-ignore format: even columns
  let t0 = 0, t1 = 0, t2 = 0, t3 = 0; // biome-ignore format: odd columns
  for (let k = 0; k < i; k += 2) {
    const v0 = a[r0 + k]!;
    const v1 = a[r1 + k]!;
    const v2 = a[r2 + k]!;
    const v3 = a[r3 + k]!;
    const xk = x[k]!;
    s0 += v0 * xk;
    s1 += v1 * xk;
    s2 += v2 * xk;
    s3 += v3 * xk;
    y[k]! += v0 * x0 + v1 * x1 + (v2 * x2 + v3 * x3);
    const w0 = a[r0 + k + 1]!;
    const w1 = a[r1 + k + 1]!;
    const w2 = a[r2 + k + 1]!;
    const w3 = a[r3 + k + 1]!;
    const xo = x[k + 1]!;
    t0 += w0 * xo;
    t1 += w1 * xo;
    t2 += w2 * xo;
    t3 += w3 * xo;
    y[k + 1]! += w0 * x0 + w1 * x1 + (w2 * x2 + w3 * x3);
  }
  const a10 = a[r1 + i]!;
  const a20 = a[r2 + i]!;
  const a21 = a[r2 + i + 1]!;
  const a30 = a[r3 + i]!;
  const a31 = a[r3 + i + 1]!;
  const a32 = a[r3 + i + 2]!;
  y[i]! += s0 + t0 + a[r0 + i]! * x0 + a10 * x1 + a20 * x2 + a30 * x3;
  y[i + 1]! += s1 + t1 + a10 * x0 + a[r1 + i + 1]! * x1 + a21 * x2 + a31 * x3;
  y[i + 2]! += s2 + t2 + a20 * x0 + a21 * x1 + a[r2 + i + 2]! * x2 + a32 * x3;
  y[i + 3]! += s3 + t3 + a30 * x0 + a31 * x1 + a32 * x2 + a[r3 + i + 3]! * x3;
}

function rowStart(i: number): number {
  return (i * (i + 1)) / 2;
}
