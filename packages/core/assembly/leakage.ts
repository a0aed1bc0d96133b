// Entries of the leakage matrix by rows of others: far pairs by tables, near ones by closed form; src/leakage/plain-entry.ts is its twin.
import { imageSum, pointSum } from './images';
import { forget, nodeMean } from './nodes';
import { radialPair } from './radial';
import {
  AT_CLASS, AT_HX, AT_HY, AT_LENGTH, AT_NEAR, AT_RADIUS, AT_RANK, AT_SINGLE, AT_THIRD, AT_UX, AT_UY, AT_UZ, AT_Z,
  PAIR_COUNT, PAIR_FACTOR, PAIR_FAR, PAIR_FAR_PER, PAIR_IMAGES, PAIR_NODES, PAIR_PRIMARY, PAIR_REST, PAIR_REST_PER,
  PAIR_SMOOTH, PAIR_WEIGHTS, RULE_HALF, RULE, SEGMENT_SHIFT,
} from './layout';

let segments: usize = 0;
let pairs: usize = 0;
let classes: usize = 0;
let rules: usize = 0;
/** squared ratios of distance to length: from which 1, 2 and 3 points do; then of smoothness, from which 2, 3, 4, 6, 10, 16 and 32 do */
let ratios: usize = 0;

/** Says where the segments, the class pairs (rows of `classCount` addresses), the rules and the ratios lie. */
export function prepare(segmentsAt: usize, pairsAt: usize, classCount: i32, rulesAt: usize, ratiosAt: usize): void {
  segments = segmentsAt;
  pairs = pairsAt;
  classes = <usize>classCount;
  rules = rulesAt;
  ratios = ratiosAt;
  forget();
}

/** Entries of every row with every column, as indices of segments; steps in bytes. */
export function block(rows: usize, rowCount: i32, columns: usize, columnCount: i32, into: usize, rowStep: usize, columnStep: usize): void {
  for (let r: i32 = 0; r < rowCount; r++) fill(load<i32>(rows + (<usize>r << 2)), columns, columnCount, into + <usize>r * rowStep, columnStep);
}

/** Rows `from` to `to` − 1 of the packed lower triangle over the given segments. */
export function triangle(chosen: usize, from: i32, to: i32, into: usize): void {
  let at = into;
  for (let r = from; r < to; r++) {
    fill(load<i32>(chosen + (<usize>r << 2)), chosen, r + 1, at, 8);
    at += <usize>(r + 1) << 3;
  }
}

function fill(row: i32, columns: usize, count: i32, into: usize, step: usize): void {
  const one = segments + (<usize>row << SEGMENT_SHIFT);
  const own = pairs + ((<usize>load<i32>(one, AT_CLASS) * classes) << 2);
  const x = v128.load64_splat(one);
  const y = v128.load64_splat(one, 8);
  const z = v128.load64_splat(one, AT_Z);
  const least = v128.load64_splat(one, AT_SINGLE);
  let at = into;
  let column = columns;
  const end = columns + ((<usize>count & ~1) << 2);
  for (; column < end; column += 8) {
    const a = segments + (<usize>load<i32>(column) << SEGMENT_SHIFT);
    const b = segments + (<usize>load<i32>(column, 4) << SEGMENT_SHIFT);
    const pa = <usize>load<u32>(own + (<usize>load<i32>(a, AT_CLASS) << 2));
    const pb = <usize>load<u32>(own + (<usize>load<i32>(b, AT_CLASS) << 2));
    const ca = v128.load(a);
    const cb = v128.load(b);
    const dx = f64x2.sub(x, v128.shuffle<f64>(ca, cb, 0, 2));
    const dy = f64x2.sub(y, v128.shuffle<f64>(ca, cb, 1, 3));
    const dz = f64x2.sub(z, v128.load_lane<f64>(b, v128.load64_splat(a, AT_Z), 1, AT_Z));
    const limit = f64x2.pmax(least, v128.load_lane<f64>(b, v128.load64_splat(a, AT_SINGLE), 1, AT_SINGLE));
    const plan = f64x2.add(f64x2.mul(dx, dx), f64x2.mul(dy, dy));
    const apart = f64x2.ge(f64x2.add(plan, f64x2.mul(dz, dz)), limit);
    const tables = load<u32>(pa, PAIR_FAR) != 0 && load<u32>(pb, PAIR_FAR) != 0;
    if (tables && v128.all_true<i64>(apart)) {
      const value = single(one, a, b, pa, pb, dx, dy, plan);
      v128.store_lane<f64>(at, value, 0);
      v128.store_lane<f64>(at + step, value, 1);
    } else {
      store<f64>(at, entry(one, a, pa));
      store<f64>(at + step, entry(one, b, pb));
    }
    at += step + step;
  }
  if ((count & 1) != 0) {
    const a = segments + (<usize>load<i32>(column) << SEGMENT_SHIFT);
    store<f64>(at, entry(one, a, <usize>load<u32>(own + (<usize>load<i32>(a, AT_CLASS) << 2))));
  }
}

