// A case made ready: segments, images of the soil, and what the metal adds.
import {
  interfaceDepths,
  joinConductors,
  type SegmentMesh,
  type SoilImages,
  segmentMesh,
  soilImages,
} from '@ohmstead/core';
import { layeredSoil } from '@ohmstead/study';
import { latticeTable, type SoilName, soilLayers } from './bench-cases.ts';
import { twoLayerSeries } from './bench-series.ts';

export interface BenchSystem {
  readonly mesh: SegmentMesh;
  /** images as a study fits them */
  readonly images: SoilImages;
  /** images that all arms of a comparison share: the cut series in two layers, so that no script is slowed by their number */
  readonly shared: SoilImages;
  /** Ω/m by conductor; shares the current along the metal, moves nothing else */
  readonly ohmPerMetre: Float64Array;
}

/** 4·10⁻⁵ Ω/m: some 450 mm² of copper. */
const OHM_PER_METRE = 4e-5;

export function benchSystem(across: number, soilName: SoilName): BenchSystem {
  const table = latticeTable(across);
  const soil = layeredSoil(soilLayers[soilName]);
  const mesh = segmentMesh(table, joinConductors(table), interfaceDepths(soil), 0);
  const images = soilImages(soil);
  // fitted now: a study fits its soil once, whatever it then solves
  ownImages(mesh, images);
  return {
    mesh,
    images,
    shared: soilName === 'two layers' ? seriesImages(images) : images,
    ohmPerMetre: new Float64Array(table.count).fill(OHM_PER_METRE),
  };
}

/** The list that a lattice's segments, all in one layer, see of each other. */
export function ownImages({ layer }: SegmentMesh, images: SoilImages): ReturnType<SoilImages['list']> {
  return images.list(layer[0]!, layer[0]!);
}

function seriesImages({ soil, depths }: SoilImages): SoilImages {
  const [top, below] = soil.layers;
  const series = twoLayerSeries(top!.resistivity, below!.resistivity, top!.thickness);
  return { soil, depths, list: () => series };
}
