// Maps by expansions against the sum of the images one by one, in every kind of ground and for awkward plans.
import { afterEach, describe, expect, it } from 'vitest';
import { potentialAt } from '../../src/field/potential.ts';
import { surfacePotentials } from '../../src/field/surface-potential.ts';
import { useKernels } from '../../src/kernels/instance.ts';
import { type Bar, gridBars, rodBar, solveBars } from '../support/electrodes.ts';
import { randomNumbers } from '../support/random.ts';
import { soil } from '../support/soils.ts';

const grid: Bar[] = gridBars(60, 40, 9, 6, 0.5, 0.005);
const rods: Bar[] = [rodBar(0, 0, 0.5, 4, 0.008), rodBar(60, 40, 0, 6, 0.008)];
const sloped: Bar = { from: [60, 0, 0.5], to: [66, -3, 1.4], radius: 0.005 };
const box = { west: -10, south: -8, east: 70, north: 48 };
/** Error that maps must keep, of the rise. */
const KEPT = 1e-5;

/** Largest difference of a map from the images' sum at some of its points and at places between, of the rise. */
async function worstError(
  bars: readonly Bar[],
  model: ReturnType<typeof soil>,
  over: typeof box,
  spacing: number,
) {
  const { mesh, images, unit } = await solveBars(bars, model, 1);
  const map = surfacePotentials(mesh, images, [unit.leakage], 400).map(over, spacing, [1e-6]);
  const [lattice] = map.lattices;
  const potential = map.potential(0);
  const random = randomNumbers(17);
  let worst = 0;
  for (let k = 0; k < 60; k++) {
    const i = Math.floor(random() * lattice!.nx);
    const j = Math.floor(random() * lattice!.ny);
    const [x, y] = [lattice!.x0 + i * spacing, lattice!.y0 + j * spacing];
    const [u, v] = [over.west + random() * (over.east - over.west), over.south + random() * (over.north - over.south)]; // biome-ignore format: a place
    const exact = (a: number, b: number): number => potentialAt(mesh, images, unit.leakage, a, b, 0);
    worst = Math.max(
      worst,
      Math.abs(lattice!.values[j * lattice!.nx + i]! - exact(x, y)),
      Math.abs(potential(u, v) - exact(u, v)),
    );
  }
  return { worst: worst / unit.resistance, stated: lattice!.error / unit.resistance };
}

afterEach(() => useKernels(true));

describe('a map', () => {
  it.each([
    ['uniform ground', soil([100])],
    ['two layers, rods through the interface', soil([100, 1.5], [900])],
    ['the grid in the lower layer', soil([300, 0.3], [40])],
    ['four layers', soil([200, 1], [50, 3], [800, 4], [20])],
    ['metal just above an interface', soil([100, 0.52], [1000])],
  ] as const)('is what the images sum to, and states about what it misses: %s', async (_, model) => {
    const { worst, stated } = await worstError([...grid, ...rods], model, box, 0.5);
    expect(worst).toBeLessThan(KEPT);
    expect(stated).toBeLessThan(KEPT);
    expect(stated).toBeGreaterThan(worst / 10);
  });

  it.each([
    ['of part of the electrode', [...grid, ...rods], { west: 11, south: 7, east: 24, north: 16 }, 0.2],
    ['beside the electrode', grid, { west: 90, south: 60, east: 110, north: 75 }, 0.5],
    ['of rods alone', rods, box, 0.5],
    ['with sloped metal', [...grid, sloped], box, 1],
    [
      'with metal that runs far out of it',
      [...gridBars(20, 20, 4, 4, 0.5, 0.005), { from: [20, 20, 0.8], to: [230, 90, 0.8], radius: 0.005 }],
      { west: -3, south: -3, east: 23, north: 23 },
      0.25,
    ],
    ['coarser than the meshes', grid, { west: -40, south: -40, east: 100, north: 80 }, 8],
  ] as const)('is as good %s', async (_, bars, over, spacing) => {
    const { worst } = await worstError(bars, soil([100, 1.5], [900]), over, spacing);
    expect(worst).toBeLessThan(KEPT);
  });

  it('of several leakages is that of each alone', async () => {
    const { mesh, images, unit } = await solveBars([...grid, ...rods], soil([100, 1.5], [900]), 0);
    const other = unit.leakage.map((current, i) => current * (i % 3));
    const both = surfacePotentials(mesh, images, [unit.leakage, other], 200).map(box, 1, [1, 1]);
    const alone = surfacePotentials(mesh, images, [other], 200).map(box, 1, [1]);
    const worst = alone.lattices[0]!.values.reduce(
      (most, value, k) => Math.max(most, Math.abs(value - both.lattices[1]!.values[k]!)),
      0,
    );
    expect(worst / unit.resistance).toBeLessThan(KEPT);
    // the first alone, of potentials of two
    const first = surfacePotentials(mesh, images, [unit.leakage, other], 200).map(box, 1, [1]);
    expect(first.lattices).toHaveLength(1);
    const change = first.lattices[0]!.values.reduce(
      (most, value, k) => Math.max(most, Math.abs(value - both.lattices[0]!.values[k]!)),
      0,
    );
    expect(change / unit.resistance).toBeLessThan(KEPT);
    expect(Math.abs(first.potential(0)(12.3, 4.5) - both.potential(0)(12.3, 4.5))).toBeLessThan(KEPT);
    expect(first.potential(0)(-60, 4)).toBe(both.potential(0)(-60, 4));
    expect(both.potential(1)(12.3, 4.5)).toBeCloseTo(alone.potential(0)(12.3, 4.5), 5);
  });

  it('is the same by plain code, to 1e-12 of the rise, and the same bits when made again', async () => {
    const { mesh, images, unit } = await solveBars([...grid, ...rods], soil([200, 1], [50, 3], [800]), 1);
    const potentials = surfacePotentials(mesh, images, [unit.leakage], 200);
    const compiled = potentials.map(box, 0.5, [1]).lattices[0]!.values;
    expect(potentials.map(box, 0.5, [1]).lattices[0]!.values).toEqual(compiled);
    useKernels(false);
    const plain = potentials.map(box, 0.5, [1]).lattices[0]!.values;
    const worst = plain.reduce((most, value, k) => Math.max(most, Math.abs(value - compiled[k]!)), 0);
    expect(worst / unit.resistance).toBeLessThan(1e-12);
  });

  it('is refused, like any place, beyond the reach that was prepared', async () => {
    const { mesh, images, unit } = await solveBars(grid, soil([100, 1.5], [900]), 0);
    const potentials = surfacePotentials(mesh, images, [unit.leakage], 100);
    const far = /a place lies up to \d+\.\d m from metal; surface potentials were prepared for 100\.0 m/;
    expect(() => potentials.map({ ...box, east: 130 }, 1, [1])).toThrow(far);
    expect(() => potentials.at(130, 0, new Float64Array(1))).toThrow(far);
    const places = new Float64Array(2);
    expect(() => potentials.atMany(Float64Array.of(10, 130), places, new Float64Array(2))).toThrow(far);
  });
});
