// A running engine as the page holds it.
import type { EngineAnswer, EngineRequest } from './messages.ts';

export interface EngineWorker {
  readonly post: (request: EngineRequest) => void;
  readonly end: () => void;
}

/** What is heard of a running engine. */
export interface Hearing {
  readonly answer: (answer: EngineAnswer) => void;
  /** the worker broke and will answer no more */
  readonly broken: (message: string) => void;
}
