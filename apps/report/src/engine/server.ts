// The engine's side: one run at a time, which hears between its stages that it is no longer wanted.
import type { Crew } from '@ohmstead/core';
import type { PageScripts } from '@ohmstead/pack';
import { InputFaults, loadStudy, type SolvedField, solveMemory, solveStudy } from '@ohmstead/study';
import type { EngineAnswer, EngineRequest } from './messages.ts';
import { replyTo } from './questions.ts';
import type { SolvedRun } from './solved-run.ts';
import { studySource } from './study-source.ts';

export interface ServerTools {
  readonly say: (answer: EngineAnswer, transfer?: Transferable[]) => void;
  /** lets requests that have come in meanwhile be heard */
  readonly pause: () => Promise<void>;
  /** shares in large work, and is ended with each run */
  readonly crew?: Crew;
}

/** Thrown through the solver by a run that is no longer wanted. */
class Unwanted extends Error {}

/**
 * @returns takes requests; a new `solve` ends the one before, and answers of an ended run are followed by none
 */
export function engineServer({ say, pause, crew }: ServerTools): (request: EngineRequest) => void {
  let wanted: number | undefined;
  let solved: SolvedRun | undefined;
  let scripts: PageScripts | undefined;
  const memory = solveMemory();
  let before: Promise<void> = Promise.resolve();

  const solve = async (run: number, files: ReadonlyMap<string, Uint8Array>): Promise<void> => {
    const stillWanted = (): void => {
      if (wanted !== run) throw new Unwanted();
    };
    stillWanted();
    const loaded = loadStudy(await studySource(files));
    let field: SolvedField | undefined;
    const outcome = await solveStudy(loaded, {
      crew,
      memory,
      onProgress: async (stage, share) => {
        say({ kind: 'progress', run, stage, share });
        await pause();
        stillWanted();
      },
      onField: (solution) => {
        field = solution;
      },
      onFirst: (first) => say({ kind: 'first', run, outcome: first }),
    });
    solved = { run, loaded, outcome, field };
    say({ kind: 'solved', run, outcome });
  };

  const answer = async (request: EngineRequest & { readonly kind: 'ask' }): Promise<void> => {
    const { run, ask, question } = request;
    try {
      if (solved?.run !== run) throw new Error('the study has been computed anew since');
      const { reply, transfer } = await replyTo(question, solved, scripts);
      say({ kind: 'told', ask, reply }, transfer);
    } catch (error) {
      say({ kind: 'untold', ask, message: messageOf(error) });
    }
  };

  return (request) => {
    switch (request.kind) {
      case 'carry': {
        const { engine, starter } = request.scripts;
        scripts = starter === undefined ? undefined : { engine, starter };
        return;
      }
      case 'solve': {
        const { run, files } = request;
        wanted = run;
        before = before
          .then(() => solve(run, files))
          .catch((error: unknown) => say(ending(run, error)))
          .finally(() => crew?.end());
        return;
      }
      case 'cancel':
        if (wanted === request.run) wanted = undefined;
        return;
      case 'ask':
        void answer(request);
    }
  };
}

function ending(run: number, error: unknown): EngineAnswer {
  if (error instanceof Unwanted) return { kind: 'ended', run };
  if (error instanceof InputFaults) return { kind: 'faults', run, faults: error.faults };
  return { kind: 'failed', run, message: messageOf(error) };
}

function messageOf(error: unknown): string {
  return error instanceof Error ? error.message : String(error);
}
