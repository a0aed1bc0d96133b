// What lies under a place or within a rectangle.
import { describe, expect, test } from 'vitest';
import { itemAt, itemsIn, nearestOn, nearestOnLine } from '../../../src/plan/hit.ts';
import { item } from './items.ts';

const along = item('A', 0, 0, 10, 0);
const up = item('B', 4, -5, 4, 5);
const rod = item('R', 10, 0, 10, 0);

describe('hit', () => {
  test('the nearest place is the foot of the perpendicular, or an end', () => {
    expect(nearestOnLine([0, 0], [10, 0], [3, 4])).toEqual({ at: [3, 0], distance: 4 });
    expect(nearestOnLine([0, 0], [10, 0], [13, 4])).toEqual({ at: [10, 0], distance: 5 });
    expect(nearestOnLine([2, 2], [2, 2], [5, 6])).toEqual({ at: [2, 2], distance: 5 });
    expect(nearestOn(up, [7, 20])).toEqual({ at: [4, 5], distance: Math.hypot(3, 15) });
  });

  test('the nearer of two conductors is hit, and none beyond the reach', () => {
    expect(itemAt([along, up], [4.3, 0.5], 1)).toBe(up);
    expect(itemAt([along, up], [4.6, 0.5], 1)).toBe(along);
    expect(itemAt([along, up], [7, 1.1], 1)).toBeUndefined();
  });

  test('a rod is hit before the conductor that ends at it, whichever comes first', () => {
    expect(itemAt([along, rod], [10, 0], 1)).toBe(rod);
    expect(itemAt([rod, along], [9.8, 0.1], 1)).toBe(rod);
    expect(itemAt([rod, along], [8, 0.1], 1)).toBe(along);
  });

  test('a rectangle takes what lies wholly in it, whichever corner comes first', () => {
    expect(itemsIn([along, up, rod], [11, 1], [-1, -1])).toEqual([along, rod]);
    expect(itemsIn([along, up, rod], [0, -5], [10, 5])).toEqual([along, up, rod]);
    expect(itemsIn([along, up, rod], [5, -5], [9, 5])).toEqual([]);
  });
});
