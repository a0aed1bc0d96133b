// The one resistivity that a hand calculation would put in place of two layers.

import { soilImages } from '../soil/image-list.ts';
import type { SoilModel } from '../soil/soil-model.ts';
import { apparentResistivity } from './forward.ts';

export interface EquivalentResistivity {
  readonly name: string;
  readonly source: string;
  /** Ω·m */
  readonly resistivity: number;
}

/** Spacings of the survey that a hand calculation would average, in thicknesses of the upper layer. */
const AVERAGED_SPACINGS = [0.25, 0.5, 1, 2, 4, 8] as const;

/** Empty for soils of other than two layers. */
export function equivalentUniformResistivities(soil: SoilModel): readonly EquivalentResistivity[] {
  const [upper, lower] = soil.layers;
  if (soil.layers.length !== 2 || upper === undefined || lower === undefined) return [];
  const images = soilImages(soil);
  const readings = AVERAGED_SPACINGS.map((share) =>
    apparentResistivity(images, { kind: 'wenner', spacing: share * upper.thickness, pinDepth: 0 }),
  );
  const mean = readings.reduce((sum, rho) => sum + rho, 0) / readings.length;
  return [
    {
      name: 'mean of apparent resistivities read at a quarter to eight thicknesses of the upper layer',
      source: 'IEEE Std 80-2000, 13.4.1, eq. 50 (from memory)',
      resistivity: mean,
    },
    {
      name: 'half of the largest and smallest of the same readings',
      source: 'IEEE Std 80-2000, 13.4.1, eq. 51 (from memory)',
      resistivity: (Math.max(...readings) + Math.min(...readings)) / 2,
    },
    { name: 'upper layer alone', source: 'common practice, no source', resistivity: upper.resistivity },
    { name: 'lower layer alone', source: 'common practice, no source', resistivity: lower.resistivity },
  ];
}
