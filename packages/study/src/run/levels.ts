// Solves the graph on ever finer meshes until refinement moves the headline numbers little enough.
import {
  type Box,
  type Crew,
  type GraphSolution,
  interfaceDepths,
  leakageBytes,
  MODEL_FLOOR,
  refinementUncertainty,
  type SegmentMesh,
  type SoilImages,
  segmentMesh,
  solveGraph,
  type WorstPlace,
  type WorstStep,
} from '@ohmstead/core';
import { InputFaults } from '../fault.ts';
import { DEFAULT_METAL_MODEL } from '../input/defaults.ts';
import { STUDY_FILE } from '../input/read-study-json.ts';
import type { MeshLevel } from '../results.ts';
import { assessedBox } from './extent.ts';
import { type Field, type Level, levelOf, stepAt, touchAt } from './level.ts';
import { type Found, look } from './look.ts';
import type { Prepared } from './prepare.ts';
import { noMemory, type SolveMemory } from './solve-memory.ts';
import type { Footing } from './zones.ts';

/** A worst place with its numerical uncertainty. */
export type Uncertain<T> = T & { readonly uncertainty: number };

export interface ZoneWorst {
  readonly footing: Footing;
  readonly touch: Uncertain<WorstPlace> | undefined;
  readonly step: Uncertain<WorstStep> | undefined;
}

/** The response to one ampere at one place of injection: fields in Ω (V/A). */
export interface UnitField extends Omit<Found, 'zones'>, Field {
  readonly injectionNode: number;
  readonly resistance: number;
  readonly resistanceUncertainty: number;
  readonly zones: readonly ZoneWorst[];
}

export interface Solved {
  readonly images: SoilImages;
  readonly mesh: SegmentMesh;
  readonly graph: GraphSolution;
  /** same order as the graph's units, which follow the distinct places of injection */
  readonly units: readonly UnitField[];
  /** case → index into units */
  readonly unitOfCase: readonly number[];
  /** every mesh solved, coarse to fine, the last being the one above */
  readonly series: readonly Level[];
  readonly levels: readonly MeshLevel[];
}

/** Told of the stage in words and the share done; it may take its time, or end the work by throwing. */
export type Progress = (stage: string, share: number) => void | Promise<void>;

/** Refinement goes on while an uncertainty is above these: of the resistance, of touch and of step voltage. */
const RESISTANCE_TARGET = 2e-3;
const TOUCH_TARGET = 1e-2;
const STEP_TARGET = 2e-2;
/** A next level is not begun when it would need more segments than this: about a second of one core. */
const SEGMENT_CEILING = 4000;
/** Meshes that show a ratio of changes. */
const WANTED_LEVELS = 3;
const LAST_LEVEL = 6;
/** Memory that may be taken where the caller does not know of more: what a browser's tab and a small machine have. */
const USUAL_MEMORY_BYTES = 2e9;
/** Below this many segments no machine that runs the program is too small: 0.1 GB. */
const UNPLANNED_SEGMENTS = 10_000;
/** Of the mesh, its graph and its fields besides the leakage matrix, a segment; 0.6 kB were seen at 50 000. */
const MESH_BYTES = 1000;
/**
 * Lattice spacing, m: half a metre shows a mesh of 3 m. Small plans get this many points along the longer side, down to
 * the finest spacing; large ones at most this many.
 */
const SPACING_M = 0.5;
const FINEST_SPACING_M = 0.2;
const WANTED_POINTS = 150;
const MOST_POINTS = 400;
/** The first map, of one unit, only finds where to look: it may be this much coarser. */
const SCOUT = 2;
/** Largest interpolation error of a map, of the rise. */
const MAP_TOLERANCE = 2e-3;
const SCOUT_TOLERANCE = 1e-2;
/** It searches from the highest place alone. */
const SCOUT_SEARCHES = 1;
/** The map must also show the worst touch and step voltage found by the scout, to this share of them. */
const MAP_SHARE = 0.02;

/** What goes with long work. */
export interface Running {
  readonly progress: Progress;
  /** shares in large work; changes no bit of what is found */
  readonly crew?: Crew | undefined;
  /** what earlier computations left; nothing where undefined */
  readonly memory?: SolveMemory | undefined;
  /** memory that may be taken, bytes */
  readonly memoryBytes?: number | undefined;
}

export interface LevelsOptions extends Running {
  /** given what the first two meshes tell, with its uncertainty, before the finer ones are solved */
  readonly onFirst?: ((first: Solved) => void | Promise<void>) | undefined;
}

