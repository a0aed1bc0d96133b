import { describe, expect, it } from 'vitest';
import { randomNumbers } from '../../src/numerics/random.ts';
import { soilImages } from '../../src/soil/image-list.ts';
import type { SoilModel } from '../../src/soil/soil-model.ts';
import type { FourPinArray } from '../../src/survey/arrays.ts';
import { apparentResistivity } from '../../src/survey/forward.ts';
import { type FittedSurvey, type InversionOptions, invertSurvey } from '../../src/survey/inversion.ts';
import type { Reading } from '../../src/survey/readings.ts';
import { soil } from '../support/soils.ts';
import {
  fieldSet,
  kindermann,
  pirson,
  seedherArora1,
  seedherArora2,
  seedherArora3,
  wennerReadings,
} from '../support/surveys.ts';

function fitted(
  readings: readonly Reading[],
  layers: number,
  options: Partial<InversionOptions> = {},
): FittedSurvey {
  const fit = invertSurvey(readings, layers, options);
  if (fit.kind === 'refused') throw new Error(fit.message);
  return fit;
}

/** Resistivities, then thicknesses. */
const numbersOf = (fit: FittedSurvey): number[] => fit.parameters.map((parameter) => parameter.value);

/** Readings that a soil gives exactly. */
function exactReadings(model: SoilModel, arrays: readonly FourPinArray[]): Reading[] {
  const images = soilImages(model);
  return arrays.map((array, i) => ({
    row: i + 2,
    array,
    traverse: '',
    apparentResistivity: apparentResistivity(images, array),
  }));
}

const wide = [0.5, 1, 2, 4, 8, 16, 32, 64];
const wenner = (spacing: number, pinDepth = 0): FourPinArray => ({ kind: 'wenner', spacing, pinDepth });

