// Areas in plan: growing, asking what is inside, nearest boundary.
import { describe, expect, test } from 'vitest';
import {
  areaSquareMetres,
  corridors,
  grownOutlines,
  insideArea,
  nearestOnBoundary,
} from '../../src/geometry/area.ts';
import { defaultAreas } from '../../src/geometry/default-areas.ts';
import { type Polygon, signedArea } from '../../src/geometry/polygon.ts';
import { conductorTable, lattice, type Row, rod, wire } from './conductor-rows.ts';

const square: Polygon = [
  [0, 0],
  [10, 0],
  [10, 10],
  [0, 10],
];
const hole: Polygon = [
  [4, 4],
  [4, 6],
  [6, 6],
  [6, 4],
];

/** Chords of an arc of 1 mm deviation enclose at most 2/3 of it less along the arc. */
function expectRounded(polygons: readonly Polygon[], exact: number, arcLength: number): void {
  const found = areaSquareMetres(polygons);
  expect(found).toBeLessThanOrEqual(exact + 1e-3);
  expect(found).toBeGreaterThanOrEqual(exact - 1e-3 * arcLength);
}

describe('growing', () => {
  test('a square by 3 m: sides and quarter circles', () => {
    const grown = grownOutlines([square], 3);
    expect(grown).toHaveLength(1);
    expectRounded(grown, 100 + 4 * 30 + 9 * Math.PI, 6 * Math.PI);
    expect(insideArea(grown, 5, -2.9995)).toBe(true);
    expect(insideArea(grown, 5, -3.0005)).toBe(false);
    const corner = 3 * Math.SQRT1_2;
    expect(insideArea(grown, -corner + 0.002, -corner + 0.002)).toBe(true);
    expect(insideArea(grown, -corner - 0.002, -corner - 0.002)).toBe(false);
  });

  test('squares 5 m apart by 3 m become one area', () => {
    const other = square.map(([x, y]): readonly [number, number] => [x + 15, y]);
    expect(grownOutlines([square, other], 3)).toHaveLength(1);
    expect(grownOutlines([square, other], 2)).toHaveLength(2);
  });

  test('outer boundaries run counter-clockwise, holes that stay run clockwise', () => {
    const grown = grownOutlines([square, hole], 0.5);
    expect(grown.map((polygon) => Math.sign(signedArea(polygon)))).toEqual([1, -1]);
    expectRounded(grown, 100 + 20 + Math.PI / 4 - 1, 4);
    expect(insideArea(grown, 5, 5)).toBe(false);
    expect(insideArea(grown, 4.4, 5)).toBe(true);
  });

  test('keeps its shape at map coordinates', () => {
    const far = square.map(([x, y]): readonly [number, number] => [x + 512_000, y + 5_120_000]);
    const there = grownOutlines([far], 3);
    const here = grownOutlines([square], 3);
    expect(there[0]!.map(([x, y]) => [x - 512_000, y - 5_120_000].map((v) => Math.round(v * 1e4)))).toEqual(
      here[0]!.map((corner) => corner.map((v) => Math.round(v * 1e4))),
    );
  });

  test('nothing grows to nothing', () => {
    expect(grownOutlines([], 3)).toEqual([]);
    expect(corridors([], 3)).toEqual([]);
  });
});

describe('corridors', () => {
  test('a place gives a disc', () => {
    const disc = corridors([[5, 5, 5, 5]], 1);
    expect(disc).toHaveLength(1);
    expectRounded(disc, Math.PI, 2 * Math.PI);
  });

  test('a line gives a strip with round ends', () => {
    expectRounded(corridors([[0, 0, 10, 0]], 1), 20 + Math.PI, 2 * Math.PI);
  });

  test('a cross counts its middle once', () => {
    const cross = corridors([[0, 0, 10, 0], [5, -5, 5, 5], [5, 0, 5, 0]], 1); // biome-ignore format: three lines
    expect(cross).toHaveLength(1);
    expectRounded(cross, 40 - 4 + 2 * Math.PI, 4 * Math.PI);
  });

  test('a closed ring leaves its middle out', () => {
    const ring = corridors([[0, 0, 10, 0], [10, 0, 10, 10], [10, 10, 0, 10], [0, 10, 0, 0]], 1); // biome-ignore format: four lines
    expect(ring).toHaveLength(2);
    expect(insideArea(ring, 5, 5)).toBe(false);
    expectRounded(ring, 100 + 40 + Math.PI - 64, 2 * Math.PI);
  });
});

