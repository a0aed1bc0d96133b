// Geometry under the figures: plates, thinning, crossings, projections, tables, bars, texts kept apart.
import type { Point, Profile } from '@ohmstead/study';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { keptApart } from '../../src/geometry/apart.ts';
import { barOf, barScale } from '../../src/geometry/bars.ts';
import { coarseGrid, valueAt, worstIn } from '../../src/geometry/coarse.ts';
import { crossingsOf } from '../../src/geometry/crossings.ts';
import { occupancyOf } from '../../src/geometry/occupancy.ts';
import { plateOf } from '../../src/geometry/plate.ts';
import { insideEvenOdd } from '../../src/geometry/polygon.ts';
import { sectionLines } from '../../src/geometry/section-lines.ts';
import { simplifyLine, simplifyRing } from '../../src/geometry/simplify.ts';
import { roundLength, roundStep } from '../../src/geometry/ticks.ts';
import { fixtureOutcome } from '../fixture.ts';
import { fixtureConductors } from '../fixture-metal.ts';

const outcome = fixtureOutcome({ spacing: 2 });

describe('a plate', () => {
  const size = { width: 760, most: 600, least: 150, margin: { left: 56, right: 8, top: 10, bottom: 100 } };

  it('keeps proportions, puts north up, and finds the way back', () => {
    const plate = plateOf({ x: [-8, 68], y: [-8, 53] }, size);
    expect(plate.x(10) - plate.x(0)).toBeCloseTo(plate.y(0) - plate.y(10), 9);
    expect(plate.y(20)).toBeLessThan(plate.y(10));
    expect(plate.east(plate.x(12.5))).toBeCloseTo(12.5, 9);
    expect(plate.north(plate.y(-3))).toBeCloseTo(-3, 9);
    expect(plate.frame.right).toBeCloseTo(752, 9);
  });

  it('leaves room above a narrow strip, and beside a tall one', () => {
    const flat = plateOf({ x: [0, 300], y: [0, 12] }, size);
    expect(flat.frame.top).toBeGreaterThan(100);
    expect(flat.height).toBeCloseTo(10 + 150 + 100, 9);
    const tall = plateOf({ x: [0, 10], y: [0, 300] }, size);
    expect(tall.frame.bottom - tall.frame.top).toBeCloseTo(600, 9);
    expect(tall.frame.right).toBeLessThan(100);
  });
});

describe('thinning', () => {
  it('keeps ends and corners, and drops what lies on the line', () => {
    const corner: readonly Point[] = [
      [0, 0],
      [1, 0],
      [2, 0],
      [2, 1],
      [2, 2],
    ];
    expect(simplifyLine(corner, 0.01)).toEqual([
      [0, 0],
      [2, 0],
      [2, 2],
    ]);
  });

  it('moves no point by more than the tolerance, on rings too', () => {
    const ring = Array.from({ length: 200 }, (_, k): Point => [Math.cos(k / 31.83), Math.sin(k / 31.83)]);
    const thin = simplifyRing(ring, 0.01);
    expect(thin.length).toBeLessThan(60);
    expect(thin.every(([x, y]) => Math.abs(Math.hypot(x, y) - 1) < 1e-12)).toBe(true);
    expect(insideEvenOdd([thin], 0, 0.985)).toBe(true);
  });
});

describe('a profile over metal', () => {
  const profile = (from: Point, to: Point): Profile => ({
    from,
    to,
    distance: new Float64Array(2),
    potential: new Float64Array(2),
    touch: new Float64Array(2),
  });

  it('crosses each conductor once, at its distance from the start', () => {
    const conductors = fixtureConductors().filter((c) => c.role === 'energised' && !c.rod);
    expect(crossingsOf(profile([-8, 40], [68, 40]), conductors)).toEqual([8, 14, 20, 26, 32, 38, 44]);
  });

  it('does not count metal that runs along it', () => {
    const [along] = fixtureConductors();
    expect(crossingsOf(profile([-8, 0], [68, 0]), [along])).toEqual([]);
  });
});

