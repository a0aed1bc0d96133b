// The areas that are assessed where a study names none.
import type { ConductorTable } from './conductors.ts';
import { corridors, grownOutlines, type PlanLine } from './grown-area.ts';
import { meshOutlines } from './outline.ts';
import type { Polygon } from './polygon.ts';

/** Reach of an arm from metal, m: touch voltage without meshes is assessed this far from the conductors. IEEE Std 80, 3.1 (from memory). */
export const REACH_M = 1;

/** How far beyond the touch area step voltage is assessed, m: a few paces, where it is greatest. Common practice, no source. */
export const STEP_MARGIN_M = 3;

/**
 * Touch area: inside the outer boundary of the closed meshes, or within 1 m of the conductors where there are no meshes.
 * Step area: the same boundary grown by 3 m. Insulated conductors add to neither.
 * @param conductors rows of the table, the energised ones
 */
export function defaultAreas(
  table: ConductorTable,
  conductors: readonly number[],
): { touch: Polygon[]; step: Polygon[] } {
  const outlines = meshOutlines(table, conductors);
  if (outlines.length > 0) return { touch: outlines, step: grownOutlines(outlines, STEP_MARGIN_M) };
  const lines = conductors
    .filter((c) => table.insulated[c] !== 1)
    .map((c): PlanLine => [table.x1[c]!, table.y1[c]!, table.x2[c]!, table.y2[c]!]);
  return { touch: corridors(lines, REACH_M), step: corridors(lines, REACH_M + STEP_MARGIN_M) };
}
