// Axes of conductors, and which of them are rods.
import { expect, test } from 'vitest';
import { conductorAxes, isRod, placeOn } from '../../src/geometry/conductor-axis.ts';
import { conductorTable, type Row, wire } from './conductor-rows.ts';

test('places on an axis: both ends exactly, the middle between', () => {
  const row: Row = { from: [0.1, 0.2, 0.3], to: [0.7, -1.1, 2.9] };
  const [axis] = conductorAxes(conductorTable([row]));
  expect(placeOn(axis!, 0)).toEqual(row.from);
  expect(placeOn(axis!, 1)).toEqual(row.to);
  expect(placeOn(axis!, 0.5).map((v) => v.toFixed(12))).toEqual([
    '0.400000000000',
    '-0.450000000000',
    '1.600000000000',
  ]);
  expect(axis!.length).toBeCloseTo(Math.sqrt(0.36 + 1.69 + 6.76), 12);
});

test('a rod is vertical within 10°, drawn downward or upward, wherever it starts', () => {
  const lean = (degrees: number, top: number): Row => ({
    from: [1, 1, top],
    to: [1, 1 + 3 * Math.tan((degrees * Math.PI) / 180), top + 3],
  });
  const upward = (row: Row): Row => ({ from: row.to, to: row.from });
  const rows = [
    lean(0, 0),
    lean(9.9, 0.5),
    upward(lean(9.9, 0.5)),
    lean(10.1, 0.5),
    lean(10.1, 5),
    wire(0, 0, 0.1, 0, 5),
  ];
  const table = conductorTable([...rows, wire(2, 2, 2, 2)]);
  expect(Array.from({ length: table.count }, (_, c) => isRod(table, c))).toEqual([
    true,
    true,
    true,
    false,
    false,
    false,
    false,
  ]);
});
