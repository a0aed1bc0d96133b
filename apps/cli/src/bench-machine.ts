// One line on the machine and how busy it is, printed with every result.
import { availableParallelism, cpus, loadavg, totalmem } from 'node:os';
import type { Calibration } from './bench-calibration.ts';

export function machineLine(): string {
  const model = cpus()[0]?.model.trim() ?? 'processor unknown';
  const memory = (totalmem() / 2 ** 30).toFixed(0);
  return `${model}, ${availableParallelism()} threads, ${memory} GB; Node ${process.versions.node}, V8 ${process.versions.v8}`;
}

export function busyLine(found: Calibration | undefined): string {
  const load = loadavg().map((value) => value.toFixed(1));
  const loops =
    found === undefined
      ? 'no vectors in WebAssembly'
      : [
          `f64x2 multiply-add ${found.multiplyAddGflops.toFixed(1)} GF/s`,
          `triad over 96 MB ${found.triadGBs.toFixed(1)} GB/s`,
          `1/√ ${found.reciprocalRootNs.toFixed(2)} ns`,
        ].join(', ');
  return `Load ${load.join(' ')} · one thread: ${loops}`;
}
