// What every part of the benchmark gives: lines to print and figures to judge.
import type { Spawner } from './bench-child.ts';
import type { Findings } from './bench-claims.ts';
import type { Gate } from './bench-gates.ts';
import type { Numpy } from './bench-numpy.ts';

export interface Part {
  readonly lines: readonly string[];
  readonly findings?: Findings;
  readonly gates?: readonly Gate[];
}

/** What the parts need from outside. */
export interface Surroundings {
  readonly numpy: Numpy;
  readonly spawner: Spawner;
  /** also the comparisons that take minutes and gigabytes */
  readonly full: boolean;
  /** tells of progress */
  told(text: string): void;
}
