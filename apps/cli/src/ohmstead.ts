#!/usr/bin/env node
// The program `ohmstead`: joins the command line to the process it runs in.
import { engineWith } from './engine.ts';
import { PROGRAM_FAULT } from './exit-status.ts';
import type { Io } from './io.ts';
import { main } from './main.ts';
import { systemComplaint } from './system-complaint.ts';
import { threadCrew } from './thread-crew.ts';

for (const stream of [process.stdout, process.stderr]) {
  stream.on('error', (error: NodeJS.ErrnoException) => {
    // A reader that has seen enough (`ohmstead … | head`) closes the pipe; that is no fault of anyone.
    if (error.code === 'EPIPE') return;
    process.exitCode = PROGRAM_FAULT;
    if (stream === process.stdout) {
      process.stderr.write(
        `ohmstead: standard output cannot be written: ${systemComplaint(error) ?? error.message}\n`,
      );
    }
  });
}

const io: Io = {
  out: (text) => void process.stdout.write(text),
  err: (text) => void process.stderr.write(text),
  outIsTerminal: process.stdout.isTTY === true,
  errIsTerminal: process.stderr.isTTY === true,
  env: process.env,
  now: () => performance.now(),
};

const engine = engineWith(threadCrew(new URL('helper.js', import.meta.url)));

// Not awaited at the top: chunks that are read when wanted import from this file, which must be done by then.
void main(process.argv.slice(2), io, engine).then((status) => {
  // Set, not exit(): what is still on its way to a pipe is written out first. A failed stream has set it already.
  process.exitCode ??= status;
});
