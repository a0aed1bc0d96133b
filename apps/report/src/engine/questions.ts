// Questions about a solved study that are answered only when asked, since each costs time.
import {
  compareResults,
  compareTexts,
  jsonText,
  type PageScripts,
  sheetTexts,
  writePack,
} from '@ohmstead/pack';
import { sheetHtml } from '@ohmstead/sheet';
import { type Outcome, programVersion, solveStudy } from '@ohmstead/study';
import { besideRows } from './beside-rows.ts';
import type { Question, Reply } from './messages.ts';
import type { SolvedRun } from './solved-run.ts';

/**
 * @param scripts that the sheet of a pack carries
 * @returns the reply, and what of it may change hands instead of being copied
 */
export async function replyTo(
  question: Question,
  { loaded, outcome, field }: SolvedRun,
  scripts: PageScripts | undefined,
): Promise<{ readonly reply: Reply; readonly transfer: Transferable[] }> {
  switch (question.kind) {
    case 'pack': {
      // a record holds nothing that was taken over from the study before an edit
      const recorded = await solveStudy(loaded);
      const pack = new Uint8Array(await writePack(loaded, recorded, programVersion, { scripts }));
      return { reply: { kind: 'pack', pack }, transfer: [pack.buffer] };
    }
    case 'check':
      return { reply: check(question.results, question.texts, outcome), transfer: [] };
    case 'profile': {
      if (field === undefined) throw new Error('no field was kept');
      const profile = field.profile(question.caseIndex, question.from, question.to);
      const { distance, potential, touch } = profile;
      return {
        reply: { kind: 'profile', profile },
        transfer: [distance.buffer, potential.buffer, touch.buffer],
      };
    }
    case 'field': {
      if (field === undefined) throw new Error('no field was kept');
      return {
        reply: { kind: 'field', values: field.at(question.caseIndex, question.points) },
        transfer: [],
      };
    }
    case 'beside':
      return {
        reply: { kind: 'beside', rows: besideRows(question.results, outcome.results) },
        transfer: [],
      };
  }
}

function check(results: unknown, texts: readonly string[], outcome: Outcome): Reply {
  return {
    kind: 'check',
    // through JSON as the record went
    results: compareResults(results, JSON.parse(jsonText(outcome.results))),
    printed: compareTexts(texts, sheetTexts(sheetHtml(outcome))),
  };
}