describe('the section', () => {
  it('draws overlapping metal once, level runs merged', () => {
    const lines = sectionLines(fixtureConductors(), 'x');
    const level = lines.filter((l) => !l.floating && l.from[1] === l.to[1]);
    expect(level).toEqual([{ from: [0, 0.6], to: [60, 0.6], floating: false }]);
    const rods = lines.filter((l) => l.from[1] !== l.to[1]);
    expect(rods.map((l) => l.from[0]).sort((a, b) => a - b)).toEqual([0, 12, 18, 30, 36, 60]);
  });
});

describe('a map as a table', () => {
  const { map } = outcome.cases[0];

  it('reads the samples exactly where they stand', () => {
    expect(valueAt(map, map.potential, map.x0 + 3 * map.dx, map.y0 + 5 * map.dy)).toBeCloseTo(
      map.potential[5 * map.nx + 3],
      9,
    );
    expect(valueAt(map, map.potential, -1e9, -1e9)).toBe(map.potential[0]);
  });

  it('has round coordinates, y falling from row to row, at most twelve columns', () => {
    const { xs, ys, values } = coarseGrid(map, map.touch);
    expect(xs).toEqual([0, 10, 20, 30, 40, 50, 60]);
    expect(ys).toEqual([50, 40, 30, 20, 10, 0]);
    expect(values).toHaveLength(ys.length);
    expect(values[1][2]).toBeCloseTo(valueAt(map, map.touch, 20, 40), 9);
  });

  it('finds the worst of an area and none outside', () => {
    const worst = worstIn(map, map.touch, outcome.plan.touchArea[0]);
    expect(worst?.value).toBeCloseTo(outcome.results.cases[0].touch.worst_V, 6);
    expect(
      worstIn(map, map.touch, [
        [900, 900],
        [901, 900],
        [901, 901],
      ]),
    ).toBeUndefined();
  });
});

describe('bars', () => {
  const rows = [
    { worst: 975, uncertainty: 4, limit: 622 },
    { worst: 298, uncertainty: 2, limit: 1992 },
  ];

  it('put the limit at the same place in every row', () => {
    const full = barScale(rows);
    const bars = rows.map((row) => barOf(row, full));
    expect(bars[0].limit).toBe(bars[1].limit);
    expect(bars[0].within).toBe(bars[0].limit);
    expect((bars[0].within + bars[0].beyond) * full).toBeCloseTo(975 / 622, 9);
    expect(bars[1].beyond).toBe(0);
  });

  it('never reach beyond the scale, nor have the limit at its end', () => {
    fc.assert(
      fc.property(
        fc.array(
          fc.record({
            worst: fc.nat(5000),
            uncertainty: fc.nat(50),
            limit: fc.integer({ min: 1, max: 3000 }),
          }),
          { minLength: 1, maxLength: 8 },
        ),
        (list) => {
          const full = barScale(list);
          for (const row of list) {
            const bar = barOf(row, full);
            expect(bar.high).toBeLessThanOrEqual(1 + 1e-12);
            expect(bar.within + bar.beyond).toBeLessThanOrEqual(1 + 1e-12);
            expect(bar.limit).toBeLessThanOrEqual(0.8);
          }
        },
      ),
    );
  });
});

describe('texts kept apart', () => {
  it('keep their order and distance within the range', () => {
    expect(keptApart([100, 102, 40], 20, [0, 300])).toEqual([100, 120, 40]);
    expect(keptApart([295, 296], 20, [0, 300])).toEqual([280, 300]);
  });
});

describe('occupancy', () => {
  it('counts the lines that pass through a box', () => {
    const lines = occupancyOf(200, 200, [
      [
        [0, 50],
        [200, 50],
      ],
      [
        [0, 90],
        [200, 90],
      ],
    ]);
    expect(lines({ left: 20, top: 100, right: 120, bottom: 140 })).toBe(0);
    expect(lines({ left: 20, top: 40, right: 120, bottom: 60 })).toBeGreaterThan(0);
  });
});

describe('round numbers', () => {
  it('are 1, 2 or 5 times a power of ten', () => {
    expect([0.9, 1, 2.2, 7, 12, 80].map(roundLength)).toEqual([0.5, 1, 2, 5, 10, 50]);
    expect([0.9, 1, 2.2, 7, 12, 80].map(roundStep)).toEqual([1, 1, 5, 10, 20, 100]);
  });
});
