// Maps of one mesh and the worst places in them, by what lies under the feet.
import {
  type Box,
  type Lattice,
  latticeValue,
  nodesReached,
  regionMask,
  type SurfacePotential,
  stepLattice,
  touchLattice,
  type WorstPlace,
  type WorstStep,
  worstStep,
  worstTouch,
} from '@ohmstead/core';
import { type Level, stepAt, touchAt } from './level.ts';
import type { Prepared } from './prepare.ts';
import { type Footing, zonesOf } from './zones.ts';

/** The worst places of a zone; undefined where it holds no place. */
export interface ZoneFound {
  readonly footing: Footing;
  readonly touch: WorstPlace | undefined;
  readonly step: WorstStep | undefined;
}

export interface Found {
  readonly potential: Lattice;
  /** the potential at any place, as exact as the map */
  readonly surface: SurfacePotential;
  readonly touch: Lattice;
  readonly step: Lattice;
  readonly zones: readonly ZoneFound[];
}

/**
 * Maps and worst places of the first units of a level. Places are searched on the map's own field; their voltages are
 * then summed segment by segment.
 * @param searches begun at most for each worst place; the usual number where undefined
 * @param tolerance largest interpolation error of what sloped metal adds to the maps, of the rise
 */
export function look(
  prepared: Prepared,
  level: Level,
  box: Box,
  spacing: number,
  tolerance: number,
  count: number,
  searches?: number,
): Found[] {
  const { surfaces, graph } = level;
  const tolerances = graph.units.slice(0, count).map((unit) => tolerance * unit.resistance);
  const map = surfaces.map(box, spacing, tolerances);
  const grid = map.lattices[0]!;
  const nodes = nodesReached(grid, level.fields[0]!.nearest);
  const zones = zonesOf(prepared).map((zone) => ({
    ...zone,
    touchMask: regionMask(grid, zone.touch),
    stepMask: regionMask(grid, zone.step),
  }));
  const beside = prepared.metalPlaces;
  return level.fields.slice(0, count).map((field, u): Found => {
    const potential = map.lattices[u]!;
    const surface = map.potential(u);
    const { nodePotential } = graph.units[u]!;
    const touch = touchLattice(potential, (place) => nodePotential[nodes[place]!]!);
    const step = stepLattice(potential);
    const rough: SurfacePotential = (x, y) => latticeValue(potential, x, y);
    return {
      potential,
      surface,
      touch,
      step,
      zones: zones.map((zone) => {
        const worst = {
          touch: worstTouch(touch, zone.touch, zone.touchMask, surface, field.metal, beside, rough, searches),
          step: worstStep(step, zone.step, zone.stepMask, surface, beside, rough, searches),
        };
        return {
          footing: zone.footing,
          touch: worst.touch && { ...worst.touch, value: touchAt(field, worst.touch) },
          step: worst.step && { ...worst.step, value: stepAt(field, worst.step) },
        };
      }),
    };
  });
}
