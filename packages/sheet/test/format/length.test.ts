// Lengths: as given in SI, in feet and inches where those are displayed, and never broken across lines.
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  coveringUnit,
  givenIn,
  givenLength,
  givenPlace,
  givenWith,
  lengthUnit,
  place,
  smallUnit,
} from '../../src/format/length.ts';

describe('lengths', () => {
  it('adds and takes no digit in SI', () => {
    expect(givenLength(2.4, 'SI')).toBe('2.4\u202fm');
    expect(givenIn(0.012, smallUnit('SI'))).toBe('12');
    expect(givenWith(0.1, coveringUnit('SI'))).toBe('0.1\u202fm');
  });

  it('tells feet and inches, back to the round number that was typed in them', () => {
    // international foot 0.3048 m, inch 0.0254 m, exact: NIST SP 811:2008, appendix B (from memory)
    expect(givenLength(2.4, 'US')).toBe('7.874\u202fft');
    expect(givenLength(7 * 0.3048, 'US')).toBe('7\u202fft');
    expect(givenWith(4 * 0.0254, coveringUnit('US'))).toBe('4\u202fin');
    expect(givenIn(0.012, smallUnit('US'))).toBe('0.472');
  });

  it('stays within half a thousandth of the displayed unit', () => {
    fc.assert(
      fc.property(fc.double({ min: -1e5, max: 1e5, noNaN: true }), (metres) => {
        const unit = lengthUnit('US');
        const read = Number(givenIn(metres, unit).replaceAll('\u202f', '').replace('\u2212', '-'));
        /* ten significant digits are told, so large coordinates are coarser than the last decimal */
        const coarse = Math.abs(metres / unit.metres) * 1e-9;
        expect(Math.abs(read - metres / unit.metres)).toBeLessThanOrEqual(5e-4 * (1 + 1e-6) + coarse);
      }),
    );
  });

  it('writes places so that no line breaks inside them', () => {
    expect(place(24, 33.46)).toBe('(24.0,\u00a033.5)\u202fm');
    expect(place(24, 33.46, 'US')).toBe('(78.7,\u00a0109.8)\u202fft');
    expect(givenPlace(24, -0.25, 'SI')).toBe('(24,\u00a0\u22120.25)\u202fm');
  });
});
