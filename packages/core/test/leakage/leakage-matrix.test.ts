import { describe, expect, it } from 'vitest';
import { joinConductors } from '../../src/geometry/joints.ts';
import { segmentMesh } from '../../src/geometry/segmentation.ts';
import { leakageMatrix } from '../../src/leakage/leakage-matrix.ts';
import { imagePairSum } from '../../src/leakage/pair-potential.ts';
import { soilImages } from '../../src/soil/image-list.ts';
import { type Bar, conductorTable, gridBars, rodBar } from '../support/electrodes.ts';
import { soil } from '../support/soils.ts';

const yard: Bar[] = [
  ...gridBars(30, 20, 3, 2, 0.5, 0.005),
  rodBar(0, 0, 0.5, 4, 0.008),
  rodBar(30, 20, 0.5, 4, 0.008),
  { from: [30, 0, 0.5], to: [36, -3, 1.4], radius: 0.005 },
];

describe('leakage matrix', () => {
  it.each([
    ['uniform ground', soil([100]), []],
    ['two layers, rods through the interface', soil([100, 1.5], [900]), [1.5]],
    ['thin layers', soil([2000, 0.2], [500, 0.2], [100]), [0.2, 0.4]],
  ] as const)(
    'holds in every entry what the images sum to one by one, to 2e-5: %s',
    (_, model, interfaces) => {
      const table = conductorTable(yard);
      const mesh = segmentMesh(table, joinConductors(table), interfaces, 1);
      const images = soilImages(model);
      const { entries, size, segments } = leakageMatrix(mesh, images);
      let worst = 0;
      for (let i = 0; i < size; i++)
        for (let j = 0; j <= i; j++) {
          const [a, b] = [segments[i]!, segments[j]!];
          const [field, source] = mesh.layer[a]! >= mesh.layer[b]! ? [a, b] : [b, a];
          const list = images.list(mesh.layer[source]!, mesh.layer[field]!);
          const direct = list.factor * imagePairSum(mesh, field, source, list, 0, list.count);
          worst = Math.max(worst, Math.abs(entries[(i * (i + 1)) / 2 + j]! / direct - 1));
        }
      expect(worst).toBeLessThan(2e-5);
    },
  );

  it('leaves out insulated conductors', () => {
    const table = { ...conductorTable(yard), insulated: Uint8Array.from(yard, (_, i) => (i === 9 ? 1 : 0)) };
    const mesh = segmentMesh(table, joinConductors(table), [], 1);
    const { size } = leakageMatrix(mesh, soilImages(soil([100])));
    expect(size).toBe(mesh.count - mesh.conductor.filter((c) => c === 9).length);
  });
});
