import { describe, expect, it } from 'vitest';
import {
  meanInverseDistance,
  meanInverseDistanceToPoint,
  selfInverseDistance,
  type Wire,
} from '../../src/leakage/wire-pair.ts';
import { gaussLegendre } from '../../src/numerics/gauss-legendre.ts';
import { randomNumbers } from '../support/random.ts';

const wire = (x1: number, y1: number, z1: number, x2: number, y2: number, z2: number): Wire => ({
  x1,
  y1,
  z1,
  x2,
  y2,
  z2,
});

/** The same mean by fine composite integration over the first wire. */
function integrated(p: Wire, q: Wire, radius: number): number {
  const { points, weights } = gaussLegendre(8);
  const pieces = 3000;
  let sum = 0;
  for (let piece = 0; piece < pieces; piece++)
    for (let k = 0; k < points.length; k++) {
      const t = (piece + points[k]!) / pieces;
      const [x, y, z] = [p.x1 + t * (p.x2 - p.x1), p.y1 + t * (p.y2 - p.y1), p.z1 + t * (p.z2 - p.z1)];
      sum += (weights[k]! * meanInverseDistanceToPoint(q, x, y, z, radius)) / pieces;
    }
  return sum;
}

describe('mean inverse distance of two wires', () => {
  const a = 0.005;
  const awkward: readonly (readonly [string, Wire, Wire])[] = [
    ['at a right-angled corner', wire(0, 0, 1, 1, 0, 1), wire(1, 0, 1, 1, 1, 1)],
    ['end to end', wire(0, 0, 1, 1, 0, 1), wire(1, 0, 1, 2, 0, 1)],
    ['end to end, drawn the other way', wire(0, 0, 1, 1, 0, 1), wire(2, 0, 1, 1, 0, 1)],
    ['crossing', wire(0, 0, 1, 1, 0, 1), wire(0.5, -0.5, 1, 0.5, 0.5, 1)],
    ['parallel at one radius', wire(0, 0, 1, 1, 0, 1), wire(0, a, 1, 1, a, 1)],
    ['at a sharp angle', wire(0, 0, 0, 1, 0, 0), wire(0, 0, 0, 1, 1e-3, 0)],
    ['bent by a surveyor’s rounding', wire(0, 0, 0, 1, 0, 0), wire(1, 0, 0, 2, 1e-5, 0)],
    ['bent by less than is seen as an angle', wire(0, 0, 0, 1, 0, 0), wire(1, 0, 0, 2, 1e-8, 0)],
    ['askew', wire(0, 0, 0, 1, 0, 0), wire(1, 0, 0, 0.2, 1, 0.3)],
    ['long beside short', wire(0, 0, 0, 40, 0, 0), wire(12, 0.3, 0.2, 12, 0.32, 0.2)],
  ];

  it.each(awkward)('equals numerical integration %s', (_, p, q) => {
    expect(Math.abs(meanInverseDistance(p, q, a) / integrated(p, q, a) - 1)).toBeLessThan(1e-10);
  });

  it.each([1e-3, 1e-5, 1e-6, 1e-7, 1e-8, 1e-9, 1e-12])(
    'equals numerical integration to 1e-8 where axes a fifth of a metre apart part by %d of their length',
    (slope) => {
      for (const z of [0, 0.1]) {
        const [p, q] = [wire(0, 0, 0, 5, 0, 0), wire(1, 0.2, z, 6, 0.2 + 5 * slope, z)];
        const exact = integrated(p, q, a);
        expect(Math.abs(meanInverseDistance(p, q, a) / exact - 1)).toBeLessThan(1e-8);
        expect(Math.abs(meanInverseDistance(q, p, a) / exact - 1)).toBeLessThan(1e-8);
      }
    },
  );

  it('equals numerical integration for random wires, and does not depend on which comes first', () => {
    const random = randomNumbers(4);
    const any = (): Wire => wire(random(), random(), random(), random(), random(), random());
    for (let round = 0; round < 20; round++) {
      const [p, q] = [any(), any()];
      const closed = meanInverseDistance(p, q, a);
      expect(Math.abs(closed / integrated(p, q, a) - 1)).toBeLessThan(1e-10);
      expect(Math.abs(closed / meanInverseDistance(q, p, a) - 1)).toBeLessThan(1e-13);
    }
  });

  it('has a wire’s own mean as the limit of two parallel wires that coincide', () => {
    const p = wire(0, 0, 1, 2.5, 0, 1);
    expect(Math.abs(meanInverseDistance(p, p, a) / selfInverseDistance(2.5, a) - 1)).toBeLessThan(1e-12);
  });
});