/**
 * Two far entries, each by one place of its table: mean of f over both wires to the fourth order in length over
 * distance, f at the mean squared distance plus half its variance times f″.
 */
@inline
function single(one: usize, a: usize, b: usize, pa: usize, pb: usize, dx: v128, dy: v128, plan: v128): v128 {
  const ha = v128.load(a, AT_HX);
  const hb = v128.load(b, AT_HX);
  const ta = v128.load(a, AT_THIRD);
  const tb = v128.load(b, AT_THIRD);
  const per = v128.load_lane<f64>(pb, v128.load64_splat(pa, PAIR_FAR_PER), 1, PAIR_FAR_PER);
  const own = f64x2.add(f64x2.mul(dx, v128.load64_splat(one, AT_HX)), f64x2.mul(dy, v128.load64_splat(one, AT_HY)));
  const other = f64x2.add(f64x2.mul(dx, v128.shuffle<f64>(ha, hb, 0, 2)), f64x2.mul(dy, v128.shuffle<f64>(ha, hb, 1, 3)));
  const variance = f64x2.add(f64x2.mul(own, own), f64x2.mul(other, other));
  const aa = f64x2.pmax(v128.load64_splat(one, AT_RADIUS), v128.shuffle<f64>(ta, tb, 1, 3));
  const third = f64x2.add(v128.load64_splat(one, AT_THIRD), v128.shuffle<f64>(ta, tb, 0, 2));
  const rr = f64x2.add(f64x2.add(plan, aa), third);
  const y = f64x2.add(f64x2.splat(1), f64x2.mul(rr, per));
  const k = i64x2.shr_s(y, 49);
  const ka = <usize>load<u32>(pa, PAIR_FAR) + (<usize>(i64x2.extract_lane(k, 0) - FIRST) << 6);
  const kb = <usize>load<u32>(pb, PAIR_FAR) + (<usize>(i64x2.extract_lane(k, 1) - FIRST) << 6);
  const a0 = v128.load(ka);
  const b0 = v128.load(kb);
  const a1 = v128.load(ka, 16);
  const b1 = v128.load(kb, 16);
  const a2 = v128.load(ka, 32);
  const b2 = v128.load(kb, 32);
  const a3 = v128.load(ka, 48);
  const b3 = v128.load(kb, 48);
  const scale = v128.shuffle<f64>(a0, b0, 1, 3);
  const u = f64x2.mul(f64x2.sub(y, v128.shuffle<f64>(a0, b0, 0, 2)), scale);
  const c2 = v128.shuffle<f64>(a2, b2, 0, 2);
  const c3 = v128.shuffle<f64>(a2, b2, 1, 3);
  const c4 = v128.shuffle<f64>(a3, b3, 0, 2);
  const c5 = v128.shuffle<f64>(a3, b3, 1, 3);
  const uu = f64x2.mul(u, u);
  const low = f64x2.add(v128.shuffle<f64>(a1, b1, 0, 2), f64x2.mul(u, v128.shuffle<f64>(a1, b1, 1, 3)));
  const value = f64x2.add(low, f64x2.mul(uu, f64x2.add(f64x2.add(c2, f64x2.mul(u, c3)), f64x2.mul(uu, f64x2.add(c4, f64x2.mul(u, c5))))));
  // f″/2 in u is c2 + 3 c3 u + 6 c4 u² + 10 c5 u³
  const bend = f64x2.add(
    f64x2.add(c2, f64x2.mul(u, f64x2.mul(f64x2.splat(3), c3))),
    f64x2.mul(uu, f64x2.add(f64x2.mul(f64x2.splat(6), c4), f64x2.mul(u, f64x2.mul(f64x2.splat(10), c5)))),
  );
  const stretch = f64x2.mul(per, scale);
  const spread = f64x2.mul(f64x2.mul(f64x2.splat(4.0 / 3.0), variance), f64x2.mul(stretch, stretch));
  const factor = v128.load_lane<f64>(pb, v128.load64_splat(pa, PAIR_FACTOR), 1, PAIR_FACTOR);
  return f64x2.mul(factor, f64x2.add(value, f64x2.mul(spread, bend)));
}

const FIRST: i64 = 0x3ff0000000000000 >> 49;

/** Points on a segment for a squared distance, by its squared length in plan or space. */
@inline
function order(distance: f64, lengthSquared: f64): i32 {
  if (distance >= load<f64>(ratios) * lengthSquared) return 1;
  if (distance >= load<f64>(ratios, 8) * lengthSquared) return 2;
  if (distance >= load<f64>(ratios, 16) * lengthSquared) return 3;
  return 4;
}

