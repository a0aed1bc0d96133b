// The metal that a hand reaches from a place: the nearest node of the energised piece, in plan.
import Flatbush from 'flatbush';
import type { SegmentMesh } from '../geometry/segments.ts';
import type { Lattice } from './lattice.ts';

/** Node of the piece of metal nearest in plan to a place. */
export type NearestNode = (x: number, y: number) => number;

/** @param component piece of metal whose nodes are searched */
export function nearestNode(mesh: SegmentMesh, component: number): NearestNode {
  const nodes: number[] = [];
  for (let node = 0; node < mesh.nodeCount; node++)
    if (mesh.nodeComponent[node] === component) nodes.push(node);
  const index = new Flatbush(nodes.length);
  for (const node of nodes)
    index.add(mesh.nodeX[node]!, mesh.nodeY[node]!, mesh.nodeX[node]!, mesh.nodeY[node]!);
  index.finish();
  return (x, y) => nodes[index.neighbors(x, y, 1)[0]!]!;
}

/** Node nearest to each point of a lattice, shape of the lattice. */
export function nodesReached(lattice: Lattice, nearest: NearestNode): Int32Array {
  const { nx, x0, y0, spacing } = lattice;
  return Int32Array.from(lattice.values, (_, place) =>
    nearest(x0 + (place % nx) * spacing, y0 + Math.floor(place / nx) * spacing),
  );
}
