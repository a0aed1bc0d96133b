import { describe, expect, it } from 'vitest';
import { radialTable, radialValue, scaledTable } from '../../src/leakage/radial-table.ts';
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
});
