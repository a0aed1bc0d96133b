// Segments of one depth class and one radius that leak, packed for the sum of their surface potentials.
import type { SegmentMesh } from '../geometry/segments.ts';
import type { DepthClass } from '../leakage/depth-classes.ts';
import { type RadialTable, radialTable, radialValue } from '../leakage/radial-table.ts';
import { smoothKernel } from '../leakage/smooth-kernel.ts';
import type { ImageList, SoilImages } from '../soil/image-list.ts';
import type { PlanBox } from './table-reach.ts';

/** Coordinates and currents packed, shape [count] each. Tables are functions of the distance in plan, radius included. */
export interface SegmentGroup {
  readonly vertical: boolean;
  readonly z1: number;
  readonly z2: number;
  /** m² */
  readonly radiusSquared: number;
  readonly count: number;
  /** centre and half vector in plan */
  readonly cx: Float64Array;
  readonly cy: Float64Array;
  readonly hx: Float64Array;
  readonly hy: Float64Array;
  readonly length: Float64Array;
  /** leakages times the list's factor, shape [count × leakages] */
  readonly strength: Float64Array;
  /** weight of the images at the metal's own distance: the source and its reflection in the surface */
  readonly ownWeight: number;
  /** all images (horizontal metal) */
  readonly all: RadialTable | undefined;
  /** images other than those at the metal's own distance */
  readonly rest: RadialTable | undefined;
}

/** Longer segments, over the depth of their farther images, are summed in parts, so that a few Gauss points do for each. */
const LONGEST = 4;

/** An image offset below this is none, m. */
const NO_OFFSET = 1e-12;

/** Whether an image lies at the metal's own distance from the surface: the source or its reflection there. */
export function isOwn({ offset }: ImageList, k: number): boolean {
  return Math.abs(offset[k]!) < NO_OFFSET;
}

/**
 * @param members segments of the class that leak, of one radius
 * @param leakages current into the soil by segment, A; shape [mesh.count] each
 * @param reach largest distance that the tables hold, m
 * @param upright table of the farther images of vertical metal
 */
export function segmentGroup(
  mesh: SegmentMesh,
  images: SoilImages,
  leakages: readonly Float64Array[],
  depths: DepthClass,
  members: readonly [number, ...number[]],
  reach: number,
  upright: (depths: DepthClass, radius: number) => RadialTable | undefined,
): SegmentGroup {
  const list = images.list(depths.layer, 0);
  const every = Array.from({ length: list.count }, (_, k) => k);
  const own = every.filter((k) => isOwn(list, k));
  const others = every.filter((k) => !isOwn(list, k));
  const ownWeight = own.reduce((sum, k) => sum + list.weight[k]!, 0);
  const radius = mesh.radius[members[0]]!;
  const rest = depths.vertical ? upright(depths, radius) : levelRest(list, others, depths, radius, reach);
  const longest = depths.vertical || rest === undefined ? Infinity : LONGEST * rest.smoothness;
  const parts = members.flatMap((i) => evenParts(mesh, i, Math.ceil(mesh.length[i]! / longest) || 1));
  const pick = (value: (part: Part) => number): Float64Array => Float64Array.from(parts, value);
  return {
    vertical: depths.vertical,
    z1: depths.z1,
    z2: depths.z2,
    radiusSquared: radius * radius,
    count: parts.length,
    cx: pick((part) => part.cx),
    cy: pick((part) => part.cy),
    hx: pick((part) => part.hx),
    hy: pick((part) => part.hy),
    length: pick((part) => part.share * mesh.length[part.segment]!),
    strength: Float64Array.from(
      parts.flatMap(({ segment, share }) => leakages.map((of) => share * of[segment]! * list.factor)),
    ),
    ownWeight,
    all: depths.vertical ? undefined : allImages(ownWeight, rest, Math.hypot(depths.z1, radius), reach),
    rest,
  };
}

interface Part {
  readonly segment: number;
  /** of the segment's length and current */
  readonly share: number;
  readonly cx: number;
  readonly cy: number;
  readonly hx: number;
  readonly hy: number;
}

function evenParts(mesh: SegmentMesh, segment: number, count: number): Part[] {
  const [x1, y1] = [mesh.x1[segment]!, mesh.y1[segment]!];
  const [dx, dy] = [mesh.x2[segment]! - x1, mesh.y2[segment]! - y1];
  return Array.from({ length: count }, (_, k) => {
    const middle = (k + 0.5) / count;
    return {
      segment,
      share: 1 / count,
      cx: x1 + middle * dx,
      cy: y1 + middle * dy,
      hx: dx / (2 * count),
      hy: dy / (2 * count),
    };
  });
}

/** The farther images of horizontal metal; its distance is that from the axis and the radius together, near and far alike. */
function levelRest(
  list: ImageList,
  others: readonly number[],
  depths: DepthClass,
  radius: number,
  reach: number,
): RadialTable | undefined {
  const thin = smoothKernel(list, others, depths, 0, Math.hypot(reach, radius));
  return thin && radialTable((rr) => radialValue(thin, rr + radius * radius), thin.smoothness, reach);
}

/** @param above depth and radius together, m */
function allImages(
  ownWeight: number,
  rest: RadialTable | undefined,
  above: number,
  reach: number,
): RadialTable {
  const smoothness = Math.min(above, rest?.smoothness ?? above);
  const own = (rr: number): number => ownWeight / Math.sqrt(rr + above * above);
  return radialTable((rr) => own(rr) + (rest === undefined ? 0 : radialValue(rest, rr)), smoothness, reach);
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
