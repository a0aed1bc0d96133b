// The leakage matrix of a large electrode: near blocks whole, far ones through the few segments that tell of a cluster.
import type { SegmentMesh } from '../geometry/segments.ts';
import { type BlockRoom, blockRoom, type DenseBlocks, denseBlocks, SHAPE } from '../numerics/dense-blocks.ts';
import type { SoilImages } from '../soil/image-list.ts';
import { type BlockPart, type BlockPlan, type CompressionOptions, planBlocks } from './block-plan.ts';
import { type ClusterBases, clusterBases, joinBases } from './cluster-bases.ts';
import { byPlace, joinLeaves, type LeafBlocks, leafBlocks, leafShapes } from './leaf-blocks.ts';
import { type LeakageBlocks, type LeakageMatrix, leakageBlocks, leakingSegments } from './leakage-matrix.ts';
import { metalPieces } from './metal-pieces.ts';
import { type PartInputs, partMatrix, type VectorLayout, vectorLayout } from './part-matrix.ts';
import { twoLevelPreconditioner } from './two-level-preconditioner.ts';

export interface CompressedLeakageMatrix extends LeakageMatrix {
  /** memory kept, counted in doubles */
  readonly stored: number;
  /** entries computed to build it */
  readonly evaluations: number;
}

/**
 * Compresses the leakage matrix: R ≈ near blocks + V S Vᵀ, S the entries between the few telling segments of far
 * clusters and V the weights with which these stand for all (nested bases: Hackbusch and Börm, Computing 69, 2002;
 * from memory). Memory and work grow with the number of segments.
 * @throws NotPositiveDefinite, MemoryRefused
 */
export function compressedLeakageMatrix(
  mesh: SegmentMesh,
  images: SoilImages,
  options?: CompressionOptions,
): CompressedLeakageMatrix {
  return compressedByPlan(mesh, images, planBlocks(mesh, options));
}

/** The same by a plan made before. @throws NotPositiveDefinite, MemoryRefused */
export function compressedByPlan(
  mesh: SegmentMesh,
  images: SoilImages,
  plan: BlockPlan,
): CompressedLeakageMatrix {
  const entries = leakageBlocks(mesh, images);
  const joined = joinParts(
    plan,
    entries,
    plan.parts.map((part) => startPart(plan, part, entries)),
  );
  const room = blockRoom(joined.layout.length);
  const matrices = plan.parts.map((part) => partMatrix(joined.inputs, part, entries, room));
  return assembleMatrix(mesh, joined, room, {
    systems: matrices.map((part) => part.system),
    bytes: matrices.reduce((sum, part) => sum + part.bytes, 0),
    evaluations: matrices.reduce((sum, part) => sum + part.evaluations, 0),
    products: {
      kind: 'here',
      multiply: () => {
        for (const part of matrices) part.multiply();
      },
    },
  });
}

/** What a part gives before it knows of the others; plain data. */
export interface PartStart {
  readonly bases: ClusterBases;
  readonly leaves: LeafBlocks;
}

/** First step of a part, on its own. @throws NotPositiveDefinite */
export function startPart(plan: BlockPlan, { clusters }: BlockPart, entries: LeakageBlocks): PartStart {
  return { bases: clusterBases(plan, entries, clusters), leaves: leafBlocks(plan, entries, clusters) };
}

export interface JoinedParts {
  /** what every part needs for its second step, `partMatrix` */
  readonly inputs: PartInputs;
  readonly layout: VectorLayout;
  readonly bases: ClusterBases;
  readonly leaves: LeafBlocks;
}

/** Between the steps: the clusters above the parts, and what the parts must know of each other. */
export function joinParts(
  plan: BlockPlan,
  entries: LeakageBlocks,
  starts: readonly PartStart[],
): JoinedParts {
  const bases = clusterBases(plan, entries, plan.top, joinBases(starts.map((start) => start.bases)));
  const leaves = joinLeaves(starts.map((start) => start.leaves));
  const current = byPlace(plan, leaves.leaves, leaves.current);
  const { chosen } = bases;
  return {
    inputs: { plan, chosen, current, pieces: metalPieces(plan, bases, current) },
    layout: vectorLayout(plan, chosen),
    bases,
    leaves,
  };
}

