// One of a few values in a sentence: marked text where the sheet is frozen, text that opens a list where it is alive.
import type { JsonValue } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useId } from 'preact/hooks';
import type { StudyPath } from '../desk/desk.ts';
import { rawText } from '../desk/json.ts';
import { pathText } from '../desk/study-path.ts';
import { useDesk } from '../desk/use-desk.ts';
import { Complaint } from './editable-text.tsx';
import { Stated } from './inputs.tsx';

export interface Option {
  readonly value: JsonValue;
  readonly text: string;
}

/** One of a few values, set as text that opens a list. */
export function Select({
  label,
  options,
  value,
  choose,
  path,
  complaints = [],
}: {
  label: string;
  options: readonly Option[];
  value: JsonValue | undefined;
  choose: (value: JsonValue) => void;
  path?: StudyPath;
  complaints?: readonly string[];
}): VNode {
  const id = useId();
  const known = options.findIndex((option) => option.value === value);
  const wrong = complaints.length > 0 ? { 'aria-invalid': true, 'aria-describedby': id } : {};
  return (
    <span class="field">
      <select
        class="in"
        aria-label={label}
        value={String(known)}
        {...(path === undefined ? {} : { 'data-input': pathText(path) })}
        {...wrong}
        onChange={(event) => {
          const chosen = options[Number(event.currentTarget.value)];
          if (chosen !== undefined) choose(chosen.value);
        }}
      >
        {known < 0 && <option value="-1">{rawText(value) === '' ? 'choose' : rawText(value)}</option>}
        {options.map(({ text }, k) => (
          <option key={text} value={String(k)}>
            {text}
          </option>
        ))}
      </select>
      {complaints.length > 0 && <Complaint id={id} texts={complaints} alert={false} />}
    </span>
  );
}

/** A value of study.json out of a few. `value` is the one in force where the study has none. */
export function ChoiceInput({
  path,
  label,
  value,
  options,
}: {
  path: StudyPath;
  label: string;
  value: JsonValue | undefined;
  options: readonly Option[];
}): VNode {
  const desk = useDesk();
  if (desk === undefined) {
    const text = options.find((option) => option.value === value)?.text ?? rawText(value);
    return <Stated path={path} text={text} value={rawText(value)} />;
  }
  return (
    <Select
      path={path}
      label={label}
      options={options}
      value={desk.valueAt(path) ?? value}
      choose={(chosen) => desk.edit(path, chosen)}
      complaints={desk.complaints(path)}
    />
  );
}
