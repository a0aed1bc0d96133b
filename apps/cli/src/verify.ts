// `ohmstead verify`: a review pack's digests checked, its study solved again, and every difference listed.
import { differenceLine, type Verification } from '@ohmstead/pack';
import type { Arguments, Command } from './command.ts';
import type { Engine } from './engine.ts';
import { DONE, type ExitStatus, FINDING } from './exit-status.ts';
import type { Io } from './io.ts';
import { readZipFile } from './open-study.ts';
import { printable } from './printable.ts';
import { withProgress } from './progress.ts';

/** Differences printed at most; a pack of another study differs in thousands of numbers, and a few tell as much. */
const MOST_SHOWN = 50;

export const verify: Command = {
  name: 'verify',
  operand: 'FILE.zip',
  summary: 'checks a review pack: its digests, and its results by solving its study again',
  options: [],
  details: [
    'FILE.zip is a review pack as written by solve --pack. Every entry is compared with the digest in its manifest, every number of results.json with the study solved again, and the sheet, its figures and tables with those drawn again.',
    'Exit status 3 tells that something differs; each difference is a line.',
  ],
  example: 'ohmstead verify aldermoor-review.zip',
  run: runVerify,
};

async function runVerify(given: Arguments, io: Io, engine: Engine): Promise<ExitStatus> {
  const bytes = readZipFile(given.operand);
  const { verifyPack } = await import('@ohmstead/pack');
  const scripts = await engine.pageScripts?.();
  const { differences, checked } = await withProgress(io, (report) =>
    verifyPack(bytes, (loaded) => engine.solveStudy(loaded, { onProgress: report }), {
      file: given.operand,
      load: engine.loadStudy,
      scripts,
      ...(engine.renderer === undefined ? {} : { renderer: engine.renderer }),
    }),
  );
  const lines = differences.map((difference) => `difference: ${printable(differenceLine(difference))}`);
  const more = lines.length - MOST_SHOWN;
  const listed = more > 0 ? [...lines.slice(0, MOST_SHOWN), `and ${more} differences more`] : lines;
  io.out([...listed, ...summary(checked, lines.length), ''].join('\n'));
  return lines.length === 0 ? DONE : FINDING;
}

function summary(checked: Verification['checked'], differences: number): readonly string[] {
  const { packVersion, programVersion, digests, numbers, exactNumbers, closeNumbers, renderings } = checked;
  const close = closeNumbers === 0 ? '' : `, ${closeNumbers} more but for rounding (another kind of machine)`;
  const solved =
    programVersion === null
      ? 'study not solved'
      : `${exactNumbers} of ${numbers} numbers equal${close}; ${renderings} drawings and tables compared`;
  const versions =
    programVersion === null || programVersion === packVersion
      ? []
      : [
          `written by version ${printable(packVersion)}, solved again by version ${programVersion}; the program that its sheet may carry is not compared`,
        ];
  const verdict =
    differences === 0
      ? 'no difference'
      : `${differences} ${differences === 1 ? 'difference' : 'differences'}`;
  return [`${digests} digests checked; ${solved}`, ...versions, verdict];
}
