import { describe, expect, it } from 'vitest';
import { soilImages } from '../../src/soil/image-list.ts';
import type { SoilModel } from '../../src/soil/soil-model.ts';
import { type FourPinArray, geometricFactor, overPins } from '../../src/survey/arrays.ts';
import { apparentResistivity } from '../../src/survey/forward.ts';
import { surveyFilter } from '../../src/survey/survey-filter.ts';
import { potentialByHankel } from '../support/hankel-oracle.ts';
import { randomNumbers } from '../support/random.ts';
import { soil } from '../support/soils.ts';

const wenner = (spacing: number, pinDepth = 0): FourPinArray => ({ kind: 'wenner', spacing, pinDepth });

/** Both roads: the image list of the grid analysis and the filter of the inversion. */
function bothRoads(
  model: SoilModel,
  arrays: readonly FourPinArray[],
): (readonly [exact: number, fast: number])[] {
  const images = soilImages(model);
  const fast = new Float64Array(arrays.length);
  surveyFilter(arrays).evaluate(model, fast);
  return arrays.map((array, i) => [apparentResistivity(images, array), fast[i]!]);
}

function randomSoil(random: () => number, most: number, decades: number): SoilModel {
  const count = 2 + Math.floor(random() * (most - 1));
  return soil(
    ...Array.from({ length: count }, (_, i): readonly [number, number?] => {
      const resistivity = 10 ** (1 + decades * random());
      return i === count - 1 ? [resistivity] : [resistivity, 0.05 * 10 ** (2.6 * random())];
    }),
  );
}

