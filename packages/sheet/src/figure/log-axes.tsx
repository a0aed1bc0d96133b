// Draws a pair of logarithmic axes with their gridlines.
import type { VNode } from 'preact';
import { given } from '../format/number.ts';
import type { Box } from '../geometry/box.ts';
import { type LogTick, logTicks } from '../geometry/log-axis.ts';
import { px } from './path.ts';

export interface LogAxesProps {
  readonly frame: Box;
  readonly across: readonly [number, number];
  readonly up: readonly [number, number];
  readonly x: (value: number) => number;
  readonly y: (value: number) => number;
  /** in which values to the right are round; 1 for that of `across` */
  readonly acrossUnit?: number;
  /** what runs to the right, with its unit */
  readonly acrossName: string;
  /** what runs upward, with its unit */
  readonly upName: string;
}

function gridClass(tick: LogTick): string {
  return tick.lettered ? 'gridline' : 'gridline minor';
}

/** Gridlines at 1 to 9 of each decade, numbers at the round ones, names of both axes. */
export function LogAxes(props: LogAxesProps): VNode {
  const { frame, across, up, x, y, acrossUnit = 1, acrossName, upName } = props;
  const acrossTicks = logTicks(across[0] / acrossUnit, across[1] / acrossUnit);
  return (
    <g>
      {logTicks(up[0], up[1]).map((tick) => (
        <line
          key={tick.value}
          class={gridClass(tick)}
          x1={px(frame.left)}
          x2={px(frame.right)}
          y1={px(y(tick.value))}
          y2={px(y(tick.value))}
        />
      ))}
      {acrossTicks.map((tick) => (
        <line
          key={tick.value}
          class={gridClass(tick)}
          x1={px(x(tick.value * acrossUnit))}
          x2={px(x(tick.value * acrossUnit))}
          y1={px(frame.top)}
          y2={px(frame.bottom)}
        />
      ))}
      {logTicks(up[0], up[1])
        .filter((tick) => tick.lettered)
        .map(({ value }) => (
          <text key={value} class="soft end" x={px(frame.left - 8)} y={px(y(value))} dy="0.35em">
            {given(value)}
          </text>
        ))}
      {acrossTicks
        .filter((tick) => tick.lettered)
        .map(({ value }) => (
          <text
            key={value}
            class="soft mid"
            x={px(x(value * acrossUnit))}
            y={px(frame.bottom + 9)}
            dy="0.85em"
          >
            {given(value)}
          </text>
        ))}
      <text class="soft" x="2" y={px(frame.top - 12)}>
        {upName}
      </text>
      <text class="soft" x={px(frame.left)} y={px(frame.bottom + 54)}>
        {acrossName}
      </text>
    </g>
  );
}
