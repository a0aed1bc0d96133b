// Far entries of the leakage matrix, a row of one depth against another depth: Gauss points by distance over length.
import { radialPair } from './radial';

let table: usize = 0;
let perSquare: f64 = 0;
let images: usize = 0;
let imageCount: i32 = 0;
let factor: f64 = 0;
let depthSquared: f64 = 0;
let rules: usize = 0;
let closed: f64 = 0;
let ratios: usize = 0;

/** Bytes of one segment: centre, half vector, length, radius. */
const SEGMENT: usize = 48;
/** Bytes of one rule: four points on [−1, 1], four weights; what is over repeats a point with weight nothing. */
const RULE: usize = 64;

/**
 * What holds for two depths: the table of the smooth images (0 for none), weight and height² of the others (each twice),
 * the list's factor, squared distance of the depths, and squared ratios: below `closedSquared` an entry is left out.
 */
export function depths(
  tableAt: usize,
  perTableSquare: f64,
  imagesAt: usize,
  count: i32,
  listFactor: f64,
  apartSquared: f64,
  rulesAt: usize,
  closedSquared: f64,
  ratiosAt: usize,
): void {
  table = tableAt;
  perSquare = perTableSquare;
  images = imagesAt;
  imageCount = count;
  factor = listFactor;
  depthSquared = apartSquared;
  rules = rulesAt;
  closed = closedSquared;
  ratios = ratiosAt;
}

@inline
function order(distance: f64, squared: f64): usize {
  if (distance >= load<f64>(ratios) * squared) return 1;
  if (distance >= load<f64>(ratios, 8) * squared) return 2;
  if (distance >= load<f64>(ratios, 16) * squared) return 3;
  return 4;
}

/** Writes the entries of one segment against `count` others; not-a-number where the pair is near. */
export function row(one: usize, others: usize, count: i32, into: usize): void {
  const x = load<f64>(one);
  const y = load<f64>(one, 8);
  const hx = load<f64>(one, 16);
  const hy = load<f64>(one, 24);
  const length = load<f64>(one, 32);
  const radius = load<f64>(one, 40);
  const per = f64x2.splat(perSquare);
  const unit = f64x2.splat(1);
  let other = others;
  for (let j: i32 = 0; j < count; j++) {
    const dx = x - load<f64>(other);
    const dy = y - load<f64>(other, 8);
    const distance = dx * dx + dy * dy + depthSquared;
    const l = load<f64>(other, 32);
    const longer = max<f64>(length, l);
    let value: f64 = NaN;
    if (distance >= closed * longer * longer) {
      const a = max<f64>(radius, load<f64>(other, 40));
      const aa = f64x2.splat(a * a);
      const ox = v128.load64_splat(other, 16);
      const oy = v128.load64_splat(other, 24);
      const orderOne = order(distance, length * length);
      const orderOther = order(distance, l * l);
      const ruleOne = rules + orderOne * RULE;
      const ruleOther = rules + orderOther * RULE;
      const endOther = ruleOther + (((orderOther + 1) >> 1) << 4);
      let sum = f64x2.splat(0);
      for (let p = ruleOne; p < ruleOne + (orderOne << 3); p += 8) {
        const t = load<f64>(p);
        const px = f64x2.splat(dx + t * hx);
        const py = f64x2.splat(dy + t * hy);
        const w = v128.load64_splat(p, 32);
        for (let q = ruleOther; q < endOther; q += 16) {
          const s = v128.load(q);
          const ex = f64x2.sub(px, f64x2.mul(s, ox));
          const ey = f64x2.sub(py, f64x2.mul(s, oy));
          const rr = f64x2.add(f64x2.mul(ex, ex), f64x2.mul(ey, ey));
          let mean = table == 0 ? f64x2.splat(0) : radialPair(table, per, unit, rr);
          const ra = f64x2.add(rr, aa);
          const end = images + (<usize>imageCount << 5);
          for (let k = images; k < end; k += 32)
            mean = f64x2.add(mean, f64x2.div(v128.load(k), f64x2.sqrt(f64x2.add(ra, v128.load(k, 16)))));
          sum = f64x2.add(sum, f64x2.mul(f64x2.mul(w, v128.load(q, 32)), mean));
        }
      }
      value = factor * (f64x2.extract_lane(sum, 0) + f64x2.extract_lane(sum, 1));
    }
    store<f64>(into + (<usize>j << 3), value);
    other += SEGMENT;
  }
}
