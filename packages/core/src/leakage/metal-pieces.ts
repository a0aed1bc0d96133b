// An electrode as few pieces of metal, each leaking as it would alone at one potential: what far clusters feel of them.
import { type BlockPlan, frontier } from './block-plan.ts';
import type { ClusterBases } from './cluster-bases.ts';

/** Plain data. */
export interface MetalPieces {
  readonly count: number;
  /** first piece of a cluster, and how many it has or is part of; shape [clusters] */
  readonly first: Int32Array;
  readonly held: Int32Array;
  /** currents at a cluster's telling segments that far clusters feel like those of each of its pieces; shape [held × rank] */
  readonly seen: readonly Float64Array[];
}

/** Most pieces: twice as many save one iteration in 14 at 50 000 segments, and their system costs as much. */
const MOST_PIECES = 512;

/** @param current by place in the tree's order, A: of each leaf alone at one volt */
export function metalPieces(plan: BlockPlan, bases: ClusterBases, current: Float64Array): MetalPieces {
  const { half, parent, from, to } = plan.tree;
  const { chosen, weights } = bases;
  const clusters = half.length;
  const cut = frontier(plan.tree, MOST_PIECES);
  const first = new Int32Array(clusters);
  const held = new Int32Array(clusters);
  cut.forEach((c, piece) => {
    first[c] = piece;
    held[c] = 1;
  });
  for (let c = 1; c < clusters; c++)
    if (held[c] === 0 && held[parent[c]!] === 1) {
      first[c] = first[parent[c]!]!;
      held[c] = 1;
    }
  const seen: Float64Array[] = new Array(clusters);
  for (let c = clusters - 1; c >= 0; c--) {
    const h = half[c]!;
    if (held[c] === 0) {
      first[c] = first[h]!;
      held[c] = held[h]! + held[h + 1]!;
    }
    const rank = chosen[c]!.length;
    const own = new Float64Array(held[c]! * rank);
    seen[c] = own;
    if (rank === 0) continue;
    if (h < 0) addSeen(weights[c]!, 0, current.subarray(from[c]!, to[c]!), own);
    else
      for (const part of [h, h + 1]) {
        const width = chosen[part]!.length;
        const row = part === h ? 0 : chosen[h]!.length;
        for (let p = 0; p < held[part]!; p++) {
          const at = (first[part]! + p - first[c]!) * rank;
          addSeen(
            weights[c]!,
            row,
            seen[part]!.subarray(p * width, (p + 1) * width),
            own.subarray(at, at + rank),
          );
        }
      }
  }
  return { count: cut.length, first, held, seen };
}

/** into += W_rowsᵀ given */
function addSeen(weights: Float32Array, row: number, given: Float64Array, into: Float64Array): void {
  const rank = into.length;
  for (let r = 0; r < given.length; r++)
    for (let k = 0; k < rank; k++) into[k]! += weights[(row + r) * rank + k]! * given[r]!;
}

/** Σ aᵢ v_ij b_j */
export function between(a: Float64Array, values: Float64Array, b: Float64Array): number {
  let sum = 0;
  for (let r = 0; r < a.length; r++) {
    const at = r * b.length;
    let potential = 0;
    for (let c = 0; c < b.length; c++) potential += values[at + c]! * b[c]!;
    sum += a[r]! * potential;
  }
  return sum;
}

/**
 * Adds a far block's share to the packed system of the pieces.
 * @param values between the telling segments of two clusters
 */
export function addFarShare(
  { first, held, seen }: MetalPieces,
  [row, column]: readonly [number, number],
  values: Float64Array,
  system: Float64Array,
): void {
  const rows = seen[row]!.length / held[row]!;
  const columns = seen[column]!.length / held[column]!;
  const potential = new Float64Array(rows);
  for (let q = 0; q < held[column]!; q++) {
    for (let r = 0; r < rows; r++) {
      let sum = 0;
      for (let c = 0; c < columns; c++) sum += values[r * columns + c]! * seen[column]![q * columns + c]!;
      potential[r] = sum;
    }
    for (let p = 0; p < held[row]!; p++) {
      let sum = 0;
      for (let r = 0; r < rows; r++) sum += seen[row]![p * rows + r]! * potential[r]!;
      addShare(system, first[row]! + p, first[column]! + q, sum);
    }
  }
}

/** A block and its mirror: both on the diagonal when they lie within one piece. */
export function addShare(system: Float64Array, p: number, q: number, share: number): void {
  const row = Math.max(p, q);
  system[(row * (row + 1)) / 2 + Math.min(p, q)]! += p === q ? 2 * share : share;
}
