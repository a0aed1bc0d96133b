// The leakage matrix stored in the way that suits its size, and the memory that takes.
import type { Crew } from '../crew/crew.ts';
import type { SegmentMesh } from '../geometry/segments.ts';
import type { SoilImages } from '../soil/image-list.ts';
import { planBlocks, plannedBytes } from './block-plan.ts';
import { compressedByPlan } from './compressed-matrix.ts';
import { crewMatrix, crewPays } from './crew-matrix.ts';
import { type LeakageMatrix, leakageMatrix, leakingSegments } from './leakage-matrix.ts';

/** Segments up to which the whole matrix is filled and solved as fast: both take the same time at 1 700, measured. */
const WHOLE_AT_MOST = 2000;
/**
 * Right-hand sides, one a piece of metal at least, from which a factor of the whole matrix pays up to more segments: it
 * costs as much as 25 to 55 compressed solutions between 3 000 and 4 000, from operation counts.
 */
const MANY = 32;
const WHOLE_FOR_MANY = 4000;

/** @param pieces of metal not joined to each other, each of which brings a right-hand side */
export function leakageStorage(segments: number, pieces: number): 'whole' | 'compressed' {
  return segments <= WHOLE_AT_MOST || (segments <= WHOLE_FOR_MANY && pieces >= MANY) ? 'whole' : 'compressed';
}

/**
 * @param crew shares in a compressed matrix that is large enough; whether there is one or not changes no bit
 * @throws NotPositiveDefinite, MemoryRefused
 */
export async function leakageOperator(
  mesh: SegmentMesh,
  images: SoilImages,
  crew?: Crew,
): Promise<LeakageMatrix> {
  if (leakageStorage(leakingSegments(mesh).length, mesh.componentCount) === 'whole')
    return leakageMatrix(mesh, images);
  const plan = planBlocks(mesh);
  return crew !== undefined && crew.size > 0 && crewPays(plan)
    ? crewMatrix(mesh, images, plan, crew)
    : compressedByPlan(mesh, images, plan);
}

/** Of a compressed matrix while it is made, over what stays: bases in doubles, leaves before they are in place. */
const MAKING = 1.6;

/** Bytes that making and solving a mesh's leakage matrix will take, foreseen without computing an entry; to a fifth. */
export function leakageBytes(mesh: SegmentMesh): number {
  const size = leakingSegments(mesh).length;
  // a whole matrix and its factor
  if (leakageStorage(size, mesh.componentCount) === 'whole')
    return size * (size + 1) * Float64Array.BYTES_PER_ELEMENT;
  return MAKING * plannedBytes(planBlocks(mesh));
}
