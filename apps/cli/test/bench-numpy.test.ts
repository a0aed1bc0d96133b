// Python or numpy that is missing is told, not fatal; the better of two thread counts is taken.
import { expect, test } from 'vitest';
import type { Spawner } from '../src/bench-child.ts';
import { numpyArms, probeNumpy, runOf, WHOLE_ARRAY } from '../src/bench-numpy.ts';

const ending =
  (status: number | undefined, stdout = '', stderr = ''): Spawner =>
  async () => ({ status, stdout, stderr });

function printed(assembly: number, solve: number): string {
  return JSON.stringify({
    numpy: '2.4.6',
    assembly_s: assembly,
    assembly_cpu_s: 0.5,
    solve_s: solve,
    solve_cpu_s: 0.25,
    resistance_ohm: 2,
  });
}

test('a python that cannot be started and one without numpy are told apart', async () => {
  expect(await probeNumpy(ending(undefined))).toEqual({
    kind: 'absent',
    reason: 'python3 cannot be started',
  });
  expect(await probeNumpy(ending(1, '', 'ModuleNotFoundError'))).toEqual({
    kind: 'absent',
    reason: 'python3 has no numpy',
  });
  expect(await probeNumpy(ending(0, '2.4.6\n'))).toEqual({ kind: 'present', version: '2.4.6' });
});

test('each run tries one and two threads without a forced kind of processor, and keeps the better', async () => {
  const seen: (readonly [string | undefined, string | undefined, string | undefined])[] = [];
  process.env.OPENBLAS_CORETYPE = 'Prescott';
  const spawner: Spawner = async (command, args, env) => {
    seen.push([env.OPENBLAS_NUM_THREADS, env.OPENBLAS_CORETYPE, args[1]]);
    expect(command).toBe('python3');
    return {
      status: 0,
      stderr: '',
      stdout: env.OPENBLAS_NUM_THREADS === '1' ? printed(1, 3) : printed(1, 2),
    };
  };
  const [whole] = numpyArms(spawner, '/case.json', 1, () => {});
  const run = await whole!.run();
  delete process.env.OPENBLAS_CORETYPE;
  expect(whole!.name).toBe(WHOLE_ARRAY);
  expect(seen).toEqual([
    ['1', undefined, '/case.json'],
    ['2', undefined, '/case.json'],
  ]);
  expect(run).toEqual({ wallMs: 3000, cpuMs: 750, solveMs: 2000, resistance: 2 });
});

test('a script that fails leaves no figures and says why', async () => {
  const told: string[] = [];
  const [whole] = numpyArms(ending(1, '', 'MemoryError'), '/case.json', 1, (why) => told.push(why));
  expect(await whole!.run()).toBeUndefined();
  expect(told).toEqual([`${WHOLE_ARRAY}: ended with 1: MemoryError`]);
});

test('a script that fails, or prints something else, is named with what it said', () => {
  expect(() => runOf('numpy, x', { status: 1, stdout: '', stderr: 'MemoryError\n' })).toThrow(
    'numpy, x: ended with 1: MemoryError',
  );
  expect(() => runOf('numpy, x', { status: 0, stdout: '{"assembly_s": 1}', stderr: '' })).toThrow(
    'numpy, x: printed no solve_s',
  );
});