/** What the parts give in the end. */
export interface PartProducts {
  /** of every part, in their order */
  readonly systems: readonly Float64Array[];
  readonly bytes: number;
  readonly evaluations: number;
  readonly products: PartsHere | PartsAway;
}

/** Parts in the room of the rest of the matrix: `multiply` adds their products to its y, in their order. */
export interface PartsHere {
  readonly kind: 'here';
  multiply(): void;
}

/** Parts elsewhere: `multiply` adds their products of x to y, each summed apart, in their order. */
export interface PartsAway {
  readonly kind: 'away';
  multiply(x: Float64Array, y: Float64Array): Promise<void>;
}

/** Last step: the matrix, whoever multiplies its parts. @throws NotPositiveDefinite, MemoryRefused */
export function assembleMatrix(
  mesh: SegmentMesh,
  { inputs, layout, bases, leaves }: JoinedParts,
  room: BlockRoom,
  parts: PartProducts,
): CompressedLeakageMatrix {
  const { plan, pieces } = inputs;
  const segments = leakingSegments(mesh);
  const size = segments.length;
  const order = placesOf(mesh, segments, plan.tree.order);
  const own = denseBlocks(room, leafShapes(plan, leaves.leaves), leaves.own);
  const views = basisBlocks(plan, bases, layout, room);
  const system = new Float64Array((pieces.count * (pieces.count + 1)) / 2);
  for (const share of parts.systems) for (let k = 0; k < system.length; k++) system[k]! += share[k]!;
  const inverse = twoLevelPreconditioner(inputs, leaves, system, room);
  const diagonal = new Float64Array(size);
  scatter(order, byPlace(plan, leaves.leaves, leaves.diagonal), diagonal);
  return {
    segments,
    size,
    diagonal,
    stored: (own.bytes + views.bytes + inverse.bytes + parts.bytes) / Float64Array.BYTES_PER_ELEMENT,
    evaluations: leaves.evaluations + bases.evaluations + parts.evaluations,
    multiply(given, into) {
      const [x, y] = [room.x(), room.y()];
      gather(order, given, x.fill(0));
      views.fold();
      y.fill(0);
      const finish = (): void => {
        own.multiply();
        views.unfold();
        scatter(order, y, into);
      };
      if (parts.products.kind === 'here') {
        parts.products.multiply();
        return finish();
      }
      // another product may use the room meanwhile
      const [sent, sum] = [x.slice(), new Float64Array(layout.length)];
      return parts.products.multiply(sent, sum).then(() => {
        x.set(sent);
        y.set(sum);
        finish();
      });
    },
    precondition(given, into) {
      gather(order, given, room.x());
      room.y().fill(0);
      inverse.apply();
      scatter(order, room.y(), into);
    },
  };
}

/** Place in the tree's order → index into the leaking segments. */
function placesOf(mesh: SegmentMesh, segments: Int32Array, order: Int32Array): Int32Array {
  const index = new Int32Array(mesh.count);
  segments.forEach((i, k) => {
    index[i] = k;
  });
  return order.map((i) => index[i]!);
}

/** The weights of the bases, halves before the whole. */
function basisBlocks(
  { tree }: BlockPlan,
  { chosen, weights }: ClusterBases,
  { offset }: VectorLayout,
  room: BlockRoom,
): DenseBlocks {
  const clusters = Array.from(chosen, (_, c) => c)
    .filter((c) => chosen[c]!.length > 0)
    .reverse();
  const shapes = new Uint32Array(clusters.length * SHAPE);
  clusters.forEach((c, k) => {
    const rank = chosen[c]!.length;
    const row = tree.half[c]! < 0 ? tree.from[c]! : offset[tree.half[c]!]!;
    shapes.set([row, weights[c]!.length / rank, offset[c]!, rank, 0], k * SHAPE);
  });
  const blocks = denseBlocks(room, shapes);
  clusters.forEach((c, k) => {
    blocks.set(k, weights[c]!);
  });
  return blocks;
}

function gather(order: Int32Array, given: Float64Array, into: Float64Array): void {
  for (let k = 0; k < order.length; k++) into[k] = given[order[k]!]!;
}

function scatter(order: Int32Array, given: Float64Array, into: Float64Array): void {
  for (let k = 0; k < order.length; k++) into[order[k]!] = given[k]!;
}
