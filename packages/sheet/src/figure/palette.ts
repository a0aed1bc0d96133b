// The colours of the sheet in its light and dark reading, and the ramp between paper and deep teal.

export interface Palette {
  readonly paper: string;
  /** round the sheet on a screen */
  readonly desk: string;
  readonly ink: string;
  readonly soft: string;
  readonly rule: string;
  readonly deep: string;
  readonly beyond: string;
  /** ground of the hatch that marks what lies beyond a limit */
  readonly beyondGround: string;
  /** tint behind an input */
  readonly field: string;
  /** ends of the ramp: nothing, and the limit */
  readonly rampNone: string;
  readonly rampFull: string;
}

export const LIGHT: Palette = {
  paper: '#fbfaf6',
  desk: '#ece8df',
  ink: '#1f2a2e',
  soft: '#5d6a6e',
  rule: '#dcd7cc',
  deep: '#2f6f80',
  beyond: '#9a3412',
  beyondGround: '#f3d3bd',
  field: '#eef2f0',
  rampNone: '#f3f0e7',
  rampFull: '#2f6f80',
};

/** Paper and ink change places; the ramp still runs from the paper to teal, so that what stands out is what is near a limit. */
export const DARK: Palette = {
  paper: '#151b1e',
  desk: '#0d1113',
  ink: '#e9e6dd',
  soft: '#a6b1b3',
  rule: '#3a4549',
  deep: '#82c3d1',
  beyond: '#f09a74',
  beyondGround: '#4a2617',
  field: '#212d31',
  rampNone: '#1c2427',
  rampFull: '#58a9bb',
};

/** Steps of the ramp; a figure with fewer bands takes every second one. */
export const RAMP_STEPS = 10;

function linear(channel: number): number {
  const c = channel / 255;
  return c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4;
}

function encoded(value: number): number {
  const c = value <= 0.0031308 ? 12.92 * value : 1.055 * value ** (1 / 2.4) - 0.055;
  return Math.round(255 * Math.max(0, Math.min(1, c)));
}

type Triple = readonly [number, number, number];

function channels(hex: string): Triple {
  const channel = (at: number): number => linear(Number.parseInt(hex.slice(at, at + 2), 16));
  return [channel(1), channel(3), channel(5)];
}

/** Relative luminance of a colour, 0 to 1 (WCAG 2.2, definition of relative luminance). */
export function luminance(hex: string): number {
  const [r, g, b] = channels(hex);
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

/** Contrast ratio of two colours, 1 to 21 (WCAG 2.2, definition of contrast ratio). */
export function contrast(one: string, other: string): number {
  const [a, b] = [luminance(one), luminance(other)];
  return (Math.max(a, b) + 0.05) / (Math.min(a, b) + 0.05);
}

/** A colour between two, mixed in cube roots of linear light so that equal steps look about equal. */
export function mixed(from: string, to: string, share: number): string {
  const [a, b] = [channels(from), channels(to)];
  const parts = a.map((value, k) => {
    const root = (1 - share) * Math.cbrt(value) + share * Math.cbrt(b[k]);
    return encoded(root ** 3)
      .toString(16)
      .padStart(2, '0');
  });
  return `#${parts.join('')}`;
}

/** Colours of the ramp, from nothing to the limit. */
export function rampOf(palette: Palette): readonly string[] {
  return Array.from({ length: RAMP_STEPS }, (_, k) =>
    mixed(palette.rampNone, palette.rampFull, k / (RAMP_STEPS - 1)),
  );
}

/** The palette as CSS variables. */
export function paletteVariables(palette: Palette): ReadonlyMap<string, string> {
  const named: [string, string][] = [
    ['--paper', palette.paper],
    ['--desk', palette.desk],
    ['--ink', palette.ink],
    ['--soft', palette.soft],
    ['--rule', palette.rule],
    ['--deep', palette.deep],
    ['--beyond', palette.beyond],
    ['--beyond-ground', palette.beyondGround],
    ['--field', palette.field],
  ];
  return new Map([...named, ...rampOf(palette).map((hex, k): [string, string] => [`--ramp-${k}`, hex])]);
}

/** `--paper:#fbfaf6;…` for a rule. */
export function paletteCss(palette: Palette): string {
  return [...paletteVariables(palette)].map(([name, value]) => `${name}:${value}`).join(';');
}
