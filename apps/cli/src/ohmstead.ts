#!/usr/bin/env node
// The program `ohmstead`: joins the command line to the process it runs in.
import { engine } from './engine.ts';
import type { Io } from './io.ts';
import { main } from './main.ts';

// A reader that has seen enough (`ohmstead … | head`) closes the pipe; that is no fault of anyone.
for (const stream of [process.stdout, process.stderr]) {
  stream.on('error', (error: NodeJS.ErrnoException) => {
    if (error.code !== 'EPIPE') throw error;
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

// Set, not exit(): what is still on its way to a pipe is written out first.
process.exitCode = await main(process.argv.slice(2), io, engine);
