// The compiled assembly of the leakage matrix against its plain twin: grids, slopes, rods and depths in one electrode.
import { afterEach, describe, expect, it } from 'vitest';
import { useKernels } from '../../src/kernels/instance.ts';
import { leakageMatrix } from '../../src/leakage/leakage-matrix.ts';
import { type Bar, gridBars, rodBar, solveBars } from '../support/electrodes.ts';
import { soil } from '../support/soils.ts';

const yard: Bar[] = [
  ...gridBars(60, 40, 7, 5, 0.5, 0.005),
  ...gridBars(23, 31, 3, 2, 0.8, 0.011),
  rodBar(0, 0, 0.5, 4, 0.008),
  rodBar(60, 40, 0, 6, 0.008),
  { from: [60, 0, 0.5], to: [66, -3, 1.4], radius: 0.005 },
  { from: [900, 700, 0.5], to: [903, 700, 0.5], radius: 0.005 },
];

afterEach(() => useKernels(true));

describe('leakage kernel', () => {
  it.each([
    ['uniform ground', soil([100])],
    ['two layers, depths on both sides of the interface', soil([100, 0.7], [900])],
    ['the grid in the lower layer', soil([300, 0.3], [40])],
    ['four layers', soil([200, 1], [50, 3], [800, 4], [20])],
  ] as const)('agrees with plain code to 1e-12 of every entry: %s', async (_, model) => {
    const { mesh, images } = await solveBars(yard, model, 0);
    const fast = leakageMatrix(mesh, images).entries;
    useKernels(false);
    const plain = leakageMatrix(mesh, images).entries;
    const worst = plain.reduce((most, v, k) => Math.max(most, Math.abs(fast[k]! / v - 1)), 0);
    expect(worst).toBeLessThan(1e-12);
    expect(fast).not.toEqual(plain);
  });
});
