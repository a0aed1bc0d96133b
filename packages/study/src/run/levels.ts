// Solves the graph on ever finer meshes until refinement moves the headline numbers little enough.
import {
  adaptiveLattice,
  type Box,
  type GraphSolution,
  type Lattice,
  leakageMatrix,
  type MetalPotential,
  MODEL_FLOOR,
  nearestNode,
  refinementUncertainty,
  type SegmentMesh,
  segmentMesh,
  type SoilImages,
  soilImages,
  solveGraph,
  type SurfacePotential,
  stepLattice,
  surfacePotential,
  touchLattice,
  type WorstPlace,
  type WorstStep,
  worstStep,
  worstTouch,
} from '@ohmstead/core';
import type { MeshLevel } from '../results.ts';
import type { Prepared } from './prepare.ts';
import { assessedBox, lineReach } from './extent.ts';

/** The response to one ampere at one place of injection: fields in Ω (V/A). */
export interface UnitField {
  readonly injectionNode: number;
  readonly surface: SurfacePotential;
  readonly metal: MetalPotential;
  readonly potential: Lattice;
  readonly touch: Lattice;
  readonly step: Lattice;
  readonly worstTouch: WorstPlace;
  readonly worstStep: WorstStep;
  readonly resistance: number;
  readonly resistanceUncertainty: number;
  readonly touchUncertainty: number;
  readonly stepUncertainty: number;
}

export interface Solved {
  readonly images: SoilImages;
  readonly mesh: SegmentMesh;
  readonly graph: GraphSolution;
  /** same order as the graph's units, which follow the distinct places of injection */
  readonly units: readonly UnitField[];
  /** case → index into units */
  readonly unitOfCase: readonly number[];
  /** one coarser solution, kept for the uncertainty of other quantities */
  readonly coarse: GraphSolution;
  readonly levels: readonly MeshLevel[];
}

export type Progress = (stage: string, share: number) => void;

/** Refinement goes on while the uncertainty is above these: of the resistance, of the touch voltage. */
const RESISTANCE_TARGET = 1e-3;
const TOUCH_TARGET = 5e-3;
/** A next level is not begun when it would need more segments than this: about a second of one core. */
const SEGMENT_CEILING = 4000;
const LAST_LEVEL = 5;
/** Lattice spacing, m: half a metre shows a mesh of 3 m; larger plans get at most this many points a side. */
const SPACING_M = 0.5;
const MOST_POINTS = 400;
/** The first map only finds where to look: it may be this much coarser. */
const SCOUT = 2;
/** Largest interpolation error of a map, of the rise. */
const MAP_TOLERANCE = 1e-3;

export function solveLevels(prepared: Prepared, progress: Progress): Solved {
  const images = soilImages(prepared.soil);
  const distinct = [...new Set(prepared.injectionNodes)];
  const box = assessedBox(prepared);
  const spacing = Math.max(SPACING_M, (box.east - box.west) / MOST_POINTS, (box.north - box.south) / MOST_POINTS);
  const at = (level: number): Level => {
    progress('solving the graph', level / (LAST_LEVEL + 2));
    const mesh = segmentMesh(prepared.loaded.conductors, prepared.joints, prepared.interfaces, level);
    const model = prepared.loaded.study.metal_model ?? 'resistive';
    const graph = solveGraph(mesh, leakageMatrix(mesh, images), distinct, prepared.resistancePerMetre, model);
    return { mesh, graph, fields: fieldsOf(prepared, images, graph, box) };
  };
  let coarse = at(0);
  let fine = at(1);
  let found = look(prepared, fine, box, spacing * SCOUT);
  const levels = [summary(coarse, found), summary(fine, found)];
  for (let level = 2; level <= LAST_LEVEL; level++) {
    if (wellResolved(coarse, fine, found) || 2 * fine.mesh.count > SEGMENT_CEILING) break;
    coarse = fine;
    fine = at(level);
    found = look(prepared, fine, box, spacing * SCOUT);
    levels.push(summary(fine, found));
  }
  progress('mapping the surface', (LAST_LEVEL + 1) / (LAST_LEVEL + 2));
  const units = look(prepared, fine, box, spacing).map((unit, u): UnitField => {
    const coarser = coarse.fields[u]!;
    const r = unit.resistance;
    return {
      ...unit,
      resistanceUncertainty: refinementUncertainty(coarse.graph.units[u]!.resistance, r, r),
      touchUncertainty: refinementUncertainty(touchAt(coarser, unit.worstTouch), unit.worstTouch.value, r),
      stepUncertainty: refinementUncertainty(stepAt(coarser, unit.worstStep), unit.worstStep.value, r),
    };
  });
  return {
    images,
    mesh: fine.mesh,
    graph: fine.graph,
    units,
    unitOfCase: prepared.injectionNodes.map((node) => distinct.indexOf(node)),
    coarse: coarse.graph,
    levels,
  };
}

