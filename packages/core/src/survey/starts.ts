// Where fits begin: soils read off the sounding curve, then soils by chance about it.
import type { RandomNumbers } from '../numerics/random.ts';
import { WENNER_MEDIAN_DEPTH, wennerEquivalent } from './investigation-depth.ts';
import { type ParameterBounds, parameterCount } from './model-parameters.ts';
import type { Reading } from './readings.ts';

/** Contrast of a layer to the curve, as a power of the curve's own contrast: readings average over layers, layers exceed them. */
const SHARPENING = 1.6;
/** Widest chance factor on a resistivity either way, as a logarithm: a factor of ten. */
const CHANCE = Math.log(10);

/**
 * Starting parameters, shape [count][2N − 1], within the bounds.
 * The first reads the curve at the median depth of each spacing, layers evenly spaced in ln depth; the second is the same
 * with contrasts sharpened; the rest have interfaces at chance depths and resistivities a chance factor off the curve.
 */
export function startingParameters(
  readings: readonly Reading[],
  layers: number,
  bounds: ParameterBounds,
  count: number,
  random: RandomNumbers,
): Float64Array[] {
  const curve = readings
    .map((reading): readonly [number, number] => [
      Math.log(WENNER_MEDIAN_DEPTH * wennerEquivalent(reading.array)),
      Math.log(reading.apparentResistivity),
    ])
    .sort((p, q) => p[0] - q[0]);
  const shallow = curve[0]![0];
  const deep = curve[curve.length - 1]![0];
  const mean = curve.reduce((sum, point) => sum + point[1], 0) / curve.length;
  return Array.from({ length: count }, (_, start) => {
    const interfaces = Array.from({ length: layers - 1 }, (__, i) =>
      start < 2
        ? shallow + ((deep - shallow) * (i + 1)) / layers
        : shallow + (deep - shallow) * (1.2 * random.uniform() - 0.1),
    ).sort((p, q) => p - q);
    const x = new Float64Array(parameterCount(layers));
    for (let i = 0; i < layers; i++) {
      const top = i === 0 ? shallow : interfaces[i - 1]!;
      const bottom = i === layers - 1 ? deep : interfaces[i]!;
      const value = curveAt(
        curve,
        layers === 1
          ? (shallow + deep) / 2
          : i === 0
            ? shallow
            : i === layers - 1
              ? deep
              : (top + bottom) / 2,
      );
      if (start === 0) x[i] = value;
      else if (start === 1) x[i] = mean + SHARPENING * (value - mean);
      else x[i] = value + CHANCE * (2 * random.uniform() - 1);
      if (i < layers - 1)
        x[layers + i] = Math.log(Math.exp(bottom) - (i === 0 ? 0 : Math.exp(interfaces[i - 1]!)));
    }
    return x.map((value, j) => Math.min(bounds.upper[j]!, Math.max(bounds.lower[j]!, value)));
  });
}

/** ln ρ at ln depth, straight between the readings. */
function curveAt(curve: readonly (readonly [number, number])[], depth: number): number {
  const next = curve.findIndex((point) => point[0] >= depth);
  if (next === -1) return curve[curve.length - 1]![1];
  if (next === 0) return curve[0]![1];
  const [d0, r0] = curve[next - 1]!;
  const [d1, r1] = curve[next]!;
  return r0 + ((r1 - r0) * (depth - d0)) / (d1 - d0);
}
