// Nearest places of straight pieces in space, against what can be said without the formula.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { type Axis, conductorAxes, type Place, placeOn } from '../../src/geometry/conductor-axis.ts';
import { apart, crossingApproach, endApproach, nearestShare } from '../../src/geometry/segment-distance.ts';
import { conductorTable } from './conductor-rows.ts';

const settings = { seed: 20240609, numRuns: 300 };
const coordinate = fc.integer({ min: -20, max: 20 }).map((step) => step / 4);
const place = fc.tuple(coordinate, coordinate, coordinate);
const piece = fc
  .tuple(place, place)
  .filter(([from, to]) => apart(from, to) > 0.5)
  .map(([from, to]) => axis(from, to));

function axis(from: Place, to: Place): Axis {
  return conductorAxes(conductorTable([{ from, to }]))[0]!;
}

/** Least distance of a place to places along a piece, by trying many. */
function triedDistance(a: Axis, p: Place): number {
  return Math.min(...Array.from({ length: 2001 }, (_, k) => apart(placeOn(a, k / 2000), p)));
}

describe('nearest places', () => {
  test('of a piece to a place: none tried along the piece is nearer', () => {
    fc.assert(
      fc.property(piece, place, (a, p) => {
        const found = apart(placeOn(a, nearestShare(a, p)), p);
        const tried = triedDistance(a, p);
        expect(found).toBeLessThanOrEqual(tried + 1e-12);
        expect(found).toBeGreaterThan(tried - a.length / 2000);
      }),
      settings,
    );
  });

  test('of two pieces: each is the nearest on its piece to the other, and none tried is nearer', () => {
    fc.assert(
      fc.property(piece, piece, (a, b) => {
        const { s, t, distance } = crossingApproach(a, b);
        expect(apart(placeOn(a, s), placeOn(b, t))).toBeCloseTo(distance, 10);
        for (let k = 0; k <= 20; k++) {
          const p = placeOn(a, k / 20);
          expect(distance).toBeLessThanOrEqual(apart(p, placeOn(b, nearestShare(b, p))) + 1e-9);
        }
      }),
      settings,
    );
  });

  test('of skew lines: their common perpendicular', () => {
    const found = crossingApproach(axis([-1, -1, 2], [1, 1, 2]), axis([-1, 1, 5], [3, -3, 5]));
    expect(found.s).toBeCloseTo(0.5, 12);
    expect(found.t).toBeCloseTo(0.25, 12);
    expect(found.distance).toBeCloseTo(3, 12);
  });

  test('of the ends of pieces that lie along one line: the two that face each other', () => {
    expect(endApproach(axis([0, 0, 1], [2, 0, 1]), axis([9, 0, 1], [5, 0, 1]))).toEqual({
      s: 1,
      t: 1,
      distance: 3,
    });
  });
});
