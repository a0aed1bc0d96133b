import { afterAll, beforeAll, expect, it } from 'vitest';
import { type LiveSheet, openLiveSheet, watchedPage } from './browser.ts';

let sheet: LiveSheet;
beforeAll(async () => {
  sheet = await openLiveSheet();
});
afterAll(async () => {
  await sheet?.close();
});

it('opens and computes without a network, once it was opened with one', async () => {
  const { page, errors } = await watchedPage(sheet);
  await page.goto(sheet.url);
  await page.evaluate(async () => {
    await navigator.serviceWorker.ready;
  });
  await page.context().setOffline(true);
  await page.reload();
  await page.getByRole('button', { name: 'Try the demonstration study' }).click();
  await page.getByText('Computed.', { exact: true }).waitFor({ timeout: 60_000 });
  expect(errors).toEqual([]);
  await page.context().close();
});
