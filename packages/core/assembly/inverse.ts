// A sparse factor G of the inverse of a packed matrix, Gᵀ G ≈ A⁻¹: the compiled twin of src/numerics/sparse-inverse.ts.

/**
 * Fills the rows of G. Row i keeps the `kept` columns before it (all where there are fewer) of the largest a_ij²/a_jj, and
 * itself last; rows start every kept + 1 places.
 * @param columns receives byte offsets of the columns in a vector, i32; shape [n × (kept + 1)]
 * @param values the same shape, f64
 * @param scratch doubles: n for 1/a_jj, then kept for strengths and (kept + 1)² for a block
 * @returns −1, or the row whose block is not positive definite
 */
export function invert(a: usize, n: i32, kept: i32, columns: usize, values: usize, scratch: usize): i32 {
  const width = <usize>(kept + 1);
  const strengths = scratch + (<usize>n << 3);
  const block = strengths + (<usize>kept << 3);
  for (let i: i32 = 0; i < n; i++) {
    const row = rowAt(a, i);
    store<f64>(scratch + (<usize>i << 3), 1 / load<f64>(row + (<usize>i << 3)));
    const column = columns + ((<usize>i * width) << 2);
    const count = choose(row, i, kept, scratch, strengths, column);
    sort(column, count);
    store<i32>(column + (<usize>count << 2), i << 3);
    const failed = lastRow(a, column, count + 1, block, values + ((<usize>i * width) << 3));
    if (failed >= 0) return failed;
  }
  return -1;
}

@inline
function rowAt(a: usize, i: i32): usize {
  return a + ((<usize>i * <usize>(i + 1)) << 2);
}

/** Strongest columns before i, from the nearest back; how many. */
function choose(row: usize, i: i32, kept: i32, reciprocal: usize, strengths: usize, column: usize): i32 {
  let found: i32 = 0;
  let least: f64 = -1;
  for (let j = i - 1; j >= 0; j--) {
    const v = load<f64>(row + (<usize>j << 3));
    const s = v * v * load<f64>(reciprocal + (<usize>j << 3));
    if (found == kept && s <= least) continue;
    let k = found;
    if (found < kept) found++;
    else k = kept - 1;
    for (; k > 0 && load<f64>(strengths + (<usize>(k - 1) << 3)) < s; k--) {
      store<f64>(strengths + (<usize>k << 3), load<f64>(strengths + (<usize>(k - 1) << 3)));
      store<i32>(column + (<usize>k << 2), load<i32>(column + (<usize>(k - 1) << 2)));
    }
    store<f64>(strengths + (<usize>k << 3), s);
    store<i32>(column + (<usize>k << 2), j << 3);
    least = load<f64>(strengths + (<usize>(found - 1) << 3));
  }
  return found;
}

function sort(column: usize, count: i32): void {
  for (let k: i32 = 1; k < count; k++) {
    const own = load<i32>(column + (<usize>k << 2));
    let at = k;
    for (; at > 0 && load<i32>(column + (<usize>(at - 1) << 2)) > own; at--)
      store<i32>(column + (<usize>at << 2), load<i32>(column + (<usize>(at - 1) << 2)));
    store<i32>(column + (<usize>at << 2), own);
  }
}

/** Last row of the inverse Cholesky factor of a block: L in `block`, then g with Lᵀ g = e. */
function lastRow(a: usize, column: usize, size: i32, block: usize, g: usize): i32 {
  const across = <usize>size << 3;
  for (let r: i32 = 0; r < size; r++) {
    const i = load<i32>(column + (<usize>r << 2)) >> 3;
    const row = rowAt(a, i);
    const mine = block + <usize>r * across;
    for (let c: i32 = 0; c <= r; c++) {
      const other = block + <usize>c * across;
      let rest = load<f64>(row + <usize>load<i32>(column + (<usize>c << 2)));
      for (let k: usize = 0; k < <usize>c << 3; k += 8) rest -= load<f64>(mine + k) * load<f64>(other + k);
      const at = <usize>c << 3;
      if (c < r) store<f64>(mine + at, rest / load<f64>(other + at));
      else {
        if (!(rest > 0)) return i;
        store<f64>(mine + at, sqrt(rest));
      }
    }
  }
  memory.fill(g, 0, across);
  store<f64>(g + across - 8, 1);
  for (let r = size - 1; r >= 0; r--) {
    const mine = block + <usize>r * across;
    const at = <usize>r << 3;
    const value = load<f64>(g + at) / load<f64>(mine + at);
    store<f64>(g + at, value);
    for (let c: usize = 0; c < at; c += 8) store<f64>(g + c, load<f64>(g + c) - load<f64>(mine + c) * value);
  }
  return -1;
}

/** into = Gᵀ G r, each shape [n]. */
export function precondition(n: i32, kept: i32, columns: usize, values: usize, r: usize, into: usize): void {
  const width = <usize>(kept + 1);
  memory.fill(into, 0, <usize>n << 3);
  for (let i: i32 = 0; i < n; i++) {
    const count = <usize>(min<i32>(i, kept) + 1);
    let column = columns + ((<usize>i * width) << 2);
    let value = values + ((<usize>i * width) << 3);
    const end = column + (count << 2);
    let sum: f64 = 0;
    for (let c = column; c < end; c += 4) {
      sum += load<f64>(value) * load<f64>(r + <usize>load<i32>(c));
      value += 8;
    }
    value -= count << 3;
    for (; column < end; column += 4) {
      const at = into + <usize>load<i32>(column);
      store<f64>(at, load<f64>(at) + load<f64>(value) * sum);
      value += 8;
    }
  }
}
