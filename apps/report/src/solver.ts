// The page's side of the worker: one run at a time, a new one ends the old.
import type { WorkerAnswer } from './messages.ts';

export interface Solver {
  /** starts a run; answers to earlier runs are no longer heard */
  solve(files: ReadonlyMap<string, Uint8Array>): void;
  /** ends the present run */
  cancel(): void;
}

export function createSolver(hear: (answer: WorkerAnswer) => void): Solver {
  let worker: Worker | undefined;
  let run = 0;
  const end = (): void => {
    worker?.terminate();
    worker = undefined;
  };
  return {
    solve(files) {
      end();
      run++;
      const own = run;
      const started = new Worker(new URL('./worker.ts', import.meta.url), { type: 'module' });
      worker = started;
      started.onmessage = (event: MessageEvent<WorkerAnswer>) => {
        if (event.data.run === run) hear(event.data);
        if (event.data.kind !== 'progress') end();
      };
      started.onerror = (event) => {
        hear({ kind: 'failed', run: own, message: event.message });
        end();
      };
      started.postMessage({ kind: 'solve', run: own, files });
    },
    cancel: end,
  };
}
