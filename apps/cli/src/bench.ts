// Times the main job beside a plain dense LU of the same system, as ratios in one run: `npm run bench`.
import { resolve } from 'node:path';
import {
  joinConductors,
  leakageMatrix,
  type SoilModel,
  segmentMesh,
  soilImages,
  solveGraph,
} from '@ohmstead/core';
import { type LoadedStudy, loadStudy, solveStudy } from '@ohmstead/study';
import { LuDecomposition, Matrix } from 'ml-matrix';
import { benchCases } from './bench-cases.ts';
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

function milliseconds<T>(work: () => T): [ms: number, result: T] {
  const start = performance.now();
  const result = work();
  return [performance.now() - start, result];
}

function soilOf(loaded: LoadedStudy): SoilModel {
  return {
    layers: (loaded.study.soil.layers ?? []).map((layer) => ({
      resistivity: layer.resistivity_ohm_m,
      thickness: layer.thickness_m ?? Number.POSITIVE_INFINITY,
    })),
  };
}

function round(loaded: LoadedStudy, level: number): Arms {
  const [study] = milliseconds(() => solveStudy(loaded));
  const soil = soilOf(loaded);
  const interfaces: number[] = [];
  soil.layers.slice(0, -1).reduce((depth, layer) => {
    interfaces.push(depth + layer.thickness);
    return depth + layer.thickness;
  }, 0);
  const table = loaded.conductors;
  const mesh = segmentMesh(table, joinConductors(table), interfaces, level);
  const ohm = new Float64Array(table.count).fill(1e-4);
  const [ours, solved] = milliseconds(() => {
    const matrix = leakageMatrix(mesh, soilImages(soil));
    return { matrix, resistance: solveGraph(mesh, matrix, [0], ohm, 'equipotential').units[0]!.resistance };
  });
  const { matrix } = solved;
  const full = Matrix.zeros(matrix.size, matrix.size);
  for (let i = 0; i < matrix.size; i++)
    for (let j = 0; j <= i; j++) {
      full.set(i, j, matrix.entries[(i * (i + 1)) / 2 + j]!);
      full.set(j, i, matrix.entries[(i * (i + 1)) / 2 + j]!);
    }
  // all metal at one volt: for an electrode in one piece the same system, so that the resistances must agree
  const [lu, leakage] = milliseconds(() => new LuDecomposition(full).solve(Matrix.ones(matrix.size, 1)));
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

function main(args: readonly string[]): void {
  const smallest = args.includes('--smallest');
  const lines = [
    '| case | segments | whole study, ms | assemble + solve, ms | dense LU alone (ml-matrix), ms | LU over ours | difference in R |',
    '|---|---|---|---|---|---|---|',
  ];
  for (const { name, folder, level, small } of benchCases) {
    if (smallest && !small) continue;
    const loaded = loadStudy(folderSource(resolve(folder)));
    const rounds = Array.from({ length: ROUNDS }, () => round(loaded, level));
    lines.push(report(name, rounds));
  }
  process.stdout.write(`${lines.join('\n')}\n`);
}

main(process.argv.slice(2));
