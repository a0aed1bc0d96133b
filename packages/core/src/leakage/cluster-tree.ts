// Segments in a tree of boxes, cut across the longest side into leaves of nearly one size.
import type { SegmentMesh } from '../geometry/segments.ts';

/** Clusters are numbered level by level from the root, 0; the two halves of one stand side by side. */
export interface ClusterTree {
  /** place → index into the mesh; the segments of a cluster stand together, those of a leaf in ascending order */
  readonly order: Int32Array;
  /** places `from … to − 1` of a cluster; shape [clusters] */
  readonly from: Int32Array;
  readonly to: Int32Array;
  /** first half of a cluster, the second follows it; −1 for a leaf */
  readonly half: Int32Array;
  /** −1 for the root */
  readonly parent: Int32Array;
  /** leaves under a cluster */
  readonly leaves: Int32Array;
  /** box of the segments: least x, y, z, then most, m; shape [clusters × 6] */
  readonly box: Float64Array;
}

const AXES = 3;

/** @param segments indices into the mesh, at least one @param leaf most segments of a cluster that is not halved */
export function clusterTree(mesh: SegmentMesh, segments: Int32Array, leaf: number): ClusterTree {
  const size = segments.length;
  const order = segments.slice();
  const centre = [
    Float64Array.from(mesh.x1, (x, i) => (x + mesh.x2[i]!) / 2),
    Float64Array.from(mesh.y1, (y, i) => (y + mesh.y2[i]!) / 2),
    Float64Array.from(mesh.z1, (z, i) => (z + mesh.z2[i]!) / 2),
  ];
  const leafCount = Math.max(1, Math.ceil(size / leaf));
  const clusters = 2 * leafCount - 1;
  const [from, to, half, parent, leaves] = Array.from({ length: 5 }, () => new Int32Array(clusters)) as [
    Int32Array,
    Int32Array,
    Int32Array,
    Int32Array,
    Int32Array,
  ];
  const box = new Float64Array(clusters * 2 * AXES);
  to[0] = size;
  parent[0] = -1;
  leaves[0] = leafCount;
  let made = 1;
  for (let c = 0; c < clusters; c++) {
    const [a, b, under] = [from[c]!, to[c]!, leaves[c]!];
    const own = box.subarray(c * 2 * AXES, (c + 1) * 2 * AXES);
    enclose(mesh, order, a, b, own);
    half[c] = -1;
    if (under === 1) {
      order.subarray(a, b).sort();
      continue;
    }
    const sides = Array.from({ length: AXES }, (_, axis) => own[axis + AXES]! - own[axis]!);
    const below = under >> 1;
    const middle = a + Math.round(((b - a) * below) / under);
    partition(order, centre[sides.indexOf(Math.max(...sides))]!, a, b, middle);
    half[c] = made;
    from.set([a, middle], made);
    to.set([middle, b], made);
    leaves.set([below, under - below], made);
    parent.fill(c, made, made + 2);
    made += 2;
  }
  return { order, from, to, half, parent, leaves, box };
}

function enclose(mesh: SegmentMesh, order: Int32Array, from: number, to: number, box: Float64Array): void {
  box.fill(Number.POSITIVE_INFINITY, 0, AXES);
  box.fill(Number.NEGATIVE_INFINITY, AXES);
  const ends = [mesh.x1, mesh.y1, mesh.z1, mesh.x2, mesh.y2, mesh.z2];
  ends.forEach((values, k) => {
    const axis = k % AXES;
    let least = box[axis]!;
    let most = box[axis + AXES]!;
    for (let at = from; at < to; at++) {
      const value = values[order[at]!]!;
      if (value < least) least = value;
      if (value > most) most = value;
    }
    box[axis] = least;
    box[axis + AXES] = most;
  });
}

/** Reorders places `from … to − 1` so that no key before `middle` is above one from there on (Hoare's selection); equal keys by index. */
function partition(order: Int32Array, key: Float64Array, from: number, to: number, middle: number): void {
  let low = from;
  let high = to - 1;
  while (low < high) {
    const pivot = order[(low + high) >> 1]!;
    const value = key[pivot]!;
    let i = low;
    let j = high;
    while (i <= j) {
      while (before(key, order[i]!, value, pivot)) i++;
      while (after(key, order[j]!, value, pivot)) j--;
      if (i > j) break;
      const other = order[i]!;
      order[i++] = order[j]!;
      order[j--] = other;
    }
    if (middle <= j) high = j;
    else if (middle >= i) low = i;
    else return;
  }
}

function before(key: Float64Array, item: number, value: number, pivot: number): boolean {
  const own = key[item]!;
  return own < value || (own === value && item < pivot);
}

function after(key: Float64Array, item: number, value: number, pivot: number): boolean {
  const own = key[item]!;
  return own > value || (own === value && item > pivot);
}

/** Diagonal of a cluster's box, m. */
export function diameter({ box }: ClusterTree, cluster: number): number {
  const at = cluster * 2 * AXES;
  return Math.hypot(box[at + 3]! - box[at]!, box[at + 4]! - box[at + 1]!, box[at + 5]! - box[at + 2]!);
}

/** Distance between the boxes of two clusters, m; 0 where they overlap. */
export function boxDistance({ box }: ClusterTree, one: number, other: number): number {
  const a = one * 2 * AXES;
  const b = other * 2 * AXES;
  let sum = 0;
  for (let axis = 0; axis < AXES; axis++) {
    const gap = Math.max(0, box[a + axis]! - box[b + axis + AXES]!, box[b + axis]! - box[a + axis + AXES]!);
    sum += gap * gap;
  }
  return Math.sqrt(sum);
}
