// What a command is: its name, operand and options, words for its help, and what it runs.
import type { Engine } from './engine.ts';
import type { ExitStatus } from './exit-status.ts';
import type { Io } from './io.ts';

export interface OptionSpec {
  readonly name: string;
  /** name of its value in the help; an option without one is a switch */
  readonly value?: string;
  readonly required?: boolean;
  readonly help: string;
}

export interface CommandSpec {
  readonly name: string;
  readonly operand: string;
  /** one line */
  readonly summary: string;
  readonly options: readonly OptionSpec[];
  /** paragraphs of the help, each a line or more */
  readonly details: readonly string[];
  readonly example: string;
}

/** What stands behind a command's name on the command line. */
export interface Arguments {
  readonly operand: string;
  readonly values: ReadonlyMap<string, string>;
  readonly switches: ReadonlySet<string>;
}

export interface Command extends CommandSpec {
  readonly run: (given: Arguments, io: Io, engine: Engine) => Promise<ExitStatus>;
}
