// Blocks of the leakage matrix by the compiled kernel, which holds segments and tables in its memory from call to call.
import { type Kernel, kernelOf, ownKernel, place, reserve } from '../kernels/instance.ts';
import { leakageBytes } from '../kernels/leakage-bytes.ts';
import { gaussLegendre } from '../numerics/gauss-legendre.ts';
import type { ImageList } from '../soil/image-list.ts';
import type { DepthNodes } from './depth-nodes.ts';
import type { DepthPair, DepthPairs } from './depth-pairs.ts';
import {
  FARTHEST_SHARE,
  HALVES_RATIO,
  PAIR_RATIOS,
  QUARTERS_RATIO,
  SMOOTH_ORDERS,
} from './pair-potential.ts';
import { CLASS, RECORD } from './segment-records.ts';

export interface LeakageKernel {
  /** fills rows × columns, indices of segments; false where memory was refused, with nothing filled */
  block(rows: Int32Array, columns: Int32Array, into: Float64Array): boolean;
  /** fills the packed lower triangle over the given segments; false as above */
  triangle(segments: Int32Array, entries: Float64Array): boolean;
}

/** Bytes of a class pair, and of a whole number. */
const PAIR = 64;
const WORD = 4;
const DOUBLE = 8;
/** Entries of a triangle that are taken over at a time. */
const BATCH = 1 << 13;

/**
 * Places segments and tables in a kernel's memory.
 * @param records as segmentRecords makes them
 * @param lasting whether calls come one by one, while other matrices may be filled: the instance is then its own
 * @returns undefined where there is no kernel, or its memory does not suffice
 */
export function leakageKernel(
  records: Float64Array,
  depths: DepthPairs,
  lasting: boolean,
): LeakageKernel | undefined {
  const kernel = lasting ? ownKernel(leakageBytes) : kernelOf(leakageBytes);
  if (kernel === undefined) return undefined;
  const free = layOut(kernel, records, depths);
  if (free === undefined) return undefined;
  const block = kernel.find('block');
  const triangle = kernel.find('triangle');
  let buffer: ArrayBufferLike | undefined;
  let words = new Int32Array(0);
  let doubles = new Float64Array(0);
  const room = (end: number): boolean => {
    if (!reserve(kernel, end)) return false;
    if (buffer !== kernel.memory.buffer) {
      buffer = kernel.memory.buffer;
      words = new Int32Array(buffer);
      doubles = new Float64Array(buffer);
    }
    return true;
  };
  return {
    block(rows, columns, into) {
      const [r, c] = [rows.length, columns.length];
      const at = free + Math.ceil((r + c) / 2) * DOUBLE;
      if (!room(at + r * c * DOUBLE)) return false;
      copyWords(rows, words, free / WORD);
      copyWords(columns, words, free / WORD + r);
      const columnsAt = free + r * WORD;
      // the longer side is the inner loop, which takes two at a time
      if (c >= r) block(free, r, columnsAt, c, at, c * DOUBLE, DOUBLE);
      else block(columnsAt, c, free, r, at, DOUBLE, c * DOUBLE);
      copyDoubles(doubles, at / DOUBLE, into, 0, r * c);
      return true;
    },
    triangle(segments, entries) {
      const n = segments.length;
      const at = free + Math.ceil(n / 2) * DOUBLE;
      if (!room(at + (BATCH + n) * DOUBLE)) return false;
      copyWords(segments, words, free / WORD);
      let from = 0;
      while (from < n) {
        const start = (from * (from + 1)) / 2;
        let to = from + 1;
        while (to < n && ((to + 1) * (to + 2)) / 2 - start <= BATCH) to++;
        triangle(free, from, to, at);
        copyDoubles(doubles, at / DOUBLE, entries, start, (to * (to + 1)) / 2 - start);
        from = to;
      }
      return true;
    },
  };
}

/** Fewer items than this are copied one by one. */
const FEW = 64;

function copyWords(from: Int32Array, into: Int32Array, at: number): void {
  if (from.length < FEW) for (let k = 0; k < from.length; k++) into[at + k] = from[k]!;
  else into.set(from, at);
}

function copyDoubles(from: Float64Array, start: number, into: Float64Array, at: number, count: number): void {
  if (count < FEW) for (let k = 0; k < count; k++) into[at + k] = from[start + k]!;
  else into.set(from.subarray(start, start + count), at);
}

