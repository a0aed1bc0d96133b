// The largest case: what it takes in a process of its own, so that the memory counted is its own.
import { compressedLeakageMatrix } from '@ohmstead/core';
import { entryErrors, entryText } from './bench-accuracy.ts';
import { calibration } from './bench-calibration.ts';
import { LARGEST_ACROSS, type SoilName } from './bench-cases.ts';
import { ENGINE, engineArm, RESIDUAL } from './bench-engine.ts';
import { leakageAtOneVolt } from './bench-iteration.ts';
import { busyLine } from './bench-machine.ts';
import { figures, inTurns } from './bench-rounds.ts';
import type { Part } from './bench-stage.ts';
import { spread } from './bench-statistics.ts';
import { benchSystem, ownImages } from './bench-system.ts';
import { relative, short, spreadText, table } from './bench-table.ts';

/** The whole matrix would take 10 GB: a compressed one solved to this residual stands for the exact solution. */
const EXACT = 1e-10;
const KILOBYTE = 1024;
const MEGABYTE = 1e6;

/** @param rounds the first of which also tells the memory */
export async function largePart(soil: SoilName, rounds: number): Promise<Part> {
  const made = benchSystem(LARGEST_ACROSS, soil);
  const system = { ...made, shared: made.images };
  const count = system.mesh.count;
  const before = process.memoryUsage().rss;
  let memory: number | undefined;
  const { name, run } = engineArm(system);
  const arm = {
    name,
    async run() {
      const found = await run();
      memory ??= (KILOBYTE * process.resourceUsage().maxRSS - before) / MEGABYTE;
      return found;
    },
  };
  const runs = await inTurns([arm], rounds, (text) =>
    process.stderr.write(`${count} segments, ${soil}: ${text}\n`),
  );
  const of = (pick: Parameters<typeof figures>[2]): number[] =>
    figures(runs, ENGINE, pick).filter((value) => value !== undefined);
  const wall = spread(of((one) => one.wallMs / 1000));
  const resistance = spread(of((one) => one.resistance))!.median;
  const matrix = await compressedLeakageMatrix(system.mesh, system.images);
  const { iterations } = await leakageAtOneVolt(matrix, RESIDUAL);
  const tighter = await leakageAtOneVolt(matrix, EXACT);
  const exact = 1 / tighter.current.reduce((sum, i) => sum + i, 0);
  const errors = await entryErrors(system, matrix);
  // last, for it takes memory that must not count
  const busy = busyLine(calibration());
  return {
    lines: [
      `**${count} segments, ${soil}, ${ownImages(system.mesh, system.images).count} images, a process of its own.** ${busy}. ${entryText(errors)}.`,
      '',
      ...table(
        [
          'arm',
          'rounds',
          'assemble + solve, s',
          'of it solve',
          'CPU, s',
          'iterations',
          'memory taken, MB',
          'matrix, MB',
          'R, Ω',
          'R off a residual of 1e-10',
        ],
        [
          [
            name,
            String(rounds),
            spreadText(wall, ''),
            spreadText(spread(of((one) => (one.solveMs ?? 0) / 1000)), ''),
            spreadText(spread(of((one) => one.cpuMs / 1000)), ''),
            String(iterations),
            short(memory ?? Number.NaN),
            short((Float64Array.BYTES_PER_ELEMENT * matrix.stored) / MEGABYTE),
            resistance.toPrecision(7),
            relative(resistance / exact - 1),
          ],
        ],
      ),
    ],
    findings: {
      largestTime: wall!.median,
      ...(memory === undefined ? {} : { largestMemory: memory }),
      entries: errors.computed,
    },
  };
}
