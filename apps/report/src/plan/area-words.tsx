// The areas in words: which are there, and of the one in hand every corner as coordinates to be edited or pasted.
import type { DisplayUnits, Outcome } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useState } from 'preact/hooks';
import type { Draft } from '../desk/draft.ts';
import {
  type AreaEdit,
  areaGiven,
  areaRemoved,
  cornerRemoved,
  cornerSet,
  cornersPasted,
} from './area-edits.ts';
import {
  AREA_KINDS,
  type AreaRef,
  areaWords,
  edgeMiddles,
  type PlanArea,
  supposedArea,
} from './plan-areas.ts';
import { QuantityField } from './quantity-field.tsx';
import { Word } from './word.tsx';

export interface AreaWordsProps {
  readonly outcome: Outcome;
  readonly draft: Draft;
  readonly units: DisplayUnits;
  readonly areas: readonly PlanArea[];
  readonly inHand: PlanArea | undefined;
  readonly takeUp: (area: AreaRef | undefined) => void;
  readonly edit: (edit: AreaEdit) => void;
}

export function AreaWords(props: AreaWordsProps): VNode {
  const { outcome, draft, areas, inHand, takeUp, edit } = props;
  const absent = AREA_KINDS.filter((kind) => !areas.some((area) => area.kind === kind));
  return (
    <>
      <p class="plan-words">
        <span class="soft">corners of</span>
        {areas.map((area) => {
          const held = area === inHand;
          return (
            <Word key={area.name} held={held} press={() => takeUp(held ? undefined : area)}>
              {area.name}
            </Word>
          );
        })}
        {absent.map((kind) => {
          const polygons = supposedArea(outcome, kind);
          if (polygons.length === 0) return null;
          const give = (): void => {
            edit(areaGiven(draft, kind, polygons));
            takeUp({ kind, polygon: 0 });
          };
          return <Word key={kind} press={give}>{`${areaWords(kind)}, as supposed`}</Word>;
        })}
      </p>
      {inHand !== undefined && <Corners {...props} area={inHand} />}
    </>
  );
}

function Corners(props: AreaWordsProps & { readonly area: PlanArea }): VNode {
  const { draft, units, area, takeUp, edit } = props;
  const [complaints, setComplaints] = useState<readonly string[]>([]);
  const middles = edgeMiddles(area.corners);
  const paste = (text: string): void => {
    const pasted = cornersPasted(draft, area, text, units);
    if ('complaints' in pasted) setComplaints(pasted.complaints);
    else {
      setComplaints([]);
      edit(pasted);
    }
  };
  const last = area.corners.length - 1;
  return (
    // biome-ignore lint/a11y/useSemanticElements: a fieldset cannot be set in columns in every browser
    <div class="area-corners" role="group" aria-label={`Corners of the ${area.name}`}>
      <ol>
        {area.corners.map(([x, y], k) => {
          const set = (to: readonly [number, number]): void =>
            edit(cornerSet(draft, area, { corner: k, fresh: false }, to, units));
          const name = `corner ${k + 1}`;
          return (
            <li key={k} class="plan-words">
              <QuantityField
                label={`${name} east`}
                kind="coordinate"
                value={x}
                units={units}
                take={(east) => set([east, y])}
              />
              <QuantityField
                label="north"
                of={name}
                kind="coordinate"
                value={y}
                units={units}
                take={(north) => set([x, north])}
              />
              <Word
                of={`after ${name}`}
                press={() =>
                  edit(
                    cornerSet(
                      draft,
                      area,
                      { corner: k + 1, fresh: true },
                      middles[k === last ? 0 : k + 1]!,
                      units,
                    ),
                  )
                }
              >
                add one
              </Word>
              <Word of={name} press={() => edit(cornerRemoved(draft, area, k))}>
                remove
              </Word>
            </li>
          );
        })}
      </ol>
      <p class="plan-words">
        <Word
          press={() => {
            takeUp(undefined);
            edit(areaRemoved(draft, area));
          }}
        >{`remove the ${area.name}`}</Word>
        <Word press={() => takeUp(undefined)}>done with its corners</Word>
        <label class="plan-field">
          paste corners{' '}
          <textarea
            class="in"
            rows={1}
            value=""
            spellcheck={false}
            onPaste={(event) => {
              event.preventDefault();
              paste(event.clipboardData?.getData('text/plain') ?? '');
            }}
          />
        </label>
      </p>
      {complaints.length > 0 && (
        <ul class="input-faults" role="alert">
          {complaints.map((line) => (
            <li key={line}>{line}</li>
          ))}
        </ul>
      )}
    </div>
  );
}
