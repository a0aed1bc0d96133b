// Digits follow the uncertainty, and rounding never claims more than was computed.
import { expect, test } from 'vitest';
import { measured, order, percent, place, quantity } from '../src/number-text.ts';

test.each([
  [975.26, 4.1, '975 ± 5 V'],
  [975.26, 1.21, '975.3 ± 1.3 V'],
  [975.26, 40, '980 ± 40 V'],
  [975.26, 120, '980 ± 120 V'],
  [2.7204, 0.004, '2.720 ± 0.004 V'],
  [12345.678, 1e-9, '12345.7 ± 0.1 V'],
  [0.000123456, 2e-7, '0.0001235 ± 0.0000002 V'],
  [-0.04, 0.3, '0.0 ± 0.3 V'],
  [0, 0.3, '0.0 ± 0.3 V'],
  [5, 0, '5.000 ± 0 V'],
  [9.996, 0.3, '10.0 ± 0.3 V'],
])('%d within %d', (value, uncertainty, text) => {
  expect(measured(value, uncertainty, 'V')).toBe(text);
});

test('quantities have four digits', () => {
  expect([0.00123456, 9.99996, 123.456, 123456, 0, -1.5].map((value) => quantity(value, 'A'))).toEqual([
    '0.001235 A',
    '10.00 A',
    '123.5 A',
    '123500 A',
    '0.000 A',
    '-1.500 A',
  ]);
});

test('shares, places and orders of size', () => {
  expect([1.876, 0.5, 0.0995, 0.07, 0].map(percent)).toEqual(['188 %', '50 %', '10 %', '7.0 %', '0.0 %']);
  expect(place(1.234, -0.001)).toBe('(1.23, 0.00) m');
  expect([3.4e-13, 0].map(order)).toEqual(['3e-13', '0']);
});
