// The spectral kernel of a layered soil: reflections seen downward and upward from each layer, and transmission.
import type { SoilModel } from './soil-model.ts';

/** Depth of the top of each layer and of its bottom (Infinity for the last), m; shape [layers]. */
export interface LayerDepths {
  readonly top: Float64Array;
  readonly bottom: Float64Array;
}

export function layerDepths(soil: SoilModel): LayerDepths {
  const count = soil.layers.length;
  const top = new Float64Array(count);
  const bottom = new Float64Array(count);
  let depth = 0;
  soil.layers.forEach((layer, i) => {
    top[i] = depth;
    depth += layer.thickness;
    bottom[i] = i === count - 1 ? Number.POSITIVE_INFINITY : depth;
  });
  return { top, bottom };
}

/** Depths of the interfaces, m, from the top; shape [layers − 1]. */
export function interfaceDepths(soil: SoilModel): number[] {
  return Array.from(layerDepths(soil).bottom.subarray(0, soil.layers.length - 1));
}

/** Layer that holds a depth; on an interface, the upper one. */
export function layerAt(depths: LayerDepths, depth: number): number {
  let layer = 0;
  while (layer < depths.bottom.length - 1 && depth > depths.bottom[layer]!) layer++;
  return layer;
}

/** Reflection at the bottom of layer i for a source in it, k_i = (ρ_{i+1} − ρ_i)/(ρ_{i+1} + ρ_i); shape [layers − 1]. */
export function interfaceReflections(soil: SoilModel): Float64Array {
  const k = new Float64Array(soil.layers.length - 1);
  for (let i = 0; i < k.length; i++) {
    const above = soil.layers[i]!.resistivity;
    const below = soil.layers[i + 1]!.resistivity;
    k[i] = (below - above) / (below + above);
  }
  return k;
}

/** Down- and up-looking reflections at one wavenumber, shape [layers] each. */
export interface Reflections {
  readonly down: Float64Array;
  readonly up: Float64Array;
  /** e^{−2λt} of each layer, 0 for the last */
  readonly decay: Float64Array;
}

/**
 * Reflection recursion with decaying exponentials only, so that no thickness or wavenumber overflows:
 * down: D_N = 0, D_i = (k_i + D_{i+1}E_{i+1})/(1 + k_i D_{i+1}E_{i+1});
 * up: U_1 = 1 (the air insulates), U_{i+1} = (−k_i + U_i E_i)/(1 − k_i U_i E_i); E_i = e^{−2λt_i}.
 * Source: the layered-earth recursion of Sunde (1949), written for point electrodes inside the layers.
 * @param wavenumber λ, 1/m; Infinity gives the reflections of the nearest interfaces alone
 */
export function reflections(soil: SoilModel, k: Float64Array, wavenumber: number, into: Reflections): void {
  const { down, up, decay } = into;
  const last = soil.layers.length - 1;
  for (let i = 0; i < last; i++) decay[i] = Math.exp(-2 * wavenumber * soil.layers[i]!.thickness);
  decay[last] = 0;
  down[last] = 0;
  for (let i = last - 1; i >= 0; i--) {
    const beyond = down[i + 1]! * decay[i + 1]!;
    down[i] = (k[i]! + beyond) / (1 + k[i]! * beyond);
  }
  up[0] = 1;
  for (let i = 0; i < last; i++) {
    const beyond = up[i]! * decay[i]!;
    up[i + 1] = (-k[i]! + beyond) / (1 - k[i]! * beyond);
  }
}

export function emptyReflections(layers: number): Reflections {
  return { down: new Float64Array(layers), up: new Float64Array(layers), decay: new Float64Array(layers) };
}

/**
 * Amplitudes of the exponentials in the kernel for a source in layer s and a field point in layer f ≥ s.
 * Same layer: direct e^{−λ|z−d|}, then [M·D, M·U, M·U·D] with M = 1/(1 − U D E).
 * Below: T·[1, U_s, D_f, U_s D_f] with T = M·Π_{q=s}^{f−1} (1 + D_q)/(1 + D_{q+1}E_{q+1}).
 * Result shape [4]; for the same layer the first entry is 0 (the direct term has no amplitude to fit).
 */
export function amplitudes(state: Reflections, source: number, field: number, into: Float64Array): void {
  const { down, up, decay } = state;
  const u = up[source]!;
  const multiple = 1 / (1 - u * down[source]! * decay[source]!);
  if (source === field) {
    into[0] = 0;
    into[1] = multiple * u;
    into[2] = multiple * down[source]!;
    into[3] = multiple * u * down[source]!;
    return;
  }
  let through = multiple;
  for (let q = source; q < field; q++) through *= (1 + down[q]!) / (1 + down[q + 1]! * decay[q + 1]!);
  into[0] = through;
  into[1] = through * u;
  into[2] = through * down[field]!;
  into[3] = through * u * down[field]!;
}
