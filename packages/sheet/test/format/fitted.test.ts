// What is fitted to readings: three digits, ranges without a ±, misfits with their sign.
import { describe, expect, it } from 'vitest';
import {
  band,
  bandQuantity,
  fitted,
  fittedQuantity,
  misfitPercent,
  outsideBand,
  shortQuantity,
  surveyed,
} from '../../src/format/fitted.ts';

const plain = (text: string): string => text.replace(/[\u202f\u00a0]/g, ' ');

describe('fitted quantities', () => {
  it('carry three digits, no more than readings tell', () => {
    expect(fitted(132.508)).toBe('133');
    expect(fitted(29.3735)).toBe('29.4');
    expect(fitted(0.0965334)).toBe('0.0965');
    expect(plain(fitted(18_592.8))).toBe('18 600');
    expect(plain(fittedQuantity(12_345, 'V'))).toBe('12.3 kV');
    expect(plain(fittedQuantity(12_345, 'Ω·m'))).toBe('12 300 Ω·m');
  });

  it('add nothing to what was given beside them', () => {
    expect(plain(shortQuantity(1500, 'Ω·m'))).toBe('1 500 Ω·m');
    expect(plain(shortQuantity(0.5, 'm'))).toBe('0.5 m');
    expect(plain(shortQuantity(0.6845931, 'm'))).toBe('0.685 m');
    expect(surveyed(0.5)).toBe('0.5');
    expect(surveyed(3.048)).toBe('3.048');
  });
});

describe('bands', () => {
  it('are a range with one unit, and never a ±', () => {
    expect(plain(bandQuantity({ low: 178.2, high: 231.4 }, 'Ω·m'))).toBe('178–231 Ω·m');
    expect(plain(bandQuantity({ low: 8_214, high: 12_432 }, 'V'))).toBe('8.21–12.4 kV');
    expect(band({ low: 1.374, high: 1.786 })).toBe('1.37–1.79');
    expect(band({ low: 1.3741, high: 1.3742 })).toBe('1.37');
  });

  it('tell whether they hold the best fit, their ends included', () => {
    expect(outsideBand({ best: 3, low: 3, median: 4, high: 5 })).toBe(false);
    expect(outsideBand({ best: 2.9, low: 3, median: 4, high: 5 })).toBe(true);
    expect(outsideBand({ best: 5.1, low: 3, median: 4, high: 5 })).toBe(true);
  });
});

describe('misfits', () => {
  it('carry their sign and one decimal, and none where nothing is left', () => {
    expect(misfitPercent(3.09)).toBe('+3.1');
    expect(misfitPercent(-11.14)).toBe('\u221211.1');
    expect(misfitPercent(-0.04)).toBe('0.0');
    expect(misfitPercent(Number.NaN)).toBe('—');
  });
});
