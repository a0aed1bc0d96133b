// Rows of a four-pin survey, checked: readings that can be used, and what is wrong or doubtful about rows.
import {
  apparentFromResistance,
  arrayKey,
  type FourPinArray,
  geometricFactor,
  overPins,
  pinDistances,
} from './arrays.ts';

/** One row as the field sheet gives it. */
export interface SurveyRow {
  /** the caller's number for it, e.g. the line of the file */
  readonly row: number;
  readonly array: FourPinArray;
  /** name of the line along which the pins stood; '' where it has none */
  readonly traverse: string;
  readonly quantity: 'apparent resistivity' | 'resistance';
  /** Ω·m or Ω */
  readonly value: number;
}

/** A row that can be used. */
export interface Reading {
  readonly row: number;
  readonly array: FourPinArray;
  readonly traverse: string;
  /** Ω·m, greater than 0 */
  readonly apparentResistivity: number;
}

/** Something about a row, in words. */
export interface RowFinding {
  readonly row: number;
  /** stable word for programs */
  readonly code: 'spacing' | 'pin-depth' | 'null-array' | 'value' | 'deep-pins' | 'repeated-row';
  /** lower case: the quantity's trade name, the value, what was expected */
  readonly message: string;
}

export interface CheckedRows {
  /** in the order of the rows */
  readonly readings: readonly Reading[];
  /** rows that gave no reading, each with every reason */
  readonly faults: readonly RowFinding[];
  /** rows that were used, with a doubt */
  readonly cautions: readonly RowFinding[];
}

/** Pin depth over spacing up to which the short formula 2πaR holds within 0.5 % (IEEE Std 81: b ≤ a/20, from memory). */
export const DEEP_PINS: number = 1 / 20;
/** Σ±1/r over the largest 1/r, below which M and N see one potential and the reading tells nothing. */
const NULL_ARRAY = 1e-6;

/** Readings of a survey, with every fault and doubt told by row; no row is dropped in silence. */
export function checkRows(rows: readonly SurveyRow[]): CheckedRows {
  const readings: Reading[] = [];
  const faults: RowFinding[] = [];
  const cautions: RowFinding[] = [];
  const seen = new Map<string, number>();
  for (const row of rows) {
    const wrong = [...arrayFaults(row), ...valueFaults(row)];
    faults.push(...wrong);
    if (wrong.length > 0) continue;
    readings.push({
      row: row.row,
      array: row.array,
      traverse: row.traverse,
      apparentResistivity:
        row.quantity === 'resistance' ? apparentFromResistance(row.array, row.value) : row.value,
    });
    cautions.push(...deepPins(row));
    const same = JSON.stringify([
      arrayKey(row.array),
      row.array.pinDepth,
      row.traverse,
      row.quantity,
      row.value,
    ]);
    const first = seen.get(same);
    if (first === undefined) seen.set(same, row.row);
    else
      cautions.push({
        row: row.row,
        code: 'repeated-row',
        message: `repeats row ${first} to the last digit; both are used, as two readings`,
      });
  }
  return { readings, faults, cautions };
}

function arrayFaults({ row, array }: SurveyRow): RowFinding[] {
  const found: RowFinding[] = [];
  const spacing = (message: string): void => {
    found.push({ row, code: 'spacing', message });
  };
  switch (array.kind) {
    case 'wenner':
      if (!isPositive(array.spacing)) spacing(`spacing: ${array.spacing} m is not a positive length`);
      break;
    case 'schlumberger':
      if (!isPositive(array.halfCurrent)) spacing(`AB/2: ${array.halfCurrent} m is not a positive length`);
      if (!isPositive(array.halfPotential))
        spacing(`MN/2: ${array.halfPotential} m is not a positive length`);
      if (array.halfPotential >= array.halfCurrent)
        spacing(`MN/2: ${array.halfPotential} m is not less than AB/2, ${array.halfCurrent} m`);
      break;
    case 'collinear': {
      const pins = [...array.currentPins, ...array.potentialPins];
      if (!pins.every(Number.isFinite)) spacing(`pin positions: ${pins.join(', ')} m are not all numbers`);
      else if (new Set(pins).size < 4)
        spacing(`pin positions: ${pins.join(', ')} m are not four different places`);
      break;
    }
  }
  const depth = array.pinDepth;
  if (!(depth >= 0 && Number.isFinite(depth)))
    found.push({ row, code: 'pin-depth', message: `pin depth: ${depth} m is not a length of 0 or more` });
  if (found.length > 0) return found;
  const { distance, sign } = pinDistances(array);
  const shortest = Math.min(...distance);
  if (depth >= shortest)
    found.push({
      row,
      code: 'pin-depth',
      message: `pin depth: ${depth} m is not less than the distance between pins, ${shortest} m`,
    });
  const inverse = distance.reduce((sum, r, i) => sum + sign[i]! / r, 0);
  if (Math.abs(inverse) * shortest < NULL_ARRAY)
    found.push({
      row,
      code: 'null-array',
      message: 'potential pins stand where uniform ground has one potential: the reading tells nothing',
    });
  return found;
}

function valueFaults(row: SurveyRow): RowFinding[] {
  const unit = row.quantity === 'resistance' ? 'Ω' : 'Ω·m';
  const wrong = (message: string): RowFinding[] => [{ row: row.row, code: 'value', message }];
  if (!Number.isFinite(row.value)) return wrong(`${row.quantity}: ${row.value} is not a number`);
  if (row.quantity === 'apparent resistivity' || row.array.kind !== 'collinear')
    return row.value > 0 ? [] : wrong(`${row.quantity}: ${row.value} ${unit} is not positive`);
  // the sign that the places of the pins give
  const factor = geometricFactor(row.array);
  if (factor * row.value > 0 || !Number.isFinite(factor)) return [];
  const expected = factor > 0 ? 'positive' : 'negative';
  return wrong(`resistance: ${row.value} Ω is not ${expected}, as the places of the pins ask`);
}

function deepPins({ row, array, quantity }: SurveyRow): RowFinding[] {
  const shortest = Math.min(...pinDistances(array).distance);
  if (array.pinDepth <= DEEP_PINS * shortest) return [];
  const shortOverFull = (4 * Math.PI) / overPins(array, (r) => 2 / r) / geometricFactor(array);
  const how =
    quantity === 'resistance'
      ? `the full formula is used, ${(100 * (1 / shortOverFull - 1)).toFixed(1)} % above the short one`
      : `the value is taken as worked out with the full formula; the short one gives ${(100 * (1 - shortOverFull)).toFixed(1)} % less`;
  const message = `pin depth: ${array.pinDepth} m is more than a twentieth of the distance between pins, ${shortest} m; ${how}`;
  return [{ row, code: 'deep-pins', message }];
}

function isPositive(value: number): boolean {
  return value > 0 && Number.isFinite(value);
}
