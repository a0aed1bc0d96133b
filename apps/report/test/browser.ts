// Chromium with the built sheet served from this machine, for tests.
import { existsSync } from 'node:fs';
import { resolve } from 'node:path';
import { type Browser, chromium, type Page } from 'playwright-core';
import { type PreviewServer, preview } from 'vite';

const CHROMIUM = '/usr/bin/chromium';
/** A name of this machine that browsers take for a plain http host, unlike its loopback address. */
export const PLAIN_HOST = 'plain.test';
const FLAGS = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--disable-background-networking',
  '--no-first-run',
  `--host-resolver-rules=MAP ${PLAIN_HOST} 127.0.0.1`,
];

export interface LiveSheet {
  readonly browser: Browser;
  readonly url: string;
  close(): Promise<void>;
}

export function openBrowser(): Promise<Browser> {
  return chromium.launch({ executablePath: CHROMIUM, args: FLAGS });
}

/** Serves the built page and starts a browser; fails where either is missing. */
export async function openLiveSheet(): Promise<LiveSheet> {
  const root = resolve(import.meta.dirname, '..');
  if (!existsSync(resolve(root, 'dist/site/index.html'))) throw new Error('the live sheet is not built');
  const server: PreviewServer = await preview({
    root,
    logLevel: 'error',
    preview: { host: '127.0.0.1', port: 0, allowedHosts: [PLAIN_HOST] },
  });
  const browser = await openBrowser();
  return {
    browser,
    url: server.resolvedUrls?.local[0] ?? '',
    async close() {
      await browser.close();
      await server.close();
    },
  };
}

/** A page that collects its own errors and every request it makes. */
export async function watchedPage(
  sheet: Pick<LiveSheet, 'browser'>,
): Promise<{ page: Page; errors: string[]; requests: string[] }> {
  const context = await sheet.browser.newContext({ viewport: { width: 1180, height: 900 } });
  const page = await context.newPage();
  const errors: string[] = [];
  const requests: string[] = [];
  page.on('pageerror', (error) => errors.push(error.message));
  page.on('console', (message) => {
    if (message.type() === 'error') errors.push(message.text());
  });
  page.on('request', (request) => requests.push(request.url()));
  return { page, errors, requests };
}
