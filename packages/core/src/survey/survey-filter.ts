// A fast forward model for the arrays of one survey: each reading a fixed weighted sum of the ground's spectral kernel.
import { Matrix, QrDecomposition } from 'ml-matrix';
import {
  amplitudes,
  emptyReflections,
  interfaceReflections,
  layerAt,
  layerDepths,
  reflections,
} from '../soil/layer-kernel.ts';
import type { SoilModel } from '../soil/soil-model.ts';
import { type FourPinArray, geometricFactor, overPins, pinDistances } from './arrays.ts';

export interface SurveyFilter {
  readonly arrays: readonly FourPinArray[];
  /** Apparent resistivities over a soil, Ω·m, written into an array of shape [arrays]. */
  evaluate(soil: SoilModel, into: Float64Array): void;
}

/** Images for which the weights are made: from where they act as the pin itself, in shortest distances between pins … */
const NEAREST_IMAGE = 0.05;
/** … to where all pins see the same potential, in longest distances. */
const FARTHEST_IMAGE = 100;
const IMAGES_PER_DECADE = 9;
/** Wavenumbers, over the longest and the shortest distance; ranges and densities that err by 2e-6 on soils of contrast 10³. */
const LOWEST_WAVENUMBER = 0.06;
const HIGHEST_WAVENUMBER = 30;
const WAVENUMBERS_PER_DECADE = 9;
/** Keeps weights small, of the largest singular value; the error it adds is of the same size. */
const TIKHONOV = 1e-9;

/**
 * The kernel's part F(λ) beyond the pins themselves enters a reading as ∫F(λ)·Σ±J0(λr) dλ. With F = Σ a_j e^{−β_j λ},
 * fitted on fixed wavenumbers λ_i as the image lists are, the integral is Σ a_j Σ±1/√(r² + β_j²), which is linear in
 * F(λ_i): a digital filter in the sense of Ghosh (1971), but made by least squares for these very distances. Agrees with
 * `apparentResistivity` over contrasts of 10³ to 1e-5, to 1e-4 where long arrays have pins beneath a thin layer, and costs
 * microseconds. Pins are points at their depth, as there.
 */
export function surveyFilter(arrays: readonly FourPinArray[]): SurveyFilter {
  const distances = arrays.flatMap((array) => pinDistances(array).distance);
  const shortest = Math.min(...distances);
  const longest = Math.max(...distances);
  const wavenumbers = logSpaced(
    LOWEST_WAVENUMBER / longest,
    HIGHEST_WAVENUMBER / shortest,
    WAVENUMBERS_PER_DECADE,
  );
  const images = [0, ...logSpaced(NEAREST_IMAGE * shortest, FARTHEST_IMAGE * longest, IMAGES_PER_DECADE)];
  const weights = filterWeights(arrays, images, wavenumbers, longest);
  const pinPairs = arrays.map(
    (array) => (geometricFactor(array) / (4 * Math.PI)) * overPins(array, (r) => 1 / r),
  );
  const depths = [...new Set(arrays.map((array) => array.pinDepth))];
  const atDepth = depths.map((depth) => arrays.flatMap((array, i) => (array.pinDepth === depth ? [i] : [])));
  const kernel = new Float64Array(wavenumbers.length);
  const evaluate = (soil: SoilModel, into: Float64Array): void => {
    depths.forEach((depth, d) => {
      const layer =
        depth === 0 ? surfaceKernel(soil, wavenumbers, kernel) : pinKernel(soil, depth, wavenumbers, kernel);
      for (const i of atDepth[d]!) {
        const row = weights[i]!;
        // with the pins in the top layer the pin and its image in the air together give exactly 1
        let sum = layer === 0 ? 1 : pinPairs[i]!;
        for (let q = 0; q < kernel.length; q++) sum += row[q]! * kernel[q]!;
        into[i] = soil.layers[layer]!.resistivity * sum;
      }
    });
  };
  return { arrays, evaluate };
}

