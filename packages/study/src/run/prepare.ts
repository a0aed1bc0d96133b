// From a loaded study to what the solver needs: joined metal, roles, places of injection, areas, resistances.
import {
  type ConductorFault,
  type ConductorTable,
  conductorMaterials,
  defaultAreas,
  floatingJoined,
  type Joints,
  joinConductors,
  type SoilModel,
} from '@ohmstead/core';
import { type Fault, InputFaults } from '../fault.ts';
import { STUDY_FILE } from '../input/read-study-json.ts';
import type { ResultsWarning } from '../results.ts';
import type { LayerInput, LoadedStudy, Polygon } from '../study.ts';
import { drawingDoubts } from './drawing-doubts.ts';
import { listed } from './listed.ts';

export interface Prepared {
  readonly loaded: LoadedStudy;
  readonly soil: SoilModel;
  readonly joints: Joints;
  /** piece of metal of each conductor */
  readonly componentOf: Int32Array;
  /** by case, a node of the joints */
  readonly injectionNodes: readonly number[];
  /** pieces of metal that a case injects into */
  readonly energised: ReadonlySet<number>;
  /** by conductor, Ω/m */
  readonly resistancePerMetre: Float64Array;
  readonly touchArea: readonly Polygon[];
  readonly stepArea: readonly Polygon[];
  /** where the covering lies; undefined where there is none */
  readonly coveringArea: readonly Polygon[] | undefined;
  /** places by the metal where a map may miss a peak, free ends and shallow metal first */
  readonly metalPlaces: readonly (readonly [number, number])[];
  readonly assumptions: readonly ResultsWarning[];
  readonly warnings: readonly ResultsWarning[];
}

/** A place of injection farther than this from the node that takes it is worth a warning, m. */
const INJECTION_DISTANCE_M = 1;

/** @throws InputFaults with every fault of the drawing */
export function prepare(loaded: LoadedStudy, soil: SoilModel): Prepared {
  const { study, conductors } = loaded;
  const joints = joinConductors(conductors);
  const floating = new Set(study.electrodes?.filter((e) => e.role === 'floating').map((e) => e.name) ?? []);
  const drawing = joints.faults.length > 0 ? joints.faults : floatingJoined(conductors, joints, floating);
  if (drawing.length > 0) throw new InputFaults(drawing.map((fault) => located(fault, loaded)));

  const componentOf = componentsOfConductors(conductors, joints);
  const assumptions: ResultsWarning[] = [];
  const warnings: ResultsWarning[] = [];
  const candidates = energisedNodes(joints, componentOf, conductors, floating);
  if (candidates.length === 0)
    throw new InputFaults([
      {
        file: STUDY_FILE,
        place: 'conductors',
        code: 'nothing-leaks',
        message: 'no conductor of an energised electrode is bare: no current can enter the ground',
      },
    ]);
  const injectionNodes = study.cases.map((_, c) =>
    injectionNode(loaded, joints, candidates, c, assumptions, warnings),
  );
  refuseSeparateInjections(loaded, joints, injectionNodes);
  const energised = new Set(injectionNodes.map((node) => joints.nodeComponent[node]!));
  warnings.push(...unjoined(conductors, componentOf, energised, floating), ...nearMisses(conductors, joints));

  const members = Array.from({ length: conductors.count }, (_, i) => i).filter((i) =>
    energised.has(componentOf[i]!),
  );
  const areas = defaultAreas(conductors, members);
  if (study.areas?.touch === undefined)
    assumptions.push({
      code: 'touch-area-default',
      message:
        'touch is assessed inside the outer boundary of the closed meshes (without meshes: within 1 m of the conductors), supposing no accessible metal within arm’s reach outside it',
    });
  if (study.areas?.step === undefined)
    assumptions.push({
      code: 'step-area-default',
      message: 'step is assessed inside the same boundary grown by 3 m',
    });
  const touchArea = study.areas?.touch ?? areas.touch;
  const coveringArea = study.surfacing === undefined ? undefined : (study.surfacing.areas ?? touchArea);
  if (study.surfacing !== undefined && study.surfacing.areas === undefined)
    assumptions.push({
      code: 'covering-area-default',
      message:
        'the covering is taken to lie in the touch area and nowhere else: beyond it people stand on bare soil',
    });
  warnings.push(...drawingDoubts(conductors, joints, energised, componentOf, touchArea));
  assumptions.push({
    code: 'metal-cold-direct-current',
    message: 'metal has its direct-current resistance at 20 °C',
  });
  return {
    loaded,
    soil,
    joints,
    componentOf,
    injectionNodes,
    energised,
    resistancePerMetre: resistances(conductors),
    touchArea,
    stepArea: study.areas?.step ?? areas.step,
    coveringArea,
    metalPlaces: metalPlaces(joints),
    assumptions,
    warnings,
  };
}

