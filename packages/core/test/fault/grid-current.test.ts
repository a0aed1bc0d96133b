// Current that enters the ground, of the worked examples of IEEE Std 80.
import { expect, test } from 'vitest';
import { decrementFactor } from '../../src/fault/decrement.ts';
import { gridCurrent } from '../../src/fault/grid-current.ts';

// IEEE Std 80-2000, B.1 (from memory): 3180 A at 115 kV, Sf 0.6, Df taken as 1.0, I_G 1908 A.
test('the worked examples: 1908 A', () => {
  const current = gridCurrent({ faultCurrent: 3180, divisionFactor: 0.6, decrementFactor: 1 });
  expect(current.toFixed(0)).toBe('1908');
});

// The same with Df of its equation, X/R 3.33, 0.5 s, 60 Hz: 1925 A, independent computation.
test('the worked examples with the decrement factor of the equation: 1925 A', () => {
  const factor = decrementFactor(3.33, 60, 0.5);
  const current = gridCurrent({ faultCurrent: 3180, divisionFactor: 0.6, decrementFactor: factor });
  expect(current.toFixed(0)).toBe('1925');
});
