import { describe, expect, it } from 'vitest';
import {
  radialFarMean,
  radialMean,
  radialTable,
  radialValue,
  scaledTable,
} from '../../src/leakage/radial-table.ts';
import { gaussLegendre } from '../../src/numerics/gauss-legendre.ts';
import { randomNumbers } from '../support/random.ts';

describe('radial table', () => {
  const images = (rr: number): number =>
    1 / Math.sqrt(rr + 0.25) - 0.7 / Math.sqrt(rr + 3) + 0.1 / Math.sqrt(rr + 1e4);
  const table = radialTable(images, 0.5, 300);

  it('gives a sum of images to 1e-8 from no distance to its reach', () => {
    const random = randomNumbers(8);
    for (let k = 0; k < 2000; k++) {
      const r = 300 * random() ** 3;
      expect(Math.abs(radialValue(table, r * r) / images(r * r) - 1)).toBeLessThan(1e-8);
    }
    expect(Math.abs(radialValue(table, 0) / images(0) - 1)).toBeLessThan(1e-8);
    expect(Math.abs(radialValue(table, 9e4) / images(9e4) - 1)).toBeLessThan(1e-8);
  });

  it('is the same table for the same function in another unit of length', () => {
    const tenfold = radialTable((rr) => images(rr / 100), 5, 3000);
    expect(tenfold.bins.length).toBe(table.bins.length);
    expect(Math.abs(radialValue(tenfold, 100 * 7.3) / radialValue(table, 7.3) - 1)).toBeLessThan(1e-13);
  });

  it('can be multiplied', () => {
    expect(radialValue(scaledTable(table, 3), 40) / radialValue(table, 40)).toBeCloseTo(3, 14);
  });

  it('knows its error: below 1e-9 of images that keep the smoothness away, large where one comes nearer', () => {
    for (const smoothness of [0.01, 0.3, 4]) {
      const one = (rr: number): number => 1 / Math.sqrt(rr + smoothness * smoothness);
      expect(radialTable(one, smoothness, 1000).error).toBeLessThan(1e-9);
      expect(radialTable(one, 10 * smoothness, 1000).error).toBeGreaterThan(1e-6);
    }
    expect(table.error).toBeLessThan(1e-9);
    // images that cancel: against their sizes
    const difference = (rr: number): number => 1 / Math.sqrt(rr + 1) - 1.2 / Math.sqrt(rr + 4);
    const sizes = (rr: number): number => 1 / Math.sqrt(rr + 1) + 1.2 / Math.sqrt(rr + 4);
    expect(radialTable(difference, 1, 100, 0, sizes).error).toBeLessThan(1e-9);
  });

  it('may be singular below the least distance it is asked for', () => {
    const far = radialTable((rr) => 1 / Math.sqrt(rr), 0.4, 300, 1.28);
    expect(far.error).toBeLessThan(2e-9);
    expect(radialValue(far, 0.5)).toBeNaN();
    for (const r of [1.14, 1.5, 9, 300]) expect(Math.abs(radialValue(far, r * r) * r - 1)).toBeLessThan(3e-9);
  });

  it('holds a bin past its reach, and refuses lengths that are none', () => {
    // the last one ends just before a bin's end
    for (const reach of [1, 7.3, 300, 1000, 0.5 * Math.sqrt(71 - 1e-12)]) {
      const to = radialTable(images, 0.5, reach);
      const past = reach * reach * (1 + 1e-13);
      expect(Math.abs(radialValue(to, past) / images(past) - 1)).toBeLessThan(1e-8);
    }
    expect(() => radialTable(images, 0, 300)).toThrow(RangeError);
    expect(() => radialTable(images, Number.NaN, 300)).toThrow(RangeError);
    expect(() => radialTable(images, 0.5, Number.POSITIVE_INFINITY)).toThrow(RangeError);
  });

  it('gives the mean of 1/r over two wires with an error that falls with the sixth power of length over distance', () => {
    const inverse = radialTable((rr) => 1 / Math.sqrt(rr), 0.05, 300, 1);
    const { points, weights } = gaussLegendre(8);
    const errors = [10, 20].map((distance) => {
      const [c, h, k] = [[distance, 0.3 * distance], [0.4, 0.2], [-0.1, 0.45]] as const; // biome-ignore format: one row
      let exact = 0;
      points.forEach((t, p) => {
        points.forEach((s, q) => {
          const x = c[0]! + (2 * t - 1) * h[0]! - (2 * s - 1) * k[0]!;
          const y = c[1]! + (2 * t - 1) * h[1]! - (2 * s - 1) * k[1]!;
          exact += (weights[p]! * weights[q]!) / Math.hypot(x, y);
        });
      });
      const dot = (a: readonly number[], b: readonly number[]): number => a[0]! * b[0]! + a[1]! * b[1]!;
      const [h3, k3] = [dot(h, h) / 3, dot(k, k) / 3];
      const rr = dot(c, c) + h3 + k3;
      return {
        fourth: Math.abs(radialMean(inverse, rr, dot(c, h), dot(c, k), dot(h, k), h3, k3) / exact - 1),
        second: Math.abs(radialFarMean(inverse, rr, dot(c, h), dot(c, k)) / exact - 1),
      };
    });
    expect(errors[0]!.fourth).toBeLessThan(3e-7);
    expect(errors[0]!.second / errors[1]!.second).toBeGreaterThan(12);
    expect(errors[0]!.fourth / errors[1]!.fourth).toBeGreaterThan(30);
  });
});
