import { describe, expect, it } from 'vitest';
import { joinConductors } from '../../src/geometry/joints.ts';
import { segmentMesh } from '../../src/geometry/segmentation.ts';
import { leakageBlocks, leakageMatrix } from '../../src/leakage/leakage-matrix.ts';
import { soilImages } from '../../src/soil/image-list.ts';
import { type Bar, conductorTable, gridBars, rodBar } from '../support/electrodes.ts';
import { integratedEntry } from '../support/entry-reference.ts';
import { looseMesh } from '../support/loose-mesh.ts';
import { randomNumbers } from '../support/random.ts';
import { soil } from '../support/soils.ts';

const yard: Bar[] = [
  ...gridBars(30, 20, 3, 2, 0.5, 0.005),
  rodBar(0, 0, 0.5, 4, 0.008),
  rodBar(30, 20, 0.5, 4, 0.008),
  { from: [30, 0, 0.5], to: [36, -3, 1.4], radius: 0.005 },
];
/** Enough of everything that each kind of pair has its tables. */
const station: Bar[] = [
  ...gridBars(60, 50, 8, 6, 0.5, 0.005),
  ...gridBars(20, 30, 4, 3, 0.9, 0.007),
  ...Array.from({ length: 20 }, (_, k) => rodBar(7.5 * (k % 9), 8 * Math.floor(k / 9), 0.5, 6, 0.008)),
  ...Array.from({ length: 8 }, (_, k) => rodBar(-3, 4 * k, 0, 1, 0.03)),
];
const cases = [
  ['uniform ground', soil([100]), []],
  ['two layers, rods through the interface', soil([100, 1.5], [900]), [1.5]],
  ['thin layers', soil([2000, 0.2], [500, 0.2], [100]), [0.2, 0.4]],
  ['four layers', soil([200, 1], [50, 3], [800, 4], [20]), [1, 4, 8]],
] as const;

function meshOf(bars: readonly Bar[], interfaces: readonly number[], level: number) {
  const table = conductorTable(bars);
  return segmentMesh(table, joinConductors(table), interfaces, level);
}

describe('leakage matrix', () => {
  it.each(cases)(
    'holds in entries what the images integrate to one by one, to 1e-6: %s',
    (_, model, interfaces) => {
      for (const bars of [yard, station]) {
        const mesh = meshOf(bars, interfaces, 1);
        const images = soilImages(model);
        const { entries, segments, size } = leakageMatrix(mesh, images);
        // no entry is read from where a table has no number
        expect(entries.every((value) => value > 0)).toBe(true);
        const random = randomNumbers(17);
        let worst = 0;
        for (let round = 0; round < 1500; round++) {
          const i = Math.floor(random() * size);
          // every second one close by, in the mesh's order
          const j =
            round % 2 === 0 ? Math.floor(random() * (i + 1)) : Math.max(0, i - Math.floor(8 * random()));
          const exact = integratedEntry(mesh, images, segments[i]!, segments[j]!);
          worst = Math.max(worst, Math.abs(entries[(i * (i + 1)) / 2 + j]! / exact - 1));
        }
        expect(worst).toBeLessThan(1e-6);
      }
    },
  );

  it('gives entries in blocks to the same bit as in the whole, whatever the block, and the same the other way round', () => {
    const mesh = meshOf(station, [1.5], 0);
    const images = soilImages(soil([100, 1.5], [900]));
    const { entries, size } = leakageMatrix(mesh, images);
    const fill = leakageBlocks(mesh, images);
    const random = randomNumbers(3);
    for (const [rows, columns] of [
      [1, 100],
      [100, 1],
      [7, 48],
      [48, 7],
      [1, 1],
    ] as const) {
      // biome-ignore format: one row
      const [r, c] = [rows, columns].map((count) => Int32Array.from({ length: count }, () => Math.floor(random() * size)));
      const [block, mirror] = [new Float64Array(rows * columns), new Float64Array(rows * columns)];
      fill(r!, c!, block);
      fill(c!, r!, mirror);
      for (let a = 0; a < rows; a++)
        for (let b = 0; b < columns; b++) {
          const [high, low] = [Math.max(r![a]!, c![b]!), Math.min(r![a]!, c![b]!)];
          expect(block[a * columns + b]).toBe(entries[(high * (high + 1)) / 2 + low]);
          expect(mirror[b * rows + a]).toBe(block[a * columns + b]);
        }
    }
  });

  it('keeps two matrices apart whose blocks are asked for in turns', () => {
    const [wide, deep] = [meshOf(station, [1.5], 0), meshOf(yard, [1.5], 0)];
    const images = soilImages(soil([100, 1.5], [900]));
    const [fillWide, fillDeep] = [leakageBlocks(wide, images), leakageBlocks(deep, images)];
    const [a, b] = [new Float64Array(4), new Float64Array(4)];
    const places = Int32Array.of(0, 3);
    fillWide(places, places, a);
    fillDeep(places, places, b);
    leakageMatrix(deep, images);
    const again = new Float64Array(4);
    fillWide(places, places, again);
    expect(again).toEqual(a);
    expect(b).not.toEqual(a);
  });

  it('holds for a thick shaft by itself, whose plan has no extent', () => {
    const shaft = Array.from({ length: 150 }, (_, k) => rodBar(0, 0, 0.6 + 0.2 * k, 0.8 + 0.2 * k, 0.4));
    const mesh = looseMesh(shaft, [0.3, 0.6]);
    const images = soilImages(soil([2000, 0.3], [50, 0.3], [400]));
    const { entries } = leakageMatrix(mesh, images);
    for (const [i, j] of [[0, 0], [1, 0], [9, 4], [80, 3], [149, 0]] as const) // biome-ignore format: one row
      expect(
        Math.abs(entries[(i * (i + 1)) / 2 + j]! / integratedEntry(mesh, images, i, j) - 1),
      ).toBeLessThan(1e-6);
  });

  it('leaves out insulated conductors', () => {
    const table = { ...conductorTable(yard), insulated: Uint8Array.from(yard, (_, i) => (i === 9 ? 1 : 0)) };
    const mesh = segmentMesh(table, joinConductors(table), [], 1);
    const { size } = leakageMatrix(mesh, soilImages(soil([100])));
    expect(size).toBe(mesh.count - mesh.conductor.filter((c) => c === 9).length);
  });

  it('refuses a mesh with a place that is not a number', () => {
    const mesh = meshOf(yard, [], 0);
    const broken = { ...mesh, x1: Float64Array.from(mesh.x1, (x, i) => (i === 4 ? Number.NaN : x)) };
    expect(() => leakageMatrix(broken, soilImages(soil([100])))).toThrow(RangeError);
  });
});
