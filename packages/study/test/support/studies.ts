// Studies for tests, built in memory from bars and layers: one case of one ampere unless said.
import { type Bar, conductorTable } from '../../../core/test/support/electrodes.ts';
import type { CaseInput, LoadedStudy, Study } from '../../src/index.ts';

export type Layers = readonly (readonly [resistivity: number, thickness?: number])[];

export interface StudyChoices {
  readonly cases?: readonly CaseInput[];
  readonly metal?: 'resistive' | 'equipotential';
  readonly areas?: Study['areas'];
  readonly seasons?: Study['seasons'];
  /** electrode of each bar; main where undefined */
  readonly electrodes?: readonly (string | undefined)[];
  readonly floating?: readonly string[];
}

export function studyOf(bars: readonly Bar[], layers: Layers, choices: StudyChoices = {}): LoadedStudy {
  const table = conductorTable(bars);
  return {
    study: {
      format: 'ohmstead-study',
      version: 1,
      title: 'test',
      soil: {
        layers: layers.map(([resistivity_ohm_m, thickness_m]) =>
          thickness_m === undefined ? { resistivity_ohm_m } : { resistivity_ohm_m, thickness_m },
        ),
      },
      metal_model: choices.metal ?? 'equipotential',
      conductors: ['conductors.csv'],
      electrodes: (choices.floating ?? []).map((name) => ({ name, role: 'floating' as const })),
      cases: choices.cases ?? [{ name: 'one ampere', grid_current_A: 1, duration_s: 0.5 }],
      limits: { basis: 'IEEE 80', body_mass_kg: 70 },
      areas: choices.areas,
      seasons: choices.seasons,
    },
    conductors: { ...table, electrode: bars.map((_, i) => choices.electrodes?.[i] ?? 'main') },
    origins: bars.map((_, i) => ({ file: 'conductors.csv', line: i + 2 })),
    notes: [],
    files: new Map(),
  };
}
