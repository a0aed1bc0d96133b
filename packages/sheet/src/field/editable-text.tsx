// A text that is edited where it stands: Enter or leaving commits, Escape reverts, nonsense is refused beside it.
import type { TargetedKeyboardEvent, VNode } from 'preact';
import { useId, useState } from 'preact/hooks';
import type { StudyPath } from '../desk/desk.ts';
import { pathText } from '../desk/study-path.ts';

export interface EditableTextProps {
  readonly path: StudyPath;
  /** what the text is, for those who do not see its sentence */
  readonly label: string;
  /** the text as it stands in the sentence */
  readonly shown: string;
  /** the text to edit, which reads back as what stands; as shown where undefined */
  readonly exact?: string;
  /** stands in the field while it is empty */
  readonly placeholder?: string;
  /** takes a changed text, or tells in words why not */
  readonly take: (text: string) => string | undefined;
  /** complaints about the text as it stands */
  readonly complaints: readonly string[];
}

/** Width of an empty field, characters. */
const LEAST_SIZE = 3;

/** What is wrong, in words beside the field. */
export function Complaint({
  id,
  texts,
  alert,
}: {
  id: string;
  texts: readonly string[];
  alert: boolean;
}): VNode {
  return (
    <span class="complaint" id={id} {...(alert ? { role: 'alert' } : {})}>
      {texts.join('; ')}
    </span>
  );
}

/** A field as wide as its text, in the line of the sentence. */
export function EditableText(props: EditableTextProps): VNode {
  const { path, label, shown, exact = shown, placeholder, take, complaints } = props;
  const id = useId();
  const [typed, setTyped] = useState<string | undefined>(undefined);
  const [refusal, setRefusal] = useState<string | undefined>(undefined);
  const [focused, setFocused] = useState(false);
  const standing = focused ? exact : shown;
  const text = typed ?? standing;
  const told = refusal === undefined ? complaints : [refusal];
  const commit = (): void => {
    if (typed === undefined) return;
    const refused = typed.trim() === exact ? undefined : take(typed.trim());
    setRefusal(refused);
    if (refused === undefined) setTyped(undefined);
  };
  const keyed = (event: TargetedKeyboardEvent<HTMLInputElement>): void => {
    if (event.key === 'Enter') {
      event.preventDefault();
      commit();
    } else if (event.key === 'Escape' && typed !== undefined) {
      event.stopPropagation();
      setTyped(undefined);
      setRefusal(undefined);
    }
  };
  return (
    <span class="field">
      <input
        class="in"
        type="text"
        size={Math.max(LEAST_SIZE, text.length)}
        value={text}
        data-input={pathText(path)}
        aria-label={label}
        autocomplete="off"
        spellcheck={false}
        {...(told.length > 0 ? { 'aria-invalid': true, 'aria-describedby': id } : {})}
        placeholder={placeholder}
        onFocus={(event) => {
          setFocused(true);
          if (typed !== undefined || exact === shown) return;
          /* selected here, because the text that comes with the next drawing would take the selection away */
          event.currentTarget.value = exact;
          event.currentTarget.select();
        }}
        onInput={(event) => {
          setTyped(event.currentTarget.value);
          setRefusal(undefined);
        }}
        onKeyDown={keyed}
        onBlur={() => {
          setFocused(false);
          commit();
        }}
      />
      {told.length > 0 && <Complaint id={id} texts={told} alert={refusal !== undefined} />}
    </span>
  );
}
