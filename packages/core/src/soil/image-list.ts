// A layered soil as short lists of real images: for a source in one layer and a field point in another,
// the potential is that of a few point sources at fixed depths in uniform ground.
import { Matrix, QrDecomposition } from 'ml-matrix';
import {
  amplitudes,
  emptyReflections,
  interfaceReflections,
  type LayerDepths,
  layerDepths,
  reflections,
} from './layer-kernel.ts';
import type { SoilModel } from './soil-model.ts';

/**
 * Images of a unit point current at depth d, seen from depth z at horizontal distance r:
 * φ = factor · Σ weight/√(r² + (z − sign·d − offset)²), in volt per ampere (ohm).
 * Entries up to `primaryCount` are the source itself and its first reflections, whose distance can be zero; the rest
 * stay a fraction of the thinnest layer away and make a smooth field.
 */
export interface ImageList {
  /** ρ of the source's layer/4π, Ω·m */
  readonly factor: number;
  readonly count: number;
  readonly primaryCount: number;
  /** +1: the source shifted; −1: mirrored; shape [count] */
  readonly sign: Int8Array;
  /** m, shape [count] */
  readonly offset: Float64Array;
  /** shape [count] */
  readonly weight: Float64Array;
  /** largest error of the fitted amplitudes at wavenumbers between the fitted ones, of the amplitude or of its own largest up to 1 */
  readonly error: number;
}

/** Lists for every pair of layers, made when first asked for. */
export interface SoilImages {
  readonly soil: SoilModel;
  readonly depths: LayerDepths;
  list(sourceLayer: number, fieldLayer: number): ImageList;
}

/** Amplitude error asked of a fit when the caller names none; three orders below the mesh's own error. */
export const IMAGE_TOLERANCE = 2e-8;
/**
 * Image distances per decade tried in turn until the tolerance is met, and the error that each reaches at best (seen
 * over random soils); those that cannot meet the tolerance are not tried.
 */
const NODES_PER_DECADE: readonly (readonly [perDecade: number, best: number])[] = [
  [5, 1e-6],
  [8, 1e-9],
  [10, 0],
  [12, 0],
];
/** Wavenumber samples per decade: well past two a node. */
const SAMPLES_PER_DECADE = 30;
/** Nearest image, in thicknesses of the thinnest layer: the first exact one stands at 2 thicknesses. */
const NEAREST = 0.5;
/** Farthest image, in depths of the whole stack times the largest resistivity contrast: beyond it amplitudes are flat. */
const FARTHEST = 20;
const FARTHEST_LEAST = 300;
/** Wavenumbers fitted: from where the farthest image is flat, times its distance, to where the nearest has vanished (e^{−15}), times the thinnest layer. */
const LOWEST_WAVENUMBER = 0.05;
const HIGHEST_WAVENUMBER = 30;
/** Tikhonov term: keeps weights of the order of the amplitudes without adding error above it. */
const TIKHONOV = 1e-12;
/** A weight below this moves no printed digit. */
const NEGLIGIBLE_WEIGHT = 1e-13;
/** An amplitude that differs from its own limit by less than this needs no fitted images. */
const FLAT = 1e-13;

/**
 * Image lists of a layered soil. Each amplitude of the spectral kernel is split in its limit at large wavenumber, which
 * is an exact image, and a rest fitted by Σ a_j e^{−β_j λ} with fixed log-spaced β_j, linear least squares on
 * log-spaced λ; every term is then a real image β_j farther away. Principle of complex images: Chow, Yang and
 * Srivastava, IEEE Trans. Power Delivery 7 (1992) (from memory); real images on fixed distances are ours.
 * @param soil layers from the surface down
 * @param tolerance amplitude error asked for, of max(1, |amplitude|)
 */
export function soilImages(soil: SoilModel, tolerance: number = IMAGE_TOLERANCE): SoilImages {
  const depths = layerDepths(soil);
  const known = new Map<string, ImageList>();
  const factors: SharedFactors = new Map();
  const list = (source: number, field: number): ImageList => {
    const key = `${source},${field}`;
    let images = known.get(key);
    if (images === undefined) {
      images =
        field >= source
          ? fitImages(soil, depths, source, field, tolerance, factors)
          : reversed(list(field, source));
      known.set(key, images);
    }
    return images;
  };
  return { soil, depths, list };
}

/** The list for a field point above the source, by reciprocity G(z, d) = G(d, z): shifts change their sense, mirrors do not. */
function reversed(images: ImageList): ImageList {
  return { ...images, offset: images.offset.map((offset, i) => (images.sign[i] === 1 ? -offset : offset)) };
}

