// Pieces of metal that leak, and what they take together.
import type { SegmentMesh } from '../geometry/segments.ts';

export interface LeakingPieces {
  /** components of the mesh with a leaking segment, upward */
  readonly pieces: readonly number[];
  /** for each, ones at its segments; shape [segments] each */
  readonly ones: readonly Float64Array[];
  /** sums over the segments of each piece; shape [pieces] */
  net(x: Float64Array): Float64Array;
}

/** @param segments leaking segments, as indices into the mesh */
export function leakingPieces(mesh: SegmentMesh, segments: Int32Array): LeakingPieces {
  const component = Int32Array.from(segments, (i) => mesh.nodeComponent[mesh.node1[i]!]!);
  const pieces = [...new Set(component)].sort((a, b) => a - b);
  const place = new Int32Array(mesh.componentCount);
  pieces.forEach((c, p) => {
    place[c] = p;
  });
  return {
    pieces,
    ones: pieces.map((c) => Float64Array.from(component, (own) => (own === c ? 1 : 0))),
    net(x) {
      const sums = new Float64Array(pieces.length);
      for (let k = 0; k < x.length; k++) sums[place[component[k]!]!]! += x[k]!;
      return sums;
    },
  };
}

/** One ampere at a node; shape [count]. */
export function unitAt(count: number, node: number): Float64Array {
  const injection = new Float64Array(count);
  injection[node] = 1;
  return injection;
}
