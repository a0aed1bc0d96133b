// A part of the sheet: its name, facts and state in the margin, its reasoning, and the engineer's note.
import type { Outcome } from '@ohmstead/study';
import type { ComponentChildren, VNode } from 'preact';
import type { Desk, SectionId, SectionState } from '../desk/desk.ts';
import { useDesk } from '../desk/use-desk.ts';

export interface PartProps {
  /** anchor of the part, and prefix of identifiers in it */
  readonly id: SectionId;
  readonly title: string;
  /** short facts for the margin */
  readonly facts: readonly string[];
  readonly outcome: Outcome | undefined;
  readonly children?: ComponentChildren;
}

const STATE_WORDS: Readonly<Record<SectionState, string>> = {
  fresh: 'up to date',
  early: 'first numbers',
  computing: 'computing',
  stale: 'out of date',
  fault: 'at fault',
};

function Facts({ facts }: { facts: readonly string[] }): VNode | null {
  if (facts.length === 0) return null;
  return (
    <ul class="facts">
      {facts.map((fact) => (
        <li key={fact}>{fact}</li>
      ))}
    </ul>
  );
}

/** What is wrong with the inputs of the section, as its reading told. */
function InputFaults({ faults, of }: { faults: readonly string[]; of: string }): VNode | null {
  if (faults.length === 0) return null;
  return (
    <ul class="input-faults" aria-label={`Faults under ${of}`}>
      {faults.map((fault) => (
        <li key={fault}>{fault}</li>
      ))}
    </ul>
  );
}

function LivePart({ desk, id, title, facts, children }: PartProps & { readonly desk: Desk }): VNode {
  const state = desk.state(id);
  return (
    <section class={`part ${state}`} id={id} aria-labelledby={`${id}-name`} aria-busy={state === 'computing'}>
      <div class="margin">
        <h2 id={`${id}-name`}>{title}</h2>
        <p class="state" aria-live="polite">
          {STATE_WORDS[state]}
        </p>
        <Facts facts={facts} />
      </div>
      <div class="body" tabIndex={-1}>
        <InputFaults faults={desk.faults(id)} of={title} />
        {children}
        {desk.note(id)}
      </div>
    </section>
  );
}

/** The engineer's own words, a paragraph a line. */
function FrozenNote({ text }: { text: string | undefined }): VNode | null {
  if (text === undefined) return null;
  return (
    <div class="note">
      <h3>Note</h3>
      {text
        .split('\n')
        .filter((line) => line.trim() !== '')
        .map((line, k) => (
          <p key={k}>{line}</p>
        ))}
    </div>
  );
}

/** One step of the reasoning, with its name and facts in the margin. */
export function Part(props: PartProps): VNode {
  const desk = useDesk();
  if (desk !== undefined) return <LivePart {...props} desk={desk} />;
  const { id, title, facts, outcome, children } = props;
  return (
    <PlainPart id={id} title={title} facts={facts}>
      {children}
      <FrozenNote text={outcome?.study.notes?.[id]} />
    </PlainPart>
  );
}

/** A part without state. */
export function PlainPart({
  id,
  title,
  facts,
  children,
}: Omit<PartProps, 'id' | 'outcome'> & { readonly id: string }): VNode {
  return (
    <section class="part" id={id} aria-labelledby={`${id}-name`}>
      <div class="margin">
        <h2 id={`${id}-name`}>{title}</h2>
        <Facts facts={facts} />
      </div>
      <div class="body">{children}</div>
    </section>
  );
}
