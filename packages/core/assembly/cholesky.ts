// Cholesky factor in block rows of four: panels [k][4], so that an update tile reads contiguous doubles.

/** Panels of a block: its rows, 256 columns long, stay in the second-level memory while all rows below are reduced by them. */
const BLOCK: i32 = 64;

/**
 * Factors panels in place. Panel p holds rows 4p … 4p + 3 of the lower triangle, column after column of four, 4(p + 1)
 * columns, and follows panel p − 1.
 * @returns −1, or the row whose pivot is not positive
 */
export function factor(a: usize, panels: i32): i32 {
  for (let first: i32 = 0; first < panels; first += BLOCK) {
    const last = min<i32>(first + BLOCK, panels);
    for (let from: i32 = 0; from < first; from += BLOCK)
      for (let p = first; p < panels; p++) {
        const mine = a + panelAt(p);
        const skip = <usize>from << 7;
        for (let q = first, end = min<i32>(last, p + 1); q < end; q++)
          reduce(mine + skip, a + panelAt(q) + skip, mine + (<usize>q << 7), BLOCK << 2);
      }
    const failed = factorBlock(a, first, last, panels);
    if (failed >= 0) return failed;
  }
  return -1;
}

/** Columns first … last − 1 of all panels below them, everything before these columns being subtracted. */
function factorBlock(a: usize, first: i32, last: i32, panels: i32): i32 {
  const skip = <usize>first << 7;
  for (let p = first; p < panels; p++) {
    const mine = a + panelAt(p);
    for (let q = first, end = min<i32>(last, p); q < end; q++) {
      const other = a + panelAt(q);
      const tile = mine + (<usize>q << 7);
      reduce(mine + skip, other + skip, tile, (q - first) << 2);
      // what remains of the tile is divided by the triangle on the other panel's diagonal
      solve(tile, other + (<usize>q << 7));
    }
    if (p >= last) continue;
    const tile = mine + (<usize>p << 7);
    reduce(mine + skip, mine + skip, tile, (p - first) << 2);
    const failed = triangle(tile);
    if (failed >= 0) return (p << 2) + failed;
  }
  return -1;
}

@inline
function panelAt(p: i32): usize {
  return (<usize>p * <usize>(p + 1)) << 6;
}

/** Subtracts from a tile [column][row] the products of two panels over the first `count` columns. */
function reduce(mine: usize, other: usize, tile: usize, count: i32): void {
  let c00 = v128.load(tile);
  let c01 = v128.load(tile, 16);
  let c10 = v128.load(tile, 32);
  let c11 = v128.load(tile, 48);
  let c20 = v128.load(tile, 64);
  let c21 = v128.load(tile, 80);
  let c30 = v128.load(tile, 96);
  let c31 = v128.load(tile, 112);
  const end = mine + (<usize>count << 5);
  for (let m = mine; m < end; m += 32) {
    const u0 = v128.load(m);
    const u1 = v128.load(m, 16);
    let v = v128.load64_splat(other);
    c00 = f64x2.sub(c00, f64x2.mul(u0, v));
    c01 = f64x2.sub(c01, f64x2.mul(u1, v));
    v = v128.load64_splat(other, 8);
    c10 = f64x2.sub(c10, f64x2.mul(u0, v));
    c11 = f64x2.sub(c11, f64x2.mul(u1, v));
    v = v128.load64_splat(other, 16);
    c20 = f64x2.sub(c20, f64x2.mul(u0, v));
    c21 = f64x2.sub(c21, f64x2.mul(u1, v));
    v = v128.load64_splat(other, 24);
    c30 = f64x2.sub(c30, f64x2.mul(u0, v));
    c31 = f64x2.sub(c31, f64x2.mul(u1, v));
    other += 32;
  }
  v128.store(tile, c00);
  v128.store(tile, c01, 16);
  v128.store(tile, c10, 32);
  v128.store(tile, c11, 48);
  v128.store(tile, c20, 64);
  v128.store(tile, c21, 80);
  v128.store(tile, c30, 96);
  v128.store(tile, c31, 112);
}

/** X Lᵀ = tile, L the triangle at `pivot`, both [column][row]. */
function solve(tile: usize, pivot: usize): void {
  for (let c: usize = 0; c < 4; c++) {
    const at = tile + (c << 5);
    let low = v128.load(at);
    let high = v128.load(at, 16);
    for (let m: usize = 0; m < c; m++) {
      const l = v128.load64_splat(pivot + (m << 5) + (c << 3));
      low = f64x2.sub(low, f64x2.mul(v128.load(tile + (m << 5)), l));
      high = f64x2.sub(high, f64x2.mul(v128.load(tile + (m << 5), 16), l));
    }
    const d = v128.load64_splat(pivot + (c << 5) + (c << 3));
    v128.store(at, f64x2.div(low, d));
    v128.store(at, f64x2.div(high, d), 16);
  }
}

