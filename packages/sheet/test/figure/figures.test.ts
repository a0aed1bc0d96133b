// Figure files: names, titles, well-formed markup whatever the names, colours that can be read.
import { describe, expect, it } from 'vitest';
import { contrast, DARK, LIGHT, luminance, rampOf } from '../../src/figure/palette.ts';
import { standaloneCss } from '../../src/figure/style.ts';
import { xmlText } from '../../src/figure/xml-text.ts';
import { figures } from '../../src/index.ts';
import { fixtureOutcome } from '../fixture.ts';
import { malformed } from '../markup.ts';

const outcome = fixtureOutcome({ spacing: 2 });
const files = figures(outcome);

describe('figure files', () => {
  it('are named by kind and case, sorted and unique', () => {
    const names = files.map((f) => f.name);
    expect(names).toEqual([
      'electrode-plan.svg',
      'ground-section.svg',
      'leakage.svg',
      'limits.svg',
      'potential-11-kv-side.svg',
      'potential-33-kv-bus.svg',
      'potential-33-kv-line-end.svg',
      'profile-11-kv-side.svg',
      'profile-33-kv-bus.svg',
      'profile-33-kv-line-end.svg',
      'step-11-kv-side.svg',
      'step-33-kv-bus.svg',
      'step-33-kv-line-end.svg',
      'touch-11-kv-side.svg',
      'touch-33-kv-bus.svg',
      'touch-33-kv-line-end.svg',
    ]);
  });

  it('stand alone: namespace, title, description, own styles, no variable, nothing to fetch', () => {
    for (const { svg } of files) {
      expect(svg).toMatch(/^<svg xmlns="http:\/\/www\.w3\.org\/2000\/svg"/);
      expect(svg).toMatch(/<title id="[^"]+">[^<]+<\/title><desc id="[^"]+">[^<]+<\/desc>/);
      expect(svg).toContain('<style>');
      expect(svg).not.toContain('var(--');
      expect(svg).not.toMatch(/href=|url\((?!#)|@import|<script|<image/);
    }
  });

  it('are well formed and have no number that is none', () => {
    for (const { name, svg } of files) {
      expect({ name, problems: malformed(svg) }).toEqual({ name, problems: [] });
      expect(svg).not.toMatch(/NaN|Infinity|undefined/);
    }
  });

  it('stay well formed with names that are markup, control characters or halves of characters', () => {
    const nasty = fixtureOutcome({
      spacing: 6,
      caseNames: ['<script>alert(1)</script>', 'a & "b" \u0000\u0007', '\ud800 half', 'same ]]>', 'same'],
      fenceName: '</svg><img src=x onerror=alert(1)>',
      title: '</title><script>',
    });
    const list = figures(nasty);
    expect(new Set(list.map((f) => f.name)).size).toBe(list.length);
    for (const { svg } of list) {
      expect(malformed(svg)).toEqual([]);
      expect(svg).not.toContain('<script');
      expect(svg).not.toContain('<img');
      // biome-ignore lint/suspicious/noControlCharactersInRegex: control characters are what is looked for
      expect(svg).not.toMatch(/[\u0000-\u0008]/);
    }
  });

  it('refer only to identifiers that they define', () => {
    for (const { svg } of files) {
      const defined = new Set([...svg.matchAll(/ id="([^"]+)"/g)].map((m) => m[1]));
      for (const [, used] of svg.matchAll(/url\(#([^)]+)\)/g)) expect(defined.has(used)).toBe(true);
    }
  });

  it('mark the worst place with value, uncertainty and coordinates', () => {
    const svg =
      files.find((f) => f.name === 'touch-33-kv-bus.svg')?.svg.replace(/[\u202f\u00a0]/g, ' ') ?? '';
    const { touch } = outcome.results.cases[0];
    expect(svg).toContain(`${Math.round(touch.worst_V).toLocaleString('en').replace(',', ' ')} ± `);
    expect(svg).toContain(`(${touch.x_m.toFixed(1)}, ${touch.y_m.toFixed(1)}) m`);
    expect(svg).toContain('class="limit"');
    expect(svg).toContain('url(#touch-33-kv-bus-hatch)');
  });

  it('hatch only the swatch of the key where nothing is beyond the limit', () => {
    const svg = files.find((f) => f.name === 'touch-11-kv-side.svg')?.svg ?? '';
    const inArea = svg.slice(svg.indexOf('clip-path="url(#touch-11-kv-side-area)"'));
    expect(
      inArea.includes('clip-path="url(#touch-11-kv-side-area)"') &&
        inArea.includes('evenodd"><path class="limit" d="M'),
    ).toBe(false);
  });

  it('have the same bytes for the same outcome', () => {
    expect(figures(fixtureOutcome({ spacing: 2 }))).toEqual(files);
  });
});

describe('colours', () => {
  // WCAG 2.2, success criterion 1.4.3: 4.5 to 1 for text; 1.4.11: 3 to 1 for graphics that carry meaning
  it('give text 4.5 to 1 on paper in both readings', () => {
    for (const palette of [LIGHT, DARK]) {
      for (const text of [palette.ink, palette.soft, palette.deep, palette.beyond]) {
        expect(contrast(text, palette.paper)).toBeGreaterThanOrEqual(4.5);
      }
      /* what stands in a field, and its placeholder */
      for (const text of [palette.ink, palette.soft])
        expect(contrast(text, palette.field)).toBeGreaterThanOrEqual(4.5);
    }
  });

  it('set limit line and metal 3 to 1 against the hatch they meet and the paper', () => {
    for (const palette of [LIGHT, DARK]) {
      expect(contrast(palette.beyond, palette.beyondGround)).toBeGreaterThanOrEqual(3);
      expect(contrast(palette.beyond, palette.paper)).toBeGreaterThanOrEqual(3);
      expect(contrast(palette.ink, palette.paper)).toBeGreaterThanOrEqual(7);
    }
  });

  it('run along the ramp away from the paper without turning back, so that greyscale keeps the order', () => {
    for (const palette of [LIGHT, DARK]) {
      const distances = rampOf(palette).map((hex) => Math.abs(luminance(hex) - luminance(palette.paper)));
      for (let k = 1; k < distances.length; k += 1) expect(distances[k]).toBeGreaterThan(distances[k - 1]);
    }
  });

  it('are written out where a file stands alone', () => {
    expect(standaloneCss()).toContain(LIGHT.beyond);
    expect(standaloneCss()).not.toContain('var(');
  });
});

describe('text of markup', () => {
  it('keeps what XML allows and shows what it does not as a replacement', () => {
    expect(xmlText('a\tb\n😀é')).toBe('a\tb\n😀é');
    expect(xmlText('a\u0000b\ufffe')).toBe('a\ufffdb\ufffd');
    expect(xmlText('\ud800x\udc00')).toBe('\ufffdx\ufffd');
    expect(xmlText('x\ud83d')).toBe('x\ufffd');
  });
});
