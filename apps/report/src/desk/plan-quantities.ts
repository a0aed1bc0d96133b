// How much metal a plan has: metres of conductor and number of rods, by what they are made of.
import type { PlanConductor } from '@ohmstead/study';

/** Conductors or rods of one diameter and material. */
export interface MetalSum {
  /** m */
  readonly diameter: number;
  readonly material: string;
  readonly count: number;
  /** m, all together */
  readonly length: number;
}

export interface PlanQuantities {
  /** all that is no rod, thickest first, then by material */
  readonly conductors: readonly MetalSum[];
  readonly rods: readonly MetalSum[];
}

/** Diameters are the same to a micrometre. Reason: half an inch is written as 12.7 mm and read through feet. */
const SAME_DIAMETER_M = 1e-6;

export function conductorLength({ x1, y1, depth1, x2, y2, depth2 }: PlanConductor): number {
  return Math.hypot(x2 - x1, y2 - y1, depth2 - depth1);
}

/** Key of what a conductor is made of. */
export function makeKey({ diameter, material }: Pick<PlanConductor, 'diameter' | 'material'>): string {
  return `${Math.round(diameter / SAME_DIAMETER_M)} ${material}`;
}

function sums(conductors: readonly PlanConductor[]): readonly MetalSum[] {
  const found = new Map<string, MetalSum>();
  for (const conductor of conductors) {
    const { diameter, material } = conductor;
    const before = found.get(makeKey(conductor)) ?? { diameter, material, count: 0, length: 0 };
    const length = before.length + conductorLength(conductor);
    found.set(makeKey(conductor), { ...before, count: before.count + 1, length });
  }
  return [...found.values()].sort(
    (a, b) => b.diameter - a.diameter || (a.material < b.material ? -1 : a.material > b.material ? 1 : 0),
  );
}

/** Sums over all conductors of a plan, floating metal included. */
export function planQuantities(conductors: readonly PlanConductor[]): PlanQuantities {
  return {
    conductors: sums(conductors.filter(({ rod }) => !rod)),
    rods: sums(conductors.filter(({ rod }) => rod)),
  };
}
