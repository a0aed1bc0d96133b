// The shapes of layered soils, their common scale set apart because the readings give it directly.
import type { RandomNumbers } from '../numerics/random.ts';
import type { ParameterBounds } from './model-parameters.ts';
import type { SurveyMisfit } from './survey-misfit.ts';

export interface SoilShapes {
  /** one of all shapes, evenly in the logarithms */
  draw(random: RandomNumbers): Float64Array;
  /** squares left at the best scale; Infinity outside the bounds */
  squares(shape: Float64Array): number;
  /** parameters of a soil of this shape, its scale drawn by chance */
  scaled(shape: Float64Array, random: RandomNumbers): Float64Array;
}

/**
 * Shape of a soil: [ln ρ2/ρ1 … ln ρN/ρ1, ln t1 … ln t(N−1)]. All resistivities times one factor shift every residual
 * alike, so the likelihood is integrated over that factor in closed form and the factor drawn afterwards: one number less
 * to search. Σ w(r + c)² = Σ w(r − r̄)² + (c + r̄)²·Σw.
 */
export function shapesOfSoil(
  misfit: SurveyMisfit,
  bounds: ParameterBounds,
  weights: Float64Array,
  scatter: number,
): SoilShapes {
  const n = bounds.lower.length;
  const layers = (n + 1) / 2;
  const count = weights.reduce((sum, w) => sum + w, 0);
  const x = new Float64Array(n);
  const residuals = new Float64Array(weights.length);
  const within = (j: number): boolean => x[j]! >= bounds.lower[j]! && x[j]! <= bounds.upper[j]!;
  /** Sets x to the shape at its best scale; the squares left, or Infinity outside the bounds. */
  const place = (shape: Float64Array): number => {
    x[0] = 0;
    x.set(shape, 1);
    for (let j = layers; j < n; j++) if (!within(j)) return Number.POSITIVE_INFINITY;
    misfit.residuals(x, residuals);
    let mean = 0;
    for (let i = 0; i < residuals.length; i++) mean += (weights[i]! * residuals[i]!) / count;
    for (let j = 0; j < layers; j++) {
      x[j]! -= mean;
      if (!within(j)) return Number.POSITIVE_INFINITY;
    }
    let squares = 0;
    for (let i = 0; i < residuals.length; i++) squares += weights[i]! * (residuals[i]! - mean) ** 2;
    return squares;
  };
  return {
    draw: (random) =>
      Float64Array.from({ length: n - 1 }, (_, q) => {
        const j = q + 1;
        const range = bounds.upper[j]! - bounds.lower[j]!;
        return j < layers ? range * (2 * random.uniform() - 1) : bounds.lower[j]! + range * random.uniform();
      }),
    squares: place,
    scaled: (shape, random) => {
      place(shape);
      const shift = (scatter * random.normal()) / Math.sqrt(count);
      return x.map((value, j) =>
        j < layers ? Math.min(bounds.upper[j]!, Math.max(bounds.lower[j]!, value + shift)) : value,
      );
    },
  };
}
