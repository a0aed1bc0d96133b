// Numbers of the sheet with signs and blanks that a terminal copies well.
import { expect, test } from 'vitest';
import { measured, order, percent, place, quantity, range } from '../src/number-text.ts';

test.each([
  [975.26, 4.1, '975 ± 5 V'],
  [975.26, 1.21, '975.3 ± 1.3 V'],
  [1975.26, 4.1, '1975 ± 5 V'],
  [12345.678, 4, '12.346 ± 0.004 kV'],
  [-0.04, 0.3, '0.0 ± 0.3 V'],
  [-5.31, 0.3, '-5.3 ± 0.3 V'],
])('%d within %d', (value, uncertainty, text) => {
  expect(measured(value, uncertainty, 'V')).toBe(text);
});

test('quantities, shares and places', () => {
  expect([0.00123456, 123.456, 1234567, -1.5].map((value) => quantity(value, 'Ω·m'))).toEqual([
    '0.001235 Ω·m',
    '123 Ω·m',
    '1234567 Ω·m',
    '-1.500 Ω·m',
  ]);
  expect(quantity(1.23456, 'm', 3)).toBe('1.23 m');
  expect([1.876, 0.07].map(percent)).toEqual(['188 %', '7.0 %']);
  expect(place(1234567.234, -12.6)).toBe('(1234567.2, -12.6) m');
});

test('orders of size', () => {
  expect([3.4e-13, 0].map(order)).toEqual(['3e-13', '0']);
});

test('ranges name their unit once where both ends have the same', () => {
  expect(range({ low: 98.76, high: 185.4 }, 'Ω·m')).toBe('98.8 to 185 Ω·m');
  expect(range({ low: 9876, high: 12345 }, 'V')).toBe('9880 V to 12.3 kV');
  expect(range({ low: 1234.5, high: 18593 }, 'Ω·m')).toBe('1230 to 18600 Ω·m');
});
