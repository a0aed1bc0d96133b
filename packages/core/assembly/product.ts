// Product of a packed symmetric matrix with several vectors, in one pass over its lower triangle; and what preconditions it.
export { invert, precondition } from './inverse';

/**
 * y = A x for `count` vectors. Row i of the triangle follows row i − 1; vectors start `stride` bytes apart, shape [n] each.
 * Four rows are read together and serve every vector before the next four are fetched.
 */
export function multiply(a: usize, n: i32, xs: usize, ys: usize, stride: usize, count: i32): void {
  memory.fill(ys, 0, stride * <usize>count);
  const fours = n & ~3;
  for (let i: i32 = 0; i < fours; i += 4)
    for (let c: i32 = 0; c < count; c++) strip(a, <usize>i, xs + stride * <usize>c, ys + stride * <usize>c);
  for (let i = fours; i < n; i++)
    for (let c: i32 = 0; c < count; c++) single(a, <usize>i, xs + stride * <usize>c, ys + stride * <usize>c);
}

/** Rows i … i + 3, i a multiple of four: their own sums, and what they give to the columns before them. */
function strip(a: usize, i: usize, x: usize, y: usize): void {
  const bytes = i << 3;
  const first = a + ((i * (i + 1)) << 2);
  const second = first + bytes + 8;
  const third = second + bytes + 16;
  const fourth = third + bytes + 24;
  const own = x + bytes;
  const x0 = v128.load64_splat(own);
  const x1 = v128.load64_splat(own, 8);
  const x2 = v128.load64_splat(own, 16);
  const x3 = v128.load64_splat(own, 24);
  let s0 = f64x2.splat(0);
  let s1 = f64x2.splat(0);
  let s2 = f64x2.splat(0);
  let s3 = f64x2.splat(0);
  for (let k: usize = 0; k < bytes; k += 16) {
    const v0 = v128.load(first + k);
    const v1 = v128.load(second + k);
    const v2 = v128.load(third + k);
    const v3 = v128.load(fourth + k);
    const xk = v128.load(x + k);
    s0 = f64x2.add(s0, f64x2.mul(v0, xk));
    s1 = f64x2.add(s1, f64x2.mul(v1, xk));
    s2 = f64x2.add(s2, f64x2.mul(v2, xk));
    s3 = f64x2.add(s3, f64x2.mul(v3, xk));
    const low = f64x2.add(f64x2.mul(v0, x0), f64x2.mul(v1, x1));
    const high = f64x2.add(f64x2.mul(v2, x2), f64x2.mul(v3, x3));
    v128.store(y + k, f64x2.add(v128.load(y + k), f64x2.add(low, high)));
  }
  const f0 = load<f64>(own);
  const f1 = load<f64>(own, 8);
  const f2 = load<f64>(own, 16);
  const f3 = load<f64>(own, 24);
  const d0 = load<f64>(first + bytes);
  const d10 = load<f64>(second + bytes);
  const d1 = load<f64>(second + bytes, 8);
  const d20 = load<f64>(third + bytes);
  const d21 = load<f64>(third + bytes, 8);
  const d2 = load<f64>(third + bytes, 16);
  const d30 = load<f64>(fourth + bytes);
  const d31 = load<f64>(fourth + bytes, 8);
  const d32 = load<f64>(fourth + bytes, 16);
  const d3 = load<f64>(fourth + bytes, 24);
  const out = y + bytes;
  store<f64>(out, load<f64>(out) + (both(s0) + d0 * f0 + d10 * f1 + d20 * f2 + d30 * f3));
  store<f64>(out, load<f64>(out, 8) + (both(s1) + d10 * f0 + d1 * f1 + d21 * f2 + d31 * f3), 8);
  store<f64>(out, load<f64>(out, 16) + (both(s2) + d20 * f0 + d21 * f1 + d2 * f2 + d32 * f3), 16);
  store<f64>(out, load<f64>(out, 24) + (both(s3) + d30 * f0 + d31 * f1 + d32 * f2 + d3 * f3), 24);
}

@inline
function both(sum: v128): f64 {
  return f64x2.extract_lane(sum, 0) + f64x2.extract_lane(sum, 1);
}

/** Row i alone, one of the last three. */
function single(a: usize, i: usize, x: usize, y: usize): void {
  const row = a + ((i * (i + 1)) << 2);
  const bytes = i << 3;
  const xi = load<f64>(x + bytes);
  let sum: f64 = 0;
  for (let k: usize = 0; k < bytes; k += 8) {
    const v = load<f64>(row + k);
    sum += v * load<f64>(x + k);
    store<f64>(y + k, load<f64>(y + k) + v * xi);
  }
  store<f64>(y + bytes, load<f64>(y + bytes) + (sum + load<f64>(row + bytes) * xi));
}