/** Every case must enter the same piece of metal: areas and roles are those of one energised electrode. */
function refuseSeparateInjections(loaded: LoadedStudy, joints: Joints, nodes: readonly number[]): void {
  const [first] = nodes;
  const faults = nodes.flatMap((node, c): Fault[] =>
    joints.nodeComponent[node] === joints.nodeComponent[first!]
      ? []
      : [
          {
            file: STUDY_FILE,
            place: `cases[${c}].inject`,
            code: 'separate-injections',
            message: `case ${loaded.study.cases[c]!.name} enters metal that nothing joins to that of case ${loaded.study.cases[0]!.name}; give each its own study, with the other electrode floating`,
          },
        ],
  );
  if (faults.length > 0) throw new InputFaults(faults);
}

/** Most places by the metal that a search looks at. */
const MOST_METAL_PLACES = 300;

function metalPlaces(joints: Joints): (readonly [number, number])[] {
  const rank = (node: number): number => (joints.nodeDegree[node] === 1 ? -1 : joints.nodeDepth[node]!);
  return Array.from({ length: joints.nodeCount }, (_, node) => node)
    .sort((a, b) => rank(a) - rank(b) || a - b)
    .slice(0, MOST_METAL_PLACES)
    .map((node) => [joints.nodeX[node]!, joints.nodeY[node]!] as const);
}

function located(fault: ConductorFault, loaded: LoadedStudy): Fault {
  const origin = loaded.origins[fault.conductor]!;
  return {
    file: origin.file,
    line: origin.line,
    place: loaded.conductors.id[fault.conductor]!,
    code: fault.code,
    message: fault.message,
  };
}

/** The soil that layers of a study describe. */
export function layeredSoil(layers: readonly LayerInput[]): SoilModel {
  return {
    layers: layers.map((layer) => ({
      resistivity: layer.resistivity_ohm_m,
      thickness: layer.thickness_m ?? Number.POSITIVE_INFINITY,
    })),
  };
}

function componentsOfConductors(table: ConductorTable, joints: Joints): Int32Array {
  const of = new Int32Array(table.count);
  for (let piece = 0; piece < joints.pieceCount; piece++)
    of[joints.pieceConductor[piece]!] = joints.nodeComponent[joints.pieceNode1[piece]!]!;
  return of;
}

/** Nodes of metal that may take a fault: every piece with a bare conductor of an electrode that is not floating. */
function energisedNodes(
  joints: Joints,
  componentOf: Int32Array,
  table: ConductorTable,
  floating: ReadonlySet<string>,
): readonly number[] {
  const may = new Set<number>();
  for (let i = 0; i < table.count; i++)
    if (!floating.has(table.electrode[i]!) && table.insulated[i] !== 1) may.add(componentOf[i]!);
  return Array.from({ length: joints.nodeCount }, (_, node) => node).filter((node) =>
    may.has(joints.nodeComponent[node]!),
  );
}

function injectionNode(
  loaded: LoadedStudy,
  joints: Joints,
  candidates: readonly number[],
  at: number,
  assumptions: ResultsWarning[],
  warnings: ResultsWarning[],
): number {
  const given = loaded.study.cases[at]!;
  const allowed = given.inject === undefined ? ofLargestPiece(joints, candidates) : candidates;
  const place = given.inject ?? centroid(joints, allowed);
  let best = allowed[0]!;
  let least = Number.POSITIVE_INFINITY;
  for (const node of allowed) {
    const distance = Math.hypot(
      joints.nodeX[node]! - place.x_m,
      joints.nodeY[node]! - place.y_m,
      joints.nodeDepth[node]! - place.depth_m,
    );
    if (distance < least) {
      least = distance;
      best = node;
    }
  }
  const where = `(${joints.nodeX[best]!.toFixed(2)}, ${joints.nodeY[best]!.toFixed(2)}) m`;
  if (given.inject === undefined)
    assumptions.push({
      code: 'injection-at-centroid',
      message: `case ${given.name}: the fault enters at the node nearest the centroid, ${where}`,
    });
  else if (least > INJECTION_DISTANCE_M)
    warnings.push({
      code: 'injection-moved',
      message: `case ${given.name}: the nearest node of the energised metal, ${where}, is ${least.toFixed(2)} m from the place of injection given`,
    });
  return best;
}

