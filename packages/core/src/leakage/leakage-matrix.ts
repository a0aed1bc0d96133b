// The leakage matrix: mutual resistance between every two leaking segments, Galerkin, symmetric positive definite.
import type { SegmentMesh } from '../geometry/segments.ts';
import type { Product, Products } from '../numerics/conjugate-gradients.ts';
import type { PackedLower } from '../numerics/packed-cholesky.ts';
import { packedOperator } from '../numerics/packed-operator.ts';
import { type PackedStore, packedStore } from '../numerics/packed-store.ts';
import type { SoilImages } from '../soil/image-list.ts';
import { type DepthPairs, depthPairs } from './depth-pairs.ts';
import { leakageKernel } from './leakage-kernel.ts';
import { type LeakageEntry, plainEntry } from './plain-entry.ts';
import { segmentRecords } from './segment-records.ts';

/** The leakage matrix behind one interface, however it is stored. */
export interface LeakageMatrix {
  /** leaking segments, as indices into the mesh; shape [size] */
  readonly segments: Int32Array;
  readonly size: number;
  /** R_ii, Ω; shape [size] */
  readonly diagonal: Float64Array;
  /** writes R x, V */
  readonly multiply: Product;
  /** the same for several vectors in one pass over the matrix, where it is cheaper so */
  readonly multiplyAll?: Products;
  /** writes an approximate R⁻¹ r that keeps iterations few; symmetric positive definite */
  precondition(r: Float64Array, into: Float64Array): void;
  /** R_ij, Ω: mean potential of segment i per ampere leaked evenly by segment j; packed lower triangle, where it is stored whole */
  readonly entries?: PackedLower;
}

export interface DenseLeakageMatrix extends LeakageMatrix {
  readonly entries: PackedLower;
}

/**
 * Assembles the matrix: R_ij = factor·Σ_images weight·(1/L_i L_j)∬ ds dt/√(r² + a²), a the larger radius.
 * Primary images: closed double integral when near. The smooth rest, and all images when far: one table in horizontal
 * distance for each pair of depths, so that the number of images costs nothing. Entries err by less than 1e-6 of
 * themselves; by the compiled kernel where there is one.
 */
export function leakageMatrix(mesh: SegmentMesh, images: SoilImages): DenseLeakageMatrix {
  const segments = leakingSegments(mesh);
  const size = segments.length;
  const store = packedStore(size);
  const { entries } = store;
  const { records, depths } = leakageTables(mesh, images);
  const kernel = leakageKernel(records, depths, false);
  if (kernel?.triangle(segments, entries) !== true) {
    const entry = plainEntry(records, depths);
    for (let row = 0; row < size; row++)
      for (let column = 0; column <= row; column++)
        entries[(row * (row + 1)) / 2 + column] = entry(segments[row]!, segments[column]!);
  }
  return storedMatrix(segments, store);
}

/** A stored matrix, its entries filled, behind the interface. */
export function storedMatrix(segments: Int32Array, store: PackedStore): DenseLeakageMatrix {
  const { size, entries } = store;
  const diagonal = Float64Array.from({ length: size }, (_, i) => entries[(i * (i + 3)) / 2]!);
  return { segments, size, entries, diagonal, ...packedOperator(store) };
}

/** Prepares the tables from which single entries of the leakage matrix are made, the same as in blocks. */
export function leakageEntries(mesh: SegmentMesh, images: SoilImages): LeakageEntry {
  const fill = leakageBlocks(mesh, images);
  const [row, column, value] = [new Int32Array(1), new Int32Array(1), new Float64Array(1)];
  return (i, j) => {
    row[0] = i;
    column[0] = j;
    fill(row, column, value);
    return value[0]!;
  };
}

/**
 * Fills a block of the leakage matrix, Ω, row after row; rows and columns are indices into the mesh.
 * `into` shape [rows × columns]
 */
export type LeakageBlocks = (rows: Int32Array, columns: Int32Array, into: Float64Array) => void;

/** What entries are made of: segments and tables; plain data. */
export interface LeakageTables {
  readonly records: Float64Array;
  readonly depths: DepthPairs;
}

export function leakageTables(mesh: SegmentMesh, images: SoilImages): LeakageTables {
  // tables are read at r² + a²
  const thickest = mesh.radius.reduce((most, radius) => Math.max(most, radius), 0);
  const depths = depthPairs(mesh, images, Math.hypot(planReach(mesh), thickest));
  return {
    records: segmentRecords(mesh, (i) => depths.upright[depths.classOf[i]!]!, depths.uprightLeast),
    depths,
  };
}

/**
 * Prepares the tables from which blocks of the leakage matrix are made. An entry is the same to the last bit in whatever
 * block it is asked for.
 */
export function leakageBlocks(mesh: SegmentMesh, images: SoilImages): LeakageBlocks {
  return blocksFrom(leakageTables(mesh, images));
}

/** The same from tables prepared before. */
export function blocksFrom({ records, depths }: LeakageTables): LeakageBlocks {
  const kernel = leakageKernel(records, depths, true);
  const entry = plainEntry(records, depths);
  return (rows, columns, into) => {
    if (kernel?.block(rows, columns, into) === true) return;
    for (let r = 0; r < rows.length; r++)
      for (let c = 0; c < columns.length; c++) into[r * columns.length + c] = entry(rows[r]!, columns[c]!);
  };
}

export function leakingSegments(mesh: SegmentMesh): Int32Array {
  const found: number[] = [];
  for (let i = 0; i < mesh.count; i++) if (mesh.leaking[i] === 1) found.push(i);
  return Int32Array.from(found);
}

/** Diagonal of the mesh's bounding box in plan, m. */
export function planReach(mesh: SegmentMesh): number {
  let west = Number.POSITIVE_INFINITY;
  let east = Number.NEGATIVE_INFINITY;
  let south = Number.POSITIVE_INFINITY;
  let north = Number.NEGATIVE_INFINITY;
  for (let i = 0; i < mesh.count; i++) {
    west = Math.min(west, mesh.x1[i]!, mesh.x2[i]!);
    east = Math.max(east, mesh.x1[i]!, mesh.x2[i]!);
    south = Math.min(south, mesh.y1[i]!, mesh.y2[i]!);
    north = Math.max(north, mesh.y1[i]!, mesh.y2[i]!);
  }
  return Math.hypot(east - west, north - south);
}
