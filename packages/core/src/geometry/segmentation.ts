// From joined conductors to the mesh: cut at nodes, at soil interfaces, and ever finer toward ends.
import type { ConductorTable } from './conductors.ts';
import { type SpanEnd, spanCuts } from './grading.ts';
import type { Joints } from './joints.ts';
import type { SegmentMesh } from './segments.ts';

/** A cut of a conductor by an interface nearer to its end than this share of its length is the end itself. */
const END_SHARE = 1e-9;

/**
 * Cuts every piece of conductor in segments.
 * @param interfaces depths of the soil interfaces, m, ascending
 * @param level 0 for the coarsest mesh, one more for each refinement
 */
export function segmentMesh(
  table: ConductorTable,
  joints: Joints,
  interfaces: readonly number[],
  level: number,
): SegmentMesh {
  const x: number[] = Array.from(joints.nodeX);
  const y: number[] = Array.from(joints.nodeY);
  const z: number[] = Array.from(joints.nodeDepth);
  const component: number[] = Array.from(joints.nodeComponent);
  const ends: number[][] = [[], [], [], [], [], []];
  const radius: number[] = [];
  const layer: number[] = [];
  const leaking: number[] = [];
  const conductor: number[] = [];
  const node1: number[] = [];
  const node2: number[] = [];

  for (let piece = 0; piece < joints.pieceCount; piece++) {
    const c = joints.pieceConductor[piece]!;
    const a = table.radius[c]!;
    const insulated = table.insulated[c] === 1;
    const start = joints.pieceStart[piece]!;
    const end = joints.pieceEnd[piece]!;
    const first = joints.pieceNode1[piece]!;
    const last = joints.pieceNode2[piece]!;
    const cuts = insulated
      ? [start, end]
      : pieceCuts(
          table,
          c,
          start,
          end,
          interfaces,
          level,
          endKind(table, c, start, joints, first),
          endKind(table, c, end, joints, last),
        );
    let from = first;
    for (let k = 0; k + 1 < cuts.length; k++) {
      const t1 = cuts[k]!;
      const t2 = cuts[k + 1]!;
      let to = last;
      if (k + 2 < cuts.length) {
        to = x.length;
        x.push(along(table.x1[c]!, table.x2[c]!, t2));
        y.push(along(table.y1[c]!, table.y2[c]!, t2));
        z.push(along(table.depth1[c]!, table.depth2[c]!, t2));
        component.push(component[first]!);
      }
      ends[0]!.push(along(table.x1[c]!, table.x2[c]!, t1));
      ends[1]!.push(along(table.y1[c]!, table.y2[c]!, t1));
      ends[2]!.push(along(table.depth1[c]!, table.depth2[c]!, t1));
      ends[3]!.push(along(table.x1[c]!, table.x2[c]!, t2));
      ends[4]!.push(along(table.y1[c]!, table.y2[c]!, t2));
      ends[5]!.push(along(table.depth1[c]!, table.depth2[c]!, t2));
      const middle = along(table.depth1[c]!, table.depth2[c]!, (t1 + t2) / 2);
      let below = 0;
      while (below < interfaces.length && middle > interfaces[below]!) below++;
      radius.push(a);
      layer.push(below);
      leaking.push(insulated ? 0 : 1);
      conductor.push(c);
      node1.push(from);
      node2.push(to);
      from = to;
    }
  }
  const [x1, y1, z1, x2, y2, z2] = ends.map((values) => Float64Array.from(values)) as [
    Float64Array, Float64Array, Float64Array, Float64Array, Float64Array, Float64Array,
  ]; // biome-ignore format: six arrays of one kind
  const length = x1.map((_, i) => Math.hypot(x2[i]! - x1[i]!, y2[i]! - y1[i]!, z2[i]! - z1[i]!));
  return {
    count: radius.length,
    x1,
    y1,
    z1,
    x2,
    y2,
    z2,
    length,
    radius: Float64Array.from(radius),
    layer: Int32Array.from(layer),
    leaking: Uint8Array.from(leaking),
    conductor: Int32Array.from(conductor),
    node1: Int32Array.from(node1),
    node2: Int32Array.from(node2),
    nodeCount: x.length,
    nodeX: Float64Array.from(x),
    nodeY: Float64Array.from(y),
    nodeZ: Float64Array.from(z),
    nodeComponent: Int32Array.from(component),
    componentCount: joints.componentCount,
  };
}

function along(from: number, to: number, t: number): number {
  return t === 1 ? to : from + (to - from) * t;
}

function endKind(table: ConductorTable, c: number, t: number, joints: Joints, node: number): SpanEnd {
  if (joints.nodeDegree[node]! > 1) return 'joint';
  return along(table.depth1[c]!, table.depth2[c]!, t) < table.radius[c]! ? 'surface' : 'tip';
}

/** Cuts of one piece as parameters along its conductor, ends included. */
function pieceCuts(
  table: ConductorTable,
  c: number,
  start: number,
  end: number,
  interfaces: readonly number[],
  level: number,
  first: SpanEnd,
  last: SpanEnd,
): number[] {
  const dz = table.depth2[c]! - table.depth1[c]!;
  const length = Math.hypot(table.x2[c]! - table.x1[c]!, table.y2[c]! - table.y1[c]!, dz);
  const stops = [start];
  const crossings = interfaces
    .map((depth) => (dz === 0 ? Number.NaN : (depth - table.depth1[c]!) / dz))
    .filter((t) => t > start + END_SHARE && t < end - END_SHARE)
    .sort((p, q) => p - q);
  stops.push(...crossings, end);
  const cuts = [start];
  for (let k = 0; k + 1 < stops.length; k++) {
    const from = stops[k]!;
    const span = (stops[k + 1]! - from) * length;
    const kind1 = k === 0 ? first : 'joint';
    const kind2 = k + 2 === stops.length ? last : 'joint';
    const inner = spanCuts(span, table.radius[c]!, kind1, kind2, level);
    inner.slice(1, -1).forEach((s) => {
      cuts.push(from + s / length);
    });
    cuts.push(stops[k + 1]!);
  }
  return cuts;
}
