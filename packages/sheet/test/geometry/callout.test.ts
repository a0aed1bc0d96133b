// Places of notes: always inside, clear of obstacles where there is room.
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { about, type Box, contains, overlap } from '../../src/geometry/box.ts';
import { type CalloutRequest, placeCallout } from '../../src/geometry/callout.ts';
import { occupancyOf } from '../../src/geometry/occupancy.ts';

const BOUNDS: Box = { left: 50, top: 10, right: 750, bottom: 600 };

function request(x: number, y: number, more: Partial<CalloutRequest> = {}): CalloutRequest {
  return { x, y, width: 190, height: 80, bounds: BOUNDS, avoid: [], cost: () => 0, lines: () => 0, ...more };
}

describe('a note', () => {
  it('never leaves the drawing, wherever its mark is', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 800, noNaN: true }),
        fc.double({ min: 0, max: 620, noNaN: true }),
        (x, y) => {
          expect(contains(BOUNDS, placeCallout(request(x, y)).box)).toBe(true);
        },
      ),
    );
  });

  it('never leaves even a drawing that is hardly larger than itself', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 200 }), fc.integer({ min: 0, max: 90 }), (x, y) => {
        const bounds: Box = { left: 0, top: 0, right: 200, bottom: 90 };
        expect(contains(bounds, placeCallout(request(x, y, { bounds })).box)).toBe(true);
      }),
    );
  });

  it('covers no obstacle while there is room beside it', () => {
    fc.assert(
      fc.property(fc.integer({ min: 100, max: 700 }), fc.integer({ min: 60, max: 550 }), (x, y) => {
        const obstacle = about(x + 60, y - 40, 90, 60);
        const { box } = placeCallout(request(x, y, { avoid: [obstacle] }));
        expect(overlap(box, obstacle)).toBe(0);
      }),
    );
  });

  it('does not cover its own mark', () => {
    fc.assert(
      fc.property(fc.integer({ min: 60, max: 740 }), fc.integer({ min: 20, max: 590 }), (x, y) => {
        expect(overlap(placeCallout(request(x, y)).box, about(x, y, 12, 12))).toBe(0);
      }),
    );
  });

  it('prefers empty ground and ground without lines', () => {
    const left = placeCallout(request(400, 300, { cost: (x) => (x > 400 ? 1 : 0) }));
    expect(left.side).toBe('left');
    const lines = occupancyOf(800, 620, [
      [
        [420, 0],
        [420, 620],
      ],
      [
        [450, 0],
        [450, 620],
      ],
      [
        [480, 0],
        [480, 620],
      ],
    ]);
    expect(placeCallout(request(400, 300, { lines })).side).toBe('left');
  });

  it('meets its leader line at the edge that faces the mark', () => {
    const { box, side, leader } = placeCallout(request(100, 300));
    expect(side).toBe('right');
    expect(leader[0]).toBeCloseTo(box.left, 9);
    expect(leader[1]).toBeCloseTo((box.top + box.bottom) / 2, 9);
  });
});