/** The kernel below for pins on the surface, where it is 4DE/(1 − DE) and needs the reflections from below alone. */
function surfaceKernel(soil: SoilModel, wavenumbers: Float64Array, into: Float64Array): number {
  const k = interfaceReflections(soil);
  const thickness = soil.layers.map((layer) => -2 * layer.thickness);
  for (let i = 0; i < wavenumbers.length; i++) {
    let beyond = 0;
    for (let q = k.length - 1; q >= 0; q--)
      beyond = ((k[q]! + beyond) / (1 + k[q]! * beyond)) * Math.exp(wavenumbers[i]! * thickness[q]!);
    into[i] = (4 * beyond) / (1 - beyond);
  }
  return 0;
}

/**
 * Kernel for source and field point both at a depth, less the direct term and, in the top layer, less the image in the air.
 * @returns the layer that holds the pins
 */
function pinKernel(soil: SoilModel, depth: number, wavenumbers: Float64Array, into: Float64Array): number {
  const depths = layerDepths(soil);
  const k = interfaceReflections(soil);
  const state = emptyReflections(soil.layers.length);
  const at = new Float64Array(4);
  const layer = layerAt(depths, depth);
  const below = depth - depths.top[layer]!;
  const above = depths.bottom[layer]! - depth;
  for (let i = 0; i < wavenumbers.length; i++) {
    const wavenumber = wavenumbers[i]!;
    reflections(soil, k, wavenumber, state);
    amplitudes(state, layer, layer, at);
    const decay = state.decay[layer]!;
    const up = below === 0 ? 1 : Math.exp(-2 * wavenumber * below);
    const down = below === 0 ? decay : Math.exp(-2 * wavenumber * above);
    into[i] = (layer === 0 ? at[1]! - 1 : at[1]!) * up + at[2]! * down + 2 * at[3]! * decay;
  }
  return layer;
}

/** Weights of the kernel's samples in each reading; shape [arrays][wavenumbers]. */
function filterWeights(
  arrays: readonly FourPinArray[],
  images: readonly number[],
  wavenumbers: Float64Array,
  longest: number,
): Float64Array[] {
  const rows = wavenumbers.length;
  const columns = images.length;
  // low wavenumbers hardly change a difference of potentials: the kernel may grow there, as over rock, without spoiling the fit
  const scale = wavenumbers.map((wavenumber) => (wavenumber * longest) / (1 + wavenumber * longest));
  const basis = Matrix.zeros(rows + columns, columns);
  for (let i = 0; i < rows; i++)
    for (let j = 0; j < columns; j++) basis.set(i, j, scale[i]! * Math.exp(-images[j]! * wavenumbers[i]!));
  for (let j = 0; j < columns; j++) basis.set(rows + j, j, TIKHONOV);
  const factor = new QrDecomposition(basis);
  const q = factor.orthogonalMatrix;
  const r = factor.upperTriangularMatrix;
  return arrays.map((array) => {
    const unit = geometricFactor(array) / (4 * Math.PI);
    const y = new Float64Array(columns);
    for (let j = 0; j < columns; j++) {
      let rest = unit * overPins(array, (distance) => 1 / Math.hypot(distance, images[j]!));
      for (let l = 0; l < j; l++) rest -= r.get(l, j) * y[l]!;
      y[j] = rest / r.get(j, j);
    }
    return wavenumbers.map((_, i) => {
      let sum = 0;
      for (let j = 0; j < columns; j++) sum += q.get(i, j) * y[j]!;
      return scale[i]! * sum;
    });
  });
}

/** Points from `from` to `to`, evenly spaced in the logarithm. */
function logSpaced(from: number, to: number, perDecade: number): Float64Array {
  const intervals = Math.max(1, Math.ceil(Math.log10(to / from) * perDecade));
  return Float64Array.from({ length: intervals + 1 }, (_, i) => from * (to / from) ** (i / intervals));
}
