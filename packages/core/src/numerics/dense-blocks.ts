// Dense blocks of a large matrix in single precision, side by side in one memory, times a vector, summed in double.
import { blocksBytes } from '../kernels/blocks-bytes.ts';
import { doublesAt, type Store, storeOf, take } from '../kernels/instance.ts';
import { foldPlain, LISTED, multiplyPlain, padded, unfoldPlain } from './dense-blocks-plain.ts';

/** A vector and a sum of products, which blocks read and add to, in the memory that holds the blocks. */
export interface BlockRoom {
  readonly length: number;
  /** views, valid until more blocks are made; shape [length] */
  x(): Float64Array;
  y(): Float64Array;
  /** memory of the kernel, where there is one, with the addresses of the vector, the sum, and a sum apart */
  readonly kernel:
    | { readonly store: Store; readonly x: number; readonly y: number; readonly part: number }
    | undefined;
}

/** Numbers of a block: first row, rows, first column, columns, 1 where the mirrored block across the diagonal counts too. */
export const SHAPE = 5;

export interface DenseBlocks {
  /** taken for the values */
  readonly bytes: number;
  /** sets a block from values row after row, and rounds them */
  set(block: number, values: Float64Array | Float32Array): void;
  /** y += Σ B x, summed apart from y first */
  multiply(): void;
  /** x_columns += Bᵀ x_rows, block after block, whose rows and columns must not overlap */
  fold(): void;
  /** y_rows += B y_columns, from the last block to the first, likewise */
  unfold(): void;
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
  const [x, y, part] = [0, 1, 2].map(() => store && take(store, bytes));
  if (store === undefined || x === undefined || y === undefined || part === undefined) {
    const [own, sum] = [new Float64Array(length), new Float64Array(length)];
    return { length, x: () => own, y: () => sum, kernel: undefined };
  }
  return {
    length,
    x: () => doublesAt(store.kernel, x, length),
    y: () => doublesAt(store.kernel, y, length),
    kernel: { store, x, y, part },
  };
}

/** Bytes that blocks will take. @param shapes shape [blocks × SHAPE] */
export function blockBytes(shapes: Uint32Array): number {
  let values = 0;
  for (let at = 0; at < shapes.length; at += SHAPE) values += shapes[at + 1]! * padded(shapes[at + 3]!);
  return values * Float32Array.BYTES_PER_ELEMENT;
}

/**
 * Room for blocks, in the kernel's memory or, where there is none or not enough, in a plain array.
 * @param shapes shape [blocks × SHAPE]
 * @param given values of all blocks, one after the other, where they are known already
 * @throws MemoryRefused
 */
export function denseBlocks(room: BlockRoom, shapes: Uint32Array, given?: Float32Array): DenseBlocks {
  const bytes = blockBytes(shapes);
  const list = listOf(shapes);
  const { products, values } = inKernel(room, list, bytes, touched(shapes)) ?? inArray(room, list, bytes);
  const set = (block: number, from: Float64Array | Float32Array): void => {
    const at = block * LISTED;
    const [rows, columns] = [list[at + 1]!, list[at + 3]!];
    const into = values();
    let read = 0;
    for (let r = 0; r < rows; r++) {
      const row = list[at + 4]! + r * padded(columns);
      for (let c = 0; c < columns; c++) into[row + c] = from[read++]!;
    }
  };
  if (given !== undefined) {
    let at = 0;
    for (let b = 0; b < list.length / LISTED; b++) {
      set(b, given.subarray(at));
      at += list[b * LISTED + 1]! * list[b * LISTED + 3]!;
    }
  }
  return { bytes, set, ...products };
}

interface Home {
  readonly products: Pick<DenseBlocks, 'multiply' | 'fold' | 'unfold'>;
  values(): Float32Array;
}

function inKernel(
  { kernel }: BlockRoom,
  list: Uint32Array,
  bytes: number,
  [low, high]: readonly [number, number],
): Home | undefined {
  if (kernel === undefined) return undefined;
  const { store, x, y, part } = kernel;
  const valuesAt = take(store, bytes);
  const listAt = valuesAt === undefined ? undefined : take(store, list.byteLength);
  if (valuesAt === undefined || listAt === undefined) return undefined;
  const placed = new Uint32Array(store.kernel.memory.buffer, listAt, list.length);
  placed.set(list);
  for (let at = 0; at < list.length; at += LISTED) {
    placed[at + 3] = padded(list[at + 3]!);
    placed[at + 4] = valuesAt + list[at + 4]! * Float32Array.BYTES_PER_ELEMENT;
  }
  const count = list.length / LISTED;
  const size = bytes / Float32Array.BYTES_PER_ELEMENT;
  let view = new Float32Array(store.kernel.memory.buffer, valuesAt, size);
  return {
    products: {
      multiply: () => void store.kernel.call('multiply', listAt, count, x, y, part, low, high),
      fold: () => void store.kernel.call('fold', listAt, count, x),
      unfold: () => void store.kernel.call('unfold', listAt, count, y),
    },
    values: () => {
      // growth of the memory moves its buffer
      if (view.buffer !== store.kernel.memory.buffer) view = new Float32Array(store.kernel.memory.buffer, valuesAt, size); // biome-ignore format: one line
      return view;
    },
  };
}

function inArray(room: BlockRoom, list: Uint32Array, bytes: number): Home {
  const values = plainValues(bytes);
  return {
    products: {
      multiply: () => {
        const part = new Float64Array(room.length);
        multiplyPlain(list, values, room.x(), part);
        const y = room.y();
        for (let i = 0; i < part.length; i++) y[i]! += part[i]!;
      },
      fold: () => foldPlain(list, values, room.x()),
      unfold: () => unfoldPlain(list, values, room.y()),
    },
    values: () => values,
  };
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
function touched(shapes: Uint32Array): readonly [low: number, high: number] {
  if (shapes.length === 0) return [0, 0];
  let low = Number.POSITIVE_INFINITY;
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
