// Tables in Markdown, and how the benchmark writes its figures.
import type { Spread } from './bench-statistics.ts';

export function table(header: readonly string[], rows: readonly (readonly string[])[]): string[] {
  const line = (cells: readonly string[]): string => `| ${cells.join(' | ')} |`;
  return [line(header), `|${'---|'.repeat(header.length)}`, ...rows.map(line)];
}

/** Three figures, without an exponent. */
export function short(value: number): string {
  const digits = Math.max(0, 2 - Math.floor(Math.log10(Math.abs(value))));
  return value === 0 ? '0' : value.toFixed(Math.min(digits, 6));
}

/** Median, and the extremes where they differ. */
export function spreadText(found: Spread | undefined, unit: string): string {
  if (found === undefined) return '–';
  const { median, least, most } = found;
  return least === most
    ? `${short(median)}${unit}`
    : `${short(median)}${unit} (${short(least)}–${short(most)})`;
}

/** A relative difference, in a power of ten. */
export function relative(value: number | undefined): string {
  return value === undefined ? '–' : Math.abs(value).toExponential(1);
}
