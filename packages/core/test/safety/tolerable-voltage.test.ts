// Tolerable voltages against the printed figures of the standard and evaluated rows of its equations.
import { describe, expect, test } from 'vitest';
import { coveringDeratingFactor } from '../../src/safety/covering-derating.ts';
import {
  type BodyMass,
  type Footing,
  tolerableMetalToMetalVoltage,
  tolerableStepVoltage,
  tolerableTouchVoltage,
} from '../../src/safety/tolerable-voltage.ts';

// Soil 400 Ω·m under 0.102 m of wet crushed rock of 2500 Ω·m: IEEE Std 80-2000, B.1 (from memory).
const unrounded: Footing = {
  resistivity: 2500,
  coveringFactor: coveringDeratingFactor(400, { resistivity: 2500, thickness: 0.102 }),
};
const rounded: Footing = { resistivity: 2500, coveringFactor: 0.74 };

// IEEE Std 80-2000/2013, eq. 29, 30, 32 to 35 (from memory), evaluated with unrounded Cs: independent computation.
const rows = [
  // ts, touch 50, step 50, touch 70, step 70, metal 50, metal 70
  [0.1, 1388.7, 4454.3, 1879.5, 6028.7, 366.8, 496.5],
  [0.2, 982.0, 3149.7, 1329.0, 4262.9, 259.4, 351.1],
  [0.25, 878.3, 2817.1, 1188.7, 3812.9, 232.0, 314.0],
  [0.5, 621.0, 1992.0, 840.5, 2696.1, 164.0, 222.0],
  [1.0, 439.1, 1408.6, 594.4, 1906.4, 116.0, 157.0],
  [3.0, 253.5, 813.2, 343.2, 1100.7, 67.0, 90.6],
] as const;

describe('tolerable voltages', () => {
  test.each(rows)('%f s', (duration, touch50, step50, touch70, step70, metal50, metal70) => {
    const found = [
      tolerableTouchVoltage(50, duration, unrounded),
      tolerableStepVoltage(50, duration, unrounded),
      tolerableTouchVoltage(70, duration, unrounded),
      tolerableStepVoltage(70, duration, unrounded),
      tolerableMetalToMetalVoltage(50, duration),
      tolerableMetalToMetalVoltage(70, duration),
    ];
    const printed = [touch50, step50, touch70, step70, metal50, metal70];
    expect(found.map((volts) => volts.toFixed(1))).toEqual(printed.map((volts) => volts.toFixed(1)));
  });

  // 70 kg: IEEE Std 80-2000, B.1 (printed, seen in a public copy); 50 kg: independent computation. Both with Cs rounded to 0.74.
  test.each([
    [70, 838.2, 2686.6],
    [50, 619.3, 1985.0],
  ] as const)('the worked examples of IEEE Std 80, Annex B, %i kg', (mass, touch, step) => {
    expect(tolerableTouchVoltage(mass, 0.5, rounded).toFixed(1)).toBe(touch.toFixed(1));
    expect(tolerableStepVoltage(mass, 0.5, rounded).toFixed(1)).toBe(step.toFixed(1));
  });

  test('hold from 0.03 s to 3 s and are refused outside', () => {
    const all: readonly ((mass: BodyMass, duration: number) => number)[] = [
      (mass, duration) => tolerableTouchVoltage(mass, duration, rounded),
      (mass, duration) => tolerableStepVoltage(mass, duration, rounded),
      tolerableMetalToMetalVoltage,
    ];
    for (const voltage of all) {
      expect(voltage(50, 0.03)).toBeGreaterThan(voltage(50, 3));
      for (const duration of [0.0299, 3.001, 0, -1, Number.NaN]) {
        expect(() => voltage(70, duration)).toThrow(
          `fault duration: ${duration} s is outside 0.03 s to 3 s, for which tolerable body current is known`,
        );
      }
    }
  });
});
