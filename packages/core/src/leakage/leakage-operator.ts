// The leakage matrix stored in the way that suits its size.
import type { SegmentMesh } from '../geometry/segments.ts';
import type { SoilImages } from '../soil/image-list.ts';
import { compressedLeakageMatrix } from './compressed-matrix.ts';
import { type LeakageMatrix, leakageMatrix, leakingSegments } from './leakage-matrix.ts';

/** Beyond this many leaking segments far blocks are compressed: the whole matrix would take longer to fill and 0.04 GB. */
export const WHOLE_AT_MOST = 3000;

export function leakageOperator(mesh: SegmentMesh, images: SoilImages): LeakageMatrix {
  return leakingSegments(mesh).length <= WHOLE_AT_MOST
    ? leakageMatrix(mesh, images)
    : compressedLeakageMatrix(mesh, images);
}