interface Level {
  readonly mesh: SegmentMesh;
  readonly graph: GraphSolution;
  /** one a unit of the graph */
  readonly fields: readonly Field[];
}

interface Field {
  readonly surface: SurfacePotential;
  readonly metal: MetalPotential;
}

type Found = Omit<UnitField, 'resistanceUncertainty' | 'touchUncertainty' | 'stepUncertainty'>;

function fieldsOf(prepared: Prepared, images: SoilImages, graph: GraphSolution, box: Box): Field[] {
  const reach = lineReach(graph.mesh, box);
  return graph.units.map((unit) => {
    const nearest = nearestNode(graph.mesh, graph.mesh.nodeComponent[unit.injectionNode]!);
    return {
      surface: surfacePotential(graph.mesh, images, unit.leakage, reach),
      metal:
        prepared.loaded.study.metal_model === 'equipotential'
          ? () => unit.resistance
          : (x, y) => unit.nodePotential[nearest(x, y)]!,
    };
  });
}

/** Maps and worst places of every unit on one mesh. */
function look(prepared: Prepared, level: Level, box: Box, spacing: number): Found[] {
  return level.fields.map(({ surface, metal }, u) => {
    const { resistance, injectionNode } = level.graph.units[u]!;
    const potential = adaptiveLattice(surface, box, spacing, MAP_TOLERANCE * resistance);
    const touch = touchLattice(potential, metal);
    const step = stepLattice(potential);
    return {
      injectionNode,
      surface,
      metal,
      potential,
      touch,
      step,
      worstTouch: worstTouch(touch, surface, metal, prepared.touchArea),
      worstStep: worstStep(step, surface, prepared.stepArea),
      resistance,
    };
  });
}

function touchAt(field: Field, place: WorstPlace): number {
  return Math.abs(field.metal(place.x, place.y) - field.surface(place.x, place.y));
}

function stepAt(field: Field, place: WorstStep): number {
  return Math.abs(field.surface(place.from[0], place.from[1]) - field.surface(place.to[0], place.to[1]));
}

function wellResolved(coarse: Level, fine: Level, found: readonly Found[]): boolean {
  return found.every((unit, u) => {
    const r = unit.resistance;
    const change = refinementUncertainty(coarse.graph.units[u]!.resistance, r, r);
    const touch = touchAt(fine.fields[u]!, unit.worstTouch);
    const touchChange = refinementUncertainty(touchAt(coarse.fields[u]!, unit.worstTouch), touch, r);
    return change <= RESISTANCE_TARGET * r && touchChange <= TOUCH_TARGET * touch + MODEL_FLOOR * r;
  });
}

/** What the first place of injection reads on one mesh, at the worst places found. */
function summary(level: Level, found: readonly Found[]): MeshLevel {
  const resistance = level.graph.units[0]!.resistance;
  return {
    segment_count: level.mesh.count,
    resistance_ohm: resistance,
    worst_touch_ratio: touchAt(level.fields[0]!, found[0]!.worstTouch) / resistance,
    worst_step_ratio: stepAt(level.fields[0]!, found[0]!.worstStep) / resistance,
  };
}
