// One season of the draft as fields in its sentence.
import type { ComponentChildren, VNode } from 'preact';
import type { Desk, StudyPath } from '../desk/desk.ts';
import { memberOf, rawText } from '../desk/json.ts';
import { listWithout, type SeasonKind, seasonKindOf, seasonOfKind } from '../desk/study-edits.ts';
import { Select } from '../field/choice.tsx';
import { QuantityInput, TextInput } from '../field/inputs.tsx';
import { WordButton } from '../field/word-button.tsx';
import { LayerFields } from './layer-fields.tsx';
import { Say } from './parts.tsx';

const KINDS: readonly { readonly value: SeasonKind; readonly text: string }[] = [
  { value: 'top', text: 'its top dried or frozen' },
  { value: 'below', text: 'wet from some depth on' },
  { value: 'both', text: 'its top dried or frozen, and wet from some depth on' },
  { value: 'layers', text: 'layers of its own' },
];

function kindOf(value: unknown): SeasonKind {
  return KINDS.find((kind) => kind.value === value)?.value ?? 'top';
}

function Change({ path, part, name }: { path: StudyPath; part: 'top' | 'below'; name: string }): VNode {
  const at = [...path, part];
  return (
    <>
      {part === 'top' ? '; down to ' : '; below '}
      <QuantityInput
        path={[...at, 'depth_m']}
        kind="length"
        label={`depth ${part === 'top' ? 'to which the top changes' : 'from which the ground is wet'} in ${name}`}
      />{' '}
      it has{' '}
      <QuantityInput
        path={[...at, 'resistivity_ohm_m']}
        kind="resistivity"
        label={`resistivity ${part === 'top' ? 'of the top' : 'below'} in ${name}`}
      />
    </>
  );
}

export interface SeasonFieldsProps {
  readonly desk: Desk;
  readonly index: number;
  /** what was solved of it */
  readonly children?: ComponentChildren;
}

/** Name, kind, and what changes. */
export function SeasonFields({ desk, index, children }: SeasonFieldsProps): VNode {
  const path: StudyPath = ['seasons', index];
  const season = desk.valueAt(path);
  const kind = seasonKindOf(season);
  const name = rawText(memberOf(season, 'name')) || `season ${index + 1}`;
  const soil = desk.valueAt(['soil', 'layers']);
  return (
    <Say>
      <span class="case-name">
        <TextInput path={[...path, 'name']} label={`name of season ${index + 1}`} value={name} />
      </span>
      : the soil with{' '}
      <Select
        label={`what ${name} changes`}
        options={KINDS}
        value={kind}
        choose={(chosen) => desk.edit(path, seasonOfKind(season, kindOf(chosen), soil))}
        complaints={desk.complaints(path)}
      />
      {(kind === 'top' || kind === 'both') && <Change path={path} part="top" name={name} />}
      {(kind === 'below' || kind === 'both') && <Change path={path} part="below" name={name} />}.{' '}
      {kind === 'layers' && <LayerFields desk={desk} path={[...path, 'layers']} of={` in ${name}`} />}{' '}
      {children}
      <span class="edits">
        <WordButton
          press={() => desk.edit(['seasons'], listWithout(desk.valueAt(['seasons']), index))}
          of={name}
          vanishes
        >
          remove the season
        </WordButton>
      </span>
    </Say>
  );
}
