// What the soil's ignorance does to the answer: resistance, rise, touch and step voltage over the family of soils.
import {
  areaRegion,
  bandOf,
  type FamilyMember,
  interfaceDepths,
  latticeSummits,
  leakageOperator,
  regionMask,
  type SoilModel,
  segmentMesh,
  soilImages,
  solveGraph,
  surfacePotentials,
} from '@ohmstead/core';
import type { GroundResult, Spread } from '../ground.ts';
import type { CaseResult } from '../results.ts';
import { assessedBox, lineReach } from './extent.ts';
import type { Running, Solved } from './levels.ts';
import type { Prepared } from './prepare.ts';

/** Soils of the family that are solved: with 40, the 5 % and 95 % marks are the second from either end. */
const SOLVED_MEMBERS = 40;
/** Places tried for the worst touch voltage, and for the worst step, of every soil: the highest of the best fit's map. */
const PLACES = 24;
/** Image error asked for: a hundredth of a percent is far inside the family's spread. */
const IMAGE_TOLERANCE = 1e-5;

/** One soil on the coarsest mesh: by place of injection, resistance and the worst of the places, in Ω. */
interface Response {
  readonly resistance: number;
  readonly touch: number;
  readonly step: number;
}

interface Places {
  readonly touch: readonly (readonly [number, number])[];
  readonly step: readonly (readonly [from: readonly [number, number], to: readonly [number, number]])[];
}

/**
 * Solves members of the family on the coarsest mesh and carries their ratio to the best fit, solved alike, over to the
 * fine results of the best fit.
 */
export async function consequenceOf(
  prepared: Prepared,
  solved: Solved,
  cases: readonly CaseResult[],
  members: readonly FamilyMember[],
  { progress, crew }: Running,
): Promise<GroundResult['consequence']> {
  const places = placesOf(prepared, solved);
  const chosen = strided(members, SOLVED_MEMBERS);
  const best = await respond(prepared, solved, prepared.soil, places, crew);
  const responses: Response[][] = [];
  for (const { soil } of chosen) {
    await progress('solving soils that the readings allow', responses.length / chosen.length);
    responses.push(await respond(prepared, solved, soil, places, crew));
  }
  const spread = (unit: number, value: number, pick: (response: Response) => number): Spread => ({
    best: value,
    ...bandOf(responses.map((units) => (value * pick(units[unit]!)) / pick(best[unit]!))),
  });
  const first = solved.unitOfCase[0]!;
  return {
    resistance_ohm: spread(first, solved.units[first]!.resistance, (r) => r.resistance),
    cases: cases.map((result, c) => {
      const unit = solved.unitOfCase[c]!;
      return {
        name: result.name,
        gpr_V: spread(unit, result.gpr_V, (r) => r.resistance),
        touch_V: spread(unit, result.touch.worst_V, (r) => r.touch),
        step_V: spread(unit, result.step.worst_V, (r) => r.step),
      };
    }),
  };
}

/** Evenly chosen from the closest to the farthest. */
function strided<T>(list: readonly T[], count: number): T[] {
  const taken = Math.min(count, list.length);
  return Array.from({ length: taken }, (_, k) => list[Math.floor(((k + 0.5) * list.length) / taken)]!);
}

function placesOf(prepared: Prepared, solved: Solved): Places {
  const units = solved.units.flatMap((unit) => unit.zones);
  const summits = latticeSummits(
    solved.units[0]!.touch,
    regionMask(solved.units[0]!.touch, areaRegion(prepared.touchArea)),
  );
  return {
    touch: [
      ...units.flatMap(({ touch }) => (touch === undefined ? [] : [[touch.x, touch.y] as const])),
      ...summits.slice(0, PLACES),
    ],
    step: units.flatMap(({ step }) => (step === undefined ? [] : [[step.from, step.to] as const])),
  };
}

async function respond(
  prepared: Prepared,
  solved: Solved,
  soil: SoilModel,
  places: Places,
  crew: Running['crew'],
): Promise<Response[]> {
  const mesh = segmentMesh(prepared.loaded.conductors, prepared.joints, interfaceDepths(soil), 0);
  const images = soilImages(soil, IMAGE_TOLERANCE);
  const nodes = solved.units.map((unit) => unit.injectionNode);
  const model = prepared.loaded.study.metal_model ?? 'resistive';
  const graph = await solveGraph(
    mesh,
    await leakageOperator(mesh, images, crew),
    nodes,
    prepared.resistancePerMetre,
    model,
  );
  const leakages = graph.units.map((unit) => unit.leakage);
  const surface = surfacePotentials(mesh, images, leakages, lineReach(mesh, assessedBox(prepared)));
  const at = (place: readonly [number, number]): Float64Array => {
    const values = new Float64Array(leakages.length);
    surface.at(place[0], place[1], values);
    return values;
  };
  const touch = places.touch.map(at);
  const step = places.step.map(([from, to]) => ({ from: at(from), to: at(to) }));
  return graph.units.map(({ resistance }, u) => ({
    resistance,
    touch: Math.max(...touch.map((values) => Math.abs(resistance - values[u]!))),
    step: Math.max(...step.map(({ from, to }) => Math.abs(from[u]! - to[u]!))),
  }));
}
