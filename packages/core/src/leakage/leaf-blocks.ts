// The leaves' own blocks of the compressed matrix, their inverses, and where their current goes at one potential.
import { SHAPE } from '../numerics/dense-blocks.ts';
import { invertPositive } from '../numerics/small-inverse.ts';
import { type BlockPlan, sizeOf } from './block-plan.ts';
import type { LeakageBlocks } from './leakage-matrix.ts';

/** Plain data of some leaves, leaf after leaf. */
export interface LeafBlocks {
  /** their clusters */
  readonly leaves: Int32Array;
  /** R_ii, Ω */
  readonly diagonal: Float64Array;
  /** B⁻¹ 1: current of each leaf's segments, alone at one volt, A */
  readonly current: Float64Array;
  /** the own block B of each leaf, Ω, row after row, and B⁻¹, S */
  readonly own: Float32Array;
  readonly inverse: Float32Array;
  readonly evaluations: number;
}

/**
 * @param clusters of which the leaves are taken
 * @throws NotPositiveDefinite
 */
export function leafBlocks({ tree }: BlockPlan, entries: LeakageBlocks, clusters: Int32Array): LeafBlocks {
  const leaves = clusters.filter((c) => tree.half[c]! < 0);
  const places = leaves.reduce((sum, c) => sum + sizeOf(tree, c), 0);
  const squares = leaves.reduce((sum, c) => sum + sizeOf(tree, c) ** 2, 0);
  const diagonal = new Float64Array(places);
  const current = new Float64Array(places);
  const own = new Float32Array(squares);
  const inverse = new Float32Array(squares);
  let place = 0;
  let square = 0;
  for (const c of leaves) {
    const n = sizeOf(tree, c);
    const segments = tree.order.subarray(tree.from[c]!, tree.to[c]!);
    const block = symmetricBlock(entries, segments);
    own.set(block, square);
    for (let i = 0; i < n; i++) diagonal[place + i] = block[i * (n + 1)]!;
    invertPositive(block, n);
    inverse.set(block, square);
    for (let i = 0; i < n; i++) for (let j = 0; j < n; j++) current[place + i]! += block[i * n + j]!;
    place += n;
    square += n * n;
  }
  return {
    leaves,
    diagonal,
    current,
    own,
    inverse,
    evaluations: leaves.reduce((sum, c) => sum + computed(sizeOf(tree, c)), 0),
  };
}

/** Rows whose entries are asked for together, up to the last one's own column: the rest follows by symmetry. */
const ROWS = 8;

function symmetricBlock(entries: LeakageBlocks, segments: Int32Array): Float64Array {
  const n = segments.length;
  const block = new Float64Array(n * n);
  const values = new Float64Array(ROWS * n);
  for (let from = 0; from < n; from += ROWS) {
    const to = Math.min(n, from + ROWS);
    entries(segments.subarray(from, to), segments.subarray(0, to), values);
    for (let i = from; i < to; i++)
      for (let j = 0; j <= i; j++) {
        const value = values[(i - from) * to + j]!;
        block[i * n + j] = value;
        block[j * n + i] = value;
      }
  }
  return block;
}

/** Entries computed for a block of n segments with itself. */
function computed(n: number): number {
  let sum = 0;
  for (let from = 0; from < n; from += ROWS) {
    const to = Math.min(n, from + ROWS);
    sum += (to - from) * to;
  }
  return sum;
}

/** The leaves of several parts as one. */
export function joinLeaves(parts: readonly LeafBlocks[]): LeafBlocks {
  return {
    leaves: Int32Array.from(parts.flatMap((part) => Array.from(part.leaves))),
    diagonal: chained(
      Float64Array,
      parts.map((part) => part.diagonal),
    ),
    current: chained(
      Float64Array,
      parts.map((part) => part.current),
    ),
    own: chained(
      Float32Array,
      parts.map((part) => part.own),
    ),
    inverse: chained(
      Float32Array,
      parts.map((part) => part.inverse),
    ),
    evaluations: parts.reduce((sum, part) => sum + part.evaluations, 0),
  };
}

function chained<T extends Float32Array | Float64Array>(
  make: new (length: number) => T,
  pieces: readonly T[],
): T {
  const whole = new make(pieces.reduce((sum, piece) => sum + piece.length, 0));
  let at = 0;
  for (const piece of pieces) {
    whole.set(piece, at);
    at += piece.length;
  }
  return whole;
}

/** What is given leaf after leaf, by place in the tree's order. */
export function byPlace({ tree }: BlockPlan, leaves: Int32Array, given: Float64Array): Float64Array {
  const placed = new Float64Array(given.length);
  let at = 0;
  for (const c of leaves) {
    placed.set(given.subarray(at, at + sizeOf(tree, c)), tree.from[c]!);
    at += sizeOf(tree, c);
  }
  return placed;
}

/** Shapes of square blocks on the diagonal, for `denseBlocks`. */
export function leafShapes({ tree }: BlockPlan, leaves: Int32Array): Uint32Array {
  const shapes = new Uint32Array(leaves.length * SHAPE);
  leaves.forEach((c, k) => {
    const n = sizeOf(tree, c);
    shapes.set([tree.from[c]!, n, tree.from[c]!, n, 0], k * SHAPE);
  });
  return shapes;
}
