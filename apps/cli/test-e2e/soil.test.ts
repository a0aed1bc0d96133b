// The built program on surveys: the fit alone, and a study whose soil is fitted.
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { readPack } from '@ohmstead/pack';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { ohmstead, ROOT } from './program.ts';

const STATION = `${ROOT}test-data/brackwater`;
const SURVEY = `${STATION}/survey.csv`;
const BROKEN = `${ROOT}test-data/broken`;

let folder: string;
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'ohmstead-'));
});
afterAll(() => rmSync(folder, { recursive: true }));

describe('soil', () => {
  test('the layers stand first, within the width of a terminal', () => {
    const { status, out, err } = ohmstead('soil', SURVEY);
    expect([status, err]).toEqual([0, '']);
    const lines = out.split('\n');
    expect(lines[0]).toContain('brackwater/survey.csv: 14 readings on 2 traverses, spacings 0.5 m to 32 m');
    expect(lines[1]).toMatch(/^3 layers, misfit \d\.\d % rms; converged/);
    expect(Math.max(...lines.map((line) => [...line].length))).toBeLessThanOrEqual(100);
    expect(out).toMatch(/local codes and\s+licensed practice/);
  });

  test('--json finds what the invented readings were computed with, and is twice the same', () => {
    const { status, out } = ohmstead('soil', SURVEY, '--json');
    expect(status).toBe(0);
    const json = JSON.parse(out);
    expect(json).toMatchObject({ format: 'ohmstead-soil', version: 1, outcome: 'converged', layer_count: 3 });
    // generating model in test-data/README.md; readings scatter by 4.5 %
    const [top, , bottom] = json.layers;
    expect(Math.abs(top.resistivity_ohm_m / 130 - 1)).toBeLessThan(0.1);
    expect(Math.abs(bottom.resistivity_ohm_m / 28 - 1)).toBeLessThan(0.1);
    expect(bottom).not.toHaveProperty('thickness_m');
    expect(ohmstead('soil', SURVEY, '--json', '--layers', 'auto').out).toBe(out);
  });

  test('--layers takes as many as are asked for, and says what the readings call for', () => {
    const { out } = ohmstead('soil', SURVEY, '--layers', '2');
    expect(out).toMatch(/^2 layers, .* The readings call for 3\.$/m);
    expect(out).toMatch(/^ +3 .* proposed$/m);
  });

  test('more layers than the readings can tell are refused in words', () => {
    const { status, out, err } = ohmstead('soil', SURVEY, '--layers', '5');
    expect([status, out]).toEqual([2, '']);
    expect(err).toMatch(/survey\.csv: .*layers/);
  });

  test('every wrong row is named', () => {
    const { status, out, err } = ohmstead('soil', `${BROKEN}/survey-rows/survey.csv`);
    expect([status, out]).toEqual([2, '']);
    const named = err
      .trimEnd()
      .split('\n')
      .map((line) => Number(/survey\.csv:(\d+): /.exec(line)?.[1]));
    expect([...new Set(named)]).toEqual(Array.from({ length: 19 }, (_, i) => i + 3));
  });
});

describe('a study whose soil is fitted', () => {
  test('tells the fit, the seasons and which of them governs', () => {
    const { status, out, err } = ohmstead('solve', STATION, '--pack', join(folder, 'a.zip'));
    expect(status).toBe(0);
    expect(out).toMatch(/^Ground {6}3 layers fitted to survey\.csv, misfit \d\.\d % rms, converged;/m);
    expect(out).toMatch(/^ {2}frozen to 0\.5 m +\S+ ± \S+ Ω /m);
    expect(out).toMatch(/^Governing +20 kV earth fault: touch dry to 1 m/m);
    expect(out).toMatch(/^ {2}touch, dry to 1 m +\d/m);
    expect(err).toMatch(/^warning: survey\.csv:2: pin depth: .*\(deep-pins\)$/m);
  });

  test('its pack holds the survey and verifies without a difference', async () => {
    const { entries } = await readPack(readFileSync(join(folder, 'a.zip')));
    expect([...entries.keys()].some((name) => name.endsWith('survey.csv'))).toBe(true);
    const { status, out } = ohmstead('verify', join(folder, 'a.zip'));
    expect(out).toMatch(/\nno difference\n$/);
    expect(status).toBe(0);
  });
});
