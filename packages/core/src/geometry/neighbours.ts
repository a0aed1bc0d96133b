// Which conductors come near each other in plan, by a spatial index instead of trying every pair.
import Flatbush from 'flatbush';
import type { Axis } from './conductor-axis.ts';

/** Finds conductors whose metal may lie within a distance in plan; ascending order. */
export interface Neighbours {
  /** conductors near conductor `c`, itself included, m */
  ofConductor(c: number, distance: number): number[];
  /** conductors near a place in plan, m */
  ofPlace(x: number, y: number, distance: number): number[];
}

export function neighbours(axes: readonly Axis[]): Neighbours {
  if (axes.length === 0) return { ofConductor: () => [], ofPlace: () => [] };
  const index = new Flatbush(axes.length);
  for (const { x1, y1, x2, y2, radius } of axes) {
    index.add(
      Math.min(x1, x2) - radius,
      Math.min(y1, y2) - radius,
      Math.max(x1, x2) + radius,
      Math.max(y1, y2) + radius,
    );
  }
  index.finish();
  const search = (x1: number, y1: number, x2: number, y2: number, margin: number): number[] =>
    index
      .search(
        Math.min(x1, x2) - margin,
        Math.min(y1, y2) - margin,
        Math.max(x1, x2) + margin,
        Math.max(y1, y2) + margin,
      )
      .sort((p, q) => p - q);
  return {
    ofConductor(c, distance) {
      const { x1, y1, x2, y2, radius } = axes[c]!;
      return search(x1, y1, x2, y2, radius + distance);
    },
    ofPlace: (x, y, distance) => search(x, y, x, y, distance),
  };
}
