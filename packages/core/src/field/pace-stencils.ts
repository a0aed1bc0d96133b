// Drops over one pace about every point of a lattice, in several directions: weights of the points around it.
import { BYTES_A_DOUBLE, doublesAt, place } from '../kernels/instance.ts';
import { keysWeights, type Lattice } from './lattice.ts';
import { surfaceKernel } from './surface-kernel.ts';

/** Weights of the points ahead of a place; those behind have the same, turned round, and are subtracted. */
export interface PaceStencil {
  /** points eastward and northward of the place, and their weights; shape [taps] each */
  readonly east: readonly number[];
  readonly north: readonly number[];
  readonly weight: readonly number[];
}

/** The stencil of a foot at (x, y) from the midpoint, in spacings, and the other opposite. */
export function paceStencil(x: number, y: number): PaceStencil {
  const east: number[] = [];
  const north: number[] = [];
  const weight: number[] = [];
  const [wx, wy] = [keysWeights(x - Math.floor(x)), keysWeights(y - Math.floor(y))];
  for (let b = 0; b < wy.length; b++)
    for (let a = 0; a < wx.length; a++) {
      if (wx[a]! * wy[b]! === 0) continue;
      east.push(Math.floor(x) - 1 + a);
      north.push(Math.floor(y) - 1 + b);
      weight.push(wx[a]! * wy[b]!);
    }
  return { east, north, weight };
}

/** Largest magnitude of the drops of all stencils at every point; beyond the border the lattice goes on with its slope. */
export function steepestDrops(lattice: Lattice, stencils: readonly PaceStencil[]): Float64Array {
  const { nx, ny } = lattice;
  const margin = Math.max(...stencils.flatMap(({ east, north }) => [...east, ...north].map(Math.abs)));
  const wide = widened(lattice, margin);
  const width = nx + 2 * margin;
  const offsets = stencils.map(({ east, north }) => east.map((e, k) => north[k]! * width + e));
  const found = dropsByKernel(wide, width, margin, nx, ny, stencils, offsets);
  const drops = found ?? plainDrops(wide, width, margin, nx, ny, stencils, offsets);
  const values = new Float64Array(nx * ny);
  for (let j = 0; j < ny; j++) {
    const from = (j + margin) * width + margin;
    values.set(drops.subarray(from, from + nx), j * nx);
  }
  return values;
}

/** A lattice's values with points added on every side: each as much beyond the border's value as the one opposite is behind. */
function widened({ nx, ny, values }: Lattice, margin: number): Float64Array {
  const width = nx + 2 * margin;
  const wide = new Float64Array(width * (ny + 2 * margin));
  // a lattice narrower than the margin goes on from its farthest point
  const inner = (at: number, count: number): number => Math.min(count - 1, Math.max(0, at));
  for (let j = 0; j < ny; j++) {
    const row = (j + margin) * width + margin;
    wide.set(values.subarray(j * nx, (j + 1) * nx), row);
    for (let k = 1; k <= margin; k++) {
      wide[row - k] = 2 * wide[row]! - wide[row + inner(k, nx)]!;
      wide[row + nx - 1 + k] = 2 * wide[row + nx - 1]! - wide[row + inner(nx - 1 - k, nx)]!;
    }
  }
  for (let k = 1; k <= margin; k++)
    for (let i = 0; i < width; i++) {
      const [low, high] = [margin * width + i, (margin + ny - 1) * width + i];
      wide[low - k * width] = 2 * wide[low]! - wide[low + inner(k, ny) * width]!;
      wide[high + k * width] = 2 * wide[high]! - wide[low + inner(ny - 1 - k, ny) * width]!;
    }
  return wide;
}

/** Points that the kernel works on at once, the last ones past the end. */
const AT_ONCE = 8;

function dropsByKernel(
  values: Float64Array,
  width: number,
  margin: number,
  nx: number,
  ny: number,
  stencils: readonly PaceStencil[],
  offsets: readonly (readonly number[])[],
): Float64Array | undefined {
  const kernel = surfaceKernel();
  // number of taps, then an offset in bytes and a weight of each, stencil after stencil; numbers that are not weights
  // stand as whole ones in the first half of theirs
  const list = new Float64Array(stencils.reduce((sum, { weight }) => sum + 1 + 2 * weight.length, 0));
  const whole = new Int32Array(list.buffer);
  let next = 0;
  stencils.forEach(({ weight }, s) => {
    whole[2 * next++] = weight.length;
    weight.forEach((w, k) => {
      whole[2 * next++] = offsets[s]![k]! * BYTES_A_DOUBLE;
      list[next++] = w;
    });
  });
  const [taps, from, to] = (kernel && place(kernel, [list, values], values.length + AT_ONCE)) ?? [];
  if (kernel === undefined || taps === undefined || from === undefined || to === undefined) return undefined;
  kernel.call('drops', from, width, margin, margin + ny, nx, taps, stencils.length, to);
  return doublesAt(kernel, to, values.length);
}

function plainDrops(
  values: Float64Array,
  width: number,
  margin: number,
  nx: number,
  ny: number,
  stencils: readonly PaceStencil[],
  offsets: readonly (readonly number[])[],
): Float64Array {
  const drops = new Float64Array(values.length);
  for (let j = margin; j < margin + ny; j++)
    for (let i = margin; i < margin + nx; i++) {
      const at = j * width + i;
      stencils.forEach(({ weight }, s) => {
        let drop = 0;
        for (let k = 0; k < weight.length; k++) {
          const offset = offsets[s]![k]!;
          drop += weight[k]! * (values[at + offset]! - values[at - offset]!);
        }
        if (Math.abs(drop) > drops[at]!) drops[at] = Math.abs(drop);
      });
    }
  return drops;
}
