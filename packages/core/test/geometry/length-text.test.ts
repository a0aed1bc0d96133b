// Lengths in words.
import { expect, test } from 'vitest';
import { metres, millimetres, planPlace } from '../../src/geometry/length-text.ts';

test('metres to the centimetre, never a negative nothing', () => {
  expect([3.196, 0, -0.001, -1.5].map(metres)).toEqual(['3.20 m', '0.00 m', '0.00 m', '-1.50 m']);
});

test('millimetres to the tenth where they are few', () => {
  expect([0.004, 0.0004, 0.0123, 0, -0.00001].map(millimetres)).toEqual([
    '4 mm',
    '0.4 mm',
    '12 mm',
    '0 mm',
    '0 mm',
  ]);
});

test('places in plan', () => {
  expect(planPlace(12, -0.001)).toBe('(12.00, 0.00) m');
});
