import { describe, expect, it } from 'vitest';
import { joinConductors } from '../../src/geometry/joints.ts';
import { segmentMesh } from '../../src/geometry/segmentation.ts';
import { compressedLeakageMatrix } from '../../src/leakage/compressed-matrix.ts';
import { leakageBytes, leakageOperator, leakageStorage } from '../../src/leakage/leakage-operator.ts';
import { soilImages } from '../../src/soil/image-list.ts';
import { type Bar, conductorTable, gridBars } from '../support/electrodes.ts';
import { soil } from '../support/soils.ts';

function meshOf(bars: readonly Bar[]) {
  const table = conductorTable(bars);
  return segmentMesh(table, joinConductors(table), [], 0);
}

const images = soilImages(soil([100]));

describe('the storage of the leakage matrix', () => {
  it('is whole for small electrodes, and for larger ones in many pieces', () => {
    expect(leakageStorage(2000, 1)).toBe('whole');
    expect(leakageStorage(2001, 1)).toBe('compressed');
    expect(leakageStorage(4000, 31)).toBe('compressed');
    expect(leakageStorage(4000, 32)).toBe('whole');
    expect(leakageStorage(4001, 500)).toBe('compressed');
  });

  it('is what the matrix made has', async () => {
    const small = await leakageOperator(meshOf(gridBars(20, 20, 4, 4, 0.5, 0.005)), images);
    expect(small.entries?.length).toBe((small.size * (small.size + 1)) / 2);
    const large = await leakageOperator(meshOf(gridBars(120, 120, 24, 24, 0.5, 0.005)), images);
    expect(large.size).toBeGreaterThan(2000);
    expect(large.entries).toBeUndefined();
  });

  it('is foreseen in bytes: twice a whole matrix, for its factor, and what a compressed one takes while it is made', () => {
    const small = meshOf(gridBars(20, 20, 4, 4, 0.5, 0.005));
    expect(leakageBytes(small)).toBe(2 * 8 * ((small.count * (small.count + 1)) / 2));
    const large = meshOf(gridBars(150, 150, 30, 30, 0.5, 0.005));
    const { stored } = compressedLeakageMatrix(large, images);
    expect(leakageBytes(large) / (8 * stored)).toBeGreaterThan(1.2);
    expect(leakageBytes(large) / (8 * stored)).toBeLessThan(2);
  });
});
