// The built engine and its helpers in a browser: same results with and without them, with shared memory and by messages.
import { readFileSync } from 'node:fs';
import { createServer, type Server } from 'node:http';
import { resolve } from 'node:path';
import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { openBrowser } from './browser.ts';

/** A lattice whose second mesh is large enough for helpers, and its first is not; invented. */
const ACROSS = 31;
const LONG = ACROSS * 5;
const lines = Array.from({ length: ACROSS + 1 }, (_, k) => 5 * k).flatMap((at) => [
  `x${at},${at},0,0.5,${at},${LONG},0.5,12`,
  `y${at},0,${at},0.5,${LONG},${at},0.5,12`,
]);
const FILES: [string, string][] = [
  ['grid.csv', ['id,x1_m,y1_m,depth1_m,x2_m,y2_m,depth2_m,diameter_mm', ...lines].join('\n')],
  [
    'study.json',
    JSON.stringify({
      format: 'ohmstead-study',
      version: 1,
      title: 'Lattice',
      soil: { layers: [{ resistivity_ohm_m: 220, thickness_m: 2 }, { resistivity_ohm_m: 60 }] },
      conductors: ['grid.csv'],
      cases: [{ name: 'bus', grid_current_A: 1500, duration_s: 0.5 }],
      limits: { basis: 'IEEE 80', body_mass_kg: 70 },
    }),
  ],
];

/** Pages under this path are isolated from all others, and may share memory. */
const ISOLATED = '/isolated';
const engine = readFileSync(resolve(import.meta.dirname, '../dist/engine/engine.js'), 'utf8');
let server: Server;
let browser: Browser;
let origin: string;
beforeAll(async () => {
  server = createServer(({ url }, response) => {
    response.setHeader('Content-Type', 'text/html');
    if (url === ISOLATED) {
      response.setHeader('Cross-Origin-Opener-Policy', 'same-origin');
      response.setHeader('Cross-Origin-Embedder-Policy', 'require-corp');
    }
    response.end('<!doctype html><title>empty</title>');
  });
  await new Promise<void>((listening) => server.listen(0, '127.0.0.1', listening));
  const address = server.address();
  origin = `http://127.0.0.1:${typeof address === 'object' ? address?.port : ''}`;
  browser = await openBrowser();
});
afterAll(async () => {
  await browser?.close();
  server?.close();
});

interface Told {
  readonly results: string;
  readonly started: number;
  /** answers of helpers */
  readonly said: number;
}

/** Solves on a machine said to have so many processors. @param spoiled whether helpers break at once */
async function solved(path: string, processors: number, spoiled: boolean = false): Promise<Told> {
  const page = await browser.newPage();
  await page.goto(origin + path);
  const prefix = `
    Object.defineProperty(navigator, 'hardwareConcurrency', { value: ${processors} });
    if (name === 'helper' && ${spoiled}) throw new Error('spoiled');
    const { Worker: Started } = self;
    self.Worker = function (...given) {
      postMessage({ kind: 'started' });
      const worker = new Started(...given);
      worker.addEventListener('message', () => postMessage({ kind: 'said' }));
      return worker;
    };`;
  const told = await page.evaluate(
    ([text, files]) =>
      new Promise<Told>((done, failed) => {
        const count = { started: 0, said: 0 };
        const worker = new Worker(URL.createObjectURL(new Blob([text], { type: 'text/javascript' })), {
          name: 'engine',
        });
        worker.onerror = (event) => failed(new Error(event.message));
        worker.onmessage = ({ data }) => {
          if (data.kind === 'started') count.started++;
          else if (data.kind === 'said') count.said++;
          else if (data.kind === 'solved') done({ ...count, results: JSON.stringify(data.outcome.results) });
          else if (data.kind === 'failed' || data.kind === 'faults') failed(new Error(JSON.stringify(data)));
        };
        worker.postMessage({ kind: 'carry', scripts: { engine: text } });
        const encoder = new TextEncoder();
        worker.postMessage({
          kind: 'solve',
          run: 1,
          files: new Map(files.map(([name, content]) => [name, encoder.encode(content)])),
        });
      }),
    [`${prefix}\n${engine}`, FILES] as const,
  );
  await page.close();
  return told;
}

test('results are the same alone, with helpers that share memory or are sent vectors, and with broken ones', async () => {
  const alone = await solved('/', 1);
  expect(alone.started).toBe(0);
  const sent = await solved('/', 3);
  expect(sent.started).toBe(2);
  expect(sent.said).toBeGreaterThan(10);
  const shared = await solved(ISOLATED, 2);
  expect(shared.started).toBe(1);
  expect(shared.said).toBeGreaterThan(10);
  const broken = await solved('/', 2, true);
  expect([broken.started, broken.said]).toEqual([1, 0]);
  for (const { results } of [sent, shared, broken]) expect(results).toBe(alone.results);
});
