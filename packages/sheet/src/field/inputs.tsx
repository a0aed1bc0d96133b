// Inputs in a sentence: marked text where the sheet is frozen, fields where it is alive.
import type { VNode } from 'preact';
import type { Desk, QuantityKind, StudyPath } from '../desk/desk.ts';
import { rawText } from '../desk/json.ts';
import { pathText } from '../desk/study-path.ts';
import { useDesk } from '../desk/use-desk.ts';
import { useUnits } from '../desk/use-units.ts';
import { quantityText } from '../format/quantity-text.ts';
import { EditableText } from './editable-text.tsx';

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
    desk.edit(path, undefined);
    return undefined;
  }
  const read = desk.read(kind, text);
  if ('complaint' in read) return read.complaint;
  if (read.value !== desk.valueAt(path)) desk.edit(path, read.value);
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
      shown={typeof draft === 'number' ? quantityText(kind, draft, units) : rawText(draft)}
      {...(typeof draft === 'number' ? { exact: desk.show(kind, draft) } : {})}
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
  placeholder,
}: FieldProps & { readonly value?: string; readonly placeholder?: string }): VNode {
  const desk = useDesk();
  if (desk === undefined) return <>{value}</>;
  const take = (text: string): string | undefined => {
    if (text === '' && optional !== true) return `${label}: at least one visible character is expected`;
    desk.edit(path, text === '' ? undefined : text);
    return undefined;
  };
  return (
    <EditableText
      path={path}
      label={label}
      shown={rawText(desk.valueAt(path))}
      {...(placeholder === undefined ? {} : { placeholder })}
      take={take}
      complaints={desk.complaints(path)}
    />
  );
}
