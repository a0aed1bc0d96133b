// The answer in words for every mix of cases within, beyond and undecided.
import { loadStudy, type Results, sourceFromMap } from '@ohmstead/study';
import { expect, test } from 'vitest';
import { exampleSolve } from '../../../packages/pack/test/example.ts';
import { answer, verdictRows } from '../src/verdict.ts';
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

/** Worst touch voltages by case, each ± 1 V against a limit of 800 V. */
function withTouch(...volts: readonly number[]): Results {
  const [only] = example.cases;
  return { ...example, cases: volts.map((worst_V) => ({ ...only, touch: { ...only.touch, worst_V } })) };
}

test.each([
  [[900], 'The case exceeds a limit.'],
  [[700], 'The case is within its limits.'],
  [[800.5], 'The case cannot be decided at this mesh.'],
  [[900, 700, 700], 'One of three cases exceeds a limit.'],
  [[900, 900, 700], 'Two of three cases exceed a limit.'],
  [[900, 900], 'Both cases exceed a limit.'],
  [[900, 799.5, 700], 'One of three cases exceeds a limit; one more cannot be decided at this mesh.'],
  [[800, 700, 700], 'One of three cases cannot be decided at this mesh; the others are within the limits.'],
  [[800, 700], 'One of two cases cannot be decided at this mesh; the other is within the limits.'],
  [[800, 800], 'Both cases cannot be decided at this mesh.'],
  [[700, 700, 700, 700], 'All four cases are within their limits.'],
  [Array(20).fill(900), 'All 20 cases exceed a limit.'],
])('touch voltages %j', (volts, words) => {
  expect(answer(withTouch(...volts))).toBe(words);
});

test('the margin must be as large as the uncertainty to decide', () => {
  const findings = [798.9, 799, 799.1, 800.9, 801, 801.1].map((v) => verdictRows(withTouch(v))[0].finding);
  expect(findings).toEqual(['within', 'within', 'undecided', 'undecided', 'beyond', 'beyond']);
});

test('floating metal is held against the limit of touch, with both uncertainties', () => {
  const rows = verdictRows({ ...example, electrodes: [fence, { ...fence, touch_ratio: null }] });
  expect(rows).toHaveLength(3);
  const [{ gpr_V, gpr_uncertainty_V }] = example.cases;
  expect(rows[2]).toEqual({
    at: 0,
    subject: 'touch at fence',
    worst: 0.4 * gpr_V,
    uncertainty: 0.001 * gpr_V + 0.4 * gpr_uncertainty_V,
    limit: 800,
    x: 1,
    y: 2,
    finding: 'beyond',
  });
});
