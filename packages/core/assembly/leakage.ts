// Entries of the leakage matrix by rows of others: far pairs by tables, near ones by closed form; src/leakage/plain-entry.ts is its twin.
import { imageSum, pointSum } from './images';
import { forget, nodeMean } from './nodes';
import { farthest, halves, planMean, preparePlan, quarters, single } from './plan';
import {
  AT_CLASS, AT_HX, AT_HY, AT_LEAST, AT_LENGTH, AT_NEAR, AT_RADIUS, AT_RANK, AT_SINGLE, AT_THIRD, AT_UX, AT_UY, AT_UZ, AT_Z,
  PAIR_COUNT, PAIR_FACTOR, PAIR_FAR, PAIR_FAR_PER, PAIR_IMAGES, PAIR_NODES, PAIR_REST, PAIR_REST_PER,
  PAIR_SINGLY, PAIR_SINGLY_COUNT, PAIR_SMOOTH, PAIR_WEIGHTS, RULE, SEGMENT_SHIFT,
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

/** Says where the segments, the class pairs (rows of `classCount` addresses), the rules and the ratios lie. */
export function prepare(segmentsAt: usize, pairsAt: usize, classCount: i32, rulesAt: usize, ratiosAt: usize, smoothAt: usize, smoothSize: i32, momentsAt: usize): void {
  segments = segmentsAt;
  pairs = pairsAt;
  classes = <usize>classCount;
  rules = rulesAt;
  ratios = ratiosAt;
  smoothSteps = smoothAt;
  smoothCount = <usize>smoothSize;
  preparePlan(rulesAt, momentsAt);
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

/** Points on a segment of a near pair for its smooth images; none where they are too close for points. */
@inline
function smoothOrder(smoothSquared: f64, length: f64): i32 {
  const ll = length * length;
  for (let step = smoothSteps; step < smoothSteps + (smoothCount << 4); step += 16)
    if (smoothSquared >= load<f64>(step) * ll) return <i32>load<f64>(step, 8);
  return 0;
}
