// An Io that keeps what is written, with a clock that tests turn by hand.
import type { Io } from '../src/io.ts';

export interface TestIo extends Io {
  readonly written: { out: string; err: string };
  readonly clock: { ms: number };
}

export function testIo(given: Partial<Pick<Io, 'outIsTerminal' | 'errIsTerminal' | 'env'>> = {}): TestIo {
  const written = { out: '', err: '' };
  const clock = { ms: 0 };
  return {
    written,
    clock,
    out: (text) => {
      written.out += text;
    },
    err: (text) => {
      written.err += text;
    },
    outIsTerminal: false,
    errIsTerminal: false,
    env: {},
    now: () => clock.ms,
    ...given,
  };
}
