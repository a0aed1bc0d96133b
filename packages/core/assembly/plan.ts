// Means of radial tables over two segments in plan: by moments within a bin when far, by Gauss points when nearer.
import { AT_HX, AT_HY, AT_RADIUS, AT_THIRD, PAIR_FACTOR, PAIR_FAR, PAIR_FAR_PER, RULE, RULE_HALF } from './layout';
import { radialPair } from './radial';

let rules: usize = 0;
/** factors in the moments of r² over two wires */
let moments: usize = 0;

export function preparePlan(rulesAt: usize, momentsAt: usize): void {
  rules = rulesAt;
  moments = momentsAt;
}

/** Two far entries, each by one bin of its table. */
@inline
export function single(one: usize, a: usize, b: usize, pa: usize, pb: usize, dx: v128, dy: v128, plan: v128): v128 {
  const ha = v128.load(a, AT_HX);
  const hb = v128.load(b, AT_HX);
  const ta = v128.load(a, AT_THIRD);
  const tb = v128.load(b, AT_THIRD);
  const per = v128.load_lane<f64>(pb, v128.load64_splat(pa, PAIR_FAR_PER), 1, PAIR_FAR_PER);
  const aa = f64x2.pmax(v128.load64_splat(one, AT_RADIUS), v128.shuffle<f64>(ta, tb, 1, 3));
  const third = v128.load64_splat(one, AT_THIRD);
  const thirds = v128.shuffle<f64>(ta, tb, 0, 2);
  const rr = f64x2.add(f64x2.add(plan, aa), f64x2.add(third, thirds));
  const hx = v128.load64_splat(one, AT_HX);
  const hy = v128.load64_splat(one, AT_HY);
  const ox = v128.shuffle<f64>(ha, hb, 0, 2);
  const oy = v128.shuffle<f64>(ha, hb, 1, 3);
  const mean = binMean(<usize>load<u32>(pa, PAIR_FAR), <usize>load<u32>(pb, PAIR_FAR), per, rr, dx, dy, hx, hy, ox, oy, third, thirds);
  return f64x2.mul(v128.load_lane<f64>(pb, v128.load64_splat(pa, PAIR_FACTOR), 1, PAIR_FACTOR), mean);
}

/** Two entries so far that the second moment of u does. */
@inline
export function farthest(one: usize, a: usize, b: usize, pa: usize, pb: usize, dx: v128, dy: v128, plan: v128): v128 {
  const ha = v128.load(a, AT_HX);
  const hb = v128.load(b, AT_HX);
  const ta = v128.load(a, AT_THIRD);
  const tb = v128.load(b, AT_THIRD);
  const per = v128.load_lane<f64>(pb, v128.load64_splat(pa, PAIR_FAR_PER), 1, PAIR_FAR_PER);
  const aa = f64x2.pmax(v128.load64_splat(one, AT_RADIUS), v128.shuffle<f64>(ta, tb, 1, 3));
  const rr = f64x2.add(f64x2.add(plan, aa), f64x2.add(v128.load64_splat(one, AT_THIRD), v128.shuffle<f64>(ta, tb, 0, 2)));
  const y = f64x2.add(f64x2.splat(1), f64x2.mul(rr, per));
  const k = i64x2.shr_s(y, 49);
  const ka = <usize>load<u32>(pa, PAIR_FAR) + (<usize>(i64x2.extract_lane(k, 0) - FIRST) << 6);
  const kb = <usize>load<u32>(pb, PAIR_FAR) + (<usize>(i64x2.extract_lane(k, 1) - FIRST) << 6);
  const a0 = v128.load(ka);
  const b0 = v128.load(kb);
  const scale = v128.shuffle<f64>(a0, b0, 1, 3);
  const u = f64x2.mul(f64x2.sub(y, v128.shuffle<f64>(a0, b0, 0, 2)), scale);
  const stretch = f64x2.mul(per, scale);
  const p = f64x2.add(f64x2.mul(dx, v128.load64_splat(one, AT_HX)), f64x2.mul(dy, v128.load64_splat(one, AT_HY)));
  const q = f64x2.add(f64x2.mul(dx, v128.shuffle<f64>(ha, hb, 0, 2)), f64x2.mul(dy, v128.shuffle<f64>(ha, hb, 1, 3)));
  const e = f64x2.mul(f64x2.mul(f64x2.mul(stretch, stretch), v128.load64_splat(moments)), f64x2.add(f64x2.mul(p, p), f64x2.mul(q, q)));
  const uu = f64x2.mul(u, u);
  const two = f64x2.add(uu, e);
  const three = f64x2.add(uu, f64x2.mul(v128.load64_splat(moments, 56), e));
  const four = f64x2.mul(uu, f64x2.add(uu, f64x2.mul(v128.load64_splat(moments, 64), e)));
  const five = f64x2.mul(uu, f64x2.add(uu, f64x2.mul(v128.load64_splat(moments, 80), e)));
  const a1 = v128.load(ka, 16);
  const b1 = v128.load(kb, 16);
  const a2 = v128.load(ka, 32);
  const b2 = v128.load(kb, 32);
  const a3 = v128.load(ka, 48);
  const b3 = v128.load(kb, 48);
  const odd = f64x2.add(
    f64x2.add(v128.shuffle<f64>(a1, b1, 1, 3), f64x2.mul(three, v128.shuffle<f64>(a2, b2, 1, 3))),
    f64x2.mul(five, v128.shuffle<f64>(a3, b3, 1, 3)),
  );
  const even = f64x2.add(
    f64x2.add(v128.shuffle<f64>(a1, b1, 0, 2), f64x2.mul(two, v128.shuffle<f64>(a2, b2, 0, 2))),
    f64x2.mul(four, v128.shuffle<f64>(a3, b3, 0, 2)),
  );
  const factor = v128.load_lane<f64>(pb, v128.load64_splat(pa, PAIR_FACTOR), 1, PAIR_FACTOR);
  return f64x2.mul(factor, f64x2.add(even, f64x2.mul(u, odd)));
}