/** Factors the four by four triangle at `tile`; −1, or the row that fails. */
function triangle(tile: usize): i32 {
  for (let c: i32 = 0; c < 4; c++) {
    for (let r = c; r < 4; r++) {
      const at = tile + (<usize>c << 5) + (<usize>r << 3);
      let rest = load<f64>(at);
      for (let m: i32 = 0; m < c; m++)
        rest -= load<f64>(tile + (<usize>m << 5) + (<usize>r << 3)) * load<f64>(tile + (<usize>m << 5) + (<usize>c << 3));
      if (r == c) {
        if (!(rest > 0)) return c;
        store<f64>(at, sqrt(rest));
      } else store<f64>(at, rest / load<f64>(tile + (<usize>c << 5) + (<usize>c << 3)));
    }
  }
  return -1;
}

/** Copies packed rows into panels, or back; rows past n are those of the identity. */
export function toPanels(packed: usize, a: usize, n: i32, panels: i32): void {
  for (let p: i32 = 0; p < panels; p++) {
    const into = a + panelAt(p);
    const whole = (p << 2) + 4 <= n;
    const first = packed + ((<usize>(p << 2) * <usize>((p << 2) + 1)) << 2);
    const second = first + (<usize>p << 5) + 8;
    const third = second + (<usize>p << 5) + 16;
    const fourth = third + (<usize>p << 5) + 24;
    if (whole)
      for (let j: usize = 0; j < <usize>p << 5; j += 8) {
        const at = into + (j << 2);
        v128.store(at, v128.load64_lane(second + j, v128.load64_zero(first + j), 1));
        v128.store(at, v128.load64_lane(fourth + j, v128.load64_zero(third + j), 1), 16);
      }
    for (let i = p << 2; i < (p << 2) + 4; i++)
      for (let j = whole ? p << 2 : 0; j <= (p << 2) + 3; j++) {
        let value: f64 = i == j ? 1 : 0;
        if (i < n && j <= i) value = load<f64>(packed + ((<usize>i * <usize>(i + 1)) << 2) + (<usize>j << 3));
        store<f64>(into + (<usize>j << 5) + (<usize>(i & 3) << 3), value);
      }
  }
}

export function fromPanels(packed: usize, a: usize, n: i32): void {
  for (let i: i32 = 0; i < n; i++) {
    const from = a + panelAt(i >> 2) + (<usize>(i & 3) << 3);
    const row = packed + ((<usize>i * <usize>(i + 1)) << 2);
    for (let j: i32 = 0; j <= i; j++) store<f64>(row + (<usize>j << 3), load<f64>(from + (<usize>j << 5)));
  }
}

/**
 * Solves L Lᵀ x = b in place for `count` right-hand sides, `stride` bytes apart, 4 × panels doubles each; a panel read
 * serves them all.
 */
export function solveAll(a: usize, panels: i32, b: usize, stride: usize, count: i32): void {
  for (let p: i32 = 0; p < panels; p++)
    for (let c: i32 = 0; c < count; c++) forward(a + panelAt(p), <usize>p << 5, b + stride * <usize>c);
  for (let p = panels - 1; p >= 0; p--)
    for (let c: i32 = 0; c < count; c++) backward(a + panelAt(p), <usize>p << 5, b + stride * <usize>c);
}

/** Four unknowns of L y = b, those before them being final; `own` is their place in bytes. */
function forward(panel: usize, own: usize, b: usize): void {
  let low = v128.load(b + own);
  let high = v128.load(b + own, 16);
  for (let k: usize = 0; k < own; k += 8) {
    const y = v128.load64_splat(b + k);
    low = f64x2.sub(low, f64x2.mul(v128.load(panel + (k << 2)), y));
    high = f64x2.sub(high, f64x2.mul(v128.load(panel + (k << 2), 16), y));
  }
  v128.store(b + own, low);
  v128.store(b + own, high, 16);
  const tile = panel + (own << 2);
  for (let c: usize = 0; c < 4; c++) {
    const at = b + own + (c << 3);
    let rest = load<f64>(at);
    for (let m: usize = 0; m < c; m++) rest -= load<f64>(tile + (m << 5) + (c << 3)) * load<f64>(b + own + (m << 3));
    store<f64>(at, rest / load<f64>(tile + (c << 5) + (c << 3)));
  }
}

/** Four unknowns of Lᵀ x = y, those after them being final and already taken from y, as these are then from the rest. */
function backward(panel: usize, own: usize, b: usize): void {
  const tile = panel + (own << 2);
  for (let c: isize = 3; c >= 0; c--) {
    const at = b + own + (<usize>c << 3);
    let rest = load<f64>(at);
    for (let m = c + 1; m < 4; m++)
      rest -= load<f64>(tile + (<usize>c << 5) + (<usize>m << 3)) * load<f64>(b + own + (<usize>m << 3));
    store<f64>(at, rest / load<f64>(tile + (<usize>c << 5) + (<usize>c << 3)));
  }
  const low = v128.load(b + own);
  const high = v128.load(b + own, 16);
  for (let k: usize = 0; k < own; k += 16) {
    const at = panel + (k << 2);
    const even = f64x2.add(f64x2.mul(v128.load(at), low), f64x2.mul(v128.load(at, 16), high));
    const odd = f64x2.add(f64x2.mul(v128.load(at, 32), low), f64x2.mul(v128.load(at, 48), high));
    const given = f64x2.add(v128.shuffle<f64>(even, odd, 0, 2), v128.shuffle<f64>(even, odd, 1, 3));
    v128.store(b + k, f64x2.sub(v128.load(b + k), given));
  }
}
