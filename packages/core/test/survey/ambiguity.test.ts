import { describe, expect, it } from 'vitest';
import { randomNumbers } from '../../src/numerics/random.ts';
import type { SoilModel } from '../../src/soil/soil-model.ts';
import {
  bandOf,
  type FamilyOptions,
  type SoilFamily,
  soilFamily,
  soundingBand,
} from '../../src/survey/ambiguity.ts';
import { degenerateLayers } from '../../src/survey/degeneracy.ts';
import {
  evidenceWeights,
  type FittedSurvey,
  INVERSION_DEFAULTS,
  invertSurvey,
} from '../../src/survey/inversion.ts';
import { parametersOf } from '../../src/survey/model-parameters.ts';
import type { Reading } from '../../src/survey/readings.ts';
import { surveyFilter } from '../../src/survey/survey-filter.ts';
import { surveyMisfit } from '../../src/survey/survey-misfit.ts';
import { soil } from '../support/soils.ts';
import { kindermann, pirson, seedherArora1, seedherArora3, wennerReadings } from '../support/surveys.ts';

function familyOf(
  readings: readonly Reading[],
  layers: number,
  options: Partial<FamilyOptions> = {},
  starts = INVERSION_DEFAULTS.starts,
): { readonly fit: FittedSurvey; readonly family: SoilFamily } {
  const fit = invertSurvey(readings, layers, { starts });
  if (fit.kind === 'refused') throw new Error(fit.message);
  return { fit, family: soilFamily(readings, fit, options) };
}

const spacings = [1, 1.5, 2, 3, 4.5, 7, 10, 15, 22, 32, 48, 70];
const filter = surveyFilter(wennerReadings(spacings, spacings).map((reading) => reading.array));

/** What a soil gives at the spacings, Ω·m. */
function curveOf(model: SoilModel): Float64Array {
  const curve = new Float64Array(spacings.length);
  filter.evaluate(model, curve);
  return curve;
}

