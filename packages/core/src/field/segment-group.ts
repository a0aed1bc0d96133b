// The segments of one depth class that leak, packed for the sum of their surface potentials.
import type { SegmentMesh } from '../geometry/segments.ts';
import type { DepthClass } from '../leakage/depth-classes.ts';
import type { RadialTable } from '../leakage/radial-table.ts';
import { smoothKernel } from '../leakage/smooth-kernel.ts';
import type { SoilImages } from '../soil/image-list.ts';
import type { PlanBox } from './table-reach.ts';

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
}

/** An image offset below this is none, m. */
const NO_OFFSET = 1e-12;

/**
 * @param members segments of the class that leak
 * @param leakages current into the soil by segment, A; shape [mesh.count] each
 * @param reach largest distance that the tables hold, m
 */
export function segmentGroup(
  mesh: SegmentMesh,
  images: SoilImages,
  leakages: readonly Float64Array[],
  depths: DepthClass,
  members: readonly number[],
  reach: number,
): SegmentGroup {
  const list = images.list(depths.layer, 0);
  const pick = (value: (i: number) => number): Float64Array => Float64Array.from(members, value);
  const every = Array.from({ length: list.count }, (_, k) => k);
  const own = every.filter((k) => Math.abs(list.offset[k]!) < NO_OFFSET);
  const others = every.filter((k) => Math.abs(list.offset[k]!) >= NO_OFFSET);
  return {
    vertical: depths.vertical,
    z1: depths.z1,
    z2: depths.z2,
    count: members.length,
    cx: pick((i) => (mesh.x1[i]! + mesh.x2[i]!) / 2),
    cy: pick((i) => (mesh.y1[i]! + mesh.y2[i]!) / 2),
    hx: pick((i) => (mesh.x2[i]! - mesh.x1[i]!) / 2),
    hy: pick((i) => (mesh.y2[i]! - mesh.y1[i]!) / 2),
    length: pick((i) => mesh.length[i]!),
    radiusSquared: pick((i) => mesh.radius[i]! ** 2),
    strength: Float64Array.from(members.flatMap((i) => leakages.map((of) => of[i]! * list.factor))),
    ownWeight: own.reduce((sum, k) => sum + list.weight[k]!, 0),
    all: depths.vertical ? undefined : smoothKernel(list, every, depths, 0, reach),
    rest: smoothKernel(list, others, depths, 0, reach),
  };
}

/** Box around the metal of some groups; undefined where there is none. */
export function metalBox(groups: readonly SegmentGroup[]): PlanBox | undefined {
  const box: [number, number, number, number] = [Infinity, Infinity, -Infinity, -Infinity];
  for (const { count, cx, cy, hx, hy } of groups)
    for (let j = 0; j < count; j++) {
      box[0] = Math.min(box[0], cx[j]! - Math.abs(hx[j]!));
      box[1] = Math.min(box[1], cy[j]! - Math.abs(hy[j]!));
      box[2] = Math.max(box[2], cx[j]! + Math.abs(hx[j]!));
      box[3] = Math.max(box[3], cy[j]! + Math.abs(hy[j]!));
    }
  return box[0] <= box[2] ? box : undefined;
}
