// One fault case of the draft as fields in its sentence.
import type { CaseResult, JsonValue } from '@ohmstead/study';
import type { ComponentChildren, VNode } from 'preact';
import type { Desk, StudyPath } from '../desk/desk.ts';
import { memberOf, rawText } from '../desk/json.ts';
import { type CurrentSource, caseWithSource, currentSourceOf } from '../desk/study-edits.ts';
import { useUnits } from '../desk/use-units.ts';
import { Select } from '../field/choice.tsx';
import { QuantityInput, TextInput } from '../field/inputs.tsx';
import { WordButton } from '../field/word-button.tsx';
import { givenPlace } from '../format/length.ts';
import { significant } from '../format/number.ts';

export interface CaseFieldsProps {
  readonly desk: Desk;
  readonly index: number;
  /** as solved last; undefined where it has not been solved */
  readonly solved: CaseResult | undefined;
  /** what follows the inputs of the current: the result and how it is found */
  readonly children?: ComponentChildren;
}

const SOURCES: readonly { readonly value: CurrentSource; readonly text: string }[] = [
  { value: 'fault', text: 'a fault of' },
  { value: 'grid', text: 'a current into the ground, as given, of' },
];

interface FieldsProps {
  readonly path: StudyPath;
  readonly name: string;
}

function Current({ path, name, source }: FieldsProps & { readonly source: CurrentSource }): VNode {
  const amperes = source === 'fault' ? 'fault_current_A' : 'grid_current_A';
  return (
    <>
      <QuantityInput
        path={[...path, amperes]}
        kind="current"
        label={`${source === 'fault' ? 'fault current' : 'current into the ground'} of ${name}`}
      />{' '}
      for <QuantityInput path={[...path, 'duration_s']} kind="duration" label={`duration of ${name}`} />
      {source === 'fault' && (
        <>
          , of which the share{' '}
          <QuantityInput
            path={[...path, 'division_factor']}
            kind="ratio"
            label={`division factor of ${name}`}
          />{' '}
          enters the ground here
        </>
      )}
    </>
  );
}

function Offset({
  path,
  name,
  solved,
  none,
}: FieldsProps & Pick<CaseFieldsProps, 'solved'> & { none: boolean }): VNode {
  return (
    <>
      ; with <i>X/R</i> of{' '}
      <QuantityInput path={[...path, 'x_over_r']} kind="ratio" label={`X/R of ${name}`} optional /> at{' '}
      <QuantityInput
        path={[...path, 'frequency_hz']}
        kind="frequency"
        label={`frequency of ${name}`}
        optional
      />{' '}
      the direct-current offset{' '}
      {none
        ? 'is left out, as no X/R is given'
        : `raises it${solved === undefined ? '' : ` by the factor ${significant(solved.decrement_factor, 4)}`}`}
    </>
  );
}

function Injection({
  desk,
  path,
  name,
  solved,
}: FieldsProps & Pick<CaseFieldsProps, 'desk' | 'solved'>): VNode {
  const units = useUnits();
  const place: StudyPath = [...path, 'inject'];
  if (desk.valueAt(place) === undefined) {
    const now = solved?.inject;
    return (
      <>
        It enters at the node nearest the centroid of the metal
        {now !== undefined && `, ${givenPlace(now.x_m, now.y_m, units)}`}.
      </>
    );
  }
  return (
    <>
      It enters the metal at <i>x</i>{' '}
      <QuantityInput path={[...place, 'x_m']} kind="coordinate" label={`x where ${name} enters`} />, <i>y</i>{' '}
      <QuantityInput path={[...place, 'y_m']} kind="coordinate" label={`y where ${name} enters`} />, at a
      depth of{' '}
      <QuantityInput path={[...place, 'depth_m']} kind="length" label={`depth where ${name} enters`} />.
    </>
  );
}

/** Where the current enters: given, or left to the middle of the metal. */
export function InjectionChoice({ desk, index, solved }: Omit<CaseFieldsProps, 'children'>): VNode {
  const path: StudyPath = ['cases', index, 'inject'];
  if (desk.valueAt(path) !== undefined) {
    return (
      <WordButton press={() => desk.edit(path, undefined)}>let the current enter at the middle</WordButton>
    );
  }
  const now = solved?.inject;
  /* the node in use, so that giving the place changes nothing yet */
  const begin: JsonValue = now === undefined ? {} : { x_m: now.x_m, y_m: now.y_m, depth_m: now.depth_m };
  return <WordButton press={() => desk.edit(path, begin)}>say where the current enters</WordButton>;
}

/** Name, current, offset and place of injection. */
export function CaseFields({ desk, index, solved, children }: CaseFieldsProps): VNode {
  const path: StudyPath = ['cases', index];
  const stated = desk.valueAt(path);
  const source = currentSourceOf(stated);
  const name = rawText(memberOf(stated, 'name')) || `case ${index + 1}`;
  return (
    <>
      <span class="case-name">
        <TextInput path={[...path, 'name']} label={`name of case ${index + 1}`} value={name} />
      </span>
      :{' '}
      <Select
        label={`how the current of ${name} is stated`}
        options={SOURCES}
        value={source}
        choose={(chosen) => desk.edit(path, caseWithSource(stated, chosen === 'grid' ? 'grid' : 'fault'))}
        complaints={desk.complaints(path)}
      />{' '}
      <Current path={path} name={name} source={source} />
      <Offset path={path} name={name} solved={solved} none={memberOf(stated, 'x_over_r') === undefined} />
      {children} <Injection desk={desk} path={path} name={name} solved={solved} />
    </>
  );
}
