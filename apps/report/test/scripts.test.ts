// What the built page weighs, and that the scripts it carries are the same bytes at every build.
import { spawnSync } from 'node:child_process';
import { mkdtempSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { gzipSync } from 'node:zlib';
import { expect, it } from 'vitest';

const root = resolve(import.meta.dirname, '..');
/** Transfer size of the whole page, packed, bytes. */
const MOST_TRANSFER = 500_000;

it('the page transfers at most 500 kB', () => {
  const site = resolve(root, 'dist/site');
  const files = readdirSync(site, { recursive: true, withFileTypes: true }).filter((entry) => entry.isFile());
  const sizes = files.map((entry) => gzipSync(readFileSync(join(entry.path, entry.name))).length);
  expect(sizes.length).toBeGreaterThan(2);
  expect(sizes.reduce((sum, size) => sum + size, 0)).toBeLessThanOrEqual(MOST_TRANSFER);
});

it.each(['engine', 'starter'])('%s is the same bytes when built again', (mode) => {
  const outDir = mkdtempSync(join(tmpdir(), 'ohmstead-'));
  // as from a shell: the test runner's own environment asks for a build for tests
  const { NODE_ENV: _, ...env } = process.env;
  try {
    const vite = resolve(root, '../../node_modules/vite/bin/vite.js');
    const options = [
      '--config',
      'vite.engine.config.ts',
      '--mode',
      mode,
      '--outDir',
      outDir,
      '--logLevel',
      'error',
    ];
    const { status, stderr } = spawnSync(process.execPath, [vite, 'build', ...options], {
      cwd: root,
      env,
      encoding: 'utf8',
    });
    expect([status, stderr]).toEqual([0, '']);
    const [again, before] = [outDir, resolve(root, 'dist/engine')].map((folder) =>
      readFileSync(join(folder, `${mode}.js`), 'utf8'),
    );
    expect(again === before).toBe(true);
  } finally {
    rmSync(outDir, { recursive: true });
  }
});
