// The compiled products with blocks, choice of rows and small inverses against their plain twins.
import { afterEach, describe, expect, it } from 'vitest';
import { useKernels } from '../../src/kernels/instance.ts';
import {
  type BlockRoom,
  blockRoom,
  type DenseBlocks,
  denseBlocks,
  MemoryRefused,
  SHAPE,
} from '../../src/numerics/dense-blocks.ts';
import { skeletonRows } from '../../src/numerics/skeleton-rows.ts';
import { invertPositive } from '../../src/numerics/small-inverse.ts';
import { randomNumbers } from '../support/random.ts';

afterEach(() => useKernels(true));

function vector(length: number, seed: number): Float64Array {
  const random = randomNumbers(seed);
  return Float64Array.from({ length }, () => random() - 0.5);
}

/** Number of the block that lies on the diagonal: products in place have none. */
const ON_DIAGONAL = 4;

/** Odd and even counts, single rows and columns, mirrored or not; a last block that ends with the vector. */
const shapes = Uint32Array.of(
  ...[3, 7, 20, 5, 1],
  ...[0, 1, 10, 9, 1],
  ...[30, 16, 60, 12, 1],
  ...[50, 33, 0, 1, 0],
  ...[64, 4, 64, 4, 0],
  ...[10, 8, 92, 9, 1],
  ...[0, 0, 40, 8, 1],
);

/** Those whose rows and columns do not overlap. */
const apart = shapes.filter((_, k) => Math.floor(k / SHAPE) !== ON_DIAGONAL);

function filled(room: BlockRoom, list: Uint32Array = shapes): DenseBlocks {
  const blocks = denseBlocks(room, list);
  for (let b = 0; b < list.length / SHAPE; b++)
    blocks.set(b, vector(list[b * SHAPE + 1]! * list[b * SHAPE + 3]!, b));
  return blocks;
}

const LENGTH = 101;

/** Sets the vector and the sum of a room. */
function hold(room: BlockRoom): void {
  room.x().set(vector(LENGTH, 40));
  room.y().set(vector(LENGTH, 41));
}

describe('products with blocks', () => {
  it.each(['multiply', 'fold', 'unfold'] as const)('agree with plain code to 1e-12: %s', (name) => {
    const result = (on: boolean): Float64Array => {
      useKernels(on);
      const room = blockRoom(LENGTH);
      expect(room.kernel === undefined).toBe(!on);
      const blocks = filled(room, name === 'multiply' ? shapes : apart);
      hold(room);
      blocks[name]();
      return (name === 'fold' ? room.x() : room.y()).slice();
    };
    const [fast, plain] = [result(true), result(false)];
    const worst = plain.reduce((most, v, i) => Math.max(most, Math.abs(v - fast[i]!)), 0);
    expect(worst).toBeLessThan(1e-12);
    expect(fast).not.toEqual(vector(LENGTH, name === 'fold' ? 40 : 41));
  });

  it('are what their definition says', () => {
    const room = blockRoom(LENGTH);
    const blocks = filled(room);
    hold(room);
    blocks.multiply();
    const [x, sums] = [vector(LENGTH, 40), vector(LENGTH, 41)];
    for (let b = 0; b < shapes.length / SHAPE; b++) {
      const [row = 0, rows = 0, column = 0, columns = 0, mirrored] = shapes.subarray(b * SHAPE);
      const values = Float32Array.from(vector(rows * columns, b));
      for (let r = 0; r < rows; r++)
        for (let c = 0; c < columns; c++) {
          sums[row + r]! += values[r * columns + c]! * x[column + c]!;
          if (mirrored === 1) sums[column + c]! += values[r * columns + c]! * x[row + r]!;
        }
    }
    const worst = room.y().reduce((most, v, i) => Math.max(most, Math.abs(v - sums[i]!)), 0);
    expect(worst).toBeLessThan(1e-12);
    expect(Array.from(room.x())).toEqual(Array.from(x));
  });

  it('fall back to a plain array where the kernel is refused more memory', () => {
    const whole = blockRoom(LENGTH);
    const room = blockRoom(LENGTH);
    const { kernel } = room;
    expect(kernel).toBeDefined();
    // as full as a machine that has no more to give
    kernel!.store.kernel.memory.grow = () => {
      throw new RangeError('refused');
    };
    kernel!.store.free = kernel!.store.kernel.memory.buffer.byteLength - 16;
    for (const name of ['multiply', 'fold', 'unfold'] as const) {
      const list = name === 'multiply' ? shapes : apart;
      hold(room);
      hold(whole);
      filled(room, list)[name]();
      filled(whole, list)[name]();
      for (const view of ['x', 'y'] as const) {
        const worst = whole[view]().reduce((most, v, i) => Math.max(most, Math.abs(v - room[view]()[i]!)), 0);
        expect(worst).toBeLessThan(1e-12);
      }
    }
    expect(kernel!.store.free).toBe(kernel!.store.kernel.memory.buffer.byteLength - 16);
  });

  it('are refused with their size where there is no memory at all', () => {
    useKernels(false);
    const huge = Uint32Array.of(0, 2 ** 31, 0, 2 ** 31, 0);
    expect(() => denseBlocks(blockRoom(2), huge)).toThrow(new MemoryRefused(2 ** 64));
  });
});

describe('rows chosen', () => {
  it.each([
    [30, 64],
    [31, 45],
    [1, 7],
    [20, 3],
  ])('are those of plain code, weights to 1e-12: %i × %i', (rows, columns) => {
    const smooth = (): Float64Array =>
      Float64Array.from(
        { length: rows * columns },
        (_, k) => 1 / Math.hypot(3 + (k % columns) * 0.1, Math.floor(k / columns) * 0.17),
      );
    const fast = skeletonRows(smooth(), rows, columns, 1e-6);
    const kept = { rows: fast.rows.slice(), weights: fast.weights.slice() };
    useKernels(false);
    const plain = skeletonRows(smooth(), rows, columns, 1e-6);
    expect(kept.rows).toEqual(plain.rows);
    const worst = plain.weights.reduce((most, v, k) => Math.max(most, Math.abs(v - kept.weights[k]!)), 0);
    expect(worst).toBeLessThan(1e-12);
  });
});

describe('small inverses', () => {
  it.each([1, 2, 7, 32, 47])('agree with plain code to 1e-12: %i rows', (n) => {
    const matrix = (): Float64Array => {
      const a = vector(n * n, n);
      for (let i = 0; i < n; i++) for (let j = 0; j < i; j++) a[i * n + j] = a[j * n + i]!;
      for (let i = 0; i < n; i++) a[i * (n + 1)] = n / 2 + i;
      return a;
    };
    const [fast, plain, given] = [matrix(), matrix(), matrix()];
    if (n === 1) [fast[0], plain[0], given[0]] = [4, 4, 4];
    invertPositive(fast, n);
    useKernels(false);
    invertPositive(plain, n);
    const worst = plain.reduce((most, v, k) => Math.max(most, Math.abs(v - fast[k]!)), 0);
    expect(worst).toBeLessThan(1e-12);
    for (let i = 0; i < n; i++)
      for (let j = 0; j < n; j++) {
        let sum = 0;
        for (let k = 0; k < n; k++) sum += given[i * n + k]! * fast[k * n + j]!;
        expect(Math.abs(sum - (i === j ? 1 : 0))).toBeLessThan(1e-12);
      }
  });
});