describe('apparent resistivity', () => {
  it('meets the Wenner tables of six soils (independent computation: image series and Hankel integral agree to nine digits)', () => {
    const spacings = [0.5, 1, 2, 3, 5, 7, 10, 15, 20, 30, 50, 100];
    const tables: readonly (readonly [SoilModel, readonly number[]])[] = [
      [soil([100, 5], [300]), [100.04, 100.311, 102.257, 106.58, 121.034, 138.719, 163.951, 196.456, 219.048, 247.021, 272.752, 291.034]],
      [soil([300, 3], [100]), [299.521, 296.451, 278.315, 248.705, 189.462, 150.791, 122.915, 108.212, 104.074, 101.653, 100.572, 100.141]],
      [soil([100, 2.5], [1000]), [100.543, 103.955, 123.33, 154.601, 225.295, 290.672, 374.214, 483.294, 565.919, 681.462, 808.941, 924.128]],
      [soil([1000, 2], [100]), [991.733, 944.067, 733.904, 504.318, 237.15, 146.639, 112.548, 103.651, 101.87, 100.794, 100.28, 100.069]],
      [soil([100, 2], [500, 6], [50]), [100.8, 105.52, 128.14, 157.35, 204.5, 229.16, 235.19, 205.68, 165.33, 105.51, 62.945, 51.607]],
      [soil([500, 1.5], [50, 4], [1000]), [490.69, 443.6, 290.74, 178.29, 106.75, 112.58, 146.22, 204.6, 257.18, 346.97, 482.55, 681.17]],
    ]; // biome-ignore format: one soil a row
    for (const [model, table] of tables)
      bothRoads(
        model,
        spacings.map((a) => wenner(a)),
      ).forEach(([exact, fast], i) => {
        // biome-ignore format: short
        expect(Math.abs(exact / table[i]! - 1)).toBeLessThan(1e-4);
        expect(Math.abs(fast / table[i]! - 1)).toBeLessThan(1e-4);
      });
  });

  it('meets the Wenner tables of three- and four-layer soils, 0.5 to 64 m (independent computation, to five digits)', () => {
    const spacings = [0.5, 1, 2, 4, 8, 16, 32, 64];
    const tables: readonly (readonly [SoilModel, readonly number[]])[] = [
      [soil([100, 2], [20, 6], [500]), [99.32, 95.42, 78.2, 46.49, 37.14, 61.72, 110.8, 185.87]],
      [soil([50, 2], [500, 4], [50]), [50.5, 53.47, 67.89, 104.85, 145.58, 140.31, 86.81, 56.05]],
      [soil([200, 1], [50, 3], [800, 4], [20]), [191.7, 160.45, 102.51, 84.93, 120.56, 144.57, 101.23, 38.28]],
    ]; // biome-ignore format: one soil a row
    for (const [model, table] of tables)
      bothRoads(
        model,
        spacings.map((a) => wenner(a)),
      ).forEach(([exact, fast], i) => {
        // biome-ignore format: short
        // half of the last printed digit, where that is coarser
        const tolerance = Math.max(1e-4, 0.0051 / table[i]!);
        expect(Math.abs(exact / table[i]! - 1)).toBeLessThan(tolerance);
        expect(Math.abs(fast / table[i]! - 1)).toBeLessThan(tolerance);
      });
  });

  it('meets the values of the two soils of IEEE Std 80-2013, Annex H, spacings in feet (independent computation)', () => {
    const arrays = [1, 3, 5, 10, 15, 20, 30, 50, 70, 90, 110, 130, 150].map((feet) => wenner(0.3048 * feet));
    const falling = [300, 299.6, 298.4, 289.4, 271.6, 248.7, 202.6, 144.2, 120.3, 110.7, 106.5, 104.3, 103.1];
    const rising = [100, 100.1, 100.6, 104.1, 111.3, 121, 143.2, 181.7, 208.7, 227.8, 241.5, 251.8, 259.7];
    for (const [model, table] of [
      [soil([300, 6.096], [100]), falling],
      [soil([100, 6.096], [300]), rising],
    ] as const)
      bothRoads(model, arrays).forEach(([exact], i) => {
        expect(Math.abs(exact - table[i]!)).toBeLessThan(0.0501);
      });
  });

  it('reads 1.2103 ρ1 at a spacing of the upper thickness for K = 0.5, and the like (independent computation)', () => {
    for (const [k, ratio] of [
      [-0.9, 0.71083],
      [-2 / 3, 0.77808],
      [-0.5, 0.82902],
      [-0.2, 0.92792],
      [0.2, 1.07818],
      [0.5, 1.21034],
      [0.8, 1.3694],
      [0.9, 1.43225],
    ] as const) {
      // biome-ignore format: pairs
      const model = soil([1, 3], [(1 + k) / (1 - k)]);
      for (const value of bothRoads(model, [wenner(3)])[0]!)
        expect(Math.abs(value - ratio)).toBeLessThan(6e-6);
    }
  });

  it('with pins at depth is the potential of points there, by numerical Hankel integration', () => {
    const models = [soil([200, 0.4], [50, 3], [800]), soil([100, 2], [900])];
    for (const model of models)
      for (const array of [
        wenner(2, 0.3),
        wenner(3, 1),
        { kind: 'schlumberger', halfCurrent: 5, halfPotential: 0.5, pinDepth: 0.25 } as const,
      ]) {
        // biome-ignore format: arrays
        const b = array.pinDepth;
        const resistance = overPins(array, (r) => potentialByHankel(model, b, b, r, 0.1));
        for (const value of bothRoads(model, [array])[0]!)
          expect(Math.abs(value / (geometricFactor(array) * resistance) - 1)).toBeLessThan(1e-5);
      }
  });

  it('is the resistivity of uniform ground at any pin depth, and of equal layers', () => {
    const arrays = [wenner(2), wenner(2, 0.4), { kind: 'schlumberger', halfCurrent: 9, halfPotential: 1, pinDepth: 0.2 } as const]; // biome-ignore format: arrays
    for (const model of [soil([70]), soil([70, 0.3], [70, 4], [70])])
      for (const [exact, fast] of bothRoads(model, arrays)) {
        expect(Math.abs(exact / 70 - 1)).toBeLessThan(1e-9);
        expect(Math.abs(fast / 70 - 1)).toBeLessThan(1e-6);
      }
  });

  it('is the same when current and potential pins change places', () => {
    const model = soil([100, 1], [900, 2], [20]);
    const [there, back] = bothRoads(model, [
      { kind: 'collinear', currentPins: [0, 12], potentialPins: [3, 5], pinDepth: 0.2 },
      { kind: 'collinear', currentPins: [3, 5], potentialPins: [0, 12], pinDepth: 0.2 },
    ]);
    expect(Math.abs(there![0] / back![0] - 1)).toBeLessThan(1e-12);
  });

  it('scales: lengths × s leave it, resistivities × q multiply it', () => {
    const base = bothRoads(soil([100, 1.5], [700, 2], [30]), [wenner(4, 0.1)])[0]!;
    const scaled = bothRoads(soil([300, 15], [2100, 20], [90]), [wenner(40, 1)])[0]!;
    for (const i of [0, 1] as const) expect(Math.abs(scaled[i] / base[i] / 3 - 1)).toBeLessThan(1e-8);
  });

  it('rises no faster than the spacing over any layers, to contrasts of 10⁴, and reaches that over an insulator', () => {
    const random = randomNumbers(3);
    const spacings = Array.from({ length: 25 }, (_, i) => 0.3 * 1.3 ** i);
    const filters = [
      surveyFilter(spacings.map((a) => wenner(a))),
      surveyFilter(spacings.map((l): FourPinArray => ({ kind: 'schlumberger', halfCurrent: l, halfPotential: l / 50, pinDepth: 0 }))), // biome-ignore format: one row
    ];
    const curve = new Float64Array(spacings.length);
    let steepest = 0;
    for (let round = 0; round < 300; round++) {
      const model = randomSoil(random, 5, 4);
      for (const filter of filters) {
        filter.evaluate(model, curve);
        for (let i = 1; i < curve.length; i++)
          steepest = Math.max(steepest, Math.log(curve[i]! / curve[i - 1]!) / Math.log(1.3));
      }
    }
    expect(steepest).toBeLessThan(1.0005);
    filters[0]!.evaluate(soil([1, 0.5], [1e6]), curve);
    expect(Math.log(curve[20]! / curve[19]!) / Math.log(1.3)).toBeGreaterThan(0.98);
  });
});

