// A review pack's sheet opened from disk, with nothing installed: it confirms, contradicts, and tries other numbers.
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { type PageScripts, readPack, verifyPack, writePack } from '@ohmstead/pack';
import { loadStudy, programVersion, solveStudy, sourceFromMap } from '@ohmstead/study';
import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { openBrowser, openLiveSheet, watchedPage } from './browser.ts';

/** A square of four meshes with a rod in one corner, so that mirrored halves tie; invented. */
const STUDY = {
  format: 'ohmstead-study',
  version: 1,
  title: 'Four meshes </script><!-- <b>',
  soil: { layers: [{ resistivity_ohm_m: 220, thickness_m: 2 }, { resistivity_ohm_m: 60 }] },
  conductors: ['grid.csv'],
  cases: [{ name: 'bus', grid_current_A: 1500, duration_s: 0.5 }],
  limits: { basis: 'IEEE 80', body_mass_kg: 70 },
};
const WIRES = ['0,0,0.5,8,0,0.5', '0,4,0.5,8,4,0.5', '0,8,0.5,8,8,0.5', '0,0,0.5,0,8,0.5', '4,0,0.5,4,8,0.5'];
const TABLE = [
  'id,x1_m,y1_m,depth1_m,x2_m,y2_m,depth2_m,diameter_mm',
  ...[...WIRES, '8,0,0.5,8,8,0.5', '8,8,0.5,8,8,3.5'].map((ends, k) => `w${k},${ends},12`),
].join('\n');

const encoder = new TextEncoder();
const files = new Map([
  ['grid.csv', encoder.encode(TABLE)],
  ['study.json', encoder.encode(JSON.stringify(STUDY, null, 2))],
]);
const built = (name: string): string =>
  readFileSync(resolve(import.meta.dirname, `../dist/engine/${name}.js`), 'utf8').trimEnd();

let scripts: PageScripts;
let folder: string;
let browser: Browser;
let html: string;
beforeAll(async () => {
  scripts = { starter: built('starter'), engine: built('engine') };
  folder = mkdtempSync(join(tmpdir(), 'ohmstead-'));
  browser = await openBrowser();
  const loaded = loadStudy(sourceFromMap(files));
  const pack = await writePack(loaded, await solveStudy(loaded), programVersion, { scripts });
  html = new TextDecoder().decode((await readPack(pack)).entries.get('index.html'));
});
afterAll(async () => {
  await browser?.close();
  rmSync(folder, { recursive: true });
});

interface Opened {
  readonly page: Page;
  readonly errors: readonly string[];
  readonly requests: readonly string[];
}

async function opened(text: string = html): Promise<Opened> {
  const path = join(folder, 'index.html');
  writeFileSync(path, text);
  const watched = await watchedPage({ browser });
  await watched.page.goto(`file://${path}`);
  return watched;
}

function replaced(from: string | RegExp, to: string): string {
  const text = html.replace(from, to);
  if (text === html) throw new Error(`the sheet has no ${from}`);
  return text;
}

async function recomputed(page: Page): Promise<string> {
  await page.getByRole('button', { name: 'Recompute' }).click();
  const status = page.getByRole('status');
  await status.filter({ hasText: /./ }).waitFor({ timeout: 60_000 });
  return (await status.textContent()) ?? '';
}

const sheetText = (page: Page): Promise<string | null> => page.locator('main').textContent();

/** Whether a worker may compile the smallest of modules: magic number and version (WebAssembly core 2.0, 5.5.16). */
function compilesWasm(): boolean {
  try {
    return (
      new WebAssembly.Module(Uint8Array.of(0, 0x61, 0x73, 0x6d, 1, 0, 0, 0)) instanceof WebAssembly.Module
    );
  } catch {
    return false;
  }
}

