// What a pointer takes up and where it goes: by an end or by its middle, onto other metal, in whole steps, or freely.
import type { Point } from '@ohmstead/study';
import { describe, expect, test } from 'vitest';
import { gripOf, heldTo } from '../../../src/plan/held-shift.ts';
import type { PlanArea } from '../../../src/plan/plan-areas.ts';
import { draggedCorners, draggedProfile, type Grip, gripUnder, heldAt } from '../../../src/plan/plan-grip.ts';
import type { Drag } from '../../../src/plan/pointer-drag.ts';
import { item } from './items.ts';

const along = item('A', 0, 0, 10, 0);
const other = item('B', 3.2, 5, 3.2, 9);
const options = { tolerance: 0.5, step: 0.5, free: false };

describe('a grip', () => {
  test('is an end within reach, else the place on the conductor', () => {
    expect(gripOf(along, [9.8, 0.2], 0.5)).toEqual([10, 0]);
    expect(gripOf(along, [0.3, 0], 0.5)).toEqual([0, 0]);
    expect(gripOf(along, [4, 0.2], 0.5)).toEqual([4, 0]);
  });

  test('falls on other metal where it comes near, off the grid or not', () => {
    expect(heldTo([other], [0, 0], [3.1, 5.2], options)).toEqual({
      at: [3.2, 5],
      why: 'end of conductor B',
    });
  });

  test('goes in whole steps from where it was otherwise', () => {
    expect(heldTo([other], [0.2, 0], [1.3, 1.9], options)).toEqual({ at: [1.7, 2], why: undefined });
    expect(heldTo([other], [0.2, 0], [1.3, 1.9], { ...options, step: 0 }).at).toEqual([1.5, 1.9]);
  });

  test('goes where the pointer is when it is free', () => {
    expect(heldTo([other], [0, 0], [3.1, 5.2], { ...options, free: true })).toEqual({
      at: [3.1, 5.2],
      why: undefined,
    });
  });
});

describe('what is taken up', () => {
  const corners: readonly Point[] = [
    [0, 0],
    [10, 0],
    [10, 8],
  ];
  const area: PlanArea = { kind: 'touch', polygon: 0, corners, name: 'touch area' };
  const profile = [
    [10, 0],
    [5, 5],
  ] as const;
  const grips = { items: [along, other], area, profile };

  test('corners before ends of the profile, these before metal, and nothing elsewhere', () => {
    expect(gripUnder(grips, [10, 0.1], 0.5)).toMatchObject({ kind: 'corner', corner: 1 });
    expect(gripUnder({ ...grips, area: undefined }, [10, 0.1], 0.5)).toMatchObject({
      kind: 'profile',
      end: 0,
    });
    expect(gripUnder({ ...grips, area: undefined, profile: undefined }, [10, 0.1], 0.5)).toEqual({
      kind: 'items',
      row: along.row,
      at: [10, 0],
    });
    expect(gripUnder(grips, [7, -3], 0.5)).toBeUndefined();
  });

  test('is nowhere before it has been moved, and does not fall on what moves with it', () => {
    const grip: Grip = { kind: 'items', row: other.row, at: [3.2, 5] };
    const drag: Drag<Grip> = {
      kind: 'move',
      grip,
      begun: [0, 0],
      from: [3.2, 5],
      to: [3.4, 5.1],
      far: true,
      free: false,
    };
    const reach = { tolerance: 0.5, step: 0.5 };
    expect(heldAt({ ...drag, far: false }, [along, other], new Set(), reach)).toBeUndefined();
    expect(heldAt({ kind: 'band', from: [0, 0], to: [1, 1] }, [], new Set(), reach)).toBeUndefined();
    expect(heldAt(drag, [along, other], new Set([other.key]), reach)).toEqual({
      at: [3.2, 5],
      why: undefined,
    });
    expect(heldAt(drag, [along, other], new Set(), reach)?.why).toBe('end of conductor B');
  });

  test('leaves the other corners and the other end where they are', () => {
    expect(draggedCorners(corners, { corner: 1, fresh: false, at: [10, 0] }, [12, 1])).toEqual([
      [0, 0],
      [12, 1],
      [10, 8],
    ]);
    expect(draggedCorners(corners, { corner: 3, fresh: true, at: [5, 4] }, [4, 5])).toEqual([
      ...corners,
      [4, 5],
    ]);
    expect(draggedProfile(profile, 0, [1, 1])).toEqual([[1, 1], profile[1]]);
    expect(draggedProfile(profile, 1, [1, 1])).toEqual([profile[0], [1, 1]]);
  });
});
