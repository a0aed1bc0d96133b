import { describe, expect, it } from 'vitest';
import { medianDepth, wennerEquivalent } from '../../src/survey/investigation-depth.ts';

describe('median depth of investigation', () => {
  it('is 0.519 a for Wenner and 0.19 AB for Schlumberger with close pins (Edwards 1977, from memory)', () => {
    expect(Math.abs(medianDepth({ kind: 'wenner', spacing: 10, pinDepth: 0 }) - 5.19)).toBeLessThan(0.005);
    const schlumberger = { kind: 'schlumberger', halfCurrent: 10, halfPotential: 0.01, pinDepth: 0 } as const;
    expect(Math.abs(medianDepth(schlumberger) / 20 - 0.19)).toBeLessThan(0.005);
    // closed form for close pins: (1 + 4z²/L²)^(−3/2) = 1/2 with L = AB/2
    const close = Math.sqrt((2 ** (2 / 3) - 1) / 4) / 2;
    expect(Math.abs(medianDepth(schlumberger) / 20 / close - 1)).toBeLessThan(1e-5);
  });

  it('puts other arrays on the axis of Wenner spacings', () => {
    expect(wennerEquivalent({ kind: 'wenner', spacing: 7, pinDepth: 0.3 })).toBe(7);
    const asPlaces = {
      kind: 'collinear',
      currentPins: [0, 21],
      potentialPins: [7, 14],
      pinDepth: 0,
    } as const;
    expect(wennerEquivalent(asPlaces)).toBeCloseTo(7, 9);
  });
});
