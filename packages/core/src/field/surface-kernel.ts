// The surface potentials of one group of metal at many points, by the compiled kernel.
import { BYTES_A_DOUBLE, doublesAt, type Kernel, kernelOf, place } from '../kernels/instance.ts';
import { surfaceBytes } from '../kernels/surface-bytes.ts';
import type { RadialTable } from '../leakage/radial-table.ts';
import { gaussLegendre } from '../numerics/gauss-legendre.ts';
import { FOUR_POINTS, restOrder, TWO_POINTS } from './direct-sum.ts';
import type { SegmentGroup } from './segment-group.ts';

/** A group as the kernel reads it. */
export interface PackedGroup {
  readonly vertical: boolean;
  readonly count: number;
  /** nine doubles a horizontal segment, four a vertical one */
  readonly segments: Float64Array;
  /** shape [count × cases] */
  readonly strength: Float64Array;
  readonly all: RadialTable | undefined;
  readonly rest: RadialTable | undefined;
  /** Gauss rules in pairs: that of four points, then those of near segments */
  readonly rules: Float64Array;
  readonly ownWeight: number;
  readonly z1: number;
  readonly z2: number;
}

export function packGroup(group: SegmentGroup): PackedGroup {
  const { count, cx, cy, hx, hy, length, radiusSquared } = group;
  const zz = group.z1 * group.z1;
  const rules: number[] = pairedRule(FOUR);
  const ruleAt = new Map<number, number>();
  const segments = new Float64Array(count * (group.vertical ? 4 : 9));
  for (let j = 0; j < count; j++) {
    const l = length[j]!;
    if (group.vertical) {
      segments.set([cx[j]!, cy[j]!, radiusSquared, l], j * 4);
      continue;
    }
    const order = restOrder(group, l);
    if (!ruleAt.has(order)) {
      ruleAt.set(order, rules.length * BYTES_A_DOUBLE);
      rules.push(...pairedRule(order));
    }
    const two = TWO_POINTS * TWO_POINTS * l * l - zz;
    const four = FOUR_POINTS * FOUR_POINTS * l * l - zz;
    const rule = ruleAt.get(order)!;
    segments.set([cx[j]!, cy[j]!, hx[j]!, hy[j]!, two, four, l, zz + radiusSquared, rule], j * 9);
  }
  return { ...group, segments, rules: Float64Array.from(rules) };
}

/** Points of the first rule, that of segments neither near nor far. */
const FOUR = 4;

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
    kernel.call('upright', s, count, w, restAt, perRest, ownWeight, z1, z2, cases, x, y, xs.length, o);
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