function entry(one: usize, other: usize, pair: usize): f64 {
  // the shallower layer is the source, and of one layer the segment that comes first: R_ij and R_ji are the same sum
  const first = load<f64>(one, AT_RANK) <= load<f64>(other, AT_RANK);
  const source = first ? one : other;
  const field = first ? other : one;
  const dx = load<f64>(field) - load<f64>(source);
  const dy = load<f64>(field, 8) - load<f64>(source, 8);
  const dz = load<f64>(field, AT_Z) - load<f64>(source, AT_Z);
  const plan = dx * dx + dy * dy;
  const distance = plan + dz * dz;
  const aa = max<f64>(load<f64>(field, AT_RADIUS), load<f64>(source, AT_RADIUS));
  const factor = load<f64>(pair, PAIR_FACTOR);
  const count = load<i32>(pair, PAIR_COUNT);
  const primary = load<i32>(pair, PAIR_PRIMARY);
  const far = <usize>load<u32>(pair, PAIR_FAR);
  const nodes = <usize>load<u32>(pair, PAIR_NODES);
  const lf = load<f64>(field, AT_LENGTH);
  const ls = load<f64>(source, AT_LENGTH);
  const images = <usize>load<u32>(pair, PAIR_IMAGES);
  if (distance >= max<f64>(load<f64>(field, AT_NEAR), load<f64>(source, AT_NEAR))) {
    if (far != 0) {
      if (distance >= max<f64>(load<f64>(field, AT_SINGLE), load<f64>(source, AT_SINGLE))) {
        const value = single(field, source, source, pair, pair, f64x2.splat(dx), f64x2.splat(dy), f64x2.splat(plan));
        return f64x2.extract_lane(value, 0);
      }
      const orderF = order(distance, 12 * load<f64>(field, AT_THIRD));
      const orderS = order(distance, 12 * load<f64>(source, AT_THIRD));
      return factor * planMean(field, source, dx, dy, aa, orderF, orderS, far, load<f64>(pair, PAIR_FAR_PER));
    }
    const orderF = order(distance, lf * lf);
    const orderS = order(distance, ls * ls);
    const some = nodes != 0 ? primary : count;
    let sum = pointSum(field, source, dx, dy, aa, rules + <usize>orderF * RULE, orderF, rules + <usize>orderS * RULE, orderS, images, some);
    if (nodes != 0) sum += nodeMean(nodes, <usize>load<u32>(pair, PAIR_WEIGHTS), plan + aa);
    return factor * sum;
  }
  let sum = imageSum(field, source, images, 0, primary, aa, rules, ratios);
  if (count == primary) return factor * sum;
  const rest = <usize>load<u32>(pair, PAIR_REST);
  if (nodes != 0) sum += nodeMean(nodes, <usize>load<u32>(pair, PAIR_WEIGHTS), plan + aa);
  else {
    const gap = leastGap(field, source, dx, dy, dz, distance);
    const points = rest == 0 ? 0 : smoothOrder(gap * gap + load<f64>(pair, PAIR_SMOOTH), max<f64>(lf, ls));
    if (points == 0) sum += imageSum(field, source, images, primary, count, aa, rules, ratios);
    else {
      const orderF = load<f64>(field, AT_THIRD) > 0 ? points : 1;
      const orderS = load<f64>(source, AT_THIRD) > 0 ? points : 1;
      sum += planMean(field, source, dx, dy, aa, orderF, orderS, rest, load<f64>(pair, PAIR_REST_PER));
    }
  }
  return factor * sum;
}

@inline
function along(segment: usize, dx: f64, dy: f64, dz: f64): f64 {
  const inner = dx * load<f64>(segment, AT_UX) + dy * load<f64>(segment, AT_UY) + dz * load<f64>(segment, AT_UZ);
  return 0.5 * load<f64>(segment, AT_LENGTH) * abs<f64>(inner);
}

/** A distance that no two points of the segments fall below: along the line of their centres. */
@inline
function leastGap(field: usize, source: usize, dx: f64, dy: f64, dz: f64, distance: f64): f64 {
  if (distance == 0) return 0;
  return max<f64>(0, distance - along(field, dx, dy, dz) - along(source, dx, dy, dz)) / sqrt(distance);
}

/** Points on each segment of a near pair for its smooth images; none where they are too close for points. */
@inline
function smoothOrder(smoothSquared: f64, longer: f64): i32 {
  const ll = longer * longer;
  if (smoothSquared >= load<f64>(ratios, 24) * ll) return 2;
  if (smoothSquared >= load<f64>(ratios, 32) * ll) return 3;
  if (smoothSquared >= load<f64>(ratios, 40) * ll) return 4;
  if (smoothSquared >= load<f64>(ratios, 48) * ll) return 6;
  if (smoothSquared >= load<f64>(ratios, 56) * ll) return 10;
  if (smoothSquared >= load<f64>(ratios, 64) * ll) return 16;
  if (smoothSquared >= load<f64>(ratios, 72) * ll) return 32;
  return 0;
}

/** Mean of a table over Gauss points of both segments in plan. */
function planMean(field: usize, source: usize, dx: f64, dy: f64, aa: f64, orderF: i32, orderS: i32, bins: usize, perSquare: f64): f64 {
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
