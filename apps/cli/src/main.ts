// Words of the command line → the command they name, its exit status, and faults told on standard error.
import { faultLine, InputFaults } from '@ohmstead/study';
import { readArguments } from './arguments.ts';
import type { Command } from './command.ts';
import type { Engine } from './engine.ts';
import { DONE, type ExitStatus, INPUT_FAULT, PROGRAM_FAULT } from './exit-status.ts';
import { field } from './field.ts';
import { commandHelp, overview, studyHelp } from './help.ts';
import type { Io } from './io.ts';
import { ExplainedFaults } from './open-study.ts';
import { printable } from './printable.ts';
import { soil } from './soil.ts';
import { solve } from './solve.ts';
import { suggestion } from './suggestion.ts';
import { verify } from './verify.ts';

const COMMANDS: readonly Command[] = [solve, field, soil, verify];

/** Names kept for commands to come. */
const LATER: readonly string[] = ['probe'];

/** Faults listed at most; beyond that a list is not read but scrolled past. */
const MOST_FAULTS = 500;

/**
 * Runs the program.
 * @param words of the command line, the program's own name left out
 * @param io where to write
 * @param engine what computes
 * @returns the exit status; never throws
 */
export async function main(words: readonly string[], io: Io, engine: Engine): Promise<ExitStatus> {
  try {
    return await dispatch(words, io, engine);
  } catch (error) {
    if (error instanceof InputFaults) return tellFaults(error, io);
    io.err(`ohmstead: fault in the program, not in the input; please report it with these lines:\n`);
    io.err(`${error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`);
    return PROGRAM_FAULT;
  }
}

async function dispatch([first, ...rest]: readonly string[], io: Io, engine: Engine): Promise<ExitStatus> {
  if (first === undefined) {
    io.err(overview(COMMANDS));
    return INPUT_FAULT;
  }
  if (first === '--version') {
    io.out(`ohmstead ${engine.version}\n`);
    return DONE;
  }
  if (first === 'help' || first === '--help' || first === '-h') {
    io.out(helpPage(rest[0]));
    return DONE;
  }
  const command = commandNamed(first);
  const given = readArguments(command, rest);
  if (given === 'help') {
    io.out(commandHelp(command));
    return DONE;
  }
  return command.run(given, io, engine);
}

function helpPage(topic: string | undefined): string {
  if (topic === undefined) return overview(COMMANDS);
  return topic === 'study' ? studyHelp() : commandHelp(commandNamed(topic));
}

function commandNamed(word: string): Command {
  const command = COMMANDS.find(({ name }) => name === word);
  if (command !== undefined) return command;
  const near = suggestion(word, [...COMMANDS.map(({ name }) => name), 'help']);
  const hint = near === undefined ? 'see ohmstead --help' : `did you mean ${near}?`;
  const kind = word.startsWith('-') ? 'an option' : 'a command';
  const message = LATER.includes(word) ? 'not part of this version' : `not ${kind}; ${hint}`;
  throw new InputFaults([{ file: 'ohmstead', place: word, code: 'usage', message }]);
}

function tellFaults(error: InputFaults, io: Io): ExitStatus {
  for (const fault of error.faults.slice(0, MOST_FAULTS)) io.err(`${printable(faultLine(fault))}\n`);
  const more = error.faults.length - MOST_FAULTS;
  if (more > 0) io.err(`and ${more} faults more\n`);
  if (error instanceof ExplainedFaults) io.err(`\n${error.explanation}`);
  return INPUT_FAULT;
}
