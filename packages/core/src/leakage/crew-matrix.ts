// The compressed matrix made and multiplied by a crew: each member keeps its parts, only vectors go to and fro.
import { type Crew, type Hand, HelperLost, movable } from '../crew/crew.ts';
import type { SegmentMesh } from '../geometry/segments.ts';
import { blockRoom } from '../numerics/dense-blocks.ts';
import type { SoilImages } from '../soil/image-list.ts';
import { type BlockPlan, plannedEntries } from './block-plan.ts';
import {
  assembleMatrix,
  type CompressedLeakageMatrix,
  joinParts,
  type PartStart,
} from './compressed-matrix.ts';
import {
  FINISH_PARTS,
  heldParts,
  MULTIPLY_PARTS,
  type PartRange,
  type PartReport,
  type PartVectors,
  START_PARTS,
} from './held-parts.ts';
import { blocksFrom, type LeakageBlocks, type LeakageTables, leakageTables } from './leakage-matrix.ts';
import type { PartInputs } from './part-matrix.ts';

/**
 * Entries from which a crew shares in a matrix. Fewer, a quarter of a second's work, are made and solved as fast alone:
 * a helper's start, the reading of its code and its first, slow calls cost as much as it saves. Measured from 2 400 to
 * 8 600 segments, of which the latter are the first to gain.
 */
const LEAST_ENTRIES = 5e6;

/** Whether a matrix takes so long that a helper's start, and the data sent to it, cost less than what it saves. */
export function crewPays(plan: BlockPlan): boolean {
  return plannedEntries(plan) >= LEAST_ENTRIES;
}

/**
 * The same to the last bit as `compressedByPlan`: parts are summed apart, in their order, whoever computes them. What a
 * lost helper held is made anew in place.
 * @throws NotPositiveDefinite, MemoryRefused
 */
export async function crewMatrix(
  mesh: SegmentMesh,
  images: SoilImages,
  plan: BlockPlan,
  crew: Crew,
): Promise<CompressedLeakageMatrix> {
  const tables = leakageTables(mesh, images);
  const entries = blocksFrom(tables);
  const [own, ...others] = shares(plan.parts.length, crew.size + 1);
  const here = heldParts(plan, own!, entries);
  const hands = crew.hands();
  const away = others.map((range, h) => awayParts({ plan, tables, entries, range }, hands[h]!, crew));
  const [first, ...more] = await together(
    () => crew.underWay().then(() => here.start()),
    away.map((one) => one.start()),
  );
  const joined = joinParts(plan, entries, [first, ...more].flat());
  const { length } = joined.layout;
  const room = blockRoom(length);
  const reports = await together(
    () => here.finish(joined.inputs, room),
    away.map((one) => one.finish(joined.inputs, length)),
  );
  const finished = reports.flat();
  return assembleMatrix(mesh, joined, room, {
    systems: finished.map((part) => part.system),
    bytes: finished.reduce((sum, part) => sum + part.bytes, 0),
    evaluations: finished.reduce((sum, part) => sum + part.evaluations, 0),
    products: {
      kind: 'away',
      async multiply(x, y) {
        const asked = away.map((one) => one.multiply(x));
        here.sum(x, y);
        const given = await Promise.all(asked);
        given.forEach((vectors, k) => {
          addProducts(vectors, y);
          away[k]!.giveBack(vectors);
        });
      },
    },
  });
}

/** Cuts the parts into one range a member, nearly equal, in order. */
function shares(parts: number, members: number): PartRange[] {
  const count = Math.min(parts, members);
  return Array.from({ length: count }, (_, m) => ({
    from: Math.floor((parts * m) / count),
    to: Math.floor((parts * (m + 1)) / count),
  }));
}

/** What the caller does while helpers are at work, and what they give, in this order. */
function together<T>(own: () => T | Promise<T>, asked: readonly Promise<T>[]): Promise<T[]> {
  // a fault of the own work must wait for them, too
  return Promise.all([new Promise<T>((done) => done(own())), ...asked]);
}

function addProducts({ x, products }: PartVectors, y: Float64Array): void {
  for (let at = 0; at < products.length; at += x.length)
    for (let i = 0; i < x.length; i++) y[i]! += products[at + i]!;
}

interface AwayParts {
  start(): Promise<readonly PartStart[]>;
  finish(inputs: PartInputs, length: number): Promise<readonly PartReport[]>;
  multiply(x: Float64Array): Promise<PartVectors>;
  /** vectors that were read and may be used again */
  giveBack(vectors: PartVectors): void;
}

interface AwayInputs {
  readonly plan: BlockPlan;
  readonly tables: LeakageTables;
  readonly entries: LeakageBlocks;
  readonly range: PartRange;
}

/** Parts that a helper holds; in place, made anew, from when it is lost. */
function awayParts({ plan, tables, entries, range }: AwayInputs, hand: Hand, crew: Crew): AwayParts {
  const inPlace = heldParts(plan, range, entries);
  const free: PartVectors[] = [];
  let lost = false;
  let inputs: PartInputs | undefined;
  let made = false;
  /** what a helper gives; nothing when it is lost */
  const given = async <T>(ask: () => Promise<T>): Promise<T | undefined> => {
    if (lost) return undefined;
    try {
      return await ask();
    } catch (error) {
      if (!(error instanceof HelperLost)) throw error;
      lost = true;
      return undefined;
    }
  };
  const finishInPlace = (all: PartInputs, length: number): PartReport[] => {
    made = true;
    return inPlace.finish(all, blockRoom(length));
  };
  return {
    start: async () =>
      (await given(() => hand.ask(START_PARTS, { tables, plan, ...range }))) ?? inPlace.start(),
    async finish(all, length) {
      inputs = all;
      const { plan: _, ...sent } = all;
      return (
        (await given(() => hand.ask(FINISH_PARTS, { inputs: sent, length }))) ?? finishInPlace(all, length)
      );
    },
    async multiply(x) {
      const { length } = x;
      const vectors = free.pop() ?? {
        x: crew.doubles(length),
        products: crew.doubles((range.to - range.from) * length),
      };
      vectors.x.set(x);
      const back = await given(() => hand.ask(MULTIPLY_PARTS, vectors, movable(vectors.x, vectors.products)));
      if (back !== undefined) return back;
      const own = { x, products: new Float64Array((range.to - range.from) * length) };
      if (!made) finishInPlace(inputs!, length);
      inPlace.multiply(own);
      return own;
    },
    giveBack: (vectors) => void free.push(vectors),
  };
}
