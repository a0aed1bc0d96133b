// How far a radial table goes, and the refusal of places beyond: past its last bin there is nothing to read.
import { type RadialTable, STRIDE } from '../leakage/radial-table.ts';

/** Largest distance that a table holds, m. */
export function radialReach({ bins, perSquare }: RadialTable): number {
  const last = bins.length - STRIDE;
  return Math.sqrt((bins[last]! + 1 / bins[last + 1]! - 1) / perSquare);
}

/** A box in plan: west, south, east, north, m. */
export type PlanBox = readonly [west: number, south: number, east: number, north: number];

/**
 * @param metal box around all metal
 * @param places box around the places asked for
 * @throws RangeError when a place lies farther from some metal than the tables reach, or is none
 */
export function requireWithin(reach: number, metal: PlanBox, places: PlanBox): void {
  const across = Math.max(places[2] - metal[0], metal[2] - places[0]);
  const up = Math.max(places[3] - metal[1], metal[3] - places[1]);
  const farthest = Math.hypot(across, up);
  if (farthest <= reach) return;
  throw new RangeError(
    `a place lies up to ${farthest.toFixed(1)} m from metal; surface potentials were prepared for ${reach.toFixed(1)} m`,
  );
}
