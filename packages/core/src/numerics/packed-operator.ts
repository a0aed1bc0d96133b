// A packed matrix as an operator to iterate with: its products, and a preconditioner made when first asked for.
import type { Product, Products } from './conjugate-gradients.ts';
import type { PackedStore } from './packed-store.ts';
import type { Preconditioner } from './sparse-inverse.ts';

export interface PackedOperator {
  readonly multiply: Product;
  readonly multiplyAll: Products;
  readonly precondition: Preconditioner;
}

/** The entries must be final when a vector is preconditioned for the first time. */
export function packedOperator(store: PackedStore): PackedOperator {
  let inverse: Preconditioner | undefined;
  return {
    multiply: (x, into) => store.multiply([x], [into]),
    multiplyAll: (xs, into) => store.multiply(xs, into),
    precondition: (r, into) => {
      inverse ??= store.preconditioner();
      inverse(r, into);
    },
  };
}
