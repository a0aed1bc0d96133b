import { describe, expect, it } from 'vitest';
import { soundingOf, traversesOf } from '../../src/survey/sounding.ts';
import { wennerReadings } from '../support/surveys.ts';

const north = wennerReadings([2, 1, 14], [200, 100, 50], 0, 'north');
const south = wennerReadings([1, 2], [400, 50], 0.02, 'south');

describe('a sounding', () => {
  it('has the geometric mean and the scatter of each spacing, pins alike but for their depth together', () => {
    const { points, scatter } = soundingOf([...north, ...south]);
    expect(points.map((point) => point.spacing)).toEqual([1, 2, 14]);
    expect(points[0]!.geometricMean).toBeCloseTo(200, 10);
    expect(points[1]!.geometricMean).toBeCloseTo(100, 10);
    expect([points[0]!.least, points[0]!.most]).toEqual([100, 400]);
    // ±ln 2 about the mean, one degree of freedom
    expect(points[0]!.scatter).toBeCloseTo(Math.SQRT2 * Math.LN2, 10);
    expect(points[2]!.scatter).toBeUndefined();
    expect(scatter).toBeCloseTo(Math.SQRT2 * Math.LN2, 10);
    expect(points[1]!.rows).toEqual([2, 3]);
  });

  it('has no scatter where nothing was read twice', () => {
    expect(soundingOf(north).scatter).toBeUndefined();
  });

  it('keeps kinds of array apart', () => {
    const pins = { kind: 'schlumberger', halfCurrent: 1, halfPotential: 0.1, pinDepth: 0 } as const;
    const other = { row: 9, array: pins, traverse: '', apparentResistivity: 7 };
    expect(soundingOf([...north, other]).points.map((point) => point.array.kind)).toEqual([
      'schlumberger',
      'wenner',
      'wenner',
      'wenner',
    ]);
  });
});

describe('traverses', () => {
  it('are told by name with their mean shift from the geometric mean of all, over spacings that another read too', () => {
    const doubled = wennerReadings([1, 2, 8], [200, 400, 30], 0, 'doubled');
    const [first, second] = traversesOf([...north, ...doubled]);
    expect([first!.name, second!.name]).toEqual(['doubled', 'north']);
    expect(first!.shift).toBeCloseTo(Math.LN2 / 2, 10);
    expect(second!.shift).toBeCloseTo(-Math.LN2 / 2, 10);
    expect(second!.shared).toBe(2);
    expect(second!.readings).toEqual(north);
  });

  it('that stand alone have no shift', () => {
    expect(traversesOf(north)).toEqual([{ name: 'north', readings: north, shift: 0, shared: 0 }]);
  });
});
