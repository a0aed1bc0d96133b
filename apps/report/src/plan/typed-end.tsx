// A field for the length or the place at which the next point is set.
import type { DisplayUnits, Point } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useId, useState } from 'preact/hooks';
import { TYPED_END_WORDS, typedEnd } from './typed-move.ts';
import { Word } from './word.tsx';

export interface TypedEndProps {
  readonly from: Point;
  readonly towards: Point | undefined;
  readonly units: DisplayUnits;
  readonly take: (at: Point) => void;
  /** closes an area; undefined where there is none to close */
  readonly finish: (() => void) | undefined;
}

export function TypedEnd({ from, towards, units, take, finish }: TypedEndProps): VNode {
  const id = useId();
  const [text, setText] = useState('');
  const [complaint, setComplaint] = useState<string>();
  const commit = (): void => {
    const end = typedEnd(text, from, towards ?? from, units);
    if ('complaint' in end) {
      setComplaint(end.complaint);
      return;
    }
    setText('');
    setComplaint(undefined);
    take(end.at);
  };
  return (
    <p class="plan-words">
      <label class="plan-field">
        to{' '}
        <input
          class="in typed-end"
          size={12}
          value={text}
          autocomplete="off"
          spellcheck={false}
          aria-describedby={id}
          {...(complaint === undefined ? {} : { 'aria-invalid': true })}
          onInput={(event) => {
            setText(event.currentTarget.value);
            setComplaint(undefined);
          }}
          onKeyDown={(event) => {
            if (event.key === 'Enter' && text.trim() !== '') commit();
          }}
        />
      </label>
      <span id={id} class={complaint === undefined ? 'soft' : 'complaint'}>
        {complaint ?? TYPED_END_WORDS}
      </span>
      {finish !== undefined && <Word press={finish}>close the area</Word>}
    </p>
  );
}
