// Runs another program to its end and keeps what it printed.
import { spawn } from 'node:child_process';

export interface Ended {
  /** undefined where the program could not be started or was killed */
  readonly status: number | undefined;
  readonly stdout: string;
  readonly stderr: string;
}

export type Spawner = (
  command: string,
  args: readonly string[],
  env: Readonly<Record<string, string | undefined>>,
) => Promise<Ended>;

/** Starts a program; one that is not there ends without a status, it does not throw. */
export const runChild: Spawner = (command, args, env) =>
  new Promise((settle) => {
    const child = spawn(command, args, { env: { ...env }, stdio: ['ignore', 'pipe', 'pipe'] });
    const said = { stdout: '', stderr: '' };
    for (const channel of ['stdout', 'stderr'] as const)
      child[channel].on('data', (part: Buffer) => {
        said[channel] += part.toString();
      });
    child.on('error', (error) => settle({ status: undefined, ...said, stderr: error.message }));
    child.on('close', (code) => settle({ status: code ?? undefined, ...said }));
  });
