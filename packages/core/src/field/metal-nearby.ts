// The metal that a hand reaches from a place: the nearest node of the energised piece, in plan.
import type { SegmentMesh } from '../geometry/segments.ts';
import type { Grid } from './lattice.ts';

/** Node of the piece of metal nearest in plan to a place. */
export type NearestNode = (x: number, y: number) => number;

/**
 * Nodes sorted into square cells, about one a cell, and looked for ring by ring of cells. Of nodes at one place in plan,
 * as along a rod, the shallowest is reached.
 * @param component piece of metal whose nodes are searched, at least one
 */
export function nearestNode(mesh: SegmentMesh, component: number): NearestNode {
  const { nodeX, nodeY } = mesh;
  const nodes = reachable(mesh, component);
  const west = nodes.reduce((a, node) => Math.min(a, nodeX[node]!), Infinity);
  const south = nodes.reduce((a, node) => Math.min(a, nodeY[node]!), Infinity);
  const width = nodes.reduce((a, node) => Math.max(a, nodeX[node]!), -Infinity) - west;
  const height = nodes.reduce((a, node) => Math.max(a, nodeY[node]!), -Infinity) - south;
  // about one node a cell, in a line of metal too
  const side = Math.max(Math.sqrt((width * height) / nodes.length), (width + height) / nodes.length) || 1;
  const columns = Math.floor(width / side) + 1;
  const rows = Math.floor(height / side) + 1;
  const clamped = (at: number, count: number): number =>
    Math.min(count - 1, Math.max(0, Math.floor(at / side)));
  const cellOf = (node: number): number =>
    clamped(nodeY[node]! - south, rows) * columns + clamped(nodeX[node]! - west, columns);
  const start = new Int32Array(columns * rows + 1);
  for (const node of nodes) start[cellOf(node) + 1]!++;
  for (let c = 1; c < start.length; c++) start[c]! += start[c - 1]!;
  const next = start.slice();
  const sorted = new Int32Array(nodes.length);
  for (const node of nodes) sorted[next[cellOf(node)]!++] = node;

  // places asked for one after another are near each other: the last answer bounds the next
  let last = sorted[0]!;
  return (x, y) => {
    const i = clamped(x - west, columns);
    const j = clamped(y - south, rows);
    let best = last;
    let least = (nodeX[last]! - x) ** 2 + (nodeY[last]! - y) ** 2;
    for (let ring = 0; ; ring++) {
      for (let row = Math.max(0, j - ring); row <= Math.min(rows - 1, j + ring); row++) {
        const stride = Math.abs(row - j) === ring ? 1 : Math.max(1, 2 * ring);
        for (let column = i - ring; column <= i + ring; column += stride) {
          if (column < 0 || column >= columns) continue;
          const cell = row * columns + column;
          for (let k = start[cell]!; k < start[cell + 1]!; k++) {
            const node = sorted[k]!;
            const squared = (nodeX[node]! - x) ** 2 + (nodeY[node]! - y) ** 2;
            if (squared > least || (squared === least && node > best)) continue;
            least = squared;
            best = node;
          }
        }
      }
      // distance to the nearest cell not looked at, on each side where there is one
      const beyond = Math.min(
        i - ring > 0 ? x - (west + (i - ring) * side) : Infinity,
        i + ring < columns - 1 ? west + (i + ring + 1) * side - x : Infinity,
        j - ring > 0 ? y - (south + (j - ring) * side) : Infinity,
        j + ring < rows - 1 ? south + (j + ring + 1) * side - y : Infinity,
      );
      if (beyond === Infinity || (beyond > 0 && beyond * beyond > least)) {
        last = best;
        return best;
      }
    }
  };
}

/** Nodes of a piece, of those at one place in plan the shallowest, the first of equals. */
function reachable(mesh: SegmentMesh, component: number): number[] {
  const byPlace = new Map<string, number>();
  for (let node = 0; node < mesh.nodeCount; node++) {
    if (mesh.nodeComponent[node] !== component) continue;
    const place = `${mesh.nodeX[node]!} ${mesh.nodeY[node]!}`;
    const other = byPlace.get(place);
    if (other === undefined || mesh.nodeZ[node]! < mesh.nodeZ[other]!) byPlace.set(place, node);
  }
  return [...byPlace.values()].sort((a, b) => a - b);
}

/** Node nearest to each point of a grid, point after point. */
export function nodesReached(grid: Grid, nearest: NearestNode): Int32Array {
  const { nx, ny, x0, y0, spacing } = grid;
  return Int32Array.from({ length: nx * ny }, (_, place) =>
    nearest(x0 + (place % nx) * spacing, y0 + Math.floor(place / nx) * spacing),
  );
}
