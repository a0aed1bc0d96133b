// A study of one rod with an invented outcome, and a renderer that shows one number: enough to pack and to verify.
import {
  InputFaults,
  type LoadedStudy,
  type Outcome,
  type Results,
  type Study,
  type StudySource,
} from '@ohmstead/study';
import type { Renderer } from '../src/renderer.ts';
import type { VerifyOptions } from '../src/verify-pack.ts';

const study: Study = {
  format: 'ohmstead-study',
  version: 1,
  title: 'One rod',
  soil: { layers: [{ resistivity_ohm_m: 100 }] },
  conductors: ['tables/rod.csv'],
  cases: [{ name: 'only', grid_current_A: 100, duration_s: 0.5 }],
  limits: { basis: 'IEEE 80', body_mass_kg: 70 },
};

export const exampleFiles: ReadonlyMap<string, Uint8Array> = new Map([
  ['study.json', new TextEncoder().encode(JSON.stringify(study))],
  ['tables/rod.csv', new TextEncoder().encode('\uFEFFid;depth1_m\r\nrod;0,5\r\n')],
]);

const none = new Float64Array();

/** Stands in for the reader: any study.json that parses will do. */
export function exampleLoad(source: StudySource): LoadedStudy {
  const files = new Map(source.paths.map((path) => [path, source.read(path)]));
  let title: unknown;
  try {
    title = JSON.parse(new TextDecoder().decode(files.get('study.json'))).title;
  } catch {
    throw new InputFaults([{ file: 'study.json', code: 'not-json', message: 'not JSON text' }]);
  }
  const conductors = {
    count: 0,
    id: [],
    x1: none,
    y1: none,
    depth1: none,
    x2: none,
    y2: none,
    depth2: none,
    radius: none,
    material: [],
    electrode: [],
    insulated: new Uint8Array(),
    resistancePerMetre: none,
  };
  return { study: { ...study, title: String(title) }, conductors, origins: [], notes: [], files };
}

/** Stands in for the solver: the rise follows the length of the title, so that a changed study changes a number. */
export function exampleSolve({ study }: LoadedStudy): Outcome {
  const worst = {
    worst_V: 900.1,
    uncertainty_V: 1,
    x_m: 0.5,
    y_m: 0,
    on_covering: false,
    limit_V: 800,
    within_limit: false,
    margin_percent: -12.5,
  };
  const results: Results = {
    format: 'ohmstead-results',
    version: 1,
    program_version: '1.2.3',
    title: study.title,
    metal_model: 'resistive',
    electrode: {
      resistance_ohm: 33.3,
      resistance_uncertainty_ohm: 0.1,
      segment_count: 10,
      node_count: 11,
      conductor_count: 1,
      rod_count: 1,
      conductor_length_m: 3,
    },
    electrodes: [],
    checks: {
      current_balance: 1e-12,
      residual: 1e-13,
      node_balance: 1e-13,
      solver_iterations: 3,
      image_error: 1e-9,
      image_count: 1,
    },
    soil: { layers: [{ resistivity_ohm_m: 100, thickness_m: null }] },
    limits: {
      basis: 'IEEE 80',
      body_mass_kg: 70,
      soil_resistivity_ohm_m: 100,
      surfacing_resistivity_ohm_m: null,
      surfacing_thickness_m: null,
      covering_factor: 1,
    },
    mesh: [],
    cases: [
      {
        name: 'only',
        fault_current_A: null,
        division_factor: null,
        decrement_factor: 1,
        duration_s: 0.5,
        frequency_hz: 50,
        x_over_r: null,
        grid_current_A: 100,
        inject: { x_m: 0, y_m: 0, depth_m: 0.5 },
        resistance_ohm: 33.3,
        resistance_uncertainty_ohm: 0.1,
        gpr_V: 3330 + study.title.length,
        gpr_uncertainty_V: 10,
        bare_touch_limit_V: 800,
        bare_step_limit_V: 2700,
        covering_touch_limit_V: null,
        covering_step_limit_V: null,
        touch: worst,
        step: {
          ...worst,
          worst_V: 300,
          limit_V: 2700,
          within_limit: true,
          margin_percent: 88.9,
          from: { x_m: 0, y_m: 0 },
          to: { x_m: 1, y_m: 0 },
        },
      },
    ],
    snaps: [],
    assumptions: [],
    ground: null,
    equivalent_uniform: [],
    seasons: [],
    envelope: [],
    warnings: [],
  };
  const plan = {
    conductors: [],
    joints: [],
    touchArea: [],
    stepArea: [],
    areasGiven: { touch: false, step: false },
  };
  const indices = new Int32Array();
  const segments = {
    count: 0,
    conductor: indices,
    x1: none,
    y1: none,
    depth1: none,
    x2: none,
    y2: none,
    depth2: none,
    leakage: none,
    along: none,
  };
  return { study, results, plan, segments, cases: [] };
}

export const exampleRenderer: Renderer = {
  sheetHtml: ({ results }) => `<!doctype html><title>${results.title}</title>${results.program_version}`,
  figures: ({ results }) => [{ name: 'touch.svg', svg: `<svg>${results.cases[0].touch.worst_V}</svg>` }],
  tables: ({ results }) => [{ name: 'cases.csv', csv: `gpr_V\n${results.cases[0].gpr_V}\n` }],
};

export const exampleOptions: VerifyOptions = { file: 'a.zip', load: exampleLoad, renderer: exampleRenderer };
