// A survey made ready for fitting: its different arrays, the fast forward model, and the logarithms to be met.
import type { FourPinArray } from './arrays.ts';
import { soilOf } from './model-parameters.ts';
import type { Reading } from './readings.ts';
import { type SurveyFilter, surveyFilter } from './survey-filter.ts';

export interface SurveyMisfit {
  readonly readings: readonly Reading[];
  /** different ones, in the order of the readings */
  readonly arrays: readonly FourPinArray[];
  /** of each reading; shape [readings] */
  readonly arrayOf: Int32Array;
  readonly filter: SurveyFilter;
  /**
   * ln(modelled/read) of each reading for parameters x, shape [readings]. The residual is logarithmic: an error by a
   * factor counts alike up and down, and the fit to repeated readings is the fit to their geometric mean, so often.
   */
  residuals(x: ArrayLike<number>, into: Float64Array): void;
  /** Σ weight·residual² */
  squares(x: ArrayLike<number>, weights: Float64Array): number;
}

/** Apparent resistivity, Ω·m, that stands for a value which the fast forward model rounds to nothing or less. */
const LEAST_APPARENT = 1e-9;

export function surveyMisfit(readings: readonly Reading[]): SurveyMisfit {
  const known = new Map<string, number>();
  const arrays: FourPinArray[] = [];
  const arrayOf = Int32Array.from(readings, ({ array }) => {
    const key = JSON.stringify(array);
    const index = known.get(key) ?? arrays.length;
    if (index === arrays.length) {
      known.set(key, index);
      arrays.push(array);
    }
    return index;
  });
  const observed = Float64Array.from(readings, (reading) => Math.log(reading.apparentResistivity));
  const filter = surveyFilter(arrays);
  const modelled = new Float64Array(arrays.length);
  const model = (x: ArrayLike<number>): void => {
    filter.evaluate(soilOf(x), modelled);
    for (let i = 0; i < modelled.length; i++) modelled[i] = Math.log(Math.max(LEAST_APPARENT, modelled[i]!));
  };
  return {
    readings,
    arrays,
    arrayOf,
    filter,
    residuals: (x, into) => {
      model(x);
      for (let i = 0; i < observed.length; i++) into[i] = modelled[arrayOf[i]!]! - observed[i]!;
    },
    squares: (x, weights) => {
      model(x);
      let sum = 0;
      for (let i = 0; i < observed.length; i++)
        sum += weights[i]! * (modelled[arrayOf[i]!]! - observed[i]!) ** 2;
      return sum;
    },
  };
}