describe('the family of soils', () => {
  it('covers the generating soil: 200 seeded surveys of two and three layers, twelve spacings, 5 % noise', () => {
    const random = randomNumbers(7);
    const rounds = 200;
    let region = 0;
    let reach = 0;
    const inBand = { resolved: [0, 0], parameter: [0, 0], curve: [0, 0] };
    const count = (tally: number[], yes: boolean): void => {
      tally[0]! += yes ? 1 : 0;
      tally[1]! += 1;
    };
    for (let round = 0; round < rounds; round++) {
      const layers = round % 3 === 2 ? 3 : 2;
      const truth = soil(
        ...Array.from({ length: layers }, (_, i): readonly [number, number?] => {
          const resistivity = 10 ** (1 + 2.5 * random.uniform());
          return i === layers - 1 ? [resistivity] : [resistivity, 0.5 * 20 ** random.uniform()];
        }),
      );
      const curve = curveOf(truth);
      const noisy = [...curve].map((value) => value * Math.exp(0.05 * random.normal()));
      const readings = wennerReadings(spacings, noisy);
      // half of the usual draws and starts: bands a little less exact, and the more to be proved
      const { fit, family } = familyOf(readings, layers, { seed: round, drawsPerParameter: 80 }, 8);
      const x = parametersOf(truth);
      const squares = surveyMisfit(readings).squares(x, evidenceWeights(fit.fits));
      if (squares <= family.squaresLimit) region++;
      const reached = family.parameters.every((parameter, j) => {
        const value = Math.exp(x[j]!);
        const inside = value >= parameter.low && value <= parameter.high;
        count(inBand.parameter, inside);
        if (parameter.resolved) count(inBand.resolved, inside);
        const drawn = family.draws.map((draw) => draw[j]!);
        return x[j]! >= Math.min(...drawn) && x[j]! <= Math.max(...drawn);
      });
      if (reached) reach++;
      family.band.forEach((band, i) => {
        count(inBand.curve, curve[i]! >= band.low && curve[i]! <= band.high);
      });
    }
    const share = (tally: readonly number[]): number => tally[0]! / tally[1]!;
    const percent = (value: number): string => `${(100 * value).toFixed(1)} %`;
    console.info(
      `generating soil in the joint 95 % region: ${percent(region / rounds)} of ${rounds} surveys; every parameter in the family's reach: ${percent(reach / rounds)}; ` +
        `in the 5–95 % band: resolved parameters ${percent(share(inBand.resolved))}, all parameters ${percent(share(inBand.parameter))}, sounding curve ${percent(share(inBand.curve))}`,
    );
    expect(region / rounds).toBeGreaterThanOrEqual(0.9);
    expect(reach / rounds).toBeGreaterThanOrEqual(0.9);
    // 90 % when exact
    expect(share(inBand.resolved)).toBeGreaterThan(0.84);
    expect(share(inBand.resolved)).toBeLessThan(0.96);
    expect(share(inBand.parameter)).toBeGreaterThan(0.84);
    expect(share(inBand.curve)).toBeGreaterThan(0.84);
    expect(share(inBand.curve)).toBeLessThan(0.96);
  }, 120_000);

  it('of readings with given scatter has the linear model’s band where that holds', () => {
    const { fit, family } = familyOf(kindermann, 2, { scatter: 0.01 });
    const linear = invertSurvey(kindermann, 2, { scatter: 0.01 });
    if (linear.kind === 'refused') throw new Error(linear.message);
    family.parameters.forEach((band, j) => {
      const { standardDeviation } = linear.parameters[j]!;
      // half of the 5–95 % band is 1.645 standard deviations of the normal distribution
      const spread = Math.log(band.high / band.low) / 2 / 1.645;
      expect(Math.abs(spread / standardDeviation - 1)).toBeLessThan(0.15);
      expect(Math.abs(Math.log(band.median) - fit.x[j]!)).toBeLessThan(0.3 * standardDeviation);
    });
  });

  it('has members of equal weight, closest first, drawn in one seed’s order', () => {
    const { family } = familyOf(kindermann, 2, { members: 60 });
    expect(family.members.length).toBe(60);
    expect(family.members.reduce((sum, member) => sum + member.weight, 0)).toBeCloseTo(1, 12);
    const misfits = family.members.map((member) => member.logRms);
    expect(misfits).toEqual([...misfits].sort((p, q) => p - q));
    expect(family.outcome).toBe('mixed');
    expect(JSON.stringify(family)).toBe(JSON.stringify(familyOf(kindermann, 2, { members: 60 }).family));
    const other = familyOf(kindermann, 2, { members: 60, seed: 2 }).family;
    expect(other.members).not.toEqual(family.members);
    other.parameters.forEach((band, j) => {
      expect(Math.abs(band.high / family.parameters[j]!.high - 1)).toBeLessThan(0.03);
    });
  });

  it('leaves the ground below a short ascending survey open, and knows it below a long descending one', () => {
    const open = familyOf(seedherArora3, 2).family.parameters;
    expect(open[0]!.resolved).toBe(true);
    expect(open[1]!.resolved).toBe(false);
    expect(open[1]!.low).toBeLessThan(300);
    expect(open[1]!.high).toBeGreaterThan(900);
    expect(familyOf(seedherArora1, 2).family.parameters.every((parameter) => parameter.resolved)).toBe(true);
  });

  it('of uniform ground is as wide as the mean of its readings is uncertain', () => {
    const readings = wennerReadings(spacings, [96, 104, 99, 103, 95, 102, 98, 101, 105, 97, 100, 99]);
    const { family } = familyOf(readings, 1, { scatter: 0.04, drawsPerParameter: 2000 });
    const [only] = family.parameters;
    expect(
      Math.abs(Math.log(only!.high / only!.low) / (2 * 1.645 * (0.04 / Math.sqrt(12))) - 1),
    ).toBeLessThan(0.07);
  });

  it('of readings taken twice is narrower by √2', () => {
    const once = wennerReadings(spacings, [...curveOf(soil([200, 3], [40]))]);
    const width = (readings: readonly Reading[]): number => {
      const [top] = familyOf(readings, 2, { scatter: 0.03, drawsPerParameter: 600 }).family.parameters;
      return Math.log(top!.high / top!.low);
    };
    expect(Math.abs(width(once) / width([...once, ...once]) / Math.SQRT2 - 1)).toBeLessThan(0.1);
  });

  it('gives its band over any spacings', () => {
    const { family } = familyOf(kindermann, 2);
    const array = { kind: 'wenner', spacing: 3, pinDepth: 0 } as const;
    const [band] = soundingBand(
      family.members.map((member) => member.soil),
      [array],
    );
    expect(band!.array).toBe(array);
    // 700/180 Ω·m at 2.5 m gives 508.9 Ω·m at 3 m by the two-layer image series
    expect(band!.low).toBeLessThan(band!.median);
    expect(Math.abs(band!.median / 508.9 - 1)).toBeLessThan(0.02);
    expect(band!.high).toBeGreaterThan(band!.median);
  });

  it('of twelve readings in three layers takes no more than 3 s with its fit', () => {
    const curve = curveOf(soil([300, 1], [60, 6], [500]));
    const random = randomNumbers(5);
    const readings = wennerReadings(
      spacings,
      [...curve].map((value) => value * Math.exp(0.05 * random.normal())),
    );
    const start = performance.now();
    familyOf(readings, 3);
    const seconds = (performance.now() - start) / 1000;
    console.info(`inversion and family of twelve readings, three layers: ${seconds.toFixed(2)} s`);
    expect(seconds).toBeLessThan(3);
  });
});

