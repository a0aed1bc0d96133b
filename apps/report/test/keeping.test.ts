import { readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type LiveSheet, openLiveSheet, watchedPage } from './browser.ts';

const demo = resolve(import.meta.dirname, '../../../test-data/aldermoor');
const study = readFileSync(resolve(demo, 'study.json'), 'utf8');
const TITLE = '[data-input="title"]';

let sheet: LiveSheet;
beforeAll(async () => {
  sheet = await openLiveSheet();
});
afterAll(async () => {
  await sheet?.close();
});

async function begun(page: Page): Promise<void> {
  await page.goto(sheet.url);
  await page.getByRole('button', { name: 'Try the demonstration study' }).click();
  await page.getByText('Computed.', { exact: true }).waitFor({ timeout: 60_000 });
}

async function retitled(page: Page, title: string): Promise<void> {
  await page.locator(TITLE).fill(title);
  await page.locator(TITLE).press('Enter');
  // longer than the pause after which edits are kept
  await page.waitForTimeout(1500);
}

describe('studies kept in the browser', () => {
  it('are found again, edits and undo steps included, after the page is loaded again', async () => {
    const { page } = await watchedPage(sheet);
    await begun(page);
    await retitled(page, 'Aldermoor, second issue');
    await page.reload();
    await page.locator(TITLE).waitFor();
    expect(await page.locator(TITLE).inputValue()).toBe('Aldermoor, second issue');
    await page.getByRole('button', { name: 'undo' }).click();
    await expect.poll(() => page.locator(TITLE).inputValue()).toBe(JSON.parse(study).title);
    await page.context().close();
  });

  it('are listed for a page that knows nothing of them, after a crash, and can be removed', async () => {
    const { page } = await watchedPage(sheet);
    await begun(page);
    await retitled(page, 'Aldermoor, crashed');
    const again = await page.context().newPage();
    await page.close({ runBeforeUnload: false });
    await again.goto(sheet.url);
    await again.getByRole('button', { name: 'Aldermoor, crashed', exact: true }).click();
    await again.locator(TITLE).waitFor();
    expect(await again.locator(TITLE).inputValue()).toBe('Aldermoor, crashed');
    await again.getByRole('button', { name: 'all studies' }).click();
    await again.getByRole('button', { name: /^remove/ }).click();
    await again.getByRole('button', { name: /^remove for good/ }).click();
    await expect.poll(() => again.getByRole('heading', { name: 'Kept in this browser' }).count()).toBe(0);
    await again.context().close();
  });

  it('are told to be open in another window as well', async () => {
    const { page } = await watchedPage(sheet);
    await begun(page);
    await retitled(page, 'Aldermoor, twice');
    const other = await page.context().newPage();
    await other.goto(sheet.url);
    await other.getByRole('button', { name: 'Aldermoor, twice', exact: true }).click();
    await other.locator(TITLE).waitFor();
    await retitled(other, 'Aldermoor, from the other');
    await page
      .getByRole('alert')
      .filter({ hasText: /open in another window/ })
      .waitFor();
    await page.context().close();
  });

  it('are told to be lost where the browser refuses storage', async () => {
    const { page } = await watchedPage(sheet);
    await page.addInitScript(() => {
      indexedDB.open = () => {
        throw new DOMException('The operation is insecure', 'SecurityError');
      };
    });
    await page.goto(sheet.url);
    expect(await page.getByRole('alert').first().textContent()).toMatch(/keeps nothing.*insecure.*lost/);
    await page.context().close();
  });

  it('are told not to be kept where the browser’s room is full', async () => {
    const { page } = await watchedPage(sheet);
    await page.addInitScript(() => {
      IDBObjectStore.prototype.put = () => {
        throw new DOMException('no room', 'QuotaExceededError');
      };
    });
    await begun(page);
    await expect
      .poll(() => page.getByRole('alert').first().textContent())
      .toMatch(/room for this page is full/);
    await page.context().close();
  });
});
