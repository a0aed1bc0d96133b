// The slim margin: the sections in order, each with its state where that is not fresh.
import type { SectionId, SectionState } from '@ohmstead/sheet';
import type { VNode } from 'preact';

const NAMES: readonly (readonly [SectionId, string])[] = [
  ['ground', 'Ground'],
  ['electrode', 'Electrode'],
  ['fault', 'Fault'],
  ['rise', 'Rise'],
  ['surface', 'Surface'],
  ['people', 'People'],
  ['season', 'Season'],
  ['trust', 'Trust'],
  ['assumed', 'Assumed'],
];
const WORDS: Readonly<Record<SectionState, string>> = {
  fresh: '',
  early: 'first numbers',
  computing: 'computing',
  stale: 'out of date',
  fault: 'at fault',
};

export function Contents({ state }: { readonly state: (section: SectionId) => SectionState }): VNode {
  return (
    <nav class="contents" aria-label="sections">
      <ol>
        {NAMES.map(([id, name]) => {
          const now = state(id);
          return (
            <li key={id} class={now}>
              <a href={`#${id}`}>{name}</a>
              {now !== 'fresh' && <span class="now"> {WORDS[now]}</span>}
            </li>
          );
        })}
      </ol>
    </nav>
  );
}
