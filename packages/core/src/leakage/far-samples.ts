// Segments spread over all that is far from a cluster, denser where it is nearer: against them its telling segments are chosen.
import { boxDistance, type ClusterTree, diameter } from './cluster-tree.ts';

/**
 * A far cluster is sampled piece by piece, a piece being at most this share of its distance across. With this and the
 * numbers below, errors stay near the tolerance; fewer samples leave ten times as much on electrodes of unequal spacing.
 */
const PIECE = 0.7;
/** Samples of a piece; a leaf that is too large for one gets more, by area. */
const EACH = 3;
/** Samples kept of those of the cluster above: what is far from that is farther still from its halves, and smoother. */
const INHERITED = 32;

/**
 * @param far pairs of far clusters; shape [pairs × 2]
 * @returns indices into the mesh, by cluster; empty where nothing is far
 */
export function farSamples(tree: ClusterTree, far: Int32Array): Int32Array[] {
  const { order, from, to, half, parent } = tree;
  const size = Float64Array.from(from, (_, c) => diameter(tree, c));
  const partners: number[][] = Array.from(from, () => []);
  for (let p = 0; p < far.length; p += 2) {
    partners[far[p]!]!.push(far[p + 1]!);
    partners[far[p + 1]!]!.push(far[p]!);
  }
  const sample = (seenFrom: number, other: number, into: number[]): void => {
    const share = size[other]! / (PIECE * boxDistance(tree, seenFrom, other));
    const first = half[other]!;
    if (share > 1 && first >= 0) {
      sample(seenFrom, first, into);
      sample(seenFrom, first + 1, into);
    } else spread(order, from[other]!, to[other]!, Math.ceil(EACH * Math.max(1, share * share)), into);
  };
  const found: Int32Array[] = [];
  partners.forEach((others, c) => {
    const own: number[] = [];
    for (const other of others) sample(c, other, own);
    const above = found[parent[c]!];
    if (above !== undefined) spread(above, 0, above.length, INHERITED, own);
    found.push(Int32Array.from(own));
  });
  return found;
}

/** Appends at most `most` of the items `from … to − 1`, evenly spread. */
function spread(items: Int32Array, from: number, to: number, most: number, into: number[]): void {
  const take = Math.min(to - from, most);
  for (let k = 0; k < take; k++) into.push(items[from + Math.floor(((k + 0.5) * (to - from)) / take)]!);
}
