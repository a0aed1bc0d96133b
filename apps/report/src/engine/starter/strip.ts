// The strip above a sheet of a review pack: recompute it, and try changed numbers beside the record.
import { faultLine } from '@ohmstead/study';
import { blobWorker } from '../blob-worker.ts';
import { createEngine, type Engine } from '../client.ts';
import type { RunAnswer } from '../messages.ts';
import { button, element } from './element.ts';
import { contradictionList, summaryOf } from './findings.ts';
import { numberInputs, withNumbers } from './inputs.ts';
import { markContradicted, printedTexts } from './printed.ts';
import { engineText, type PageContent } from './record.ts';
import { besideTable, type Change, trialForm } from './trial.ts';

const STUDY_FILE = 'study.json';

/**
 * @param content of the page
 * @param sheet whose texts are checked, as they stand now
 */
export function recomputeStrip(content: PageContent, sheet: Element): HTMLElement {
  const texts = printedTexts(sheet);
  const stage = element('span');
  const bar = element('progress', { max: '1', 'aria-label': 'computing' });
  const said = element('p', { role: 'status' });
  const findings = element('div');
  const beside = element('div');
  const again = button('Recompute', () =>
    begin(content.files, async (run) => {
      const reply = await engine().ask(run, {
        kind: 'check',
        results: content.results,
        texts: texts.map(({ data }) => data),
      });
      if (reply.kind !== 'check') return;
      const contradicted = reply.results.differences.length + reply.printed.differences.length > 0;
      say(summaryOf(reply), contradicted);
      markContradicted(texts, reply.printed.differences);
      findings.replaceChildren(...(contradicted ? [contradictionList(reply, texts)] : []));
    }),
  );
  const cancel = button('Cancel', () => {
    engine().cancel();
    rest();
    say('Cancelled.');
  });
  const busy = element('p', { hidden: true }, bar, ' ', stage, ' ', cancel);

  let made: Engine | undefined;
  let done: ((run: number) => Promise<void>) | undefined;
  const engine = (): Engine => {
    made ??= createEngine({
      begin: (hear) => blobWorker(new Promise((resolve) => resolve({ engine: engineText(document) })), hear),
      hear: take,
    });
    return made;
  };

  const begin = (files: ReadonlyMap<string, Uint8Array>, then: (run: number) => Promise<void>): void => {
    done = then;
    say('');
    again.disabled = true;
    busy.hidden = false;
    bar.value = 0;
    stage.textContent = 'starting';
    engine().solve(files);
  };
  const rest = (): void => {
    again.disabled = false;
    busy.hidden = true;
  };
  const say = (text: string, bad: boolean = false): void => {
    said.textContent = text;
    said.className = bad ? 'contradicted' : '';
    findings.replaceChildren();
  };
  const take = (answer: Exclude<RunAnswer, { kind: 'ended' }>): void => {
    switch (answer.kind) {
      case 'progress':
        bar.value = answer.share;
        stage.textContent = answer.stage;
        return;
      case 'first':
        return;
      case 'solved':
        stage.textContent = 'comparing';
        done?.(answer.run)
          .catch((error: unknown) => say(`The comparison failed: ${String(error)}`, true))
          .finally(rest);
        return;
      case 'faults':
        rest();
        say('The study cannot be computed:', true);
        findings.append(
          element('ul', {}, ...answer.faults.map((fault) => element('li', {}, faultLine(fault)))),
        );
        return;
      case 'failed':
        rest();
        say(`Computing failed: ${answer.message}`, true);
    }
  };

  const tryChanges = (changes: readonly Change[]): void => {
    const numbers = new Map(changes.map(({ input, value }) => [input.name, value]));
    const study = new TextEncoder().encode(JSON.stringify(withNumbers(studyOf(content), numbers)));
    beside.replaceChildren();
    begin(new Map([...content.files, [STUDY_FILE, study]]), async (run) => {
      const reply = await engine().ask(run, { kind: 'beside', results: content.results });
      if (reply.kind === 'beside') beside.replaceChildren(besideTable(changes, reply.rows));
    });
  };

  return element(
    'aside',
    { class: 'recompute', 'aria-label': 'Recompute' },
    element(
      'p',
      {},
      again,
      ' Solves the study that this page carries once more, here and without a network, and compares every number. It is this page’s own program that does so: to check a page of unknown origin, use ohmstead verify with the whole pack.',
    ),
    busy,
    said,
    findings,
    element(
      'details',
      {},
      element('summary', {}, 'Try other numbers beside the record'),
      trialForm(numberInputs(studyOf(content)), tryChanges),
      beside,
    ),
  );
}

function studyOf({ files }: PageContent): unknown {
  return JSON.parse(new TextDecoder().decode(files.get(STUDY_FILE)));
}
