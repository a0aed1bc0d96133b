// Contours in metres: shifted onto the samples, clipped to the lattice, lines without the border.
import type { Point } from '@ohmstead/study';
import { describe, expect, it } from 'vitest';
import { bandsOf, type Lattice, latticeExtent } from '../../src/geometry/contours.ts';
import { insideEvenOdd, signedDoubleArea } from '../../src/geometry/polygon.ts';

const LATTICE: Lattice = { x0: -10, y0: 5, dx: 0.5, dy: 0.25, nx: 81, ny: 121 };

function sampled(lattice: Lattice, f: (x: number, y: number) => number): Float64Array {
  return Float64Array.from({ length: lattice.nx * lattice.ny }, (_, k) =>
    f(lattice.x0 + (k % lattice.nx) * lattice.dx, lattice.y0 + Math.floor(k / lattice.nx) * lattice.dy),
  );
}

function areaOf(rings: readonly (readonly Point[])[]): number {
  return Math.abs(rings.reduce((sum, ring) => sum + signedDoubleArea(ring), 0)) / 2;
}

describe('bands of a lattice', () => {
  it('stand where the samples stand: a straight field has its contour at the exact place', () => {
    const [band] = bandsOf(
      LATTICE,
      sampled(LATTICE, (x) => x),
      [3.3],
    );
    expect(band.lines).toHaveLength(1);
    for (const [x] of band.lines[0].points) expect(x).toBeCloseTo(3.3, 10);
    const ys = band.lines[0].points.map(([, y]) => y);
    expect(Math.min(...ys)).toBeCloseTo(5, 10);
    expect(Math.max(...ys)).toBeCloseTo(35, 10);
    expect(band.lines[0].closed).toBe(false);
  });

  it('fill the side where the value is higher, up to the border of the lattice and not beyond', () => {
    const [band] = bandsOf(
      LATTICE,
      sampled(LATTICE, (x) => x),
      [3.3],
    );
    expect(areaOf(band.rings)).toBeCloseTo((30 - 3.3) * 30, 8);
    expect(insideEvenOdd(band.rings, 4, 20)).toBe(true);
    expect(insideEvenOdd(band.rings, 3, 20)).toBe(false);
    const { x, y } = latticeExtent(LATTICE);
    for (const [px, py] of band.rings.flat()) {
      expect(px >= x[0] && px <= x[1] && py >= y[0] && py <= y[1]).toBe(true);
    }
  });

  it('have y upward as the samples have: the upper half is the upper half', () => {
    const [band] = bandsOf(
      LATTICE,
      sampled(LATTICE, (_, y) => y),
      [30],
    );
    expect(insideEvenOdd(band.rings, 0, 33)).toBe(true);
    expect(insideEvenOdd(band.rings, 0, 27)).toBe(false);
    expect(band.lines[0].points.every(([, y]) => Math.abs(y - 30) < 1e-9)).toBe(true);
  });

  it('close rings that stay inside, with the area of the circle', () => {
    const radius = 6;
    const cone = sampled(LATTICE, (x, y) => -Math.hypot(x - 8, y - 20));
    const [band] = bandsOf(LATTICE, cone, [-radius]);
    expect(band.lines).toHaveLength(1);
    expect(band.lines[0].closed).toBe(true);
    expect(areaOf(band.rings) / (Math.PI * radius ** 2)).toBeCloseTo(1, 2);
  });

  it('leave holes empty under even–odd filling', () => {
    const ring = sampled(LATTICE, (x, y) => -Math.abs(Math.hypot(x - 8, y - 20) - 6));
    const [band] = bandsOf(LATTICE, ring, [-2]);
    expect(insideEvenOdd(band.rings, 8, 20)).toBe(false);
    expect(insideEvenOdd(band.rings, 14, 20)).toBe(true);
  });

  it('have no line where all or nothing reaches the level', () => {
    const [all, none] = bandsOf(
      LATTICE,
      sampled(LATTICE, () => 1),
      [0.5, 2],
    );
    expect(all.lines).toHaveLength(0);
    expect(areaOf(all.rings)).toBeCloseTo(40 * 30, 8);
    expect(none.rings).toHaveLength(0);
  });
});
