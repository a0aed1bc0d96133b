// Dense blocks of single precision times parts of a vector, summed in double; the choice of telling rows; small inverses.

// A block of the list: first row, rows, first column, columns (even), address of its values row after row, 1 where the
// mirrored block counts too.
const ROW: usize = 0;
const ROWS: usize = 4;
const COLUMN: usize = 8;
const COLUMNS: usize = 12;
const VALUES: usize = 16;
const MIRRORED: usize = 20;
const BLOCK: usize = 24;

/**
 * y += Σ B x over the blocks, and Σ Bᵀ x of those that are mirrored, summed in `part` first. All that blocks touch lies in
 * places `low … high − 1`; the place after is there and may be written to.
 */
export function multiply(list: usize, count: i32, x: usize, y: usize, part: usize, low: i32, high: i32): void {
  memory.fill(part + (<usize>low << 3), 0, <usize>(high - low + 1) << 3);
  const end = list + <usize>count * BLOCK;
  for (let b = list; b < end; b += BLOCK) {
    if (load<u32>(b, MIRRORED) == 0) forward(b, x, part);
    else mirrored(b, x, part);
  }
  for (let at = <usize>low << 3; at < <usize>high << 3; at += 8) add(y + at, load<f64>(part + at));
}

/** v_columns += Bᵀ v_rows, block after block. */
export function fold(list: usize, count: i32, v: usize): void {
  const end = list + <usize>count * BLOCK;
  for (let b = list; b < end; b += BLOCK) transposed(b, v, v);
}

/** v_rows += B v_columns, from the last block to the first. */
export function unfold(list: usize, count: i32, v: usize): void {
  for (let b = list + <usize>count * BLOCK; b > list; ) {
    b -= BLOCK;
    forward(b, v, v);
  }
}

@inline
function pair(at: usize): v128 {
  return f64x2.promote_low_f32x4(v128.load64_zero(at));
}

@inline
function across(v: v128): f64 {
  return f64x2.extract_lane(v, 0) + f64x2.extract_lane(v, 1);
}

@inline
function add(at: usize, value: f64): void {
  store<f64>(at, load<f64>(at) + value);
}

function mirrored(b: usize, x: usize, y: usize): void {
  const rows = load<u32>(b, ROWS);
  const width = <usize>load<u32>(b, COLUMNS) << 2;
  const xc = x + (<usize>load<u32>(b, COLUMN) << 3);
  const yc = y + (<usize>load<u32>(b, COLUMN) << 3);
  let xr = x + (<usize>load<u32>(b, ROW) << 3);
  let yr = y + (<usize>load<u32>(b, ROW) << 3);
  let v = <usize>load<u32>(b, VALUES);
  let r: u32 = 0;
  for (; r + 4 <= rows; r += 4) {
    const x0 = v128.load64_splat(xr);
    const x1 = v128.load64_splat(xr, 8);
    const x2 = v128.load64_splat(xr, 16);
    const x3 = v128.load64_splat(xr, 24);
    let s0 = f64x2.splat(0);
    let s1 = f64x2.splat(0);
    let s2 = f64x2.splat(0);
    let s3 = f64x2.splat(0);
    const v1 = v + width;
    const v2 = v1 + width;
    const v3 = v2 + width;
    for (let c: usize = 0; c < width; c += 8) {
      const a0 = pair(v + c);
      const a1 = pair(v1 + c);
      const a2 = pair(v2 + c);
      const a3 = pair(v3 + c);
      const at = c << 1;
      const own = v128.load(xc + at);
      s0 = f64x2.add(s0, f64x2.mul(a0, own));
      s1 = f64x2.add(s1, f64x2.mul(a1, own));
      s2 = f64x2.add(s2, f64x2.mul(a2, own));
      s3 = f64x2.add(s3, f64x2.mul(a3, own));
      const low = f64x2.add(f64x2.mul(a0, x0), f64x2.mul(a1, x1));
      const high = f64x2.add(f64x2.mul(a2, x2), f64x2.mul(a3, x3));
      v128.store(yc + at, f64x2.add(v128.load(yc + at), f64x2.add(low, high)));
    }
    add(yr, across(s0));
    add(yr + 8, across(s1));
    add(yr + 16, across(s2));
    add(yr + 24, across(s3));
    v = v3 + width;
    xr += 32;
    yr += 32;
  }
  for (; r < rows; r++) {
    const x0 = v128.load64_splat(xr);
    let s0 = f64x2.splat(0);
    for (let c: usize = 0; c < width; c += 8) {
      const a0 = pair(v + c);
      const at = c << 1;
      s0 = f64x2.add(s0, f64x2.mul(a0, v128.load(xc + at)));
      v128.store(yc + at, f64x2.add(v128.load(yc + at), f64x2.mul(a0, x0)));
    }
    add(yr, across(s0));
    v += width;
    xr += 8;
    yr += 8;
  }
}

