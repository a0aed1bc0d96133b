// The sounding as drawn: logarithmic on both axes, a mark for each traverse, outliers ringed and named.
import { describe, expect, it } from 'vitest';
import { figures } from '../../src/index.ts';
import { fixtureOutcome } from '../fixture.ts';
import { type GroundOptions, withGround } from '../fixture-ground.ts';
import { withSeason } from '../fixture-season.ts';
import { malformed, textOf } from '../markup.ts';

const bare = fixtureOutcome({ spacing: 6 });

function figureOf(name: string, options: GroundOptions = {}): string {
  const files = figures(withSeason(withGround(bare, options), { name: 'dry summer', times: 1.3 }));
  return files.find((file) => file.name === name)?.svg ?? '';
}

const svg = figureOf('sounding.svg');
const { ground } = withGround(bare).results;
const readings = ground?.fit.readings ?? [];

/** Places of the numbers on an axis: [value, place]. */
function lettered(classes: string, axis: 'x' | 'y'): readonly (readonly [number, number])[] {
  const texts = new RegExp(`<text class="${classes}" x="([^"]+)" y="([^"]+)"[^>]*>([\\d.]+)</text>`, 'g');
  return [...svg.matchAll(texts)].map((m) => [Number(m[3]), Number(axis === 'x' ? m[1] : m[2])]);
}

/** The place of a value by two numbers on its axis, with equal ratios at equal distances. */
function byLogarithm(ticks: readonly (readonly [number, number])[]): (value: number) => number {
  const [[v0, p0], [v1, p1]] = [ticks[0], ticks[ticks.length - 1]];
  return (value) => p0 + ((p1 - p0) * Math.log(value / v0)) / Math.log(v1 / v0);
}

/** Marks of the readings: [x, y, path]. */
function marks(of: string): readonly (readonly [number, number, string])[] {
  const found = of.matchAll(
    /<g transform="translate\(([\d.]+),([\d.]+)\)"><path class="reading[^"]*" d="([^"]+)"/g,
  );
  return [...found].map((m) => [Number(m[1]), Number(m[2]), m[3]]);
}

/** The key repeats a mark once for each traverse; its readings come first. */
const placed = marks(svg).slice(0, readings.length);

describe('the sounding', () => {
  it('has logarithmic axes, on which each reading stands at its place', () => {
    const across = lettered('soft mid', 'x');
    const up = lettered('soft end', 'y');
    expect(across.map(([value]) => value)).toEqual([0.5, 1, 2, 5, 10, 20, 50]);
    expect(up.length).toBeGreaterThan(2);
    const [x, y] = [byLogarithm(across), byLogarithm(up)];
    for (const [value, place] of across) expect(place).toBeCloseTo(x(value), 1);
    for (const [value, place] of up) expect(place).toBeCloseTo(y(value), 1);
    expect(placed).toHaveLength(14);
    placed.forEach(([mx, my], k) => {
      expect(mx).toBeCloseTo(x(readings[k].spacing_m), 1);
      expect(my).toBeCloseTo(y(readings[k].apparent_resistivity_ohm_m), 1);
    });
  });

  it('steps at the interface, on the axis of the spacings', () => {
    const x = byLogarithm(lettered('soft mid', 'x'));
    const [stairs] = [...svg.matchAll(/<path class="stairs" d="([^"]+)"/g)].map((m) => m[1]);
    const corners = [...stairs.matchAll(/([\d.]+),([\d.]+)/g)].map((m) => [Number(m[1]), Number(m[2])]);
    expect(corners).toHaveLength(4);
    expect(corners[1][0]).toBeCloseTo(x(2.04), 1);
    expect(corners[2][0]).toBe(corners[1][0]);
    expect(corners[2][1]).toBeGreaterThan(corners[1][1]);
  });

  it('has another mark for each traverse, named in the key', () => {
    const shapes = placed.map(([, , d]) => d);
    expect(new Set(shapes.slice(0, 7)).size).toBe(1);
    expect(new Set(shapes.slice(7)).size).toBe(1);
    expect(shapes[0]).not.toBe(shapes[7]);
    expect(textOf(svg)).toContain('north fence');
    expect(textOf(svg)).toContain('access road');
  });

  it('has no two traverses alike, in shape and fill, until all marks are used', () => {
    const many = figureOf('sounding.svg', { traverses: ['a', 'b', 'c', 'd', 'e', 'f', 'g', 'h', 'i', 'j'] });
    const signs = [...many.matchAll(/<path class="(reading[^"]*)" d="([^"]+)"/g)]
      .map((m) => `${m[1]} ${m[2]}`)
      .slice(0, 70);
    expect(new Set(signs.filter((_, k) => k % 7 === 0)).size).toBe(9);
    expect(textOf(many)).toContain('2 further traverses');
  });

  it('rings each outlier and names it by its line', () => {
    const outliers = readings.filter((reading) => reading.outlier);
    expect(outliers.map((reading) => reading.line)).toEqual([12]);
    expect(textOf(svg)).toContain('line 12');
    /* two of the mark and its note, one of the key */
    expect(svg.match(/<circle class="ring[ "]/g)).toHaveLength(3);
    const clean = figureOf('sounding.svg', { traverses: ['one'] });
    expect(clean).not.toContain('class="ring');
    expect(textOf(clean)).not.toContain('outlier');
  });

  it('shows curve, band, resolved depth and the diagonal of the electrode, each in the key', () => {
    const text = textOf(svg);
    for (const name of ['fitted curve', '5–95 % of the soils', 'layers of the fit', 'resolved to 16.6 m'])
      expect(text).toContain(name);
    expect(text).toContain('diagonal 75.0 m');
    for (const name of ['soils', 'surface', 'resolved', 'diagonal'])
      expect(svg.split(`class="${name}"`).length, name).toBeGreaterThanOrEqual(3);
  });
});

describe('figure files of the ground', () => {
  it('are there where the soil was fitted, and seasons where there are any', () => {
    const names = (o: typeof bare): readonly string[] => figures(o).map((file) => file.name);
    const extra = ['ground-consequence.svg', 'seasons.svg', 'sounding.svg'];
    expect(names(withSeason(withGround(bare), { name: 'dry', times: 1.2 }))).toEqual(
      expect.arrayContaining(extra),
    );
    for (const name of extra) expect(names(bare)).not.toContain(name);
  });

  it('are well formed, hold no number that is none, and leave no name as markup', () => {
    const nasty = {
      traverses: ['</svg><script>alert(1)</script>', 'a & "b"'],
      surveyFile: '<img src=x onerror=y>.csv',
    };
    for (const name of ['sounding.svg', 'ground-consequence.svg', 'seasons.svg'])
      for (const of of [figureOf(name), figureOf(name, nasty)]) {
        expect(of.length).toBeGreaterThan(1000);
        expect(malformed(of)).toEqual([]);
        expect(of).not.toMatch(/NaN|Infinity|undefined|<script|<img|var\(--/);
      }
  });

  it('have the same bytes for the same outcome', () => {
    expect(figureOf('sounding.svg')).toBe(svg);
  });

  it('set the band of the soils apart from the numerical ±', () => {
    const bands = figureOf('ground-consequence.svg');
    expect(textOf(bands)).not.toContain('±');
    expect(bands).toContain('class="soils-bar"');
    expect(bands).not.toContain('class="bar"');
    expect(figureOf('limits.svg')).not.toContain('class="soils-bar"');
  });

  it('mark the governing season in words', () => {
    const seasons = textOf(figureOf('seasons.svg'));
    expect(seasons).toContain('touch, dry summer, governs');
    expect(seasons).not.toContain('as given, governs');
  });
});
