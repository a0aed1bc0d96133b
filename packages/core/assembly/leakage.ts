// Entries of the leakage matrix by rows of others: far pairs by tables, near ones by closed form; src/leakage/plain-entry.ts is its twin.
import { imageSum, pointSum } from './images';
import { forget, nodeMean } from './nodes';
import { radialPair } from './radial';
import {
  AT_CLASS, AT_HX, AT_HY, AT_LEAST, AT_LENGTH, AT_NEAR, AT_RADIUS, AT_RANK, AT_SINGLE, AT_THIRD, AT_UX, AT_UY, AT_UZ, AT_Z,
  PAIR_COUNT, PAIR_FACTOR, PAIR_FAR, PAIR_FAR_PER, PAIR_IMAGES, PAIR_NODES, PAIR_REST, PAIR_REST_PER,
  PAIR_SINGLY, PAIR_SINGLY_COUNT, PAIR_SMOOTH, PAIR_WEIGHTS, RULE_HALF, RULE, SEGMENT_SHIFT,
} from './layout';

let segments: usize = 0;
let pairs: usize = 0;
let classes: usize = 0;
let rules: usize = 0;
/** squared ratios of distance to length: from which 1, 2 and 3 points do; halves of one wire, halves of both; and from which
 * the second moment alone does, over the one of which one bin does */
let ratios: usize = 0;
/** squared ratios of smoothness to length, each with the points that then do; their number */
let smoothSteps: usize = 0;
let smoothCount: usize = 0;
/** factors in the moments of r² over two wires */
let moments: usize = 0;

