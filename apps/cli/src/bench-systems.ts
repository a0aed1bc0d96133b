// A case by every arm in turns: assembly and solution, with the accuracy of each beside its time.
import { leakageMatrix, leakageOperator } from '@ohmstead/core';
import { entryErrors, entryText } from './bench-accuracy.ts';
import { calibration } from './bench-calibration.ts';
import { type BenchCase, SCRIPT_ROUNDS } from './bench-cases.ts';
import type { Findings } from './bench-claims.ts';
import { ENGINE, engineArm, PRODUCT, productArm, resistanceTo, TWIN, twinArm } from './bench-engine.ts';
import { busyLine } from './bench-machine.ts';
import { NODE_SHARED, numpyArms, ROW_BLOCKED, WHOLE_ARRAY } from './bench-numpy.ts';
import { withNumpyCase } from './bench-numpy-case.ts';
import { type Arm, figures, inTurns, type Rounds } from './bench-rounds.ts';
import type { Part, Surroundings } from './bench-stage.ts';
import { ratioSpread, type Spread, spread } from './bench-statistics.ts';
import { type BenchSystem, benchSystem, ownImages } from './bench-system.ts';
import { relative, spreadText, table } from './bench-table.ts';

/** Residual of the solution by the whole matrix that stands for the exact one. */
const EXACT = 1e-12;
/** Usual ratio of the plain twin's time to the engine's at the smallest size. */
const TWIN_USUAL = 2.4;

const HEADER = [
  'arm',
  'rounds',
  'assemble + solve, ms',
  'of it solve',
  'CPU, ms',
  'over the engine',
  'R, Ω',
  'R off',
];

export async function systemsPart(one: BenchCase, around: Surroundings): Promise<Part> {
  const system = benchSystem(one.across, one.soil);
  const busy = busyLine(calibration());
  const rounds = await roundsOf(one, system, around);
  const { mesh, images, shared } = system;
  const own = await resistanceTo(await leakageMatrix(mesh, images), EXACT);
  const common = shared === images ? own : await resistanceTo(await leakageMatrix(mesh, shared), EXACT);
  const exactOf = (arm: string): number => (arm === PRODUCT ? own : common);
  const errors = await entryErrors(system, await leakageOperator(mesh, images));
  const over = (arm: string): Spread | undefined =>
    ratioSpread(
      figures(rounds, arm, (run) => run.wallMs),
      figures(rounds, ENGINE, (run) => run.wallMs),
    );
  const rows = [...rounds.keys()].map((arm) => row(arm, rounds, over(arm), exactOf(arm)));
  if (one.scripts !== 'never')
    for (const arm of [WHOLE_ARRAY, ROW_BLOCKED, NODE_SHARED])
      if (!rounds.has(arm)) rows.push([arm, '0', leftOut(around), ...HEADER.slice(3).map(() => '–')]);
  const count = mesh.count;
  return {
    lines: [
      `**${count} segments, ${one.soil}; images: ${imagesText(system)}.** ${busy}. ${entryText(errors)}.`,
      '',
      ...table(HEADER, rows),
    ],
    findings: {
      ...ratios(count, over),
      resistance: worst(
        [ENGINE, PRODUCT].map((arm) => spread(resistances(rounds, arm))!.median / exactOf(arm) - 1),
      ),
      entries: errors.computed,
    },
    gates: one.rivals
      ? [{ name: 'plain twin over engine', found: over(TWIN)?.median ?? 0, usual: TWIN_USUAL }]
      : [],
  };
}

async function roundsOf(one: BenchCase, system: BenchSystem, around: Surroundings): Promise<Rounds> {
  const { numpy, spawner, full, told } = around;
  const own: Arm[] = [engineArm(system), productArm(system), ...(one.rivals ? [twinArm(system)] : [])];
  const say = (text: string): void => told(`${system.mesh.count} segments, ${one.soil}: ${text}`);
  const scripts = numpy.kind === 'present' && (one.scripts === 'always' || (one.scripts === 'full' && full));
  if (!scripts) return inTurns(own, one.rounds, say);
  const atMost = one.scripts === 'full' ? 1 : SCRIPT_ROUNDS;
  return withNumpyCase(system, (path) =>
    inTurns([...own, ...numpyArms(spawner, path, atMost, say)], one.rounds, say),
  );
}

function row(arm: string, rounds: Rounds, over: Spread | undefined, exact: number): string[] {
  const of = (pick: Parameters<typeof figures>[2]): number[] =>
    figures(rounds, arm, pick).filter((value) => value !== undefined);
  const found = spread(resistances(rounds, arm))?.median;
  return [
    arm,
    String(of((run) => run.wallMs).length),
    spreadText(spread(of((run) => run.wallMs)), ''),
    spreadText(spread(of((run) => run.solveMs)), ''),
    spreadText(spread(of((run) => run.cpuMs)), ''),
    arm === ENGINE ? '1' : spreadText(over, '×'),
    found?.toPrecision(7) ?? 'failed',
    relative(found === undefined ? undefined : found / exact - 1),
  ];
}

function worst(differences: readonly number[]): number {
  return Math.max(...differences.map(Math.abs));
}

function imagesText({ mesh, images, shared }: BenchSystem): string {
  const own = ownImages(mesh, images).count;
  return shared === images ? `${own}` : `${ownImages(mesh, shared).count}, in a study ${own}`;
}

function resistances(rounds: Rounds, arm: string): number[] {
  return figures(rounds, arm, (run) => run.resistance).filter((value) => value !== undefined);
}

function leftOut({ numpy }: Surroundings): string {
  return numpy.kind === 'absent' ? numpy.reason : 'only with `--full`: minutes, 6 GB';
}

/** The ratios that the goals name, where this case is theirs. */
function ratios(count: number, over: (arm: string) => Spread | undefined): Findings {
  const whole = over(WHOLE_ARRAY)?.median;
  const blocked = over(ROW_BLOCKED)?.median;
  if (whole === undefined || blocked === undefined) return {};
  if (Math.abs(count / 2000 - 1) < NEAR_ROUND) return { whole2000: whole, rows2000: blocked };
  if (Math.abs(count / 10_000 - 1) < NEAR_ROUND) return { whole10000: whole, rows10000: blocked };
  return {};
}

/** A lattice's count is that near to the round number that a goal names. */
const NEAR_ROUND = 0.05;
