// Runs the built program as a user would.
import { spawnSync } from 'node:child_process';
import { fileURLToPath } from 'node:url';

export const ROOT: string = fileURLToPath(new URL('../../..', import.meta.url));
export const PROGRAM: string = `${ROOT}apps/cli/dist/ohmstead.js`;
export const DEMO: string = `${ROOT}test-data/aldermoor`;

export interface Run {
  readonly status: number | null;
  readonly out: string;
  readonly err: string;
}

/** Results of the demo with its fields stay far below this, bytes. */
const MOST_OUTPUT = 64 * 1024 * 1024;

export function ohmstead(...words: readonly string[]): Run {
  const run = spawnSync(process.execPath, [PROGRAM, ...words], { encoding: 'utf8', maxBuffer: MOST_OUTPUT });
  return { status: run.status, out: run.stdout, err: run.stderr };
}

/** A line of the shell with PROGRAM in it; for pipes. */
export function shell(line: string): Run {
  const run = spawnSync('bash', ['-c', line], {
    encoding: 'utf8',
    maxBuffer: MOST_OUTPUT,
    env: { ...process.env, PROGRAM, DEMO },
  });
  return { status: run.status, out: run.stdout, err: run.stderr };
}
