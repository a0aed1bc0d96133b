// The rounds of a case as table rows and as figures to judge.
import type { Findings } from './bench-claims.ts';
import { ENGINE, PRODUCT, TWIN } from './bench-engine.ts';
import { NODE_SHARED, ROW_BLOCKED, WHOLE_ARRAY } from './bench-numpy.ts';
import { figures, type Rounds, type Run } from './bench-rounds.ts';
import { ratioSpread, type Spread, spread } from './bench-statistics.ts';
import { relative, short, spreadText } from './bench-table.ts';

/** Resistance that an arm should find, Ω. */
export type ExactOf = (arm: string) => number;

export const SYSTEM_HEADER: readonly string[] = [
  'arm',
  'rounds',
  'assemble + solve, ms',
  'of it solve',
  'CPU, ms',
  'over the engine',
  'by CPU',
  'R, Ω',
  'R off',
];

/** A row for each arm that ran; where scripts belong to the case but did not run, a row for each with the reason. */
export function systemRows(rounds: Rounds, exactOf: ExactOf, leftOut: string | undefined): string[][] {
  const rows = [...rounds.keys()].map((arm) => row(arm, rounds, exactOf(arm)));
  const missing = [WHOLE_ARRAY, ROW_BLOCKED, NODE_SHARED].filter((arm) => !rounds.has(arm));
  if (leftOut === undefined) return rows;
  return [...rows, ...missing.map((arm) => [arm, '0', leftOut, ...SYSTEM_HEADER.slice(3).map(() => '–')])];
}

function row(arm: string, rounds: Rounds, exact: number): string[] {
  const of = (pick: (run: Run) => number | undefined): Spread | undefined => spread(known(rounds, arm, pick));
  const found = of((run) => run.resistance)?.median;
  return [
    arm,
    String(known(rounds, arm, wall).length),
    spreadText(of(wall), ''),
    spreadText(
      of((run) => run.solveMs),
      '',
    ),
    spreadText(
      of((run) => run.cpuMs),
      '',
    ),
    arm === ENGINE ? '1' : spreadText(overEngine(rounds, arm, wall), '×'),
    arm === ENGINE ? '1' : medianText(overEngine(rounds, arm, (run) => run.cpuMs)),
    found?.toPrecision(7) ?? 'failed',
    relative(found === undefined ? undefined : found / exact - 1),
  ];
}

function medianText(found: Spread | undefined): string {
  return found === undefined ? '–' : `${short(found.median)}×`;
}

/** The goals that a case speaks for: ratios where its size is theirs, accuracy always. */
export function systemFindings(segments: number, rounds: Rounds, exactOf: ExactOf): Findings {
  const off = [ENGINE, PRODUCT].flatMap((arm) =>
    known(rounds, arm, (run) => run.resistance).map((found) => Math.abs(found / exactOf(arm) - 1)),
  );
  return { ...ratios(segments, rounds), resistance: Math.max(...off) };
}

function ratios(segments: number, rounds: Rounds): Findings {
  const whole = overEngine(rounds, WHOLE_ARRAY, wall)?.median;
  const rows = overEngine(rounds, ROW_BLOCKED, wall)?.median;
  if (whole === undefined || rows === undefined) return {};
  if (Math.abs(segments / 2000 - 1) < NEAR_ROUND) return { whole2000: whole, rows2000: rows };
  if (Math.abs(segments / 10_000 - 1) < NEAR_ROUND) return { whole10000: whole, rows10000: rows };
  return {};
}

/** A lattice's count is that near to the round number that a goal names. */
const NEAR_ROUND = 0.05;

/** The plain twin's processor time over the engine's: on a busy machine steadier than what the clock on the wall says. */
export function twinOverEngine(rounds: Rounds): number | undefined {
  return overEngine(rounds, TWIN, (run) => run.cpuMs)?.median;
}

function overEngine(rounds: Rounds, arm: string, pick: (run: Run) => number): Spread | undefined {
  return ratioSpread(figures(rounds, arm, pick), figures(rounds, ENGINE, pick));
}

function known(rounds: Rounds, arm: string, pick: (run: Run) => number | undefined): number[] {
  return figures(rounds, arm, pick).filter((value) => value !== undefined);
}

function wall(run: Run): number {
  return run.wallMs;
}