/** One term of the kernel: amplitude × e^{−λ·distance}, as the images it stands for. */
interface Term {
  readonly amplitude: number;
  /** image of the extra distance β: [sign, offset at β = 0, change of offset with β] */
  readonly images: readonly (readonly [sign: 1 | -1, offset: number, growth: 1 | -1])[];
  /** whether the distance can be zero inside the two layers */
  readonly primary: boolean;
}

function kernelTerms(depths: LayerDepths, source: number, field: number): readonly Term[] {
  const top = depths.top[source]!;
  const bottom = depths.bottom[field]!;
  const span = bottom - top;
  if (source === field) {
    const terms: Term[] = [{ amplitude: 1, images: [[-1, 2 * top, -1]], primary: true }];
    if (bottom !== Number.POSITIVE_INFINITY) {
      terms.push({ amplitude: 2, images: [[-1, 2 * bottom, 1]], primary: true });
      terms.push({ amplitude: 3, images: [[1, 2 * span, 1], [1, -2 * span, -1]], primary: false }); // biome-ignore format: one row a term
    }
    return terms;
  }
  const terms: Term[] = [
    { amplitude: 0, images: [[1, 0, -1]], primary: true },
    { amplitude: 1, images: [[-1, 2 * top, -1]], primary: false },
  ];
  if (bottom !== Number.POSITIVE_INFINITY) {
    terms.push({ amplitude: 2, images: [[-1, 2 * bottom, 1]], primary: false });
    terms.push({ amplitude: 3, images: [[1, 2 * span, 1]], primary: false });
  }
  return terms;
}

function fitImages(
  soil: SoilModel,
  depths: LayerDepths,
  source: number,
  field: number,
  tolerance: number,
  factors: SharedFactors,
): ImageList {
  const layers = soil.layers.length;
  const k = interfaceReflections(soil);
  const state = emptyReflections(layers);
  const limit = new Float64Array(4);
  reflections(soil, k, Number.POSITIVE_INFINITY, state);
  amplitudes(state, source, field, limit);
  const fits = layers === 1 ? undefined : fitAmplitudes(soil, k, source, field, limit, tolerance, factors);

  const primary: [number, number, number][] = source === field ? [[1, 0, 1]] : [];
  const smooth: [number, number, number][] = [];
  for (const term of kernelTerms(depths, source, field)) {
    const weights = fits?.weights[term.amplitude];
    for (const [sign, offset, growth] of term.images) {
      const at = limit[term.amplitude]!;
      if (at !== 0) (term.primary ? primary : smooth).push([sign, offset, at]);
      weights?.forEach((weight, j) => {
        if (Math.abs(weight) > NEGLIGIBLE_WEIGHT)
          smooth.push([sign, offset + growth * fits!.distances[j]!, weight]);
      });
    }
  }
  const all = [...primary, ...smooth];
  return {
    factor: soil.layers[source]!.resistivity / (4 * Math.PI),
    count: all.length,
    primaryCount: primary.length,
    sign: Int8Array.from(all, (image) => image[0]),
    offset: Float64Array.from(all, (image) => image[1]),
    weight: Float64Array.from(all, (image) => image[2]),
    error: fits?.error ?? 0,
  };
}

interface AmplitudeFits {
  readonly distances: Float64Array;
  /** by amplitude; undefined where the limit alone is exact */
  readonly weights: readonly (Float64Array | undefined)[];
  readonly error: number;
}

/** Factors of the unscaled basis by its density: the same for every pair of a soil's layers. */
type SharedFactors = Map<number, QrDecomposition>;

function fitAmplitudes(
  soil: SoilModel,
  k: Float64Array,
  source: number,
  field: number,
  limit: Float64Array,
  tolerance: number,
  factors: SharedFactors,
): AmplitudeFits {
  const densities = NODES_PER_DECADE.filter(([, best]) => best <= tolerance).map(([perDecade]) => perDecade);
  let fits = fitWithNodes(soil, k, source, field, limit, densities[0]!, factors);
  for (const perDecade of densities.slice(1)) {
    if (fits.error <= tolerance) break;
    const finer = fitWithNodes(soil, k, source, field, limit, perDecade, factors);
    if (finer.error < fits.error) fits = finer;
  }
  return fits;
}

/**
 * The fit is made in units of the thinnest layer, so that soils of one shape get the same images whatever their size.
 */
