// The farther images of vertical metal as tables: sums at the depths where segments meet, shared by those above and below.
import { BYTES_A_DOUBLE, doublesAt, place } from '../kernels/instance.ts';
import type { DepthClass } from '../leakage/depth-classes.ts';
import {
  type RadialTable,
  radialGrid,
  radialValue,
  STRIDE,
  TERMS,
  toPowers,
} from '../leakage/radial-table.ts';
import { logarithm } from '../numerics/elementary.ts';
import type { ImageList, SoilImages } from '../soil/image-list.ts';
import { isOwn } from './segment-group.ts';
import { surfaceKernel } from './surface-kernel.ts';

/** Table of the farther images of a vertical class of a radius, m; undefined where there are none. */
export type UprightRests = (depths: DepthClass, radius: number) => RadialTable | undefined;

/** One layer's images and one radius: what its classes share. */
interface Shared {
  readonly list: ImageList;
  readonly farther: readonly number[];
  readonly grid: ReturnType<typeof radialGrid>;
  readonly smoothness: number;
  /** r² + radius²: from which tables are made, then the nearest end of each bin; shape [count × (TERMS + 1)] */
  readonly squares: Float64Array;
  readonly sums: Map<number, Float64Array>;
}

/**
 * The mean of an image over a vertical extent is [A(h₂) − A(h₁)]/(h₂ − h₁) with A(h) = ln(h + √(r² + h²)), h the height
 * of the image's ends over the surface: a difference of two sums over images, each at one depth of the metal.
 * @param classes vertical ones
 * @param reach largest distance that the tables hold, m
 */
export function uprightRests(
  classes: readonly DepthClass[],
  images: SoilImages,
  reach: number,
): UprightRests {
  const made = new Map<string, Shared | undefined>();
  const sharedOf = (layer: number, radius: number): Shared | undefined => {
    const key = `${layer} ${radius}`;
    if (!made.has(key))
      made.set(
        key,
        shared(
          classes.filter((c) => c.layer === layer),
          images.list(layer, 0),
          radius,
          reach,
        ),
      );
    return made.get(key);
  };
  return ({ layer, z1, z2 }, radius) => {
    const of = sharedOf(layer, radius);
    if (of === undefined) return undefined;
    const [above, below] = [z1, z2].map((z) => {
      const known = of.sums.get(z) ?? heightSums(of, z);
      of.sums.set(z, known);
      return known;
    });
    return tableOf(
      of,
      below!.map((sum, k) => (sum - above![k]!) / (z2 - z1)),
    );
  };
}

function shared(
  classes: readonly DepthClass[],
  list: ImageList,
  radius: number,
  reach: number,
): Shared | undefined {
  const farther = Array.from({ length: list.count }, (_, k) => k).filter((k) => !isOwn(list, k));
  if (farther.length === 0) return undefined;
  const heights = classes.flatMap(({ z1, z2 }) =>
    farther.flatMap((k) => [height(list, k, z1), height(list, k, z2)]),
  );
  const smoothness = heights.reduce((least, h) => Math.min(least, Math.abs(h)), Infinity);
  const grid = radialGrid(smoothness, reach);
  const ends = grid.centre.map((centre, k) => (centre - grid.half[k]! - 1) / grid.perSquare);
  const squares = Float64Array.of(...grid.squares, ...ends).map((rr) => rr + radius * radius);
  return { list, farther, grid, smoothness, squares, sums: new Map() };
}

/** Height of an image of metal at a depth, on the side on which it lies. */
function height({ sign, offset }: ImageList, k: number, z: number): number {
  return sign[k]! * z + offset[k]!;
}

/** Σ weight·dh/dz·A(h) at every square, with the logarithm of h taken out and put back: its sum is the same at all. */
function heightSums({ list, farther, squares }: Shared, z: number): Float64Array {
  const pairs = new Float64Array(2 * farther.length);
  let constant = 0;
  farther.forEach((k, at) => {
    const h = height(list, k, z);
    const weight = list.weight[k]! * list.sign[k]! * Math.sign(h);
    pairs.set([Math.abs(h), weight], 2 * at);
    constant += weight * logarithm(Math.abs(h));
  });
  return (sumsByKernel(pairs, squares) ?? plainSums(pairs, squares)).map((sum) => sum + constant);
}

function sumsByKernel(pairs: Float64Array, squares: Float64Array): Float64Array | undefined {
  const kernel = surfaceKernel();
  const count = squares.length + (squares.length & 1);
  const [list, from, to] = (kernel && place(kernel, [pairs, squares], count)) ?? [];
  if (kernel === undefined || list === undefined || from === undefined || to === undefined) return undefined;
  kernel.call('heights', list, pairs.length / 2, from, count * BYTES_A_DOUBLE, to);
  return doublesAt(kernel, to, squares.length).slice();
}

/** Σ weight·ln[(h + √(r² + h²))/h] at every r². */
function plainSums(pairs: Float64Array, squares: Float64Array): Float64Array {
  return squares.map((rr) => {
    let sum = 0;
    for (let k = 0; k < pairs.length; k += 2) {
      const h = pairs[k]!;
      sum += pairs[k + 1]! * logarithm((h + Math.sqrt(rr + h * h)) / h);
    }
    return sum;
  });
}

function tableOf({ grid, smoothness }: Shared, values: Float64Array): RadialTable {
  const bins = new Float64Array(grid.count * STRIDE);
  for (let k = 0; k < grid.count; k++) {
    bins[k * STRIDE] = grid.centre[k]!;
    bins[k * STRIDE + 1] = 1 / grid.half[k]!;
    toPowers(values, k * TERMS, bins, k * STRIDE + 2, 1);
  }
  const table = { perSquare: grid.perSquare, bins, smoothness, error: 0 };
  let error = 0;
  for (let k = 0; k < grid.count; k++) {
    const exact = values[grid.count * TERMS + k]!;
    const low = (grid.centre[k]! - grid.half[k]! - 1) / grid.perSquare;
    error = Math.max(error, Math.abs(radialValue(table, low) / exact - 1));
  }
  return { ...table, error };
}
