// Inputs in a sentence: marked text where the sheet is frozen, fields where it is alive.
import type { JsonValue } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useId } from 'preact/hooks';
import type { Desk, QuantityKind, StudyPath } from '../desk/desk.ts';
import { rawText } from '../desk/json.ts';
import { put } from '../desk/put.ts';
import { pathText } from '../desk/study-path.ts';
import { useDesk } from '../desk/use-desk.ts';
import { useUnits } from '../desk/use-units.ts';
import { quantityText } from '../format/quantity-text.ts';
import { Complaint, EditableText } from './editable-text.tsx';

/** An input that is shown but not edited where it stands, such as what the conductor tables tell. */
export function Stated({
  path,
  value,
  text,
}: {
  path: StudyPath;
  value?: string | number;
  text: string;
}): VNode {
  return (
    <data class="in" value={String(value ?? text)} data-input={pathText(path)}>
      {text}
    </data>
  );
}

interface FieldProps {
  /** place in study.json */
  readonly path: StudyPath;
  /** what it is, for those who do not see its sentence: `resistivity of layer 1` */
  readonly label: string;
  /** an emptied field removes the value; otherwise it is refused */
  readonly optional?: boolean;
}

export interface QuantityInputProps extends FieldProps {
  readonly kind: QuantityKind;
  /** in SI, as the results were computed with; a live sheet shows the draft's */
  readonly value?: number | undefined;
}

function takeQuantity(
  desk: Desk,
  { path, kind, optional }: QuantityInputProps,
  text: string,
): string | undefined {
  if (text === '' && optional === true) {
    put(desk, path, undefined);
    return undefined;
  }
  const read = desk.read(kind, text);
  if ('complaint' in read) return read.complaint;
  if (read.value !== desk.valueAt(path)) put(desk, path, read.value);
  return undefined;
}

/** A number with its unit. */
export function QuantityInput(props: QuantityInputProps): VNode {
  const { path, kind, label, value } = props;
  const desk = useDesk();
  const units = useUnits();
  if (desk === undefined)
    return (
      <Stated
        path={path}
        text={value === undefined ? '' : quantityText(kind, value, units)}
        value={value ?? ''}
      />
    );
  const draft = desk.valueAt(path);
  return (
    <EditableText
      path={path}
      label={label}
      shown={typeof draft === 'number' ? desk.show(kind, draft) : rawText(draft)}
      take={(text) => takeQuantity(desk, props, text)}
      complaints={desk.complaints(path)}
    />
  );
}

/** A name or another line of text; a frozen sheet shows the value alone. */
export function TextInput({
  path,
  label,
  value = '',
  optional,
}: FieldProps & { readonly value?: string }): VNode {
  const desk = useDesk();
  if (desk === undefined) return <>{value}</>;
  const take = (text: string): string | undefined => {
    if (text === '' && optional !== true) return `${label}: at least one visible character is expected`;
    put(desk, path, text === '' ? undefined : text);
    return undefined;
  };
  return (
    <EditableText
      path={path}
      label={label}
      shown={rawText(desk.valueAt(path))}
      take={take}
      complaints={desk.complaints(path)}
    />
  );
}

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
      choose={(chosen) => put(desk, path, chosen)}
      complaints={desk.complaints(path)}
    />
  );
}
