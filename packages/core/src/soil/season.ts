// A soil in another season: its top dried or frozen to a depth, or wet below a water table.
import type { SoilLayer, SoilModel } from './soil-model.ts';

/** What a season does to a soil. */
export type SeasonalChange =
  /** everything down to a depth takes one resistivity: dried or frozen ground */
  | { readonly kind: 'top'; readonly depth: number; readonly resistivity: number }
  /** everything below a depth takes one resistivity: ground under a water table */
  | { readonly kind: 'below'; readonly depth: number; readonly resistivity: number };

/** A rest of a layer thinner than this joins its neighbour, m: it moves nothing, and the image fit needs no finer scale. */
const THINNEST_REST_M = 0.01;

/**
 * The soil with a seasonal change; equal neighbouring layers are left apart.
 * @param change depth m, resistivity Ω·m, both positive
 */
export function seasonalSoil(soil: SoilModel, change: SeasonalChange): SoilModel {
  const { upper, lower } = cutSoil(soil, change.depth);
  const layers: SoilLayer[] =
    change.kind === 'top'
      ? [{ resistivity: change.resistivity, thickness: change.depth }, ...lower]
      : [...upper, { resistivity: change.resistivity, thickness: Number.POSITIVE_INFINITY }];
  return { layers };
}

/** Layers above and below a depth, the one that holds it cut in two; rests too thin to matter are given to the other side's neighbour. */
function cutSoil(soil: SoilModel, depth: number): { upper: SoilLayer[]; lower: SoilLayer[] } {
  const upper: SoilLayer[] = [];
  const lower: SoilLayer[] = [];
  let top = 0;
  for (const layer of soil.layers) {
    const above = Math.min(layer.thickness, Math.max(0, depth - top));
    const below = layer.thickness - above;
    if (above >= THINNEST_REST_M) upper.push({ ...layer, thickness: above });
    if (below >= THINNEST_REST_M) lower.push({ ...layer, thickness: below });
    top += layer.thickness;
  }
  return { upper: stretched(upper, depth), lower };
}

/** The layers with the last stretched to end at a depth. */
function stretched(layers: readonly SoilLayer[], depth: number): SoilLayer[] {
  const last = layers.at(-1);
  if (last === undefined) return [];
  const before = layers.slice(0, -1);
  const start = before.reduce((sum, layer) => sum + layer.thickness, 0);
  return [...before, { ...last, thickness: depth - start }];
}
