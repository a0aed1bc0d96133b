// Logarithm and angle by arithmetic alone, so that every engine gives the same digits; assembly/ holds their compiled twins.

/** One double seen as its words. */
const asNumber = new Float64Array(1);
const asWords = new Uint32Array(asNumber.buffer);
/** where the upper word is: 1 on little-endian machines */
const UPPER = new Uint8Array(new Uint16Array([1]).buffer)[0] === 1 ? 1 : 0;
/** Upper words of 1 and of √½, from which fractions are counted. */
const ONE = 0x3ff00000;
const ROOT_HALF = 0x3fe6a09e;

/**
 * Natural logarithm of a normal positive number, within one unit in the last place: x = 2^k·m, √½ < m < √2,
 * ln m = 2·atanh((m − 1)/(m + 1)) by the minimax series of fdlibm's e_log.c (Sun Microsystems 1993).
 */
export function logarithm(x: number): number {
  asNumber[0] = x;
  const upper = asWords[UPPER]! + ONE - ROOT_HALF;
  const k = (upper >>> 20) - 0x3ff;
  asWords[UPPER] = (upper & 0x000fffff) + ROOT_HALF;
  const f = asNumber[0]! - 1;
  const s = f / (2 + f);
  const z = s * s;
  const w = z * z;
  const odd =
    z * (0.6666666666666735 + w * (0.2857142874366239 + w * (0.1818357216161805 + w * 0.14798198605116586)));
  const even = w * (0.3999999999940942 + w * (0.22222198432149784 + w * 0.15313837699209373));
  const half = 0.5 * f * f;
  return k * 0.6931471803691238 - (half - (s * (half + odd + even) + k * 1.9082149292705877e-10) - f);
}

/** Arc tangents of 0.5, 1, 1.5 and infinity: leading digits, and the rest. */
const ATAN_HALF = 0.4636476090008061;
const ATAN_HALF_REST = 2.2698777452961687e-17;
const ATAN_ONE = 0.7853981633974483;
const ATAN_ONE_REST = 3.061616997868383e-17;
const ATAN_MORE = 0.982793723247329;
const ATAN_MORE_REST = 1.3903311031230998e-17;
const RIGHT = Math.PI / 2;
const RIGHT_REST = 6.123233995736766e-17;

/**
 * Arc tangent of n/d, n ≥ 0, d ≥ 0, not both nothing: the ratio is brought to 7/16 and below by a shift to 0.5, 1, 1.5
 * or infinity in the division itself; minimax series of fdlibm's s_atan.c (Sun Microsystems 1993).
 */
function arcTangent(n: number, d: number): number {
  let base = 0;
  let rest = 0;
  let p = n;
  let q = d;
  if (n > 0.4375 * d) {
    if (n < 0.6875 * d) {
      base = ATAN_HALF;
      rest = ATAN_HALF_REST;
      p = 2 * n - d;
      q = 2 * d + n;
    } else if (n < 1.1875 * d) {
      base = ATAN_ONE;
      rest = ATAN_ONE_REST;
      p = n - d;
      q = n + d;
    } else if (n < 2.4375 * d) {
      base = ATAN_MORE;
      rest = ATAN_MORE_REST;
      p = n - 1.5 * d;
      q = d + 1.5 * n;
    } else {
      base = RIGHT;
      rest = RIGHT_REST;
      p = -d;
      q = n;
    }
  }
  const x = p / q;
  const z = x * x;
  const w = z * z;
  const odd =
    z *
    (0.3333333333333293 +
      w *
        (0.14285714272503466 +
          w *
            (0.09090887133436507 +
              w * (0.06661073137387531 + w * (0.049768779946159324 + w * 0.016285820115365782)))));
  const even =
    w *
    (-0.19999999999876483 +
      w *
        (-0.11111110405462356 +
          w * (-0.0769187620504483 + w * (-0.058335701337905735 + w * -0.036531572744216916))));
  return base - (x * (odd + even) - rest - x);
}

/** Angle of the point (x, y) from the x axis, −π to π. */
export function angleOf(y: number, x: number): number {
  const a = arcTangent(Math.abs(y), Math.abs(x));
  const turned = x < 0 ? Math.PI - a : a;
  return y < 0 ? -turned : turned;
}