describe('degenerate layers', () => {
  it('are told for Pirson’s example: the middle layer by ρ·t alone, as its published solutions differ', () => {
    const { family } = familyOf(pirson, 3);
    const middle = degenerateLayers(family).find((layer) => layer.layer === 2)!;
    expect(middle.known).toBe('transverse resistance');
    // independent computation: 30 000 Ω·m × 2.70 m, 42 003 × 1.84 and 100 000 × 0.75 all fit within about 1 %
    for (const product of [30_000 * 2.7, 42_003 * 1.84, 100_000 * 0.75]) {
      expect(middle.band.low).toBeLessThan(product);
      expect(middle.band.high).toBeGreaterThan(product);
    }
    const resistivity = family.parameters[1]!;
    expect(resistivity.low).toBeLessThan(30_000);
    expect(resistivity.high).toBeGreaterThan(100_000);
    expect(middle.message).toMatch(
      /^layer 2 is known only by its resistivity times thickness, \d+ to \d+ Ω·m²: soils with a resistivity there from \d+ to \d+ Ω·m and a thickness from [\d.]+ to [\d.]+ m read alike$/,
    );
  });

  it('are told by t/ρ for a thin conductive layer', () => {
    const readings = wennerReadings(spacings, [...curveOf(soil([200, 4], [5, 0.4], [150]))]);
    const found = degenerateLayers(familyOf(readings, 3, { scatter: 0.02 }).family);
    const middle = found.find((layer) => layer.layer === 2)!;
    expect(middle.known).toBe('longitudinal conductance');
    expect(middle.band.low).toBeLessThan(0.4 / 5);
    expect(middle.band.high).toBeGreaterThan(0.4 / 5);
    expect(middle.message).toContain('layer 2 is known only by its thickness over resistivity, ');
  });

  it('are none where readings tell resistivity and thickness', () => {
    expect(degenerateLayers(familyOf(kindermann, 2).family)).toEqual([]);
  });

  it('are told only where a number is not resolved and the product is much better known than either', () => {
    const { family } = familyOf(kindermann, 2);
    /** A family whose top layer has ln ρ over `rho`, and ln t over −`share` of that. */
    const made = (rho: number, share: number): SoilFamily => {
      const draws = Array.from({ length: 101 }, (_, i) =>
        Float64Array.of((rho * i) / 100, 0, (-share * rho * i) / 100),
      );
      const parameters = family.parameters.map((parameter, j) => {
        const band = bandOf(draws.map((draw) => Math.exp(draw[j]!)));
        return { ...parameter, ...band, resolved: band.high <= 3 * band.low };
      });
      return { ...family, draws, parameters };
    };
    expect(degenerateLayers(made(3, 0.9)).map((layer) => layer.known)).toEqual(['transverse resistance']);
    // both resolved, however well the product is known
    expect(degenerateLayers(made(1, 0.9))).toEqual([]);
    // the product resolved, but thickness alone better
    expect(degenerateLayers(made(1.5, 0.3))).toEqual([]);
  });
});
