// The outer boundary in plan of the closed meshes of an electrode.
import { incidenceOf } from '../numerics/bridges.ts';
import type { ConductorTable } from './conductors.ts';
import { meshGraph, type PlanGraph } from './plan-graph.ts';
import { insideArea, type Polygon, signedArea } from './polygon.ts';
import { tidyPolygons } from './tidy-polygon.ts';

/**
 * Outer boundaries of the closed meshes, one for each block of meshes; none if nothing is closed.
 * Tails, rods and single links between blocks add nothing; blocks that share one corner are two; what lies inside a block is part of it.
 * @param conductors rows of the table to look at, the energised ones
 * @returns counter-clockwise, each from its lowest, then leftmost corner; the lowest first
 */
export function meshOutlines(table: ConductorTable, conductors: readonly number[]): Polygon[] {
  const graph = meshGraph(table, conductors);
  const loops = outerWalks(graph).flatMap(simpleLoops);
  const outlines = tidyPolygons(
    loops.map((loop) => loop.toReversed().map((node) => [graph.x[node]!, graph.y[node]!] as const)),
  );
  return outlines.filter(
    (outline) => !outlines.some((other) => other !== outline && encloses(other, outline)),
  );
}

/**
 * Walks around each connected part of a plane graph, the graph on the left hand (clockwise around it).
 * Every edge is walked once in each direction, at every node taking the next edge clockwise from the one just walked;
 * that goes around the faces, inner ones counter-clockwise and the outer one of each part clockwise.
 */
function outerWalks(graph: PlanGraph): number[][] {
  const next = nextHalfEdges(graph);
  const walked = new Uint8Array(next.length);
  const walks: number[][] = [];
  for (let start = 0; start < next.length; start++) {
    if (walked[start] === 1) continue;
    const walk: number[] = [];
    for (let half = start; walked[half] === 0; half = next[half]!) {
      walked[half] = 1;
      walk.push(tail(graph, half));
    }
    if (signedArea(walk.map((node) => [graph.x[node]!, graph.y[node]!])) < 0) walks.push(walk);
  }
  return walks;
}

/** Half edge 2e runs from `from[e]` to `to[e]`, 2e + 1 runs back. */
function tail({ from, to }: PlanGraph, half: number): number {
  return half % 2 === 0 ? from[half >> 1]! : to[half >> 1]!;
}

/** For every half edge the one that follows it around the face on its left. */
function nextHalfEdges(graph: PlanGraph): Int32Array {
  const { first, list } = incidenceOf(graph);
  const next = new Int32Array(2 * graph.from.length);
  for (let node = 0; node < graph.nodeCount; node++) {
    const leaving = Array.from(list.subarray(first[node]!, first[node + 1]!), (edge) => {
      const half = graph.from[edge]! === node ? 2 * edge : 2 * edge + 1;
      const head = tail(graph, half ^ 1);
      return { half, turn: turnOf(graph.x[head]! - graph.x[node]!, graph.y[head]! - graph.y[node]!) };
    }).sort((p, q) => p.turn - q.turn);
    leaving.forEach(({ half }, k) => {
      const clockwise = leaving[(k + leaving.length - 1) % leaving.length]!;
      next[half ^ 1] = clockwise.half;
    });
  }
  return next;
}

/** A measure of direction that grows counter-clockwise from 0 to 4, as the angle does, without trigonometry. */
function turnOf(dx: number, dy: number): number {
  const slope = dx / (Math.abs(dx) + Math.abs(dy));
  return dy < 0 ? 3 + slope : 1 - slope;
}

/** A closed walk cut in loops wherever it comes back to a node. */
function simpleLoops(walk: readonly number[]): number[][] {
  const loops: number[][] = [];
  const open: number[] = [];
  const position = new Map<number, number>();
  for (const node of walk) {
    const before = position.get(node);
    if (before !== undefined) {
      const loop = open.splice(before);
      for (const visited of loop) position.delete(visited);
      loops.push(loop);
    }
    position.set(node, open.length);
    open.push(node);
  }
  loops.push(open);
  return loops;
}

function encloses(outer: Polygon, inner: Polygon): boolean {
  return inner.every(([x, y]) => insideArea([outer], x, y));
}