/** Nodes of the piece with the most metal: a loose scrap must not become the electrode. */
function ofLargestPiece(joints: Joints, nodes: readonly number[]): readonly number[] {
  const lengths = new Map<number, number>();
  for (let piece = 0; piece < joints.pieceCount; piece++) {
    const a = joints.pieceNode1[piece]!;
    const b = joints.pieceNode2[piece]!;
    const component = joints.nodeComponent[a]!;
    const length = Math.hypot(
      joints.nodeX[b]! - joints.nodeX[a]!,
      joints.nodeY[b]! - joints.nodeY[a]!,
      joints.nodeDepth[b]! - joints.nodeDepth[a]!,
    );
    lengths.set(component, (lengths.get(component) ?? 0) + length);
  }
  const lengthOf = (node: number): number => lengths.get(joints.nodeComponent[node]!) ?? 0;
  const longest = nodes.reduce((most, node) => Math.max(most, lengthOf(node)), 0);
  return nodes.filter((node) => lengthOf(node) === longest);
}

function centroid(joints: Joints, nodes: readonly number[]): { x_m: number; y_m: number; depth_m: number } {
  const allowed = new Set(nodes);
  const sum = { x: 0, y: 0, z: 0, length: 0 };
  for (let piece = 0; piece < joints.pieceCount; piece++) {
    const a = joints.pieceNode1[piece]!;
    const b = joints.pieceNode2[piece]!;
    if (!allowed.has(a)) continue;
    const length = Math.hypot(
      joints.nodeX[b]! - joints.nodeX[a]!,
      joints.nodeY[b]! - joints.nodeY[a]!,
      joints.nodeDepth[b]! - joints.nodeDepth[a]!,
    );
    sum.x += (length * (joints.nodeX[a]! + joints.nodeX[b]!)) / 2;
    sum.y += (length * (joints.nodeY[a]! + joints.nodeY[b]!)) / 2;
    sum.z += (length * (joints.nodeDepth[a]! + joints.nodeDepth[b]!)) / 2;
    sum.length += length;
  }
  return { x_m: sum.x / sum.length, y_m: sum.y / sum.length, depth_m: sum.z / sum.length };
}

/** Conductors of an energised electrode that no metal joins to the place of any fault. */
function unjoined(
  table: ConductorTable,
  componentOf: Int32Array,
  energised: ReadonlySet<number>,
  floating: ReadonlySet<string>,
): ResultsWarning[] {
  const loose = new Map<number, string[]>();
  for (let i = 0; i < table.count; i++) {
    if (energised.has(componentOf[i]!) || floating.has(table.electrode[i]!)) continue;
    loose.set(componentOf[i]!, [...(loose.get(componentOf[i]!) ?? []), table.id[i]!]);
  }
  return [...loose.values()].map((ids) => ({
    code: 'piece-not-joined',
    message: `no metal joins ${listed(ids)} to the place of a fault: solved as floating`,
  }));
}

function nearMisses(table: ConductorTable, joints: Joints): ResultsWarning[] {
  return joints.nearMisses.map((miss) => ({
    code: 'near-miss',
    message: `an end of ${table.id[miss.conductor]!} stops ${(1000 * miss.distance).toFixed(0)} mm short of ${table.id[miss.other]!} at (${miss.x.toFixed(2)}, ${miss.y.toFixed(2)}) m: taken as not joined`,
  }));
}

function resistances(table: ConductorTable): Float64Array {
  return table.resistancePerMetre.map((given, i) =>
    Number.isNaN(given)
      ? conductorMaterials.get(table.material[i]!)!.resistivity20 / (Math.PI * table.radius[i]! ** 2)
      : given,
  );
}