describe('the fast forward model', () => {
  it('agrees with the image list over contrasts of 10³, for any range of spacings and pin depth, to 1e-5, and where long arrays have pins beneath a thin layer to 1e-4', () => {
    const random = randomNumbers(11);
    const surveys: FourPinArray[][] = [
      [0.5, 1, 2, 3, 5, 7, 10, 15, 20, 30, 50, 100].map((a) => wenner(a)),
      [2, 4, 6, 8, 10].map((a) => wenner(a, 0.1 * a)),
      [3].map((a) => wenner(a, 0.3)),
      [1, 2, 5, 10, 20, 50, 150].map((l) => ({ kind: 'schlumberger', halfCurrent: l, halfPotential: l / 10, pinDepth: 0.1 })), // biome-ignore format: one row
      [1, 3, 9].map((a) => ({
        kind: 'collinear',
        currentPins: [0, a],
        potentialPins: [2 * a, 3 * a],
        pinDepth: 0,
      })),
    ];
    const worst = surveys.map(() => 0);
    for (let round = 0; round < 40; round++)
      surveys.forEach((arrays, s) => {
        for (const [exact, fast] of bothRoads(randomSoil(random, 5, 3), arrays))
          worst[s] = Math.max(worst[s]!, Math.abs(fast / exact - 1));
      });
    console.info(
      `fast forward model against image lists, 200 soils: worst ${worst.map((w) => w.toExponential(1)).join(', ')}`,
    );
    const [usual, deep, one, beneath, dipoles] = worst;
    expect(Math.max(usual!, deep!, one!, dipoles!)).toBeLessThan(1e-5);
    expect(beneath).toBeLessThan(1e-4);
  });
});
