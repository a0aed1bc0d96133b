// For every cluster the few of its segments through which far clusters see it, nested from the leaves up.
import { skeletonRows } from '../numerics/skeleton-rows.ts';
import type { BlockPlan } from './block-plan.ts';
import type { LeakageBlocks } from './leakage-matrix.ts';

/** By cluster; empty where a cluster is not among those asked for, or nothing is far from it. Plain data. */
export interface ClusterBases {
  /** the telling segments, indices into the mesh; shape [rank] */
  readonly chosen: readonly Int32Array[];
  /**
   * W: potentials of a cluster's segments are W times those of the telling ones; shape [rows × rank], the rows being the
   * segments of a leaf, or the telling ones of the first half and then of the second
   */
  readonly weights: readonly Float32Array[];
  /** entries computed */
  readonly evaluations: number;
}

/**
 * Chooses the telling segments of clusters, each from its halves' (nested cross approximation: Bebendorf and Venn, Numer.
 * Math. 121, 2012; from memory): entries against a sample of all that is far from it are eliminated with full pivoting.
 * @param clusters halves before the whole
 * @param below bases of clusters done before
 */
export function clusterBases(
  { tree, samples, options }: BlockPlan,
  entries: LeakageBlocks,
  clusters: Int32Array,
  below?: ClusterBases,
): ClusterBases {
  const { order, from, to, half } = tree;
  const chosen = Array.from(from, (_, c) => below?.chosen[c] ?? NO_SEGMENTS);
  const weights = Array.from(from, (_, c) => below?.weights[c] ?? NO_WEIGHTS);
  let evaluations = below?.evaluations ?? 0;
  let block = new Float64Array(0);
  for (const c of clusters) {
    const sample = samples[c]!;
    if (sample.length === 0) continue;
    const first = half[c]!;
    const rows = first < 0 ? order.subarray(from[c]!, to[c]!) : joined(chosen[first]!, chosen[first + 1]!);
    const count = rows.length * sample.length;
    if (block.length < count) block = new Float64Array(count);
    entries(rows, sample, block);
    evaluations += count;
    const found = skeletonRows(block, rows.length, sample.length, options.tolerance);
    chosen[c] = found.rows.map((r) => rows[r]!);
    weights[c] = Float32Array.from(found.weights);
  }
  return { chosen, weights, evaluations };
}

const NO_SEGMENTS = new Int32Array(0);
const NO_WEIGHTS = new Float32Array(0);

function joined(a: Int32Array, b: Int32Array): Int32Array {
  const both = new Int32Array(a.length + b.length);
  both.set(a);
  both.set(b, a.length);
  return both;
}

/** The bases of several parts as one. */
export function joinBases(parts: readonly ClusterBases[]): ClusterBases {
  const [first] = parts;
  const pick = <T extends { readonly length: number }>(of: (part: ClusterBases) => readonly T[]): T[] =>
    of(first!).map((own, c) => parts.map((part) => of(part)[c]!).find((one) => one.length > 0) ?? own);
  return {
    chosen: pick((part) => part.chosen),
    weights: pick((part) => part.weights),
    evaluations: parts.reduce((sum, part) => sum + part.evaluations, 0),
  };
}
