// A case by every arm in turns: assembly and solution, with the accuracy of each beside its time.
import { leakageMatrix, leakageOperator } from '@ohmstead/core';
import { entryErrors, entryText } from './bench-accuracy.ts';
import { calibration } from './bench-calibration.ts';
import { type BenchCase, SCRIPT_ROUNDS } from './bench-cases.ts';
import { engineArm, PRODUCT, productArm, resistanceTo, twinArm } from './bench-engine.ts';
import type { Gate } from './bench-gates.ts';
import { busyLine } from './bench-machine.ts';
import { numpyArms } from './bench-numpy.ts';
import { withNumpyCase } from './bench-numpy-case.ts';
import { type Arm, inTurns, type Rounds } from './bench-rounds.ts';
import type { Part, Surroundings } from './bench-stage.ts';
import { type BenchSystem, benchSystem, ownImages } from './bench-system.ts';
import {
  type ExactOf,
  SYSTEM_HEADER,
  systemFindings,
  systemRows,
  twinOverEngine,
} from './bench-system-rows.ts';
import { table } from './bench-table.ts';

/** Residual of the solution by the whole matrix that stands for the exact one. */
const EXACT = 1e-12;
/** Usual ratio of the plain twin's processor time to the engine's at the smallest size. */
const TWIN_USUAL = 3;

export async function systemsPart(one: BenchCase, around: Surroundings): Promise<Part> {
  const system = benchSystem(one.across, one.soil);
  const { mesh, images } = system;
  const busy = busyLine(calibration());
  const rounds = await roundsOf(one, system, around);
  const exactOf = await exactResistances(system);
  const errors = await entryErrors(system, await leakageOperator(mesh, images));
  const leftOut = one.scripts === 'never' ? undefined : whyLeftOut(around);
  return {
    lines: [
      `**${mesh.count} segments, ${one.soil}; images: ${imagesText(system)}.** ${busy}. ${entryText(errors)}.`,
      '',
      ...table(SYSTEM_HEADER, systemRows(rounds, exactOf, leftOut)),
    ],
    findings: { ...systemFindings(mesh.count, rounds, exactOf), entries: errors.computed },
    gates: twinGates(twinOverEngine(rounds)),
  };
}

async function roundsOf(one: BenchCase, system: BenchSystem, around: Surroundings): Promise<Rounds> {
  const { numpy, spawner, full, told } = around;
  const own: Arm[] = [engineArm(system), productArm(system), ...(one.rivals ? [twinArm(system)] : [])];
  const say = (text: string): void => told(`${system.mesh.count} segments, ${one.soil}: ${text}`);
  const wanted = one.scripts === 'always' || (one.scripts === 'full' && full);
  if (!wanted || numpy.kind === 'absent') return inTurns(own, one.rounds, say);
  const atMost = one.scripts === 'full' ? 1 : SCRIPT_ROUNDS;
  return withNumpyCase(system, (path) =>
    inTurns([...own, ...numpyArms(spawner, path, atMost, say)], one.rounds, say),
  );
}

/** By the whole matrix of the images that an arm was given. */
async function exactResistances({ mesh, images, shared }: BenchSystem): Promise<ExactOf> {
  const own = await resistanceTo(await leakageMatrix(mesh, images), EXACT);
  const common = shared === images ? own : await resistanceTo(await leakageMatrix(mesh, shared), EXACT);
  return (arm) => (arm === PRODUCT ? own : common);
}

function twinGates(found: number | undefined): Gate[] {
  return found === undefined ? [] : [{ name: 'plain twin over engine, CPU time', found, usual: TWIN_USUAL }];
}

function whyLeftOut({ numpy }: Surroundings): string {
  return numpy.kind === 'absent' ? numpy.reason : 'only with `--full`: minutes, 6 GB';
}

function imagesText({ mesh, images, shared }: BenchSystem): string {
  const own = ownImages(mesh, images).count;
  return shared === images ? `${own}` : `${ownImages(mesh, shared).count}, in a study ${own}`;
}