function forward(b: usize, x: usize, y: usize): void {
  const rows = load<u32>(b, ROWS);
  const width = <usize>load<u32>(b, COLUMNS) << 2;
  const xc = x + (<usize>load<u32>(b, COLUMN) << 3);
  let yr = y + (<usize>load<u32>(b, ROW) << 3);
  let v = <usize>load<u32>(b, VALUES);
  let r: u32 = 0;
  for (; r + 4 <= rows; r += 4) {
    let s0 = f64x2.splat(0);
    let s1 = f64x2.splat(0);
    let s2 = f64x2.splat(0);
    let s3 = f64x2.splat(0);
    const v1 = v + width;
    const v2 = v1 + width;
    const v3 = v2 + width;
    for (let c: usize = 0; c < width; c += 8) {
      const own = v128.load(xc + (c << 1));
      s0 = f64x2.add(s0, f64x2.mul(pair(v + c), own));
      s1 = f64x2.add(s1, f64x2.mul(pair(v1 + c), own));
      s2 = f64x2.add(s2, f64x2.mul(pair(v2 + c), own));
      s3 = f64x2.add(s3, f64x2.mul(pair(v3 + c), own));
    }
    add(yr, across(s0));
    add(yr + 8, across(s1));
    add(yr + 16, across(s2));
    add(yr + 24, across(s3));
    v = v3 + width;
    yr += 32;
  }
  for (; r < rows; r++) {
    let s0 = f64x2.splat(0);
    for (let c: usize = 0; c < width; c += 8) s0 = f64x2.add(s0, f64x2.mul(pair(v + c), v128.load(xc + (c << 1))));
    add(yr, across(s0));
    v += width;
    yr += 8;
  }
}

function transposed(b: usize, x: usize, y: usize): void {
  const rows = load<u32>(b, ROWS);
  const width = <usize>load<u32>(b, COLUMNS) << 2;
  const yc = y + (<usize>load<u32>(b, COLUMN) << 3);
  let xr = x + (<usize>load<u32>(b, ROW) << 3);
  let v = <usize>load<u32>(b, VALUES);
  for (let r: u32 = 0; r < rows; r++) {
    const x0 = v128.load64_splat(xr);
    for (let c: usize = 0; c < width; c += 8) {
      const at = yc + (c << 1);
      v128.store(at, f64x2.add(v128.load(at), f64x2.mul(pair(v + c), x0)));
    }
    v += width;
    xr += 8;
  }
}

/**
 * Gaussian elimination in single precision with full pivoting, until the largest entry left is at most `tolerance` of the
 * largest of all.
 * @param a rows of `columns` doubles, a multiple of four; overwritten
 * @param order row numbers, i32; the chosen ones come first
 * @param lower by place in `order`, `most` doubles a row: multipliers for the chosen, then weights with which those make the rest
 * @param largest room for a float a row
 * @returns how many rows were chosen
 */
export function skeleton(
  a: usize,
  count: i32,
  columns: i32,
  tolerance: f64,
  most: i32,
  order: usize,
  lower: usize,
  largest: usize,
): i32 {
  const width = <usize>columns << 2;
  const stride = <usize>most << 3;
  for (let r: i32 = 0; r < count; r++) {
    store<i32>(order + (<usize>r << 2), r);
    store<f32>(largest + (<usize>r << 2), narrow(a + 2 * <usize>r * width, a + <usize>r * width, width));
  }
  let first: f32 = 0;
  let rank: i32 = 0;
  for (; rank < most; rank++) {
    let at = rank;
    let size: f32 = -1;
    for (let k = rank; k < count; k++) {
      const own = load<f32>(largest + (<usize>load<i32>(order + (<usize>k << 2)) << 2));
      if (own > size) {
        size = own;
        at = k;
      }
    }
    if (rank == 0) first = size;
    if (!(<f64>size > tolerance * <f64>first)) break;
    const row = load<i32>(order + (<usize>at << 2));
    store<i32>(order + (<usize>at << 2), load<i32>(order + (<usize>rank << 2)));
    store<i32>(order + (<usize>rank << 2), row);
    const one = lower + <usize>at * stride;
    const other = lower + <usize>rank * stride;
    for (let k: usize = 0; k < <usize>rank << 3; k += 8) {
      const held = load<f64>(one + k);
      store<f64>(one + k, load<f64>(other + k));
      store<f64>(other + k, held);
    }
    const pivotRow = a + <usize>row * width;
    let column: usize = 0;
    while (abs(load<f32>(pivotRow + column)) != size) column += 4;
    const pivot = load<f32>(pivotRow + column);
    for (let k = rank + 1; k < count; k++) {
      const r = load<i32>(order + (<usize>k << 2));
      const own = a + <usize>r * width;
      const share = load<f32>(own + column) / pivot;
      store<f64>(lower + <usize>k * stride + (<usize>rank << 3), share);
      store<f32>(largest + (<usize>r << 2), reduced(own, pivotRow, width, share));
    }
  }
  for (let k = rank; k < count; k++) weigh(lower + <usize>k * stride, lower, stride, rank);
  return rank;
}

