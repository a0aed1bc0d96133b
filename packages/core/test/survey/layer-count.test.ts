import { describe, expect, it } from 'vitest';
import { randomNumbers } from '../../src/numerics/random.ts';
import { proposeLayerCount } from '../../src/survey/layer-count.ts';
import { surveyFilter } from '../../src/survey/survey-filter.ts';
import { soil } from '../support/soils.ts';
import {
  fieldSet,
  kindermann,
  pirson,
  seedherArora1,
  seedherArora3,
  wennerReadings,
} from '../support/surveys.ts';

describe('the number of layers', () => {
  it('is that of the published models: two, and three for Pirson’s example', () => {
    for (const readings of [seedherArora1, seedherArora3, kindermann, fieldSet])
      expect(proposeLayerCount(readings).layers).toBe(2);
    expect(proposeLayerCount(pirson).layers).toBe(3);
  });

  it('is one for readings that scatter about one value', () => {
    const values = [103, 96, 101, 95, 104, 99, 98, 102];
    expect(proposeLayerCount(wennerReadings([1, 2, 3, 5, 8, 12, 20, 30], values)).layers).toBe(1);
  });

  it('never has as many parameters as there are spacings', () => {
    const { candidates, reason } = proposeLayerCount(kindermann);
    expect(candidates.map((candidate) => candidate.layers)).toEqual([1, 2, 3]);
    expect(reason).toContain('more than 3 would have as many parameters as there are spacings, 7');
    expect(proposeLayerCount(wennerReadings([1], [100])).layers).toBe(1);
  });

  it('is not raised by one wrong reading, which plain squares would make layers of', () => {
    const spacings = [0.5, 0.75, 1, 1.5, 2, 3, 4, 6, 8, 12, 16, 24, 32, 48, 64];
    const filter = surveyFilter(wennerReadings(spacings, spacings).map((r) => r.array));
    for (const [place, factor] of [
      [1, 0.5],
      [6, 1.6],
      [14, 1.6],
    ] as const) {
      // biome-ignore format: three readings
      const values = new Float64Array(spacings.length);
      filter.evaluate(soil([200, 2], [40]), values);
      values[place]! *= factor;
      expect(proposeLayerCount(wennerReadings(spacings, [...values])).layers).toBe(2);
    }
  });

  it('is rarely above that of the generating soil, 5 % noise', () => {
    const random = randomNumbers(21);
    const spacings = [0.5, 1, 2, 3, 5, 8, 12, 20, 30, 50];
    const values = new Float64Array(spacings.length);
    const filter = surveyFilter(wennerReadings(spacings, [...values]).map((r) => r.array));
    let above = 0;
    let exact = 0;
    for (let round = 0; round < 20; round++) {
      filter.evaluate(
        soil([100, 2 + 2 * random.uniform()], [100 * 5 ** (random.uniform() < 0.5 ? 1 : -1)]),
        values,
      );
      const noisy = [...values].map((value) => value * Math.exp(0.05 * random.normal()));
      const { layers } = proposeLayerCount(wennerReadings(spacings, noisy));
      if (layers! > 2) above++;
      if (layers === 2) exact++;
    }
    console.info(`layer count of 20 two-layer soils, 5 % noise: ${exact} exact, ${above} above`);
    expect(above).toBeLessThanOrEqual(2);
    expect(exact).toBeGreaterThanOrEqual(17);
  });

  it('is undefined without readings', () => {
    expect(proposeLayerCount([])).toEqual({
      layers: undefined,
      candidates: [],
      reason: 'there are no readings',
    });
  });
});
