// Segments as they are given, each a piece of metal of its own: for entries of single pairs, without joints or cuts.
import type { SegmentMesh } from '../../src/geometry/segments.ts';
import type { Bar } from './electrodes.ts';

/** @param interfaces depths between layers, m; a bar lies in the layer of its middle */
export function looseMesh(bars: readonly Bar[], interfaces: readonly number[]): SegmentMesh {
  const pick = (value: (bar: Bar, i: number) => number): Float64Array => Float64Array.from(bars, value);
  const whole = (value: (bar: Bar, i: number) => number): Int32Array => Int32Array.from(bars, value);
  const middle = ({ from, to }: Bar): number => (from[2] + to[2]) / 2;
  return {
    count: bars.length,
    x1: pick((b) => b.from[0]),
    y1: pick((b) => b.from[1]),
    z1: pick((b) => b.from[2]),
    x2: pick((b) => b.to[0]),
    y2: pick((b) => b.to[1]),
    z2: pick((b) => b.to[2]),
    length: pick(({ from, to }) => Math.hypot(to[0] - from[0], to[1] - from[1], to[2] - from[2])),
    radius: pick((b) => b.radius),
    layer: whole((b) => interfaces.filter((depth) => depth < middle(b)).length),
    leaking: new Uint8Array(bars.length).fill(1),
    conductor: whole((_, i) => i),
    node1: whole((_, i) => 2 * i),
    node2: whole((_, i) => 2 * i + 1),
    nodeCount: 2 * bars.length,
    nodeX: Float64Array.from(bars.flatMap((b) => [b.from[0], b.to[0]])),
    nodeY: Float64Array.from(bars.flatMap((b) => [b.from[1], b.to[1]])),
    nodeZ: Float64Array.from(bars.flatMap((b) => [b.from[2], b.to[2]])),
    nodeComponent: Int32Array.from({ length: 2 * bars.length }, (_, n) => n >> 1),
    componentCount: bars.length,
  };
}
