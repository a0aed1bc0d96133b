// The compiled surface kernel against its plain twin, on random places near and far, in every kind of ground.
import { afterEach, describe, expect, it } from 'vitest';
import { surfaceKernel } from '../../src/field/surface-kernel.ts';
import { type SurfacePotentials, surfacePotentials } from '../../src/field/surface-potential.ts';
import { useKernels } from '../../src/kernels/instance.ts';
import { type Bar, gridBars, rodBar, solveBars } from '../support/electrodes.ts';
import { randomNumbers } from '../support/random.ts';
import { soil } from '../support/soils.ts';

const yard: Bar[] = [
  ...gridBars(60, 40, 9, 6, 0.5, 0.005),
  rodBar(0, 0, 0.5, 4, 0.008),
  rodBar(60, 40, 0, 6, 0.008),
  { from: [60, 0, 0.5], to: [66, -3, 1.4], radius: 0.005 },
];

/** Places of each comparison. */
const PLACES = 3000;

function one(potentials: SurfacePotentials, xs: Float64Array, ys: Float64Array): Float64Array {
  const values = new Float64Array(xs.length * potentials.count);
  const here = new Float64Array(potentials.count);
  for (let p = 0; p < xs.length; p++) {
    potentials.at(xs[p]!, ys[p]!, here);
    values.set(here, p * potentials.count);
  }
  return values;
}

afterEach(() => useKernels(true));

describe('surface kernel', () => {
  it('is there in Node', () => {
    expect(surfaceKernel()).toBeDefined();
  });

  it.each([
    ['uniform ground', soil([100])],
    ['two layers, rods through the interface', soil([100, 1.5], [900])],
    ['the grid in the lower layer', soil([300, 0.3], [40])],
    ['four layers', soil([200, 1], [50, 3], [800, 4], [20])],
  ] as const)('agrees with plain code to 1e-12 of the rise: %s', async (_, model) => {
    const { mesh, images, unit } = await solveBars(yard, model, 1);
    const other = unit.leakage.map((current, i) => current * (i % 3));
    const third = unit.leakage.map((current, i) => (i % 2 === 0 ? current : 0));
    const random = randomNumbers(7);
    // widely spread distances, conductors' own lines, and the places right over nodes and rods
    const spread = (): number => 20 * 50 ** (2 * random() - 1) * (random() < 0.5 ? -1 : 1);
    const xs = Float64Array.from({ length: PLACES }, (_, p) => (p % 5 === 0 ? 0 : 30 + spread()));
    const ys = Float64Array.from({ length: PLACES }, (_, p) => (p % 7 === 0 ? 40 : 20 + spread()));
    for (const leakages of [[unit.leakage], [unit.leakage, other, third]]) {
      const potentials = surfacePotentials(mesh, images, leakages, 3000);
      const many = new Float64Array(PLACES * leakages.length).fill(Number.NaN);
      potentials.atMany(xs, ys, many);
      const worst = one(potentials, xs, ys).reduce((most, v, k) => Math.max(most, Math.abs(v - many[k]!)), 0);
      expect(worst / unit.resistance).toBeLessThan(1e-12);
      expect(many.every(Number.isFinite)).toBe(true);
    }
  });

  it('is replaced by plain code, bit for bit, when kernels are off', async () => {
    useKernels(false);
    expect(surfaceKernel()).toBeUndefined();
    const { mesh, images, unit } = await solveBars(yard, soil([100, 1.5], [900]), 0);
    const potentials = surfacePotentials(mesh, images, [unit.leakage], 100);
    const xs = Float64Array.of(3, 17, 80);
    const ys = Float64Array.of(-2, 20, 60);
    const many = new Float64Array(3);
    potentials.atMany(xs, ys, many);
    expect(many).toEqual(one(potentials, xs, ys));
  });
});