export async function solveLevels(prepared: Prepared, options: LevelsOptions): Promise<Solved> {
  const { progress, crew, onFirst, memory = noMemory } = options;
  const images = memory.images(prepared.soil);
  const interfaces = interfaceDepths(prepared.soil);
  const distinct = [...new Set(prepared.injectionNodes)];
  const box = assessedBox(prepared);
  const spacing = latticeSpacing(box);
  const meshAt = (level: number): SegmentMesh =>
    segmentMesh(prepared.loaded.conductors, prepared.joints, interfaces, level);
  // every study needs its second mesh
  refuseBeyond(options.memoryBytes ?? USUAL_MEMORY_BYTES, meshAt(1));
  const at = async (level: number): Promise<Level> => {
    await progress('solving the graph', level / (LAST_LEVEL + 2));
    const mesh = meshAt(level);
    const model = prepared.loaded.study.metal_model ?? DEFAULT_METAL_MODEL;
    const graph = await solveGraph(
      mesh,
      await memory.matrix(mesh, images, level, crew),
      distinct,
      prepared.resistancePerMetre,
      model,
    );
    return levelOf(images, graph, box);
  };
  const solvedBy = (series: readonly Level[], found: readonly Found[]): Solved => ({
    images,
    mesh: series.at(-1)!.graph.mesh,
    graph: series.at(-1)!.graph,
    units: found.map((one, u) => unitField(series, u, one)),
    unitOfCase: prepared.injectionNodes.map((node) => distinct.indexOf(node)),
    series,
    levels: series.map((level) => summary(level, found[0]!)),
  });
  const series = [await at(0), await at(1)];
  const scouts = onFirst === undefined ? 1 : distinct.length;
  const scouted = look(prepared, series[1]!, box, spacing * SCOUT, SCOUT_TOLERANCE, scouts, SCOUT_SEARCHES);
  await onFirst?.(solvedBy(series, scouted));
  while (series.length <= LAST_LEVEL && 2 * series.at(-1)!.graph.mesh.count <= SEGMENT_CEILING) {
    if (series.length >= WANTED_LEVELS && wellResolved(series, scouted[0]!)) break;
    series.push(await at(series.length));
  }
  await progress('mapping the surface', (LAST_LEVEL + 1) / (LAST_LEVEL + 2));
  const fine = series.at(-1)!;
  const tolerance = mapTolerance(scouted[0]!, fine.graph.units[0]!.resistance);
  return solvedBy(series, look(prepared, fine, box, spacing, tolerance, distinct.length));
}

/** Half a metre; finer for small plans, coarser for large ones. */
function latticeSpacing(box: Box): number {
  const longest = Math.max(box.east - box.west, box.north - box.south);
  return Math.max(FINEST_SPACING_M, Math.min(SPACING_M, longest / WANTED_POINTS), longest / MOST_POINTS);
}

/** What was found for one place of injection on the finest of several meshes, with what the series leaves uncertain. */
function unitField(series: readonly Level[], u: number, found: Found): UnitField {
  const fine = series.at(-1)!;
  const { resistance, injectionNode } = fine.graph.units[u]!;
  return {
    ...fine.fields[u]!,
    ...found,
    injectionNode,
    resistance,
    resistanceUncertainty: refinementUncertainty(resistances(series, u), resistance),
    zones: found.zones.map(({ footing, touch, step }) => ({
      footing,
      touch: touch && { ...touch, uncertainty: touchUncertainty(series, u, touch) },
      step: step && { ...step, uncertainty: stepUncertainty(series, u, step) },
    })),
  };
}

/** @throws InputFaults when the two meshes that every study needs cannot be held */
function refuseBeyond(most: number, mesh: SegmentMesh): void {
  if (mesh.count <= UNPLANNED_SEGMENTS) return;
  const bytes = leakageBytes(mesh) + MESH_BYTES * mesh.count;
  if (bytes <= most) return;
  const gigabytes = (value: number): string => `${(value / 1e9).toFixed(1)} GB`;
  throw new InputFaults([
    {
      file: STUDY_FILE,
      place: 'conductors',
      code: 'too-large',
      message: `the electrode needs ${mesh.count} segments and about ${gigabytes(bytes)} of memory; this machine has ${gigabytes(most)} for it`,
    },
  ]);
}

function resistances(series: readonly Level[], u: number): number[] {
  return series.map((level) => level.graph.units[u]!.resistance);
}

function touchUncertainty(series: readonly Level[], u: number, place: WorstPlace): number {
  const values = series.map((level) => touchAt(level.fields[u]!, place));
  return refinementUncertainty(values, series.at(-1)!.graph.units[u]!.resistance);
}

function stepUncertainty(series: readonly Level[], u: number, place: WorstStep): number {
  const values = series.map((level) => stepAt(level.fields[u]!, place));
  return refinementUncertainty(values, series.at(-1)!.graph.units[u]!.resistance);
}

/** Whether every unit's resistance, and the voltages at the places found, are known well enough. */
function wellResolved(series: readonly Level[], found: Found): boolean {
  return series.at(-1)!.graph.units.every(({ resistance }, u) => {
    const field = series.at(-1)!.fields[u]!;
    const floor = MODEL_FLOOR * resistance;
    return (
      refinementUncertainty(resistances(series, u), resistance) <= RESISTANCE_TARGET * resistance &&
      found.zones.every(
        ({ touch, step }) =>
          (touch === undefined ||
            touchUncertainty(series, u, touch) <= TOUCH_TARGET * touchAt(field, touch) + floor) &&
          (step === undefined ||
            stepUncertainty(series, u, step) <= STEP_TARGET * stepAt(field, step) + floor),
      )
    );
  });
}

/** Largest interpolation error of the final map, of the rise: small against the worst voltages too. */
function mapTolerance(scouted: Found, resistance: number): number {
  const voltages = scouted.zones
    .flatMap(({ touch, step }) => [touch?.value, step?.value])
    .filter((v) => v !== undefined);
  return Math.min(MAP_TOLERANCE, (MAP_SHARE * Math.min(...voltages)) / resistance);
}

/** What the first place of injection reads on one mesh, at the worst places found. */
function summary(level: Level, found: Found): MeshLevel {
  const { resistance } = level.graph.units[0]!;
  const field = level.fields[0]!;
  const most = (values: readonly (number | undefined)[]): number =>
    Math.max(0, ...values.filter((v) => v !== undefined));
  return {
    segment_count: level.graph.mesh.count,
    resistance_ohm: resistance,
    worst_touch_ratio: most(found.zones.map(({ touch }) => touch && touchAt(field, touch))) / resistance,
    worst_step_ratio: most(found.zones.map(({ step }) => step && stepAt(field, step))) / resistance,
  };
}
