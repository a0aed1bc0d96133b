// Solves the graph on ever finer meshes until refinement moves the headline numbers little enough.
import {
  adaptiveLattices,
  areaMask,
  type Box,
  type GraphSolution,
  interfaceDepths,
  type Lattice,
  leakageOperator,
  type MetalPotential,
  MODEL_FLOOR,
  type NearestNode,
  nearestNode,
  nodesReached,
  onePotential,
  refinementUncertainty,
  type SegmentMesh,
  type SoilImages,
  type SurfacePotential,
  type SurfacePotentials,
  segmentMesh,
  soilImages,
  solveGraph,
  stepLattice,
  surfacePotentials,
  touchLattice,
  type WorstPlace,
  type WorstStep,
  worstStep,
  worstTouch,
} from '@ohmstead/core';
import { InputFaults } from '../fault.ts';
import { STUDY_FILE } from '../input/read-study-json.ts';
import type { MeshLevel } from '../results.ts';
import { assessedBox, lineReach } from './extent.ts';
import type { Prepared } from './prepare.ts';

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
const RESISTANCE_TARGET = 2e-3;
const TOUCH_TARGET = 1e-2;
/** A next level is not begun when it would need more segments than this: about a second of one core. */
const SEGMENT_CEILING = 4000;
const LAST_LEVEL = 5;
/** Most segments of the second mesh, which every study needs: a compressed leakage matrix of 0.4 GB and about a minute of one core. */
const MOST_SEGMENTS = 60_000;
/** Memory that a large electrode takes, a segment: 5.5 kB of compressed matrix were seen at 52 000, and the mesh besides. */
const BYTES_A_SEGMENT = 7000;
/** Lattice spacing, m: half a metre shows a mesh of 3 m; larger plans get at most this many points a side. */
const SPACING_M = 0.5;
const MOST_POINTS = 400;
/** The first map, of one unit, only finds where to look: it may be this much coarser. */
const SCOUT = 2;
/** Largest interpolation error of a map, of the rise. */
const MAP_TOLERANCE = 2e-3;
const SCOUT_TOLERANCE = 1e-2;

