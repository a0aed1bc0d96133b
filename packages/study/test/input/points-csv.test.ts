// points.csv: points in metres, the surface where no depth is given.
import { describe, expect, test } from 'vitest';
import { loadPoints } from '../../src/input/points-csv.ts';
import { sourceFromMap } from '../../src/input/source.ts';
import { bytesOf, faultLinesOf } from './folder-source.ts';

function points(text: string): ReturnType<typeof loadPoints> {
  return loadPoints(sourceFromMap(new Map([['points.csv', bytesOf(text)]])), 'points.csv');
}

describe('points.csv', () => {
  test('is read in any unit and order of columns', () => {
    const table = points('depth_cm,y_m,x_ft\n50,2,10\n,3,-10\n');
    expect(table.count).toBe(2);
    expect([...table.x]).toEqual([3.048, -3.048]);
    expect([...table.y]).toEqual([2, 3]);
    expect([...table.depth]).toEqual([0.5, 0]);
    expect(table.notes).toEqual([
      {
        code: 'units-converted',
        message: 'converted to SI units: points.csv: depth_cm (centimetre), x_ft (international foot)',
      },
    ]);
  });

  test('lies on the surface without a column of depths', () => {
    expect([...points('x_m,y_m\n1,2\n3,4\n').depth]).toEqual([0, 0]);
  });

  test.each([
    ['', ['points.csv:1: the table is empty; expected a header row and rows under it']],
    ['x_m\n1\n', ['points.csv:1: y_m: the column is missing; expected y of the point']],
    [
      'x_m,y_m,depth_m\n1,a,-1\n,2,0\n',
      [
        'points.csv:2: y_m: a is not a number; expected a plain decimal number such as 12.5',
        'points.csv:2: depth_m: -1 is above the soil surface; depths are positive downward',
        'points.csv:3: x_m: the cell is empty; expected a plain decimal number such as 12.5',
      ],
    ],
    [
      'x_m,y_parsec\n1,2\n',
      [
        'points.csv:1: y_parsec: parsec is not a unit of length known here; known are _m, _dm, _cm, _mm, _km, _in, _ft, _yd and _us_ft',
      ],
    ],
  ])('is refused: %j', (text, lines) => {
    expect(faultLinesOf(() => points(text))).toEqual(lines);
  });

  test('is refused where there is no such file', () => {
    expect(faultLinesOf(() => loadPoints(sourceFromMap(new Map()), 'points.csv'))).toEqual([
      'points.csv: no such file in the study folder',
    ]);
  });
});
