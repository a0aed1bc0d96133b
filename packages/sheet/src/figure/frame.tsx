// The outer shape of every figure: root element with title and description, axes, scale bar.
import type { ComponentChildren, VNode } from 'preact';
import { useUnits } from '../desk/use-units.ts';
import { lengthUnit } from '../format/length.ts';
import { fixed, THIN_SPACE } from '../format/number.ts';
import type { Plate } from '../geometry/plate.ts';
import { roundLength, ticksIn } from '../geometry/ticks.ts';
import { Path } from './drawn.tsx';
import { px } from './path.ts';

export interface FigureProps {
  /** unique on the page; identifiers inside the figure begin with it */
  readonly name: string;
  readonly title: string;
  readonly description: string;
  readonly width: number;
  readonly height: number;
  /** full width of the sheet, or one of several side by side */
  readonly wide: boolean;
  /** rules written into the file, where the figure stands alone */
  readonly css?: string | undefined;
  readonly children?: ComponentChildren;
}

/** Root of a figure; read out as one picture with its title and description. */
export function Figure(props: FigureProps): VNode {
  const { name, title, description, width, height, wide, css, children } = props;
  return (
    <svg
      xmlns="http://www.w3.org/2000/svg"
      class={wide ? 'fig wide' : 'fig'}
      viewBox={`0 0 ${px(width)} ${px(height)}`}
      role="img"
      aria-labelledby={`${name}-title ${name}-desc`}
      {...(css === undefined ? {} : { width: px(width), height: px(height) })}
    >
      <title id={`${name}-title`}>{title}</title>
      <desc id={`${name}-desc`}>{description}</desc>
      {css !== undefined && <style>{css}</style>}
      {css !== undefined && <rect width={px(width)} height={px(height)} fill="#fbfaf6" />}
      {children}
    </svg>
  );
}

/** About so many ticks along the longer axis. */
const TICKS = 8;

/** Ticks at round lengths along the lower and the left side of the ground; `drawn` adds the axes themselves. */
export function PlanAxes({ plate, drawn = false }: { plate: Plate; drawn?: boolean }): VNode {
  const { frame, extent } = plate;
  const { metres, sign } = lengthUnit(useUnits());
  const [left, right] = extent.x.map((x) => x / metres);
  const [low, high] = extent.y.map((y) => y / metres);
  const xs = ticksIn(left, right, TICKS);
  const step = xs.length > 1 ? xs[1] - xs[0] : 1;
  const ys = ticksIn(low, high, Math.max(2, (high - low) / step));
  /* the unit stands at the last tick of each axis */
  const text = (value: number, last: number): string =>
    `${fixed(value, step < 1 ? 1 : 0)}${value === last ? THIN_SPACE + sign : ''}`;
  return (
    <g>
      {drawn && (
        <Path class="axis" d={`M${px(frame.left)},${px(frame.top)}V${px(frame.bottom)}H${px(frame.right)}`} />
      )}
      {xs.map((x) => (
        <g key={x}>
          <line
            class="tick"
            x1={px(plate.x(x * metres))}
            x2={px(plate.x(x * metres))}
            y1={px(frame.bottom)}
            y2={px(frame.bottom + 5)}
          />
          <text class="soft mid" x={px(plate.x(x * metres))} y={px(frame.bottom + 8)} dy="0.85em">
            {text(x, xs[xs.length - 1])}
          </text>
        </g>
      ))}
      {ys.map((y) => (
        <g key={y}>
          <line
            class="tick"
            x1={px(frame.left - 5)}
            x2={px(frame.left)}
            y1={px(plate.y(y * metres))}
            y2={px(plate.y(y * metres))}
          />
          <text class="soft end" x={px(frame.left - 8)} y={px(plate.y(y * metres))} dy="0.35em">
            {text(y, ys[ys.length - 1])}
          </text>
        </g>
      ))}
    </g>
  );
}

/** A bar of round length, its right end at the given place. */
export function ScaleBar({ plate, x, y, most }: { plate: Plate; x: number; y: number; most: number }): VNode {
  const { metres, sign } = lengthUnit(useUnits());
  const round = roundLength(most / plate.scale / metres);
  const length = round * metres * plate.scale;
  return (
    <g>
      <Path class="line" d={`M${px(x - length)},${px(y - 4)}v4h${px(length)}v-4`} />
      <text class="end" x={px(x - length - 6)} y={px(y)}>
        {fixed(round, round < 1 ? 1 : 0) + THIN_SPACE + sign}
      </text>
    </g>
  );
}
