// Tells on standard error how far long work has come: one line redrawn on a terminal, plain lines elsewhere.
import type { Io } from './io.ts';
import { printable } from './printable.ts';

/** Work shorter than this is done before a line about it could be read, ms. */
const QUIET_FOR_MS = 500;
/** Redrawing oftener than the eye follows only costs time, ms. */
const REDRAW_EVERY_MS = 100;
/** Between plain lines of one stage, ms: a log should grow slowly. */
const LINE_EVERY_MS = 5000;

const CLEAR_LINE = '\r\u001b[K';

export interface Progress {
  readonly report: (stage: string, share: number) => void;
  /** takes the redrawn line away */
  readonly done: () => void;
}

/** Runs work with its progress shown; the redrawn line is taken away however the work ends. */
export async function withProgress<T>(
  io: Io,
  work: (report: Progress['report']) => T | Promise<T>,
): Promise<T> {
  const shown = progress(io);
  try {
    return await work(shown.report);
  } finally {
    shown.done();
  }
}

/**
 * Progress of one piece of work, silent for its first half second.
 * @param io where to write, and its clock
 */
export function progress(io: Io): Progress {
  const redraws = io.errIsTerminal && io.env.TERM !== 'dumb';
  const begun = io.now();
  let last = -Infinity;
  let lastStage = '';
  let drawn = false;
  return {
    report: (stage, share) => {
      const now = io.now();
      if (now - begun < QUIET_FOR_MS) return;
      const wait = redraws ? REDRAW_EVERY_MS : LINE_EVERY_MS;
      if (stage === lastStage && now - last < wait) return;
      last = now;
      lastStage = stage;
      const done = share > 0 ? `  ${Math.floor(100 * Math.min(1, share))} %` : '';
      const text = `${printable(stage)}${done}`;
      io.err(redraws ? `${CLEAR_LINE}${text}` : `${text}\n`);
      drawn = true;
    },
    done: () => {
      if (drawn && redraws) io.err(CLEAR_LINE);
      drawn = false;
    },
  };
}
