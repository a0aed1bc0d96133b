// Metal for tests of the plan: lines and rods by their places.
import { type Conductor, isRod } from '../../../src/desk/conductor.ts';
import type { PlanItem } from '../../../src/plan/plan-conductors.ts';

let line = 1;

/** Invented: at 0.5 m depth, 10 mm thick. */
export function conductor(id: string, x1: number, y1: number, x2: number, y2: number): Conductor {
  const rod = x1 === x2 && y1 === y2;
  return {
    id,
    x1,
    y1,
    depth1: 0.5,
    x2,
    y2,
    depth2: rod ? 3.5 : 0.5,
    diameter: 0.01,
    material: undefined,
    electrode: undefined,
    insulated: undefined,
    resistance: undefined,
  };
}

export function item(...of: Parameters<typeof conductor>): PlanItem {
  line += 1;
  const made = conductor(...of);
  const row = { file: 'conductors.csv', line };
  return { row, key: `${row.file}:${row.line}`, conductor: made, rod: isRod(made) };
}
