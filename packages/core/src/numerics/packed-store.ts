// A packed symmetric matrix kept where the kernel that multiplies and preconditions with it can read it.
import { BYTES_A_DOUBLE, doublesAt, type Kernel, ownKernel, place } from '../kernels/instance.ts';
import { productBytes } from '../kernels/product-bytes.ts';
import { NotPositiveDefinite, type PackedLower } from './packed-cholesky.ts';
import { multiplyPacked } from './packed-product.ts';
import { KEPT_NEIGHBOURS, type Preconditioner, sparseInverse } from './sparse-inverse.ts';

export interface PackedStore {
  readonly size: number;
  /** zeros at first, to be filled in place; the kernel reads this very array */
  readonly entries: PackedLower;
  /** into[c] = A xs[c], each shape [size]; one pass over the matrix serves several vectors */
  multiply(xs: readonly Float64Array[], into: readonly Float64Array[]): void;
  /**
   * A sparse inverse of the entries as they are now; it takes the place of one made before.
   * @throws NotPositiveDefinite
   */
  preconditioner(): Preconditioner;
}

/** Vectors that one pass serves: the rows in hand stay in the nearest memory for all of them. */
const TOGETHER = 8;

/** Room for a packed matrix and what is computed with it; in plain memory where there is no kernel, with the same bits. */
export function packedStore(size: number): PackedStore {
  const kernel = ownKernel(productBytes);
  return (kernel && kernelStore(kernel, size)) ?? plainStore(size);
}

function plainStore(size: number): PackedStore {
  const entries = new Float64Array((size * (size + 1)) / 2);
  return {
    size,
    entries,
    multiply(vectors, into) {
      vectors.forEach((x, c) => {
        multiplyPacked(entries, size, x, into[c]!);
      });
    },
    preconditioner: () => sparseInverse(entries, size, KEPT_NEIGHBOURS),
  };
}

/** @returns undefined where memory of that size is refused */
function kernelStore(kernel: Kernel, size: number): PackedStore | undefined {
  const count = (size * (size + 1)) / 2;
  const stride = even(size);
  const width = KEPT_NEIGHBOURS + 1;
  const kept = even(size * width);
  const room = [even(count), TOGETHER * stride, TOGETHER * stride, kept, kept, stride + width * (width + 1)];
  // reserved at once: memory that grows takes the views of it away
  const at = place(
    kernel,
    [],
    room.reduce((sum, doubles) => sum + doubles, 0),
  );
  if (at === undefined) return undefined;
  let next = at[0]!;
  const [a, xs, ys, columns, values, scratch] = room.map((doubles) => {
    const address = next;
    next += doubles * BYTES_A_DOUBLE;
    return address;
  }) as [number, number, number, number, number, number];
  const given = doublesAt(kernel, xs, TOGETHER * stride);
  const found = doublesAt(kernel, ys, TOGETHER * stride);
  const one = doublesAt(kernel, ys, size);
  return {
    size,
    entries: doublesAt(kernel, a, count),
    multiply(vectors, into) {
      for (let first = 0; first < vectors.length; first += TOGETHER) {
        const together = Math.min(TOGETHER, vectors.length - first);
        for (let c = 0; c < together; c++) given.set(vectors[first + c]!, c * stride);
        kernel.call('multiply', a, size, xs, ys, stride * BYTES_A_DOUBLE, together);
        for (let c = 0; c < together; c++)
          into[first + c]!.set(found.subarray(c * stride, c * stride + size));
      }
    },
    preconditioner() {
      const failed = kernel.call('invert', a, size, KEPT_NEIGHBOURS, columns, values, scratch);
      if (failed >= 0) throw new NotPositiveDefinite(failed);
      return (r, into) => {
        given.set(r);
        kernel.call('precondition', size, KEPT_NEIGHBOURS, columns, values, xs, ys);
        into.set(one);
      };
    },
  };
}

/** Doubles rounded up to whole pairs, so that arrays begin on one. */
function even(doubles: number): number {
  return doubles + (doubles % 2);
}
