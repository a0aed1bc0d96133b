// Which pairs of clusters are stored whole and which see each other through a few segments, in parts of equal work.
import type { SegmentMesh } from '../geometry/segments.ts';
import { boxDistance, type ClusterTree, clusterTree, diameter } from './cluster-tree.ts';
import { farSamples } from './far-samples.ts';
import { leakingSegments } from './leakage-matrix.ts';

export interface CompressionOptions {
  /** most segments of a cluster that is not halved */
  readonly leaf: number;
  /** two clusters are far when the larger one's diameter is at most this share of their distance */
  readonly admissible: number;
  /** error of the entries between far clusters, of the largest one in a cluster's sight */
  readonly tolerance: number;
}

/** Resistance within 1e-6 of the whole matrix's up to 50 000 segments, in the least time of the values tried. */
export const COMPRESSION: CompressionOptions = { leaf: 48, admissible: 2.5, tolerance: 2e-6 };

/** What one worker does on its own. */
export interface BlockPart {
  /** its clusters, halves before the whole */
  readonly clusters: Int32Array;
  /** range of the near and far pairs, counted in pairs */
  readonly near: readonly [from: number, to: number];
  readonly far: readonly [from: number, to: number];
}

/** Plain data: the same for every worker. Pairs shape [pairs × 2]; with the leaves' own blocks they cover half the matrix. */
export interface BlockPlan {
  readonly options: CompressionOptions;
  readonly tree: ClusterTree;
  /** pairs of leaves stored whole */
  readonly near: Int32Array;
  readonly far: Int32Array;
  /** segments far from each cluster, against which its telling ones are chosen, indices into the mesh */
  readonly samples: readonly Int32Array[];
  readonly parts: readonly BlockPart[];
  /** clusters above those of the parts, halves before the whole */
  readonly top: Int32Array;
}

/** Parts of the work, whatever the number of workers, so that sums are taken in one order: two workers get four each. */
const PARTS = 8;

/** Ranks seen at the standard tolerance: 22 to 30 on lattices and yards with rods. */
const EXPECTED_RANK = 30;

/** Plans a compressed matrix: tree, pairs and parts. The mesh must have a leaking segment. */
export function planBlocks(mesh: SegmentMesh, options: CompressionOptions = COMPRESSION): BlockPlan {
  const tree = clusterTree(mesh, leakingSegments(mesh), options.leaf);
  const { near, far } = pairsOf(tree, options.admissible);
  const subtrees = frontier(tree, PARTS);
  const owner = new Int32Array(tree.half.length).fill(-1);
  subtrees.forEach((c, part) => {
    owner[c] = part;
  });
  tree.parent.forEach((above, c) => {
    if (above >= 0 && owner[above]! >= 0) owner[c] = owner[above]!;
  });
  const nearCuts = equalCuts(
    near,
    subtrees.length,
    (row, column) => sizeOf(tree, row) * sizeOf(tree, column),
  );
  const farCuts = equalCuts(far, subtrees.length, (row, column) => rankOf(tree, row) * rankOf(tree, column));
  return {
    options,
    tree,
    near,
    far,
    samples: farSamples(tree, far),
    parts: Array.from(subtrees, (_, p) => ({
      clusters: ownedBy(owner, p),
      near: [nearCuts[p]!, nearCuts[p + 1]!],
      far: [farCuts[p]!, farCuts[p + 1]!],
    })),
    top: ownedBy(owner, -1),
  };
}

function pairsOf(tree: ClusterTree, admissible: number): Pick<BlockPlan, 'near' | 'far'> {
  const { half } = tree;
  const size = Float64Array.from(half, (_, c) => diameter(tree, c));
  const near: number[] = [];
  const far: number[] = [];
  const pair = (row: number, column: number): void => {
    const gap = boxDistance(tree, row, column);
    if (gap > 0 && Math.max(size[row]!, size[column]!) <= admissible * gap) {
      far.push(row, column);
      return;
    }
    const [a, b] = [half[row]!, half[column]!];
    if (a < 0 && b < 0) near.push(row, column);
    else if (b < 0 || (a >= 0 && size[row]! >= size[column]!)) {
      pair(a, column);
      pair(a + 1, column);
    } else {
      pair(row, b);
      pair(row, b + 1);
    }
  };
  half.forEach((first) => {
    if (first >= 0) pair(first + 1, first);
  });
  return { near: Int32Array.from(near), far: Int32Array.from(far) };
}

