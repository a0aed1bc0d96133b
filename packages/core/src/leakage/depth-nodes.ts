// The smooth images of two layers as tables in horizontal distance at nodes of depth difference and depth sum.
import { gaussLegendre } from '../numerics/gauss-legendre.ts';
import type { ImageList } from '../soil/image-list.ts';
import { type RadialTable, radialBin, radialGrid, STRIDE, TERMS, toPowers } from './radial-table.ts';

/**
 * Σ weight/√(r² + (ζ − offset)²) over images of one sign that lie on one side of all ζ = z − sign·z′: interpolated in
 * x = ln|ζ − nearest offset|, in which the nearest singularity, ζ = offset ± ir, stands π/2 off the real axis at any r.
 */
interface NodeGroup {
  readonly sign: number;
  readonly side: number;
  readonly nearest: number;
  /** first of its nodes */
  readonly from: number;
  /** x of the nodes: Chebyshev points of [low, high] */
  readonly nodes: Float64Array;
  /** weights of the barycentric formula: (−1)^k·sin of the point's angle */
  readonly barycentric: Float64Array;
}

export interface DepthNodes {
  readonly perSquare: number;
  /** shortest distance of an image, m */
  readonly smoothness: number;
  /** number of nodes, even */
  readonly count: number;
  /** bin after bin: centre, reciprocal half width, then a coefficient of all nodes, six times; shape [bins × (2 + 6·count)] */
  readonly bins: Float64Array;
  readonly groups: readonly NodeGroup[];
}

/** Depths between which segments of a layer lie, m. */
export interface DepthRange {
  readonly z1: number;
  readonly z2: number;
}

/** Share of an image that interpolation between nodes may miss, of the order of the tables' own 6e-10. */
const NODE_ERROR = 1e-9;
/** More nodes than this cost more than they save. */
const MOST_NODES = 160;

/**
 * Tables of the images past the primary ones.
 * @param field depths of segments in the list's field layer
 * @param source depths of segments in the list's source layer
 * @param reach largest horizontal distance, m
 * @returns undefined where there is no such image, or one is not apart from the depths
 */
export function depthNodes(
  images: ImageList,
  field: DepthRange,
  source: DepthRange,
  reach: number,
): DepthNodes | undefined {
  const split: { sign: number; side: number; members: number[] }[] = [];
  let smoothness = Number.POSITIVE_INFINITY;
  for (let k = images.primaryCount; k < images.count; k++) {
    const sign = images.sign[k]!;
    const [low, high] = spread(sign, field, source);
    const offset = images.offset[k]!;
    const side = offset < low ? 1 : -1;
    smoothness = Math.min(smoothness, side === 1 ? low - offset : offset - high);
    const group = split.find((one) => one.sign === sign && one.side === side);
    if (group === undefined) split.push({ sign, side, members: [k] });
    else group.members.push(k);
  }
  if (!(smoothness > 0) || split.length === 0) return undefined;
  let count = 0;
  const groups = split.map(({ sign, side, members }): NodeGroup => {
    const [low, high] = spread(sign, field, source);
    const nearest = members.reduce((most, k) => Math.max(most, side * images.offset[k]!), Number.NEGATIVE_INFINITY) * side; // biome-ignore format: one place
    const ends = [Math.log(side === 1 ? low - nearest : nearest - high), Math.log(side === 1 ? high - nearest : nearest - low)] as const; // biome-ignore format: one pair
    const nodes = chebyshev(ends[0], ends[1]);
    const from = count;
    count += nodes.length;
    return {
      sign,
      side,
      nearest,
      from,
      nodes,
      barycentric: nodes.map(
        (_, k) => (k % 2 === 0 ? 1 : -1) * Math.sin((Math.PI * (k + 0.5)) / nodes.length),
      ),
    };
  });
  if (count > MOST_NODES) return undefined;
  const even = count + (count & 1);
  const { perSquare, count: binCount, centre, half, squares } = radialGrid(smoothness, reach);
  const stride = 2 + TERMS * even;
  const bins = new Float64Array(binCount * stride);
  for (let k = 0; k < binCount; k++) {
    bins[k * stride] = centre[k]!;
    bins[k * stride + 1] = 1 / half[k]!;
  }
  const values = new Float64Array(squares.length);
  groups.forEach((group, g) => {
    const { members } = split[g]!;
    const weight = Float64Array.from(members, (k) => images.weight[k]!);
    group.nodes.forEach((x, n) => {
      const zeta = group.nearest + group.side * Math.exp(x);
      const hh = Float64Array.from(members, (k) => (zeta - images.offset[k]!) ** 2);
      sumImages(squares, weight, hh, values);
      for (let k = 0; k < binCount; k++)
        toPowers(values, k * TERMS, bins, k * stride + 2 + group.from + n, even);
    });
  });
  return { perSquare, smoothness, count: even, bins, groups };
}

/** Least and greatest z − sign·z′. */
function spread(sign: number, field: DepthRange, source: DepthRange): [number, number] {
  return sign > 0
    ? [field.z1 - source.z2, field.z2 - source.z1]
    : [field.z1 + source.z1, field.z2 + source.z2];
}

