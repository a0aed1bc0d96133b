// The table of all images between two depth classes, for segments far from each other.
import { gaussLegendre } from '../numerics/gauss-legendre.ts';
import type { ImageList } from '../soil/image-list.ts';
import type { DepthRange } from './depth-nodes.ts';
import { type RadialTable, radialTable, radialValue } from './radial-table.ts';
import { logRatio, parallelMean } from './wire-pair.ts';

/** A depth class as far as tables are concerned. */
export interface TabledClass extends DepthRange {
  readonly vertical: boolean;
  /** shortest length, m */
  readonly shortest: number;
}

/** Share of the scale that would do: 1 + r²/s² is then r²/s² within a hundredth wherever a table is asked. */
const SMALL_SCALE = 1 / 8;
/** Least distance between points of two far segments, over the longer length: between centres 1.987, less a half and the outermost of four points. */
const APART = 1;

/**
 * Those images that are summed singly, over the extents of both classes, and the rest from its own table. The bins begin
 * so small that at the least distance of far segments a singularity is as far from a bin as if it were s away.
 * @param reach largest distance in plan, m; the rest's table reaches past it
 * @param leastInPlan distance in plan below which the table will not be asked, m
 */
export function farTable(
  singly: ImageList,
  rest: RadialTable | undefined,
  field: TabledClass,
  source: TabledClass,
  reach: number,
  leastInPlan: number,
): RadialTable {
  const means = Array.from({ length: singly.count }, (_, k) => extentMean(singly, k, field, source));
  const nearest = means.reduce((least, one) => Math.min(least, one.nearest), Number.POSITIVE_INFINITY);
  const apart = APART * Math.max(field.shortest, source.shortest);
  const least = Math.max(leastInPlan ** 2, apart ** 2 - nearest ** 2);
  // with bins for s, r² + h² ≥ (8/9)(r² + s²) must hold from the least r² on
  const largest = (9 / 8) * (nearest ** 2 + least / 9);
  // the reach over a power of √2, and small: bins then stay where they are when a shorter segment is drawn
  const scale = (SMALL_SCALE * reach) / 2 ** (Math.ceil(Math.log2(reach ** 2 / largest)) / 2);
  const all = (rr: number): number => {
    let sum = rest === undefined ? 0 : radialValue(rest, rr);
    for (const { mean } of means) sum += mean(rr);
    return sum;
  };
  return radialTable(all, scale, reach, least);
}

/** One image's mean over the extents of two classes, as a function of r², and its least height. */
function extentMean(
  list: ImageList,
  k: number,
  field: TabledClass,
  source: TabledClass,
): { nearest: number; mean: (rr: number) => number } {
  const weight = list.weight[k]!;
  const sign = list.sign[k]!;
  const [s1, s2] = [source.z1, source.z2].map((z) => sign * z + list.offset[k]!);
  const low = field.z1 - Math.max(s1!, s2!);
  const high = field.z2 - Math.min(s1!, s2!);
  const nearest = Math.max(0, low, -high);
  if (!field.vertical && !source.vertical)
    return { nearest, mean: (rr) => weight / Math.sqrt(rr + low * low) };
  if (!field.vertical || !source.vertical)
    return { nearest, mean: (rr) => weight * heightMean(rr, low, high) };
  const [lf, ls] = [field.z2 - field.z1, source.z2 - source.z1];
  const from = Math.min(s1!, s2!) - field.z1;
  const farSquare = (FAR_EXTENTS * Math.max(lf, ls)) ** 2;
  return {
    nearest,
    mean: (rr) =>
      weight *
      (rr > farSquare
        ? extentPoints(rr, lf, ls, from)
        : parallelMean(lf, ls, from, from + ls, Math.sqrt(rr))),
  };
}

/** Distance over half the extent from which four derivatives leave 2e-10 of a mean. */
const FEW_DERIVATIVES = 30;

/** (1/(h2 − h1))∫ dh/√(r² + h²): by value, second and fourth derivative at the middle when far, else in closed form. */
function heightMean(rr: number, h1: number, h2: number): number {
  const half = (h2 - h1) / 2;
  const hh = ((h1 + h2) / 2) ** 2;
  const square = rr + hh;
  if (square > FEW_DERIVATIVES * FEW_DERIVATIVES * half * half) {
    const per = 1 / square;
    const e = half * half * per * per;
    const second = (2 * hh - rr) / 6;
    const fourth = (8 * hh * hh - 24 * hh * rr + 3 * rr * rr) / 40;
    return Math.sqrt(per) * (1 + e * (second + e * fourth));
  }
  return logRatio(h1, Math.sqrt(rr + h1 * h1), h2, Math.sqrt(rr + h2 * h2), rr) / (h2 - h1);
}

/** Horizontal distance over the longer extent from which points keep more digits than differences: three leave 1e-9. */
const FAR_EXTENTS = 10;
const POINTS = 3;

/** Mean of 1/√(r² + (t − s)²) over t in [0, lf] and s in [from, from + ls], by points. */
function extentPoints(rr: number, lf: number, ls: number, from: number): number {
  const { points, weights } = gaussLegendre(POINTS);
  let sum = 0;
  for (let a = 0; a < POINTS; a++)
    for (let b = 0; b < POINTS; b++) {
      const h = points[a]! * lf - from - points[b]! * ls;
      sum += (weights[a]! * weights[b]!) / Math.sqrt(rr + h * h);
    }
  return sum;
}
