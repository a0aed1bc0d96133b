import { describe, expect, it } from 'vitest';
import { potentialAt } from '../../src/field/potential.ts';
import { onePotential, surfacePotentials } from '../../src/field/surface-potential.ts';
import { type Bar, gridBars, rodBar, solveBars } from '../support/electrodes.ts';
import { randomNumbers } from '../support/random.ts';
import { soil } from '../support/soils.ts';

const yard: Bar[] = [
  ...gridBars(60, 40, 9, 6, 0.5, 0.005),
  rodBar(0, 0, 0.5, 4, 0.008),
  rodBar(60, 40, 0, 6, 0.008),
  { from: [60, 0, 0.5], to: [66, -3, 1.4], radius: 0.005 },
];

describe('surface potential', () => {
  it.each([
    ['uniform ground', soil([100])],
    ['two layers, rods through the interface', soil([100, 1.5], [900])],
    ['the grid in the lower layer', soil([300, 0.3], [40])],
    ['four layers', soil([200, 1], [50, 3], [800, 4], [20])],
  ] as const)('is what the images sum to one by one, to 1e-5 of the rise: %s', async (_, model) => {
    const { mesh, images, unit } = await solveBars(yard, model, 1);
    const zero = new Float64Array(mesh.count);
    const surfaces = surfacePotentials(mesh, images, [unit.leakage, zero], 200);
    const surface = onePotential(surfaces, 0);
    const random = randomNumbers(31);
    for (let k = 0; k < 60; k++) {
      const [x, y] = [-30 + 120 * random(), -30 + 100 * random()];
      const exact = potentialAt(mesh, images, unit.leakage, x, y, 0);
      expect(Math.abs(surface(x, y) - exact) / unit.resistance).toBeLessThan(1e-5);
      expect(onePotential(surfaces, 1)(x, y)).toBe(0);
    }
    // over a node, over a rod that begins at the surface, over a conductor
    for (const [x, y] of [
      [0, 0],
      [60, 40],
      [30, 20],
    ] as const) {
      // biome-ignore format: places
      const exact = potentialAt(mesh, images, unit.leakage, x, y, 0);
      expect(Math.abs(surface(x, y) - exact) / unit.resistance).toBeLessThan(1e-5);
    }
  });

  it('falls off like that of a point current far away: ρI/2πr', async () => {
    const { mesh, images, unit } = await solveBars(yard, soil([100]), 1);
    const surface = onePotential(surfacePotentials(mesh, images, [unit.leakage], 5000), 0);
    const r = 4000;
    expect(Math.abs((surface(30 + r, 20) * 2 * Math.PI * r) / 100 - 1)).toBeLessThan(1e-3);
  });

  it('has no current through the surface: potential just below it is the surface’s', async () => {
    const { mesh, images, unit } = await solveBars(yard, soil([100, 1.5], [900]), 1);
    const slope =
      (potentialAt(mesh, images, unit.leakage, 13, 7, 1e-3) -
        potentialAt(mesh, images, unit.leakage, 13, 7, 0)) /
      1e-3;
    const deeper =
      (potentialAt(mesh, images, unit.leakage, 13, 7, 0.2) -
        potentialAt(mesh, images, unit.leakage, 13, 7, 0)) /
      0.2;
    expect(Math.abs(slope)).toBeLessThan(0.02 * Math.abs(deeper));
  });

  it('is continuous through an interface below the grid', async () => {
    const { mesh, images, unit } = await solveBars(yard, soil([100, 1.5], [900]), 1);
    const above = potentialAt(mesh, images, unit.leakage, 13, 7, 1.5 - 1e-6);
    const below = potentialAt(mesh, images, unit.leakage, 13, 7, 1.5 + 1e-6);
    expect(Math.abs(above / below - 1)).toBeLessThan(1e-5);
  });
});
