// The inner loops of a map: expansions from cell to cell and onto points, and near metal at the points of a cell.
import { radialPair } from './radial';

/** Terms of an expansion, and polynomials each way, as src/field/plan-expansion.ts makes them. */
const TERMS: usize = 28;
const ORDER: usize = 7;
const COLUMN: usize = TERMS << 3;

/** Adds matrix × source to each target; columns that count by fours of rows, steps between cells in bytes. */
export function transfer(
  matrix: usize,
  limits: usize,
  from: usize,
  fromEast: usize,
  fromNorth: usize,
  to: usize,
  toEast: usize,
  toNorth: usize,
  columns: i32,
  rows: i32,
): void {
  for (let r: i32 = 0; r < rows; r++) {
    let source = from;
    let target = to;
    let c: i32 = 0;
    for (; c + 4 <= columns; c += 4) {
      four(matrix, limits, source, fromEast, target, toEast);
      source += fromEast << 2;
      target += toEast << 2;
    }
    for (; c < columns; c++) {
      single(matrix, limits, source, target);
      source += fromEast;
      target += toEast;
    }
    from += fromNorth;
    to += toNorth;
  }
}

function four(matrix: usize, limits: usize, s0: usize, fromEast: usize, t0: usize, toEast: usize): void {
  const t1 = t0 + toEast;
  const t2 = t1 + toEast;
  const t3 = t2 + toEast;
  const step1 = fromEast;
  const step2 = fromEast << 1;
  const step3 = step2 + fromEast;
  for (let r: usize = 0; r < COLUMN; r += 32) {
    let c00 = v128.load(t0 + r);
    let c01 = v128.load(t0 + r, 16);
    let c10 = v128.load(t1 + r);
    let c11 = v128.load(t1 + r, 16);
    let c20 = v128.load(t2 + r);
    let c21 = v128.load(t2 + r, 16);
    let c30 = v128.load(t3 + r);
    let c31 = v128.load(t3 + r, 16);
    let m = matrix + r;
    const end = s0 + (<usize>load<f64>(limits + (r >> 2)) << 3);
    for (let s = s0; s < end; s += 8) {
      const m0 = v128.load(m);
      const m1 = v128.load(m, 16);
      let v = v128.load64_splat(s);
      c00 = f64x2.add(c00, f64x2.mul(m0, v));
      c01 = f64x2.add(c01, f64x2.mul(m1, v));
      v = v128.load64_splat(s + step1);
      c10 = f64x2.add(c10, f64x2.mul(m0, v));
      c11 = f64x2.add(c11, f64x2.mul(m1, v));
      v = v128.load64_splat(s + step2);
      c20 = f64x2.add(c20, f64x2.mul(m0, v));
      c21 = f64x2.add(c21, f64x2.mul(m1, v));
      v = v128.load64_splat(s + step3);
      c30 = f64x2.add(c30, f64x2.mul(m0, v));
      c31 = f64x2.add(c31, f64x2.mul(m1, v));
      m += COLUMN;
    }
    v128.store(t0 + r, c00);
    v128.store(t0 + r, c01, 16);
    v128.store(t1 + r, c10);
    v128.store(t1 + r, c11, 16);
    v128.store(t2 + r, c20);
    v128.store(t2 + r, c21, 16);
    v128.store(t3 + r, c30);
    v128.store(t3 + r, c31, 16);
  }
}

function single(matrix: usize, limits: usize, source: usize, target: usize): void {
  for (let r: usize = 0; r < COLUMN; r += 32) {
    let c0 = v128.load(target + r);
    let c1 = v128.load(target + r, 16);
    let m = matrix + r;
    const end = source + (<usize>load<f64>(limits + (r >> 2)) << 3);
    for (let s = source; s < end; s += 8) {
      const v = v128.load64_splat(s);
      c0 = f64x2.add(c0, f64x2.mul(v128.load(m), v));
      c1 = f64x2.add(c1, f64x2.mul(v128.load(m, 16), v));
      m += COLUMN;
    }
    v128.store(target + r, c0);
    v128.store(target + r, c1, 16);
  }
}

