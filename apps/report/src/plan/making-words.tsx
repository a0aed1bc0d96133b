// What the next conductor is made of, in a line of fields that go with the tool in hand.
import { conductorMaterials } from '@ohmstead/core';
import type { DisplayUnits } from '@ohmstead/study';
import type { VNode } from 'preact';
import type { Making } from './plan-edits.ts';
import { QuantityField } from './quantity-field.tsx';
import type { Tool } from './tool-state.ts';

export interface MakingWordsProps {
  readonly tool: Tool;
  readonly making: Making;
  readonly change: (making: Making) => void;
  readonly units: DisplayUnits;
}

export function MakingWords({ tool, making, change, units }: MakingWordsProps): VNode | null {
  if (tool !== 'conductor' && tool !== 'rod' && tool !== 'mesh') return null;
  const set = (part: Partial<Making>): void => change({ ...making, ...part });
  return (
    <p class="plan-words">
      <QuantityField
        label={tool === 'rod' ? 'top at' : 'depth'}
        kind="length"
        value={making.depth}
        units={units}
        take={(depth) => set({ depth })}
      />
      {tool === 'rod' && (
        <QuantityField
          label="rod length"
          kind="length"
          value={making.rodLength}
          units={units}
          take={(rodLength) => set({ rodLength })}
        />
      )}
      <QuantityField
        label="diameter"
        kind="diameter"
        value={making.diameter}
        units={units}
        take={(diameter) => set({ diameter })}
      />
      <MaterialChoice value={making.material ?? ''} take={(material) => set({ material })} />
      {tool === 'mesh' && (
        <>
          <Count label="meshes east" value={making.nx} take={(nx) => set({ nx })} />
          <Count label="meshes north" value={making.ny} take={(ny) => set({ ny })} />
        </>
      )}
    </p>
  );
}

export interface MaterialChoiceProps {
  /** empty where several are mixed or none is given */
  readonly value: string;
  readonly take: (material: string | undefined) => void;
}

export function MaterialChoice({ value, take }: MaterialChoiceProps): VNode {
  return (
    <label class="plan-field">
      material{' '}
      <select
        class="in"
        value={value}
        onChange={(event) => take(event.currentTarget.value === '' ? undefined : event.currentTarget.value)}
      >
        <option value="">not given</option>
        {[...conductorMaterials.values()].map(({ name, label }) => (
          <option key={name} value={name}>
            {label}
          </option>
        ))}
      </select>
    </label>
  );
}

/** Most meshes each way. Reason: more are drawn in a file. */
const MOST_MESHES = 200;

function Count(props: {
  readonly label: string;
  readonly value: number;
  readonly take: (n: number) => void;
}): VNode {
  return (
    <label class="plan-field">
      {props.label}{' '}
      <input
        class="in"
        type="number"
        min={1}
        max={MOST_MESHES}
        step={1}
        value={props.value}
        onChange={(event) => {
          const n = event.currentTarget.valueAsNumber;
          if (Number.isInteger(n) && n >= 1 && n <= MOST_MESHES) props.take(n);
          else event.currentTarget.value = String(props.value);
        }}
      />
    </label>
  );
}
