// The leakage matrix of a large electrode: near blocks whole, far blocks as thin products.
import type { SegmentMesh } from '../geometry/segments.ts';
import { crossApproximation, type LowRank } from '../numerics/cross-approximation.ts';
import { factorPacked, multiplyPacked, type PackedLower, solvePacked } from '../numerics/packed-cholesky.ts';
import type { SoilImages } from '../soil/image-list.ts';
import { boxDistance, type Cluster, clusterTree, diameter } from './cluster-tree.ts';
import { type LeakageMatrix, leakageEntries, leakingSegments } from './leakage-matrix.ts';

export interface CompressedLeakageMatrix extends LeakageMatrix {
  /** doubles kept for all blocks */
  readonly stored: number;
  /** entries computed to build them */
  readonly evaluations: number;
}

/** Most segments of a cluster that is not halved. */
const LEAF = 48;
/** Two clusters see each other smoothly when the smaller one's diameter is at most this share of their distance. */
const ADMISSIBLE = 1.5;
/** Error of a far block, of its norm: leaves resistance within 1e-5 of the whole matrix's. */
const BLOCK_TOLERANCE = 1e-5;

interface NearBlock {
  readonly row: Cluster;
  readonly column: Cluster;
  /** row after row */
  readonly values: Float64Array;
}

interface FarBlock {
  readonly row: Cluster;
  readonly column: Cluster;
  readonly product: LowRank;
}

interface LeafBlock {
  readonly cluster: Cluster;
  readonly values: PackedLower;
  readonly factor: PackedLower;
}

/**
 * Compressed by adaptive cross approximation over a tree of boxes; preconditioned by the factors of the leaves' own
 * blocks. The entries are those of the whole matrix.
 */
export function compressedLeakageMatrix(mesh: SegmentMesh, images: SoilImages): CompressedLeakageMatrix {
  const segments = leakingSegments(mesh);
  const size = segments.length;
  const { order, root } = clusterTree(mesh, segments, LEAF);
  const entryOf = leakageEntries(mesh, images);
  const segmentAt = Int32Array.from(order, (k) => segments[k]!);
  let evaluations = 0;
  const entry = (r: number, c: number): number => {
    evaluations++;
    return entryOf(segmentAt[r]!, segmentAt[c]!);
  };
  const near: NearBlock[] = [];
  const far: FarBlock[] = [];
  const leaves: LeafBlock[] = [];

  const pair = (row: Cluster, column: Cluster): void => {
    const gap = boxDistance(row.box, column.box);
    if (Math.min(diameter(row.box), diameter(column.box)) <= ADMISSIBLE * gap) {
      const rows = row.to - row.from;
      const columns = column.to - column.from;
      const most = Math.floor((rows * columns) / (rows + columns));
      const product = crossApproximation(
        rows,
        columns,
        (r, c) => entry(row.from + r, column.from + c),
        BLOCK_TOLERANCE,
        most,
      );
      if (product !== undefined) {
        far.push({ row, column, product });
        return;
      }
    }
    if (row.halves === undefined && column.halves === undefined) near.push(nearBlock(row, column, entry));
    else if (
      column.halves === undefined ||
      (row.halves !== undefined && row.to - row.from >= column.to - column.from)
    )
      for (const half of row.halves!) pair(half, column);
    else for (const half of column.halves) pair(row, half);
  };
  const own = (cluster: Cluster): void => {
    if (cluster.halves === undefined) {
      leaves.push(leafBlock(cluster, entry));
      return;
    }
    const [first, second] = cluster.halves;
    own(first);
    own(second);
    pair(second, first);
  };
  own(root);

  const diagonal = new Float64Array(size);
  for (const { cluster, values } of leaves)
    for (let k = 0; k < cluster.to - cluster.from; k++)
      diagonal[order[cluster.from + k]!] = values[(k * (k + 3)) / 2]!;
  const x = new Float64Array(size);
  const y = new Float64Array(size);
  return {
    segments,
    size,
    diagonal,
    stored:
      near.reduce((sum, block) => sum + block.values.length, 0) +
      far.reduce((sum, { product }) => sum + product.u.length + product.v.length, 0) +
      leaves.reduce((sum, leaf) => sum + 2 * leaf.values.length, 0),
    evaluations,
    multiply(given, into) {
      gather(order, given, x);
      y.fill(0);
      for (const leaf of leaves) addLeaf(leaf, x, y);
      for (const block of near) addNear(block, x, y);
      for (const block of far) addFar(block, x, y);
      scatter(order, y, into);
    },
    precondition(given, into) {
      gather(order, given, x);
      for (const { cluster, factor } of leaves)
        solvePacked(factor, cluster.to - cluster.from, x.subarray(cluster.from, cluster.to));
      scatter(order, x, into);
    },
  };
}