/** Writes the values of expansions at the points of each cell, `side` each way, even. */
export function spread(
  expansions: usize,
  columns: i32,
  rows: i32,
  basis: usize,
  side: i32,
  room: usize,
  values: usize,
  rowStep: usize,
): void {
  const width = <usize>side << 3;
  let term = expansions;
  for (let r: i32 = 0; r < rows; r++) {
    for (let c: i32 = 0; c < columns; c++) {
      for (let b: usize = 0; b < ORDER; b++) {
        const row = room + b * width;
        // the term (a, b) stands at d(d + 1)/2 + b with d = a + b
        const first = term + (((b * (b + 1)) >> 1) + b) * 8;
        for (let i: usize = 0; i < width; i += 16) {
          let sum = f64x2.splat(0);
          let t = first;
          let at = basis + i;
          for (let d = b; d < ORDER; d++) {
            sum = f64x2.add(sum, f64x2.mul(v128.load64_splat(t), v128.load(at)));
            t += (d + 1) << 3;
            at += width;
          }
          v128.store(row + i, sum);
        }
      }
      term += COLUMN;
      let into = values + <usize>c * width;
      for (let j: usize = 0; j < width; j += 8) {
        const p = basis + j;
        for (let i: usize = 0; i < width; i += 16) {
          let sum = f64x2.splat(0);
          let q = p;
          let at = room + i;
          for (let b: usize = 0; b < ORDER; b++) {
            sum = f64x2.add(sum, f64x2.mul(v128.load64_splat(q), v128.load(at)));
            q += width;
            at += width;
          }
          v128.store(into + i, sum);
        }
        into += rowStep;
      }
    }
    values += rowStep * <usize>side;
  }
}

/**
 * ln(a/b) of positive normal numbers, a ≥ b, in both lanes, with one division: a is halved k times, so that it is within
 * a factor 3/2 of b; ln m = 2·atanh(s) with s = (m − 1)/(m + 1), |s| ≤ 0.2, and 2·atanh(s)/s the polynomial in s² that
 * meets it at seven Chebyshev points of [0, 0.0401] (computed to 60 digits; it leaves 2e-15).
 */
@inline
function logarithmOfRatio(a: v128, b: v128): v128 {
  // bits taken as whole numbers grow nearly as the logarithm to base 2, times 2^52
  const k = i64x2.shr_u(i64x2.add(i64x2.sub(a, b), i64x2.splat(0x0008000000000000)), 52);
  const m = i64x2.sub(a, i64x2.shl(k, 52));
  const s = f64x2.div(f64x2.sub(m, b), f64x2.add(m, b));
  const z = f64x2.mul(s, s);
  const w = f64x2.mul(z, z);
  const low = f64x2.add(f64x2.splat(2.000000000000003), f64x2.mul(z, f64x2.splat(0.6666666666591495)));
  const mid = f64x2.add(f64x2.splat(0.400000002993805), f64x2.mul(z, f64x2.splat(0.28571383941540335)));
  const top = f64x2.add(f64x2.splat(0.2222538153016316), f64x2.mul(z, f64x2.splat(0.18067615106226007)));
  const high = f64x2.add(top, f64x2.mul(w, f64x2.splat(0.1740558341811264)));
  const series = f64x2.add(low, f64x2.mul(w, f64x2.add(mid, f64x2.mul(w, high))));
  // a whole number below 2^52 as a double: 2^52 + k, less 2^52
  const big = f64x2.splat(4503599627370496);
  const exponent = f64x2.sub(v128.or(k, big), big);
  return f64x2.add(f64x2.mul(exponent, f64x2.splat(0.6931471805599453)), f64x2.mul(s, series));
}

/** Adds straight pieces at the crossings of columns with rows: x1, y1, x2, y2, length, height², a factor a leakage. */
export function wires(
  pieces: usize,
  count: i32,
  cases: i32,
  xs: usize,
  ys: usize,
  columns: i32,
  rows: i32,
  values: usize,
  rowStep: usize,
  caseStep: usize,
): void {
  const width = <usize>columns << 3;
  const height = <usize>rows << 3;
  let piece = pieces;
  for (let p: i32 = 0; p < count; p++) {
    const x1 = v128.load64_splat(piece);
    const y1 = load<f64>(piece, 8);
    const x2 = v128.load64_splat(piece, 16);
    const y2 = load<f64>(piece, 24);
    const length = v128.load64_splat(piece, 32);
    const above = load<f64>(piece, 40);
    let row = values;
    for (let j: usize = 0; j < height; j += 8) {
      const y = load<f64>(ys + j);
      const across1 = f64x2.splat((y - y1) * (y - y1) + above);
      const across2 = f64x2.splat((y - y2) * (y - y2) + above);
      for (let i: usize = 0; i < width; i += 16) {
        const x = v128.load(xs + i);
        const dx1 = f64x2.sub(x, x1);
        const dx2 = f64x2.sub(x, x2);
        const ends = f64x2.add(
          f64x2.sqrt(f64x2.add(f64x2.mul(dx1, dx1), across1)),
          f64x2.sqrt(f64x2.add(f64x2.mul(dx2, dx2), across2)),
        );
        const mean = logarithmOfRatio(f64x2.add(ends, length), f64x2.sub(ends, length));
        let at = row + i;
        let factor = piece + 48;
        for (let u: i32 = 0; u < cases; u++) {
          v128.store(at, f64x2.add(v128.load(at), f64x2.mul(v128.load64_splat(factor), mean)));
          at += caseStep;
          factor += 8;
        }
      }
      row += rowStep;
    }
    piece += 48 + (<usize>cases << 3);
  }
}

