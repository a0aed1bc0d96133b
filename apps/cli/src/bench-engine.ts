// The engine's arms: assembly and solution by the compiled kernels, and by their plain twins.
import { type LeakageMatrix, leakageOperator, type SoilImages, solveGraph, useKernels } from '@ohmstead/core';
import { timed } from './bench-clock.ts';
import { leakageAtOneVolt } from './bench-iteration.ts';
import type { Arm } from './bench-rounds.ts';
import type { BenchSystem } from './bench-system.ts';

/** Relative residual of the comparisons: three digits past what any soil is known to. */
export const RESIDUAL = 1e-6;

export const ENGINE = 'engine, to a residual of 1e-6';
export const PRODUCT = 'engine, as a study runs it';
export const TWIN = 'its plain TypeScript twin, to 1e-6';

export function engineArm(system: BenchSystem): Arm {
  return arm(ENGINE, system, system.shared, async (matrix) => resistanceTo(matrix, RESIDUAL));
}

export function productArm(system: BenchSystem): Arm {
  return arm(PRODUCT, system, system.images, async (matrix) => {
    const { units } = await solveGraph(system.mesh, matrix, [0], system.ohmPerMetre, 'equipotential');
    return units[0]!.resistance;
  });
}

export function twinArm(system: BenchSystem): Arm {
  const { run } = arm(TWIN, system, system.shared, async (matrix) => resistanceTo(matrix, RESIDUAL));
  return { name: TWIN, run: () => withoutKernels(run) };
}

/** Does some work in plain TypeScript. */
export async function withoutKernels<T>(work: () => Promise<T>): Promise<T> {
  useKernels(false);
  try {
    return await work();
  } finally {
    useKernels(true);
  }
}

/** Resistance of all metal at one volt, Ω. */
export async function resistanceTo(matrix: LeakageMatrix, residual: number): Promise<number> {
  const { current } = await leakageAtOneVolt(matrix, residual);
  return 1 / current.reduce((sum, i) => sum + i, 0);
}

function arm(
  name: string,
  { mesh }: BenchSystem,
  images: SoilImages,
  solve: (matrix: LeakageMatrix) => Promise<number>,
): Arm {
  return {
    name,
    async run() {
      const assembly = await timed(() => leakageOperator(mesh, images));
      const solution = await timed(() => solve(assembly.result));
      return {
        wallMs: assembly.wallMs + solution.wallMs,
        cpuMs: assembly.cpuMs + solution.cpuMs,
        solveMs: solution.wallMs,
        resistance: solution.result,
      };
    },
  };
}
