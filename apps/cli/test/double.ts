// A quick engine for tests: real reading of studies, invented results.
import { type ElectrodeResult, loadPoints, loadStudy, type Results } from '@ohmstead/study';
import { exampleRenderer, exampleSolve } from '../../../packages/pack/test/example.ts';
import type { Engine } from '../src/engine.ts';

/** An engine whose results are the example's with changes. */
export function doubleEngine(change: (results: Results) => Results = (results) => results): Engine {
  return {
    loadStudy,
    loadPoints,
    solveStudy: (loaded, options) => {
      options?.onProgress?.('solving', 0.5);
      const outcome = exampleSolve(loaded);
      return { ...outcome, results: change(outcome.results) };
    },
    fieldAt: (_loaded, points, caseName) =>
      points.map((point) => ({
        ...point,
        potential_V: caseName.length + 0.1 + 0.2,
        touch_V: -1e-7 * point.x_m,
      })),
    renderer: exampleRenderer,
    version: '1.2.3',
  };
}

/** Floating metal whose worst touch voltage is 0.4 of the rise. */
export const fence: ElectrodeResult = {
  name: 'fence',
  role: 'floating',
  potential_ratio: 0.5,
  potential_uncertainty_ratio: 0.001,
  leakage_ratio: 0,
  piece_count: 1,
  conductor_count: 1,
  rod_count: 0,
  conductor_length_m: 9,
  touch_ratio: -0.4,
  touch_x_m: 1,
  touch_y_m: 2,
};

/** The example's results with everything within its limit. */
export function within(results: Results): Results {
  return {
    ...results,
    cases: results.cases.map((one) => ({
      ...one,
      touch: { ...one.touch, worst_V: 100, within_limit: true, margin_percent: 87.5 },
    })),
  };
}
