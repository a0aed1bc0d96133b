// Readings between the points of a map: exact for planes, none outside.
import type { CaseMap } from '@ohmstead/study';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { profileOn, readingAt } from '../../../src/plan/reading.ts';

/** Invented: a lattice on which each quantity is a plane of its own. */
const planes = {
  potential: (x: number, y: number): number => 1000 - 3 * x + 2 * y,
  touch: (x: number, y: number): number => 40 + 5 * x - y,
  step: (x: number, y: number): number => 7 + 0.5 * x + 0.25 * y,
};

function mapOf(): CaseMap {
  const lattice = { x0: -4, y0: 10, dx: 2, dy: 3, nx: 6, ny: 5 };
  const values = (plane: (x: number, y: number) => number): Float64Array =>
    Float64Array.from({ length: lattice.nx * lattice.ny }, (_, k) =>
      plane(lattice.x0 + (k % lattice.nx) * lattice.dx, lattice.y0 + Math.floor(k / lattice.nx) * lattice.dy),
    );
  return {
    ...lattice,
    potential: values(planes.potential),
    touch: values(planes.touch),
    step: values(planes.step),
    error: 0,
  };
}

const map = mapOf();

describe('readings', () => {
  test('are exact for planes', () => {
    const x = fc.double({ min: -4, max: 6, noNaN: true });
    const y = fc.double({ min: 10, max: 22, noNaN: true });
    fc.assert(
      fc.property(x, y, (east, north) => {
        const reading = readingAt(map, east, north);
        expect(reading?.potential).toBeCloseTo(planes.potential(east, north), 9);
        expect(reading?.touch).toBeCloseTo(planes.touch(east, north), 9);
        expect(reading?.step).toBeCloseTo(planes.step(east, north), 9);
      }),
    );
  });

  test('reach to the last point of the map and no further', () => {
    expect(readingAt(map, 6, 22)?.potential).toBe(planes.potential(6, 22));
    expect(readingAt(map, -4, 10)?.potential).toBe(planes.potential(-4, 10));
    for (const [east, north] of [
      [6.001, 22],
      [-4.001, 10],
      [0, 22.001],
      [0, 9.999],
      [Number.NaN, 12],
    ] as const)
      expect(readingAt(map, east, north)).toBeUndefined();
  });

  test('along a line stand as close as the points of the map, from end to end', () => {
    const { distance, potential, touch } = profileOn(map, [-4, 10], [4, 16])!;
    expect([distance[0], distance.at(-1)]).toEqual([0, 10]);
    for (let k = 1; k < distance.length; k++) expect(distance[k]! - distance[k - 1]!).toBeLessThanOrEqual(2);
    distance.forEach((d, k) => {
      const [x, y] = [-4 + 0.8 * d, 10 + 0.6 * d];
      expect(potential[k]).toBeCloseTo(planes.potential(x, y), 9);
      expect(touch[k]).toBeCloseTo(planes.touch(x, y), 9);
    });
  });

  test('along a line that leaves the map are of the part on it', () => {
    const { from, to, distance, potential } = profileOn(map, [0, 4], [0, 34])!;
    expect([from, to]).toEqual([
      [0, 10],
      [0, 22],
    ]);
    expect([distance[0], distance.at(-1)]).toEqual([0, 12]);
    expect(potential[0]).toBeCloseTo(planes.potential(0, 10), 9);
    expect(profileOn(map, [0, 40], [9, 60])).toBeUndefined();
    expect(profileOn(map, [0, 12], [0, 12])).toBeUndefined();
  });
});
