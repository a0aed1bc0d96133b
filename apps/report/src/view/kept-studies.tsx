// Studies kept in this browser: go on with one, or remove it.
import type { VNode } from 'preact';
import { useState } from 'preact/hooks';
import type { KeptSummary } from '../files/study-store.ts';

export interface KeptStudiesProps {
  readonly kept: readonly KeptSummary[];
  readonly goOn: (id: string) => void;
  readonly remove: (id: string) => void;
}

export function KeptStudies({ kept, goOn, remove }: KeptStudiesProps): VNode | null {
  const [asked, setAsked] = useState<string>();
  if (kept.length === 0) return null;
  return (
    <section aria-labelledby="kept-title">
      <h2 id="kept-title">Kept in this browser</h2>
      <ul class="kept">
        {kept.map(({ id, title, at }) => (
          <li key={id}>
            <button type="button" class="word" onClick={() => goOn(id)}>
              {title}
            </button>
            <span class="soft"> {new Date(at).toLocaleString()} </span>
            <button
              type="button"
              class="word"
              onClick={() => {
                if (asked !== id) return setAsked(id);
                setAsked(undefined);
                remove(id);
              }}
            >
              {asked === id ? 'remove for good' : 'remove'}
              <span class="unseen"> {title}</span>
            </button>
          </li>
        ))}
      </ul>
    </section>
  );
}
