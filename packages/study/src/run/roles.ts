// What the joints make of each conductor: joined to a place of injection or floating, rod or not.
import type { ConductorTable } from '@ohmstead/core';
import type { Prepared } from './prepare.ts';

/** A conductor steeper than this from vertical is no rod. */
const ROD_TILT = Math.tan((10 * Math.PI) / 180);

export function isRod(table: ConductorTable, i: number): boolean {
  const run = Math.hypot(table.x2[i]! - table.x1[i]!, table.y2[i]! - table.y1[i]!);
  return run <= ROD_TILT * Math.abs(table.depth2[i]! - table.depth1[i]!);
}

export function conductorLength(table: ConductorTable, i: number): number {
  return Math.hypot(
    table.x2[i]! - table.x1[i]!,
    table.y2[i]! - table.y1[i]!,
    table.depth2[i]! - table.depth1[i]!,
  );
}

export function isEnergised(prepared: Prepared, i: number): boolean {
  return prepared.energised.has(prepared.componentOf[i]!);
}