/** Adds sources that are points in plan, by a table: x, y, a factor a leakage. */
export function sources(
  list: usize,
  count: i32,
  cases: i32,
  bins: usize,
  perSquare: f64,
  xs: usize,
  ys: usize,
  columns: i32,
  rows: i32,
  values: usize,
  rowStep: usize,
  caseStep: usize,
): void {
  const width = <usize>columns << 3;
  const height = <usize>rows << 3;
  const per = f64x2.splat(perSquare);
  const one = f64x2.splat(1);
  let source = list;
  for (let s: i32 = 0; s < count; s++) {
    const x = v128.load64_splat(source);
    const y = load<f64>(source, 8);
    let row = values;
    for (let j: usize = 0; j < height; j += 8) {
      const dy = load<f64>(ys + j) - y;
      const across = f64x2.splat(dy * dy);
      for (let i: usize = 0; i < width; i += 16) {
        const dx = f64x2.sub(v128.load(xs + i), x);
        const value = radialPair(bins, per, one, f64x2.add(f64x2.mul(dx, dx), across));
        let at = row + i;
        let factor = source + 16;
        for (let u: i32 = 0; u < cases; u++) {
          v128.store(at, f64x2.add(v128.load(at), f64x2.mul(v128.load64_splat(factor), value)));
          at += caseStep;
          factor += 8;
        }
      }
      row += rowStep;
    }
    source += 16 + (<usize>cases << 3);
  }
}

/**
 * Largest magnitude of the drops over paces at the inner points of a lattice, eight at a time: past the last ones, up to
 * seven more are written. A stencil: number of taps, then for each its offset in bytes (a whole number of 32 bits) and
 * its weight; the points opposite are subtracted.
 */
export function drops(
  values: usize,
  nx: i32,
  first: i32,
  end: i32,
  columns: i32,
  taps: usize,
  stencils: i32,
  into: usize,
): void {
  for (let j = first; j < end; j++) {
    const row = <usize>(j * nx + first) << 3;
    for (let i: usize = 0; i < <usize>columns << 3; i += 64) {
      const at = values + row + i;
      let most0 = f64x2.splat(0);
      let most1 = f64x2.splat(0);
      let most2 = f64x2.splat(0);
      let most3 = f64x2.splat(0);
      let tap = taps;
      for (let s: i32 = 0; s < stencils; s++) {
        const last = tap + 8 + (<usize>load<i32>(tap) << 4);
        let drop0 = f64x2.splat(0);
        let drop1 = f64x2.splat(0);
        let drop2 = f64x2.splat(0);
        let drop3 = f64x2.splat(0);
        for (tap += 8; tap < last; tap += 16) {
          const offset = <isize>load<i32>(tap);
          const weight = v128.load64_splat(tap, 8);
          const ahead = at + offset;
          const behind = at - offset;
          drop0 = f64x2.add(drop0, f64x2.mul(weight, f64x2.sub(v128.load(ahead), v128.load(behind))));
          drop1 = f64x2.add(drop1, f64x2.mul(weight, f64x2.sub(v128.load(ahead, 16), v128.load(behind, 16))));
          drop2 = f64x2.add(drop2, f64x2.mul(weight, f64x2.sub(v128.load(ahead, 32), v128.load(behind, 32))));
          drop3 = f64x2.add(drop3, f64x2.mul(weight, f64x2.sub(v128.load(ahead, 48), v128.load(behind, 48))));
        }
        most0 = f64x2.pmax(most0, f64x2.abs(drop0));
        most1 = f64x2.pmax(most1, f64x2.abs(drop1));
        most2 = f64x2.pmax(most2, f64x2.abs(drop2));
        most3 = f64x2.pmax(most3, f64x2.abs(drop3));
      }
      const to = into + row + i;
      v128.store(to, most0);
      v128.store(to, most1, 16);
      v128.store(to, most2, 32);
      v128.store(to, most3, 48);
    }
  }
}

/** Adds up Σ weight·ln[(h + √(r² + h²))/h] over heights and weights at every r², two at a time. */
export function heights(list: usize, count: i32, squares: usize, bytes: usize, into: usize): void {
  for (let i: usize = 0; i < bytes; i += 16) v128.store(into + i, f64x2.splat(0));
  for (let k: i32 = 0; k < count; k++) {
    const h = v128.load64_splat(list);
    const weight = v128.load64_splat(list, 8);
    const hh = f64x2.mul(h, h);
    for (let i: usize = 0; i < bytes; i += 16) {
      const root = f64x2.sqrt(f64x2.add(v128.load(squares + i), hh));
      const term = f64x2.mul(weight, logarithmOfRatio(f64x2.add(h, root), h));
      v128.store(into + i, f64x2.add(v128.load(into + i), term));
    }
    list += 16;
  }
}