/**
 * Means of two tables' polynomials over two wires each, from the moments of u about the mean of r², in which u is linear
 * (src/leakage/radial-table.ts, radialMean).
 */
@inline
function binMean(
  tableA: usize, tableB: usize, per: v128, rr: v128, dx: v128, dy: v128,
  hx: v128, hy: v128, ox: v128, oy: v128, third: v128, thirds: v128,
): v128 {
  const y = f64x2.add(f64x2.splat(1), f64x2.mul(rr, per));
  const k = i64x2.shr_s(y, 49);
  const ka = tableA + (<usize>(i64x2.extract_lane(k, 0) - FIRST) << 6);
  const kb = tableB + (<usize>(i64x2.extract_lane(k, 1) - FIRST) << 6);
  const a0 = v128.load(ka);
  const b0 = v128.load(kb);
  const scale = v128.shuffle<f64>(a0, b0, 1, 3);
  const u = f64x2.mul(f64x2.sub(y, v128.shuffle<f64>(a0, b0, 0, 2)), scale);
  const stretch = f64x2.mul(per, scale);
  const p = f64x2.mul(stretch, f64x2.add(f64x2.mul(dx, hx), f64x2.mul(dy, hy)));
  const q = f64x2.mul(stretch, f64x2.add(f64x2.mul(dx, ox), f64x2.mul(dy, oy)));
  const r = f64x2.mul(stretch, f64x2.add(f64x2.mul(hx, ox), f64x2.mul(hy, oy)));
  const t = f64x2.mul(stretch, third);
  const v = f64x2.mul(stretch, thirds);
  const pp = f64x2.mul(p, p);
  const qq = f64x2.mul(q, q);
  const pq = f64x2.mul(p, q);
  const both = f64x2.add(pp, qq);
  const e2 = f64x2.add(
    f64x2.mul(v128.load64_splat(moments), both),
    f64x2.add(f64x2.mul(v128.load64_splat(moments, 8), f64x2.add(f64x2.mul(t, t), f64x2.mul(v, v))), f64x2.mul(v128.load64_splat(moments, 16), f64x2.mul(r, r))),
  );
  const e3 = f64x2.add(
    f64x2.mul(v128.load64_splat(moments, 24), f64x2.add(f64x2.mul(pp, t), f64x2.mul(qq, v))),
    f64x2.mul(v128.load64_splat(moments, 32), f64x2.mul(pq, r)),
  );
  const e4 = f64x2.add(f64x2.mul(v128.load64_splat(moments, 40), f64x2.mul(both, both)), f64x2.mul(v128.load64_splat(moments, 48), f64x2.mul(pq, pq)));
  const uu = f64x2.mul(u, u);
  const three = f64x2.add(f64x2.mul(u, f64x2.add(uu, f64x2.mul(v128.load64_splat(moments, 56), e2))), e3);
  const ue3 = f64x2.mul(u, e3);
  const four = f64x2.add(f64x2.mul(uu, f64x2.add(uu, f64x2.mul(v128.load64_splat(moments, 64), e2))), f64x2.add(f64x2.mul(v128.load64_splat(moments, 72), ue3), e4));
  const ten = v128.load64_splat(moments, 80);
  const five = f64x2.mul(u, f64x2.add(
    f64x2.mul(uu, f64x2.add(uu, f64x2.mul(ten, e2))),
    f64x2.add(f64x2.mul(ten, ue3), f64x2.mul(v128.load64_splat(moments, 88), e4)),
  ));
  const a1 = v128.load(ka, 16);
  const b1 = v128.load(kb, 16);
  const a2 = v128.load(ka, 32);
  const b2 = v128.load(kb, 32);
  const a3 = v128.load(ka, 48);
  const b3 = v128.load(kb, 48);
  const low = f64x2.add(v128.shuffle<f64>(a1, b1, 0, 2), f64x2.mul(u, v128.shuffle<f64>(a1, b1, 1, 3)));
  const middle = f64x2.add(f64x2.mul(f64x2.add(uu, e2), v128.shuffle<f64>(a2, b2, 0, 2)), f64x2.mul(three, v128.shuffle<f64>(a2, b2, 1, 3)));
  const top = f64x2.add(f64x2.mul(four, v128.shuffle<f64>(a3, b3, 0, 2)), f64x2.mul(five, v128.shuffle<f64>(a3, b3, 1, 3)));
  return f64x2.add(low, f64x2.add(middle, top));
}

