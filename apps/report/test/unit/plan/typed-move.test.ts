// Ends of lines that are typed, and what is said of those that are none.
import { describe, expect, test } from 'vitest';
import { typedEnd } from '../../../src/plan/typed-move.ts';

function endOf(text: string, units: 'SI' | 'US' = 'SI'): readonly [number, number] {
  const end = typedEnd(text, [1, 2], [1, 10], units);
  if ('complaint' in end) throw new Error(end.complaint);
  return end.at;
}

function complaintOf(text: string): string {
  const end = typedEnd(text, [1, 2], [1, 2], 'SI');
  return 'complaint' in end ? end.complaint : `${end.at}`;
}

describe('typed ends', () => {
  test('a length goes where the pointer is', () => {
    expect(endOf('12 m')).toEqual([1, 14]);
    expect(endOf('12')).toEqual([1, 14]);
    expect(endOf('120 cm')).toEqual([1, 3.2]);
  });

  test('a length at an angle north of east', () => {
    const [x, y] = endOf('12 m @ 30');
    // sin 30° is one half
    expect(y).toBeCloseTo(2 + 6, 12);
    expect(x).toBeCloseTo(1 + 6 * Math.sqrt(3), 12);
    expect(endOf('5@180')[0]).toBeCloseTo(-4, 12);
    expect(endOf('5 @ \u221290°')[1]).toBeCloseTo(-3, 12);
  });

  test('so far east and so far north', () => {
    expect(endOf('12 m; \u22125 m')).toEqual([13, -3]);
    expect(endOf('0.5; 0')).toEqual([1.5, 2]);
  });

  test('feet where feet are displayed', () => {
    // one foot is 0.3048 m exactly: NIST SP 811 (2008), B.6
    expect(endOf('10', 'US')[1]).toBeCloseTo(2 + 3.048, 12);
  });

  test.each([
    ['twelve', /twelve/],
    ['12 kg', /kg/],
    ['12 @ north', /^north is no angle; expected degrees north of east, such as 30$/],
    ['12 @', / is no angle/],
    ['x; 3', /x/],
    ['3; y', /y/],
    ['12', /^the direction is not told; point somewhere, or add @ and an angle$/],
  ])('%s is complained of', (text, complaint) => {
    expect(complaintOf(text)).toMatch(complaint);
  });
});
