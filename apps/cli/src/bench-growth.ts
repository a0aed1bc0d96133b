// How memory, kernel evaluations and iterations grow from 4 000 to 64 000 segments: counts, no clock.
import { compressedLeakageMatrix, solveGraph } from '@ohmstead/core';
import { GROWTH_ACROSS } from './bench-cases.ts';
import type { Part, Surroundings } from './bench-stage.ts';
import { growthExponent } from './bench-statistics.ts';
import { benchSystem } from './bench-system.ts';
import { table } from './bench-table.ts';

interface Counts {
  readonly segments: number;
  /** doubles */
  readonly stored: number;
  readonly evaluations: number;
  readonly iterations: number;
}

const MEGABYTE = 1e6;

export async function growthPart({ told }: Surroundings): Promise<Part> {
  const counts: Counts[] = [];
  for (const across of GROWTH_ACROSS) {
    const { mesh, images, ohmPerMetre } = benchSystem(across, 'two layers');
    told(`growth: ${mesh.count} segments`);
    const matrix = await compressedLeakageMatrix(mesh, images);
    const { iterations } = await solveGraph(mesh, matrix, [0], ohmPerMetre, 'equipotential');
    counts.push({ segments: mesh.count, stored: matrix.stored, evaluations: matrix.evaluations, iterations });
  }
  const exponent = (pick: (one: Counts) => number): number =>
    growthExponent(
      counts.map(({ segments }) => segments),
      counts.map(pick),
    );
  const findings = {
    growthMemory: exponent(({ stored }) => stored),
    growthEvaluations: exponent(({ evaluations }) => evaluations),
    growthIterations: exponent(({ iterations }) => iterations),
  };
  const rows = counts.map(({ segments, stored, evaluations, iterations }) => [
    String(segments),
    ((8 * stored) / MEGABYTE).toFixed(0),
    (evaluations / 1e6).toFixed(1),
    `${((200 * evaluations) / (segments * (segments + 1))).toFixed(1)} %`,
    String(iterations),
  ]);
  const powers = Object.values(findings).map((power) => `n^${power.toFixed(2)}`);
  return {
    lines: [
      '**Growth of the compressed matrix, two layers.** Counts of one run, the same on every machine.',
      '',
      ...table(
        [
          'segments',
          'matrix, MB',
          'kernel evaluations, 10⁶',
          'of half the entries',
          'iterations of a study’s solution',
        ],
        [...rows, ['grows as', powers[0]!, powers[1]!, '–', powers[2]!]],
      ),
    ],
    findings,
  };
}
