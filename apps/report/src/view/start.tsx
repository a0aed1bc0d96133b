// The page before a study is open: where one comes from.
import type { ComponentChildren, VNode } from 'preact';
import { FilePicks } from './file-picks.tsx';

export interface StartProps {
  readonly open: (list: readonly File[]) => void;
  readonly demo: () => void;
  /** what went wrong with the files that were opened last, in words */
  readonly faults: readonly string[];
  /** studies kept in this browser */
  readonly children?: ComponentChildren;
}

export function Start({ open, demo, faults, children }: StartProps): VNode {
  return (
    <main class="start" id="page">
      <h1>Ohmstead</h1>
      <p>
        A calculation sheet for grounding (earthing) grids and electrodes. Open or drop a study, a zip of one,
        a review pack, or a bare table of conductors: the sheet then asks for what is missing. Everything is
        computed in this page; nothing is sent anywhere.
      </p>
      {faults.length > 0 && (
        <div role="alert">
          <h2>These files cannot be read</h2>
          <ul class="faults">
            {faults.map((line) => (
              <li key={line}>{line}</li>
            ))}
          </ul>
        </div>
      )}
      <p class="picks">
        <FilePicks open={open} />
        <button type="button" class="word" onClick={demo}>
          Try the demonstration study
        </button>
      </p>
      {children}
      <p class="caution">
        Results are calculations from the inputs given. Whether an installation is acceptable is for local
        codes and licensed practice to decide.
      </p>
    </main>
  );
}
