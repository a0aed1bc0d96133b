import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type LiveSheet, openLiveSheet, watchedPage } from './browser.ts';

/** The rules are axe-core's, as its defaults have them. */
const axe = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8');

let sheet: LiveSheet;
beforeAll(async () => {
  sheet = await openLiveSheet();
});
afterAll(async () => {
  await sheet?.close();
});

/** What axe finds wrong, one line a violation with the first element that breaks it. */
async function violations(page: Page): Promise<string[]> {
  await page.evaluate(axe);
  return page.evaluate(async () => {
    const { axe } = globalThis as unknown as {
      axe: {
        run(): Promise<{ violations: { id: string; nodes: { html: string; failureSummary: string }[] }[] }>;
      };
    };
    const found = await axe.run();
    return found.violations.map(
      ({ id, nodes }) => `${id} (${nodes.length}): ${nodes[0]?.html} — ${nodes[0]?.failureSummary}`,
    );
  });
}

async function demonstration(page: Page): Promise<void> {
  await page.goto(sheet.url);
  await page.getByRole('button', { name: 'Try the demonstration study' }).click();
  await page.getByText('Computed.', { exact: true }).waitFor({ timeout: 90_000 });
}

describe('axe finds nothing wrong', () => {
  it('at the start, and with files that cannot be read', async () => {
    const { page } = await watchedPage(sheet);
    await page.goto(sheet.url);
    expect(await violations(page)).toEqual([]);
    await page.setInputFiles('input[type=file][accept]', {
      name: 'study.json',
      mimeType: 'text/plain',
      buffer: Buffer.from('{'),
    });
    await page.getByRole('alert').first().waitFor();
    expect(await violations(page)).toEqual([]);
    await page.context().close();
  });

  it('in a study that lacks nearly everything', async () => {
    const { page } = await watchedPage(sheet);
    await page.goto(sheet.url);
    await page.setInputFiles('input[type=file][accept]', {
      name: 'yard.csv',
      mimeType: 'text/plain',
      buffer: Buffer.from('x1_m,y1_m,depth1_m,x2_m,y2_m,depth2_m,diameter_mm\n0,0,0.5,20,0,0.5,10\n'),
    });
    await page.locator('#ground').waitFor();
    expect(await violations(page)).toEqual([]);
    await page.context().close();
  });

  it.each(['light', 'dark'] as const)(
    'in the whole sheet, %s, compared with a pinned state, and at fault',
    async (scheme) => {
      const { page } = await watchedPage(sheet);
      await page.emulateMedia({ colorScheme: scheme });
      await demonstration(page);
      await page.getByRole('button', { name: 'pin this state' }).click();
      await page.getByText('Conductors as tables').click();
      await page.locator('.plan-words').getByRole('button', { name: 'rod', exact: true }).click();
      expect(await violations(page)).toEqual([]);
      const field = page.locator('[data-input="cases[0].duration_s"]').first();
      await field.fill('1000 s');
      await field.press('Enter');
      await page.getByText(/The study has/).waitFor({ timeout: 30_000 });
      expect(await violations(page)).toEqual([]);
      await page.context().close();
    },
  );
});
