// Times the main job beside a plain dense LU of the same system, as ratios in one run: `npm run bench`.
import { resolve } from 'node:path';
import {
  adaptiveLattices,
  type ConductorTable,
  compressedLeakageMatrix,
  interfaceDepths,
  joinConductors,
  leakageMatrix,
  segmentMesh,
  soilImages,
  solveGraph,
  surfacePotentials,
} from '@ohmstead/core';
import { type LoadedStudy, layeredSoil, loadStudy, solveStudy } from '@ohmstead/study';
import { LuDecomposition, Matrix } from 'ml-matrix';
import { benchCases } from './bench-cases.ts';
import { kernelRows } from './bench-kernels.ts';
import { folderSource } from './folder-source.ts';

/** Rounds of every arm, in the order A B C A B C; medians are printed. */
const ROUNDS = 3;

interface Arms {
  /** the whole study: joints, meshes, solution, maps, worst places, uncertainties, verdicts */
  readonly study: number;
  /** images, leakage matrix and solution of one mesh */
  readonly ours: number;
  /** ml-matrix LU of the same matrix */
  readonly lu: number;
  readonly segments: number;
  /** resistance of ours over that of the LU, less 1 */
  readonly difference: number;
}

async function milliseconds<T>(work: () => T | Promise<T>): Promise<[ms: number, result: T]> {
  const start = performance.now();
  const result = await work();
  return [performance.now() - start, result];
}

async function round(loaded: LoadedStudy, level: number): Promise<Arms> {
  const [study] = await milliseconds(() => solveStudy(loaded));
  const soil = layeredSoil(loaded.study.soil.layers ?? []);
  const interfaces = interfaceDepths(soil);
  const table = loaded.conductors;
  const mesh = segmentMesh(table, joinConductors(table), interfaces, level);
  const ohm = new Float64Array(table.count).fill(1e-4);
  const [ours, solved] = await milliseconds(async () => {
    const matrix = leakageMatrix(mesh, soilImages(soil));
    const { units } = await solveGraph(mesh, matrix, [0], ohm, 'equipotential');
    return { matrix, resistance: units[0]!.resistance };
  });
  const { matrix } = solved;
  const full = Matrix.zeros(matrix.size, matrix.size);
  for (let i = 0; i < matrix.size; i++)
    for (let j = 0; j <= i; j++) {
      full.set(i, j, matrix.entries[(i * (i + 1)) / 2 + j]!);
      full.set(j, i, matrix.entries[(i * (i + 1)) / 2 + j]!);
    }
  // all metal at one volt: for an electrode in one piece the same system, so that the resistances must agree
  const [lu, leakage] = await milliseconds(() =>
    new LuDecomposition(full).solve(Matrix.ones(matrix.size, 1)),
  );
  return { study, ours, lu, segments: matrix.size, difference: solved.resistance * leakage.sum() - 1 };
}

function median(values: readonly number[]): number {
  return [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)]!;
}

function report(name: string, rounds: readonly Arms[]): string {
  const of = (pick: (arms: Arms) => number): number => median(rounds.map(pick));
  const cells = [
    name,
    String(rounds[0]!.segments),
    of((r) => r.study).toFixed(0),
    of((r) => r.ours).toFixed(0),
    of((r) => r.lu).toFixed(0),
    `${of((r) => r.lu / r.ours).toFixed(1)}×`,
    of((r) => Math.abs(r.difference)).toExponential(1),
  ];
  return `| ${cells.join(' | ')} |`;
}

async function main(args: readonly string[]): Promise<void> {
  const smallest = args.includes('--smallest');
  const lines = [
    '| case | segments | whole study, ms | assemble + solve, ms | dense LU alone (ml-matrix), ms | LU over ours | difference in R |',
    '|---|---|---|---|---|---|---|',
  ];
  for (const { name, folder, level, small } of benchCases) {
    if (smallest && !small) continue;
    const loaded = loadStudy(folderSource(resolve(folder)));
    const rounds: Arms[] = [];
    for (let r = 0; r < ROUNDS; r++) rounds.push(await round(loaded, level));
    lines.push(report(name, rounds));
  }
  lines.push('', '| part, one thread | ms | what it did |', '|---|---|---|', ...(await parts(smallest)));
  demonstration ??= await surfaceOf(loadStudy(folderSource(resolve('test-data/aldermoor'))));
  lines.push('', ...kernelRows(demonstration.mesh, demonstration.images, demonstration.surfaces));
  process.stdout.write(`${lines.join('\n')}\n`);
}

