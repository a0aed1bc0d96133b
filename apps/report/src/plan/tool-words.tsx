// What the plan shows and what is in hand, as words in a line.
import type { DisplayUnits, Outcome } from '@ohmstead/study';
import type { VNode } from 'preact';
import { QuantityField } from './quantity-field.tsx';
import { SHOWN, type Shown } from './shown.ts';
import { TOOLS, type Tool } from './tool-state.ts';
import { Word } from './word.tsx';

const ENLARGED = 1.5;

export interface ToolWordsProps {
  readonly outcome: Outcome;
  readonly shown: Shown;
  readonly show: (shown: Shown) => void;
  readonly caseIndex: number;
  readonly setCase: (index: number) => void;
  readonly tool: Tool;
  readonly setTool: (tool: Tool) => void;
  readonly zoom: (factor: number) => void;
  readonly whole: () => void;
  readonly all: () => void;
  readonly gridStep: number;
  readonly setGridStep: (step: number) => void;
  readonly units: DisplayUnits;
}

export function ToolWords(props: ToolWordsProps): VNode {
  const { outcome, shown, caseIndex, tool, units } = props;
  return (
    <>
      <p class="plan-words">
        <span class="soft">show</span>{' '}
        {SHOWN.map((one) => (
          <Word key={one} press={() => props.show(one)} held={one === shown}>
            {one}
          </Word>
        ))}
        <label class="plan-field">
          of{' '}
          <select
            class="in"
            value={String(caseIndex)}
            onChange={(event) => props.setCase(Number(event.currentTarget.value))}
          >
            {outcome.results.cases.map(({ name }, k) => (
              <option key={name} value={String(k)}>
                {name}
              </option>
            ))}
          </select>
        </label>
        <Word press={() => props.zoom(ENLARGED)}>larger</Word>
        <Word press={() => props.zoom(1 / ENLARGED)}>smaller</Word>
        <Word press={props.whole}>whole plan</Word>
      </p>
      <p class="plan-words">
        <span class="soft">in hand</span>{' '}
        {TOOLS.map((one) => (
          <Word key={one} press={() => props.setTool(one)} held={one === tool}>
            {one}
          </Word>
        ))}
        <Word press={props.all}>choose all</Word>
        <QuantityField
          label="on a grid of"
          kind="length"
          value={props.gridStep}
          units={units}
          take={props.setGridStep}
        />
      </p>
    </>
  );
}