export function solveLevels(prepared: Prepared, progress: Progress): Solved {
  const images = soilImages(prepared.soil);
  const interfaces = interfaceDepths(prepared.soil);
  const distinct = [...new Set(prepared.injectionNodes)];
  const box = assessedBox(prepared);
  const spacing = Math.max(
    SPACING_M,
    (box.east - box.west) / MOST_POINTS,
    (box.north - box.south) / MOST_POINTS,
  );
  const meshAt = (level: number): SegmentMesh =>
    segmentMesh(prepared.loaded.conductors, prepared.joints, interfaces, level);
  refuseBeyondMemory(meshAt(1).count);
  const at = (level: number): Level => {
    progress('solving the graph', level / (LAST_LEVEL + 2));
    const mesh = meshAt(level);
    const model = prepared.loaded.study.metal_model ?? 'resistive';
    const graph = solveGraph(
      mesh,
      leakageOperator(mesh, images),
      distinct,
      prepared.resistancePerMetre,
      model,
    );
    return levelOf(images, graph, box);
  };
  let coarse = at(0);
  let fine = at(1);
  const scouted = look(prepared, fine, box, spacing * SCOUT, SCOUT_TOLERANCE, 1)[0]!;
  const levels = [summary(coarse, scouted), summary(fine, scouted)];
  for (let level = 2; level <= LAST_LEVEL; level++) {
    if (wellResolved(coarse, fine, scouted) || 2 * fine.mesh.count > SEGMENT_CEILING) break;
    coarse = fine;
    fine = at(level);
    levels.push(summary(fine, scouted));
  }
  progress('mapping the surface', (LAST_LEVEL + 1) / (LAST_LEVEL + 2));
  const units = look(prepared, fine, box, spacing, MAP_TOLERANCE, distinct.length).map(
    (unit, u): UnitField => {
      const coarser = coarse.fields[u]!;
      const r = unit.resistance;
      return {
        ...unit,
        resistanceUncertainty: refinementUncertainty(coarse.graph.units[u]!.resistance, r, r),
        touchUncertainty: refinementUncertainty(touchAt(coarser, unit.worstTouch), unit.worstTouch.value, r),
        stepUncertainty: refinementUncertainty(stepAt(coarser, unit.worstStep), unit.worstStep.value, r),
      };
    },
  );
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

/** @throws InputFaults when the two meshes that every study needs cannot be held */
function refuseBeyondMemory(segments: number): void {
  if (segments <= MOST_SEGMENTS) return;
  const gigabytes = ((segments * BYTES_A_SEGMENT) / 1e9).toFixed(1);
  throw new InputFaults([
    {
      file: STUDY_FILE,
      place: 'conductors',
      code: 'too-large',
      message: `the electrode needs ${segments} segments, about ${gigabytes} GB; at most ${MOST_SEGMENTS} segments are solved`,
    },
  ]);
}

interface Level {
  readonly mesh: SegmentMesh;
  readonly graph: GraphSolution;
  readonly surfaces: SurfacePotentials;
  /** one a unit of the graph */
  readonly fields: readonly Field[];
}

interface Field {
  readonly surface: SurfacePotential;
  readonly metal: MetalPotential;
  /** piece of metal that is energised */
  readonly component: number;
  readonly nearest: NearestNode;
}

type Found = Omit<UnitField, 'resistanceUncertainty' | 'touchUncertainty' | 'stepUncertainty'>;

function levelOf(images: SoilImages, graph: GraphSolution, box: Box): Level {
  const { mesh, units } = graph;
  const leakages = units.map((unit) => unit.leakage);
  const surfaces = surfacePotentials(mesh, images, leakages, lineReach(mesh, box));
  const nearestOf = new Map<number, NearestNode>();
  const fields = units.map((unit, u): Field => {
    const component = mesh.nodeComponent[unit.injectionNode]!;
    const nearest = nearestOf.get(component) ?? nearestNode(mesh, component);
    nearestOf.set(component, nearest);
    return {
      surface: onePotential(surfaces, u),
      metal: (x, y) => unit.nodePotential[nearest(x, y)]!,
      component,
      nearest,
    };
  });
  return { mesh, graph, surfaces, fields };
}

/** Maps and worst places of the first units on one mesh. */
function look(
  prepared: Prepared,
  level: Level,
  box: Box,
  spacing: number,
  tolerance: number,
  count: number,
): Found[] {
  const { surfaces, graph } = level;
  const fields = level.fields.slice(0, count);
  const tolerances = graph.units.map((unit) => tolerance * unit.resistance);
  const maps = adaptiveLattices(surfaces.at, tolerances, box, spacing);
  const touchMask = areaMask(maps[0]!, prepared.touchArea);
  const stepMask = areaMask(maps[0]!, prepared.stepArea);
  const reached = new Map<number, Int32Array>();
  return fields.map(({ surface, metal, component, nearest }, u) => {
    const potential = maps[u]!;
    const { resistance, injectionNode, nodePotential } = graph.units[u]!;
    const nodes = reached.get(component) ?? nodesReached(potential, nearest);
    reached.set(component, nodes);
    const touch = touchLattice(potential, (place) => nodePotential[nodes[place]!]!);
    const step = stepLattice(potential);
    return {
      injectionNode,
      surface,
      metal,
      potential,
      touch,
      step,
      worstTouch: worstTouch(touch, touchMask, surface, metal, prepared.touchArea),
      worstStep: worstStep(step, stepMask, surface, prepared.stepArea),
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

/** Whether the last refinement moved every unit's resistance, and its touch voltage at the place found, little enough. */
function wellResolved(coarse: Level, fine: Level, found: Found): boolean {
  return fine.graph.units.every(({ resistance }, u) => {
    const change = refinementUncertainty(coarse.graph.units[u]!.resistance, resistance, resistance);
    const touch = touchAt(fine.fields[u]!, found.worstTouch);
    const touchChange = refinementUncertainty(
      touchAt(coarse.fields[u]!, found.worstTouch),
      touch,
      resistance,
    );
    return (
      change <= RESISTANCE_TARGET * resistance &&
      touchChange <= TOUCH_TARGET * touch + MODEL_FLOOR * resistance
    );
  });
}

/** What the first place of injection reads on one mesh, at the worst places found. */
function summary(level: Level, found: Found): MeshLevel {
  const resistance = level.graph.units[0]!.resistance;
  return {
    segment_count: level.mesh.count,
    resistance_ohm: resistance,
    worst_touch_ratio: touchAt(level.fields[0]!, found.worstTouch) / resistance,
    worst_step_ratio: stepAt(level.fields[0]!, found.worstStep) / resistance,
  };
}
