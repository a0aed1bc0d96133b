// A radial table read for two squared distances at once, and a logarithm of its own so that engines agree.

// Bins as in src/leakage/radial-table.ts: eight an octave of 1 + r²/s², eight doubles a bin.
const SHIFT: i64 = 49;
const FIRST: i64 = 0x3ff0000000000000 >> 49;

/** Values of the table at the two lanes of rr; `bins` is its address, `perSquare` in both lanes. */
@inline
export function radialPair(bins: usize, perSquare: v128, one: v128, rr: v128): v128 {
  const y = v128.add<f64>(one, v128.mul<f64>(rr, perSquare));
  const a = bins + (<usize>((v128.extract_lane<i64>(y, 0) >> SHIFT) - FIRST) << 6);
  const b = bins + (<usize>((v128.extract_lane<i64>(y, 1) >> SHIFT) - FIRST) << 6);
  const a0 = v128.load(a);
  const b0 = v128.load(b);
  const a1 = v128.load(a, 16);
  const b1 = v128.load(b, 16);
  const a2 = v128.load(a, 32);
  const b2 = v128.load(b, 32);
  const a3 = v128.load(a, 48);
  const b3 = v128.load(b, 48);
  const u = v128.mul<f64>(
    v128.sub<f64>(y, v128.shuffle<f64>(a0, b0, 0, 2)),
    v128.shuffle<f64>(a0, b0, 1, 3),
  );
  const uu = v128.mul<f64>(u, u);
  const low = v128.add<f64>(v128.shuffle<f64>(a1, b1, 0, 2), v128.mul<f64>(u, v128.shuffle<f64>(a1, b1, 1, 3)));
  const mid = v128.add<f64>(v128.shuffle<f64>(a2, b2, 0, 2), v128.mul<f64>(u, v128.shuffle<f64>(a2, b2, 1, 3)));
  const top = v128.add<f64>(v128.shuffle<f64>(a3, b3, 0, 2), v128.mul<f64>(u, v128.shuffle<f64>(a3, b3, 1, 3)));
  return v128.add<f64>(low, v128.mul<f64>(uu, v128.add<f64>(mid, v128.mul<f64>(uu, top))));
}

/**
 * Natural logarithm of a normal positive number, within one unit in the last place: x = 2^k·m, √½ < m < √2,
 * ln m = 2·atanh((m − 1)/(m + 1)) by the minimax series of fdlibm's e_log.c (Sun Microsystems 1993).
 */
export function logarithm(x: f64): f64 {
  let bits = reinterpret<i64>(x);
  bits += 0x3ff0000000000000 - 0x3fe6a09e00000000;
  const k = <f64>((bits >> 52) - 0x3ff);
  const m = reinterpret<f64>((bits & 0x000fffffffffffff) + 0x3fe6a09e00000000);
  const f = m - 1;
  const s = f / (2 + f);
  const z = s * s;
  const w = z * z;
  const odd = z * (0.6666666666666735 + w * (0.2857142874366239 + w * (0.1818357216161805 + w * 0.14798198605116586)));
  const even = w * (0.3999999999940942 + w * (0.22222198432149784 + w * 0.15313837699209373));
  const half = 0.5 * f * f;
  return k * 6.93147180369123816490e-1 - (half - (s * (half + odd + even) + k * 1.90821492927058770002e-10) - f);
}
