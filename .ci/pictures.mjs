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
  await page.getByRole('heading', { level: 1, name: /Aldermoor/ }).waitFor({ timeout: 120_000 });
  return page;
}

const desktop = await solved(1100, 1250);
await desktop.getByRole('heading', { name: 'Surface', exact: true }).scrollIntoViewIfNeeded();
await desktop.evaluate(() => scrollTo(0, document.querySelector('#surface')?.offsetTop ?? 0));
await desktop.screenshot({ path: resolve(out, 'desktop.png') });
const phone = await solved(390, 844);
await phone.screenshot({ path: resolve(out, 'phone.png') });
await desktop.pdf({ path: resolve(root, '.ci/out/print.pdf'), format: 'A4', printBackground: true });
await browser.close();
await server.close();
