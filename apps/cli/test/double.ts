// A quick engine for tests: real reading of studies, invented results.
import {
  type ElectrodeResult,
  loadPoints,
  loadStudy,
  loadSurvey,
  type Results,
  type SoilFit,
  type Spread,
} from '@ohmstead/study';
import { exampleRenderer, exampleSolve } from '../../../packages/pack/test/example.ts';
import type { Engine } from '../src/engine.ts';

/** What the example's results say of ground and seasons: nothing. */
const NO_GROUND = { ground: null, equivalent_uniform: [], seasons: [], envelope: [] } as const;

function spread(best: number): Spread {
  return { best, low: 0.8 * best, median: 1.05 * best, high: 1.5 * best };
}

/** Invented: two layers, the second reading an outlier. */
export const exampleFit: SoilFit = {
  survey_file: 'survey.csv',
  outcome: 'converged',
  layer_count: 2,
  layer_count_proposed: 3,
  layer_count_criterion: 'least of a criterion: 3',
  trials: [
    { layer_count: 1, rms_percent: 42.31, criterion: 12.34 },
    { layer_count: 2, rms_percent: 4.56, criterion: -33.21 },
    { layer_count: 3, rms_percent: 1.23, criterion: -40 },
  ],
  rms_percent: 4.56,
  layers: [
    { resistivity_ohm_m: spread(123.456), thickness_m: spread(1.23456) },
    { resistivity_ohm_m: spread(45.678), thickness_m: null },
  ],
  readings: [
    {
      line: 2,
      traverse: 'north',
      spacing_m: 0.5,
      apparent_resistivity_ohm_m: 120.06,
      model_ohm_m: 123.2,
      misfit_percent: 2.615,
      outlier: false,
    },
    {
      line: 3,
      traverse: 'south\u001b',
      spacing_m: 12,
      apparent_resistivity_ohm_m: 80,
      model_ohm_m: 48.3,
      misfit_percent: -39.63,
      outlier: true,
    },
  ],
  sounding: [{ spacing_m: 1, fitted_ohm_m: 120, low_ohm_m: 100, high_ohm_m: 140 }],
  family: { count: 321, seed: 7, method: 'invented' },
  resolved_depth_m: 6.228,
  resolved_depth_rule: 'an invented rule',
  doubts: [{ code: 'deep-pins', message: 'survey.csv:2: pins are deep\u0007' }],
};

/** Results of the example study with what it leaves out. */
export function exampleResults(loaded: Parameters<typeof exampleSolve>[0]): Results {
  return { ...NO_GROUND, ...exampleSolve(loaded).results };
}

/** An engine whose results are the example's with changes. */
export function doubleEngine(change: (results: Results) => Results = (results) => results): Engine {
  return {
    loadStudy,
    loadPoints,
    solveStudy: async (loaded, options) => {
      options?.onProgress?.('solving', 0.5);
      return { ...exampleSolve(loaded), results: change(exampleResults(loaded)) };
    },
    loadSurvey,
    fitSurvey: ({ file }, layerCount) => ({
      fit: {
        ...exampleFit,
        survey_file: file,
        layer_count: layerCount === 'auto' ? exampleFit.layer_count_proposed : layerCount,
      },
    }),
    fieldAt: async (_loaded, points, caseName) =>
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
  touch_uncertainty_ratio: 0.01,
  touch_on_covering: false,
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
