// Run control with an engine that is played: what is heard, what is cancelled, and when another is started.
import { expect, test } from 'vitest';
import { createEngine, type Engine, PATIENCE_MS } from '../../../src/engine/client.ts';
import type { Hearing } from '../../../src/engine/engine-worker.ts';
import type { EngineRequest, RunAnswer } from '../../../src/engine/messages.ts';

interface Played {
  readonly requests: EngineRequest[];
  readonly hear: Hearing;
  ended: boolean;
}

interface Scene {
  readonly engine: Engine;
  readonly workers: Played[];
  readonly heard: RunAnswer[];
  /** lets the time pass that `later` was asked for */
  readonly pass: () => void;
  readonly waits: () => number[];
}

function scene(): Scene {
  const workers: Played[] = [];
  const heard: RunAnswer[] = [];
  const due = new Map<() => void, number>();
  const engine = createEngine({
    begin: (hear) => {
      const played: Played = { requests: [], hear, ended: false };
      workers.push(played);
      return {
        post: (request) => played.requests.push(request),
        end: () => {
          played.ended = true;
        },
      };
    },
    hear: (answer) => heard.push(answer),
    later: (ms, act) => {
      due.set(act, ms);
      return () => due.delete(act);
    },
  });
  return {
    engine,
    workers,
    heard,
    pass: () => {
      const acts = [...due.keys()];
      due.clear();
      for (const act of acts) act();
    },
    waits: () => [...due.values()],
  };
}

const files = new Map([['study.json', new Uint8Array([1])]]);
const progress = (run: number): RunAnswer => ({ kind: 'progress', run, stage: 'solving', share: 0.5 });
const failed = (run: number): RunAnswer => ({ kind: 'failed', run, message: 'no pivot' });
const kinds = (played: Played): string[] =>
  played.requests.map((request) =>
    request.kind === 'ask' ? `ask ${request.ask}` : `${request.kind} ${'run' in request ? request.run : ''}`,
  );

test('a run is posted with its files, and its answers are heard', () => {
  const { engine, workers, heard } = scene();
  expect(engine.solve(files)).toBe(1);
  expect(workers[0]!.requests).toEqual([{ kind: 'solve', run: 1, files }]);
  workers[0]!.hear.answer(progress(1));
  workers[0]!.hear.answer(failed(1));
  expect(heard).toEqual([progress(1), failed(1)]);
});

test('a new run silences the old one, in the same warm worker', () => {
  const { engine, workers, heard, pass, waits } = scene();
  engine.solve(files);
  engine.solve(files);
  workers[0]!.hear.answer(progress(1));
  workers[0]!.hear.answer(failed(1));
  workers[0]!.hear.answer(progress(2));
  expect(heard).toEqual([progress(2)]);
  expect(waits()).toEqual([]);
  pass();
  expect(workers).toHaveLength(1);
  expect(kinds(workers[0]!)).toEqual(['solve 1', 'solve 2']);
});

test('cancel is posted, and nothing more is heard of the run', () => {
  const { engine, workers, heard, pass } = scene();
  engine.solve(files);
  engine.cancel();
  engine.cancel();
  workers[0]!.hear.answer(progress(1));
  workers[0]!.hear.answer({ kind: 'ended', run: 1 });
  pass();
  expect(heard).toEqual([]);
  expect(kinds(workers[0]!)).toEqual(['solve 1', 'cancel 1']);
  expect(workers).toHaveLength(1);
});

test('a worker that does not hear within its patience is replaced, and the present run begun anew', () => {
  const { engine, workers, heard, pass, waits } = scene();
  engine.solve(files);
  engine.solve(files);
  engine.solve(files);
  expect(waits()).toEqual([PATIENCE_MS]);
  pass();
  expect(workers.map(({ ended }) => ended)).toEqual([true, false]);
  expect(kinds(workers[1]!)).toEqual(['solve 3']);
  // what the old one had still on its way
  workers[0]!.hear.answer(progress(3));
  workers[0]!.hear.broken('ended');
  expect(heard).toEqual([]);
  workers[1]!.hear.answer(progress(3));
  expect(heard).toEqual([progress(3)]);
});

test('a cancelled worker that stays deaf is ended, and another begun only when wanted', () => {
  const { engine, workers, pass } = scene();
  engine.solve(files);
  engine.cancel();
  pass();
  expect(workers.map(({ ended }) => ended)).toEqual([true]);
  engine.solve(files);
  expect(workers).toHaveLength(2);
});

test('a broken worker fails its run once and for all; the next run gets another worker', async () => {
  const { engine, workers, heard } = scene();
  engine.solve(files);
  const asked = engine.ask(1, { kind: 'pack' });
  workers[0]!.hear.broken('out of memory');
  workers[0]!.hear.broken('out of memory');
  await expect(asked).rejects.toThrow('out of memory');
  expect(heard).toEqual([{ kind: 'failed', run: 1, message: 'out of memory' }]);
  expect(workers).toHaveLength(1);
  engine.solve(files);
  expect(kinds(workers[1]!)).toEqual(['solve 2']);
});

test('questions get their own replies, in whatever order they come', async () => {
  const { engine, workers } = scene();
  const first = engine.ask(1, { kind: 'pack' });
  const second = engine.ask(1, { kind: 'pack' });
  expect(kinds(workers[0]!)).toEqual(['ask 1', 'ask 2']);
  const pack = new Uint8Array([7]);
  workers[0]!.hear.answer({ kind: 'told', ask: 2, reply: { kind: 'pack', pack } });
  workers[0]!.hear.answer({ kind: 'untold', ask: 1, message: 'computed anew since' });
  expect(await second).toEqual({ kind: 'pack', pack });
  await expect(first).rejects.toThrow('computed anew since');
});

test('what is asked of a worker that is replaced or stopped is refused, not left open', async () => {
  const { engine, workers, pass } = scene();
  engine.solve(files);
  const asked = engine.ask(1, { kind: 'pack' });
  engine.cancel();
  pass();
  await expect(asked).rejects.toThrow('started anew');
  const late = engine.ask(1, { kind: 'pack' });
  engine.stop();
  await expect(late).rejects.toThrow('stopped');
  expect(workers.every(({ ended }) => ended)).toBe(true);
});
