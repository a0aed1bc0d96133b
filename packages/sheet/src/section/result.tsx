// A result in a sentence, and its change from the pinned state where one is pinned.
import type { CaseResult, Outcome } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useDesk } from '../desk/use-desk.ts';
import { changeText, type Told } from '../format/told.ts';

/** `(0.021 less than pinned)`: in brackets, so that any sentence goes on behind it. */
export function Change({ now, before }: { now: Told; before: Told | undefined }): VNode {
  return <span class="change"> ({changeText(now, before)})</span>;
}

export interface ResultOfProps {
  readonly outcome: Outcome;
  /** reads the result from the outcome shown and from the pinned one; undefined where an outcome has none */
  readonly told: (of: Outcome) => Told | undefined;
}

/** A result without its mark: text of a table cell. */
export function Compared({ outcome, told }: ResultOfProps): VNode {
  const before = useDesk()?.before;
  const now = told(outcome);
  return (
    <>
      {now?.text ?? '—'}
      {before !== undefined && now !== undefined && <Change now={now} before={told(before)} />}
    </>
  );
}

/** A result in bold. */
export function ResultOf({ outcome, told }: ResultOfProps): VNode {
  const before = useDesk()?.before;
  const now = told(outcome);
  return (
    <>
      <b class="res">{now?.text ?? '—'}</b>
      {before !== undefined && now !== undefined && <Change now={now} before={told(before)} />}
    </>
  );
}

/** A case of an outcome by its name. */
export function caseNamed({ results }: Outcome, name: string): CaseResult | undefined {
  return results.cases.find((of) => of.name === name);
}
