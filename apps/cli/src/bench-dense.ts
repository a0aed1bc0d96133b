// Factors of one and the same leakage matrix: the packed Cholesky, its plain twin, and a library's Cholesky and LU.
import { factorPacked, leakageMatrix } from '@ohmstead/core';
import { CholeskyDecomposition, LuDecomposition, Matrix } from 'ml-matrix';
import { timed } from './bench-clock.ts';
import { withoutKernels } from './bench-engine.ts';
import type { Arm, Run } from './bench-rounds.ts';
import type { BenchSystem } from './bench-system.ts';

export const PACKED = 'packed Cholesky';
export const PACKED_TWIN = 'its plain TypeScript twin';
export const ML_CHOLESKY = 'ml-matrix Cholesky';
export const ML_LU = 'ml-matrix LU';

/** Segments from which a library's factor takes so many seconds that it runs once. */
const SLOW_FROM = 1000;

/** Operations of a Cholesky factor of n rows, n³/3. */
export function choleskyOperations(n: number): number {
  return n ** 3 / 3;
}

export async function denseArms({ mesh, images }: BenchSystem): Promise<Arm[]> {
  const { entries, size } = await leakageMatrix(mesh, images);
  const packed = async (): Promise<Run> => {
    const factor = Float64Array.from(entries);
    const { wallMs, cpuMs } = await timed(() => factorPacked(factor, size));
    return { wallMs, cpuMs, resistance: resistanceByFactor(factor, size) };
  };
  const full = whole(entries, size);
  const ones = Matrix.ones(size, 1);
  const library = async (factor: () => { solve(b: Matrix): Matrix }): Promise<Run> => {
    const { wallMs, cpuMs, result } = await timed(factor);
    return { wallMs, cpuMs, resistance: 1 / result.solve(ones).sum() };
  };
  const slow = size >= SLOW_FROM ? { atMost: 1 } : {};
  return [
    { name: PACKED, run: packed },
    { name: PACKED_TWIN, run: () => withoutKernels(packed) },
    { name: ML_CHOLESKY, ...slow, run: () => library(() => new CholeskyDecomposition(full)) },
    { name: ML_LU, ...slow, run: () => library(() => new LuDecomposition(full)) },
  ];
}

/** All metal at one volt: the total leakage is 1ᵀ(L Lᵀ)⁻¹1 = ‖L⁻¹1‖². */
function resistanceByFactor(factor: Float64Array, n: number): number {
  const y = new Float64Array(n);
  let total = 0;
  for (let i = 0; i < n; i++) {
    const row = (i * (i + 1)) / 2;
    let rest = 1;
    for (let k = 0; k < i; k++) rest -= factor[row + k]! * y[k]!;
    y[i] = rest / factor[row + i]!;
    total += y[i]! ** 2;
  }
  return 1 / total;
}

function whole(packed: Float64Array, n: number): Matrix {
  const full = Matrix.zeros(n, n);
  for (let i = 0; i < n; i++)
    for (let j = 0; j <= i; j++) {
      full.set(i, j, packed[(i * (i + 1)) / 2 + j]!);
      full.set(j, i, packed[(i * (i + 1)) / 2 + j]!);
    }
  return full;
}
