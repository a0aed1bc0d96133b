// Pieces of conductor between cuts, and the nodes that contacts make of cuts.
import { meanOf } from '../numerics/mean.ts';
import { rootOf, singletons, unite } from '../numerics/union-find.ts';
import { type Place, placeOn } from './conductor-axis.ts';
import type { Contacts } from './contacts.ts';
import type { Cuts } from './cuts.ts';

/** Shapes: per piece [pieceCount], per node [nodeCount]. */
export interface JoinedMetal {
  /** pieces of conductors between nodes, in conductor order, then along the conductor */
  readonly pieceCount: number;
  readonly pieceConductor: Int32Array;
  /** shares 0 … 1 along the conductor */
  readonly pieceStart: Float64Array;
  readonly pieceEnd: Float64Array;
  /** equal only for a conductor about as short as the contact distance, both ends of which touch the same metal */
  readonly pieceNode1: Int32Array;
  readonly pieceNode2: Int32Array;
  /** numbered by conductor order, then along; placed at the mean of the places that touch, m */
  readonly nodeCount: number;
  readonly nodeX: Float64Array;
  readonly nodeY: Float64Array;
  readonly nodeDepth: Float64Array;
  /** ends of pieces that meet there */
  readonly nodeDegree: Int32Array;
  /** metallically joined piece of metal that the node belongs to */
  readonly nodeComponent: Int32Array;
  readonly componentCount: number;
}

/** A cut that stays, and the set of cuts that contacts make one with it. */
interface Stop {
  readonly root: number;
  /** share 0 … 1 along the conductor */
  readonly share: number;
}

/** Pieces between the cuts of every conductor, and the nodes where they meet. */
export function joinPieces({ axes, contacts }: Contacts, cuts: Cuts): JoinedMetal {
  const sets = singletons(cuts.share.length);
  contacts.forEach((_, k) => {
    unite(sets, cuts.ofContact[2 * k]!, cuts.ofContact[2 * k + 1]!);
  });
  const nodeOfRoot = new Map<number, number>();
  const places: Place[][] = [];
  const pieces: { conductor: number; start: number; end: number; node1: number; node2: number }[] = [];
  axes.forEach((axis, conductor) => {
    const stops = stopsOf(cuts, conductor, sets).map(({ root, share }) => {
      const node = nodeOfRoot.get(root) ?? places.length;
      if (node === places.length) places.push([]);
      nodeOfRoot.set(root, node);
      places[node]!.push(placeOn(axis, share));
      return { node, share };
    });
    for (let k = 1; k < stops.length; k++) {
      const [from, to] = [stops[k - 1]!, stops[k]!];
      pieces.push({ conductor, start: from.share, end: to.share, node1: from.node, node2: to.node });
    }
  });
  const pieceNode1 = Int32Array.from(pieces, (piece) => piece.node1);
  const pieceNode2 = Int32Array.from(pieces, (piece) => piece.node2);
  return {
    pieceCount: pieces.length,
    pieceConductor: Int32Array.from(pieces, (piece) => piece.conductor),
    pieceStart: Float64Array.from(pieces, (piece) => piece.start),
    pieceEnd: Float64Array.from(pieces, (piece) => piece.end),
    pieceNode1,
    pieceNode2,
    nodeCount: places.length,
    nodeX: Float64Array.from(places, (touching) => meanOf(touching.map((place) => place[0]))),
    nodeY: Float64Array.from(places, (touching) => meanOf(touching.map((place) => place[1]))),
    nodeDepth: Float64Array.from(places, (touching) => meanOf(touching.map((place) => place[2]))),
    ...metalOf(places.length, pieceNode1, pieceNode2),
  };
}

/** Cuts of one conductor without those that contacts have made one node with a neighbour; the ends always stay. */
function stopsOf(cuts: Cuts, conductor: number, sets: Int32Array): Stop[] {
  const first = cuts.first[conductor]!;
  const last = cuts.first[conductor + 1]! - 1;
  const start = rootOf(sets, first);
  const end = rootOf(sets, last);
  const stops: Stop[] = [{ root: start, share: 0 }];
  let run = first + 1;
  while (run < last) {
    const root = rootOf(sets, run);
    let next = run + 1;
    while (next < last && rootOf(sets, next) === root) next++;
    const oneWithStart = stops.length === 1 && root === start;
    const oneWithEnd = next === last && root === end;
    if (!oneWithStart && !oneWithEnd) stops.push({ root, share: meanOf(cuts.share.subarray(run, next)) });
    run = next;
  }
  stops.push({ root: end, share: 1 });
  return stops;
}

function metalOf(
  nodeCount: number,
  node1: Int32Array,
  node2: Int32Array,
): Pick<JoinedMetal, 'nodeDegree' | 'nodeComponent' | 'componentCount'> {
  const nodeDegree = new Int32Array(nodeCount);
  const sets = singletons(nodeCount);
  node1.forEach((from, piece) => {
    nodeDegree[from]!++;
    nodeDegree[node2[piece]!]!++;
    unite(sets, from, node2[piece]!);
  });
  const nodeComponent = new Int32Array(nodeCount);
  let componentCount = 0;
  for (let node = 0; node < nodeCount; node++) {
    const root = rootOf(sets, node);
    // the root is the smallest member, so it has its number already
    nodeComponent[node] = root === node ? componentCount++ : nodeComponent[root]!;
  }
  return { nodeDegree, nodeComponent, componentCount };
}
