import { expect, it } from 'vitest';
import { angleOf, logarithm } from '../../src/numerics/elementary.ts';
import { randomNumbers } from '../support/random.ts';

it('takes logarithms to the last digits', () => {
  const random = randomNumbers(2);
  for (let k = 0; k < 5000; k++) {
    const x = 10 ** (60 * random() - 30);
    expect(Math.abs(logarithm(x) - Math.log(x))).toBeLessThanOrEqual(3e-16 * Math.abs(Math.log(x)));
    const near = 1 + (random() - 0.5) * 10 ** (-15 * random());
    expect(Math.abs(logarithm(near) - Math.log(near))).toBeLessThanOrEqual(3e-16 * Math.abs(Math.log(near)));
  }
  expect(logarithm(1)).toBe(0);
});

it('takes angles in all quadrants to the last digits', () => {
  const random = randomNumbers(6);
  for (let k = 0; k < 5000; k++) {
    const [y, x] = [
      (random() - 0.5) * 10 ** (20 * random() - 10),
      (random() - 0.5) * 10 ** (20 * random() - 10),
    ];
    expect(Math.abs(angleOf(y, x) - Math.atan2(y, x))).toBeLessThanOrEqual(
      5e-16 * Math.abs(Math.atan2(y, x)),
    );
  }
  expect(angleOf(0, 2)).toBe(0);
  expect(angleOf(3, 0)).toBe(Math.PI / 2);
  expect(angleOf(-3, 0)).toBe(-Math.PI / 2);
  expect(angleOf(0, -2)).toBe(Math.PI);
});
