// Runs the benchmark, then prints the page's own times: node .ci/bench.mjs [--full | --smallest], after `npm run build`.
import { spawnSync } from 'node:child_process';

const given = process.argv.slice(2);
const { status } = spawnSync(process.execPath, ['apps/cli/dist/bench.js', ...given], { stdio: 'inherit' });
if (status !== 0) process.exit(status ?? 1);
if (!given.includes('--smallest')) await import('./page-times.mjs');
