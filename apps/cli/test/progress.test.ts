// Progress is silent for quick work, redrawn on a terminal, and plain lines in a log.
import { expect, test } from 'vitest';
import { progress, withProgress } from '../src/progress.ts';
import { type TestIo, testIo } from './test-io.ts';

function at(io: TestIo, ms: number, act: () => void): void {
  io.clock.ms = ms;
  act();
}

test('quick work is silent', () => {
  const io = testIo({ errIsTerminal: true });
  const shown = progress(io);
  at(io, 100, () => shown.report('mesh', 0.1));
  at(io, 499, () => shown.report('mesh', 0.9));
  shown.done();
  expect(io.written).toEqual({ out: '', err: '' });
});

test('on a terminal one line is redrawn, not too often, and taken away', () => {
  const io = testIo({ errIsTerminal: true });
  const shown = progress(io);
  at(io, 600, () => shown.report('mesh', 0.101));
  at(io, 650, () => shown.report('mesh', 0.2));
  at(io, 700, () => shown.report('mesh', 0.999));
  at(io, 701, () => shown.report('field', 2));
  shown.done();
  const clear = '\r\u001b[K';
  expect(io.written.err).toBe(`${clear}mesh  10 %${clear}mesh  99 %${clear}field  100 %${clear}`);
});

test.each([{ errIsTerminal: false }, { errIsTerminal: true, env: { TERM: 'dumb' } }])(
  '%j: plain lines',
  (given) => {
    const io = testIo(given);
    const shown = progress(io);
    at(io, 600, () => shown.report('mesh', 0.1));
    at(io, 5000, () => shown.report('mesh', 0.2));
    at(io, 5700, () => shown.report('mesh', 0.3));
    at(io, 5800, () => shown.report('field\u001b[2J', 0));
    shown.done();
    expect(io.written.err).toBe('mesh  10 %\nmesh  30 %\nfield<U+001B>[2J\n');
  },
);

test('the redrawn line is taken away when the work fails, too', async () => {
  const io = testIo({ errIsTerminal: true });
  const work = withProgress(io, (report) => {
    at(io, 600, () => report('mesh', 0.5));
    throw new Error('no');
  });
  await expect(work).rejects.toThrow('no');
  expect(io.written.err.endsWith('mesh  50 %\r\u001b[K')).toBe(true);
});
