// The page's side of the engine: a new run replaces the old, stale answers are not heard, a deaf or dead worker is replaced.
import type { EngineWorker, Hearing } from './engine-worker.ts';
import type { EngineAnswer, EngineRequest, Question, Reply, RunAnswer } from './messages.ts';

export interface EnginePlatform {
  readonly begin: (hear: Hearing) => EngineWorker;
  /** told what becomes of the present run; `ended` is not told, for whoever cancels knows */
  readonly hear: (answer: Exclude<RunAnswer, { kind: 'ended' }>) => void;
  /** does something later, unless the function returned is called before */
  readonly later?: (ms: number, act: () => void) => () => void;
}

export interface Engine {
  /**
   * Starts a run; the one before is no longer heard.
   * @returns its number, which its answers bear
   */
  readonly solve: (files: ReadonlyMap<string, Uint8Array>) => number;
  /** ends the present run; an outcome that was told stays known to the engine */
  readonly cancel: () => void;
  /**
   * Asks about the outcome of a run.
   * @throws Error where the engine no longer has that outcome, or stopped
   */
  readonly ask: (run: number, question: Question) => Promise<Reply>;
  readonly stop: () => void;
}

/**
 * A run that is no longer wanted hears of it between two stages, mostly within some 50 ms, and leaves the worker warm.
 * Past this many ms, a good deal more than starting another worker takes, the worker is replaced.
 */
export const PATIENCE_MS: number = 300;

interface Asked {
  readonly resolve: (reply: Reply) => void;
  readonly reject: (error: Error) => void;
}

export function createEngine({ begin, hear, later = laterByTimer }: EnginePlatform): Engine {
  let runs = 0;
  let asks = 0;
  /** the run whose answers are heard, as long as it computes */
  let present: { readonly run: number; readonly files: ReadonlyMap<string, Uint8Array> } | undefined;
  /** runs that the worker has not ended */
  const open = new Set<number>();
  const asked = new Map<number, Asked>();
  let watch: (() => void) | undefined;

  const start = (): EngineWorker => {
    const own = begin({
      answer: (answer) => {
        if (own === worker) take(answer);
      },
      broken: (message) => {
        if (own === worker) fail(message);
      },
    });
    return own;
  };
  let worker: EngineWorker | undefined = start();

  const post = (request: EngineRequest): void => {
    worker ??= start();
    if (request.kind === 'solve') open.add(request.run);
    worker.post(request);
  };

  /** What the worker was doing, and what it was asked, is lost with it. */
  const drop = (reason: string): void => {
    worker?.end();
    worker = undefined;
    unwatch();
    open.clear();
    for (const { reject } of asked.values()) reject(new Error(reason));
    asked.clear();
  };

  /** A worker that does not hear that its run is over makes way for another, which takes the present run. */
  const replaceDeaf = (): void => {
    drop('the engine was started anew');
    if (present !== undefined) post({ kind: 'solve', ...present });
  };

  /** The run that a worker broke under is not tried again; the next one starts another worker. */
  const fail = (message: string): void => {
    drop(message);
    const lost = present;
    present = undefined;
    if (lost !== undefined) hear({ kind: 'failed', run: lost.run, message });
  };

  const unwatch = (): void => {
    watch?.();
    watch = undefined;
  };

  const stale = (): boolean => [...open].some((run) => run !== present?.run);

  const take = (answer: EngineAnswer): void => {
    switch (answer.kind) {
      case 'told':
        asked.get(answer.ask)?.resolve(answer.reply);
        asked.delete(answer.ask);
        return;
      case 'untold':
        asked.get(answer.ask)?.reject(new Error(answer.message));
        asked.delete(answer.ask);
        return;
    }
    const wanted = answer.run === present?.run;
    if (answer.kind !== 'progress' && answer.kind !== 'first') {
      open.delete(answer.run);
      if (wanted) present = undefined;
      if (!stale()) unwatch();
    }
    if (wanted && answer.kind !== 'ended') hear(answer);
  };

  /** Gives runs that are no longer wanted a while to hear of it. */
  const watchStale = (): void => {
    if (stale() && watch === undefined) watch = later(PATIENCE_MS, replaceDeaf);
  };

  return {
    solve(files) {
      runs++;
      present = { run: runs, files };
      watchStale();
      post({ kind: 'solve', ...present });
      return runs;
    },
    cancel() {
      if (present === undefined) return;
      post({ kind: 'cancel', run: present.run });
      present = undefined;
      watchStale();
    },
    ask(run, question) {
      asks++;
      const ask = asks;
      return new Promise((resolve, reject) => {
        asked.set(ask, { resolve, reject });
        post({ kind: 'ask', run, ask, question });
      });
    },
    stop() {
      present = undefined;
      drop('the engine was stopped');
    },
  };
}

function laterByTimer(ms: number, act: () => void): () => void {
  const timer = setTimeout(act, ms);
  return () => clearTimeout(timer);
}
