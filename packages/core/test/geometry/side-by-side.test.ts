// How far nearly parallel conductors run within contact, in space.
import { describe, expect, test } from 'vitest';
import { type Axis, conductorAxes, type Place } from '../../src/geometry/conductor-axis.ts';
import { nearlyParallel, sideBySide } from '../../src/geometry/side-by-side.ts';
import { conductorTable } from './conductor-rows.ts';

function axis(from: Place, to: Place): Axis {
  return conductorAxes(conductorTable([{ from, to }]))[0]!;
}

function sum([x, y, z]: Place, [dx, dy, dz]: Place, factor: number): Place {
  return [x + factor * dx, y + factor * dy, z + factor * dz];
}

/** A direction with all three coordinates, of unit length, and one square to it. */
const along: Place = [2 / 7, 3 / 7, 6 / 7];
const across: Place = [3 / 7, -6 / 7, 2 / 7];
function at(distance: number, beside: number): Place {
  return sum(sum([1, 1, 1], along, distance), across, beside);
}

describe('two conductors beside each other', () => {
  test('parallel at one distance: the part that both have', () => {
    const stretch = sideBySide(axis(at(0, 0), at(10, 0)), axis(at(14, 0.012), at(4, 0.012)), 0.015)!;
    expect(stretch.length).toBeCloseTo(6, 9);
    expect([stretch.from.s, stretch.from.t, stretch.to.s, stretch.to.t].map((v) => v.toFixed(9))).toEqual([
      '0.400000000',
      '1.000000000',
      '1.000000000',
      '0.400000000',
    ]);
    expect(stretch.nearest).toBeCloseTo(0.012, 9);
    expect(stretch.farthest).toBeCloseTo(0.012, 9);
  });

  test('parallel beyond the contact distance, or one after the other: none', () => {
    expect(sideBySide(axis(at(0, 0), at(10, 0)), axis(at(4, 0.016), at(14, 0.016)), 0.015)).toBeUndefined();
    expect(sideBySide(axis(at(0, 0), at(10, 0)), axis(at(11, 0), at(14, 0)), 0.015)).toBeUndefined();
  });

  test('spreading from 3 mm: until the contact distance is reached', () => {
    // beside = 3 mm + s/100, so 15 mm at s = 1.2 m
    const stretch = sideBySide(axis(at(0, 0.003), at(10, 0.103)), axis(at(-5, 0), at(20, 0)), 0.015)!;
    const slant = Math.hypot(1, 0.01);
    expect(stretch.length).toBeCloseTo(1.2 * slant, 9);
    expect(stretch.from.s).toBe(0);
    expect(stretch.nearest).toBeCloseTo(0.003, 9);
    expect(stretch.farthest).toBeCloseTo(0.015, 9);
  });

  test('crossing flatly: within contact on both sides of the crossing, nearest at it', () => {
    // beside runs from −50 to +50 mm over 10 m: within 15 mm for 3 m
    const stretch = sideBySide(axis(at(0, -0.05), at(10, 0.05)), axis(at(-5, 0), at(20, 0)), 0.015)!;
    expect(stretch.length).toBeCloseTo(3 * Math.hypot(1, 0.01), 9);
    expect(stretch.from.s).toBeCloseTo(0.35, 9);
    expect(stretch.to.s).toBeCloseTo(0.65, 9);
    expect(stretch.nearest).toBeCloseTo(0, 9);
  });

  test('crossing flatly 9 mm apart: the legs of right triangles', () => {
    // square to both directions: the third one
    const square: Place = [6 / 7, 2 / 7, -3 / 7];
    const lifted = (distance: number): Place => sum(at(distance, 0), square, 0.009);
    const stretch = sideBySide(axis(at(0, -0.05), at(10, 0.05)), axis(lifted(-5), lifted(20)), 0.015)!;
    // √(15² − 9²) = 12 mm on either side, at 10 mm a metre
    expect(stretch.length).toBeCloseTo(2.4 * Math.hypot(1, 0.01), 9);
    expect(stretch.nearest).toBeCloseTo(0.009, 9);
    expect(stretch.farthest).toBeCloseTo(0.015, 9);
  });
});

describe('nearly parallel', () => {
  test('is below a sine of 0.1, in any plane and either direction', () => {
    const first = axis(at(0, 0), at(10, 0));
    const turned = (sine: number, length: number): Axis =>
      axis(at(0, 0), at(length * Math.sqrt(1 - sine * sine), length * sine));
    expect(nearlyParallel(first, turned(0.0999, 5))).toBe(true);
    expect(nearlyParallel(first, turned(0.1001, 5))).toBe(false);
    expect(nearlyParallel(first, turned(0.0999, -5))).toBe(true);
    expect(nearlyParallel(first, turned(1, 5))).toBe(false);
  });

  test('is nothing without length', () => {
    expect(nearlyParallel(axis(at(0, 0), at(10, 0)), axis(at(1, 0), at(1, 0)))).toBe(false);
    expect(nearlyParallel(axis(at(1, 0), at(1, 0)), axis(at(0, 0), at(10, 0)))).toBe(false);
  });
});
