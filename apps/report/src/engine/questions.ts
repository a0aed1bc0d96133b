// Questions about a solved study that are answered only when asked, since each costs time.
import { writePack } from '@ohmstead/pack';
import { programVersion } from '@ohmstead/study';
import type { Question, Reply } from './messages.ts';
import type { SolvedRun } from './solved-run.ts';

/** @returns the reply, and what of it may change hands instead of being copied */
export async function replyTo(
  question: Question,
  { loaded, outcome }: SolvedRun,
): Promise<{ readonly reply: Reply; readonly transfer: Transferable[] }> {
  switch (question.kind) {
    case 'pack': {
      const pack = new Uint8Array(await writePack(loaded, outcome, programVersion));
      return { reply: { kind: 'pack', pack }, transfer: [pack.buffer] };
    }
  }
}
