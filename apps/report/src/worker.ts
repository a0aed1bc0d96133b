// Solves a study away from the page and writes its review pack.
import { sourceFromZip, writePack } from '@ohmstead/pack';
import {
  InputFaults,
  loadStudy,
  programVersion,
  type StudySource,
  solveStudy,
  sourceFromMap,
} from '@ohmstead/study';
import type { SolveRequest, WorkerAnswer } from './messages.ts';

declare const self: DedicatedWorkerGlobalScope;

const say = (answer: WorkerAnswer, transfer: Transferable[] = []): void => self.postMessage(answer, transfer);

self.onmessage = (event: MessageEvent<SolveRequest>): void => {
  const { run, files } = event.data;
  solve(run, files).catch((error: unknown) => {
    if (error instanceof InputFaults) say({ kind: 'faults', run, faults: error.faults });
    else say({ kind: 'failed', run, message: error instanceof Error ? error.message : String(error) });
  });
};

async function solve(run: number, files: ReadonlyMap<string, Uint8Array>): Promise<void> {
  const loaded = loadStudy(await sourceOf(files));
  const outcome = await solveStudy(loaded, {
    onProgress: (stage, share) => say({ kind: 'progress', run, stage, share }),
  });
  const pack = new Uint8Array(await writePack(loaded, outcome, programVersion));
  say({ kind: 'solved', run, outcome, pack }, [pack.buffer]);
}

/** A single zip is a study or a review pack; anything else is the files of a study. */
async function sourceOf(files: ReadonlyMap<string, Uint8Array>): Promise<StudySource> {
  const [only] = files;
  if (files.size === 1 && only !== undefined && only[0].toLowerCase().endsWith('.zip'))
    return sourceFromZip(only[1], only[0]);
  return sourceFromMap(files);
}
