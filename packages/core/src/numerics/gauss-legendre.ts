// Gauss–Legendre points and weights on [0, 1], any order, computed once.

export interface GaussRule {
  /** points in (0, 1), shape [order] */
  readonly points: Float64Array;
  /** weights summing to 1, shape [order] */
  readonly weights: Float64Array;
}

/** Newton on a Legendre root gains digits quadratically; from the cosine guess four steps suffice, this is a ceiling. */
const NEWTON_LIMIT = 20;
/** below this step a root has all its digits */
const NEWTON_STEP = 1e-16;

const cache = new Map<number, GaussRule>();

/**
 * Points and weights of the Gauss–Legendre rule of the given order, mapped to [0, 1].
 * Roots of P_n by Newton from cos(π(i − 1/4)/(n + 1/2)); w = 2/((1 − x²)P'_n²) (Abramowitz & Stegun 1964, 25.4.29).
 * @param order number of points, 1 or more
 */
export function gaussLegendre(order: number): GaussRule {
  const known = cache.get(order);
  if (known !== undefined) return known;
  const points = new Float64Array(order);
  const weights = new Float64Array(order);
  for (let i = 0; i < order; i++) {
    let x = Math.cos((Math.PI * (i + 0.75)) / (order + 0.5));
    let slope = 1;
    for (let step = 0; step < NEWTON_LIMIT; step++) {
      let previous = 1;
      let value = x;
      for (let k = 2; k <= order; k++) {
        const next = ((2 * k - 1) * x * value - (k - 1) * previous) / k;
        previous = value;
        value = next;
      }
      slope = (order * (x * value - previous)) / (x * x - 1);
      const change = value / slope;
      x -= change;
      if (Math.abs(change) < NEWTON_STEP) break;
    }
    points[order - 1 - i] = 0.5 * (1 + x);
    weights[order - 1 - i] = 1 / ((1 - x * x) * slope * slope);
  }
  const rule: GaussRule = { points, weights };
  cache.set(order, rule);
  return rule;
}
