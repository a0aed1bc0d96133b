// Runs the arms of a comparison in turns, A B C A B C, so that a busy minute falls on all of them.

/** What one run of an arm took and found. */
export interface Run {
  readonly wallMs: number;
  /** of the whole process, all its threads */
  readonly cpuMs: number;
  /** part of the wall time spent in the solution, where an arm also assembles */
  readonly solveMs?: number;
  readonly resistance: number;
}

export interface Arm {
  readonly name: string;
  /** rounds it takes part in, from the first, where it is too slow for all */
  readonly atMost?: number;
  /** undefined where it failed, for a reason told elsewhere */
  run(): Promise<Run | undefined>;
}

/** Runs of every arm by round; undefined where it sat out or failed. */
export type Rounds = ReadonlyMap<string, readonly (Run | undefined)[]>;

/** @param told called before each run */
export async function inTurns(
  arms: readonly Arm[],
  rounds: number,
  told: (text: string) => void,
): Promise<Rounds> {
  const found = new Map<string, (Run | undefined)[]>(arms.map(({ name }) => [name, []]));
  for (let round = 0; round < rounds; round++)
    for (const { name, atMost, run } of arms) {
      if (round >= (atMost ?? rounds)) {
        found.get(name)!.push(undefined);
        continue;
      }
      told(`round ${round + 1} of ${rounds}: ${name}`);
      found.get(name)!.push(await run());
    }
  return found;
}

/** One figure of an arm by round. */
export function figures(
  rounds: Rounds,
  arm: string,
  pick: (run: Run) => number | undefined,
): (number | undefined)[] {
  return (rounds.get(arm) ?? []).map((run) => run && pick(run));
}