describe('a fitted survey', () => {
  it.each([
    ['case 1 of Seedher and Arora (1992)', seedherArora1, [1000, 20, 1], [999.67, 19.985, 0.9999], 0.005],
    ['case 2 of Seedher and Arora (1992)', seedherArora2, [100, 1000, 2.5], [100, 998.8, 2.4997], 0.006],
    ['case 3 of Seedher and Arora (1992)', seedherArora3, [100, 300, 5], [100, 299.98, 5.0002], 0.001],
    [
      'the textbook set of Kindermann and Campagnolo',
      kindermann,
      [700, 180, 2.5],
      [699.85, 180.24, 2.499],
      0.06,
    ],
  ] as const)(
    'has the published soil of %s within 1 %%, and the optimum of an independent computation',
    (_, readings, published, optimum, rms) => {
      // biome-ignore format: one row a case
      for (const loss of ['huber', 'squares'] as const) {
      const fit = fitted(readings, 2, { loss });
      expect(fit.outcome).toBe('converged');
      numbersOf(fit).forEach((value, j) => {
        expect(Math.abs(value / published[j]! - 1)).toBeLessThan(0.01);
        expect(Math.abs(value / optimum[j]! - 1)).toBeLessThan(3e-4);
      });
      expect(Math.abs(fit.rmsPercent - rms)).toBeLessThan(0.005);
    }
    },
  );

  it('has the misfit of a field set used in several papers: 3.542 % (independent computation); its optimum in logarithms is 372.43, 145.53, 2.697', () => {
    const plain = fitted(fieldSet, 2, { loss: 'squares' });
    expect(Math.abs(plain.rmsPercent - 3.542)).toBeLessThan(0.02);
    [372.43, 145.53, 2.697].forEach((expected, j) => {
      expect(Math.abs(numbersOf(plain)[j]! / expected - 1)).toBeLessThan(2e-4);
    });
    expect(Math.abs(fitted(fieldSet, 2).rmsPercent - 3.542)).toBeLessThan(0.02);
  });

  it('fits a degenerate three-layer soil as closely as its bound lets it, 0.30 % at 100 000 Ω·m in the middle (independent computation), and says that it stands on the bound', () => {
    const fit = fitted(pirson, 3);
    expect(fit.outcome).toBe('at-bound');
    expect(fit.rmsPercent).toBeLessThan(0.31);
    const held = fit.parameters.find((parameter) => parameter.bound !== undefined)!;
    expect([held.quantity, held.layer, held.bound!.side]).toEqual(['resistivity', 2, 'upper']);
    expect(held.bound!.reason).toMatch(
      /^the readings do not limit it from above, and more than 173000 Ω·m was not tried$/,
    );
    expect(held.standardDeviation).toBe(0);
    // the two-layer best fit of the same readings is 14 % rms (independent computation)
    expect(fitted(pirson, 2, { loss: 'squares' }).rmsPercent).toBeGreaterThan(13.5);
  });

  it('recovers soils of one to four layers from their exact readings, pins at depth and arrays mixed', () => {
    const arrays: FourPinArray[] = [
      ...wide.map((a) => wenner(a, 0.1 * a)),
      ...[3, 12, 50, 90].map((l): FourPinArray => ({ kind: 'schlumberger', halfCurrent: l, halfPotential: l / 8, pinDepth: 0.1 })), // biome-ignore format: one row
      { kind: 'collinear', currentPins: [0, 2], potentialPins: [4, 6], pinDepth: 0 },
    ];
    for (const model of [
      soil([80]),
      soil([80, 3], [900]),
      soil([100, 1.2], [20, 6], [400]),
      soil([300, 1], [40, 4], [900, 20], [60]),
    ]) {
      // biome-ignore format: four soils
      const fit = fitted(exactReadings(model, arrays), model.layers.length);
      expect(fit.outcome).toBe('converged');
      expect(fit.rmsPercent).toBeLessThan(0.01);
      fit.soil.layers.forEach((layer, i) => {
        const { resistivity, thickness } = model.layers[i]!;
        expect(Math.abs(layer.resistivity / resistivity - 1)).toBeLessThan(0.01);
        if (Number.isFinite(thickness)) expect(Math.abs(layer.thickness / thickness - 1)).toBeLessThan(0.01);
      });
    }
  });

  it('is not drawn off by a wrong reading, which it flags; plain least squares is', () => {
    const spacings = [0.5, 0.75, 1, 1.5, 2, 3, 4, 6, 8, 12, 16, 24, 32, 48, 64];
    const readings = exactReadings(
      soil([200, 2], [40]),
      spacings.map((a) => wenner(a)),
    ).map((reading, i) =>
      i === 6 ? { ...reading, apparentResistivity: 1.6 * reading.apparentResistivity } : reading,
    );
    const robust = fitted(readings, 2);
    expect(robust.fits.filter((fit) => fit.outlier).map((fit) => fit.row)).toEqual([8]);
    expect(robust.fits[6]!.weight).toBeLessThan(0.2);
    expect(robust.fits[6]!.relative).toBeCloseTo(1 / 1.6 - 1, 1);
    [200, 40, 2].forEach((value, j) => {
      expect(Math.abs(numbersOf(robust)[j]! / value - 1)).toBeLessThan(0.03);
    });
    expect(Math.abs(numbersOf(fitted(readings, 2, { loss: 'squares' }))[2]! / 2 - 1)).toBeGreaterThan(0.1);
  });

  it('is the fit to the geometric mean where spacings are read several times', () => {
    const low = wennerReadings(wide, [180, 170, 150, 90, 60, 45, 41, 40]);
    const factors = [1.1, 0.95, 1.02, 1.08, 0.93, 1.04, 0.97, 1.01];
    const high = low.map((reading, i) => ({ ...reading, apparentResistivity: reading.apparentResistivity * factors[i]! ** 2 })); // biome-ignore format: one row
    const mean = low.map((reading, i) => ({ ...reading, apparentResistivity: reading.apparentResistivity * factors[i]! })); // biome-ignore format: one row
    const both = numbersOf(fitted([...low, ...high], 2, { loss: 'squares' }));
    numbersOf(fitted(mean, 2, { loss: 'squares' })).forEach((value, j) => {
      expect(Math.abs(both[j]! / value - 1)).toBeLessThan(1e-4);
    });
  });

  it('scales: readings × q and lengths × s give resistivities × q and thicknesses × s', () => {
    const scaled = fieldSet.map((reading) => ({
      ...reading,
      array: wenner(4 * 2.5 * (fieldSet.indexOf(reading) + 1)),
      apparentResistivity: 3 * reading.apparentResistivity,
    }));
    const [rho1, rho2, thickness] = numbersOf(fitted(scaled, 2));
    const base = numbersOf(fitted(fieldSet, 2));
    expect(Math.abs(rho1! / base[0]! / 3 - 1)).toBeLessThan(1e-4);
    expect(Math.abs(rho2! / base[1]! / 3 - 1)).toBeLessThan(1e-4);
    expect(Math.abs(thickness! / base[2]! / 4 - 1)).toBeLessThan(1e-4);
  });

  it('is repeated by its seed, and the seed does not matter where the optimum is plain', () => {
    expect(JSON.stringify(fitted(pirson, 3, { seed: 4 }))).toBe(
      JSON.stringify(fitted(pirson, 3, { seed: 4 })),
    );
    const [one, other] = [fitted(fieldSet, 2, { seed: 1 }), fitted(fieldSet, 2, { seed: 99 })];
    numbersOf(one).forEach((value, j) => {
      expect(Math.abs(numbersOf(other)[j]! / value - 1)).toBeLessThan(1e-3);
    });
    expect(one.starts.agreeing).toBeGreaterThan(8);
  });

  it('is the same through the image list of the grid analysis, to 1e-5', () => {
    for (const layers of [1, 2, 3]) expect(fitted(kindermann, layers).forwardError).toBeLessThan(1e-5);
  });

  it('knows its parameters as well as seeded noise of 1 % says', () => {
    const random = randomNumbers(8);
    const truth = [100, 1000, 2.5];
    const model = soil([100, 2.5], [1000]);
    const exact = exactReadings(model, [1, 2, 4, 8, 16, 32].map((a) => wenner(a))); // biome-ignore format: one row
    const squares = [0, 0, 0];
    const rounds = 300;
    for (let round = 0; round < rounds; round++) {
      const noisy = exact.map((reading) => ({ ...reading, apparentResistivity: reading.apparentResistivity * Math.exp(0.01 * random.normal()) })); // biome-ignore format: one row
      numbersOf(fitted(noisy, 2, { loss: 'squares', starts: 2 })).forEach((value, j) => {
        squares[j]! += Math.log(value / truth[j]!) ** 2 / rounds;
      });
    }
    const fit = fitted(exact, 2, { scatter: 0.01 });
    fit.parameters.forEach((parameter, j) => {
      // three standard errors of a standard deviation from 300 rounds: 12 %
      expect(Math.abs(parameter.standardDeviation / Math.sqrt(squares[j]!) - 1)).toBeLessThan(0.13);
    });
    // over a resistive ground, a thicker top goes with a more resistive one below
    expect(fit.correlation[1]![2]).toBeGreaterThan(0.5);
    expect(fit.correlation[2]![1]).toBe(fit.correlation[1]![2]);
    expect(fit.correlation[1]![1]).toBe(1);
  });

  it('spreads as published surveys do under 1 % noise (independent computation by trials; ρ1, ρ2, h in %)', () => {
    for (const [readings, row] of [
      [seedherArora1, [1, 1.3, 0.5]],
      [seedherArora2, [2.4, 8.3, 4.5]],
      [seedherArora3, [1, 7.8, 6.4]],
      [kindermann, [0.9, 0.7, 1.1]],
    ] as const)
      fitted(readings, 2, { scatter: 0.01 }).parameters.forEach((parameter, j) => {
        const ratio = (100 * parameter.standardDeviation) / row[j]!;
        expect(ratio).toBeGreaterThan(1 / 1.4);
        expect(ratio).toBeLessThan(1.4);
      });
  });

  it('takes its scatter from residuals, never below what few readings can tell', () => {
    // five readings met to 0.005 %, three parameters: 5 % counted as two readings, over 2 + 2 degrees of freedom
    expect(fitted(seedherArora1, 2).scatter).toBeCloseTo(Math.sqrt((2 * 0.05 ** 2) / 4), 4);
    expect(fitted(seedherArora1, 2, { scatter: 0.02 }).scatter).toBe(0.02);
    expect(fitted(kindermann, 1).scatter).toBeGreaterThan(0.3);
  });
});

describe('a survey is refused', () => {
  it('for more parameters than different spacings, which pin depth and repetition do not make', () => {
    expect(invertSurvey(fieldSet, 4)).toEqual({
      kind: 'refused',
      code: 'too-few-spacings',
      message:
        'layer count: 4 layers have 7 resistivities and thicknesses; 6 different spacings give no more than 6',
    });
    const twice = [...wennerReadings([1, 2], [100, 90]), ...wennerReadings([1, 2], [101, 91], 0.01)];
    expect(invertSurvey(twice, 2)).toMatchObject({ kind: 'refused', code: 'too-few-spacings' });
    expect(invertSurvey(twice, 1)).toMatchObject({ kind: 'fitted' });
    expect(invertSurvey([], 1)).toMatchObject({ kind: 'refused', code: 'too-few-spacings' });
  });

  it('for a layer count that is not a whole number from 1 to 5', () => {
    for (const layers of [0, 6, 2.5, Number.NaN])
      expect(invertSurvey(kindermann, layers)).toEqual({
        kind: 'refused',
        code: 'layer-count',
        message: `layer count: ${layers} is not a whole number from 1 to 5`,
      });
  });
});
