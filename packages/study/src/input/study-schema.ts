// What study.json may hold: keys, kinds and ranges, each with its trade name and what is expected.
import { z } from 'zod';
import type { LayerInput, Study } from '../study.ts';
import * as most from './limits.ts';
import { above, between, label, oneOf, told } from './schema-parts.ts';
import { notes, project, revisions } from './words-schema.ts';

function coordinate(title: string): z.ZodNumber {
  return between(title, ' m', -most.LARGEST_COORDINATE_M, most.LARGEST_COORDINATE_M);
}

const resistivity = between(
  'soil resistivity',
  ' Ω·m',
  most.SMALLEST_SOIL_RESISTIVITY_OHM_M,
  most.LARGEST_SOIL_RESISTIVITY_OHM_M,
);

const layer = told(
  z.strictObject({
    resistivity_ohm_m: resistivity,
    thickness_m: between(
      'layer thickness',
      ' m',
      most.SMALLEST_LAYER_THICKNESS_M,
      most.LARGEST_LAYER_THICKNESS_M,
    ).optional(),
  }),
  'soil layer',
  'an object with resistivity_ohm_m and, save the last layer, thickness_m',
);

const layers = told(
  z.array(layer).min(1).max(most.MOST_SOIL_LAYERS),
  'list of soil layers',
  `1 to ${most.MOST_SOIL_LAYERS} layers, the top one first`,
);

const layerCounts: readonly (number | 'auto')[] = [
  ...Array.from({ length: most.MOST_FITTED_LAYERS }, (_, i) => i + 1),
  'auto',
];

const soil = oneOf(
  told(
    z.strictObject({
      layers: layers.optional(),
      survey: told(z.string().min(1), 'path of a survey', 'a path within the study folder').optional(),
      layer_count: told(
        z.literal(layerCounts),
        'number of layers to fit',
        `a whole number from 1 to ${most.MOST_FITTED_LAYERS}, or "auto"`,
      ).optional(),
    }),
    'soil',
    'an object with layers, or with survey and layer_count',
  ),
  ['layers'],
  ['survey', 'layer_count'],
);

const change = z.strictObject({
  depth_m: between('depth of the change', ' m', most.SMALLEST_LAYER_THICKNESS_M, most.LARGEST_DEPTH_M),
  resistivity_ohm_m: resistivity,
});
const CHANGE = 'an object with depth_m and resistivity_ohm_m';

const season = told(
  z.strictObject({
    name: label('season name', most.LONGEST_NAME),
    layers: layers.optional(),
    top: told(change, 'dried or frozen top', CHANGE).optional(),
    below: told(change, 'ground under the water table', CHANGE).optional(),
  }),
  'season',
  'an object with name and layers, top or below',
);

const electrode = told(
  z.strictObject({
    name: label('electrode name', most.LONGEST_NAME),
    role: told(z.enum(['energised', 'floating']), 'electrode role', 'energised or floating'),
  }),
  'electrode',
  'an object with name and role',
);

const inject = told(
  z.strictObject({
    x_m: coordinate('x of the injection'),
    y_m: coordinate('y of the injection'),
    depth_m: between('depth of the injection', ' m', 0, most.LARGEST_DEPTH_M, ', positive downward'),
  }),
  'place of injection',
  'a whole point, with x_m, y_m and depth_m',
);

const faultCase = told(
  z.strictObject({
    name: label('case name', most.LONGEST_NAME),
    fault_current_A: above('fault current', ' A', most.LARGEST_CURRENT_A).optional(),
    division_factor: above('division factor', '', 1).optional(),
    grid_current_A: above('grid current', ' A', most.LARGEST_CURRENT_A).optional(),
    x_over_r: between('X/R ratio', '', 0, most.LARGEST_X_OVER_R).optional(),
    frequency_hz: above('frequency', ' Hz', most.LARGEST_FREQUENCY_HZ).optional(),
    duration_s: between(
      'fault duration',
      ' s',
      most.SHORTEST_DURATION_S,
      most.LONGEST_DURATION_S,
      ', where the body-current limits of IEEE Std 80 hold',
    ),
    inject: inject.optional(),
  }),
  'fault case',
  'an object with name, duration_s and fault_current_A or grid_current_A',
);