describe('a sheet opened from disk', () => {
  it('confirms every number, twice, and asks nothing of any network', async () => {
    const { page, errors, requests } = await opened();
    const word = /^All (\S+) numbers confirmed: (\S+) printed in this sheet, and (\S+) of its results/;
    const counts = word
      .exec(await recomputed(page))
      ?.slice(1)
      .map((text) => Number(text.replace('\u202f', '')));
    expect(counts?.[0]).toBe(counts![1]! + counts![2]!);
    expect(counts![1]).toBeGreaterThan(100);
    expect(counts![2]).toBeGreaterThan(50);
    expect(await recomputed(page)).toMatch(word);
    for (const url of requests) expect(url).toMatch(/^(file:|blob:)/);
    expect(errors).toEqual([]);
    await page.close();
  });

  it('contradicts a number that was changed in the sheet, and marks it where it stands', async () => {
    const { page } = await opened(replaced(/(<strong class="res">|<b class="res">|class="res">)\d/, '$19'));
    expect(await recomputed(page)).toMatch(
      /^Contradicted in 1 place .*: 1 in this sheet.* and 0 in the results/,
    );
    const marked = page.locator('[data-recomputed]');
    expect(await marked.count()).toBe(1);
    expect(await marked.textContent()).toMatch(/^9/);
    expect(await page.locator('.recompute li').textContent()).toMatch(
      /: 9[\d\s.]* is printed, [\d\s.]+ is computed/,
    );
    await page.locator('.recompute li').getByRole('button', { name: 'Show' }).click();
    expect(await marked.isVisible()).toBe(true);
    await page.close();
  });

  it('contradicts words that were changed, and results that were', async () => {
    const words = await opened(replaced(/exceeds/, 'is far within'));
    expect(await recomputed(words.page)).toMatch(/^Contradicted in 1 place/);
    expect(await words.page.locator('.recompute li').textContent()).toContain('far within');
    await words.page.close();
    const results = await opened(replaced(/"resistance_ohm":/, '"resistance_ohm":1'));
    expect(await recomputed(results.page)).toMatch(/0 in this sheet.* and 1 in the results/);
    expect(await results.page.locator('.recompute li').textContent()).toMatch(
      /^Results, electrode\.resistance_ohm: 1\S+ on record, \S+ computed$/,
    );
    await results.page.close();
  });

  it('contradicts the whole sheet where the study in it is another', async () => {
    const { page } = await opened(replaced('\\"grid_current_A\\": 1500', '\\"grid_current_A\\": 3000'));
    expect(await recomputed(page)).toMatch(/^Contradicted in \d\d+ places/);
    await page.close();
  });

  it('tries another number beside the record, which stays as it is', async () => {
    const { page } = await opened();
    const before = await sheetText(page);
    await page.getByText('Try other numbers beside the record').click();
    await page.getByRole('group', { name: 'bus' }).getByLabel('grid_current_A').fill('3000');
    await page.getByRole('button', { name: 'Compute with these numbers' }).click();
    const table = page.locator('.recompute table');
    await table.waitFor({ timeout: 60_000 });
    expect(await table.locator('caption').textContent()).toBe(
      'With cases[0].grid_current_A 1500 → 3000. The record below is unaltered.',
    );
    const row = (name: string): Promise<string[]> =>
      table.getByRole('row', { name }).getByRole('cell').allTextContents();
    const value = (text: string | undefined): number => Number.parseFloat(text!.replace('\u202f', ''));
    const [resistance, same] = await row('Resistance');
    expect(same).toBe(resistance);
    const [rise, twice] = (await row('bus: rise')).map(
      (text) => value(text) * (text.endsWith('kV') ? 1000 : 1),
    );
    // the rise is proportional to the current; both are printed to three digits or more
    expect(Math.abs(twice! / rise! - 2)).toBeLessThan(0.01);
    expect(await sheetText(page)).toBe(before);
    expect(await recomputed(page)).toMatch(/^All /);
    await page.close();
  });

  it('tells what is wrong with a number that is tried', async () => {
    const { page } = await opened();
    await page.getByText('Try other numbers beside the record').click();
    const field = page.getByRole('group', { name: 'soil' }).getByLabel('layers[0].resistivity_ohm_m');
    const compute = page.getByRole('button', { name: 'Compute with these numbers' });
    await compute.click();
    expect(await page.getByRole('alert').textContent()).toMatch(/as on record/);
    await field.fill('much');
    await compute.click();
    expect(await page.getByRole('alert').textContent()).toBe(
      'Not a number: soil.layers[0].resistivity_ohm_m.',
    );
    await field.fill('-5');
    await compute.click();
    await page.locator('.recompute li').waitFor();
    expect(await page.locator('.recompute li').textContent()).toMatch(
      /^study\.json:1: soil\.layers\[0\]\.resistivity_ohm_m: .*-5/,
    );
    await page.close();
  });

  it('can be cancelled and begun again', async () => {
    const { page } = await opened();
    await page.getByRole('button', { name: 'Recompute' }).click();
    await page.getByRole('button', { name: 'Cancel' }).click();
    expect(await page.getByRole('status').textContent()).toBe('Cancelled.');
    expect(await recomputed(page)).toMatch(/^All /);
    await page.close();
  });

  it('gives the same where compiled kernels are forbidden', async () => {
    for (const [text, compiles] of [
      [html, true],
      [replaced(" 'wasm-unsafe-eval'", ''), false],
    ] as const) {
      const { page } = await opened(text);
      expect(await recomputed(page)).toMatch(/^All /);
      expect(await page.workers()[0]!.evaluate(compilesWasm)).toBe(compiles);
      await page.close();
    }
  });

  it('runs no script but its own', async () => {
    const { page } = await opened(replaced('</main>', '</main><script>document.title="run"</script>'));
    expect(await page.title()).toMatch(/^Four meshes/);
    await page.close();
  });

  it('reads the same without scripts, and prints without the strip', async () => {
    const { page } = await opened();
    const text = await sheetText(page);
    expect(await page.locator('.recompute').isVisible()).toBe(true);
    await page.emulateMedia({ media: 'print' });
    expect(await page.locator('.recompute').isVisible()).toBe(false);
    const context = await browser.newContext({ javaScriptEnabled: false, viewport: page.viewportSize() });
    const plain = await context.newPage();
    await plain.goto(page.url());
    expect(await plain.locator('.recompute').count()).toBe(0);
    expect(await sheetText(plain)).toBe(text);
    for (const script of await plain.locator('script').all()) expect(await script.isVisible()).toBe(false);
    await context.close();
    await page.close();
  });

  it('fits a phone without scrolling sideways', async () => {
    const { page } = await opened();
    await page.setViewportSize({ width: 390, height: 844 });
    await page.getByText('Try other numbers beside the record').click();
    const [content, window] = await page.evaluate(() => [document.documentElement.scrollWidth, innerWidth]);
    expect(content).toBeLessThanOrEqual(window!);
    await page.close();
  });
});

it('a pack from the live sheet carries the same program, and verifies on another kind of machine', async () => {
  const live = await openLiveSheet();
  const { page } = await watchedPage(live);
  await page.goto(live.url);
  await page.setInputFiles(
    'input[type=file][accept]',
    [...files].map(([name, content]) => ({ name, mimeType: 'text/plain', buffer: Buffer.from(content) })),
  );
  await page.getByText('Computed.', { exact: true }).waitFor({ timeout: 60_000 });
  const [download] = await Promise.all([
    page.waitForEvent('download'),
    page.getByRole('button', { name: 'take the review pack' }).click(),
  ]);
  const pack = new Uint8Array(readFileSync(await download.path()));
  await live.close();
  const { differences, checked } = await verifyPack(pack, (loaded) => solveStudy(loaded), { scripts });
  expect(differences).toEqual([]);
  expect(checked.renderings).toBeGreaterThan(10);
});