/** Says where the segments, the class pairs (rows of `classCount` addresses), the rules and the ratios lie. */
export function prepare(segmentsAt: usize, pairsAt: usize, classCount: i32, rulesAt: usize, ratiosAt: usize, smoothAt: usize, smoothSize: i32, momentsAt: usize): void {
  segments = segmentsAt;
  pairs = pairsAt;
  classes = <usize>classCount;
  rules = rulesAt;
  ratios = ratiosAt;
  smoothSteps = smoothAt;
  smoothCount = <usize>smoothSize;
  moments = momentsAt;
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
  const reach = v128.load64_splat(one, AT_SINGLE);
  const least = v128.load64_splat(one, AT_LEAST);
  const farther = v128.load64_splat(ratios, 40);
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
    const limit = f64x2.pmax(reach, v128.load_lane<f64>(b, v128.load64_splat(a, AT_SINGLE), 1, AT_SINGLE));
    const inPlan = f64x2.pmax(least, v128.load_lane<f64>(b, v128.load64_splat(a, AT_LEAST), 1, AT_LEAST));
    const plan = f64x2.add(f64x2.mul(dx, dx), f64x2.mul(dy, dy));
    const distance = f64x2.add(plan, f64x2.mul(dz, dz));
    const apart = v128.and(f64x2.ge(distance, limit), f64x2.ge(plan, inPlan));
    const tables = load<u32>(pa, PAIR_FAR) != 0 && load<u32>(pb, PAIR_FAR) != 0;
    const far = f64x2.ge(distance, f64x2.mul(farther, limit));
    // an entry is made in the same way whatever its neighbour
    if (tables && v128.all_true<i64>(v128.and(apart, far))) {
      const value = farthest(one, a, b, pa, pb, dx, dy, plan);
      v128.store_lane<f64>(at, value, 0);
      v128.store_lane<f64>(at + step, value, 1);
    } else if (tables && v128.all_true<i64>(v128.andnot(apart, far))) {
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

/** Two far entries, each by one bin of its table. */
@inline
function single(one: usize, a: usize, b: usize, pa: usize, pb: usize, dx: v128, dy: v128, plan: v128): v128 {
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
function farthest(one: usize, a: usize, b: usize, pa: usize, pb: usize, dx: v128, dy: v128, plan: v128): v128 {
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
  const far = <usize>load<u32>(pair, PAIR_FAR);
  const rest = <usize>load<u32>(pair, PAIR_REST);
  const nodes = <usize>load<u32>(pair, PAIR_NODES);
  const singly = <usize>load<u32>(pair, PAIR_SINGLY);
  const singles = load<i32>(pair, PAIR_SINGLY_COUNT);
  const lf = load<f64>(field, AT_LENGTH);
  const ls = load<f64>(source, AT_LENGTH);
  const tf = load<f64>(field, AT_THIRD);
  const ts = load<f64>(source, AT_THIRD);
  if (distance >= max<f64>(load<f64>(field, AT_NEAR), load<f64>(source, AT_NEAR))) {
    if (far != 0 && plan >= max<f64>(load<f64>(field, AT_LEAST), load<f64>(source, AT_LEAST))) {
      const limit = max<f64>(load<f64>(field, AT_SINGLE), load<f64>(source, AT_SINGLE));
      if (distance >= limit) {
        const x = f64x2.splat(dx);
        const y = f64x2.splat(dy);
        const value = distance >= load<f64>(ratios, 40) * limit
          ? farthest(field, source, source, pair, pair, x, y, f64x2.splat(plan))
          : single(field, source, source, pair, pair, x, y, f64x2.splat(plan));
        return f64x2.extract_lane(value, 0);
      }
      const longer = 12 * max<f64>(tf, ts);
      const per = load<f64>(pair, PAIR_FAR_PER);
      if (distance >= load<f64>(ratios, 24) * longer) {
        // the wire that points more to the other, so that it does not depend on their order
        const ofField = abs<f64>(dx * load<f64>(field, AT_HX) + dy * load<f64>(field, AT_HY));
        const ofSource = abs<f64>(dx * load<f64>(source, AT_HX) + dy * load<f64>(source, AT_HY));
        return factor * (ofField > ofSource ? halves(source, field, -dx, -dy, aa, far, per) : halves(field, source, dx, dy, aa, far, per));
      }
      if (distance >= load<f64>(ratios, 32) * longer) return factor * quarters(field, source, dx, dy, aa, far, per);
      return factor * planMean(field, source, dx, dy, aa, order(distance, 12 * tf), order(distance, 12 * ts), far, per);
    }
    const orderF = order(distance, lf * lf);
    const orderS = order(distance, ls * ls);
    let sum = pointSum(field, source, dx, dy, aa, rules + <usize>orderF * RULE, orderF, rules + <usize>orderS * RULE, orderS, singly, singles);
    if (nodes != 0) sum += nodeMean(nodes, <usize>load<u32>(pair, PAIR_WEIGHTS), plan + aa);
    if (rest != 0) sum += planMean(field, source, dx, dy, aa, order(distance, 12 * tf), order(distance, 12 * ts), rest, load<f64>(pair, PAIR_REST_PER));
    return factor * sum;
  }
  if (rest != 0) {
    const gap = leastGap(field, source, dx, dy, dz, distance);
    const smooth = gap * gap + load<f64>(pair, PAIR_SMOOTH);
    const orderF = tf > 0 ? smoothOrder(smooth, lf) : 1;
    const orderS = ts > 0 ? smoothOrder(smooth, ls) : 1;
    // images that are too close for points: all by closed form
    if (orderF == 0 || orderS == 0) return factor * imageSum(field, source, <usize>load<u32>(pair, PAIR_IMAGES), 0, load<i32>(pair, PAIR_COUNT), aa, rules, ratios);
    return factor * (
      imageSum(field, source, singly, 0, singles, aa, rules, ratios) +
      planMean(field, source, dx, dy, aa, orderF, orderS, rest, load<f64>(pair, PAIR_REST_PER))
    );
  }
  let sum = imageSum(field, source, singly, 0, singles, aa, rules, ratios);
  if (nodes != 0) sum += nodeMean(nodes, <usize>load<u32>(pair, PAIR_WEIGHTS), plan + aa);
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

/** Mean of a table over a wire and the two halves of the other. */
function halves(whole: usize, halved: usize, dx: f64, dy: f64, aa: f64, table: usize, perSquare: f64): f64 {
  return halfSum(whole, halved, dx, dy, load<f64>(whole, AT_HX), load<f64>(whole, AT_HY), load<f64>(whole, AT_THIRD), aa, table, perSquare);
}

/** Mean of a table over the halves of both wires. */
function quarters(field: usize, source: usize, dx: f64, dy: f64, aa: f64, table: usize, perSquare: f64): f64 {
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

/** Points on a segment of a near pair for its smooth images; none where they are too close for points. */
@inline
function smoothOrder(smoothSquared: f64, length: f64): i32 {
  const ll = length * length;
  for (let step = smoothSteps; step < smoothSteps + (smoothCount << 4); step += 16)
    if (smoothSquared >= load<f64>(step) * ll) return <i32>load<f64>(step, 8);
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
