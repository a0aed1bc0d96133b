// The surface potentials of one group of metal at many points, by the compiled kernel.
import { doublesAt, type Kernel, kernelOf, place } from '../kernels/instance.ts';
import { surfaceBytes } from '../kernels/surface-bytes.ts';
import type { RadialTable } from '../leakage/radial-table.ts';
import { gaussLegendre } from '../numerics/gauss-legendre.ts';
import type { SegmentGroup } from './segment-group.ts';

/** A group as the kernel reads it. */
export interface PackedGroup {
  readonly vertical: boolean;
  readonly count: number;
  /** ten doubles a horizontal segment, four a vertical one */
  readonly segments: Float64Array;
  /** shape [count × cases] */
  readonly strength: Float64Array;
  readonly all: RadialTable | undefined;
  readonly rest: RadialTable | undefined;
  /** Gauss rules of near segments, in pairs */
  readonly rules: Float64Array;
  readonly ownWeight: number;
  readonly z1: number;
  readonly z2: number;
}

/**
 * @param twoPoints ratio of distance to length past which two Gauss points are enough
 * @param threePoints the same for three
 * @param order Gauss points of a near segment of a length, m, on the rest's table
 */
export function packGroup(
  group: SegmentGroup,
  twoPoints: number,
  threePoints: number,
  order: (length: number) => number,
): PackedGroup {
  const { count, cx, cy, hx, hy, length, radiusSquared } = group;
  const zz = group.z1 * group.z1;
  const rules: number[] = [];
  const ruleAt = new Map<number, number>();
  const segments = new Float64Array(count * (group.vertical ? 4 : 10));
  for (let j = 0; j < count; j++) {
    const l = length[j]!;
    if (group.vertical) {
      segments.set([cx[j]!, cy[j]!, radiusSquared[j]!, l], j * 4);
      continue;
    }
    const points = order(l);
    if (!ruleAt.has(points)) {
      ruleAt.set(points, rules.length * 8);
      rules.push(...pairedRule(points));
    }
    const ux = hx[j]!;
    const uy = hy[j]!;
    const two = twoPoints * twoPoints * l * l - zz;
    const three = threePoints * threePoints * l * l - zz;
    segments.set(
      [cx[j]!, cy[j]!, ux, uy, ux * ux + uy * uy, two, three, l, zz + radiusSquared[j]!, ruleAt.get(points)!],
      j * 10,
    );
  }
  return { ...group, segments, rules: Float64Array.from(rules) };
}

/** Number of pairs, then for each pair its two points on [−1, 1] and its two weights. */
function pairedRule(order: number): number[] {
  const { points, weights } = gaussLegendre(order);
  const pairs = Math.ceil(order / 2);
  const rule = [pairs];
  for (let k = 0; k < pairs; k++) {
    const a = 2 * k;
    const b = a + 1 < order ? a + 1 : a;
    rule.push(2 * points[a]! - 1, 2 * points[b]! - 1, weights[a]!, b === a ? 0 : weights[b]!);
  }
  return rule;
}

export function surfaceKernel(): Kernel | undefined {
  return kernelOf(surfaceBytes);
}

/**
 * Adds the potentials of a group at every point.
 * @param into shape [points × cases]
 * @returns false where memory was refused, with nothing added
 */
export function addByKernel(
  kernel: Kernel,
  group: PackedGroup,
  cases: number,
  farRatio: number,
  xs: Float64Array,
  ys: Float64Array,
  into: Float64Array,
): boolean {
  const none = new Float64Array(0);
  const { segments, strength, rules, all, rest, count } = group;
  const sums = new Float64Array(2 * cases);
  const arrays = [segments, strength, all?.bins ?? none, rest?.bins ?? none, rules, sums, xs, ys, into];
  const at = place(kernel, arrays);
  if (at === undefined) return false;
  const [s = 0, w = 0, a = 0, r = 0, g = 0, t = 0, x = 0, y = 0, o = 0] = at;
  const restAt = rest === undefined ? 0 : r;
  const perRest = rest?.perSquare ?? 0;
  if (group.vertical) {
    const { ownWeight, z1, z2 } = group;
    kernel.call(
      'upright',
      s,
      count,
      w,
      restAt,
      perRest,
      ownWeight,
      z1,
      z2,
      farRatio,
      cases,
      x,
      y,
      xs.length,
      o,
    );
  } else {
    const perAll = all?.perSquare ?? 0;
    kernel.call(
      'level',
      s,
      count,
      w,
      a,
      perAll,
      restAt,
      perRest,
      group.ownWeight,
      g,
      cases,
      t,
      x,
      y,
      xs.length,
      o,
    );
  }
  into.set(doublesAt(kernel, o, into.length));
  return true;
}
