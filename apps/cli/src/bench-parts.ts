// Parts of the main job by themselves, on the demonstration and on a large drawing.
import {
  adaptiveLattices,
  interfaceDepths,
  joinConductors,
  leakageMatrix,
  type SegmentMesh,
  type SoilImages,
  type SurfacePotentials,
  segmentMesh,
  soilImages,
  solveGraph,
  surfacePotentials,
} from '@ohmstead/core';
import { type LoadedStudy, layeredSoil } from '@ohmstead/study';
import { latticeTable, soilLayers } from './bench-cases.ts';
import { timed } from './bench-clock.ts';
import { spread } from './bench-statistics.ts';
import { spreadText, table } from './bench-table.ts';

const ROUNDS = 3;

/** An electrode solved, with the potential that it gives the surface. */
export interface Demonstration {
  readonly mesh: SegmentMesh;
  readonly images: SoilImages;
  readonly surfaces: SurfacePotentials;
  /** Ω */
  readonly rise: number;
}

/** The demonstration's second mesh at one ampere. */
export async function demonstrationOf(loaded: LoadedStudy): Promise<Demonstration> {
  const soil = layeredSoil(loaded.study.soil.layers ?? []);
  const conductors = loaded.conductors;
  const mesh = segmentMesh(conductors, joinConductors(conductors), interfaceDepths(soil), 1);
  const images = soilImages(soil);
  const ohm = new Float64Array(conductors.count).fill(1e-4);
  const { units } = await solveGraph(mesh, await leakageMatrix(mesh, images), [0], ohm, 'equipotential');
  const surfaces = surfacePotentials(mesh, images, [units[0]!.leakage], 300);
  return { mesh, images, surfaces, rise: units[0]!.resistance };
}

export async function partRows({ mesh, surfaces, rise }: Demonstration): Promise<string[]> {
  const lattice = latticeTable(100);
  const four = layeredSoil(soilLayers['four layers']);
  const works: readonly (readonly [name: string, work: () => string])[] = [
    [
      'joining conductors',
      () => `${lattice.count} conductors into ${joinConductors(lattice).nodeCount} nodes`,
    ],
    [
      'image lists of a new soil',
      () => {
        const images = soilImages(four);
        const lists = four.layers.flatMap((_, s) => four.layers.map((_, f) => images.list(s, f)));
        const worst = Math.max(...lists.map((list) => list.error));
        return `4 layers, all ${lists.length} pairs, error ${worst.toExponential(1)}`;
      },
    ],
    [
      'map of the demonstration’s areas',
      () => {
        const box = { west: -5, south: -5, east: 65, north: 50 };
        const [map] = adaptiveLattices(surfaces, [2e-3 * rise], box, 0.5);
        return `${map!.nx} × ${map!.ny} places, ${map!.evaluated} computed, ${mesh.count} segments`;
      },
    ],
  ];
  const rows: string[][] = [];
  for (const [name, work] of works) {
    const runs = [];
    for (let round = 0; round < ROUNDS; round++) runs.push(await timed(work));
    rows.push([name, spreadText(spread(runs.map(({ wallMs }) => wallMs)), ''), runs[0]!.result]);
  }
  return table(['part', 'ms', 'what it did'], rows);
}
