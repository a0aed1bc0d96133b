// Soils for tests, written as [resistivity Ω·m, thickness m] from the surface down.
import type { SoilModel } from '../../src/soil/soil-model.ts';

export function soil(...layers: readonly (readonly [resistivity: number, thickness?: number])[]): SoilModel {
  return {
    layers: layers.map(([resistivity, thickness]) => ({
      resistivity,
      thickness: thickness ?? Number.POSITIVE_INFINITY,
    })),
  };
}
