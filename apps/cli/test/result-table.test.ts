// The table for people: answer first, aligned, within the width, honest about what is undecided.
import { loadStudy, type Results, sourceFromMap } from '@ohmstead/study';
import { expect, test } from 'vitest';
import { resultTable } from '../src/result-table.ts';
import { exampleFit, exampleResults, fence } from './double.ts';
import { RODS_CSV, STUDY_JSON } from './study-folder.ts';

const bytes = (text: string): Uint8Array => new TextEncoder().encode(text);
const example: Results = exampleResults(
  loadStudy(
    sourceFromMap(
      new Map([
        ['study.json', bytes(STUDY_JSON)],
        ['tables/rods.csv', bytes(RODS_CSV)],
      ]),
    ),
  ),
);
const plain = (text: string): string => text;
const [only] = example.cases;

test('the whole table', () => {
  expect(resultTable(example, plain)).toBe(`Two rods
The case exceeds a limit. Farthest beyond: touch voltage, only, 900.1 ± 1.0 V, 113 % of the limit of
800 V.

Soil        uniform, 100 Ω·m
Electrode   33.30 ± 0.10 Ω to remote earth; 3.000 m of metal, 1 rod, 10 segments
Limits      IEEE 80, 70 kg; covering factor 1.00

only: 100 A into the ground for 0.5 s; ground potential rise (GPR) 3338 ± 10 V
                 worst  at             limit  of limit
  touch  900.1 ± 1.0 V  (0.5, 0.0) m   800 V     113 %  EXCEEDS
  step   300.0 ± 1.0 V  (0.5, 0.0) m  2700 V      11 %  within

Checks      current balance 1e-12, residual 1e-13, both relative
Assumed     0 assumptions, 0 joints snapped; listed by --json and in the review pack
Warnings    none
Mind        ± is the numerical uncertainty alone. These are results of a calculation from the inputs
            given (Ohmstead 1.2.3); whether the installation is acceptable is for local codes and
            licensed practice to decide.
`);
});

test('names are cut and cleaned, and no line is wider than 100', () => {
  const name = `${'long name '.repeat(12)}\u001b[31m`;
  const table = resultTable(
    {
      ...example,
      title: name,
      cases: [
        {
          ...only,
          name,
          gpr_V: 1e6,
          touch: {
            ...only.touch,
            worst_V: 123456.7,
            uncertainty_V: 0.04,
            x_m: -12345.678,
            y_m: -12345.678,
            limit_V: 123456,
          },
        },
      ],
      electrodes: [{ ...fence, name }],
      warnings: Array.from({ length: 30 }, (_, i) => ({ code: `some-warning-${i}`, message: 'm' })),
    },
    plain,
  );
  expect(Math.max(...table.split('\n').map((line) => [...line].length))).toBeLessThanOrEqual(100);
  expect(table).not.toContain('\u001b');
  expect(table).toMatch(/^ {2}touch at long name long[^\n]*… {2}/m);
  // numbers are never cut
  expect(table).toContain('123.457 ± 0.001 kV  (-12345.7, -12345.7) m  123.5 kV');
});

test('what exceeds stands out where the terminal can', () => {
  const table = resultTable(example, (text) => `<${text}>`);
  expect(table).toMatch(/^<Two rods>\n/);
  expect(table.match(/<EXCEEDS>/g)).toHaveLength(1);
});

const wet = { ...only.touch, worst_V: 500, limit_V: 1000, within_limit: true, margin_percent: 50 };
const dry = { ...only.touch, worst_V: 2000, limit_V: 1600, margin_percent: -25, x_m: 7 };
const seasonal: Results = {
  ...example,
  seasons: [
    { season: 'wet spring\u001b', touch: wet, gpr_V: 1000 },
    { season: 'dry', touch: dry, gpr_V: 9000 },
  ].map(({ season, touch, gpr_V }) => ({
    name: season,
    layers: [],
    covering_factor: 1,
    resistance_ohm: gpr_V / 100,
    resistance_uncertainty_ohm: 0.1,
    segment_count: 9,
    cases: [{ name: 'only', grid_current_A: 100, gpr_V, gpr_uncertainty_V: 10, touch, step: only.step }],
  })),
  envelope: [
    {
      name: 'only',
      gpr: { season: 'dry', gpr_V: 9000 },
      touch: { ...dry, season: 'dry' },
      step: { ...only.step, season: 'as given' },
    },
  ],
};

test('other seasons: each in a line, what governs among the comparisons and in the answer', () => {
  const table = resultTable(seasonal, plain);
  expect(table).toContain(
    'Farthest beyond: touch voltage, dry, only, 2000.0 ± 1.0 V, 125 % of the\nlimit of 1600 V.',
  );
  expect(table).toContain('  touch, dry  2000.0 ± 1.0 V  (7.0, 0.0) m  1600 V     125 %  EXCEEDS\n');
  expect(table).toContain(`Other seasons
                          resistance  touch of limit  step of limit
  wet spring<U+001B>  10.00 ± 0.10 Ω            50 %           11 %
  dry                 90.00 ± 0.10 Ω           125 %           11 %
Governing   only: touch dry, step as given, rise dry

Checks `);
});

test('the worst case of a season stands for it', () => {
  const [spring] = seasonal.seasons;
  const two = { ...spring, cases: [...spring.cases, { ...spring.cases[0], touch: dry }] };
  expect(resultTable({ ...seasonal, seasons: [two] }, plain)).toMatch(/Ω +125 % +11 %\n/);
});

test('a soil fitted to readings: how well, and what that leaves open', () => {
  const ground = {
    fit: exampleFit,
    consequence: {
      resistance_ohm: { best: 33.3, low: 31.234, median: 33, high: 36.789 },
      cases: [],
    },
  };
  const soil = {
    layers: [
      { resistivity_ohm_m: 123.456789, thickness_m: 1.23456789 },
      { resistivity_ohm_m: 45.6789, thickness_m: null },
    ],
  };
  const table = resultTable({ ...example, ground, soil }, plain);
  expect(table).toContain(`
Soil        1.23 m of 123 Ω·m, 45.7 Ω·m below
Ground      2 layers fitted to survey.csv, misfit 4.6 % rms, converged; over the soils that the
            readings allow the resistance is 31.2 to 36.8 Ω (5 to 95 %)
Electrode `);
});
