// Segments in a tree of boxes, halved along the longest side until few are left in each.
import type { SegmentMesh } from '../geometry/segments.ts';

export interface Cluster {
  /** places `from … to − 1` of the order */
  readonly from: number;
  readonly to: number;
  /** box of the segments: least x, y, z, then most; m */
  readonly box: Float64Array;
  readonly halves: readonly [Cluster, Cluster] | undefined;
}

export interface ClusterTree {
  /** place → index into the list of segments given */
  readonly order: Int32Array;
  readonly root: Cluster;
}

/** @param segments indices into the mesh @param leaf most segments of a cluster that is not halved */
export function clusterTree(mesh: SegmentMesh, segments: Int32Array, leaf: number): ClusterTree {
  const order = Int32Array.from(segments, (_, k) => k);
  const centre = [
    Float64Array.from(segments, (i) => (mesh.x1[i]! + mesh.x2[i]!) / 2),
    Float64Array.from(segments, (i) => (mesh.y1[i]! + mesh.y2[i]!) / 2),
    Float64Array.from(segments, (i) => (mesh.z1[i]! + mesh.z2[i]!) / 2),
  ];
  const build = (from: number, to: number): Cluster => {
    const box = boxOf(mesh, segments, order, from, to);
    if (to - from <= leaf) return { from, to, box, halves: undefined };
    const sides = [0, 1, 2].map((axis) => box[axis + 3]! - box[axis]!);
    const along = centre[sides.indexOf(Math.max(...sides))]!;
    order.subarray(from, to).sort((a, b) => along[a]! - along[b]! || a - b);
    const middle = from + ((to - from) >> 1);
    return { from, to, box, halves: [build(from, middle), build(middle, to)] };
  };
  return { order, root: build(0, segments.length) };
}

function boxOf(
  mesh: SegmentMesh,
  segments: Int32Array,
  order: Int32Array,
  from: number,
  to: number,
): Float64Array {
  const box = new Float64Array(6).fill(Number.POSITIVE_INFINITY);
  box.fill(Number.NEGATIVE_INFINITY, 3);
  const ends = [
    [mesh.x1, mesh.x2],
    [mesh.y1, mesh.y2],
    [mesh.z1, mesh.z2],
  ] as const;
  for (let k = from; k < to; k++) {
    const i = segments[order[k]!]!;
    ends.forEach(([first, second], axis) => {
      box[axis] = Math.min(box[axis]!, first[i]!, second[i]!);
      box[axis + 3] = Math.max(box[axis + 3]!, first[i]!, second[i]!);
    });
  }
  return box;
}

/** Diagonal of a box, m. */
export function diameter(box: Float64Array): number {
  return Math.hypot(box[3]! - box[0]!, box[4]! - box[1]!, box[5]! - box[2]!);
}

/** Distance between two boxes, m; 0 where they overlap. */
export function boxDistance(a: Float64Array, b: Float64Array): number {
  const gap = (axis: number): number => Math.max(0, a[axis]! - b[axis + 3]!, b[axis]! - a[axis + 3]!);
  return Math.hypot(gap(0), gap(1), gap(2));
}
