import { afterEach, describe, expect, it } from 'vitest';
import { uprightRests } from '../../src/field/upright-rests.ts';
import { useKernels } from '../../src/kernels/instance.ts';
import type { DepthClass } from '../../src/leakage/depth-classes.ts';
import { radialValue } from '../../src/leakage/radial-table.ts';
import { soilImages } from '../../src/soil/image-list.ts';
import { randomNumbers } from '../support/random.ts';
import { soil } from '../support/soils.ts';

const classOf = (layer: number, z1: number, z2: number): DepthClass => ({
  layer,
  z1,
  z2,
  vertical: true,
  members: 1,
});
const classes = [classOf(0, 0, 0.8), classOf(0, 0.8, 1), classOf(1, 1, 1.05), classOf(2, 4, 7.5)];
const radius = 0.02;
const model = soil([200, 1], [50, 3], [800]);

afterEach(() => useKernels(true));

describe('tables of the farther images of rods', () => {
  it.each(classes)('are the mean of each image along the rod, to 1e-9: %o', (depths) => {
    const images = soilImages(model);
    const list = images.list(depths.layer, 0);
    const table = uprightRests(classes, images, 2000)(depths, radius)!;
    const random = randomNumbers(13);
    for (let p = 0; p < 300; p++) {
      const rr = p === 0 ? 0 : (2000 * 1e-6 ** random()) ** 2;
      let sum = 0;
      let scale = 0;
      for (let k = 0; k < list.count; k++) {
        if (list.offset[k] === 0) continue;
        // ∫ dh/√(r² + h²) between the heights of the image's ends
        const [a, b] = [depths.z1, depths.z2].map((z) => Math.abs(list.sign[k]! * z + list.offset[k]!));
        const w = Math.sqrt(rr + radius * radius);
        const mean = Math.abs(Math.asinh(b! / w) - Math.asinh(a! / w)) / (depths.z2 - depths.z1);
        sum += list.weight[k]! * mean;
        scale += Math.abs(list.weight[k]!) * mean;
      }
      expect(Math.abs(radialValue(table, rr) - sum) / scale).toBeLessThan(1e-9);
    }
    expect(table.error).toBeLessThan(1e-8);
  });

  it('are the same by plain code, to 1e-12 over the length of the shortest class', () => {
    const images = soilImages(model);
    const compiled = classes.map((depths) => uprightRests(classes, images, 2000)(depths, radius)!);
    useKernels(false);
    classes.forEach((depths, c) => {
      const plain = uprightRests(classes, images, 2000)(depths, radius)!;
      const most = plain.bins.reduce((a, b, k) => (k % 8 === 2 ? Math.max(a, Math.abs(b)) : a), 0);
      for (let k = 0; k < plain.bins.length; k += 8)
        expect(Math.abs(plain.bins[k + 2]! - compiled[c]!.bins[k + 2]!) / most).toBeLessThan(1e-12 / 0.05);
    });
  });

  it('are not there in uniform ground', () => {
    expect(uprightRests([classOf(0, 0, 3)], soilImages(soil([100])), 100)(classOf(0, 0, 3), radius)).toBe(
      undefined,
    );
  });
});
