// What the page and its worker say to each other.
import type { Fault, Outcome } from '@ohmstead/study';

export interface SolveRequest {
  readonly kind: 'solve';
  /** tells answers to this request from answers to one that it replaced */
  readonly run: number;
  readonly files: ReadonlyMap<string, Uint8Array>;
}

export type WorkerAnswer =
  | { readonly kind: 'progress'; readonly run: number; readonly stage: string; readonly share: number }
  | {
      readonly kind: 'solved';
      readonly run: number;
      readonly outcome: Outcome;
      readonly pack: Uint8Array<ArrayBuffer>;
    }
  | { readonly kind: 'faults'; readonly run: number; readonly faults: readonly Fault[] }
  | { readonly kind: 'failed'; readonly run: number; readonly message: string };
