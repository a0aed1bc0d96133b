// The title block: what was calculated, and the answer in words.
import type { Outcome } from '@ohmstead/study';
import type { VNode } from 'preact';
import { counted } from '../format/words.ts';
import { answerOf, answerSentences } from '../verdict/answer.ts';

/** Anchors and names of the parts, in order. */
const PARTS: readonly (readonly [id: string, name: string])[] = [
  ['ground', 'Ground'],
  ['electrode', 'Electrode'],
  ['fault', 'Fault'],
  ['rise', 'Rise'],
  ['surface', 'Surface'],
  ['people', 'People'],
  ['season', 'Season'],
  ['trust', 'Trust'],
  ['assumed', 'Assumed'],
  ['cautions', 'Cautions'],
];

/** Title, answer, and the findings behind it. */
export function TitleBlock({ outcome }: { outcome: Outcome }): VNode {
  const { results } = outcome;
  const answer = answerOf(results);
  const doubts = results.warnings.length;
  return (
    <header class="title-block">
      <div class="headline">
        <div>
          <h1>
            {results.title} <span>earthing calculation</span>
          </h1>
          <p class="subtitle">Ohmstead {results.program_version}. Prepared for review; not an approval.</p>
        </div>
        <p class={`answer ${answer.finding}`}>
          {answer.subject} <strong>{answer.predicate}</strong>
          {answer.rest !== undefined && <span class="rest"> {answer.rest}</span>}
        </p>
      </div>
      <div class="findings">
        {answerSentences(results).map((sentence) => (
          <p key={sentence}>{sentence}</p>
        ))}
        {doubts > 0 && (
          <p>
            {doubts === 1
              ? 'One doubt is'
              : `${counted(doubts, 'doubt').replace(/^./, (c) => c.toUpperCase())} are`}{' '}
            stated under <a href="#assumed">Assumed</a>.
          </p>
        )}
      </div>
      <nav aria-label="Parts of the sheet">
        <ol>
          {PARTS.filter(([id]) => id !== 'season' || results.seasons.length > 0).map(([id, name]) => (
            <li key={id}>
              <a href={`#${id}`}>{name}</a>
            </li>
          ))}
        </ol>
      </nav>
    </header>
  );
}
