// The axis of a conductor as a straight line in space, from its first end to its second.
import type { ConductorTable } from './conductors.ts';

/** Ends in plan and depth, m; z is the depth. */
export interface Axis {
  readonly x1: number;
  readonly y1: number;
  readonly z1: number;
  readonly x2: number;
  readonly y2: number;
  readonly z2: number;
  /** m */
  readonly length: number;
  /** radius of the metal, m */
  readonly radius: number;
}

/** [x, y, depth], m */
export type Place = readonly [x: number, y: number, depth: number];

/** A conductor that leans less than this from the vertical is a ground rod, degrees: driven rods are never exactly plumb. Common practice, no source. */
export const ROD_LEAN_DEGREES = 10;
const ROD_RUN_PER_FALL = Math.tan((ROD_LEAN_DEGREES * Math.PI) / 180);

/** Axes of all conductors, in the order of the table. */
export function conductorAxes(table: ConductorTable): Axis[] {
  return Array.from({ length: table.count }, (_, c) => {
    const [x1, y1, z1] = [table.x1[c]!, table.y1[c]!, table.depth1[c]!];
    const [x2, y2, z2] = [table.x2[c]!, table.y2[c]!, table.depth2[c]!];
    const length = Math.hypot(x2 - x1, y2 - y1, z2 - z1);
    return { x1, y1, z1, x2, y2, z2, length, radius: table.radius[c]! };
  });
}

/** Place at the share `t` (0 … 1) of the way along; the ends are met exactly. */
export function placeOn(axis: Axis, t: number): Place {
  if (t === 1) return [axis.x2, axis.y2, axis.z2];
  return [
    axis.x1 + t * (axis.x2 - axis.x1),
    axis.y1 + t * (axis.y2 - axis.y1),
    axis.z1 + t * (axis.z2 - axis.z1),
  ];
}

/** Whether conductor `c` is a ground rod: vertical within {@link ROD_LEAN_DEGREES}. */
export function isRod(table: ConductorTable, c: number): boolean {
  const run = Math.hypot(table.x2[c]! - table.x1[c]!, table.y2[c]! - table.y1[c]!);
  const fall = Math.abs(table.depth2[c]! - table.depth1[c]!);
  return fall > 0 && run <= fall * ROD_RUN_PER_FALL;
}
