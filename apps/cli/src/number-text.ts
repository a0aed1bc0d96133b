// Numbers as a terminal shows them: digits from the uncertainty, plain signs and blanks that copy well.

/** Digits of a number that has no uncertainty of its own. */
const USUAL_DIGITS = 4;
/** No more digits than this are shown, however small the uncertainty. */
const MOST_DIGITS = 6;
/** Share of the last place below which rounding up an uncertainty sees only a rounding error of its own. */
const ROUND_UP_SLACK = 1e-6;

function exponentOf(value: number): number {
  return value === 0 ? 0 : Number(value.toExponential().split('e')[1]);
}

/** Decimals as asked for; negative ones round to tens and hundreds. */
function fixed(value: number, decimals: number): string {
  const unit = 10 ** Math.max(0, -decimals);
  const text = (Math.round(value / unit) * unit).toFixed(0);
  const shown = decimals > 0 ? value.toFixed(Math.min(decimals, 100)) : text;
  return Number(shown) === 0 ? shown.replace('-', '') : shown;
}

/** A number with so many significant digits, and its unit. */
export function quantity(value: number, unit: string, digits: number = USUAL_DIGITS): string {
  return `${fixed(value, digits - 1 - exponentOf(Number(value.toPrecision(digits))))} ${unit}`;
}

/**
 * A result and its uncertainty at one common place: 975 ± 4 V. One digit of the uncertainty is kept, two where it
 * begins with 1; it is rounded up, so that rounding never claims more than was computed.
 */
export function measured(value: number, uncertainty: number, unit: string): string {
  if (!(uncertainty > 0)) return `${quantity(value, '')}± 0 ${unit}`;
  const exponent = exponentOf(uncertainty);
  const wanted = uncertainty / 10 ** exponent < 2 ? 1 - exponent : -exponent;
  const decimals = Math.min(wanted, MOST_DIGITS - 1 - exponentOf(value));
  const place = 10 ** -decimals;
  const up = Math.max(1, Math.ceil(uncertainty / place - ROUND_UP_SLACK)) * place;
  return `${fixed(value, decimals)} ± ${fixed(up, decimals)} ${unit}`;
}

/** A share as a whole per cent, one decimal below ten. */
export function percent(share: number): string {
  return `${fixed(100 * share, Math.abs(share) < 0.0995 ? 1 : 0)} %`;
}

/** A place on the surface, to a centimetre. */
export function place(x: number, y: number): string {
  return `(${fixed(x, 2)}, ${fixed(y, 2)}) m`;
}

/** A small number by its order of size: 3e-13. */
export function order(value: number): string {
  return value === 0 ? '0' : value.toExponential(0);
}
