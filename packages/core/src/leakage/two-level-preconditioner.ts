// An approximate inverse of the compressed leakage matrix: leaves alone, and whole pieces of metal among each other.
import { type BlockRoom, denseBlocks } from '../numerics/dense-blocks.ts';
import { factorPacked, solvePacked } from '../numerics/packed-cholesky.ts';
import { type LeafBlocks, leafShapes } from './leaf-blocks.ts';
import type { PartInputs } from './part-matrix.ts';

export interface TwoLevelPreconditioner {
  readonly bytes: number;
  /** y += M⁻¹ x of the room's vectors, by place in the tree's order */
  apply(): void;
}

/**
 * M⁻¹ = B⁻¹ − W G⁻¹ Wᵀ + W E⁻¹ Wᵀ, B the leaves' own blocks, column p of W the current B⁻¹ 1 of piece p, G = diag(1ᵀ B⁻¹ 1),
 * E = Wᵀ R W: the inverse, by Woodbury's formula, of B with constant potentials between the pieces, those that the
 * currents W cause. B⁻¹ − W G⁻¹ Wᵀ is positive semidefinite with the constants as null space, where W E⁻¹ Wᵀ is
 * positive, so M⁻¹ is symmetric positive definite. What it leaves out falls off faster than the square of distance,
 * so iterations hardly grow with the electrode.
 * @param system the pairs' share of E, packed; overwritten
 * @throws NotPositiveDefinite
 */
export function twoLevelPreconditioner(
  { plan, current, pieces }: PartInputs,
  leaves: LeafBlocks,
  system: Float64Array,
  room: BlockRoom,
): TwoLevelPreconditioner {
  const { tree } = plan;
  const size = tree.order.length;
  const inverse = denseBlocks(room, leafShapes(plan, leaves.leaves), leaves.inverse);
  const pieceAt = new Int32Array(size);
  for (const c of leaves.leaves) pieceAt.fill(pieces.first[c]!, tree.from[c]!, tree.to[c]!);
  const conductance = new Float64Array(pieces.count);
  for (let i = 0; i < size; i++) conductance[pieceAt[i]!]! += current[i]!;
  // a leaf's own share of E is its conductance: Wᵀ B W = 1ᵀ B⁻¹ 1
  for (let p = 0; p < pieces.count; p++) system[(p * (p + 3)) / 2]! += conductance[p]!;
  factorPacked(system, pieces.count);
  return {
    bytes: inverse.bytes + system.byteLength,
    apply() {
      inverse.multiply();
      const [r, z] = [room.x(), room.y()];
      const sums = new Float64Array(pieces.count);
      for (let i = 0; i < size; i++) sums[pieceAt[i]!]! += current[i]! * r[i]!;
      const alone = sums.map((sum, p) => sum / conductance[p]!);
      solvePacked(system, pieces.count, sums);
      for (let i = 0; i < size; i++) z[i]! += current[i]! * (sums[pieceAt[i]!]! - alone[pieceAt[i]!]!);
    },
  };
}
