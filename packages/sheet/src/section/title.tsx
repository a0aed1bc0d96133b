// The title block: what was calculated, and the answer in words.
import type { Outcome, Results } from '@ohmstead/study';
import type { VNode } from 'preact';
import type { Desk, SectionState } from '../desk/desk.ts';
import { useDesk } from '../desk/use-desk.ts';
import { useUnits } from '../desk/use-units.ts';
import { TextInput } from '../field/inputs.tsx';
import { capital, counted } from '../format/words.ts';
import { answerOf, answerSentences } from '../verdict/answer.ts';
import { otherDoubts } from '../verdict/doubts.ts';
import { soilBandSentences } from '../verdict/soil-band.ts';
import { Project, ProjectFields } from './project.tsx';

interface DoubtsIn {
  readonly part: string;
  readonly name: string;
  readonly count: number;
}

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

/** Doubts of the soil's fit stand under Ground, all others under Assumed. */
function doubtsOf(results: Results): readonly DoubtsIn[] {
  const places: readonly DoubtsIn[] = [
    { part: 'ground', name: 'Ground', count: results.ground?.fit.doubts.length ?? 0 },
    { part: 'assumed', name: 'Assumed', count: otherDoubts(results).length },
  ];
  return places.filter(({ count }) => count > 0);
}

/** The answer stands to the study as what it is drawn from does. */
function stateOf(desk: Desk | undefined): SectionState {
  return desk?.state('people') ?? 'fresh';
}

/** What was calculated and by whom. */
export function Heading({ outcome }: { outcome: Outcome | undefined }): VNode {
  const desk = useDesk();
  return (
    <>
      <h1>
        <TextInput path={['title']} label="title" placeholder="title" value={outcome?.results.title ?? ''} />{' '}
        <span class="sort">earthing calculation</span>
      </h1>
      {outcome !== undefined && (
        <p class="subtitle">
          Ohmstead {outcome.results.program_version}. Prepared for review; not an approval.
        </p>
      )}
      {desk !== undefined && <ProjectFields desk={desk} />}
      {desk === undefined && outcome !== undefined && <Project study={outcome.study} />}
    </>
  );
}

function Findings({ outcome }: { outcome: Outcome }): VNode {
  const { results } = outcome;
  const units = useUnits();
  const stated = doubtsOf(results);
  const doubts = stated.reduce((sum, { count }) => sum + count, 0);
  return (
    <div class="findings">
      {[...answerSentences(results, units), ...soilBandSentences(results)].map((sentence) => (
        <p key={sentence}>{sentence}</p>
      ))}
      {stated.length > 0 && (
        <p>
          {capital(counted(doubts, 'doubt'))} {doubts === 1 ? 'is' : 'are'} stated under{' '}
          {stated.map(({ part, name }, k) => (
            <span key={part}>
              {k > 0 && ' and '}
              <a href={`#${part}`}>{name}</a>
            </span>
          ))}
          .
        </p>
      )}
    </div>
  );
}

/** Title, answer, and the findings behind it. */
export function TitleBlock({ outcome }: { outcome: Outcome }): VNode {
  const desk = useDesk();
  const { results } = outcome;
  const answer = answerOf(results);
  const state = stateOf(desk);
  const season = desk !== undefined || results.seasons.length > 0;
  return (
    <header class={state === 'fresh' ? 'title-block' : `title-block ${state}`}>
      <div class="headline">
        <div>
          <Heading outcome={outcome} />
        </div>
        <p class={`answer ${answer.finding}`}>
          {answer.subject} <strong>{answer.predicate}</strong>
          {answer.rest !== undefined && <span class="rest"> {answer.rest}</span>}
        </p>
      </div>
      <Findings outcome={outcome} />
      <nav aria-label="Parts of the sheet">
        <ol>
          {PARTS.filter(([id]) => id !== 'season' || season).map(([id, name]) => (
            <li key={id}>
              <a href={`#${id}`}>{name}</a>
            </li>
          ))}
        </ol>
      </nav>
    </header>
  );
}
