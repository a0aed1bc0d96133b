// Potentials of the soil surface at many points, segment by segment: Gauss points far away, the closed form near.
import { logarithm, radialPair } from './radial';

export { drops, heights, sources, spread, transfer, wires } from './map';

// Addresses and counts of one group of horizontal metal; written by `level` before points are asked for.
let segments: usize = 0;
let strength: usize = 0;
let all: usize = 0;
let rest: usize = 0;
let rule: usize = 0;
let cases: i32 = 0;
let perAll: f64 = 0;
let perRest: f64 = 0;
let ownWeight: f64 = 0;

/** Bytes of one segment: centre, half vector, two thresholds of distance², length, height² + radius², place of its rule. */
const SEGMENT: usize = 72;

/** Sums of the cases at one point: two lanes each, added at the end. */
let sums: usize = 0;

/** Adds the potentials of a group of horizontal metal at each point; `into` shape [points × cases]. */
export function level(
  segmentsAt: usize,
  count: i32,
  strengthAt: usize,
  allAt: usize,
  perAllSquare: f64,
  restAt: usize,
  perRestSquare: f64,
  own: f64,
  ruleAt: usize,
  casesCount: i32,
  sumsAt: usize,
  xs: usize,
  ys: usize,
  points: i32,
  into: usize,
): void {
  segments = segmentsAt;
  strength = strengthAt;
  all = allAt;
  perAll = perAllSquare;
  rest = restAt;
  perRest = perRestSquare;
  ownWeight = own;
  rule = ruleAt;
  cases = casesCount;
  sums = sumsAt;
  for (let p: i32 = 0; p < points; p++) {
    const at = <usize>p << 3;
    for (let u: i32 = 0; u < casesCount; u++) v128.store(sums + (<usize>u << 4), f64x2.splat(0));
    run(count, load<f64>(xs + at), load<f64>(ys + at));
    const row = into + <usize>(p * casesCount) * 8;
    for (let u: i32 = 0; u < casesCount; u++) {
      const sum = v128.load(sums + (<usize>u << 4));
      const place = row + (<usize>u << 3);
      store<f64>(place, load<f64>(place) + f64x2.extract_lane(sum, 0) + f64x2.extract_lane(sum, 1));
    }
  }
}

function run(count: i32, x: f64, y: f64): void {
  let seg = segments;
  let s = strength;
  for (let j: i32 = 0; j < count; j++) {
    const dx = x - load<f64>(seg);
    const dy = y - load<f64>(seg, 8);
    const distance = dx * dx + dy * dy;
    let value: v128;
    if (distance > load<f64>(seg, 32)) {
      const along = 0.5773502691896257 * (dx * load<f64>(seg, 16) + dy * load<f64>(seg, 24));
      const ux = load<f64>(seg, 16);
      const uy = load<f64>(seg, 24);
      const base = distance + (ux * ux + uy * uy) * 0.3333333333333333;
      const pair = f64x2.replace_lane(f64x2.splat(base + 2 * along), 1, base - 2 * along);
      value = f64x2.mul(f64x2.splat(0.5), radialPair(all, f64x2.splat(perAll), f64x2.splat(1), pair));
    } else if (distance > load<f64>(seg, 40)) value = points(rule, all, perAll, seg, dx, dy);
    else {
      value = f64x2.replace_lane(f64x2.splat(0), 0, near(seg, dx, dy));
      if (rest != 0) value = f64x2.add(value, points(rule + <usize>load<f64>(seg, 64), rest, perRest, seg, dx, dy));
    }
    for (let u: i32 = 0; u < cases; u++) {
      const sum = sums + (<usize>u << 4);
      v128.store(sum, f64x2.add(v128.load(sum), f64x2.mul(v128.load64_splat(s), value)));
      s += 8;
    }
    seg += SEGMENT;
  }
}

/** Mean of the nearest images along a segment, by its closed form. */
@inline
function near(seg: usize, dx: f64, dy: f64): f64 {
  const ux = load<f64>(seg, 16);
  const uy = load<f64>(seg, 24);
  const length = load<f64>(seg, 48);
  const above = load<f64>(seg, 56);
  const ends =
    sqrt((dx - ux) * (dx - ux) + (dy - uy) * (dy - uy) + above) +
    sqrt((dx + ux) * (dx + ux) + (dy + uy) * (dy + uy) + above);
  return (ownWeight * logarithm((ends + length) / (ends - length))) / length;
}

/** Two lanes whose sum is the mean of a table along a segment, by pairs of points on [−1, 1] and pairs of weights. */
function points(at: usize, table: usize, perSquare: f64, seg: usize, dx: f64, dy: f64): v128 {
  const ux = v128.load64_splat(seg, 16);
  const uy = v128.load64_splat(seg, 24);
  const per = f64x2.splat(perSquare);
  const one = f64x2.splat(1);
  const end = at + 8 + (<usize>load<f64>(at) << 5);
  let sum = f64x2.splat(0);
  for (at += 8; at < end; at += 32) {
    const t = v128.load(at);
    const px = f64x2.sub(f64x2.splat(dx), f64x2.mul(t, ux));
    const py = f64x2.sub(f64x2.splat(dy), f64x2.mul(t, uy));
    const value = radialPair(table, per, one, f64x2.add(f64x2.mul(px, px), f64x2.mul(py, py)));
    sum = f64x2.add(sum, f64x2.mul(v128.load(at, 16), value));
  }
  return sum;
}

/** Adds the potentials of a group of vertical metal: x, y, radius², length a segment; `restAt` 0 for none. */
export function upright(
  metal: usize,
  count: i32,
  strengthAt: usize,
  restAt: usize,
  perRestSquare: f64,
  own: f64,
  z1: f64,
  z2: f64,
  casesCount: i32,
  xs: usize,
  ys: usize,
  points: i32,
  into: usize,
): void {
  const per = f64x2.splat(perRestSquare);
  const one = f64x2.splat(1);
  for (let p: i32 = 0; p < points; p++) {
    const x = load<f64>(xs + (<usize>p << 3));
    const y = load<f64>(ys + (<usize>p << 3));
    const row = into + <usize>(p * casesCount) * 8;
    let s = strengthAt;
    for (let j: i32 = 0; j < count; j++) {
      const at = metal + (<usize>j << 5);
      const dx = x - load<f64>(at);
      const dy = y - load<f64>(at, 8);
      const rr = dx * dx + dy * dy;
      const aa = load<f64>(at, 16);
      const length = load<f64>(at, 24);
      const ends = sqrt(rr + aa + z1 * z1) + sqrt(rr + aa + z2 * z2);
      let value = (own * logarithm((ends + length) / (ends - length))) / length;
      if (restAt != 0) value += f64x2.extract_lane(radialPair(restAt, per, one, f64x2.splat(rr)), 0);
      for (let u: i32 = 0; u < casesCount; u++) {
        const place = row + (<usize>u << 3);
        store<f64>(place, load<f64>(place) + load<f64>(s) * value);
        s += 8;
      }
    }
  }
}
