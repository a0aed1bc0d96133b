// Where a drawn point falls, in which order of precedence, and why.
import { describe, expect, test } from 'vitest';
import { snap } from '../../../src/plan/snap.ts';
import { item } from './items.ts';

const along = item('A', 0, 0, 10, 0);
const up = item('B', 4, -5, 4, 5);
const rod = item('R', 10, 0, 10, 0);
const items = [along, up, rod];
const near = { tolerance: 0.6, step: 0.5 };

describe('snap', () => {
  test('an end before the conductor that it ends, and before the grid', () => {
    expect(snap(items, [0.3, 0.4], near)).toEqual({ at: [0, 0], why: 'end of conductor A' });
    expect(snap(items, [4.1, 4.8], near)).toEqual({ at: [4, 5], why: 'end of conductor B' });
  });

  test('a rod by its name', () => {
    expect(snap([rod], [9.8, 0.3], near)).toEqual({ at: [10, 0], why: 'rod R' });
  });

  test('a crossing before the conductors that cross', () => {
    expect(snap(items, [4.4, 0.3], near)).toEqual({
      at: [4, 0],
      why: 'where conductor A and conductor B cross',
    });
  });

  test('lines that would only cross beyond their ends do not cross', () => {
    const apart = item('C', 20, 0.2, 20, 5);
    expect(snap([item('D', 0, 0, 19.8, 0), apart], [19.9, 0.1], { tolerance: 0.15, step: 0 }).why).toMatch(
      /^end of conductor [CD]$/,
    );
    expect(snap([along, item('E', 0, 1, 10, 1)], [5, 0.5], { tolerance: 0.6, step: 0 }).why).toBe(
      'on conductor A',
    );
  });

  test('a right angle before just anywhere on a conductor', () => {
    const options = { ...near, step: 0, from: [7, 3] as const };
    expect(snap(items, [7.2, 0.1], options)).toEqual({ at: [7, 0], why: 'square to conductor A' });
    expect(snap(items, [8.2, 0.1], options)).toEqual({ at: [8.2, 0], why: 'on conductor A' });
  });

  test('due east or north of the beginning, at whole steps', () => {
    const options = { ...near, from: [20.1, 20.1] as const };
    expect(snap(items, [27.3, 20.4], options)).toEqual({ at: [27.5, 20.1], why: 'due east or west' });
    expect(snap(items, [20.2, 26.9], options)).toEqual({ at: [20.1, 27], why: 'due north or south' });
  });

  test('on the grid without a reason, or where it is without a grid', () => {
    expect(snap(items, [22.3, -7.8], near)).toEqual({ at: [22.5, -8], why: undefined });
    expect(snap(items, [22.3, -7.8], { ...near, step: 0 })).toEqual({ at: [22.3, -7.8], why: undefined });
    // no digits of arithmetic, and no negative zero
    expect(snap([], [0.31, -0.01], { tolerance: 0.1, step: 0.1 }).at).toEqual([0.3, 0]);
  });
});
