// The graph on one mesh, with the fields that are asked of it.
import {
  type Box,
  type GraphSolution,
  type MetalPotential,
  type NearestNode,
  nearestNode,
  onePotential,
  type SoilImages,
  type SurfacePotential,
  type SurfacePotentials,
  surfacePotentials,
  type WorstPlace,
  type WorstStep,
} from '@ohmstead/core';
import { lineReach } from './extent.ts';

/** One place of injection: responses in Ω (V/A). */
export interface Field {
  readonly surface: SurfacePotential;
  readonly metal: MetalPotential;
  readonly nearest: NearestNode;
}

export interface Level {
  readonly graph: GraphSolution;
  readonly surfaces: SurfacePotentials;
  /** one a unit of the graph */
  readonly fields: readonly Field[];
}

export function levelOf(images: SoilImages, graph: GraphSolution, box: Box): Level {
  const { mesh, units } = graph;
  const leakages = units.map((unit) => unit.leakage);
  const surfaces = surfacePotentials(mesh, images, leakages, lineReach(mesh, box));
  // all places of injection lie on one piece of metal
  const nearest = nearestNode(mesh, mesh.nodeComponent[units[0]!.injectionNode]!);
  const fields = units.map(
    (unit, u): Field => ({
      surface: onePotential(surfaces, u),
      metal: (x, y) => unit.nodePotential[nearest(x, y)]!,
      nearest,
    }),
  );
  return { graph, surfaces, fields };
}

export function touchAt(field: Field, place: WorstPlace): number {
  return Math.abs(field.metal(place.x, place.y) - field.surface(place.x, place.y));
}

export function stepAt(field: Field, place: WorstStep): number {
  return Math.abs(field.surface(place.from[0], place.from[1]) - field.surface(place.to[0], place.to[1]));
}
