import { describe, expect, it } from 'vitest';
import { soilImages } from '../../src/soil/image-list.ts';
import { layerAt } from '../../src/soil/layer-kernel.ts';
import { pointPotential } from '../../src/soil/point-potential.ts';
import type { SoilModel } from '../../src/soil/soil-model.ts';
import { potentialByHankel } from '../support/hankel-oracle.ts';
import { randomNumbers } from '../support/random.ts';
import { soil } from '../support/soils.ts';

/**
 * Two-layer potential by the exact image series, summed to the last digit. Source: Tagg, Earth Resistances (1964), as
 * the image method for source and field in either layer; K = (ρ2 − ρ1)/(ρ2 + ρ1), interface at h.
 */
function twoLayerSeries(r1: number, r2: number, h: number, d: number, z: number, r: number): number {
  const k = (r2 - r1) / (r2 + r1);
  const inverse = (zeta: number): number => 1 / Math.hypot(r, z - zeta);
  let sum = 0;
  for (let n = 0; n < 60_000; n++) {
    const weight = k ** n;
    if (Math.abs(weight) < 1e-18) break;
    const far = 2 * n * h;
    if (d <= h && z <= h)
      sum += n === 0 ? inverse(d) + inverse(-d) : weight * (inverse(d + far) + inverse(d - far) + inverse(-d + far) + inverse(-d - far)); // biome-ignore format: four images
    else if (d <= h) sum += weight * (1 + k) * (inverse(d - far) + inverse(-d - far));
    else if (z <= h) sum += weight * (1 - k) * (inverse(d + far) + inverse(-d - far));
    else
      sum += (n === 0 ? inverse(d) - k * inverse(2 * h - d) : 0) + (1 - k * k) * weight * inverse(-d - far);
  }
  return ((d <= h ? r1 : r2) / (4 * Math.PI)) * sum;
}

