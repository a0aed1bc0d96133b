// Asks for what a study still lacks, and for nothing else.
import type { DisplayUnits } from '@ohmstead/study';
import type { VNode } from 'preact';
import type { Draft } from '../desk/draft.ts';
import { setLabel } from '../desk/labels.ts';
import { type Answer, type Question, questionsOf } from '../desk/missing.ts';
import { setValue } from '../desk/set-value.ts';
import { QuantityField } from '../plan/quantity-field.tsx';
import type { BenchAction } from './bench.ts';

export interface MissingProps {
  readonly draft: Draft;
  readonly units: DisplayUnits;
  readonly act: (action: BenchAction) => void;
}

export function Missing({ draft, units, act }: MissingProps): VNode | null {
  const questions = questionsOf(draft);
  if (questions.length === 0) return null;
  const set = (path: Extract<Answer, { path: unknown }>['path'], value: string | number): void =>
    act({ kind: 'edit', draft: setValue(draft, path, value), label: setLabel(draft, path, value, units) });
  return (
    <section class="missing" aria-labelledby="missing-title">
      <h2 id="missing-title">Before anything can be computed, the sheet needs</h2>
      <ul>
        {questions.map((question) => (
          <li key={`${question.id} ${question.ask}`}>
            <span class="ask">{question.ask}: </span>
            {question.answers.map((answer, k) => (
              <span key={answer.words}>
                {k > 0 && ' or '}
                <AnswerField question={question} answer={answer} units={units} set={set} />
              </span>
            ))}
          </li>
        ))}
      </ul>
    </section>
  );
}

interface AnswerFieldProps {
  readonly question: Question;
  readonly answer: Answer;
  readonly units: DisplayUnits;
  readonly set: (path: Extract<Answer, { path: unknown }>['path'], value: string | number) => void;
}

function AnswerField({ question, answer, units, set }: AnswerFieldProps): VNode {
  switch (answer.kind) {
    case 'quantity':
      return (
        <QuantityField
          label={answer.words}
          kind={answer.quantity}
          value={undefined}
          units={units}
          take={(value) => set(answer.path, value)}
        />
      );
    case 'text':
      return (
        <label class="plan-field">
          {answer.words}{' '}
          <input
            class="in"
            onChange={(event) => {
              const text = event.currentTarget.value.trim();
              if (text !== '') set(answer.path, text);
            }}
          />
        </label>
      );
    case 'choice':
      return (
        <>
          {answer.choices.map((choice) => (
            <button key={choice} type="button" class="word" onClick={() => set(answer.path, choice)}>
              {choice}
              <span class="unseen"> for {question.ask}</span>
            </button>
          ))}
        </>
      );
    case 'table':
      return <span class="soft">{answer.words}, opened or dropped on this page as a table</span>;
  }
}
