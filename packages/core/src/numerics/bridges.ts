// Edges of a graph that no closed path runs through: tails, and single links between blocks.

/** An undirected graph without doubled edges or loops; edge e joins from[e] and to[e], shape [edges]. */
export interface Graph {
  readonly nodeCount: number;
  readonly from: ArrayLike<number>;
  readonly to: ArrayLike<number>;
}

/** Edges at each node: those of node v are list[first[v]] … list[first[v + 1] − 1]. */
export interface Incidence {
  readonly first: Int32Array;
  readonly list: Int32Array;
}

export function incidenceOf({ nodeCount, from, to }: Graph): Incidence {
  const first = new Int32Array(nodeCount + 1);
  for (let e = 0; e < from.length; e++) {
    first[from[e]! + 1]!++;
    first[to[e]! + 1]!++;
  }
  for (let v = 0; v < nodeCount; v++) first[v + 1]! += first[v]!;
  const next = first.slice();
  const list = new Int32Array(2 * from.length);
  for (let e = 0; e < from.length; e++) {
    list[next[from[e]!]!++] = e;
    list[next[to[e]!]!++] = e;
  }
  return { first, list };
}

/**
 * 1 for every bridge, shape [edges]. Depth-first: an edge to a child is a bridge if nothing below the child reaches back
 * to the parent or above (Tarjan 1974, "A note on finding the bridges of a graph"). With a stack of its own, so depth is no limit.
 */
export function bridges(graph: Graph): Uint8Array {
  const { nodeCount, from, to } = graph;
  const { first, list } = incidenceOf(graph);
  const bridge = new Uint8Array(from.length);
  const seen = new Int32Array(nodeCount).fill(-1);
  const reaches = new Int32Array(nodeCount);
  const next = first.slice(0, nodeCount);
  const entered = new Int32Array(nodeCount).fill(-1);
  let time = 0;
  for (let root = 0; root < nodeCount; root++) {
    if (seen[root] !== -1) continue;
    const path = [root];
    seen[root] = time;
    reaches[root] = time++;
    while (path.length > 0) {
      const node = path.at(-1)!;
      if (next[node]! < first[node + 1]!) {
        const edge = list[next[node]!++]!;
        if (edge === entered[node]) continue;
        const far = from[edge]! === node ? to[edge]! : from[edge]!;
        if (seen[far] === -1) {
          entered[far] = edge;
          seen[far] = time;
          reaches[far] = time++;
          path.push(far);
        } else {
          reaches[node] = Math.min(reaches[node]!, seen[far]!);
        }
        continue;
      }
      path.pop();
      const parent = path.at(-1);
      if (parent === undefined) continue;
      reaches[parent] = Math.min(reaches[parent]!, reaches[node]!);
      if (reaches[node]! > seen[parent]!) bridge[entered[node]!] = 1;
    }
  }
  return bridge;
}
