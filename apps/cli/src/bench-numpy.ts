// The numpy scripts: whether they can run here, and their arms.
import { resolve } from 'node:path';
import type { Ended, Spawner } from './bench-child.ts';
import type { Arm, Run } from './bench-rounds.ts';

export const WHOLE_ARRAY = 'numpy, whole array';
export const ROW_BLOCKED = 'numpy, row-blocked in place';
export const NODE_SHARED = 'numpy, node-shared';

const SCRIPTS = [
  [WHOLE_ARRAY, 'whole_array.py'],
  [ROW_BLOCKED, 'row_blocked.py'],
  [NODE_SHARED, 'node_shared.py'],
] as const;

/** Threads of the linear algebra library that are tried each time; the better run counts. */
const THREADS = ['1', '2'] as const;

export type Numpy =
  | { readonly kind: 'present'; readonly version: string }
  | { readonly kind: 'absent'; readonly reason: string };

/** Asks python3 for numpy once. */
export async function probeNumpy(spawner: Spawner): Promise<Numpy> {
  const asked = await spawner('python3', ['-c', 'import numpy; print(numpy.__version__)'], environment('1'));
  if (asked.status === undefined) return { kind: 'absent', reason: 'python3 cannot be started' };
  if (asked.status !== 0) return { kind: 'absent', reason: 'python3 has no numpy' };
  return { kind: 'present', version: asked.stdout.trim() };
}

/**
 * @param casePath file written by `withNumpyCase`
 * @param atMost rounds that the scripts take part in
 * @param failed told why a script has no figures; the rest of the benchmark goes on
 */
export function numpyArms(
  spawner: Spawner,
  casePath: string,
  atMost: number,
  failed: (why: string) => void,
): Arm[] {
  return SCRIPTS.map(([name, script]) => ({
    name,
    atMost,
    async run() {
      const runs: Run[] = [];
      for (const threads of THREADS) {
        const ended = await spawner('python3', [scriptPath(script), casePath], environment(threads));
        try {
          runs.push(runOf(name, ended));
        } catch (error) {
          failed(error instanceof Error ? error.message : String(error));
          return undefined;
        }
      }
      return runs.reduce((best, run) => (run.wallMs < best.wallMs ? run : best));
    },
  }));
}

/** The version of the linear algebra library numpy was built with, as a script prints it. */
export async function numpyBlas(spawner: Spawner): Promise<string> {
  const code = `import sys; sys.path.insert(0, ${JSON.stringify(resolve(FOLDER))}); import common; print(common.blas())`;
  return (await spawner('python3', ['-c', code], environment('1'))).stdout.trim();
}

const FOLDER = 'apps/cli/bench';

function scriptPath(script: string): string {
  return resolve(FOLDER, script);
}

/** This process's own, without a forced kind of processor, which would slow the library down. */
function environment(threads: string): Record<string, string | undefined> {
  const { OPENBLAS_CORETYPE: _, ...rest } = process.env;
  return { ...rest, OPENBLAS_NUM_THREADS: threads, PYTHONDONTWRITEBYTECODE: '1' };
}

/** @throws Error with what the script complained of, or when it printed something else than its figures */
export function runOf(name: string, { status, stdout, stderr }: Ended): Run {
  if (status !== 0) throw new Error(`${name}: ended with ${status ?? 'no status'}: ${stderr.trim()}`);
  const said: unknown = JSON.parse(stdout);
  const figure = (key: string): number => {
    const value =
      typeof said === 'object' && said !== null && key in said ? Reflect.get(said, key) : undefined;
    if (typeof value !== 'number') throw new Error(`${name}: printed no ${key}`);
    return value;
  };
  return {
    wallMs: 1000 * (figure('assembly_s') + figure('solve_s')),
    cpuMs: 1000 * (figure('assembly_cpu_s') + figure('solve_cpu_s')),
    solveMs: 1000 * figure('solve_s'),
    resistance: figure('resistance_ohm'),
  };
}