/** Parts of the main job by themselves: medians of the same rounds. */
async function parts(smallest: boolean): Promise<string[]> {
  const across = smallest ? 30 : 100;
  const lattice = latticeTable(across);
  const four = layeredSoil(fourLayers);
  const timed = async (work: () => string | Promise<string>): Promise<string[]> => {
    const rounds: [number, string][] = [];
    for (let r = 0; r < ROUNDS; r++) rounds.push(await milliseconds(work));
    return [median(rounds.map(([ms]) => ms)).toFixed(0), rounds[0]![1]];
  };
  const row = async (name: string, work: () => string | Promise<string>): Promise<string> =>
    `| ${[name, ...(await timed(work))].join(' | ')} |`;
  const rows = [
    await row(
      'joining conductors',
      () => `${lattice.count} conductors into ${joinConductors(lattice).nodeCount} nodes`,
    ),
    await row('image lists of a new soil', () => {
      const images = soilImages(four);
      const lists = four.layers.flatMap((_, s) => four.layers.map((_, f) => images.list(s, f)));
      const worst = Math.max(...lists.map((list) => list.error));
      return `4 layers, all ${lists.length} pairs, error ${worst.toExponential(1)}`;
    }),
    await row('map of the demonstration’s areas', () => mapOnce()),
  ];
  if (!smallest)
    rows.push(
      await row('compressed leakage matrix', () => {
        const table = latticeTable(44);
        const mesh = segmentMesh(table, joinConductors(table), [2], 0);
        const { stored, evaluations } = compressedLeakageMatrix(mesh, soilImages(layeredSoil(twoLayers)));
        const share = ((200 * evaluations) / mesh.count ** 2).toFixed(0);
        return `${mesh.count} segments, ${(stored / 125_000).toFixed(0)} MB, ${share} % of the entries computed`;
      }),
    );
  return rows;
}

const twoLayers = [{ resistivity_ohm_m: 100, thickness_m: 2 }, { resistivity_ohm_m: 300 }];
const fourLayers = [
  { resistivity_ohm_m: 200, thickness_m: 1 },
  { resistivity_ohm_m: 50, thickness_m: 3 },
  { resistivity_ohm_m: 800, thickness_m: 4 },
  { resistivity_ohm_m: 20 },
];

/** The demonstration's surface on half a metre, from the leakage of its second mesh. */
async function mapOnce(): Promise<string> {
  demonstration ??= await surfaceOf(loadStudy(folderSource(resolve('test-data/aldermoor'))));
  const [map] = adaptiveLattices(demonstration.surfaces, [2e-3 * demonstration.rise], demonstration.box, 0.5);
  return `${map!.nx} × ${map!.ny} places, ${map!.evaluated} computed, ${demonstration.segments} segments`;
}

let demonstration: Awaited<ReturnType<typeof surfaceOf>> | undefined;

async function surfaceOf(loaded: LoadedStudy) {
  const soil = layeredSoil(loaded.study.soil.layers ?? []);
  const table = loaded.conductors;
  const mesh = segmentMesh(table, joinConductors(table), interfaceDepths(soil), 1);
  const images = soilImages(soil);
  const ohm = new Float64Array(table.count).fill(1e-4);
  const { units } = await solveGraph(mesh, leakageMatrix(mesh, images), [0], ohm, 'equipotential');
  const [unit] = units;
  const surfaces = surfacePotentials(mesh, images, [unit!.leakage], 300);
  return {
    mesh,
    images,
    surfaces,
    rise: unit!.resistance,
    segments: mesh.count,
    box: { west: -5, south: -5, east: 65, north: 50 },
  };
}

/** A square lattice of lines five metres apart, cut at every crossing. */
function latticeTable(across: number): ConductorTable {
  const ends: [number, number, number, number][] = [];
  for (let i = 0; i <= across; i++)
    for (let j = 0; j < across; j++)
      ends.push([5 * i, 5 * j, 5 * i, 5 * j + 5], [5 * j, 5 * i, 5 * j + 5, 5 * i]);
  const column = (pick: (end: readonly number[]) => number): Float64Array => Float64Array.from(ends, pick);
  const all = (value: number): Float64Array => new Float64Array(ends.length).fill(value);
  return {
    count: ends.length,
    id: ends.map((_, i) => String(i)),
    x1: column((e) => e[0]!),
    y1: column((e) => e[1]!),
    depth1: all(0.5),
    x2: column((e) => e[2]!),
    y2: column((e) => e[3]!),
    depth2: all(0.5),
    radius: all(0.005),
    material: ends.map(() => 'copper-annealed'),
    electrode: ends.map(() => 'main'),
    insulated: new Uint8Array(ends.length),
    resistancePerMetre: all(Number.NaN),
  };
}

await main(process.argv.slice(2));
