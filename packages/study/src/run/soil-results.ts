// A soil as the results file writes it.
import type { SoilModel } from '@ohmstead/core';
import type { Results } from '../results.ts';

export function layersOf(soil: SoilModel): Results['soil']['layers'] {
  return soil.layers.map(({ resistivity, thickness }) => ({
    resistivity_ohm_m: resistivity,
    thickness_m: Number.isFinite(thickness) ? thickness : null,
  }));
}
