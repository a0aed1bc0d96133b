// The field of a solved study at whatever line or place is asked for, without solving it again.
import { potentialAt } from '@ohmstead/core';
import type { Profile } from '../outcome.ts';
import { profileAlong } from './drawing.ts';
import type { Solved, UnitField } from './levels.ts';

export interface FieldPoint {
  readonly x_m: number;
  readonly y_m: number;
  readonly depth_m: number;
}

export interface FieldValue extends FieldPoint {
  readonly potential_V: number;
  /** potential of the nearest energised metal minus that of the place */
  readonly touch_V: number;
}

export interface SolvedField {
  /**
   * Potential and touch voltage on the surface along a straight line.
   * @param caseIndex place in the study's cases
   * @param from first end, m
   * @param to second end, m
   */
  readonly profile: (
    caseIndex: number,
    from: readonly [number, number],
    to: readonly [number, number],
  ) => Profile;
  /** Potential and touch voltage at places of any depth. */
  readonly at: (caseIndex: number, points: readonly FieldPoint[]) => FieldValue[];
}

/**
 * @param currents that enter the ground, A, one a case
 * @returns functions that throw RangeError where the study has no such case
 */
export function solvedField(solved: Solved, currents: readonly number[]): SolvedField {
  const of = (caseIndex: number): { readonly unit: UnitField; readonly current: number } => {
    const current = currents[caseIndex];
    if (current === undefined) throw new RangeError(`no case ${caseIndex}`);
    return { unit: solved.units[solved.unitOfCase[caseIndex]!]!, current };
  };
  return {
    profile: (caseIndex, from, to) => {
      const { unit, current } = of(caseIndex);
      return profileAlong(current, unit, from, to);
    },
    at: (caseIndex, points) => {
      const { unit, current } = of(caseIndex);
      const { leakage } = solved.graph.units[solved.unitOfCase[caseIndex]!]!;
      return points.map((point) => {
        const { x_m, y_m, depth_m } = point;
        const potential = current * potentialAt(solved.mesh, solved.images, leakage, x_m, y_m, depth_m);
        return { ...point, potential_V: potential, touch_V: current * unit.metal(x_m, y_m) - potential };
      });
    },
  };
}
