import { readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import { readPack } from '@ohmstead/pack';
import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type LiveSheet, openLiveSheet, PLAIN_HOST, watchedPage } from './browser.ts';

const root = resolve(import.meta.dirname, '../../..');
const conductors = readFileSync(resolve(root, 'test-data/square-70m/conductors.csv'), 'utf8');
const FILES = 'input[type=file][accept]';

let sheet: LiveSheet;
beforeAll(async () => {
  sheet = await openLiveSheet();
});
afterAll(async () => {
  await sheet?.close();
});

async function computed(page: Page): Promise<void> {
  await page.getByText('Computed.', { exact: true }).waitFor({ timeout: 90_000 });
}

async function typed(page: Page, input: string, text: string): Promise<void> {
  const field = page.locator(`[data-input="${input}"]`).first();
  await field.fill(text);
  await field.press('Enter');
}

const resistance = (page: Page): Promise<string | null> => page.locator('#rise .body').first().textContent();

describe('a study from a bare table to a review pack', () => {
  it('asks for what is missing, follows every edit, compares, goes back, and is taken away and opened again', async () => {
    const { page, errors } = await watchedPage(sheet);
    await page.goto(sheet.url);
    await page.evaluate((text) => {
      const data = new DataTransfer();
      data.items.add(new File([text], 'yard.csv', { type: 'text/csv' }));
      document.body.dispatchEvent(
        new DragEvent('drop', { dataTransfer: data, bubbles: true, cancelable: true }),
      );
    }, conductors);
    // only what a table of conductors cannot tell
    const needs = page.getByRole('region', { name: /the sheet needs/ });
    await needs.waitFor();
    const answer = async (label: RegExp, text: string): Promise<void> => {
      await needs.getByLabel(label).fill(text);
      await needs.getByLabel(label).press('Enter');
    };
    await answer(/soil resistivity/, '0.4 kΩ·m');
    await answer(/fault duration/, '500 ms');
    await answer(/grid current/, '1.908 kA');
    await needs.getByRole('button', { name: /^70/ }).click();
    await computed(page);
    // B.1 of IEEE Std 80-2000: 2.648 to 2.6518 Ω (see the agreement table)
    expect(await resistance(page)).toMatch(/2\.6[45]\d*\s/);

    await page.getByRole('button', { name: 'pin this state' }).click();
    await typed(page, 'soil.layers[0].resistivity_ohm_m', 'four hundred');
    expect(await page.locator('#ground [aria-invalid]').count()).toBe(1);
    await typed(page, 'soil.layers[0].resistivity_ohm_m', '200');
    expect(await page.locator('#rise .state').textContent()).toMatch(/computing|out of date/);
    await computed(page);
    expect(await resistance(page)).toMatch(/1\.32\d*\s.*less than pinned/s);
    const compared = await page.locator('table.compare').textContent();
    expect(compared).toMatch(/resistivity/);

    await page.getByRole('button', { name: 'undo', exact: true }).click();
    await computed(page);
    expect(await resistance(page)).toMatch(/2\.6[45]\d*\s/);

    const [download] = await Promise.all([
      page.waitForEvent('download'),
      page.getByRole('button', { name: 'take the review pack' }).click(),
    ]);
    const path = await download.path();
    const pack = await readPack(new Uint8Array(readFileSync(path)));
    expect(new TextDecoder().decode(pack.entries.get('study/yard.csv'))).toBe(conductors);

    const again = await watchedPage(sheet);
    await again.page.goto(sheet.url);
    await again.page.setInputFiles(FILES, {
      name: 'a.zip',
      mimeType: 'application/zip',
      buffer: readFileSync(path),
    });
    await computed(again.page);
    expect(await resistance(again.page)).toMatch(/2\.6[45]\d*\s/);
    expect([...errors, ...again.errors]).toEqual([]);
    await page.context().close();
    await again.page.context().close();
  });

  it('shows feet and inches on demand, and reads them', async () => {
    const { page } = await watchedPage(sheet);
    await page.goto(sheet.url);
    await page.getByRole('button', { name: 'Try the demonstration study' }).click();
    await computed(page);
    await page.getByRole('button', { name: 'show feet and inches' }).click();
    await expect
      .poll(() => page.locator('[data-input="soil.layers[0].thickness_m"]').first().inputValue())
      .toMatch(/^7\.874\s*ft$/);
    await typed(page, 'surfacing.thickness_m', '6 in');
    await computed(page);
    await page.getByRole('button', { name: 'show metres' }).click();
    await expect
      .poll(() => page.locator('[data-input="surfacing.thickness_m"]').first().inputValue())
      .toMatch(/^0\.1524\s*m$/);
    await page.context().close();
  });
});

