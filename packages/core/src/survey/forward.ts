// What a four-pin array reads over layered ground, straight from the image list that the grid analysis uses too.
import type { SoilImages } from '../soil/image-list.ts';
import { pointPotential } from '../soil/point-potential.ts';
import { type FourPinArray, geometricFactor, overPins } from './arrays.ts';

/**
 * Apparent resistivity, Ω·m: geometric factor × (V_M − V_N)/I with each pin a point electrode at the pin depth in the
 * layered ground. On the surface and for Wenner this is ρ1{1 + 4Σ a_j[1/√(1 + (b_j/a)²) − 1/√(4 + (b_j/a)²)]} with
 * images a_j at distance b_j (IEEE Std 81 gives the two-layer series, b_n = 2nh; from memory). The same reading over
 * uniform ground is its resistivity, at any pin depth.
 */
export function apparentResistivity(images: SoilImages, array: FourPinArray): number {
  const depth = array.pinDepth;
  return geometricFactor(array) * overPins(array, (r) => pointPotential(images, depth, depth, r));
}
