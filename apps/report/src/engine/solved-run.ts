// What the engine keeps of the run it solved last.
import type { LoadedStudy, Outcome, SolvedField } from '@ohmstead/study';

export interface SolvedRun {
  readonly run: number;
  readonly loaded: LoadedStudy;
  readonly outcome: Outcome;
  readonly field: SolvedField | undefined;
}
