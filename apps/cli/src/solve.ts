// `ohmstead solve`: every case of a study, as a table or as JSON, and a review pack where one is asked for.
import { realpathSync } from 'node:fs';
import { jsonText } from '@ohmstead/pack';
import { verdictRows } from '@ohmstead/sheet';
import { type Fault, InputFaults } from '@ohmstead/study';
import type { Arguments, Command } from './command.ts';
import type { Engine } from './engine.ts';
import { DONE, type ExitStatus, FINDING } from './exit-status.ts';
import type { Io } from './io.ts';
import { openStudy } from './open-study.ts';
import { printable } from './printable.ts';
import { withProgress } from './progress.ts';
import { resultTable } from './result-table.ts';
import { toldWarnings } from './told-warnings.ts';
import { outputFault, writeWhole } from './write-whole.ts';

export const solve: Command = {
  name: 'solve',
  operand: 'STUDY',
  summary: 'solves every fault case: resistance, rise, worst touch and step voltages against their limits',
  options: [
    { name: 'json', help: 'results as JSON instead of a table' },
    {
      name: 'pack',
      value: 'FILE.zip',
      help: 'write a review pack: the calculation sheet, its figures and tables, the inputs',
    },
    {
      name: 'strict',
      help: 'end with exit status 3 where a limit is exceeded, in any season or at floating metal',
    },
  ],
  details: [
    'STUDY is a folder with a study.json in it, a zip of such a folder, the path of the study.json, or a review pack. See: ohmstead help study',
    'The table gives each voltage with its numerical uncertainty, its place, its limit and its share of the limit. Warnings go to standard error; read them: they are doubts about the study.',
  ],
  example: 'ohmstead solve test-data/aldermoor --pack aldermoor-review.zip',
  run: runSolve,
};

async function runSolve(given: Arguments, io: Io, engine: Engine): Promise<ExitStatus> {
  const pack = given.values.get('pack');
  const fault = pack === undefined ? undefined : packFault(pack, given.operand);
  if (fault !== undefined) throw new InputFaults([fault]);
  const loaded = engine.loadStudy(await openStudy(given.operand));
  const { results } = await withProgress(io, async (report) => {
    const outcome = await engine.solveStudy(loaded, { onProgress: report });
    if (pack !== undefined) {
      report('drawing the sheet', 0);
      // read only when wanted: what draws and packs is half the program
      const { writePack } = await import('@ohmstead/pack');
      const { renderer } = engine;
      const scripts = await engine.pageScripts?.();
      writeWhole(pack, await writePack(loaded, outcome, engine.version, { renderer, scripts }));
    }
    return outcome;
  });
  io.out(given.switches.has('json') ? jsonText(results) : resultTable(results, emphasis(io)));
  for (const { code, message } of toldWarnings(results)) io.err(`warning: ${printable(message)} (${code})\n`);
  if (pack !== undefined) io.err(`review pack written: ${printable(pack)}\n`);
  return given.switches.has('strict') && verdictRows(results).some(({ worst, limit }) => worst > limit)
    ? FINDING
    : DONE;
}

/** Found before the study is solved: a pack that could not be written, or that would overwrite its own study. */
function packFault(pack: string, study: string): Fault | undefined {
  if (!/\.zip$/i.test(pack)) {
    return { file: pack, code: 'usage', message: 'is not the name of a zip; expected --pack FILE.zip' };
  }
  const fault = outputFault(pack);
  if (fault !== undefined) return fault;
  const same = real(pack) !== undefined && real(pack) === real(study);
  return same
    ? { file: pack, code: 'overwrites-study', message: 'is the study itself; expected another name' }
    : undefined;
}

function real(path: string): string | undefined {
  try {
    return realpathSync(path);
  } catch {
    return undefined;
  }
}

function emphasis(io: Io): (text: string) => string {
  const plain = !io.outIsTerminal || (io.env.NO_COLOR ?? '') !== '' || io.env.TERM === 'dumb';
  return plain ? (text) => text : (text) => `\u001b[1m${text}\u001b[22m`;
}
