import { describe, expect, it } from 'vitest';
import { adaptiveLattices, latticeValue } from '../../src/field/lattice.ts';

const box = { west: 0, south: 0, east: 40, north: 24 };
const bump = (x: number, y: number): number => Math.exp(-((x - 10) ** 2 + (y - 12) ** 2) / 4);
const slope = (x: number, y: number): number => 0.1 * x - 0.2 * y;

describe('an adaptive lattice', () => {
  const both = (x: number, y: number, into: Float64Array): void => {
    into[0] = bump(x, y);
    into[1] = slope(x, y);
  };
  const [bumps, slopes] = adaptiveLattices(both, [1e-3, 1e-3], box, 0.25);

  it('covers the box, computes where the function bends and interpolates elsewhere', () => {
    expect(bumps!.x0).toBeLessThanOrEqual(0);
    expect(bumps!.x0 + (bumps!.nx - 1) * 0.25).toBeGreaterThanOrEqual(40);
    expect(bumps!.evaluated).toBeLessThan(0.5 * bumps!.nx * bumps!.ny);
    expect(bumps!.evaluated).toBeGreaterThan(0.02 * bumps!.nx * bumps!.ny);
  });

  it('errs nowhere by much more than the tolerance it was asked for', () => {
    for (let j = 0; j < bumps!.ny; j++)
      for (let i = 0; i < bumps!.nx; i++) {
        const [x, y] = [bumps!.x0 + i * 0.25, bumps!.y0 + j * 0.25];
        expect(Math.abs(bumps!.values[j * bumps!.nx + i]! - bump(x, y))).toBeLessThan(4e-3);
        expect(Math.abs(slopes!.values[j * bumps!.nx + i]! - slope(x, y))).toBeLessThan(1e-12);
      }
    expect(bumps!.error).toBeLessThanOrEqual(1e-3);
    expect(bumps!.error).toBeGreaterThan(0);
  });

  it('is read between its points by a cubic that keeps straight slopes and its own values', () => {
    expect(latticeValue(slopes!, 17.33, 9.87)).toBeCloseTo(slope(17.33, 9.87), 10);
    expect(latticeValue(bumps!, bumps!.x0 + 40 * 0.25, bumps!.y0 + 50 * 0.25)).toBeCloseTo(
      bumps!.values[50 * bumps!.nx + 40]!,
      12,
    );
    expect(Math.abs(latticeValue(bumps!, 10.1, 12.1) - bump(10.1, 12.1))).toBeLessThan(1e-3);
  });
});