describe('inside', () => {
  test('even–odd, with the boundary', () => {
    expect(insideArea([square, hole], 2, 2)).toBe(true);
    expect(insideArea([square, hole], 5, 5)).toBe(false);
    expect(insideArea([square, hole], 4, 5)).toBe(true);
    expect(insideArea([square, hole], 11, 5)).toBe(false);
    expect(insideArea([square, hole], 10, 10)).toBe(true);
    expect(insideArea([], 0, 0)).toBe(false);
  });

  test('within 1 nm of the boundary counts as on it, at a side as at a corner', () => {
    expect(insideArea([square], 10 + 0.9e-9, 5)).toBe(true);
    expect(insideArea([square], 10 + 1.1e-9, 5)).toBe(false);
    expect(insideArea([square], 5, -0.9e-9)).toBe(true);
    expect(insideArea([square], 5, -1.1e-9)).toBe(false);
  });

  test('a ray through corners counts them once', () => {
    const diamond: Polygon = [
      [5, 0],
      [10, 5],
      [5, 10],
      [0, 5],
    ];
    expect(insideArea([diamond], -1, 5)).toBe(false);
    expect(insideArea([diamond], 5, 5)).toBe(true);
    expect(insideArea([diamond], 1, 0)).toBe(false);
  });
});

describe('nearest on the boundary', () => {
  test('foot on the nearest side, with the tangent along it', () => {
    expect(nearestOnBoundary([square], 9, 4)).toEqual([10, 4, 0, 1]);
    expect(nearestOnBoundary([square], 3, -7)).toEqual([3, 0, 1, 0]);
    expect(nearestOnBoundary([square, hole], 5, 6.5)).toEqual([5, 6, 1, 0]);
  });

  test('a corner is nearest from beyond it', () => {
    expect(nearestOnBoundary([square], 13, 14).slice(0, 2)).toEqual([10, 10]);
  });

  test('no boundary is an error', () => {
    expect(() => nearestOnBoundary([], 0, 0)).toThrow('an area without boundary');
  });
});

describe('square metres', () => {
  test('holes are taken off, either way round, and crossing polygons count even–odd', () => {
    expect(areaSquareMetres([square, hole])).toBeCloseTo(96, 9);
    expect(areaSquareMetres([square, hole.toReversed()])).toBeCloseTo(96, 9);
    const shifted = square.map(([x, y]): readonly [number, number] => [x + 5, y]);
    expect(areaSquareMetres([square, shifted])).toBeCloseTo(100, 9);
  });
});

describe('default areas', () => {
  const areas = (...rows: Row[]): ReturnType<typeof defaultAreas> =>
    defaultAreas(
      conductorTable(rows),
      rows.map((_, i) => i),
    );

  test('of meshes: inside their boundary, and 3 m more for steps; tails and far rods add nothing', () => {
    const { touch, step } = areas(...lattice(2, 2, 5), wire(10, 5, 30, 5), rod(30, 5));
    expect(touch).toEqual([square]);
    expectRounded(step, 100 + 120 + 9 * Math.PI, 6 * Math.PI);
  });

  test('without meshes: within 1 m of the conductors, and 4 m for steps', () => {
    const { touch, step } = areas(wire(0, 0, 10, 0), rod(30, 0));
    expect(touch).toHaveLength(2);
    expectRounded(touch, 20 + 2 * Math.PI, 4 * Math.PI);
    expectRounded(step, 80 + 2 * 16 * Math.PI, 16 * Math.PI);
  });

  test('an insulated conductor has no area', () => {
    const lead = { ...wire(0, 0, 30, 0), insulated: true };
    expectRounded(areas(rod(0, 0), lead).touch, Math.PI, 2 * Math.PI);
  });
});
