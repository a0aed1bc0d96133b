// A result as it is told, and how far it stands from what another state of the study gave.
import {
  decimalsFor,
  exponentOf,
  fixed,
  measured,
  percent,
  quantity,
  RESULT_DIGITS,
  scaled,
  significant,
} from './number.ts';

/** A number as it stands in a sentence, and the number behind it. */
export interface Told {
  readonly text: string;
  readonly value: number;
  /** of the unit in the text, e.g. 1000 where volts are told in kV */
  readonly divisor: number;
  /** places after the point in the text; negative for tens, hundreds … */
  readonly decimals: number;
}

/** A result with its uncertainty: `975 ± 4 V`. */
export function measuredTold(value: number, uncertainty: number, unit: string): Told {
  const [divisor] = scaled(value, unit);
  const decimals = decimalsFor(value / divisor, uncertainty / divisor);
  return { text: measured(value, uncertainty, unit), value, divisor, decimals };
}

function significantDecimals(value: number, digits: number): number {
  return digits - 1 - exponentOf(Number(value.toPrecision(digits)));
}

/** A result without an uncertainty of its own: `3 245 A`. */
export function quantityTold(value: number, unit: string): Told {
  const [divisor] = scaled(value, unit);
  const shown = value / divisor;
  const whole = divisor === 1 && Math.abs(shown) >= 100;
  const decimals = whole ? 0 : significantDecimals(shown, RESULT_DIGITS);
  return { text: quantity(value, unit), value, divisor, decimals };
}

/** A factor with a fixed count of decimals: `0.802`. */
export function fixedTold(value: number, decimals: number): Told {
  return { text: fixed(value, decimals), value, divisor: 1, decimals };
}

/** A factor with so many significant digits: `1.026`. */
export function significantTold(value: number, digits: number): Told {
  return {
    text: significant(value, digits),
    value,
    divisor: 1,
    decimals: significantDecimals(value, digits),
  };
}

/** A share as per cent: `72 %`. */
export function percentTold(share: number): Told {
  return { text: percent(share), value: share, divisor: 0.01, decimals: Math.abs(share) < 0.0995 ? 1 : 0 };
}

/**
 * How a result differs from the pinned one, in the unit and to the decimal in which it is told: `0.021 less than
 * pinned`, or `as pinned` where no shown digit moved.
 * @param before undefined where the pinned state has no such result
 */
export function changeText(now: Told, before: Told | undefined): string {
  if (before === undefined) return 'not in the pinned state';
  const by = (now.value - before.value) / now.divisor;
  if (!Number.isFinite(by)) return 'not to be compared with the pinned';
  const text = fixed(Math.abs(by), now.decimals);
  if (Math.round(Math.abs(by) * 10 ** now.decimals) === 0) return 'as pinned';
  return `${text} ${by < 0 ? 'less' : 'more'} than pinned`;
}