/** Largest magnitude of four lanes of highest and of lowest values. */
@inline
function largestOf(high: v128, low: v128): f32 {
  const most = f32x4.pmax(high, f32x4.neg(low));
  return max<f32>(
    max<f32>(f32x4.extract_lane(most, 0), f32x4.extract_lane(most, 1)),
    max<f32>(f32x4.extract_lane(most, 2), f32x4.extract_lane(most, 3)),
  );
}

/** Writes doubles as floats, to the same place or one before, and returns the largest magnitude. */
function narrow(from: usize, into: usize, width: usize): f32 {
  let high = f32x4.splat(0);
  let low = f32x4.splat(0);
  for (let c: usize = 0; c < width; c += 16) {
    const first = f32x4.demote_f64x2_zero(v128.load(from + 2 * c));
    const second = f32x4.demote_f64x2_zero(v128.load(from + 2 * c, 16));
    const value = v128.shuffle<f32>(first, second, 0, 1, 4, 5);
    v128.store(into + c, value);
    high = f32x4.pmax(high, value);
    low = f32x4.pmin(low, value);
  }
  return largestOf(high, low);
}

/** own −= share·pivot; the largest magnitude left. */
function reduced(own: usize, pivot: usize, width: usize, share: f32): f32 {
  const s = f32x4.splat(share);
  let high = f32x4.splat(0);
  let low = f32x4.splat(0);
  for (let c: usize = 0; c < width; c += 16) {
    const left = f32x4.sub(v128.load(own + c), f32x4.mul(s, v128.load(pivot + c)));
    v128.store(own + c, left);
    high = f32x4.pmax(high, left);
    low = f32x4.pmin(low, left);
  }
  return largestOf(high, low);
}

/** Solves w L = multipliers in place, L the unit lower triangle of the chosen rows' multipliers. */
function weigh(row: usize, lower: usize, stride: usize, rank: i32): void {
  for (let j = rank - 1; j > 0; j--) {
    const weight = f64x2.splat(load<f64>(row + (<usize>j << 3)));
    const other = lower + <usize>j * stride;
    const whole = <usize>(j & ~1) << 3;
    for (let i: usize = 0; i < whole; i += 16)
      v128.store(row + i, f64x2.sub(v128.load(row + i), f64x2.mul(weight, v128.load(other + i))));
    if (j & 1)
      store<f64>(row + whole, load<f64>(row + whole) - f64x2.extract_lane(weight, 0) * load<f64>(other + whole));
  }
}

/**
 * Inverts a symmetric positive-definite matrix in place by Gauss and Jordan's elimination on its diagonal.
 * @param a n rows of `width` doubles, an even number
 * @returns −1, or the row whose pivot is not positive
 */
export function invert(a: usize, n: i32, width: i32): i32 {
  const stride = <usize>width << 3;
  for (let k: i32 = 0; k < n; k++) {
    const row = a + <usize>k * stride;
    const diagonal = row + (<usize>k << 3);
    const pivot = load<f64>(diagonal);
    if (!(pivot > 0)) return k;
    store<f64>(diagonal, 1);
    const by = f64x2.splat(1 / pivot);
    for (let at = row; at < row + stride; at += 16) v128.store(at, f64x2.mul(v128.load(at), by));
    for (let i: i32 = 0; i < n; i++) {
      if (i == k) continue;
      const other = a + <usize>i * stride;
      const share = f64x2.splat(load<f64>(other + (<usize>k << 3)));
      store<f64>(other + (<usize>k << 3), 0);
      for (let c: usize = 0; c < stride; c += 16)
        v128.store(other + c, f64x2.sub(v128.load(other + c), f64x2.mul(share, v128.load(row + c))));
    }
  }
  return -1;
}
