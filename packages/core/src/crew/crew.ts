// Helpers beside the caller: what they can be asked, and how each keeps what it made.

/** A named piece of work on plain data, which may be done in another thread. `of` tells only types. */
export interface Task<In, Out> {
  readonly name: string;
  readonly of?: (input: In) => Out;
}

/** One helper, as whoever gives it work sees it. */
export interface Hand {
  /**
   * Gives a task; tasks are done in the order in which they are given.
   * @param moved buffers of the input that may be taken away from the caller
   * @returns what the task gives, plain data
   * @throws HelperLost whatever the cause: the same work can still be done in place, where its own error would show
   */
  ask<In, Out>(task: Task<In, Out>, input: In, moved?: readonly ArrayBuffer[]): Promise<Out>;
}

export interface Crew {
  /** helpers besides the caller, who does a share of the work as well */
  readonly size: number;
  /** doubles in memory that the helpers see too, where there is such memory; in plain memory otherwise */
  doubles(length: number): Float64Array;
  /**
   * Hands for one job, started when first asked. Those of the job before are refused from then on, so that a helper
   * never keeps the data of two.
   */
  hands(): readonly Hand[];
  /** waits until those asked are so far under way that they go on while the caller is busy */
  underWay(): Promise<void>;
  /** ends all helpers and what they keep; a later job starts them anew */
  end(): void;
}

/** A helper that could not be started, broke, was ended, or failed in its task. */
export class HelperLost extends Error {
  constructor(cause: string) {
    super(`a helper was lost: ${cause}`);
    this.name = 'HelperLost';
  }
}

/** Buffers of arrays that may be moved to another thread: shared ones stay where all see them. */
export function movable(...arrays: readonly Float64Array[]): ArrayBuffer[] {
  return arrays.flatMap(({ buffer }) => (buffer instanceof ArrayBuffer ? [buffer] : []));
}
