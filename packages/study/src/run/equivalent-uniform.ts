// The uniform soil that a hand calculation would use, and how far off it is.
import {
  equivalentUniformResistivities,
  leakageOperator,
  segmentMesh,
  soilImages,
  solveGraph,
} from '@ohmstead/core';
import type { EquivalentUniform } from '../ground.ts';
import type { Running, Solved } from './levels.ts';
import type { Prepared } from './prepare.ts';

/** Empty in uniform soil, and in soils of more layers than the hand rules are made for. */
export async function equivalentUniform(
  prepared: Prepared,
  solved: Solved,
  crew: Running['crew'],
): Promise<EquivalentUniform[]> {
  const values = equivalentUniformResistivities(prepared.soil);
  if (values.length === 0) return [];
  const { resistance, injectionNode } = solved.units[solved.unitOfCase[0]!]!;
  const perOhmMetre = await resistanceInUniformSoil(prepared, solved, injectionNode, crew);
  return values.map(({ name, source, resistivity }) => ({
    name,
    source,
    resistivity_ohm_m: resistivity,
    resistance_ohm: perOhmMetre * resistivity,
    deviation_percent: 100 * ((perOhmMetre * resistivity) / resistance - 1),
  }));
}

/**
 * Resistance in uniform soil of 1 Ω·m, perfect metal, Ω: it grows in proportion to the resistivity. Solved on the
 * coarsest mesh, and carried to the finest by what refinement did to the soil as given: what is left of the mesh's
 * error is a hundredth of what hand values are off by.
 */
async function resistanceInUniformSoil(
  prepared: Prepared,
  solved: Solved,
  node: number,
  crew: Running['crew'],
): Promise<number> {
  const mesh = segmentMesh(prepared.loaded.conductors, prepared.joints, [], 0);
  const images = soilImages({ layers: [{ resistivity: 1, thickness: Number.POSITIVE_INFINITY }] });
  const matrix = await leakageOperator(mesh, images, crew);
  const { units } = await solveGraph(mesh, matrix, [node], prepared.resistancePerMetre, 'equipotential');
  const at = solved.unitOfCase[0]!;
  const coarse = solved.series[0]!.graph.units[at]!.resistance;
  return (units[0]!.resistance * solved.units[at]!.resistance) / coarse;
}
