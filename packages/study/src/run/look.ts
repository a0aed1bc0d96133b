// Maps of one mesh and the worst places in them, by what lies under the feet.
import {
  adaptiveLattices,
  type Box,
  type Lattice,
  nodesReached,
  regionMask,
  stepLattice,
  touchLattice,
  type WorstPlace,
  type WorstStep,
  worstStep,
  worstTouch,
} from '@ohmstead/core';
import type { Level } from './level.ts';
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
  readonly touch: Lattice;
  readonly step: Lattice;
  readonly zones: readonly ZoneFound[];
}

/**
 * Maps and worst places of the first units of a level.
 * @param tolerance largest interpolation error of the maps, of the rise
 */
export function look(
  prepared: Prepared,
  level: Level,
  box: Box,
  spacing: number,
  tolerance: number,
  count: number,
): Found[] {
  const { surfaces, graph } = level;
  const maps = adaptiveLattices(
    surfaces,
    graph.units.map((unit) => tolerance * unit.resistance),
    box,
    spacing,
  );
  const nodes = nodesReached(maps[0]!, level.fields[0]!.nearest);
  const zones = zonesOf(prepared).map((zone) => ({
    ...zone,
    touchMask: regionMask(maps[0]!, zone.touch),
    stepMask: regionMask(maps[0]!, zone.step),
  }));
  return level.fields.slice(0, count).map(({ surface, metal }, u): Found => {
    const potential = maps[u]!;
    const { nodePotential } = graph.units[u]!;
    const touch = touchLattice(potential, (place) => nodePotential[nodes[place]!]!);
    const step = stepLattice(potential);
    return {
      potential,
      touch,
      step,
      zones: zones.map((zone) => ({
        footing: zone.footing,
        touch: worstTouch(touch, zone.touch, zone.touchMask, surface, metal, prepared.metalPlaces),
        step: worstStep(step, zone.step, zone.stepMask, surface, prepared.metalPlaces),
      })),
    };
  });
}
