// The helper's side: takes orders one after the other, does them by name, and says what they gave.
import type { Task } from './crew.ts';

/** What a helper is told; plain data. */
export interface Order {
  readonly task: string;
  /** what the task of that name takes */
  readonly input: never;
}

/** What it says of each order, in the order in which it was told; plain data. */
export type Said =
  /** what the task of that name gives */
  { readonly kind: 'done'; readonly output: never } | { readonly kind: 'failed'; readonly message: string };

/** What a piece of work gives, and the buffers of it that may be moved to the caller. */
export interface Done<Out> {
  readonly output: Out;
  readonly moved?: readonly ArrayBuffer[];
}

/** How a task is done by one helper. */
export interface Work {
  readonly name: string;
  readonly run: (input: never) => Done<unknown>;
}

export function work<In, Out>({ name }: Task<In, Out>, run: (input: In) => Done<Out>): Work {
  return { name, run };
}

/** What a helper hands over. */
export type Say = (
  said:
    | { readonly kind: 'done'; readonly output: unknown }
    | { readonly kind: 'failed'; readonly message: string },
  moved: readonly ArrayBuffer[],
) => void;

/** @returns takes orders and answers each by `say` */
export function workshop(works: readonly Work[], say: Say): (order: Order) => void {
  const known = new Map(works.map((one) => [one.name, one]));
  return ({ task, input }) => {
    try {
      const one = known.get(task);
      if (one === undefined) throw new Error(`no such task: ${task}`);
      const { output, moved = [] } = one.run(input);
      say({ kind: 'done', output }, moved);
    } catch (error) {
      say({ kind: 'failed', message: error instanceof Error ? error.message : String(error) }, []);
    }
  };
}
