import { describe, expect, it } from 'vitest';
import type { FourPinArray } from '../../src/survey/arrays.ts';
import { checkRows, type RowFinding, type SurveyRow } from '../../src/survey/readings.ts';

function row(
  array: FourPinArray,
  value: number,
  quantity: SurveyRow['quantity'] = 'apparent resistivity',
): SurveyRow {
  return { row: 5, array, traverse: 'A', quantity, value };
}

const wenner = (spacing: number, pinDepth = 0): FourPinArray => ({ kind: 'wenner', spacing, pinDepth });
const line = (a: number, b: number, m: number, n: number): FourPinArray => ({ kind: 'collinear', currentPins: [a, b], potentialPins: [m, n], pinDepth: 0 }); // biome-ignore format: one row

const faultsOf = (one: SurveyRow): readonly RowFinding[] => checkRows([one]).faults;

describe('rows of a survey', () => {
  it('become readings, resistance by way of the geometric factor', () => {
    const { readings, faults, cautions } = checkRows([
      row(wenner(2), 123.4),
      { row: 6, array: wenner(2), traverse: 'B', quantity: 'resistance', value: 10 },
    ]);
    expect(faults).toEqual([]);
    expect(cautions).toEqual([]);
    expect(readings.map((reading) => [reading.row, reading.traverse])).toEqual([
      [5, 'A'],
      [6, 'B'],
    ]);
    expect(readings[0]!.apparentResistivity).toBe(123.4);
    expect(readings[1]!.apparentResistivity).toBeCloseTo(40 * Math.PI, 10);
  });

  it.each([
    [row(wenner(2), 0), 'value', 'apparent resistivity: 0 Ω·m is not positive'],
    [row(wenner(2), -3, 'resistance'), 'value', 'resistance: -3 Ω is not positive'],
    [row(wenner(2), Number.NaN), 'value', 'apparent resistivity: NaN is not a number'],
    [row(wenner(2), Number.POSITIVE_INFINITY), 'value', 'apparent resistivity: Infinity is not a number'],
    [row(wenner(-1), 5), 'spacing', 'spacing: -1 m is not a positive length'],
    [row(wenner(2, -0.1), 5), 'pin-depth', 'pin depth: -0.1 m is not a length of 0 or more'],
    [
      row(wenner(0.5, 0.5), 5),
      'pin-depth',
      'pin depth: 0.5 m is not less than the distance between pins, 0.5 m',
    ],
    [
      row({ kind: 'schlumberger', halfCurrent: 1, halfPotential: 2, pinDepth: 0 }, 5),
      'spacing',
      'MN/2: 2 m is not less than AB/2, 1 m',
    ],
    [
      row({ kind: 'schlumberger', halfCurrent: 1, halfPotential: 0, pinDepth: 0 }, 5),
      'spacing',
      'MN/2: 0 m is not a positive length',
    ],
    [row(line(0, 3, 3, 5), 5), 'spacing', 'pin positions: 0, 3, 3, 5 m are not four different places'],
    [row(line(0, 3, Number.NaN, 5), 5), 'spacing', 'pin positions: 0, 3, NaN, 5 m are not all numbers'],
    [
      row(line(0, 1, 2, 3), 5, 'resistance'),
      'value',
      'resistance: 5 Ω is not negative, as the places of the pins ask',
    ],
  ] as const)('with a wrong number give no reading and say why: %#', (one, code, message) => {
    // biome-ignore format: one row a case
    expect(checkRows([one]).readings).toEqual([]);
    expect(faultsOf(one)).toEqual([{ row: 5, code, message }]);
  });

  it('whose potential pins see one potential are told so', () => {
    // 1/AM − 1/BM = 1/AN − 1/BN: M and N at mirrored places on either side, seen from between A and B
    const [fault] = faultsOf(row(line(0, 2, 1, 1e9), 5, 'resistance'));
    expect(fault).toMatchObject({ code: 'null-array' });
  });

  it('tell every fault of a row, and every row', () => {
    const faults = checkRows([row(wenner(-2, -1), -5), { ...row(wenner(0), 7), row: 9 }]).faults;
    expect(faults.map((fault) => [fault.row, fault.code])).toEqual([
      [5, 'spacing'],
      [5, 'pin-depth'],
      [5, 'value'],
      [9, 'spacing'],
    ]);
  });

  it('with pins deeper than a twentieth of the spacing are used and doubted', () => {
    const { readings, cautions } = checkRows([
      row(wenner(1, 0.05), 100),
      { ...row(wenner(1, 0.1), 10, 'resistance'), row: 6 },
      { ...row(wenner(1, 0.1), 100), row: 7 },
    ]);
    expect(readings.length).toBe(3);
    expect(cautions.map((caution) => [caution.row, caution.code])).toEqual([
      [6, 'deep-pins'],
      [7, 'deep-pins'],
    ]);
    // 1.01723 of the short formula (IEEE Std 81, independent computation)
    expect(cautions[0]!.message).toContain('the full formula is used, 1.7 % above the short one');
    expect(cautions[1]!.message).toContain('the short one gives 1.7 % less');
  });

  it('that repeat another to the last digit are used as a second reading and doubted', () => {
    const same = row(wenner(3), 88);
    const { readings, cautions } = checkRows([same, { ...same, row: 6 }, { ...same, row: 7, traverse: 'B' }]);
    expect(readings.length).toBe(3);
    expect(cautions).toEqual([
      {
        row: 6,
        code: 'repeated-row',
        message: 'repeats row 5 to the last digit; both are used, as two readings',
      },
    ]);
  });
});
