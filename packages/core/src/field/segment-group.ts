// The segments of one depth class that leak, packed for the sum of their surface potentials.
import type { RadialTable } from '../leakage/radial-table.ts';
import type { FarCluster } from './far-clusters.ts';

/** Segments of one depth class that leak; coordinates and currents packed, shape [count] each. */
export interface SegmentGroup {
  readonly vertical: boolean;
  readonly z1: number;
  readonly z2: number;
  readonly count: number;
  /** centre and half vector in plan */
  readonly cx: Float64Array;
  readonly cy: Float64Array;
  readonly hx: Float64Array;
  readonly hy: Float64Array;
  readonly length: Float64Array;
  readonly radiusSquared: Float64Array;
  /** leakages times the list's factor, shape [count × leakages] */
  readonly strength: Float64Array;
  /** weight of the images at the metal's own distance: the source and its reflection in the surface */
  readonly ownWeight: number;
  /** all images (horizontal metal) */
  readonly all: RadialTable | undefined;
  /** images other than those at the metal's own distance */
  readonly rest: RadialTable | undefined;
  /** boxes of horizontal segments whose far field is that of a few points */
  readonly clusters: FarCluster | undefined;
}
