// The dense factors of a case in turns, as rates against what the vectors give.
import { calibration } from './bench-calibration.ts';
import type { BenchCase } from './bench-cases.ts';
import { choleskyOperations, denseArms, ML_CHOLESKY, PACKED } from './bench-dense.ts';
import { busyLine } from './bench-machine.ts';
import { figures, inTurns } from './bench-rounds.ts';
import type { Part, Surroundings } from './bench-stage.ts';
import { ratioSpread, spread } from './bench-statistics.ts';
import { benchSystem } from './bench-system.ts';
import { short, spreadText, table } from './bench-table.ts';

/** Usual rate of the packed factor over that of the multiply-add loop, one thread, 440 rows. */
const RATE_USUAL = 0.85;

export async function factorsPart(one: BenchCase, { told }: Surroundings): Promise<Part> {
  const system = benchSystem(one.across, one.soil);
  const n = system.mesh.count;
  const loops = calibration();
  const rounds = await inTurns(await denseArms(system), one.rounds, (text) => told(`${n} rows: ${text}`));
  const packed = figures(rounds, PACKED, (run) => run.wallMs);
  const rows = [...rounds.keys()].map((arm) => {
    const wall = figures(rounds, arm, (run) => run.wallMs);
    const times = spread(wall.filter((ms) => ms !== undefined));
    // an LU does twice the work, but serves the same purpose: all rates count that of Cholesky
    const rate = choleskyOperations(n) / times!.median / 1e6;
    return [
      arm,
      String(wall.filter((ms) => ms !== undefined).length),
      spreadText(times, ''),
      short(rate),
      loops === undefined ? '–' : short(rate / loops.multiplyAddGflops),
      arm === PACKED ? '1' : spreadText(ratioSpread(wall, packed), '×'),
      (figures(rounds, arm, (run) => run.resistance)[0] ?? Number.NaN).toPrecision(12),
    ];
  });
  const over = ratioSpread(
    figures(rounds, ML_CHOLESKY, (run) => run.wallMs),
    packed,
  );
  const rate = choleskyOperations(n) / spread(packed.filter((ms) => ms !== undefined))!.least / 1e6;
  return {
    lines: [
      `**Factor of one dense matrix, ${n} rows.** ${busyLine(loops)}.`,
      '',
      ...table(['arm', 'rounds', 'ms', 'GF/s (n³/3)', 'over multiply-add', 'over the packed', 'R, Ω'], rows),
    ],
    findings: n > 1000 && over !== undefined ? { cholesky: over.median } : {},
    gates:
      loops === undefined
        ? []
        : [
            {
              name: 'packed Cholesky over multiply-add, GF/s',
              found: rate / loops.multiplyAddGflops,
              usual: RATE_USUAL,
            },
          ],
  };
}
