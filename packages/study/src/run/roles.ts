// What the joints make of each conductor: joined to a place of injection or floating, and how long it is.
import type { ConductorTable } from '@ohmstead/core';
import type { Prepared } from './prepare.ts';

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
