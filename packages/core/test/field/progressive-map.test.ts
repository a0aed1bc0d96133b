import { describe, expect, it } from 'vitest';
import { latticeValue } from '../../src/field/lattice.ts';
import { potentialAt } from '../../src/field/potential.ts';
import { progressiveMaps } from '../../src/field/progressive-map.ts';
import { surfacePotentials } from '../../src/field/surface-potential.ts';
import { gridBars, solveBars } from '../support/electrodes.ts';
import { randomNumbers } from '../support/random.ts';
import { soil } from '../support/soils.ts';

describe('maps one after another', () => {
  it('state what interpolation between their points misses, which is ever less', async () => {
    const { mesh, images, unit } = await solveBars(
      gridBars(60, 40, 9, 6, 0.5, 0.005),
      soil([100, 1.5], [900]),
      0,
    );
    const potentials = surfacePotentials(mesh, images, [unit.leakage], 200);
    const box = { west: -5, south: -5, east: 65, north: 45 };
    const stated: number[] = [];
    for (const { spacing, between, lattices } of progressiveMaps(potentials, box, [4, 1, 0.25], [1])) {
      const random = randomNumbers(23);
      let worst = 0;
      for (let k = 0; k < 80; k++) {
        const [x, y] = [-5 + 70 * random(), -5 + 50 * random()];
        const exact = potentialAt(mesh, images, unit.leakage, x, y, 0);
        worst = Math.max(worst, Math.abs(latticeValue(lattices[0]!, x, y) - exact));
      }
      expect(lattices[0]!.spacing).toBe(spacing);
      expect(between[0]).toBeGreaterThan(worst / 2);
      expect(between[0]).toBeLessThan(4 * worst);
      stated.push(between[0]! / unit.resistance);
    }
    expect(stated[0]).toBeGreaterThan(10 * stated[1]!);
    expect(stated[1]).toBeGreaterThan(10 * stated[2]!);
  });

  it('are made only when they are asked for', async () => {
    const { mesh, images, unit } = await solveBars(gridBars(60, 40, 3, 2, 0.5, 0.005), soil([100]), 0);
    const potentials = surfacePotentials(mesh, images, [unit.leakage], 200);
    const beyond = { west: 0, south: 0, east: 500, north: 1 };
    const maps = progressiveMaps(potentials, beyond, [1], [1]);
    expect(() => maps.next()).toThrow(RangeError);
  });
});
