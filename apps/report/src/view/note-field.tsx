// The engineer's note under a section, edited where it stands.
import type { SectionId } from '@ohmstead/sheet';
import type { VNode } from 'preact';
import { useState } from 'preact/hooks';

export interface NoteFieldProps {
  readonly section: SectionId;
  readonly text: string;
  readonly take: (text: string) => void;
}

/** Lines shown of an empty and of a long note. */
const LEAST_ROWS = 2;
const MOST_ROWS = 12;

export function NoteField({ section, text, take }: NoteFieldProps): VNode {
  const [typed, setTyped] = useState<string | undefined>(undefined);
  const [open, setOpen] = useState(false);
  const commit = (): void => {
    setOpen(false);
    if (typed !== undefined && typed !== text) take(typed);
    setTyped(undefined);
  };
  if (text === '' && !open)
    return (
      <p class="edits">
        <button type="button" class="word" onClick={() => setOpen(true)}>
          add a note<span class="unseen"> to {section}</span>
        </button>
      </p>
    );
  const shown = typed ?? text;
  return (
    <textarea
      class="note-field"
      aria-label={`note to ${section}`}
      value={shown}
      rows={Math.min(MOST_ROWS, Math.max(LEAST_ROWS, shown.split('\n').length))}
      // opened by a word that it replaces, so that the focus is not lost with it
      ref={(field) => {
        if (open && typed === undefined) field?.focus();
      }}
      onInput={(event) => setTyped(event.currentTarget.value)}
      onBlur={commit}
      onKeyDown={(event) => {
        if (event.key === 'Escape') {
          setTyped(undefined);
          setOpen(false);
        }
      }}
    />
  );
}
