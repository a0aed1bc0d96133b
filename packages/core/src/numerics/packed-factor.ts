// A Cholesky factor that stays in the compiled kernel's memory and solves many right-hand sides there.
import { choleskyBytes } from '../kernels/cholesky-bytes.ts';
import { BYTES_A_DOUBLE, doublesAt, ownKernel, place } from '../kernels/instance.ts';
import { factorPacked, NotPositiveDefinite, type PackedLower, solvePacked } from './packed-cholesky.ts';

export interface PackedFactor {
  readonly size: number;
  /** solves A x = b in place for each right-hand side, shape [size]; the factor is read once for eight of them */
  solve(bs: readonly Float64Array[]): void;
}

/** Rows of a panel, to which the kernel's matrices are filled up with the identity. */
const PANEL = 4;
/** Right-hand sides that one pass over the factor serves. */
const TOGETHER = 8;

/**
 * Factors a copy of a packed matrix, A = L Lᵀ; by plain code where there is no kernel.
 * @throws NotPositiveDefinite with the row at which the pivot fails
 */
export function packedFactor(a: PackedLower, size: number): PackedFactor {
  return kernelFactor(a, size) ?? plainFactor(a, size);
}

function plainFactor(a: PackedLower, size: number): PackedFactor {
  const factor = a.slice();
  factorPacked(factor, size);
  return {
    size,
    solve(bs) {
      for (const b of bs) solvePacked(factor, size, b);
    },
  };
}

function kernelFactor(a: PackedLower, size: number): PackedFactor | undefined {
  const kernel = ownKernel(choleskyBytes);
  if (kernel === undefined) return undefined;
  const panels = Math.ceil(size / PANEL);
  const tiled = PANEL * PANEL * ((panels * (panels + 1)) / 2);
  const at = place(kernel, [a], tiled + TOGETHER * PANEL * panels);
  if (at === undefined) return undefined;
  const [packed = 0, factor = 0] = at;
  kernel.call('toPanels', packed, factor, size, panels);
  const failed = kernel.call('factor', factor, panels);
  if (failed >= 0) throw new NotPositiveDefinite(failed);
  const stride = PANEL * panels;
  const given = factor + tiled * BYTES_A_DOUBLE;
  const held = doublesAt(kernel, given, TOGETHER * stride);
  return {
    size,
    solve(bs) {
      for (let first = 0; first < bs.length; first += TOGETHER) {
        const together = bs.slice(first, first + TOGETHER);
        held.fill(0);
        together.forEach((b, c) => {
          held.set(b, c * stride);
        });
        kernel.call('solveAll', factor, panels, given, stride * BYTES_A_DOUBLE, together.length);
        together.forEach((b, c) => {
          b.set(held.subarray(c * stride, c * stride + size));
        });
      }
    },
  };
}
