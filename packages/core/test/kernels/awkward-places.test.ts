// The surface kernel and its plain twin against the images one by one, all in closed form, where formulas are strained.
import { afterEach, describe, expect, it } from 'vitest';
import { potentialAt } from '../../src/field/potential.ts';
import { surfacePotentials } from '../../src/field/surface-potential.ts';
import { joinConductors } from '../../src/geometry/joints.ts';
import { segmentMesh } from '../../src/geometry/segmentation.ts';
import { useKernels } from '../../src/kernels/instance.ts';
import { soilImages } from '../../src/soil/image-list.ts';
import { interfaceDepths } from '../../src/soil/layer-kernel.ts';
import { type Bar, conductorTable, gridBars, rodBar } from '../support/electrodes.ts';
import { randomNumbers } from '../support/random.ts';
import { soil } from '../support/soils.ts';

const awkward: readonly (readonly [name: string, bars: readonly Bar[], places: readonly (readonly [number, number])[]])[] = [
  ['on the axis of a wire, at its ends and beyond', [{ from: [0, 0, 0.5], to: [8, 0, 0.5], radius: 0.005 }],
    [[4, 0], [0, 0], [8, 0], [1e-9, 0], [8.001, 0], [-30, 0], [4, 1e-6]]],
  ['over wires that cross, touch and run side by side', [
    { from: [-4, 0, 0.6], to: [4, 0, 0.6], radius: 0.005 },
    { from: [0, -4, 0.6], to: [0, 4, 0.6], radius: 0.005 },
    { from: [-4, 0.0101, 0.6], to: [4, 0.0101, 0.6], radius: 0.005 },
    { from: [4, 0, 0.6], to: [7, 3, 0.6], radius: 0.005 },
  ], [[0, 0], [0, 0.005], [4, 0], [-4, 0.01], [2, 0.00505], [5.5, 1.5]]],
  ['right over rods, one of which begins at the surface', [rodBar(0, 0, 0, 3, 0.008), rodBar(5, 0, 0.5, 9, 0.008)],
    [[0, 0], [0.008, 0], [5, 0], [5.008, 0], [2.5, 0], [0, 1e-7]]],
  ['over a wire that lies on the surface', [{ from: [0, 0, 0], to: [3, 0, 0], radius: 0.005 }],
    [[1.5, 0], [0, 0], [3, 0.005], [1.5, 0.01], [-0.004, 0]]],
  ['over a very long wire', [{ from: [0, 0, 0.8], to: [4000, 0, 0.8], radius: 0.004 }],
    [[0, 0], [2000, 0], [2000, 900], [-500, 3], [3999.9, 0.1]]],
  ['very far away', gridBars(10, 10, 2, 2, 0.5, 0.005), [[9000, 5], [-4000, -7000], [0, 2e4], [49_000, 0]]],
  ['over metal on an interface and within a hand of one', [
    { from: [0, 0, 2], to: [6, 0, 2], radius: 0.005 },
    { from: [0, 2, 1.9], to: [6, 2, 1.9], radius: 0.005 },
    { from: [0, 4, 2.05], to: [6, 4, 2.05], radius: 0.005 },
    rodBar(3, 7, 0.5, 4, 0.008),
  ], [[3, 0], [3, 2], [0, 4], [3, 7], [6, 1], [-40, 3]]],
]; // biome-ignore format: a table

const grounds = [
  ['uniform ground', soil([100])],
  ['two layers', soil([100, 2], [900])],
  ['four layers', soil([200, 1], [50, 1], [800, 4], [20])],
] as const;

afterEach(() => useKernels(true));

describe.each(grounds)('in %s, to 1e-9 of the highest potential', (_, model) => {
  it.each(awkward)('%s', (_name, bars, places) => {
    const table = conductorTable(bars);
    const mesh = segmentMesh(table, joinConductors(table), interfaceDepths(model), 0);
    const images = soilImages(model);
    const random = randomNumbers(11);
    const leakage = Float64Array.from(mesh.length, (length) => length * (0.5 + random()));
    const potentials = surfacePotentials(mesh, images, [leakage], 60_000);
    const xs = Float64Array.from(places, ([x]) => x);
    const ys = Float64Array.from(places, ([, y]) => y);
    const exact = places.map(([x, y]) => potentialAt(mesh, images, leakage, x, y, 0));
    const scale = Math.max(...exact);
    for (const compiled of [true, false]) {
      useKernels(compiled);
      const found = new Float64Array(places.length);
      potentials.atMany(xs, ys, found);
      exact.forEach((value, p) => {
        expect(Math.abs(found[p]! - value) / scale).toBeLessThan(1e-9);
      });
    }
  });
});