function nearBlock(row: Cluster, column: Cluster, entry: (r: number, c: number) => number): NearBlock {
  const columns = column.to - column.from;
  const values = new Float64Array((row.to - row.from) * columns);
  for (let r = row.from; r < row.to; r++)
    for (let c = column.from; c < column.to; c++)
      values[(r - row.from) * columns + c - column.from] = entry(r, c);
  return { row, column, values };
}

function leafBlock(cluster: Cluster, entry: (r: number, c: number) => number): LeafBlock {
  const n = cluster.to - cluster.from;
  const values = new Float64Array((n * (n + 1)) / 2);
  for (let r = 0; r < n; r++)
    for (let c = 0; c <= r; c++) values[(r * (r + 1)) / 2 + c] = entry(cluster.from + r, cluster.from + c);
  const factor = Float64Array.from(values);
  factorPacked(factor, n);
  return { cluster, values, factor };
}

function addLeaf({ cluster, values }: LeafBlock, x: Float64Array, y: Float64Array): void {
  const n = cluster.to - cluster.from;
  const own = new Float64Array(n);
  multiplyPacked(values, n, x.subarray(cluster.from, cluster.to), own);
  for (let k = 0; k < n; k++) y[cluster.from + k]! += own[k]!;
}

/** A block and its mirror across the diagonal. */
function addNear({ row, column, values }: NearBlock, x: Float64Array, y: Float64Array): void {
  const columns = column.to - column.from;
  for (let r = row.from; r < row.to; r++) {
    const at = (r - row.from) * columns;
    const xr = x[r]!;
    let sum = 0;
    for (let c = 0; c < columns; c++) {
      const value = values[at + c]!;
      sum += value * x[column.from + c]!;
      y[column.from + c]! += value * xr;
    }
    y[r]! += sum;
  }
}

/** Vectors of a product taken together, so that x and y are read and written once for four. */
const TOGETHER = 4;

function addFar({ row, column, product }: FarBlock, x: Float64Array, y: Float64Array): void {
  const { rank, rows, columns, u, v } = product;
  let k = 0;
  for (; k + TOGETHER <= rank; k += TOGETHER) {
    const u0 = k * rows;
    const u1 = u0 + rows;
    const u2 = u1 + rows;
    const u3 = u2 + rows;
    const v0 = k * columns;
    const v1 = v0 + columns;
    const v2 = v1 + columns;
    const v3 = v2 + columns;
    let c0 = 0;
    let c1 = 0;
    let c2 = 0;
    let c3 = 0;
    for (let c = 0; c < columns; c++) {
      const value = x[column.from + c]!;
      c0 += v[v0 + c]! * value;
      c1 += v[v1 + c]! * value;
      c2 += v[v2 + c]! * value;
      c3 += v[v3 + c]! * value;
    }
    let r0 = 0;
    let r1 = 0;
    let r2 = 0;
    let r3 = 0;
    for (let r = 0; r < rows; r++) {
      const value = x[row.from + r]!;
      const a0 = u[u0 + r]!;
      const a1 = u[u1 + r]!;
      const a2 = u[u2 + r]!;
      const a3 = u[u3 + r]!;
      r0 += a0 * value;
      r1 += a1 * value;
      r2 += a2 * value;
      r3 += a3 * value;
      y[row.from + r]! += a0 * c0 + a1 * c1 + (a2 * c2 + a3 * c3);
    }
    for (let c = 0; c < columns; c++)
      y[column.from + c]! += v[v0 + c]! * r0 + v[v1 + c]! * r1 + (v[v2 + c]! * r2 + v[v3 + c]! * r3);
  }
  for (; k < rank; k++) addOne(u, k * rows, v, k * columns, row, column, x, y);
}

function addOne(
  u: Float64Array,
  atU: number,
  v: Float64Array,
  atV: number,
  row: Cluster,
  column: Cluster,
  x: Float64Array,
  y: Float64Array,
): void {
  const rows = row.to - row.from;
  const columns = column.to - column.from;
  let fromColumns = 0;
  for (let c = 0; c < columns; c++) fromColumns += v[atV + c]! * x[column.from + c]!;
  let fromRows = 0;
  for (let r = 0; r < rows; r++) {
    fromRows += u[atU + r]! * x[row.from + r]!;
    y[row.from + r]! += u[atU + r]! * fromColumns;
  }
  for (let c = 0; c < columns; c++) y[column.from + c]! += v[atV + c]! * fromRows;
}

function gather(order: Int32Array, given: Float64Array, into: Float64Array): void {
  for (let k = 0; k < order.length; k++) into[k] = given[order[k]!]!;
}

function scatter(order: Int32Array, given: Float64Array, into: Float64Array): void {
  for (let k = 0; k < order.length; k++) into[order[k]!] = given[k]!;
}
