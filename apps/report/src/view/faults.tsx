// Faults of a study that has no outcome yet, all of them, above its questions.
import { type Fault, faultLine } from '@ohmstead/study';
import type { VNode } from 'preact';

export function Faults({ faults }: { readonly faults: readonly Fault[] }): VNode | null {
  if (faults.length === 0) return null;
  return (
    <section class="all-faults" aria-label="faults">
      <h2>What keeps the study from being computed</h2>
      <ul class="faults" role="alert">
        {faults.map((fault) => (
          <li key={faultLine(fault)}>{faultLine(fault)}</li>
        ))}
      </ul>
    </section>
  );
}
