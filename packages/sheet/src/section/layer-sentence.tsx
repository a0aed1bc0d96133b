// The sentence that tells layers of a soil from the surface down, whatever its numbers are set as.
import type { ComponentChildren, VNode } from 'preact';
import { capital, countWord } from '../format/words.ts';

export interface LayerSentenceProps {
  readonly count: number;
  readonly resistivity: (layer: number) => ComponentChildren;
  /** of any layer but the last, which reaches to any depth */
  readonly thickness: (layer: number) => ComponentChildren;
}

/** `Two layers: 220 Ω·m for the first 2.4 m, then 65 Ω·m below`, without the full stop. */
export function LayerSentence({ count, resistivity, thickness }: LayerSentenceProps): VNode {
  if (count === 1) return <>The soil is taken as uniform, {resistivity(0)} at every depth</>;
  return (
    <>
      {capital(countWord(count))} layers:{' '}
      {Array.from({ length: count }, (_, k) => (
        <span key={k}>
          {k > 0 && ', then '}
          {resistivity(k)}
          {k === count - 1 ? (
            ' below'
          ) : (
            <>
              {k === 0 ? ' for the first ' : ' for '}
              {thickness(k)}
            </>
          )}
        </span>
      ))}
    </>
  );
}
