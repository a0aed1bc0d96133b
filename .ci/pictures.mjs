// Takes the README's pictures from the running sheet: node .ci/pictures.mjs, after `npm run build`.
import { mkdirSync } from 'node:fs';
import { dirname, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';
import { chromium } from 'playwright-core';
import { preview } from 'vite';

const root = resolve(dirname(fileURLToPath(import.meta.url)), '..');
const out = resolve(root, 'apps/report/pictures');
mkdirSync(out, { recursive: true });
const server = await preview({ root: resolve(root, 'apps/report'), preview: { host: '127.0.0.1', port: 0 } });
const browser = await chromium.launch({
  executablePath: '/usr/bin/chromium',
  args: [
    '--no-sandbox',
    '--disable-gpu',
    '--disable-quic',
    '--disable-background-networking',
    '--no-first-run',
  ],
});

async function solved(width, height) {
  const page = await browser.newPage({ viewport: { width, height } });
  await page.goto(server.resolvedUrls.local[0]);
  await page.getByRole('button', { name: 'Try the demonstration study' }).click();
  await page.getByText('Computed.', { exact: true }).waitFor({ timeout: 120_000 });
  // figures are drawn one after another
  await page.waitForTimeout(1500);
  return page;
}

const desktop = await solved(1360, 1180);
await desktop.evaluate(() => scrollTo(0, (document.querySelector('#surface')?.offsetTop ?? 0) - 60));
const plan = await desktop.locator('.plan-svg').boundingBox();
await desktop.mouse.move(plan.x + 0.42 * plan.width, plan.y + 0.4 * plan.height);
await desktop.waitForTimeout(300);
await desktop.screenshot({ path: resolve(out, 'desktop.png') });
const phone = await solved(390, 844);
await phone.screenshot({ path: resolve(out, 'phone.png') });
const print = await solved(794, 1123);
await print.emulateMedia({ media: 'print' });
// the margins that paper has
await print.addStyleTag({ content: 'body { margin: 12mm 14mm }' });
await print.screenshot({ path: resolve(out, 'print.png') });
await browser.close();
await server.close();
