import { readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import { readPack } from '@ohmstead/pack';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type LiveSheet, openLiveSheet, watchedPage } from './browser.ts';

const demo = resolve(import.meta.dirname, '../../../test-data/aldermoor');
const fileOf = (name: string, text: string) => ({ name, mimeType: 'text/plain', buffer: Buffer.from(text) });
const study = readFileSync(resolve(demo, 'study.json'), 'utf8');
const conductors = readFileSync(resolve(demo, 'conductors.csv'), 'utf8');
const FILES = 'input[type=file][accept]';

let sheet: LiveSheet;
beforeAll(async () => {
  sheet = await openLiveSheet();
});
afterAll(async () => {
  await sheet?.close();
});

describe('the live sheet', () => {
  it('computes the demonstration study, says which case exceeds a limit, and hands out a pack that reads', async () => {
    const { page, errors, requests } = await watchedPage(sheet);
    await page.goto(sheet.url);
    const loaded = requests.length;
    await page.getByRole('button', { name: 'Try the demonstration study' }).click();
    await page.getByRole('heading', { level: 1, name: /Aldermoor/ }).waitFor({ timeout: 60_000 });
    await page.getByText('Computed.', { exact: true }).waitFor({ timeout: 60_000 });
    expect(await page.locator('.answer').getByText('exceeds a limit').isVisible()).toBe(true);
    const [download] = await Promise.all([
      page.waitForEvent('download'),
      page.getByRole('button', { name: 'take the review pack' }).click(),
    ]);
    const pack = await readPack(new Uint8Array(readFileSync(await download.path())));
    expect([...pack.entries.keys()]).toContain('index.html');
    expect(new TextDecoder().decode(pack.entries.get('study/study.json'))).toBe(study);
    // after the page itself only its own worker and blobs
    for (const url of requests.slice(loaded))
      expect(url.startsWith(sheet.url) || url.startsWith('blob:')).toBe(true);
    expect(errors).toEqual([]);
    await page.close();
  });

  it('tells every fault of a broken study, each with file, line and column', async () => {
    const { page } = await watchedPage(sheet);
    await page.goto(sheet.url);
    const broken = conductors.split('\n');
    broken[3] = broken[3]!.replace(/,12,/, ',-12,').replace(/,16,/, ',-16,');
    await page.setInputFiles(FILES, [
      fileOf('study.json', study),
      fileOf('conductors.csv', broken.join('\n')),
    ]);
    const alert = page.getByRole('alert').first();
    await alert.waitFor();
    expect(await alert.textContent()).toMatch(/conductors\.csv:4: diameter_mm: .*-1[26].*positive length/);
    await page.close();
  });

  it('shows names as text, whatever they hold', async () => {
    const { page, errors } = await watchedPage(sheet);
    await page.goto(sheet.url);
    const hostile = study.replace(
      'Aldermoor 33 kV intake',
      '<script>alert(1)</script><img src=x onerror=alert(2)>',
    );
    await page.setInputFiles(FILES, [fileOf('study.json', hostile), fileOf('conductors.csv', conductors)]);
    await page.getByRole('heading', { level: 1, name: /<script>alert/ }).waitFor({ timeout: 60_000 });
    expect(await page.locator('main script, main img').count()).toBe(0);
    expect(errors).toEqual([]);
    await page.close();
  });

  it('can be cancelled', async () => {
    const { page } = await watchedPage(sheet);
    await page.goto(sheet.url);
    await page.getByRole('button', { name: 'Try the demonstration study' }).click();
    await page.getByRole('button', { name: 'cancel' }).click();
    await page.getByText('Not computed.').waitFor();
    await page.getByRole('button', { name: 'compute' }).click();
    await page.getByText('Computed.', { exact: true }).waitFor({ timeout: 60_000 });
    await page.close();
  });

  it('fits a phone without scrolling sideways', async () => {
    const { page } = await watchedPage(sheet);
    await page.setViewportSize({ width: 390, height: 844 });
    await page.goto(sheet.url);
    await page.getByRole('button', { name: 'Try the demonstration study' }).click();
    await page.getByRole('heading', { level: 1, name: /Aldermoor/ }).waitFor({ timeout: 60_000 });
    const [content, window] = await page.evaluate(() => [document.documentElement.scrollWidth, innerWidth]);
    expect(content).toBeLessThanOrEqual(window!);
    await page.close();
  });
});
