// Parts of a compressed matrix that one thread makes, keeps and multiplies; and the same as tasks for a helper.
import type { Task } from '../crew/crew.ts';
import { movable } from '../crew/crew.ts';
import { type Work, work } from '../crew/workshop.ts';
import { type BlockRoom, blockRoom } from '../numerics/dense-blocks.ts';
import type { BlockPlan } from './block-plan.ts';
import { type PartStart, startPart } from './compressed-matrix.ts';
import { blocksFrom, type LeakageBlocks, type LeakageTables } from './leakage-matrix.ts';
import { type PartInputs, type PartMatrix, partMatrix } from './part-matrix.ts';

/** Which of a plan's parts: `from … to − 1`. */
export interface PartRange {
  readonly from: number;
  readonly to: number;
}

/** What a part tells of itself when it is made; plain data. */
export type PartReport = Omit<PartMatrix, 'multiply'>;

/** A vector and the parts' products of it, laid out as `vectorLayout` says. */
export interface PartVectors {
  readonly x: Float64Array;
  /** each part's summed apart; shape [parts × x.length] */
  readonly products: Float64Array;
}

export interface HeldParts {
  /** @throws NotPositiveDefinite */
  start(): PartStart[];
  /** @throws MemoryRefused */
  finish(inputs: PartInputs, room: BlockRoom): PartReport[];
  /** writes the products */
  multiply(vectors: PartVectors): void;
  /** writes the sum of the products in the order of the parts */
  sum(x: Float64Array, into: Float64Array): void;
}

export function heldParts(plan: BlockPlan, { from, to }: PartRange, entries: LeakageBlocks): HeldParts {
  const parts = plan.parts.slice(from, to);
  let made: { readonly room: BlockRoom; readonly matrices: readonly PartMatrix[] } | undefined;
  const ready = (): NonNullable<typeof made> => {
    if (made === undefined) throw new Error('parts are multiplied before they are made');
    return made;
  };
  return {
    start: () => parts.map((part) => startPart(plan, part, entries)),
    finish(inputs, room) {
      const matrices = parts.map((part) => partMatrix(inputs, part, entries, room));
      made = { room, matrices };
      return matrices.map(({ bytes, evaluations, system }) => ({ bytes, evaluations, system }));
    },
    multiply({ x, products }) {
      const { room, matrices } = ready();
      room.x().set(x);
      matrices.forEach((matrix, k) => {
        const y = room.y().fill(0);
        matrix.multiply();
        products.set(y, k * x.length);
      });
    },
    sum(x, into) {
      const { room, matrices } = ready();
      room.x().set(x);
      const y = room.y().fill(0);
      for (const matrix of matrices) matrix.multiply();
      into.set(y);
    },
  };
}

export interface StartOrder extends PartRange {
  readonly tables: LeakageTables;
  readonly plan: BlockPlan;
}

export interface FinishOrder {
  readonly inputs: Omit<PartInputs, 'plan'>;
  /** of the vectors */
  readonly length: number;
}

export const START_PARTS: Task<StartOrder, readonly PartStart[]> = { name: 'start parts' };
export const FINISH_PARTS: Task<FinishOrder, readonly PartReport[]> = { name: 'finish parts' };
/** Gives the same arrays back. */
export const MULTIPLY_PARTS: Task<PartVectors, PartVectors> = { name: 'multiply parts' };

/** What a helper can do for a compressed matrix; it keeps the parts of one, the last one started. */
export function partWorks(): Work[] {
  let held: { readonly plan: BlockPlan; readonly parts: HeldParts } | undefined;
  const ready = (): NonNullable<typeof held> => {
    if (held === undefined) throw new Error('no parts were started');
    return held;
  };
  return [
    work(START_PARTS, ({ tables, plan, from, to }) => {
      held = { plan, parts: heldParts(plan, { from, to }, blocksFrom(tables)) };
      return { output: held.parts.start() };
    }),
    work(FINISH_PARTS, ({ inputs, length }) => {
      const { plan, parts } = ready();
      return { output: parts.finish({ plan, ...inputs }, blockRoom(length)) };
    }),
    work(MULTIPLY_PARTS, (vectors) => {
      ready().parts.multiply(vectors);
      return { output: vectors, moved: movable(vectors.x, vectors.products) };
    }),
  ];
}