const limits = told(
  z.strictObject({
    basis: told(z.literal('IEEE 80'), 'basis of the limits', '"IEEE 80"'),
    body_mass_kg: told(z.literal([50, 70]), 'body mass', 'the number 50 or 70, kg'),
  }),
  'limits',
  'an object with basis and body_mass_kg',
);

const corner = told(
  z.tuple([coordinate('x of the corner'), coordinate('y of the corner')]),
  'corner',
  'two numbers [x, y] in metres',
);
const polygon = told(
  z.array(corner).min(3).max(most.MOST_CORNERS),
  'area',
  `3 to ${most.MOST_CORNERS} corners [x, y] in metres, in order, the first not repeated`,
);
const areaList = told(
  z.array(polygon).min(1).max(most.MOST_AREAS),
  'list of areas',
  `1 to ${most.MOST_AREAS} areas, each a list of corners`,
);
const surfacing = told(
  z.strictObject({
    resistivity_ohm_m: above('covering resistivity', ' Ω·m', most.LARGEST_COVERING_RESISTIVITY_OHM_M),
    thickness_m: above('covering thickness', ' m', most.LARGEST_COVERING_THICKNESS_M),
    areas: areaList.optional(),
  }),
  'covering',
  'an object with resistivity_ohm_m, thickness_m and, where it does not lie in the touch area, areas',
);

const areas = told(
  z.strictObject({ touch: areaList.optional(), step: areaList.optional() }),
  'assessed areas',
  'an object with touch, step or both',
);

const tables = told(
  z.array(told(z.string().min(1), 'path of a table', 'a path within the study folder')),
  'list of conductor tables',
  `1 to ${most.MOST_TABLES} file names such as "conductors.csv"`,
);

/** A study whose keys are known, but not yet what they mean to each other. */
export interface StudyAsWritten extends Omit<Study, 'soil'> {
  readonly soil: {
    readonly layers?: readonly LayerInput[] | undefined;
    readonly survey?: string | undefined;
    readonly layer_count?: number | 'auto' | undefined;
  };
}

/** study.json, version 1, as this program can solve it; what keys mean to each other is judged apart. */
export const studySchema: z.ZodType<StudyAsWritten> = told(
  z.strictObject({
    format: told(z.literal('ohmstead-study'), 'format', '"ohmstead-study"'),
    version: told(z.literal(1), 'version of the format', 'the number 1'),
    title: label('title', most.LONGEST_TITLE),
    project: project.optional(),
    revisions: revisions.optional(),
    soil,
    seasons: told(
      z.array(season).max(most.MOST_SEASONS),
      'list of seasons',
      `at most ${most.MOST_SEASONS} seasons, each an object with name and layers, top or below`,
    ).optional(),
    surfacing: surfacing.optional(),
    metal_model: told(
      z.enum(['resistive', 'equipotential']),
      'model of the metal',
      '"resistive" or "equipotential"',
    ).optional(),
    conductors: tables.min(1).max(most.MOST_TABLES),
    electrodes: told(
      z.array(electrode).max(most.MOST_ELECTRODES),
      'list of electrodes',
      'a list of objects with name and role',
    ).optional(),
    cases: told(
      z.array(faultCase).min(1).max(most.MOST_CASES),
      'list of fault cases',
      `1 to ${most.MOST_CASES} fault cases`,
    ),
    limits,
    areas: areas.optional(),
    notes: notes.optional(),
    display_units: told(z.enum(['SI', 'US']), 'units shown', '"SI" or "US"').optional(),
  }),
  'study',
  'an object with format, version, title, soil, conductors, cases and limits',
);
