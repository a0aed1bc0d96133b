// Joins the page's state to the engine: every draft is computed, a newer one replaces the run of an older.
import { useCallback, useEffect, useMemo, useReducer, useRef } from 'preact/hooks';
import type { Draft } from '../desk/draft.ts';
import { createEngine, type Engine, type EnginePlatform } from '../engine/client.ts';
import { type Bench, type BenchAction, beginBench, draftOf, reduceBench } from './bench.ts';
import { markEdit, measureShown } from './page-times.ts';

export interface BenchControl {
  /** undefined before a study is open */
  readonly bench: Bench | undefined;
  readonly act: (action: BenchAction) => void;
  readonly engine: Engine;
  /** ends the present run; the sheet stays out of date until the next edit or `recompute` */
  readonly cancel: () => void;
  readonly recompute: () => void;
}

function reduce(bench: Bench | undefined, action: BenchAction): Bench | undefined {
  if (action.kind === 'open') return beginBench(action.draft, action.label);
  if (bench === undefined) {
    return action.kind === 'restore'
      ? reduceBench(beginBench(action.history.present.draft, ''), action)
      : undefined;
  }
  return reduceBench(bench, action);
}

/** @param begin starts an engine */
export function useBench(begin: EnginePlatform['begin']): BenchControl {
  const [bench, act] = useReducer(reduce, undefined);
  const engine = useMemo(
    () => createEngine({ begin, hear: (answer) => act({ kind: 'answer', answer }) }),
    [begin],
  );
  useEffect(() => () => engine.stop(), [engine]);
  const compute = useCallback(
    (draft: Draft): void => {
      const run = engine.solve(draft.files);
      markEdit(run);
      act({ kind: 'began', run, draft });
    },
    [engine],
  );
  const draft = bench === undefined ? undefined : draftOf(bench);
  const computed = useRef<Draft>(undefined);
  useEffect(() => {
    if (draft === undefined || draft === computed.current) return;
    computed.current = draft;
    compute(draft);
  }, [draft, compute]);
  const solved = bench?.solved;
  useEffect(() => {
    if (solved !== undefined) measureShown(solved.run, solved.early);
  }, [solved]);
  const cancel = useCallback(() => {
    engine.cancel();
    act({ kind: 'cancelled' });
  }, [engine]);
  const recompute = useCallback(() => {
    if (draft !== undefined) compute(draft);
  }, [draft, compute]);
  return { bench, act, engine, cancel, recompute };
}
