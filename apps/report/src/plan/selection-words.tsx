// What is chosen, in words: moved by typed distances, copied, deleted, made of something else.
import type { DisplayUnits, RowOrigin } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useState } from 'preact/hooks';
import { conductorsAt } from '../desk/conductor-edits.ts';
import type { Draft } from '../desk/draft.ts';
import { conductorsWords } from '../desk/labels.ts';
import { MaterialChoice } from './making-words.tsx';
import { copied, deleted, laidAt, moved, type PlanEdit, remade } from './plan-edits.ts';
import { QuantityField } from './quantity-field.tsx';
import { Word } from './word.tsx';

export interface SelectionWordsProps {
  readonly draft: Draft;
  readonly selected: readonly RowOrigin[];
  readonly units: DisplayUnits;
  readonly edit: (edit: PlanEdit) => void;
}

/** The value that all have; undefined where they differ. */
function common<T>(values: readonly T[]): T | undefined {
  const [first] = values;
  return values.every((value) => value === first) ? first : undefined;
}

export function SelectionWords({ draft, selected, units, edit }: SelectionWordsProps): VNode {
  const conductors = conductorsAt(draft, selected);
  const [east, setEast] = useState(0);
  const [north, setNorth] = useState(0);
  const shift = { dx: east, dy: north };
  const still = east === 0 && north === 0;
  return (
    <>
      <p class="plan-words">
        <span>{conductorsWords(conductors)} chosen</span>
        <QuantityField
          label="depth"
          kind="length"
          value={common(conductors.map(({ depth1 }) => depth1))}
          units={units}
          take={(depth) => edit(laidAt(draft, selected, depth))}
        />
        <QuantityField
          label="diameter"
          kind="diameter"
          value={common(conductors.map(({ diameter }) => diameter))}
          units={units}
          take={(diameter) => edit(remade(draft, selected, { diameter }))}
        />
        <MaterialChoice
          value={common(conductors.map(({ material }) => material)) ?? ''}
          take={(material) => edit(remade(draft, selected, { material }))}
        />
        <Word press={() => edit(deleted(draft, selected))}>delete</Word>
      </p>
      <p class="plan-words">
        <QuantityField label="east" kind="coordinate" value={east} units={units} take={setEast} />
        <QuantityField label="north" kind="coordinate" value={north} units={units} take={setNorth} />
        <Word press={() => edit(moved(draft, selected, shift, units))} off={still}>
          move so far
        </Word>
        <Word press={() => edit(copied(draft, selected, shift))} off={still}>
          copy so far
        </Word>
      </p>
    </>
  );
}
