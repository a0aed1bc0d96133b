// Maps of the surface potential, timed by the compiled kernel and by its plain twin, with the error at random points.
import {
  interfaceDepths,
  joinConductors,
  type Lattice,
  leakageOperator,
  potentialAt,
  type SegmentMesh,
  type SoilImages,
  segmentMesh,
  soilImages,
  solveGraph,
  surfacePotentials,
  useKernels,
} from '@ohmstead/core';
import { layeredSoil } from '@ohmstead/study';
import { latticeTable } from './bench-cases.ts';
import type { Findings } from './bench-claims.ts';
import { timed } from './bench-clock.ts';
import { seeded } from './bench-seed.ts';
import type { Part } from './bench-stage.ts';
import { spread } from './bench-statistics.ts';
import { relative, short, spreadText, table } from './bench-table.ts';

interface MapCase {
  readonly key: keyof Findings & ('mapSmall' | 'mapLarge');
  /** meshes along a side of the lattice: 4·across·(across + 1) segments */
  readonly across: number;
  /** points of the map each way, at least */
  readonly points: number;
  readonly rounds: number;
  /** rounds that the plain twin takes part in */
  readonly plainRounds: number;
}

const mapCases: readonly MapCase[] = [
  { key: 'mapSmall', across: 10, points: 150, rounds: 40, plainRounds: 10 },
  { key: 'mapLarge', across: 49, points: 1000, rounds: 12, plainRounds: 2 },
];

/** Three layers: a good one between, so that images have both signs. */
const layers = [
  { resistivity_ohm_m: 100, thickness_m: 2 },
  { resistivity_ohm_m: 400, thickness_m: 4 },
  { resistivity_ohm_m: 50 },
];

/** Ground around the lattice, m. */
const MARGIN = 5;
/** Random points of the map that are compared with the images summed one by one, and their seed. */
const COMPARED = 100;
const SEED = 9;

/** A table of the maps, and the medians of their wall time. */
export async function mapsPart(): Promise<Part> {
  const rows: string[][] = [];
  const findings: { -readonly [key in keyof Findings]: Findings[key] } = {};
  for (const one of mapCases) {
    const { cells, median } = await mapRow(one);
    rows.push(cells);
    findings[one.key] = median;
  }
  const header = ['map, one thread', 'segments', 'kernel, ms', 'plain twin, ms', 'twin over kernel', 'error at random points, of the rise', 'error stated']; // biome-ignore format: a header
  return { lines: table(header, rows), findings };
}

/** The same rows as text. */
export async function mapRows(): Promise<readonly string[]> {
  return (await mapsPart()).lines;
}

async function mapRow(one: MapCase): Promise<{ cells: string[]; median: number }> {
  const conductors = latticeTable(one.across);
  const soil = layeredSoil(layers);
  const mesh = segmentMesh(conductors, joinConductors(conductors), interfaceDepths(soil), 0);
  const images = soilImages(soil);
  const ohm = new Float64Array(conductors.count).fill(1e-4);
  const { units } = await solveGraph(mesh, await leakageOperator(mesh, images), [0], ohm, 'equipotential');
  const { leakage, resistance } = units[0]!;
  const width = conductors.x2.reduce((most, x) => Math.max(most, x), 0);
  const box = { west: -MARGIN, south: -MARGIN, east: width + MARGIN, north: width + MARGIN };
  const spacing = (width + 2 * MARGIN) / (one.points - 1);
  const surfaces = surfacePotentials(mesh, images, [leakage], 2 * width + 10 * MARGIN);
  const map = () => surfaces.map(box, spacing, [resistance]).lattices[0]!;
  const wall: [plain: number[], kernel: number[]] = [[], []];
  for (let round = 0; round < one.rounds; round++)
    for (const arm of [0, 1] as const) {
      if (arm === 0 && round >= one.plainRounds) continue;
      useKernels(arm === 1);
      wall[arm].push((await timed(map)).wallMs);
    }
  useKernels(true);
  const lattice = map();
  // the first half of the rounds warms up
  const [plain, kernel] = wall.map((all) => spread(all.slice(all.length >> 1)));
  return {
    median: kernel!.median,
    cells: [
      `${lattice.nx} × ${lattice.ny}, three layers`,
      String(mesh.count),
      spreadText(kernel, ''),
      spreadText(plain, ''),
      `${short(plain!.median / kernel!.median)}×`,
      relative(errorAtRandom(mesh, images, leakage, lattice) / resistance),
      relative(lattice.error / resistance),
    ],
  };
}

/** Largest difference of a map from the images summed one by one, at random points of it. */
function errorAtRandom(
  mesh: SegmentMesh,
  images: SoilImages,
  leakage: Float64Array,
  lattice: Lattice,
): number {
  const random = seeded(SEED);
  let most = 0;
  for (let k = 0; k < COMPARED; k++) {
    const [i, j] = [random(lattice.nx), random(lattice.ny)];
    const [x, y] = [lattice.x0 + i * lattice.spacing, lattice.y0 + j * lattice.spacing];
    const exact = potentialAt(mesh, images, leakage, x, y, 0);
    most = Math.max(most, Math.abs(lattice.values[j * lattice.nx + i]! - exact));
  }
  return most;
}
