// A crew of helpers that a platform starts: begun when first asked, answers matched to orders, the lost ones given up.
import { type Crew, type Hand, HelperLost, type Task } from './crew.ts';
import type { Said } from './workshop.ts';

/** A helper at work, as its platform gives it. */
export interface Helper {
  /** may throw where the message cannot be sent */
  post(order: { readonly task: string; readonly input: unknown }, moved: readonly ArrayBuffer[]): void;
  end(): void;
  /** until then it needs its starter's thread to be idle; from the beginning where absent */
  readonly underWay?: Promise<void>;
}

/** What is heard of a helper. */
export interface HelperHearing {
  readonly said: (said: Said) => void;
  /** it will say no more */
  readonly broken: (cause: string) => void;
}

export interface Platform {
  /** starts a helper with a `workshop` at its other end; may throw */
  start(hear: HelperHearing): Helper;
  /** whether threads can see the same memory */
  readonly shared: boolean;
}

/** Beside the caller: four members take two parts each of a matrix, and memory is not read faster by more. */
const MOST_HELPERS = 3;

/** Helpers that a machine of so many processors can use: one each, but for the caller's. */
export function helperCount(processors: number): number {
  return Math.max(0, Math.min(MOST_HELPERS, processors - 1));
}

/** @param size helpers at most */
export function crewOf(size: number, platform: Platform): Crew {
  const members = Array.from({ length: size }, () => member(platform));
  let job = 0;
  return {
    size,
    doubles: (length) =>
      platform.shared
        ? new Float64Array(new SharedArrayBuffer(length * Float64Array.BYTES_PER_ELEMENT))
        : new Float64Array(length),
    hands() {
      const own = ++job;
      return members.map(
        ({ ask }): Hand => ({
          ask: (...given) =>
            own === job ? ask(...given) : Promise.reject(new HelperLost('it is at another job')),
        }),
      );
    },
    async underWay() {
      await Promise.all(members.map((one) => one.underWay()));
    },
    end() {
      job++;
      for (const one of members) one.end();
    },
  };
}

interface Waiting {
  readonly done: (output: never) => void;
  readonly failed: (error: HelperLost) => void;
}

interface Member extends Hand {
  underWay(): Promise<void> | undefined;
  end(): void;
}

/** One place in the crew: its helper, and who waits for it. One that broke is not started again before the crew was ended. */
function member(platform: Platform): Member {
  let waiting: Waiting[] = [];
  let helper: Helper | undefined;
  let lost: HelperLost | undefined;
  let turn = 0;
  const giveUp = (error: HelperLost): void => {
    turn++;
    const all = waiting;
    waiting = [];
    helper?.end();
    helper = undefined;
    for (const { failed } of all) failed(error);
  };
  const start = (): Helper => {
    const own = turn;
    return platform.start({
      said(said) {
        if (own !== turn) return;
        const first = waiting.shift();
        if (said.kind === 'done') first?.done(said.output);
        else first?.failed(new HelperLost(said.message));
      },
      broken(cause) {
        if (own !== turn) return;
        lost = new HelperLost(cause);
        giveUp(lost);
      },
    });
  };
  return {
    ask<In, Out>(task: Task<In, Out>, input: In, moved: readonly ArrayBuffer[] = []): Promise<Out> {
      if (lost !== undefined) return Promise.reject(lost);
      return new Promise<Out>((done, failed) => {
        waiting.push({ done, failed });
        try {
          helper ??= start();
          helper.post({ task: task.name, input }, moved);
        } catch (error) {
          lost = new HelperLost(error instanceof Error ? error.message : String(error));
          giveUp(lost);
        }
      });
    },
    underWay: () => helper?.underWay,
    end() {
      giveUp(new HelperLost('the crew was ended'));
      lost = undefined;
    },
  };
}
