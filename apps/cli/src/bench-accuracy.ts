// How exact the engine's entries are on a case: those it computes and those it stores, against direct quadrature.
import { type LeakageMatrix, leakageMatrix, type SegmentMesh } from '@ohmstead/core';
import { referenceEntry } from './bench-reference.ts';
import { seeded } from './bench-seed.ts';
import { type BenchSystem, ownImages } from './bench-system.ts';
import { relative } from './bench-table.ts';

export interface EntryErrors {
  /** largest |R_ij − reference|/reference over the sample, of entries as they are computed */
  readonly computed: number;
  /** the same of the matrix that a study would solve, whose far blocks may be compressed */
  readonly stored: number;
}

const SEED = 4;
const COLUMNS = 16;
/** Rows looked at in each column: those nearest, itself among them, and others anywhere. */
const NEAREST = 16;
const ANYWHERE = 16;

/** Samples columns and rows from a seed. A lattice has one depth in one layer, so one image list serves. */
export async function entryErrors(system: BenchSystem, stored: LeakageMatrix): Promise<EntryErrors> {
  const { mesh, images } = system;
  const list = ownImages(mesh, images);
  const random = seeded(SEED);
  const worst = { computed: 0, stored: 0 };
  for (let k = 0; k < COLUMNS; k++) {
    const column = random(mesh.count);
    const rows = [...nearest(mesh, column), ...Array.from({ length: ANYWHERE }, () => random(mesh.count))];
    const kept = await columnOf(stored, column);
    // the first row is the column's own segment
    const made = await columnOf(await leakageMatrix(partOf(mesh, rows), images), 0);
    rows.forEach((row, at) => {
      const exact = referenceEntry(mesh, row, column, list);
      worst.computed = Math.max(worst.computed, Math.abs(made[at]! / exact - 1));
      worst.stored = Math.max(worst.stored, Math.abs(kept[row]! / exact - 1));
    });
  }
  return worst;
}

async function columnOf(matrix: LeakageMatrix, column: number): Promise<Float64Array> {
  const unit = new Float64Array(matrix.size);
  const into = new Float64Array(matrix.size);
  unit[column] = 1;
  await matrix.multiply(unit, into);
  return into;
}

/** Some segments of a mesh, its nodes left as they are. */
function partOf(mesh: SegmentMesh, chosen: readonly number[]): SegmentMesh {
  const doubles = (all: Float64Array): Float64Array => Float64Array.from(chosen, (i) => all[i]!);
  const whole = (all: Int32Array): Int32Array => Int32Array.from(chosen, (i) => all[i]!);
  return {
    ...mesh,
    count: chosen.length,
    x1: doubles(mesh.x1),
    y1: doubles(mesh.y1),
    z1: doubles(mesh.z1),
    x2: doubles(mesh.x2),
    y2: doubles(mesh.y2),
    z2: doubles(mesh.z2),
    length: doubles(mesh.length),
    radius: doubles(mesh.radius),
    layer: whole(mesh.layer),
    leaking: Uint8Array.from(chosen, (i) => mesh.leaking[i]!),
    conductor: whole(mesh.conductor),
    node1: whole(mesh.node1),
    node2: whole(mesh.node2),
  };
}

/** The segments whose centres lie nearest to that of one, itself first. */
function nearest(mesh: SegmentMesh, to: number): number[] {
  const far = Float64Array.from(mesh.x1, (_, i) =>
    Math.hypot(
      mesh.x1[i]! + mesh.x2[i]! - mesh.x1[to]! - mesh.x2[to]!,
      mesh.y1[i]! + mesh.y2[i]! - mesh.y1[to]! - mesh.y2[to]!,
    ),
  );
  return Array.from(far.keys())
    .sort((a, b) => far[a]! - far[b]! || a - b)
    .slice(0, NEAREST);
}

export function entryText({ computed, stored }: EntryErrors): string {
  return `Worst sampled entry off by ${relative(computed)} as computed, ${relative(stored)} as stored`;
}
