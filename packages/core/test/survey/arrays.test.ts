import { describe, expect, it } from 'vitest';
import {
  apparentFromResistance,
  arrayKey,
  type FourPinArray,
  geometricFactor,
  resistanceFromApparent,
  spacingOf,
} from '../../src/survey/arrays.ts';

const wenner = (spacing: number, pinDepth = 0): FourPinArray => ({ kind: 'wenner', spacing, pinDepth });

describe('four-pin arrays', () => {
  it('correct a Wenner reading for pin depth as IEEE Std 81 does (independent computation of its full formula)', () => {
    for (const [b, ratio] of [
      [0.05, 1.00436],
      [0.1, 1.01723],
      [0.2, 1.06589],
      [0.3, 1.1382],
    ] as const)
      expect(Math.abs(geometricFactor(wenner(1, b)) / (2 * Math.PI) - ratio)).toBeLessThan(6e-6);
  });

  it('give the apparent resistivities of a published student survey, full and short formula (values read)', () => {
    expect(Math.abs(apparentFromResistance(wenner(1, 0.5), 173.2) - 1432.1061)).toBeLessThan(6e-5);
    expect(Math.abs(apparentFromResistance(wenner(2), 35.2) - 442.3362)).toBeLessThan(6e-5);
    expect(Math.abs(apparentFromResistance(wenner(4), 8.8) - 221.1681)).toBeLessThan(6e-5);
    // independent computation with the full formula where that author used the short one
    expect(Math.abs(apparentFromResistance(wenner(2, 0.5), 35.2) - 486.43)).toBeLessThan(6e-3);
    expect(Math.abs(apparentFromResistance(wenner(4, 0.5), 8.8) - 227.07)).toBeLessThan(6e-3);
  });

  it('give π·c(c + d)R/d for unequal spacing, c 10 m, d 1 m, 0.5 Ω: 172.788 Ω·m (IEEE Std 81, Schlumberger–Palmer, from memory)', () => {
    const array: FourPinArray = { kind: 'schlumberger', halfCurrent: 10.5, halfPotential: 0.5, pinDepth: 0 };
    expect(Math.abs(apparentFromResistance(array, 0.5) - 172.788)).toBeLessThan(6e-4);
  });

  it('are one whatever they are called: Wenner as Schlumberger and by the places of its pins', () => {
    for (const pinDepth of [0, 0.3]) {
      const factor = geometricFactor(wenner(4, pinDepth));
      const others: FourPinArray[] = [
        { kind: 'schlumberger', halfCurrent: 6, halfPotential: 2, pinDepth },
        { kind: 'collinear', currentPins: [10, 22], potentialPins: [14, 18], pinDepth },
        { kind: 'collinear', currentPins: [22, 10], potentialPins: [18, 14], pinDepth },
        // current and potential pins exchanged, by reciprocity
        { kind: 'collinear', currentPins: [14, 18], potentialPins: [10, 22], pinDepth },
      ];
      for (const array of others) expect(Math.abs(geometricFactor(array) / factor - 1)).toBeLessThan(1e-14);
    }
  });

  it('turn their sign with the potential pins', () => {
    const there = geometricFactor({
      kind: 'collinear',
      currentPins: [0, 3],
      potentialPins: [5, 8],
      pinDepth: 0.1,
    });
    const back = geometricFactor({
      kind: 'collinear',
      currentPins: [0, 3],
      potentialPins: [8, 5],
      pinDepth: 0.1,
    });
    expect(there).toBe(-back);
  });

  it('lead from resistance to apparent resistivity and back', () => {
    for (const array of [wenner(3, 0.2), { kind: 'schlumberger', halfCurrent: 20, halfPotential: 1, pinDepth: 0 } as const]) // biome-ignore format: two arrays
      expect(resistanceFromApparent(array, apparentFromResistance(array, 7.25))).toBeCloseTo(7.25, 13);
  });

  it('are ordered by a, AB/2 and half their length, and known by their distances', () => {
    expect(spacingOf(wenner(4))).toBe(4);
    expect(spacingOf({ kind: 'schlumberger', halfCurrent: 9, halfPotential: 1, pinDepth: 0 })).toBe(9);
    const line: FourPinArray = {
      kind: 'collinear',
      currentPins: [0, 30],
      potentialPins: [10, 19],
      pinDepth: 0,
    };
    expect(spacingOf(line)).toBe(15);
    expect(arrayKey(line)).toBe(
      arrayKey({ kind: 'collinear', currentPins: [5.1, 35.1], potentialPins: [15.1, 24.1], pinDepth: 0.2 }),
    );
    expect(arrayKey(line)).not.toBe(arrayKey({ ...line, potentialPins: [10, 20] }));
  });
});