function fitWithNodes(
  full: SoilModel,
  k: Float64Array,
  source: number,
  field: number,
  limit: Float64Array,
  perDecade: number,
  factors: SharedFactors,
): AmplitudeFits {
  const thinnest = Math.min(...full.layers.map((layer) => layer.thickness));
  const soil: SoilModel = {
    layers: full.layers.map((layer) => ({ ...layer, thickness: layer.thickness / thinnest })),
  };
  const stack = soil.layers.slice(0, -1).reduce((sum, layer) => sum + layer.thickness, 0);
  const resistivities = soil.layers.map((layer) => layer.resistivity);
  const contrast = Math.max(...resistivities) / Math.min(...resistivities);
  const near = NEAREST;
  const far = stack * Math.max(FARTHEST_LEAST, FARTHEST * contrast);
  const distances = logSpaced(near, far, perDecade, 0);
  const low = LOWEST_WAVENUMBER / far;
  const high = HIGHEST_WAVENUMBER;
  const fitted = sampleAmplitudes(soil, k, source, field, logSpaced(low, high, SAMPLES_PER_DECADE, 0));
  const between = sampleAmplitudes(soil, k, source, field, logSpaced(low, high, SAMPLES_PER_DECADE, 0.5));

  let error = 0;
  const weights = [0, 1, 2, 3].map((q): Float64Array | undefined => {
    const values = fitted.values[q]!;
    if (values.every((value) => Math.abs(value - limit[q]!) < FLAT)) return undefined;
    // a small amplitude counts against its own size: seen the other way round it is multiplied by the resistivities' ratio
    const own = Math.min(
      1,
      values.reduce((most, value) => Math.max(most, Math.abs(value)), 0),
    );
    const scale = values.map((value) => 1 / Math.max(1, Math.abs(value)));
    const plain = scale.every((s) => s === 1);
    const factor =
      (plain ? factors.get(perDecade) : undefined) ?? factorBasis(fitted.wavenumbers, scale, distances);
    if (plain) factors.set(perDecade, factor);
    const right = Matrix.zeros(values.length + distances.length, 1);
    values.forEach((value, i) => {
      right.set(i, 0, scale[i]! * (value - limit[q]!));
    });
    const solution = Float64Array.from(factor.solve(right).to1DArray());
    between.wavenumbers.forEach((wavenumber, i) => {
      let value = limit[q]!;
      for (let j = 0; j < distances.length; j++)
        value += solution[j]! * Math.exp(-distances[j]! * wavenumber);
      const exact = between.values[q]![i]!;
      error = Math.max(error, Math.abs(value - exact) / Math.max(own, Math.abs(exact)));
    });
    return solution;
  });
  return { distances: distances.map((distance) => distance * thinnest), weights, error };
}

/** QR of the basis e^{−β_j λ_i}, rows scaled, with the Tikhonov rows below. */
function factorBasis(
  wavenumbers: Float64Array,
  scale: Float64Array,
  distances: Float64Array,
): QrDecomposition {
  const rows = wavenumbers.length;
  const columns = distances.length;
  const basis = Matrix.zeros(rows + columns, columns);
  for (let i = 0; i < rows; i++)
    for (let j = 0; j < columns; j++) basis.set(i, j, scale[i]! * Math.exp(-distances[j]! * wavenumbers[i]!));
  for (let j = 0; j < columns; j++) basis.set(rows + j, j, TIKHONOV);
  return new QrDecomposition(basis);
}

interface AmplitudeSamples {
  readonly wavenumbers: Float64Array;
  /** by amplitude */
  readonly values: readonly Float64Array[];
}

function sampleAmplitudes(
  soil: SoilModel,
  k: Float64Array,
  source: number,
  field: number,
  wavenumbers: Float64Array,
): AmplitudeSamples {
  const state = emptyReflections(soil.layers.length);
  const at = new Float64Array(4);
  const values = [0, 1, 2, 3].map(() => new Float64Array(wavenumbers.length));
  wavenumbers.forEach((wavenumber, i) => {
    reflections(soil, k, wavenumber, state);
    amplitudes(state, source, field, at);
    for (let q = 0; q < 4; q++) values[q]![i] = at[q]!;
  });
  return { wavenumbers, values };
}

/** Points from `from` to `to`, evenly spaced in the logarithm, shifted by a share of one spacing. */
function logSpaced(from: number, to: number, perDecade: number, shift: number): Float64Array {
  const intervals = Math.max(1, Math.ceil(Math.log10(to / from) * perDecade));
  const count = shift === 0 ? intervals + 1 : intervals;
  return Float64Array.from({ length: count }, (_, i) => from * (to / from) ** ((i + shift) / intervals));
}
