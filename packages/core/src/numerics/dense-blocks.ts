// Dense blocks of a large matrix in single precision, side by side in one memory, times a vector, summed in double.
import { blocksBytes } from '../kernels/blocks-bytes.ts';
import { doublesAt, type Store, storeOf, take } from '../kernels/instance.ts';
import { foldPlain, LISTED, multiplyPlain, padded, unfoldPlain } from './dense-blocks-plain.ts';

/** What blocks of one matrix share: memory of a compiled kernel, with room for a vector and a product. */
export interface BlockRoom {
  /** of the vectors */
  readonly length: number;
  readonly store: Store | undefined;
  /** addresses of the vector and the product, where there is a kernel */
  readonly x: number;
  readonly y: number;
}

/** Numbers of a block: first row, rows, first column, columns, 1 where the mirrored block across the diagonal counts too. */
export const SHAPE = 5;

export interface DenseBlocks {
  /** taken for the values */
  readonly bytes: number;
  /** sets a block from doubles row after row */
  set(block: number, values: Float64Array | Float32Array): void;
  /** y += Σ B x, summed apart from y first */
  multiply(x: Float64Array, y: Float64Array): void;
  /** v_columns += Bᵀ v_rows, block after block, whose rows and columns must not overlap */
  fold(v: Float64Array): void;
  /** v_rows += B v_columns, from the last block to the first, likewise */
  unfold(v: Float64Array): void;
}

/** Memory that a machine refused. */
export class MemoryRefused extends Error {
  readonly bytes: number;
  constructor(bytes: number) {
    super(`memory of ${Math.ceil(bytes / 1e6)} MB was refused`);
    this.name = 'MemoryRefused';
    this.bytes = bytes;
  }
}

export function blockRoom(length: number): BlockRoom {
  const store = storeOf(blocksBytes);
  // one more than the length: columns of odd count are padded
  const bytes = (length + 1) * Float64Array.BYTES_PER_ELEMENT;
  const x = store && take(store, bytes);
  const y = store && take(store, bytes);
  return x === undefined || y === undefined
    ? { length, store: undefined, x: 0, y: 0 }
    : { length, store, x, y };
}

/** Bytes that blocks will take. @param shapes shape [blocks × SHAPE] */
export function blockBytes(shapes: Uint32Array): number {
  let values = 0;
  for (let at = 0; at < shapes.length; at += SHAPE) values += shapes[at + 1]! * padded(shapes[at + 3]!);
  return values * Float32Array.BYTES_PER_ELEMENT;
}

/**
 * Room for blocks, in the kernel's memory or, where there is none or not enough, in plain arrays.
 * @param shapes shape [blocks × SHAPE]
 * @param given values of all blocks, one after the other, where they are known already
 * @throws MemoryRefused
 */
export function denseBlocks(room: BlockRoom, shapes: Uint32Array, given?: Float32Array): DenseBlocks {
  const count = shapes.length / SHAPE;
  const bytes = blockBytes(shapes);
  const list = listOf(shapes);
  const [low, high] = touched(shapes);
  const { store } = room;
  const valuesAt = store && take(store, bytes);
  const listAt = valuesAt === undefined ? undefined : store && take(store, list.byteLength);
  const inKernel = store !== undefined && valuesAt !== undefined && listAt !== undefined;
  if (inKernel) {
    const placed = new Uint32Array(store.kernel.memory.buffer, listAt, list.length);
    placed.set(list);
    for (let at = 0; at < list.length; at += LISTED) {
      placed[at + 3] = padded(list[at + 3]!);
      placed[at + 4] = valuesAt + list[at + 4]! * Float32Array.BYTES_PER_ELEMENT;
    }
  }
  const own = inKernel ? undefined : plainValues(bytes);
  const values = (): Float32Array =>
    inKernel
      ? new Float32Array(store.kernel.memory.buffer, valuesAt, bytes / Float32Array.BYTES_PER_ELEMENT)
      : own!;
  const inPlace = (name: 'fold' | 'unfold', v: Float64Array): void => {
    if (!inKernel) {
      (name === 'fold' ? foldPlain : unfoldPlain)(list, own!, v);
      return;
    }
    const held = doublesAt(store.kernel, room.x, room.length + 1);
    held.set(v);
    held[room.length] = 0;
    store.kernel.call(name, listAt, count, room.x);
    v.set(held.subarray(0, room.length));
  };
  const blocks: DenseBlocks = {
    bytes,
    set(block, from) {
      const [rows, columns] = [shapes[block * SHAPE + 1]!, shapes[block * SHAPE + 3]!];
      const width = padded(columns);
      const at = list[block * LISTED + 4]!;
      const into = values();
      if (width === columns) into.set(from.subarray(0, rows * columns), at);
      else
        for (let r = 0; r < rows; r++)
          into.set(from.subarray(r * columns, (r + 1) * columns), at + r * width);
    },
    multiply(x, y) {
      let sum: Float64Array;
      if (inKernel) {
        const held = doublesAt(store.kernel, room.x, room.length + 1);
        held.set(x.subarray(low, high), low);
        held[high] = 0;
        sum = doublesAt(store.kernel, room.y, room.length + 1).fill(0, low, high + 1);
        store.kernel.call('multiply', listAt, count, room.x, room.y);
      } else {
        sum = new Float64Array(room.length + 1);
        multiplyPlain(list, own!, x, sum);
      }
      for (let i = low; i < high; i++) y[i]! += sum[i]!;
    },
    fold: (v) => inPlace('fold', v),
    unfold: (v) => inPlace('unfold', v),
  };
  if (given !== undefined) setAll(blocks, shapes, given);
  return blocks;
}

function setAll(blocks: DenseBlocks, shapes: Uint32Array, given: Float32Array): void {
  let at = 0;
  for (let b = 0; b < shapes.length / SHAPE; b++) {
    const next = at + shapes[b * SHAPE + 1]! * shapes[b * SHAPE + 3]!;
    blocks.set(b, given.subarray(at, next));
    at = next;
  }
}

/** Shapes with the place of each block's values, counted in values, before the last number. */
function listOf(shapes: Uint32Array): Uint32Array {
  const count = shapes.length / SHAPE;
  const list = new Uint32Array(count * LISTED);
  let at = 0;
  for (let b = 0; b < count; b++) {
    const [row = 0, rows = 0, column = 0, columns = 0, mirrored = 0] = shapes.subarray(b * SHAPE, (b + 1) * SHAPE); // biome-ignore format: one block
    list.set([row, rows, column, columns, at, mirrored], b * LISTED);
    at += rows * padded(columns);
  }
  return list;
}

/** First place that any block reads or writes, and the one after the last. */
function touched(shapes: Uint32Array): [low: number, high: number] {
  let low = shapes.length === 0 ? 0 : Number.POSITIVE_INFINITY;
  let high = 0;
  for (let at = 0; at < shapes.length; at += SHAPE) {
    low = Math.min(low, shapes[at]!, shapes[at + 2]!);
    high = Math.max(high, shapes[at]! + shapes[at + 1]!, shapes[at + 2]! + shapes[at + 3]!);
  }
  return [low, high];
}

function plainValues(bytes: number): Float32Array {
  try {
    return new Float32Array(bytes / Float32Array.BYTES_PER_ELEMENT);
  } catch {
    throw new MemoryRefused(bytes);
  }
}