const FIRST: i64 = 0x3ff0000000000000 >> 49;

/** Mean of a table over a wire and the two halves of the other. */
export function halves(whole: usize, halved: usize, dx: f64, dy: f64, aa: f64, table: usize, perSquare: f64): f64 {
  return halfSum(whole, halved, dx, dy, load<f64>(whole, AT_HX), load<f64>(whole, AT_HY), load<f64>(whole, AT_THIRD), aa, table, perSquare);
}

/** Mean of a table over the halves of both wires. */
export function quarters(field: usize, source: usize, dx: f64, dy: f64, aa: f64, table: usize, perSquare: f64): f64 {
  const hx = 0.5 * load<f64>(field, AT_HX);
  const hy = 0.5 * load<f64>(field, AT_HY);
  const third = 0.25 * load<f64>(field, AT_THIRD);
  return 0.5 * (
    halfSum(field, source, dx - hx, dy - hy, hx, hy, third, aa, table, perSquare) +
    halfSum(field, source, dx + hx, dy + hy, hx, hy, third, aa, table, perSquare)
  );
}

function halfSum(whole: usize, halved: usize, dx: f64, dy: f64, hx: f64, hy: f64, third: f64, aa: f64, table: usize, perSquare: f64): f64 {
  const ox = 0.5 * load<f64>(halved, AT_HX);
  const oy = 0.5 * load<f64>(halved, AT_HY);
  const ex = f64x2.replace_lane(f64x2.splat(dx + ox), 1, dx - ox);
  const ey = f64x2.replace_lane(f64x2.splat(dy + oy), 1, dy - oy);
  const thirds = 0.25 * load<f64>(halved, AT_THIRD);
  const rr = f64x2.add(f64x2.add(f64x2.mul(ex, ex), f64x2.mul(ey, ey)), f64x2.splat(aa + (third + thirds)));
  const mean = binMean(
    table, table, f64x2.splat(perSquare), rr, ex, ey,
    f64x2.splat(hx), f64x2.splat(hy), f64x2.splat(ox), f64x2.splat(oy), f64x2.splat(third), f64x2.splat(thirds),
  );
  return 0.5 * (f64x2.extract_lane(mean, 0) + f64x2.extract_lane(mean, 1));
}

/** Mean of a table over Gauss points of both segments in plan. */
export function planMean(field: usize, source: usize, dx: f64, dy: f64, aa: f64, orderF: i32, orderS: i32, bins: usize, perSquare: f64): f64 {
  const per = f64x2.splat(perSquare);
  const unit = f64x2.splat(1);
  const ox = v128.load64_splat(source, AT_HX);
  const oy = v128.load64_splat(source, AT_HY);
  const hx = load<f64>(field, AT_HX);
  const hy = load<f64>(field, AT_HY);
  const ruleF = rules + <usize>orderF * RULE;
  const ruleS = rules + <usize>orderS * RULE;
  const endS = ruleS + ((<usize>(orderS + 1) >> 1) << 4);
  const square = f64x2.splat(aa);
  let sum = f64x2.splat(0);
  for (let p = ruleF; p < ruleF + (<usize>orderF << 3); p += 8) {
    const t = load<f64>(p);
    const px = f64x2.splat(dx + t * hx);
    const py = f64x2.splat(dy + t * hy);
    const w = v128.load64_splat(p, RULE_HALF);
    for (let q = ruleS; q < endS; q += 16) {
      const s = v128.load(q);
      const ex = f64x2.sub(px, f64x2.mul(s, ox));
      const ey = f64x2.sub(py, f64x2.mul(s, oy));
      const rr = f64x2.add(f64x2.add(f64x2.mul(ex, ex), f64x2.mul(ey, ey)), square);
      sum = f64x2.add(sum, f64x2.mul(f64x2.mul(w, v128.load(q, RULE_HALF)), radialPair(bins, per, unit, rr)));
    }
  }
  return f64x2.extract_lane(sum, 0) + f64x2.extract_lane(sum, 1);
}
