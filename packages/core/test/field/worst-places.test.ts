import { describe, expect, it } from 'vitest';
import { adaptiveLattices } from '../../src/field/lattice.ts';
import { lineProfile } from '../../src/field/line-profile.ts';
import { climb } from '../../src/field/local-search.ts';
import { areaRegion, regionMask } from '../../src/field/region.ts';
import { stepLattice, worstStep } from '../../src/field/step.ts';
import { touchLattice, worstTouch } from '../../src/field/touch.ts';
import type { Polygon } from '../../src/geometry/area.ts';

const square: Polygon[] = [[[0, 0], [20, 0], [20, 20], [0, 20]]]; // biome-ignore format: four corners
const region = areaRegion(square);
const box = { west: -2, south: -2, east: 22, north: 22 };
const latticeOf = (f: (x: number, y: number) => number) =>
  adaptiveLattices((x, y, into) => { into[0] = f(x, y); }, [1e-4], box, 0.5)[0]!; // biome-ignore format: one function

describe('the worst touch voltage', () => {
  it('is found at a hollow of the surface potential between lattice points', () => {
    const surface = (x: number, y: number): number =>
      0.7 - 0.3 * Math.exp(-((x - 7.13) ** 2 + (y - 11.61) ** 2) / 2);
    const lattice = latticeOf(surface);
    const touch = touchLattice(lattice, () => 1);
    const worst = worstTouch(touch, region, regionMask(lattice, region), surface, () => 1, [])!;
    expect(Math.hypot(worst.x - 7.13, worst.y - 11.61)).toBeLessThan(0.02);
    expect(worst.value).toBeCloseTo(0.6, 4);
  });

  it('is found on the edge of the area when the voltage grows outward, and never outside', () => {
    const surface = (x: number, y: number): number => 1 - 0.02 * x - 0.001 * (y - 13.37) ** 2;
    const away = (x: number, y: number): number => surface(x, y) + 0.002 * (y - 13.37) ** 2;
    const lattice = latticeOf(away);
    const worst = worstTouch(
      touchLattice(lattice, () => 1),
      region,
      regionMask(lattice, region),
      away,
      () => 1,
      [],
    )!;
    expect(worst.x).toBeCloseTo(20, 6);
    expect(worst.y).toBeCloseTo(13.37, 1);
  });

  it('counts a voltage of either sign', () => {
    const surface = (x: number, y: number): number => 1 + 0.5 * Math.exp(-((x - 5) ** 2 + (y - 5) ** 2));
    const lattice = latticeOf(surface);
    const worst = worstTouch(
      touchLattice(lattice, () => 1),
      region,
      regionMask(lattice, region),
      surface,
      () => 1,
      [],
    )!;
    expect(worst.value).toBeCloseTo(0.5, 3);
  });
});

describe('the worst step voltage', () => {
  it('is that of a plane in the direction it falls, whatever the direction', () => {
    for (const angle of [0, 0.3, 1.1, 2.5]) {
      const plane = (x: number, y: number): number => 5 - 0.4 * (x * Math.cos(angle) + y * Math.sin(angle));
      const lattice = latticeOf(plane);
      const step = stepLattice(lattice);
      const worst = worstStep(step, region, regionMask(lattice, region), plane, [])!;
      expect(worst.value).toBeCloseTo(0.4, 3);
      expect(Math.hypot(worst.from[0] - worst.to[0], worst.from[1] - worst.to[1])).toBeCloseTo(1, 12);
      expect(plane(...worst.from)).toBeGreaterThan(plane(...worst.to));
    }
  });

  it('is found where the potential falls steepest', () => {
    const surface = (x: number): number => 1 / (1 + Math.exp(3 * (x - 9.4)));
    const lattice = latticeOf(surface);
    const worst = worstStep(stepLattice(lattice), region, regionMask(lattice, region), surface, [])!;
    expect(worst.x).toBeCloseTo(9.4, 1);
    expect(worst.value).toBeCloseTo(surface(8.9) - surface(9.9), 3);
  });
});

describe('the worst step voltage', () => {
  it('is followed along a narrow ridge askew to the axes', () => {
    // a ridge of potential along y = 0.577 x, falling slowly along it: the worst pace crosses it near its head
    const ridge = (x: number, y: number): number => {
      const along = (x - 10) * 0.866 + (y - 10) * 0.5;
      const across = -(x - 10) * 0.5 + (y - 10) * 0.866;
      return (1 + 0.004 * along) * Math.exp(-((across / 0.8) ** 2));
    };
    const lattice = latticeOf(ridge);
    const worst = worstStep(stepLattice(lattice), region, regionMask(lattice, region), ridge, [])!;
    let probed = 0;
    for (let x = 0; x <= 20; x += 0.25)
      for (let y = 0; y <= 20; y += 0.25)
        for (let d = 0; d < 36; d++) {
          const [ex, ey] = [0.5 * Math.cos((Math.PI * d) / 36), 0.5 * Math.sin((Math.PI * d) / 36)];
          probed = Math.max(probed, Math.abs(ridge(x + ex, y + ey) - ridge(x - ex, y - ey)));
        }
    expect(worst.value).toBeGreaterThan(0.999 * probed);
  });

  it('is found beside metal that the lattice steps over, and in areas between its points', () => {
    const spike = (x: number, y: number): number => Math.exp(-((x - 3.26) ** 2 + (y - 8.24) ** 2) / 0.002);
    const lattice = latticeOf(() => 0);
    expect(
      worstStep(stepLattice(lattice), region, regionMask(lattice, region), spike, [[3.26, 8.24]])!.value,
    ).toBeGreaterThan(0.99);
    const small = areaRegion([[[5.1, 5.1], [5.3, 5.1], [5.3, 5.3], [5.1, 5.3]]]); // biome-ignore format: a square
    const slope = (x: number, y: number): number => 0.2 * x - 0.1 * y;
    const flat = latticeOf(slope);
    expect(worstStep(stepLattice(flat), small, regionMask(flat, small), slope, [])!.value).toBeCloseTo(
      Math.hypot(0.2, 0.1),
      4,
    );
    expect(
      worstTouch(
        touchLattice(flat, () => 1),
        small,
        regionMask(flat, small),
        slope,
        () => 1,
        [],
      )!.value,
    ).toBeCloseTo(1 - 0.2 * 5.1 + 0.1 * 5.3, 6);
  });
});

describe('climbing', () => {
  it('reaches the top of a smooth hill and stays inside its region', () => {
    const hill = (at: readonly number[]): number =>
      at[0]! < 0 ? Number.NEGATIVE_INFINITY : -((at[0]! + 1) ** 2) - (at[1]! - 2) ** 2;
    const { at, value } = climb(hill, [4, 5], [1, 1], () => [], 1 / 1024);
    expect(at[0]).toBeCloseTo(0, 2);
    expect(at[1]).toBeCloseTo(2, 2);
    expect(value).toBeCloseTo(-1, 2);
  });
});

describe('a profile', () => {
  it('runs evenly from one end to the other, with metal minus surface as touch', () => {
    const profile = lineProfile((x, y) => x + y, (x) => 10 * x, [1, 2], [4, 6], 6); // biome-ignore format: one call
    expect(Array.from(profile.distance)).toEqual([0, 1, 2, 3, 4, 5]);
    expect(profile.potential[5]).toBeCloseTo(10, 12);
    expect(profile.touch[5]).toBeCloseTo(40 - 10, 12);
  });
});