describe('a plain http host', () => {
  it('serves a page that computes, writes a review pack and opens it', async () => {
    const { page, errors } = await watchedPage(sheet);
    await page.goto(sheet.url.replace('127.0.0.1', PLAIN_HOST));
    expect(await page.evaluate(() => isSecureContext)).toBe(false);
    await page.getByRole('button', { name: 'Try the demonstration study' }).click();
    await computed(page);
    const [download] = await Promise.all([
      page.waitForEvent('download'),
      page.getByRole('button', { name: 'take the review pack' }).click(),
    ]);
    await page.getByRole('button', { name: 'all studies' }).click();
    const buffer = readFileSync(await download.path());
    await page.setInputFiles(FILES, { name: 'a.zip', mimeType: 'application/zip', buffer });
    await computed(page);
    const { entries } = await readPack(new Uint8Array(buffer));
    expect(entries.has('study/study.json')).toBe(true);
    expect(errors).toEqual([]);
    await page.context().close();
  });
});

describe('files that cannot be opened', () => {
  it.each([
    ['a zip cut short', 'cut.zip', Buffer.from('PK\u0003\u0004 cut'), /cut\.zip/],
    ['text that is no table', 'notes.csv', Buffer.from('these are notes'), /notes\.csv/],
    ['a study that is no JSON', 'study.json', Buffer.from('{ "title": '), /study\.json/],
  ])('%s is told by name', async (_, name, buffer, told) => {
    const { page, errors } = await watchedPage(sheet);
    await page.goto(sheet.url);
    await page.setInputFiles(FILES, { name, mimeType: 'application/octet-stream', buffer });
    await page.getByRole('alert').filter({ hasText: told }).waitFor();
    expect(errors).toEqual([]);
    await page.context().close();
  });

  it('leave the study that is worked at where it is', async () => {
    const { page } = await watchedPage(sheet);
    await page.goto(sheet.url);
    await page.getByRole('button', { name: 'Try the demonstration study' }).click();
    await computed(page);
    await page.setInputFiles(FILES, { name: 'cut.zip', mimeType: 'x/x', buffer: Buffer.from('cut') });
    await page
      .getByRole('alert')
      .filter({ hasText: /cut\.zip/ })
      .waitFor();
    expect(await page.locator('#rise').count()).toBe(1);
    await typed(page, 'soil.layers[0].resistivity_ohm_m', '100');
    await expect
      .poll(() =>
        page
          .getByRole('alert')
          .filter({ hasText: /cut\.zip/ })
          .count(),
      )
      .toBe(0);
    await page.context().close();
  });
});

describe('a cell of the conductor table', () => {
  it('is marked and told of beside its table while it is at fault', async () => {
    const { page } = await watchedPage(sheet);
    await page.goto(sheet.url);
    await page.getByRole('button', { name: 'Try the demonstration study' }).click();
    await computed(page);
    await page.getByText('Conductors as tables').click();
    const cell = page.getByLabel('diameter_mm, row 2', { exact: true });
    await cell.fill('thick');
    await cell.press('Tab');
    await page.getByText('The study has a fault, told under Electrode.').waitFor();
    expect(await cell.getAttribute('aria-invalid')).toBe('true');
    expect(await page.locator('.conductors .input-faults').textContent()).toMatch(/:2: diameter_mm: thick/);
    await cell.fill('12');
    await cell.press('Tab');
    await computed(page);
    expect(await page.locator('.conductors .input-faults').count()).toBe(0);
    await page.context().close();
  });
});

describe('what is added to a study that was computed', () => {
  it('is asked for where it is not whole, and the sheet is out of date until then', async () => {
    const { page } = await watchedPage(sheet);
    await page.goto(sheet.url);
    await page.getByRole('button', { name: 'Try the demonstration study' }).click();
    await computed(page);
    await page.getByRole('button', { name: 'add a case' }).click();
    await page.getByText('Out of date: the sheet asks for what is missing.').waitFor();
    const needs = page.getByRole('region', { name: /the sheet needs/ });
    await needs.getByLabel(/grid current/).fill('2 kA');
    await needs.getByLabel(/grid current/).press('Enter');
    await needs.getByLabel(/fault duration/).fill('0.5');
    await needs.getByLabel(/fault duration/).press('Enter');
    await computed(page);
    expect(await needs.count()).toBe(0);
    await page.context().close();
  });

  it('may be rows typed by hand, which leave the field when they are taken', async () => {
    const { page } = await watchedPage(sheet);
    await page.goto(sheet.url);
    await page.getByRole('button', { name: 'Try the demonstration study' }).click();
    await computed(page);
    await page.locator('#ground').getByText('paste rows').click();
    const rows = page.locator('#ground textarea').first();
    await rows.fill('100\tthick\n50');
    await rows.blur();
    await page.locator('#ground .input-faults').waitFor();
    await rows.fill('100\t3\n50');
    await rows.blur();
    await computed(page);
    expect(await page.locator('#ground .input-faults').count()).toBe(0);
    expect(await rows.inputValue()).toBe('');
    expect(await page.locator('[data-input="soil.layers[0].thickness_m"]').first().inputValue()).toMatch(
      /^3\s/,
    );
    await page.context().close();
  });
});
