// What the engine keeps of the run it solved last.
import type { LoadedStudy, Outcome } from '@ohmstead/study';

export interface SolvedRun {
  readonly run: number;
  readonly loaded: LoadedStudy;
  readonly outcome: Outcome;
}
