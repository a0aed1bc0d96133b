// The two-layer image series, cut short, as scripts use it: the list that all arms of a comparison share.
import type { ImageList } from '@ohmstead/core';

/** Reflections taken: what is cut off moves resistance by some 1e-3, as is usual; more would only slow the scripts. */
const TERMS = 8;

/**
 * Images of a source at depth d in the top layer, seen from the same depth: 1/r, its mirror in the surface, and for
 * each n Kⁿ at heights 2nh (twice, above and below), 2nh + 2d and 2nh − 2d, K = (ρ2 − ρ1)/(ρ2 + ρ1), h the top
 * layer's thickness (Tagg 1964, from memory). Equal heights are one image: 2 + 3·8 = 26.
 */
export function twoLayerSeries(top: number, below: number, thickness: number): ImageList {
  const reflection = (below - top) / (below + top);
  const images: [sign: number, offset: number, weight: number][] = [
    [1, 0, 1],
    [-1, 0, 1],
  ];
  for (let n = 1; n <= TERMS; n++) {
    const weight = reflection ** n;
    const offset = 2 * n * thickness;
    images.push([-1, offset, weight], [-1, -offset, weight], [1, offset, 2 * weight]);
  }
  return {
    factor: top / (4 * Math.PI),
    count: images.length,
    // the source, its mirror in the surface and its mirror in the interface, which metal can come near to
    primaryCount: 3,
    sign: Int8Array.from(images, ([sign]) => sign),
    offset: Float64Array.from(images, ([, offset]) => offset),
    weight: Float64Array.from(images, ([, , weight]) => weight),
    error: 2 * reflection ** (TERMS + 1),
  };
}
