// A button set as a word in the text.
import type { VNode } from 'preact';

export interface WordButtonProps {
  readonly children: string;
  /** completes the label for those who hear only the word */
  readonly of?: string;
  readonly press: () => void;
  /** what is pressed goes away with it, so the section takes the focus */
  readonly vanishes?: boolean;
}

export function WordButton({ children, of, press, vanishes = false }: WordButtonProps): VNode {
  return (
    <button
      type="button"
      class="word"
      onClick={(event) => {
        const body = vanishes ? event.currentTarget.closest<HTMLElement>('.body') : null;
        press();
        body?.focus();
      }}
    >
      {children}
      {of !== undefined && <span class="unseen"> {of}</span>}
    </button>
  );
}
