// Prints how long edits take on the page, as the page itself measures it: node .ci/page-times.mjs, after `npm run build`.
import { existsSync } from 'node:fs';
import { loadavg } from 'node:os';
import { dirname, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';
import { chromium } from 'playwright-core';
import { preview } from 'vite';

const CHROMIUM = '/usr/bin/chromium';
/** Edits of each case; the first few only warm the engine up. */
const EDITS = 9;
const WARMING = 3;
const root = resolve(dirname(fileURLToPath(import.meta.url)), '..');

/** A square of conductors laid every 5 m in three layers: about 2 000 segments on the second mesh. */
function largeStudy() {
  const lines = [];
  for (let k = 0; k <= 22; k++)
    lines.push(`0,${5 * k},0.6,110,${5 * k},0.6,12`, `${5 * k},0,0.6,${5 * k},110,0.6,12`);
  return {
    'study.json': JSON.stringify({
      format: 'ohmstead-study',
      version: 1,
      title: 'Large square',
      soil: {
        layers: [
          { resistivity_ohm_m: 180, thickness_m: 1.5 },
          { resistivity_ohm_m: 60, thickness_m: 6 },
          { resistivity_ohm_m: 400 },
        ],
      },
      conductors: ['conductors.csv'],
      cases: [{ name: 'bus', grid_current_A: 3000, duration_s: 0.5 }],
      limits: { basis: 'IEEE 80', body_mass_kg: 70 },
    }),
    'conductors.csv': ['x1_m,y1_m,depth1_m,x2_m,y2_m,depth2_m,diameter_mm', ...lines].join('\n'),
  };
}

const median = (values) => values.toSorted((a, b) => a - b)[Math.floor(values.length / 2)];
const cell = (values) =>
  values.length === 0
    ? '–'
    : `${median(values).toFixed(0)} (${Math.min(...values).toFixed(0)} to ${Math.max(...values).toFixed(0)})`;

/** Waits until an edit is computed: the page says so only after it said that it computes. */
async function computed(page, before) {
  await page.waitForFunction(
    (count) => performance.getEntriesByName('edit to whole sheet').length > count,
    before,
    { timeout: 120_000 },
  );
}

async function measured(page, edit) {
  await page.evaluate(() => {
    globalThis.longTasks = [];
    new PerformanceObserver((list) => {
      for (const entry of list.getEntries()) globalThis.longTasks.push(entry.duration);
    }).observe({ type: 'longtask' });
  });
  for (let k = 0; k < EDITS; k++) {
    if (k === WARMING)
      await page.evaluate(() => {
        performance.clearMeasures();
        globalThis.longTasks.length = 0;
      });
    const before = await page.evaluate(() => performance.getEntriesByName('edit to whole sheet').length);
    await edit(k);
    await computed(page, before);
    // figures are drawn one after another
    await page.waitForTimeout(500);
  }
  return page.evaluate(() => ({
    first: performance.getEntriesByName('edit to first numbers').map(({ duration }) => duration),
    whole: performance.getEntriesByName('edit to whole sheet').map(({ duration }) => duration),
    longest: Math.max(0, ...globalThis.longTasks),
  }));
}

function typing(page) {
  return async (k) => {
    const field = page.locator('[data-input="soil.layers[0].resistivity_ohm_m"]').first();
    await field.fill(String(200 + k));
    await field.press('Enter');
  };
}

/** Moves one rod to and fro by keyboard, so that the geometry alone changes. */
function nudging(page) {
  return async (k) => {
    await page.locator('.plan-svg').focus();
    await page.keyboard.press(k % 2 === 0 ? 'ArrowRight' : 'ArrowLeft');
  };
}

if (!existsSync(CHROMIUM)) {
  console.log('Times of the page: no Chromium on this machine, so none are printed.');
  process.exit(0);
}
const server = await preview({ root: resolve(root, 'apps/report'), preview: { host: '127.0.0.1', port: 0 } });
const browser = await chromium.launch({
  executablePath: CHROMIUM,
  args: [
    '--no-sandbox',
    '--disable-gpu',
    '--disable-quic',
    '--disable-background-networking',
    '--no-first-run',
  ],
});
const page = await browser.newPage({ viewport: { width: 1280, height: 900 } });
const begun = performance.now();
await page.goto(server.resolvedUrls.local[0]);
await page.getByRole('heading', { level: 1, name: 'Ohmstead' }).waitFor();
const render = performance.now() - begun;
const bytes = await page.evaluate(() =>
  performance.getEntriesByType('resource').reduce((sum, { encodedBodySize }) => sum + encodedBodySize, 0),
);
const rows = [];
await page.getByRole('button', { name: 'Try the demonstration study' }).click();
await page.getByText('Computed.', { exact: true }).waitFor({ timeout: 120_000 });
rows.push(['the demonstration, a resistivity typed', await measured(page, typing(page))]);
await page.getByText('Conductors as tables').click();
await page.getByRole('checkbox').last().check();
rows.push(['the demonstration, a conductor moved', await measured(page, nudging(page))]);
const files = Object.entries(largeStudy()).map(([name, text]) => ({
  name,
  mimeType: 'text/plain',
  buffer: Buffer.from(text),
}));
await page.setInputFiles('input[type=file][accept]', files);
await page.locator('[data-input="soil.layers[2].resistivity_ohm_m"]').waitFor({ timeout: 120_000 });
await page.getByText('Computed.', { exact: true }).waitFor({ timeout: 120_000 });
rows.push(['a square of 2 000 segments in three layers', await measured(page, typing(page))]);
await browser.close();
await server.close();
console.log(
  `Chromium, load average ${loadavg()[0].toFixed(1)}; ms, median (least to most) of ${EDITS - WARMING} edits\n`,
);
console.log('| edit | first numbers and verdict | whole sheet with maps | longest task of the page |');
console.log('|---|---|---|---|');
for (const [name, { first, whole, longest }] of rows)
  console.log(`| ${name} | ${cell(first)} | ${cell(whole)} | ${longest.toFixed(0)} |`);
console.log(
  `\nFirst render ${render.toFixed(0)} ms after the address is opened; ${(bytes / 1000).toFixed(0)} kB transferred for the page, compressed as it is served.`,
);
