// From the start of the process to the result of the demonstration study.
import { resolve } from 'node:path';
import type { Part, Surroundings } from './bench-stage.ts';
import { spread } from './bench-statistics.ts';
import { spreadText, table } from './bench-table.ts';

const ROUNDS = 5;
const ARMS = [
  [
    '`ohmstead solve test-data/aldermoor`',
    [resolve('apps/cli/dist/ohmstead.js'), 'solve', 'test-data/aldermoor'],
  ],
  ['Node itself, doing nothing', ['-e', '0']],
] as const;

/** @throws Error when the study is not solved */
export async function startPart({ spawner, told }: Surroundings): Promise<Part> {
  const times: number[][] = ARMS.map(() => []);
  for (let round = 0; round < ROUNDS; round++)
    for (const [k, [name, args]] of ARMS.entries()) {
      told(`round ${round + 1} of ${ROUNDS}: ${name}`);
      const start = performance.now();
      const { status, stderr } = await spawner(process.execPath, args, process.env);
      times[k]!.push(performance.now() - start);
      if (status !== 0) throw new Error(`${name}: ended with ${status ?? 'no status'}: ${stderr}`);
    }
  const rows = ARMS.map(([name], k) => [name, String(ROUNDS), spreadText(spread(times[k]!), '')]);
  return {
    lines: ['**Process start to result.**', '', ...table(['process', 'rounds', 'ms'], rows)],
    findings: { start: spread(times[0]!)!.median },
  };
}
