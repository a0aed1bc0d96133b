import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { SHORTEST_RADII, type SpanEnd, spanCuts, TIP_SEGMENT_RADII } from '../../src/geometry/grading.ts';

const ends: readonly SpanEnd[] = ['joint', 'tip', 'surface'];

describe('cuts of a span', () => {
  it('run from end to end, upward, none shorter than four radii but the tips, whatever the span', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.02, max: 200, noNaN: true }),
        fc.double({ min: 0.002, max: 0.05, noNaN: true }),
        fc.constantFrom(...ends),
        fc.constantFrom(...ends),
        fc.integer({ min: 0, max: 5 }),
        (length, radius, first, last, level) => {
          const cuts = spanCuts(length, radius, first, last, level);
          expect(cuts[0]).toBe(0);
          expect(cuts.at(-1)).toBe(length);
          const pieces = cuts.slice(1).map((cut, k) => cut - cuts[k]!);
          pieces.forEach((piece, k) => {
            const isTip = (k === 0 && first === 'tip') || (k === pieces.length - 1 && last === 'tip');
            if (pieces.length > 1 && !isTip)
              expect(piece).toBeGreaterThanOrEqual(SHORTEST_RADII * radius * (1 - 1e-9));
            // a span too short for a tip and four radii is left whole
            if (pieces.length > 2 && isTip) expect(piece).toBeCloseTo(TIP_SEGMENT_RADII * radius, 9);
            if (isTip)
              expect(piece).toBeGreaterThanOrEqual(
                Math.min(length / 2, TIP_SEGMENT_RADII * radius) * (1 - 1e-9),
              );
          });
        },
      ),
      { seed: 7, numRuns: 2000 },
    );
  });

  it('mirror when the ends change places', () => {
    const there = spanCuts(4, 0.008, 'tip', 'joint', 2);
    const back = spanCuts(4, 0.008, 'joint', 'tip', 2);
    back.forEach((cut, k) => {
      expect(cut).toBeCloseTo(4 - there[there.length - 1 - k]!, 12);
    });
  });

  it('between joints keep every cut of the coarser mesh', () => {
    const coarse = spanCuts(7, 0.005, 'joint', 'joint', 1);
    const fine = spanCuts(7, 0.005, 'joint', 'joint', 2);
    for (const cut of coarse) expect(fine.some((other) => Math.abs(other - cut) < 1e-12)).toBe(true);
    expect(fine.length).toBe(2 * coarse.length - 1);
  });
});
