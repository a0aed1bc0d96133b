// Outlines of areas: simple ones pass in any turn and start, others are told.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { polygonFault } from '../../src/input/polygon-faults.ts';
import type { Point, Polygon } from '../../src/study.ts';

const SEED = 20_240_606;

const ell: Polygon = [
  [0, 0],
  [60, 0],
  [60, 24],
  [36, 24],
  [36, 45],
  [0, 45],
];

function startedAt(corners: Polygon, start: number): Polygon {
  return [...corners.slice(start), ...corners.slice(0, start)];
}

describe('polygonFault', () => {
  test('an L passes from every corner and both ways round', () => {
    for (let start = 0; start < ell.length; start++) {
      expect(polygonFault(startedAt(ell, start))).toBeUndefined();
      expect(polygonFault(startedAt([...ell].reverse(), start))).toBeUndefined();
    }
  });

  test('stars with one centre pass; with two corners swapped they cross themselves', () => {
    const radii = fc.array(fc.integer({ min: 1, max: 50 }), { minLength: 5, maxLength: 12 });
    fc.assert(
      fc.property(radii, (lengths) => {
        const star = lengths.map((length, i): Point => {
          const angle = (2 * Math.PI * i) / lengths.length;
          return [length * Math.cos(angle), length * Math.sin(angle)];
        });
        expect(polygonFault(star)).toBeUndefined();
        const regular = star.map(([x, y], i): Point => [x / lengths[i], y / lengths[i]]);
        const swapped = [regular[1], regular[0], ...regular.slice(2)];
        expect(polygonFault(swapped)).toMatch(/cross or touch/);
      }),
      { seed: SEED, numRuns: 300 },
    );
  });

  test.each<[string, Polygon, string]>([
    [
      'bow tie',
      [
        [0, 0],
        [10, 10],
        [10, 0],
        [0, 10],
      ],
      'the edge after corner 1 and the edge after corner 3 cross or touch; expected an outline that does not meet itself',
    ],
    [
      'a corner on another edge',
      [
        [0, 0],
        [10, 0],
        [10, 10],
        [5, 0],
        [0, 10],
      ],
      'the edge after corner 1 and the edge after corner 3 cross or touch; expected an outline that does not meet itself',
    ],
    [
      'closed by hand',
      [
        [0, 0],
        [1, 0],
        [1, 1],
        [0, 0],
      ],
      'the last corner (0, 0) repeats the first; leave it out, the outline closes by itself',
    ],
    [
      'a corner twice',
      [
        [0, 0],
        [1, 0],
        [1, 0],
        [0, 1],
      ],
      'corners 2 and 3 are the same, (1, 0)',
    ],
    [
      'a line',
      [
        [0, 0],
        [1, 1],
        [3, 3],
      ],
      'the outline has no area; all corners lie on one line',
    ],
    [
      'a spike',
      [
        [0, 0],
        [10, 0],
        [4, 0],
        [4, 5],
      ],
      'the outline turns back on itself at corner 2, (10, 0)',
    ],
  ])('%s is told', (_, corners, message) => {
    expect(polygonFault(corners)).toBe(message);
  });
});
