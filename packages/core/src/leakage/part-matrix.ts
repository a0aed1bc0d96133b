// One part of the compressed matrix: its near and far blocks, made and multiplied without the others.
import { type BlockRoom, denseBlocks, SHAPE } from '../numerics/dense-blocks.ts';
import { type BlockPart, type BlockPlan, sizeOf } from './block-plan.ts';
import type { ClusterBases } from './cluster-bases.ts';
import type { LeakageBlocks } from './leakage-matrix.ts';
import { addFarShare, addShare, between, type MetalPieces } from './metal-pieces.ts';

/** What every part needs of the others; plain data. */
export interface PartInputs {
  readonly plan: BlockPlan;
  readonly chosen: ClusterBases['chosen'];
  /** by place in the tree's order, A: of each leaf alone at one volt */
  readonly current: Float64Array;
  readonly pieces: MetalPieces;
}

export interface PartMatrix {
  /** taken for its blocks */
  readonly bytes: number;
  readonly evaluations: number;
  /** its share of the packed system of the pieces; plain data */
  readonly system: Float64Array;
  /** y += its share of the product, in the vectors of its room, laid out as `vectorLayout` says */
  multiply(): void;
}

/** Where a vector's values lie: segments in the tree's order, then what each cluster's telling segments carry. */
export interface VectorLayout {
  readonly length: number;
  /** shape [clusters] */
  readonly offset: Uint32Array;
}

export function vectorLayout({ tree }: BlockPlan, chosen: ClusterBases['chosen']): VectorLayout {
  const offset = new Uint32Array(chosen.length);
  let length = tree.order.length;
  chosen.forEach((own, c) => {
    offset[c] = length;
    length += own.length;
  });
  return { length, offset };
}

/** @throws MemoryRefused */
export function partMatrix(
  inputs: PartInputs,
  part: BlockPart,
  entries: LeakageBlocks,
  room: BlockRoom,
): PartMatrix {
  const { plan, chosen, current, pieces } = inputs;
  const { from, to, order } = plan.tree;
  const near = pairsIn(plan.near, part.near);
  const far = pairsIn(plan.far, part.far);
  const shapes = shapesOf(inputs, near, far);
  const blocks = denseBlocks(room, shapes);
  const system = new Float64Array((pieces.count * (pieces.count + 1)) / 2);
  let evaluations = 0;
  let block = 0;
  let values = new Float64Array(0);
  const fill = (rows: Int32Array, columns: Int32Array): void => {
    const count = rows.length * columns.length;
    if (values.length < count) values = new Float64Array(count);
    entries(rows, columns, values);
    blocks.set(block++, values);
    evaluations += count;
  };
  for (const [row, column] of near) {
    fill(order.subarray(from[row]!, to[row]!), order.subarray(from[column]!, to[column]!));
    const [a, b] = [current.subarray(from[row]!, to[row]!), current.subarray(from[column]!, to[column]!)];
    addShare(system, pieces.first[row]!, pieces.first[column]!, between(a, values, b));
  }
  for (const pair of far) {
    fill(chosen[pair[0]]!, chosen[pair[1]]!);
    addFarShare(pieces, pair, values, system);
  }
  return { bytes: blocks.bytes, evaluations, system, multiply: blocks.multiply };
}

type Pair = readonly [row: number, column: number];

function pairsIn(pairs: Int32Array, [from, to]: readonly [number, number]): Pair[] {
  return Array.from({ length: to - from }, (_, k) => [pairs[2 * (from + k)]!, pairs[2 * (from + k) + 1]!]);
}

/** Shapes of the near and then the far blocks, each mirrored. */
function shapesOf({ plan, chosen }: PartInputs, near: readonly Pair[], far: readonly Pair[]): Uint32Array {
  const { tree } = plan;
  const { offset } = vectorLayout(plan, chosen);
  const shapes = new Uint32Array((near.length + far.length) * SHAPE);
  near.forEach(([row, column], k) => {
    shapes.set([tree.from[row]!, sizeOf(tree, row), tree.from[column]!, sizeOf(tree, column), 1], k * SHAPE);
  });
  far.forEach(([row, column], k) => {
    const at = (near.length + k) * SHAPE;
    shapes.set([offset[row]!, chosen[row]!.length, offset[column]!, chosen[column]!.length, 1], at);
  });
  return shapes;
}
