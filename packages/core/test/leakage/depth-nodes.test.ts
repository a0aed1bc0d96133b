import { describe, expect, it } from 'vitest';
import { collapsed, depthNodes, nodeReader, nodeWeights } from '../../src/leakage/depth-nodes.ts';
import { radialValue } from '../../src/leakage/radial-table.ts';
import { type ImageList, soilImages } from '../../src/soil/image-list.ts';
import { randomNumbers } from '../support/random.ts';
import { soil } from '../support/soils.ts';

/** Σ over images past the primary ones, and Σ of their sizes. */
function direct(list: ImageList, rr: number, z: number, other: number): [number, number] {
  let [sum, size] = [0, 0];
  for (let k = list.primaryCount; k < list.count; k++) {
    const h = z - list.sign[k]! * other - list.offset[k]!;
    const one = list.weight[k]! / Math.sqrt(rr + h * h);
    sum += one;
    size += Math.abs(one);
  }
  return [sum, size];
}

describe('nodes of depth', () => {
  const images = soilImages(soil([200, 1], [50, 3], [800]));
  it.each([
    ['one layer', 1, 1, { z1: 1, z2: 4 }, { z1: 1, z2: 4 }],
    ['a layer and the one above', 0, 1, { z1: 1, z2: 4 }, { z1: 0, z2: 1 }],
    ['the lowest layer, to a depth of forty metres', 2, 2, { z1: 4, z2: 40 }, { z1: 4, z2: 40 }],
  ] as const)('give the images’ sum between them to 1e-8 of its terms: %s', (_, s, f, field, source) => {
    const list = images.list(s, f);
    const nodes = depthNodes(list, field, source, 200)!;
    const random = randomNumbers(5);
    const read = nodeReader();
    for (let round = 0; round < 300; round++) {
      const rr = (200 * random() ** 3) ** 2;
      const z = field.z1 + random() * (field.z2 - field.z1);
      const other = source.z1 + random() * (source.z2 - source.z1);
      const weights = nodeWeights(nodes, { z1: z, z2: z }, { z1: other, z2: other }, () => 1);
      const [sum, size] = direct(list, rr, z, other);
      expect(Math.abs(read(nodes, weights, rr) - sum)).toBeLessThan(1e-8 * size);
      expect(Math.abs(radialValue(collapsed(nodes, weights), rr) - sum)).toBeLessThan(1e-8 * size);
    }
  });

  it('average over extents of depth', () => {
    const list = images.list(0, 1);
    const nodes = depthNodes(list, { z1: 1, z2: 4 }, { z1: 0, z2: 1 }, 50)!;
    const weights = nodeWeights(nodes, { z1: 1, z2: 2 }, { z1: 0.2, z2: 0.6 }, () => 10);
    const steps = 60;
    let mean = 0;
    for (let a = 0; a < steps; a++)
      for (let b = 0; b < steps; b++)
        mean += direct(list, 9, 1 + (a + 0.5) / steps, 0.2 + (0.4 * (b + 0.5)) / steps)[0] / steps ** 2;
    // the midpoint rule errs by 1/(24·60²) of the second derivative
    expect(Math.abs(nodeReader()(nodes, weights, 9) / mean - 1)).toBeLessThan(1e-5);
  });

  it('are none where there are no such images, or one is within the depths', () => {
    const all = { z1: 0, z2: 5 };
    expect(depthNodes(soilImages(soil([100])).list(0, 0), all, all, 50)).toBeUndefined();
    expect(depthNodes(images.list(0, 0), { z1: 0, z2: 8 }, { z1: 0, z2: 8 }, 50)).toBeUndefined();
  });
});
