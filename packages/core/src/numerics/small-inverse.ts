// Inverse of a small symmetric positive-definite matrix.
import { blocksBytes } from '../kernels/blocks-bytes.ts';
import { doublesAt, kernelOf, place } from '../kernels/instance.ts';
import { NotPositiveDefinite } from './packed-cholesky.ts';

/**
 * Inverts in place by Gauss and Jordan's elimination along the diagonal, stable for such matrices; by the compiled
 * kernel where there is one. The result is symmetric to the last bit.
 * @param a shape [n × n], row after row
 * @throws NotPositiveDefinite with the row at which the pivot fails
 */
export function invertPositive(a: Float64Array, n: number): void {
  const failed = invertByKernel(a, n) ?? invertPlain(a, n);
  if (failed >= 0) throw new NotPositiveDefinite(failed);
  for (let i = 0; i < n; i++)
    for (let j = 0; j < i; j++) {
      const mean = 0.5 * (a[i * n + j]! + a[j * n + i]!);
      a[i * n + j] = mean;
      a[j * n + i] = mean;
    }
}

/** @returns −1, the row that fails, or undefined where there is no kernel or not the memory */
function invertByKernel(a: Float64Array, n: number): number | undefined {
  const kernel = kernelOf(blocksBytes);
  if (kernel === undefined) return undefined;
  const width = n + (n & 1);
  const at = place(kernel, [], n * width);
  if (at === undefined) return undefined;
  const [first = 0] = at;
  const held = doublesAt(kernel, first, n * width);
  for (let r = 0; r < n; r++) held.set(a.subarray(r * n, (r + 1) * n), r * width);
  if (width > n) for (let r = 0; r < n; r++) held[r * width + n] = 0;
  const failed = kernel.call('invert', first, n, width);
  for (let r = 0; r < n; r++) a.set(held.subarray(r * width, r * width + n), r * n);
  return failed;
}

function invertPlain(a: Float64Array, n: number): number {
  for (let k = 0; k < n; k++) {
    const row = k * n;
    const pivot = a[row + k]!;
    if (!(pivot > 0)) return k;
    a[row + k] = 1;
    for (let c = 0; c < n; c++) a[row + c]! *= 1 / pivot;
    for (let i = 0; i < n; i++) {
      if (i === k) continue;
      const share = a[i * n + k]!;
      a[i * n + k] = 0;
      for (let c = 0; c < n; c++) a[i * n + c]! -= share * a[row + c]!;
    }
  }
  return -1;
}
