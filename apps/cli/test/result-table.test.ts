// The table for people: answer first, aligned, within the width, honest about what is undecided.
import { loadStudy, type Results, sourceFromMap } from '@ohmstead/study';
import { expect, test } from 'vitest';
import { exampleSolve } from '../../../packages/pack/test/example.ts';
import { resultTable } from '../src/result-table.ts';
import { fence } from './double.ts';
import { RODS_CSV, STUDY_JSON } from './study-folder.ts';

const bytes = (text: string): Uint8Array => new TextEncoder().encode(text);
const example: Results = exampleSolve(
  loadStudy(
    sourceFromMap(
      new Map([
        ['study.json', bytes(STUDY_JSON)],
        ['tables/rods.csv', bytes(RODS_CSV)],
      ]),
    ),
  ),
).results;
const plain = (text: string): string => text;
const [only] = example.cases;

test('the whole table', () => {
  expect(resultTable(example, plain)).toBe(`Two rods
The case exceeds a limit. Farthest beyond: touch voltage, only, 900.1 ± 1.0 V, 113 % of the limit of
800.0 V.

Soil        uniform, 100 Ω·m
Electrode   33.30 ± 0.10 Ω to remote earth; 3.000 m of metal, 1 rod, 10 segments
Limits      IEEE 80, 70 kg; covering factor 1.00

only: 100.0 A into the ground for 0.5 s; ground potential rise (GPR) 3338 ± 10 V
                 worst  at                limit  of limit
  touch  900.1 ± 1.0 V  (0.50, 0.00) m  800.0 V     113 %  EXCEEDS
  step   300.0 ± 1.0 V  (0.50, 0.00) m   2700 V      11 %  within

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
  expect(table).toContain('touch at long name …');
});

test('what exceeds stands out where the terminal can', () => {
  const table = resultTable(example, (text) => `<${text}>`);
  expect(table).toMatch(/^<Two rods>\n/);
  expect(table.match(/<EXCEEDS>/g)).toHaveLength(1);
});