/** At most this many clusters that together hold every segment, the largest halved first; in the order of their segments. */
export function frontier(tree: ClusterTree, most: number): Int32Array {
  const halved = new Uint8Array(tree.half.length);
  let count = 1;
  for (let c = 0; c < halved.length && count < most; c++)
    if (tree.half[c]! >= 0) {
      halved[c] = 1;
      count++;
    }
  const found: number[] = [];
  tree.parent.forEach((above, c) => {
    if (halved[c] === 0 && (above < 0 || halved[above] === 1)) found.push(c);
  });
  return Int32Array.from(found.sort((a, b) => tree.from[a]! - tree.from[b]!));
}

function ownedBy(owner: Int32Array, part: number): Int32Array {
  const found: number[] = [];
  for (let c = owner.length - 1; c >= 0; c--) if (owner[c] === part) found.push(c);
  return Int32Array.from(found);
}

/** Cuts a list of pairs into ranges of nearly equal work; shape [parts + 1]. */
function equalCuts(
  pairs: Int32Array,
  parts: number,
  work: (row: number, column: number) => number,
): number[] {
  const until = new Float64Array(pairs.length / 2 + 1);
  for (let p = 0; p < pairs.length / 2; p++)
    until[p + 1] = until[p]! + work(pairs[2 * p]!, pairs[2 * p + 1]!);
  const cuts = [0];
  let at = 0;
  for (let part = 1; part <= parts; part++) {
    while (at < pairs.length / 2 && until[at]! < (until.at(-1)! * part) / parts) at++;
    cuts.push(at);
  }
  return cuts;
}

export function sizeOf({ from, to }: ClusterTree, cluster: number): number {
  return to[cluster]! - from[cluster]!;
}

function rankOf(tree: ClusterTree, cluster: number): number {
  return Math.min(sizeOf(tree, cluster), EXPECTED_RANK);
}

/** Bytes that a plan's blocks, bases and preconditioner will take, from the ranks expected; ranks seen differ by a tenth. */
export function plannedBytes(plan: BlockPlan): number {
  // a leaf's own block and its inverse
  const values = plannedPairs(plan) + plannedClusters(plan, (rows, rank, own) => rows * rank + 2 * own);
  return values * Float32Array.BYTES_PER_ELEMENT;
}

/** Entries that will be computed to build a plan's matrix, from the same ranks. */
export function plannedEntries(plan: BlockPlan): number {
  return (
    plannedPairs(plan) + plannedClusters(plan, (rows, _, own, c) => rows * plan.samples[c]!.length + own)
  );
}

function plannedPairs({ tree, near, far }: BlockPlan): number {
  let values = 0;
  for (let p = 0; p < near.length; p += 2) values += sizeOf(tree, near[p]!) * sizeOf(tree, near[p + 1]!);
  for (let p = 0; p < far.length; p += 2) values += rankOf(tree, far[p]!) * rankOf(tree, far[p + 1]!);
  return values;
}

/** Σ over the clusters. @param of rows of its basis, its rank, values of its own block if it is a leaf, and the cluster */
function plannedClusters(
  { tree }: BlockPlan,
  of: (rows: number, rank: number, own: number, cluster: number) => number,
): number {
  let sum = 0;
  tree.half.forEach((first, c) => {
    const rows = first < 0 ? sizeOf(tree, c) : rankOf(tree, first) + rankOf(tree, first + 1);
    sum += of(rows, rankOf(tree, c), first < 0 ? rows * rows : 0, c);
  });
  return sum;
}
