// Arc tangent and the angle of a point, of the kernels' own so that engines agree.

/**
 * Arc tangent of n/d, n ≥ 0, d ≥ 0, not both nothing: the ratio is brought to 7/16 and below by a shift to 0.5, 1, 1.5
 * or infinity in the division itself; minimax series of fdlibm's s_atan.c (Sun Microsystems 1993).
 */
@inline
function arcTangent(n: f64, d: f64): f64 {
  let base = 0.0;
  let rest = 0.0;
  let p = n;
  let q = d;
  if (n > 0.4375 * d) {
    if (n < 1.1875 * d) {
      if (n < 0.6875 * d) {
        base = 4.63647609000806093515e-1;
        rest = 2.26987774529616870924e-17;
        p = 2 * n - d;
        q = 2 * d + n;
      } else {
        base = 7.85398163397448278999e-1;
        rest = 3.06161699786838301793e-17;
        p = n - d;
        q = n + d;
      }
    } else if (n < 2.4375 * d) {
      base = 9.82793723247329054082e-1;
      rest = 1.39033110312309984516e-17;
      p = n - 1.5 * d;
      q = d + 1.5 * n;
    } else {
      base = 1.57079632679489655800;
      rest = 6.12323399573676603587e-17;
      p = -d;
      q = n;
    }
  }
  const x = p / q;
  const z = x * x;
  const w = z * z;
  const odd = z * (3.33333333333329318027e-1 + w * (1.42857142725034663711e-1 + w * (9.09088713343650656196e-2 + w * (6.66107313738753120669e-2 + w * (4.97687799461593236017e-2 + w * 1.62858201153657823623e-2)))));
  const even = w * (-1.99999999998764832476e-1 + w * (-1.11111104054623557880e-1 + w * (-7.69187620504482999495e-2 + w * (-5.83357013379057348645e-2 + w * -3.65315727442169155270e-2))));
  return base - (x * (odd + even) - rest - x);
}

/** Angle of (x, y) from the x axis, −π to π. */
export function angle(y: f64, x: f64): f64 {
  const a = arcTangent(abs<f64>(y), abs<f64>(x));
  return copysign<f64>(x < 0 ? 3.141592653589793 - a : a, y);
}
