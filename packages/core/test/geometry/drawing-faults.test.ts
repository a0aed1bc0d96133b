// What cannot be right in a drawing of conductors, and the words for it.
import { describe, expect, test } from 'vitest';
import { joinConductors } from '../../src/geometry/joints.ts';
import { conductorTable, type Row, rod, wire } from './conductor-rows.ts';

function faults(...rows: Row[]): (readonly [number, string, number | undefined, string])[] {
  const { faults: found } = joinConductors(conductorTable(rows));
  return found.map(({ conductor, code, other, message }) => [conductor, code, other, message]);
}

describe('conductors on top of each other', () => {
  test('a partial overlap tells its length and place', () => {
    expect(faults(wire(0, 3.5, 10, 3.5), wire(6.8, 3.5, 20, 3.5))).toEqual([
      [1, 'overlap', 0, 'overlaps c1 over 3.20 m, from (6.80, 3.50) m to (10.00, 3.50) m'],
    ]);
  });

  test('up to two contact distances past the joint is still the joint', () => {
    // 5 mm wires: contact distance 15 mm
    expect(faults(wire(0, 0, 10.029, 0), wire(10, 0, 20, 0))).toEqual([]);
    expect(faults(wire(0, 0, 10.031, 0), wire(10, 0, 20, 0)).map(([, code]) => code)).toEqual(['overlap']);
  });

  test('a conductor that spreads from another tells the largest distance within contact', () => {
    // 10 mm a metre: 15 mm after 1.5 m
    expect(faults(wire(0, 0, 10, 0), wire(0, 0, 10, 0.1))[0]![3]).toMatch(
      /^runs within 15 mm of c1 over 1\.50 m/,
    );
  });

  test('a conductor beside another within contact tells the distance', () => {
    expect(faults(wire(0, 0, 10, 0), wire(2, 0.004, 9, 0.004))).toEqual([
      [1, 'overlap', 0, 'runs within 4 mm of c1 over 7.00 m, from (2.00, 0.00) m to (9.00, 0.00) m'],
    ]);
  });

  test('beside each other without contact is no fault', () => {
    expect(faults(wire(0, 0, 10, 0), wire(2, 0.016, 9, 0.016))).toEqual([]);
  });

  test('a crossing flatter than 5.7° lies on top, one of 6° crosses', () => {
    const crossing = (degrees: number): Row => {
      const rise = 5 * Math.tan((degrees * Math.PI) / 180);
      return wire(0, -rise, 10, rise);
    };
    expect(faults(wire(0, 0, 10, 0), crossing(6))).toEqual([]);
    // within 15 mm on 2·0.015/sin 5° of the first, that is 2·0.015/tan 5° of the second's foot on it
    expect(faults(wire(0, 0, 10, 0), crossing(5))[0]![3]).toMatch(/^runs within 15 mm of c1 over 0\.34 m/);
  });

  test('two conductors that leave one joint at 3° lie on top of each other', () => {
    const rise = 5 * Math.tan((3 * Math.PI) / 180);
    expect(faults(wire(0, 0, 5, 0), wire(0, 0, 5, rise))[0]!.slice(0, 3)).toEqual([1, 'overlap', 0]);
  });

  test('a repeated row is told, in either direction', () => {
    expect(faults(wire(0, 0, 10, 0), wire(3, -1, 3, 1), wire(0, 0, 10, 0))).toEqual([
      [2, 'duplicate', 0, 'repeats c1'],
    ]);
    expect(faults(wire(0, 0, 10, 0), wire(10, 0, 0, 0))).toEqual([
      [1, 'duplicate', 0, 'repeats c1 in the opposite direction'],
    ]);
  });

  test('a row that is there three times is told twice', () => {
    expect(
      faults(wire(0, 0, 10, 0), wire(0, 0, 10, 0), wire(0, 0, 10, 0)).map(([c, , other]) => [c, other]),
    ).toEqual([
      [1, 0],
      [2, 0],
    ]);
  });

  test('a heap of thousands of conductors on top of each other is told without looking at every pair', () => {
    const heap = Array.from({ length: 3000 }, (_, i) => wire(i * 1e-3, 0, 10 + i * 1e-3, 0));
    const told = faults(...heap).length;
    expect(told).toBeGreaterThanOrEqual(2000);
    expect(told).toBeLessThan(10_000);
  });

  test('a repeated insulated row is told, an insulated conductor between the same ends as a bare one is not', () => {
    const jacket = { ...wire(0, 0, 10, 0), insulated: true };
    expect(faults(jacket, jacket)).toEqual([[1, 'duplicate', 0, 'repeats c1']]);
    expect(faults(wire(0, 0, 10, 0), jacket)).toEqual([]);
  });

  test('a short conductor inside a long one overlaps it', () => {
    expect(faults(wire(0, 0, 10, 0), wire(5, 0, 5.02, 0)).map(([, code]) => code)).toEqual(['overlap']);
  });
});

describe('conductors wrong by themselves', () => {
  test('no longer than its own diameter', () => {
    expect(faults(wire(1, 2, 1, 2))).toEqual([
      [0, 'zero-length', undefined, 'length 0 mm is not greater than the diameter 10 mm'],
    ]);
    expect(faults(wire(1, 2, 1.0096, 2)).map(([, code]) => code)).toEqual(['zero-length']);
    expect(faults(wire(1, 2, 1.0104, 2))).toEqual([]);
  });

  test('above the surface at one end', () => {
    expect(faults({ from: [0, 0, 0.5], to: [4, 0, -0.25] })).toEqual([
      [
        0,
        'above-surface',
        undefined,
        'stands 0.25 m above the surface at (4.00, 0.00) m; depth is positive downward',
      ],
    ]);
  });

  test('shallower than its own radius', () => {
    expect(faults(wire(0, 0, 10, 0, 0.003))).toEqual([
      [0, 'depth-below-radius', undefined, 'depth 3 mm at (0.00, 0.00) m is less than the radius 5 mm'],
    ]);
    expect(faults({ from: [0, 0, 0.5], to: [4, 0, 0.0045] })[0]![3]).toBe(
      'depth 4.5 mm at (4.00, 0.00) m is less than the radius 5 mm',
    );
    expect(faults(wire(0, 0, 10, 0, 0.005))).toEqual([]);
  });

  test('a rod may start at the surface, leaning up to 10°', () => {
    const leaning = (degrees: number): Row => ({
      from: [0, 0, 0],
      to: [3 * Math.tan((degrees * Math.PI) / 180), 0, 3],
    });
    expect(faults(rod(0, 0, 0))).toEqual([]);
    expect(faults(leaning(9.9))).toEqual([]);
    expect(faults(leaning(10.1)).map(([, code]) => code)).toEqual(['depth-below-radius']);
  });

  test('every fault is told, in the order of the rows', () => {
    const codes = faults(
      wire(0, 0, 10, 0, -1),
      wire(0, 5, 10, 5),
      wire(1, 1, 1, 1),
      wire(0, 5, 10, 5),
      wire(0, 9, 9, 9, 0),
    );
    expect(codes.map(([conductor, code]) => `${conductor} ${code}`)).toEqual([
      '0 above-surface',
      '2 zero-length',
      '3 duplicate',
      '4 depth-below-radius',
    ]);
  });
});
