// Cautions: what the sheet cannot know, and who decides.
import type { VNode } from 'preact';
import { PlainPart } from './part.tsx';

/** The cautions usual in the trade; common practice, no source. */
const CAUTIONS: readonly string[] = [
  'This sheet is a calculation for review, not an approval. Local codes, the rules of the network operator and a licensed engineer decide; where they ask for more, they hold.',
  'Measure before energising: the resistance of the electrode, touch and step voltage at the places ringed above, and the continuity of every joint that a hand can reach.',
  'A voltage within its limit is tolerable for the body and the time assumed. It is felt, and it may throw a person off a ladder.',
  'The covering counts only where it lies, at its full thickness, clean and drained. Walked in, silted up or dug over, it is soil.',
  'Soil changes with drought, rain and frost. The layers stated here are states of it that somebody chose.',
  'Metal that is not listed – pipes, rails, cable sheaths, telephone lines, a neighbour’s fence – can carry the rise away from the site or bring remote earth into it. Nothing is said of it here.',
  'Clearing times are those of the protection as stated. A breaker that fails and a second shot after reclosing lengthen them.',
];

/** The usual cautions. */
export function Cautions(): VNode {
  return (
    <PlainPart id="cautions" title="Cautions" facts={[]}>
      <ul class="cautions">
        {CAUTIONS.map((text) => (
          <li key={text}>{text}</li>
        ))}
      </ul>
    </PlainPart>
  );
}
