// Sums over single images of two segments: by Gauss points when far, by closed form when near.
import { AT_LENGTH, AT_NEAR, AT_UX, AT_UY, AT_UZ, AT_Z, IMAGE_SHIFT, RULE, RULE_HALF } from './layout';
import { meanInverseDistance } from './wire-pair';

/** Double Gauss sum of the first `count` images over two segments in space. */
export function pointSum(
  field: usize, source: usize, dx: f64, dy: f64, aa: f64,
  ruleF: usize, orderF: i32, ruleS: usize, orderS: i32, images: usize, count: i32,
): f64 {
  const halfF = 0.5 * load<f64>(field, AT_LENGTH);
  const halfS = 0.5 * load<f64>(source, AT_LENGTH);
  const hx = halfF * load<f64>(field, AT_UX);
  const hy = halfF * load<f64>(field, AT_UY);
  const hz = halfF * load<f64>(field, AT_UZ);
  const ox = f64x2.splat(halfS * load<f64>(source, AT_UX));
  const oy = f64x2.splat(halfS * load<f64>(source, AT_UY));
  const oz = f64x2.splat(halfS * load<f64>(source, AT_UZ));
  const z = load<f64>(field, AT_Z);
  const depth = v128.load64_splat(source, AT_Z);
  const square = f64x2.splat(aa);
  const endS = ruleS + ((<usize>(orderS + 1) >> 1) << 4);
  const end = images + (<usize>count << IMAGE_SHIFT);
  let sum = f64x2.splat(0);
  for (let p = ruleF; p < ruleF + (<usize>orderF << 3); p += 8) {
    const t = load<f64>(p);
    const px = f64x2.splat(dx + t * hx);
    const py = f64x2.splat(dy + t * hy);
    const pz = f64x2.splat(z + t * hz);
    const w = v128.load64_splat(p, RULE_HALF);
    for (let q = ruleS; q < endS; q += 16) {
      const s = v128.load(q);
      const ex = f64x2.sub(px, f64x2.mul(s, ox));
      const ey = f64x2.sub(py, f64x2.mul(s, oy));
      const zs = f64x2.add(depth, f64x2.mul(s, oz));
      const rr = f64x2.add(f64x2.add(f64x2.mul(ex, ex), f64x2.mul(ey, ey)), square);
      let mean = f64x2.splat(0);
      for (let k = images; k < end; k += 1 << IMAGE_SHIFT) {
        const h = f64x2.sub(f64x2.sub(pz, f64x2.mul(v128.load64_splat(k, 8), zs)), v128.load64_splat(k, 16));
        mean = f64x2.add(mean, f64x2.div(v128.load64_splat(k), f64x2.sqrt(f64x2.add(rr, f64x2.mul(h, h)))));
      }
      sum = f64x2.add(sum, f64x2.mul(f64x2.mul(w, v128.load(q, RULE_HALF)), mean));
    }
  }
  return f64x2.extract_lane(sum, 0) + f64x2.extract_lane(sum, 1);
}

@inline
function order(ratios: usize, distance: f64, length: f64): i32 {
  const ll = length * length;
  if (distance >= load<f64>(ratios) * ll) return 1;
  if (distance >= load<f64>(ratios, 8) * ll) return 2;
  if (distance >= load<f64>(ratios, 16) * ll) return 3;
  return 4;
}

/** Images `from` to `to` − 1, each by its own distance. */
export function imageSum(field: usize, source: usize, images: usize, from: i32, to: i32, aa: f64, rules: usize, ratios: usize): f64 {
  const lf = load<f64>(field, AT_LENGTH);
  const ls = load<f64>(source, AT_LENGTH);
  const ux = load<f64>(field, AT_UX);
  const uy = load<f64>(field, AT_UY);
  const uz = load<f64>(field, AT_UZ);
  const vx = load<f64>(source, AT_UX);
  const vy = load<f64>(source, AT_UY);
  const vz = load<f64>(source, AT_UZ);
  const dx = load<f64>(field) - load<f64>(source);
  const dy = load<f64>(field, 8) - load<f64>(source, 8);
  const plan = dx * dx + dy * dy;
  const near = max<f64>(load<f64>(field, AT_NEAR), load<f64>(source, AT_NEAR));
  // from the first end of the field to that of the source
  const wx = 0.5 * (lf * ux - ls * vx) - dx;
  const wy = 0.5 * (lf * uy - ls * vy) - dy;
  let sum = 0.0;
  for (let k = from; k < to; k++) {
    const image = images + (<usize>k << IMAGE_SHIFT);
    const sign = load<f64>(image, 8);
    const dz = load<f64>(field, AT_Z) - sign * load<f64>(source, AT_Z) - load<f64>(image, 16);
    const distance = plan + dz * dz;
    if (distance < near) {
      const wz = 0.5 * (lf * uz - ls * (sign * vz)) - dz;
      sum += load<f64>(image) * meanInverseDistance(wx, wy, wz, ux, uy, uz, lf, vx, vy, sign * vz, ls, aa);
    } else {
      const orderF = order(ratios, distance, lf);
      const orderS = order(ratios, distance, ls);
      sum += pointSum(field, source, dx, dy, aa, rules + <usize>orderF * RULE, orderF, rules + <usize>orderS * RULE, orderS, image, 1);
    }
  }
  return sum;
}