/**
 * Chebyshev points on [low, high], as many as leave NODE_ERROR of a function whose singularities stand π/2 off the axis:
 * ρ⁻ⁿ with ρ = q + √(q² + 1), q = π/2 over half the range (Trefethen, Approximation Theory and Approximation Practice,
 * 2013, theorem 8.2).
 */
function chebyshev(low: number, high: number): Float64Array {
  const half = (high - low) / 2;
  const q = Math.PI / 2 / half;
  const count =
    half === 0 ? 1 : Math.max(2, Math.ceil(-Math.log(NODE_ERROR) / Math.log(q + Math.hypot(q, 1))) + 1);
  return Float64Array.from({ length: count }, (_, k) => (low + high) / 2 - half * Math.cos((Math.PI * (k + 0.5)) / count)); // biome-ignore format: one formula
}

function sumImages(squares: Float64Array, weight: Float64Array, hh: Float64Array, into: Float64Array): void {
  for (let p = 0; p < squares.length; p++) {
    const rr = squares[p]!;
    let sum = 0;
    for (let k = 0; k < weight.length; k++) sum += weight[k]! / Math.sqrt(rr + hh[k]!);
    into[p] = sum;
  }
}

/**
 * Weights of the nodes whose sum is the mean over two extents of depth; a level one has z1 = z2.
 * @param order Gauss points on an extent of a length, m
 * @returns shape [nodes.count]
 */
export function nodeWeights(
  nodes: DepthNodes,
  field: DepthRange,
  source: DepthRange,
  order: (length: number) => number,
): Float64Array {
  const weights = new Float64Array(nodes.count);
  const [pf, ps] = [field, source].map(({ z1, z2 }) => gaussLegendre(z1 === z2 ? 1 : order(z2 - z1)));
  for (let a = 0; a < pf!.points.length; a++)
    for (let b = 0; b < ps!.points.length; b++) {
      const z = field.z1 + pf!.points[a]! * (field.z2 - field.z1);
      const other = source.z1 + ps!.points[b]! * (source.z2 - source.z1);
      const share = pf!.weights[a]! * ps!.weights[b]!;
      for (const group of nodes.groups) {
        const x = Math.log(group.side * (z - group.sign * other - group.nearest));
        addLagrange(group, x, share, weights);
      }
    }
  return weights;
}

/** Adds a share of the Lagrange polynomials at x, by the barycentric formula for Chebyshev points (Berrut and Trefethen, SIAM Review 46, 2004). */
function addLagrange(
  { nodes, barycentric, from }: NodeGroup,
  x: number,
  share: number,
  weights: Float64Array,
): void {
  let total = 0;
  for (let k = 0; k < nodes.length; k++) {
    const gap = x - nodes[k]!;
    if (gap === 0) {
      weights[from + k]! += share;
      return;
    }
    total += barycentric[k]! / gap;
  }
  for (let k = 0; k < nodes.length; k++)
    weights[from + k]! += (share * barycentric[k]!) / ((x - nodes[k]!) * total);
}

/** The table of one mean over depths: the weighted sum of the nodes' tables. */
export function collapsed(nodes: DepthNodes, weights: Float64Array): RadialTable {
  const { count, perSquare, smoothness } = nodes;
  const stride = 2 + TERMS * count;
  const binCount = nodes.bins.length / stride;
  const bins = new Float64Array(binCount * STRIDE);
  for (let k = 0; k < binCount; k++) {
    const from = k * stride;
    const at = k * STRIDE;
    bins[at] = nodes.bins[from]!;
    bins[at + 1] = nodes.bins[from + 1]!;
    for (let term = 0; term < TERMS; term++) {
      const row = from + 2 + term * count;
      let sum = 0;
      for (let n = 0; n < count; n++) sum += weights[n]! * nodes.bins[row + n]!;
      bins[at + 2 + term] = sum;
    }
  }
  return { perSquare, bins, smoothness, error: 0 };
}

/** Reads the means of pairs of vertical segments; holds the nodes' values of the last place. */
export function nodeReader(): (nodes: DepthNodes, weights: Float64Array, rr: number) => number {
  let held: DepthNodes | undefined;
  let square = -1;
  let values = new Float64Array(0);
  return (nodes, weights, rr) => {
    const { count, bins } = nodes;
    if (nodes !== held || rr !== square) {
      held = nodes;
      square = rr;
      if (values.length < count) values = new Float64Array(count);
      const from = radialBin(nodes.perSquare, rr) * (2 + TERMS * count);
      const u = (1 + rr * nodes.perSquare - bins[from]!) * bins[from + 1]!;
      for (let n = 0; n < count; n++) {
        const c = from + 2 + n;
        let value = bins[c + 5 * count]!;
        for (let term = TERMS - 2; term >= 0; term--) value = bins[c + term * count]! + u * value;
        values[n] = value;
      }
    }
    let even = 0;
    let odd = 0;
    for (let n = 0; n < count; n += 2) {
      even += values[n]! * weights[n]!;
      odd += values[n + 1]! * weights[n + 1]!;
    }
    return even + odd;
  };
}