describe('image lists', () => {
  it('give ρ/4π(1/r + 1/r′) in uniform ground', () => {
    const images = soilImages(soil([100]));
    const expected = (100 / (4 * Math.PI)) * (1 / Math.hypot(3, 0.5) + 1 / Math.hypot(3, 1.5));
    expect(Math.abs(pointPotential(images, 0.5, 1, 3) / expected - 1)).toBeLessThan(1e-15);
  });

  it('match the exact two-layer series in all four combinations, K from −0.99 to 0.99, to 1e-6', () => {
    for (const k of [-0.99, -0.9, -0.5, 0.3, 0.9, 0.99]) {
      const lower = (100 * (1 + k)) / (1 - k);
      const images = soilImages(soil([100, 2], [lower]));
      for (const [d, z] of [[0.5, 0], [0.5, 1.9], [0.5, 3], [3, 0.5], [2.1, 2.2], [5, 9]] as const) // biome-ignore format: pairs of depths
        for (const r of [0.1, 1, 7, 40, 300]) {
          const exact = twoLayerSeries(100, lower, 2, d, z, r);
          expect(
            Math.abs(pointPotential(images, d, z, r) / exact - 1),
            `K ${k} d ${d} z ${z} r ${r}`,
          ).toBeLessThan(1e-6);
        }
    }
  });

  it('give the potentials of a four-layer soil (independent computation: spectral integration, to seven digits)', () => {
    const images = soilImages(soil([200, 1], [50, 3], [800, 4], [20]));
    for (const [d, z, r, expected] of [
      [0.5, 0.7, 2, 6.754432],
      [0.5, 2, 2, 5.398773],
      [2, 0.5, 2, 5.398773],
      [2, 3, 5, 3.165954],
      [3, 6, 1, 2.845412],
      [9, 0, 4, 0.24598],
      [6, 7, 10, 0.456373],
    ] as const)
      expect(Math.abs(pointPotential(images, d, z, r) / expected - 1), `d ${d} z ${z} r ${r}`).toBeLessThan(
        1e-5,
      );
  });

  it('match numerical Hankel integration of 200 random soils of 2 to 8 layers, contrast to 10⁴, 0.05 to 500 m, to 1e-6 of the kernel’s scale', () => {
    const random = randomNumbers(20261201);
    let worst = 0;
    for (let round = 0; round < 200; round++) {
      const count = 2 + Math.floor(random() * 7);
      const layers = Array.from({ length: count }, (_, i): readonly [number, number?] => {
        const resistivity = 10 ** (4 * random());
        return i === count - 1 ? [resistivity] : [resistivity, 0.05 * 10 ** (4 * random())];
      });
      worst = Math.max(worst, errorAtRandomPlace(soil(...layers), random, round % 3 === 0));
    }
    console.info(
      `image lists against Hankel integration, 200 soils: worst ${worst.toExponential(1)} of the kernel’s scale`,
    );
    expect(worst).toBeLessThan(1e-6);
  }, 120_000);

  it('are made for ten layers as for two', () => {
    const ten = soil(
      [300, 0.3], [80, 0.5], [500, 0.4], [40, 1], [900, 0.8], [60, 2], [200, 1.5], [1000, 3], [20, 5], [400],
    ); // biome-ignore format: ten layers
    const images = soilImages(ten);
    for (const [d, z, r] of [
      [0.1, 0, 3],
      [0.6, 2.1, 5],
      [7, 0.4, 2],
      [13, 20, 8],
    ] as const) {
      // biome-ignore format: places
      const exact = potentialByHankel(ten, d, z, r, 0.05);
      expect(Math.abs(pointPotential(images, d, z, r) / exact - 1)).toBeLessThan(1e-6);
    }
  });

  it('are the uniform soil when all layers are equal, to 1e-9', () => {
    const layered = soilImages(soil([130, 0.4], [130, 2], [130, 7], [130]));
    const uniform = soilImages(soil([130]));
    for (const [d, z, r] of [[0.2, 0, 1], [0.2, 5, 3], [12, 1, 8], [1, 1.5, 0.3]] as const) // biome-ignore format: places
      expect(Math.abs(pointPotential(layered, d, z, r) / pointPotential(uniform, d, z, r) - 1)).toBeLessThan(
        1e-9,
      );
  });

  it('are reciprocal to 1e-9 between any two layers', () => {
    const images = soilImages(soil([200, 1], [50, 3], [800, 4], [20]));
    for (const [d, z] of [
      [0.3, 2],
      [0.3, 6],
      [0.3, 12],
      [2, 6],
      [2, 12],
      [6, 12],
      [0.3, 0.9],
    ] as const) {
      // biome-ignore format: pairs
      const there = pointPotential(images, d, z, 3);
      expect(Math.abs(pointPotential(images, z, d, 3) / there - 1)).toBeLessThan(1e-9);
    }
  });

  it('scale: lengths × s and resistivity × q give potential × q/s, to 1e-9', () => {
    const base = soilImages(soil([100, 1.5], [700, 2], [30]));
    const scaled = soilImages(soil([300, 15], [2100, 20], [90]));
    for (const [d, z, r] of [[0.5, 0, 2], [2, 0.5, 4], [6, 3, 9]] as const) // biome-ignore format: places
      expect(
        Math.abs(pointPotential(scaled, 10 * d, 10 * z, 10 * r) / pointPotential(base, d, z, r) / 0.3 - 1),
      ).toBeLessThan(1e-9);
  });

  it('report the error that their fit reached', () => {
    const images = soilImages(soil([100, 1], [9000]));
    expect(images.list(0, 0).error).toBeGreaterThan(0);
    expect(images.list(0, 0).error).toBeLessThanOrEqual(2e-8);
    expect(soilImages(soil([100, 1], [9000]), 1e-3).list(0, 0).count).toBeLessThan(images.list(0, 0).count);
  });
});

/** Error at random depths and distance, of the larger of the potential and ρ/4π over the distance to the source, ρ of its layer. */
function errorAtRandomPlace(model: SoilModel, random: () => number, onSurface: boolean): number {
  const images = soilImages(model);
  const thinnest = Math.min(...model.layers.slice(0, -1).map((layer) => layer.thickness));
  const stack = model.layers.slice(0, -1).reduce((sum, layer) => sum + layer.thickness, 0);
  const d = random() * 1.3 * stack;
  const z = onSurface ? 0 : random() * 1.3 * stack;
  const r = stack * 10 ** (2 * random() - 1);
  // in place of a stated decay: one in a hundred of the thinnest layer, or the distance from the source's own level
  const exact = potentialByHankel(model, d, z, r, Math.max(0.01 * thinnest, leastDistance(model, d, z)));
  const scale = Math.max(
    Math.abs(exact),
    model.layers[layerAt(images.depths, d)]!.resistivity / (4 * Math.PI * Math.hypot(r, z - d)),
  );
  return Math.abs(pointPotential(images, d, z, r) - exact) / scale;
}

/** Shortest path from source to field point by way of a boundary of the source's layer, or straight across layers. */
function leastDistance(model: SoilModel, d: number, z: number): number {
  let top = 0;
  for (const layer of model.layers) {
    const bottom = top + layer.thickness;
    if (d <= bottom || bottom === Number.POSITIVE_INFINITY) {
      const within = z <= bottom && z >= top;
      return within ? Math.min(d + z - 2 * top, 2 * bottom - d - z) : Math.abs(z - d);
    }
    top = bottom;
  }
  return 0;
}
