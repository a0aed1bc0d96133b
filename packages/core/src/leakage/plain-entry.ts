// One entry of the leakage matrix by plain code: the twin of assembly/leakage.ts, and what runs where kernels cannot.
import { nodeReader } from './depth-nodes.ts';
import type { DepthPairs } from './depth-pairs.ts';
import { imageSum, pointSum } from './image-sums.ts';
import { pairOrder, smoothOrder } from './pair-potential.ts';
import { farMean, planMean, pointMean } from './plan-means.ts';
import { AA, CX, CY, CZ, LEAST, LENGTH, NEAR, RANK, RECORD, THIRD, UX, UY, UZ } from './segment-records.ts';

/** R_ij of two segments of the mesh, Ω. */
export type LeakageEntry = (i: number, j: number) => number;

/**
 * R_ij = factor·Σ_images weight·(1/L_i L_j)∬ ds dt/√(r² + a²), a the larger radius. Far pairs by a table of all images
 * over Gauss points in plan, or by one place of it; near ones by closed form for the primary images and a table for the
 * rest; image by image where there is no table.
 */
export function plainEntry(records: Float64Array, { count, classOf, pairs }: DepthPairs): LeakageEntry {
  const r = records;
  const nodeMean = nodeReader();
  return (i, j) => {
    // the shallower layer is the source, and of one layer the segment that comes first: R_ij and R_ji are the same sum
    const first = r[i * RECORD + RANK]! <= r[j * RECORD + RANK]!;
    const source = (first ? i : j) * RECORD;
    const field = (first ? j : i) * RECORD;
    const { list, singly, far, rest, nodes, weights } = pairs[classOf[i]! * count + classOf[j]!]!;
    const { factor } = list;
    const dx = r[field + CX]! - r[source + CX]!;
    const dy = r[field + CY]! - r[source + CY]!;
    const dz = r[field + CZ]! - r[source + CZ]!;
    const plan = dx * dx + dy * dy;
    const distance = plan + dz * dz;
    const aa = Math.max(r[field + AA]!, r[source + AA]!);
    const lf = r[field + LENGTH]!;
    const ls = r[source + LENGTH]!;
    if (distance >= Math.max(r[field + NEAR]!, r[source + NEAR]!)) {
      if (far !== undefined && plan >= Math.max(r[field + LEAST]!, r[source + LEAST]!))
        return factor * farMean(r, field, source, distance, aa, far);
      let sum = pointSum(r, field, source, aa, pairOrder(distance, lf * lf), pairOrder(distance, ls * ls), singly, 0, singly.count); // biome-ignore format: one call
      if (nodes !== undefined) sum += nodeMean(nodes, weights!, plan + aa);
      if (rest !== undefined) sum += pointMean(r, field, source, distance, aa, rest);
      return factor * sum;
    }
    if (rest !== undefined) {
      const gap = leastGap(r, field, source, dx, dy, dz, distance);
      const smooth = gap * gap + rest.smoothness ** 2;
      const orderF = r[field + THIRD]! > 0 ? smoothOrder(smooth, lf) : 1;
      const orderS = r[source + THIRD]! > 0 ? smoothOrder(smooth, ls) : 1;
      // images that are too close for points: all by closed form
      if (orderF === 0 || orderS === 0) return factor * imageSum(r, field, source, aa, list);
      return (
        factor *
        (imageSum(r, field, source, aa, singly) + planMean(r, field, source, aa, orderF, orderS, rest))
      );
    }
    const sum = imageSum(r, field, source, aa, singly);
    return factor * (nodes === undefined ? sum : sum + nodeMean(nodes, weights!, plan + aa));
  };
}

/** A distance that no two points of the segments fall below: along the line of their centres. */
function leastGap(
  r: Float64Array,
  field: number,
  source: number,
  dx: number,
  dy: number,
  dz: number,
  distance: number,
): number {
  if (distance === 0) return 0;
  const along = (at: number): number =>
    0.5 * r[at + LENGTH]! * Math.abs(dx * r[at + UX]! + dy * r[at + UY]! + dz * r[at + UZ]!);
  return Math.max(0, distance - along(field) - along(source)) / Math.sqrt(distance);
}
