import { describe, expect, it } from 'vitest';
import { insideIndex } from '../../src/field/inside-index.ts';
import { areaRegion, partOf, regionMask } from '../../src/field/region.ts';
import { insideArea, type Polygon } from '../../src/geometry/area.ts';
import { randomNumbers } from '../support/random.ts';

const rounded: Polygon = Array.from({ length: 90 }, (_, k) => [
  20 + 15 * Math.cos((2 * Math.PI * k) / 90),
  10 + 9 * Math.sin((2 * Math.PI * k) / 90),
]);
const area: Polygon[] = [
  rounded,
  [[15, 8], [15, 12], [22, 12], [22, 8]], // biome-ignore format: a hole
  [[40, 0], [46, 0], [46, 6], [43, 2], [40, 6]], // biome-ignore format: a notched piece
];

describe('an index of the edges of an area', () => {
  it('answers as the area itself, at random and at every corner, edge and height of one', () => {
    const inside = insideIndex(area);
    const random = randomNumbers(5);
    const corners = area.flat();
    for (let k = 0; k < 20_000; k++) {
      const [x, y] = [50 * random(), 25 * random() - 3];
      expect(inside(x, y)).toBe(insideArea(area, x, y));
    }
    for (const [x, y] of corners)
      for (const [u, v] of [...corners, [0, 0] as const]) {
        const middle = [(x + u) / 2, (y + v) / 2] as const;
        for (const [a, b] of [[x, y], [u, y], middle, [x + 5e-10, y - 5e-10]] as const) // biome-ignore format: places
          expect(inside(a, b)).toBe(insideArea(area, a, b));
      }
  });

  it('holds nothing for no polygon', () => {
    expect(insideIndex([])(0, 0)).toBe(false);
  });
});

describe('the mask of a region', () => {
  it('is the answer of the region at every point, on edges through points too', () => {
    const lattice = { x0: -1, y0: -2, spacing: 0.5, nx: 105, ny: 50 };
    const regions = [areaRegion(area), partOf(area, 'inside', [rounded]), partOf(area, 'outside', [rounded])];
    for (const region of regions) {
      const mask = regionMask(lattice, region);
      const each = Uint8Array.from(mask, (_, place) =>
        region.inside(-1 + 0.5 * (place % 105), -2 + 0.5 * Math.floor(place / 105)) ? 1 : 0,
      );
      expect(mask).toEqual(each);
    }
    expect(regionMask(lattice, areaRegion(area)).reduce((a, b) => a + b, 0)).toBeGreaterThan(100);
  });
});
