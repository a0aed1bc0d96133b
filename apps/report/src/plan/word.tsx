// A tool or a deed of the plan, set as a word.
import type { VNode } from 'preact';

export interface WordProps {
  readonly children: string;
  readonly press: () => void;
  readonly held?: boolean;
  readonly off?: boolean;
  /** completes the word for those who hear it: `remove` of `corner 2` */
  readonly of?: string;
}

export function Word({ children, press, held, off = false, of }: WordProps): VNode {
  return (
    <button
      type="button"
      class={held === true ? 'word held' : 'word'}
      disabled={off}
      onClick={press}
      {...(held === undefined ? {} : { 'aria-pressed': held })}
    >
      {children}
      {of !== undefined && <span class="unseen"> {of}</span>}
    </button>
  );
}
