// Cholesky factor of a symmetric positive-definite matrix kept as its packed lower triangle.

import { choleskyBytes } from '../kernels/cholesky-bytes.ts';
import { doublesAt, kernelOf, place } from '../kernels/instance.ts';

/** Packed lower triangle: entry (i, j ≤ i) at i(i + 1)/2 + j; shape [n(n + 1)/2]. */
export type PackedLower = Float64Array;

export class NotPositiveDefinite extends Error {
  /** row whose pivot failed */
  readonly row: number;
  constructor(row: number) {
    super(`matrix is not positive definite: pivot of row ${row} is not positive`);
    this.name = 'NotPositiveDefinite';
    this.row = row;
  }
}

/** Rows and columns of the tile whose products are summed together: sixteen sums share eight loads. */
const TILE = 4;

/** Rows below which copying into the kernel's memory costs more than it saves. */
const KERNEL_FROM = 96;

/**
 * Overwrites a packed matrix with its Cholesky factor L, A = L Lᵀ, left-looking, in tiles of four by four; by the
 * compiled kernel where there is one.
 * @throws NotPositiveDefinite with the row at which the pivot fails
 */
export function factorPacked(a: PackedLower, n: number): void {
  if (n >= KERNEL_FROM && factorByKernel(a, n)) return;
  const sums = new Float64Array(TILE * TILE);
  for (let i0 = 0; i0 < n; i0 += TILE) {
    const rows = Math.min(TILE, n - i0);
    if (rows === TILE) for (let j0 = 0; j0 < i0; j0 += TILE) reduceTile(a, i0, j0, sums);
    // what is left: rows past the last full tile, and the triangle on the diagonal
    for (let i = i0; i < i0 + rows; i++) reduceRow(a, i, rows === TILE ? i0 : 0);
  }
}

/** @returns false where there is no kernel or not the memory, with nothing changed */
function factorByKernel(a: PackedLower, n: number): boolean {
  const kernel = kernelOf(choleskyBytes);
  if (kernel === undefined) return false;
  const panels = Math.ceil(n / TILE);
  const entries = (n * (n + 1)) / 2;
  const at = place(kernel, [a.subarray(0, entries)], TILE * TILE * ((panels * (panels + 1)) / 2));
  if (at === undefined) return false;
  const [packed = 0, tiled = 0] = at;
  kernel.call('toPanels', packed, tiled, n, panels);
  const failed = kernel.call('factor', tiled, panels);
  if (failed >= 0) throw new NotPositiveDefinite(failed);
  kernel.call('fromPanels', packed, tiled, n);
  a.set(doublesAt(kernel, packed, entries));
  return true;
}

function rowStart(i: number): number {
  return (i * (i + 1)) / 2;
}

/** Entries (i0 … i0 + 3, j0 … j0 + 3) of the factor, all columns before j0 and all rows before i0 being final. */
function reduceTile(a: PackedLower, i0: number, j0: number, sums: Float64Array): void {
  const p0 = rowStart(i0);
  const p1 = rowStart(i0 + 1);
  const p2 = rowStart(i0 + 2);
  const p3 = rowStart(i0 + 3);
  const q0 = rowStart(j0);
  const q1 = rowStart(j0 + 1);
  const q2 = rowStart(j0 + 2);
  const q3 = rowStart(j0 + 3);
  let s00 = 0, s01 = 0, s02 = 0, s03 = 0; // biome-ignore format: a tile
  let s10 = 0, s11 = 0, s12 = 0, s13 = 0; // biome-ignore format: a tile
  let s20 = 0, s21 = 0, s22 = 0, s23 = 0; // biome-ignore format: a tile
  let s30 = 0, s31 = 0, s32 = 0, s33 = 0; // biome-ignore format: a tile
  for (let k = 0; k < j0; k++) {
    const u0 = a[p0 + k]!;
    const u1 = a[p1 + k]!;
    const u2 = a[p2 + k]!;
    const u3 = a[p3 + k]!;
    const v0 = a[q0 + k]!;
    const v1 = a[q1 + k]!;
    const v2 = a[q2 + k]!;
    const v3 = a[q3 + k]!;
    s00 += u0 * v0;
    s01 += u0 * v1;
    s02 += u0 * v2;
    s03 += u0 * v3; // biome-ignore format: a tile
    s10 += u1 * v0;
    s11 += u1 * v1;
    s12 += u1 * v2;
    s13 += u1 * v3; // biome-ignore format: a tile
    s20 += u2 * v0;
    s21 += u2 * v1;
    s22 += u2 * v2;
    s23 += u2 * v3; // biome-ignore format: a tile
    s30 += u3 * v0;
    s31 += u3 * v1;
    s32 += u3 * v2;
    s33 += u3 * v3; // biome-ignore format: a tile
  }
  sums.set([s00, s01, s02, s03, s10, s11, s12, s13, s20, s21, s22, s23, s30, s31, s32, s33]);
  for (let r = 0; r < TILE; r++) {
    const row = rowStart(i0 + r) + j0;
    for (let c = 0; c < TILE; c++) {
      const pivotRow = rowStart(j0 + c) + j0;
      let rest = a[row + c]! - sums[r * TILE + c]!;
      for (let m = 0; m < c; m++) rest -= a[row + m]! * a[pivotRow + m]!;
      a[row + c] = rest / a[pivotRow + c]!;
    }
  }
}

/** Entries of row i from column `from` to the diagonal, those before it being final. */
function reduceRow(a: PackedLower, i: number, from: number): void {
  const row = rowStart(i);
  for (let j = from; j <= i; j++) {
    const other = rowStart(j);
    let rest = a[row + j]!;
    for (let k = 0; k < j; k++) rest -= a[row + k]! * a[other + k]!;
    if (j < i) a[row + j] = rest / a[other + j]!;
    else {
      if (!(rest > 0)) throw new NotPositiveDefinite(i);
      a[row + i] = Math.sqrt(rest);
    }
  }
}

/** Solves L Lᵀ x = b in place for a factor made by `factorPacked`. */
export function solvePacked(factor: PackedLower, n: number, b: Float64Array): void {
  for (let i = 0; i < n; i++) {
    const r = (i * (i + 1)) / 2;
    let sum = b[i]!;
    for (let k = 0; k < i; k++) sum -= factor[r + k]! * b[k]!;
    b[i] = sum / factor[r + i]!;
  }
  for (let i = n - 1; i >= 0; i--) {
    const r = (i * (i + 1)) / 2;
    const value = b[i]! / factor[r + i]!;
    b[i] = value;
    for (let k = 0; k < i; k++) b[k]! -= factor[r + k]! * value;
  }
}
