// Changes from a pinned state: told in the unit and to the decimal of the result itself.
import { describe, expect, it } from 'vitest';
import { changeText, measuredTold, percentTold, quantityTold } from '../../src/format/told.ts';

const plain = (text: string): string => text.replaceAll('\u202f', ' ');

describe('changes', () => {
  it('are told to the decimal of the result', () => {
    expect(changeText(measuredTold(0.813, 0.001, 'Ω'), measuredTold(0.834, 0.002, 'Ω'))).toBe(
      '0.0210 less than pinned',
    );
    expect(changeText(measuredTold(975, 4, 'V'), measuredTold(940.2, 9, 'V'))).toBe('35 more than pinned');
  });

  it('are told in thousands where the result is', () => {
    const now = measuredTold(12_340, 20, 'V');
    expect(plain(now.text)).toBe('12.34 ± 0.02 kV');
    expect(changeText(now, measuredTold(9_900, 20, 'V'))).toBe('2.44 more than pinned');
  });

  it('say so where no shown digit moved, and where nothing is pinned', () => {
    expect(changeText(measuredTold(975, 4, 'V'), measuredTold(975.3, 4, 'V'))).toBe('as pinned');
    expect(changeText(quantityTold(3245, 'A'), undefined)).toBe('not in the pinned state');
    expect(changeText(percentTold(0.72), percentTold(0.75))).toBe('3 less than pinned');
    expect(changeText(quantityTold(3245, 'A'), quantityTold(Number.NaN, 'A'))).toBe(
      'not to be compared with the pinned',
    );
  });
});