/** Writes everything that stays, and tells the kernel; returns the first free address. */
function layOut(
  kernel: Kernel,
  records: Float64Array,
  { count, classOf, pairs }: DepthPairs,
): number | undefined {
  const arrays: Float64Array[] = [];
  const indexOf = new Map<object, number>();
  const keep = (key: object, made: () => Float64Array): void => {
    if (indexOf.has(key)) return;
    indexOf.set(key, arrays.length);
    arrays.push(made());
  };
  keep(records, () => records);
  keep(RULES, () => RULES);
  for (const array of [RATIOS, SMOOTH, MOMENTS]) keep(array, () => array);
  const distinct = [...new Set(pairs)];
  for (const { list, singly, far, rest, nodes, weights } of distinct) {
    keep(list, () => packedImages(list));
    keep(singly, () => packedImages(singly));
    if (far) keep(far, () => far.bins);
    if (rest) keep(rest, () => rest.bins);
    if (weights) keep(weights, () => weights);
    if (nodes) keep(nodes, () => packedNodes(nodes));
  }
  const room = (distinct.length * PAIR + Math.ceil(pairs.length / 2) * DOUBLE) / DOUBLE;
  const addresses = place(kernel, arrays, room);
  if (addresses === undefined) return undefined;
  const addressOf = (key: object | undefined): number => {
    const at = key === undefined ? undefined : indexOf.get(key);
    return at === undefined ? 0 : addresses[at]!;
  };
  const start = addresses[arrays.length]!;
  const view = new DataView(kernel.memory.buffer);
  const pairAt = new Map(distinct.map((pair, k) => [pair, start + k * PAIR]));
  for (const [pair, at] of pairAt) writePair(view, at, pair, addressOf);
  const table = start + distinct.length * PAIR;
  pairs.forEach((pair, k) => {
    view.setUint32(table + k * WORD, pairAt.get(pair)!, true);
  });
  const segments = addressOf(records);
  for (let i = 0; i < classOf.length; i++)
    view.setInt32(segments + (i * RECORD + CLASS) * DOUBLE, classOf[i]!, true);
  for (const { nodes } of distinct) if (nodes) view.setInt32(addressOf(nodes) + DOUBLE, nodes.count, true);
  kernel.call('prepare', segments, table, count, addressOf(RULES), addressOf(RATIOS), addressOf(SMOOTH), SMOOTH_ORDERS.length, addressOf(MOMENTS)); // biome-ignore format: one call
  return start + room * DOUBLE;
}

function writePair(
  view: DataView,
  at: number,
  pair: DepthPair,
  addressOf: (key: object | undefined) => number,
): void {
  const { list, singly, far, rest, nodes, weights } = pair;
  view.setFloat64(at, list.factor, true);
  view.setFloat64(at + 8, far?.perSquare ?? 0, true);
  view.setFloat64(at + 16, rest?.perSquare ?? 0, true);
  view.setFloat64(at + 24, (rest?.smoothness ?? 0) ** 2, true);
  const whole = [addressOf(far), addressOf(rest), addressOf(list), list.count, addressOf(singly), singly.count, addressOf(nodes), addressOf(weights)]; // biome-ignore format: one row
  whole.forEach((value, k) => {
    view.setUint32(at + 32 + k * WORD, value, true);
  });
}

/** 1/s², place of their count, room for values, bins. */
function packedNodes(nodes: DepthNodes): Float64Array {
  const found = new Float64Array(2 + nodes.count + nodes.bins.length);
  found[0] = nodes.perSquare;
  found.set(nodes.bins, 2 + nodes.count);
  return found;
}

/** Weight, sign, offset, nothing. */
function packedImages(list: ImageList): Float64Array {
  const found = new Float64Array(list.count * 4);
  for (let k = 0; k < list.count; k++) found.set([list.weight[k]!, list.sign[k]!, list.offset[k]!], 4 * k);
  return found;
}

/** Squared ratios of pairs. */
const RATIOS: Float64Array = Float64Array.from([...PAIR_RATIOS, HALVES_RATIO, QUARTERS_RATIO, FARTHEST_SHARE], (ratio) => ratio * ratio); // biome-ignore format: one row
/** Squared ratios of smooth images, each with its order. */
const SMOOTH: Float64Array = Float64Array.from(SMOOTH_ORDERS.flatMap(([ratio, order]) => [ratio * ratio, order])); // biome-ignore format: one row
/** As radialMean uses them. */
const MOMENTS: Float64Array = Float64Array.of(4 / 3, 0.8, 4 / 9, 3.2, 16 / 3, 3.2, 64 / 15, 3, 6, 4, 10, 5);

/** Rules of order 0 (none) to 32: points on [−1, 1], then weights; an odd one repeats its last point with weight nothing. */
const RULES: Float64Array = rules();

function rules(): Float64Array {
  const most = SMOOTH_ORDERS.at(-1)![1];
  const found = new Float64Array((most + 1) * 2 * most);
  for (let order = 1; order <= most; order++) {
    const { points, weights } = gaussLegendre(order);
    for (let k = 0; k < most; k++) {
      found[order * 2 * most + k] = 2 * points[Math.min(k, order - 1)]! - 1;
      found[order * 2 * most + most + k] = k < order ? weights[k]! : 0;
    }
  }
  return found;
}
