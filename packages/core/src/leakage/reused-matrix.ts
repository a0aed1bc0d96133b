// The leakage matrix after a change of the drawing: entries between unchanged segments are taken from the matrix before.
import type { SegmentMesh } from '../geometry/segments.ts';
import { type PackedStore, packedStore } from '../numerics/packed-store.ts';
import type { SoilImages } from '../soil/image-list.ts';
import { placesAmongKnown } from './known-segments.ts';
import { type DenseLeakageMatrix, leakageBlocks, leakingSegments, storedMatrix } from './leakage-matrix.ts';

/** A matrix and what it was made from. */
export interface KnownLeakage {
  readonly mesh: SegmentMesh;
  readonly images: SoilImages;
  readonly matrix: DenseLeakageMatrix;
}

export interface ReusedLeakage extends KnownLeakage {
  /** segments found unchanged */
  readonly kept: number;
  /** entries computed anew: c(n − c) + c(c + 1)/2 for c changed segments of n */
  readonly computed: number;
}

/**
 * The leakage matrix of a changed mesh in the same soil. A conductor that is moved, added or removed changes its own
 * segments and those cut anew where it joins; rows of these alone are computed. Entries kept may differ from new ones
 * as two tables of the same images do, by 1e-7 of themselves at most: a table's bins follow the extent of the mesh. (To
 * start an iteration from the solution before saves one step of a dozen and costs one: measured, and left out.)
 */
export function reusedLeakageMatrix(previous: KnownLeakage, mesh: SegmentMesh): ReusedLeakage {
  const { images, matrix: known } = previous;
  const segments = leakingSegments(mesh);
  const places = placesAmongKnown(mesh, segments, previous.mesh, known.segments);
  const rows = Int32Array.from(segments, (_, k) => k);
  const kept = rows.filter((k) => places[k]! >= 0);
  const changed = rows.filter((k) => places[k]! < 0);
  const store = packedStore(segments.length);
  copyKept(store, kept, places, known.entries);
  const computed = changed.length === 0 ? 0 : computeChanged(store, kept, changed, segments, mesh, images);
  return { mesh, images, matrix: storedMatrix(segments, store), kept: kept.length, computed };
}

/** Copies entries between kept segments, by runs that lie side by side in both matrices. */
function copyKept({ entries }: PackedStore, kept: Int32Array, places: Int32Array, known: Float64Array): void {
  const from = kept.map((k) => places[k]!);
  const runs = runsOf(kept, from);
  for (let a = 0; a < kept.length; a++) {
    const row = rowStart(kept[a]!);
    const own = from[a]!;
    const knownRow = rowStart(own);
    for (let r = 0; runs[r]! <= a; r++) {
      const first = runs[r]!;
      const last = Math.min(runs[r + 1]!, a + 1) - 1;
      if (from[last]! <= own)
        entries.set(known.subarray(knownRow + from[first]!, knownRow + from[last]! + 1), row + kept[first]!);
      else
        for (let b = first; b <= last; b++) {
          const other = from[b]!;
          entries[row + kept[b]!] = known[other <= own ? knownRow + other : rowStart(other) + own]!;
        }
    }
  }
}

/** Where runs begin in which both lists count upward by one; then their length. */
function runsOf(a: Int32Array, b: Int32Array): number[] {
  const starts: number[] = [];
  for (let k = 0; k < a.length; k++)
    if (k === 0 || a[k]! !== a[k - 1]! + 1 || b[k]! !== b[k - 1]! + 1) starts.push(k);
  return [...starts, a.length];
}

function computeChanged(
  { entries }: PackedStore,
  kept: Int32Array,
  changed: Int32Array,
  segments: Int32Array,
  mesh: SegmentMesh,
  images: SoilImages,
): number {
  const fill = leakageBlocks(mesh, images);
  const inMesh = (rows: Int32Array): Int32Array => rows.map((k) => segments[k]!);
  const put = (rows: Int32Array, columns: Int32Array): number => {
    const values = new Float64Array(rows.length * columns.length);
    fill(inMesh(rows), inMesh(columns), values);
    let at = 0;
    for (let a = 0; a < rows.length; a++)
      for (let b = 0; b < columns.length; b++) {
        const [r, c] = [rows[a]!, columns[b]!];
        entries[r > c ? rowStart(r) + c : rowStart(c) + r] = values[at++]!;
      }
    return values.length;
  };
  let computed = put(changed, kept);
  for (let a = 0; a < changed.length; a++)
    computed += put(changed.subarray(a, a + 1), changed.subarray(0, a + 1));
  return computed;
}

function rowStart(i: number): number {
  return (i * (i + 1)) / 2;
}
