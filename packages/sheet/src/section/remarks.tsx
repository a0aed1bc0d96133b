// Lists remarks under a heading, each as a sentence with its code.
import type { ResultsWarning } from '@ohmstead/study';
import type { VNode } from 'preact';
import { capital } from '../format/words.ts';

/** A first word that is a word, and no name of a file, is written with a capital. */
const PLAIN_WORD = /^[a-z]+[\s,]/;

function sentence(message: string): string {
  const text = PLAIN_WORD.test(message) ? capital(message) : message;
  return /[.!?]$/.test(text) ? text : `${text}.`;
}

/** Doubts or assumptions as the results tell them. */
export function Remarks({ title, remarks }: { title: string; remarks: readonly ResultsWarning[] }): VNode {
  return (
    <>
      <h3>{title}</h3>
      <ul class="remarks">
        {remarks.map((remark, k) => (
          <li key={k}>
            {sentence(remark.message)} <code>{remark.code}</code>
          </li>
        ))}
      </ul>
    </>
  );
}
