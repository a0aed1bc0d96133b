// Leaking segments gathered in boxes whose far field is that of a few points: a tree for maps of large electrodes.
import { type RadialTable, radialValue } from '../leakage/radial-table.ts';
import { gaussLegendre } from '../numerics/gauss-legendre.ts';

/** Straight segments in plan with the leakages of several cases; shape [count], strengths [count × cases]. */
export interface PlanSegments {
  readonly count: number;
  /** centre and half vector */
  readonly cx: Float64Array;
  readonly cy: Float64Array;
  readonly hx: Float64Array;
  readonly hy: Float64Array;
  readonly strength: Float64Array;
}

/** Segments `from … to − 1` in a box. */
export interface FarCluster {
  readonly from: number;
  readonly to: number;
  /** centre of the box, m */
  readonly x: number;
  readonly y: number;
  /** squared distance from which the box's points stand for its segments, m² */
  readonly farSquared: number;
  /** the points' coordinates, shape [POINTS] each way */
  readonly px: Float64Array;
  readonly py: Float64Array;
  /** shape [POINTS² × cases], x fastest */
  readonly strength: Float64Array;
  readonly halves: readonly [FarCluster, FarCluster] | undefined;
}

/** Chebyshev points each way in a box: with the distance below they leave 3e-6 of a box's field. */
const POINTS = 6;
/** Distance from a box's centre, in its half diagonals, from which its points are used. */
const FAR = 3;
/** Segments below which a box costs no less than they do: two table values a segment against one a point. */
const LEAF = 24;

const ROOTS: readonly number[] = Array.from({ length: POINTS }, (_, k) =>
  Math.cos((Math.PI * (k + 0.5)) / POINTS),
);

/** Order that makes every box a run of segments. */
export function clusterOrder(cx: Float64Array, cy: Float64Array): Int32Array {
  const order = Int32Array.from(cx, (_, k) => k);
  const halve = (from: number, to: number): void => {
    if (to - from <= LEAF) return;
    const run = order.subarray(from, to);
    const along = spread(cx, run) >= spread(cy, run) ? cx : cy;
    run.sort((a, b) => along[a]! - along[b]! || a - b);
    const middle = from + ((to - from) >> 1);
    halve(from, middle);
    halve(middle, to);
  };
  halve(0, order.length);
  return order;
}

function spread(values: Float64Array, run: Int32Array): number {
  let least = Number.POSITIVE_INFINITY;
  let most = Number.NEGATIVE_INFINITY;
  for (const k of run) {
    least = Math.min(least, values[k]!);
    most = Math.max(most, values[k]!);
  }
  return most - least;
}

/** Boxes over segments that stand in cluster order. */
export function farClusters(segments: PlanSegments, cases: number): FarCluster | undefined {
  if (segments.count === 0) return undefined;
  const build = (from: number, to: number): FarCluster => {
    const middle = from + ((to - from) >> 1);
    const box = boxOf(segments, from, to);
    const halves = to - from <= LEAF ? undefined : ([build(from, middle), build(middle, to)] as const);
    return {
      from,
      to,
      halves,
      ...box,
      strength: halves === undefined ? new Float64Array(0) : gathered(segments, from, to, box, cases),
    };
  };
  return build(0, segments.count);
}

type Box = Pick<FarCluster, 'x' | 'y' | 'farSquared' | 'px' | 'py'>;

function boxOf({ cx, cy, hx, hy }: PlanSegments, from: number, to: number): Box {
  let west = Number.POSITIVE_INFINITY;
  let east = Number.NEGATIVE_INFINITY;
  let south = Number.POSITIVE_INFINITY;
  let north = Number.NEGATIVE_INFINITY;
  for (let j = from; j < to; j++) {
    west = Math.min(west, cx[j]! - Math.abs(hx[j]!));
    east = Math.max(east, cx[j]! + Math.abs(hx[j]!));
    south = Math.min(south, cy[j]! - Math.abs(hy[j]!));
    north = Math.max(north, cy[j]! + Math.abs(hy[j]!));
  }
  const x = (west + east) / 2;
  const y = (south + north) / 2;
  const a = (east - west) / 2;
  const b = (north - south) / 2;
  return {
    x,
    y,
    farSquared: FAR * FAR * (a * a + b * b),
    px: Float64Array.from(ROOTS, (root) => x + a * root),
    py: Float64Array.from(ROOTS, (root) => y + b * root),
  };
}

/** Strengths of a box's points: each segment's even leakage times the points' interpolation polynomials, summed along it. */
function gathered(segments: PlanSegments, from: number, to: number, box: Box, cases: number): Float64Array {
  const { points, weights } = gaussLegendre(4);
  const strength = new Float64Array(POINTS * POINTS * cases);
  const ax = new Float64Array(POINTS);
  const ay = new Float64Array(POINTS);
  for (let j = from; j < to; j++)
    for (let g = 0; g < points.length; g++) {
      const t = 2 * points[g]! - 1;
      lagrange(box.px, segments.cx[j]! + t * segments.hx[j]!, ax);
      lagrange(box.py, segments.cy[j]! + t * segments.hy[j]!, ay);
      for (let b = 0; b < POINTS; b++)
        for (let a = 0; a < POINTS; a++) {
          const share = weights[g]! * ax[a]! * ay[b]!;
          const at = (b * POINTS + a) * cases;
          for (let u = 0; u < cases; u++) strength[at + u]! += share * segments.strength[j * cases + u]!;
        }
    }
  return strength;
}

/** Lagrange polynomials of the nodes at a place; a box without extent has its nodes in one place and takes the first. */
function lagrange(nodes: Float64Array, at: number, into: Float64Array): void {
  if (nodes[0] === nodes[POINTS - 1]) {
    into.fill(0);
    into[0] = 1;
    return;
  }
  for (let k = 0; k < POINTS; k++) {
    let value = 1;
    for (let m = 0; m < POINTS; m++) if (m !== k) value *= (at - nodes[m]!) / (nodes[k]! - nodes[m]!);
    into[k] = value;
  }
}

/** Adds the field of far boxes at a place; calls `near` for each run of segments that is not far. */
export function addFarField(
  cluster: FarCluster,
  table: RadialTable,
  x: number,
  y: number,
  into: Float64Array,
  near: (from: number, to: number) => void,
): void {
  if (cluster.halves === undefined) {
    near(cluster.from, cluster.to);
    return;
  }
  const dx = x - cluster.x;
  const dy = y - cluster.y;
  if (dx * dx + dy * dy < cluster.farSquared) {
    addFarField(cluster.halves[0], table, x, y, into, near);
    addFarField(cluster.halves[1], table, x, y, into, near);
    return;
  }
  const { px, py, strength } = cluster;
  const cases = into.length;
  for (let b = 0; b < POINTS; b++) {
    const ey = y - py[b]!;
    for (let a = 0; a < POINTS; a++) {
      const ex = x - px[a]!;
      const value = radialValue(table, ex * ex + ey * ey);
      const at = (b * POINTS + a) * cases;
      for (let u = 0; u < cases; u++) into[u]! += strength[at + u]! * value;
    }
  }
}
