// The outer shape of every figure: root element with title and description, axes, scale bar.
import type { ComponentChildren, VNode } from 'preact';
import { fixed } from '../format/number.ts';
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

/** Ticks in metres along the lower and the left side of the ground; `drawn` adds the axes themselves. */
export function PlanAxes({ plate, drawn = false }: { plate: Plate; drawn?: boolean }): VNode {
  const { frame, extent } = plate;
  const xs = ticksIn(extent.x[0], extent.x[1], TICKS);
  const step = xs.length > 1 ? xs[1] - xs[0] : 1;
  const ys = ticksIn(extent.y[0], extent.y[1], Math.max(2, (extent.y[1] - extent.y[0]) / step));
  /* the unit stands at the last tick of each axis */
  const text = (value: number, last: number): string =>
    `${fixed(value, step < 1 ? 1 : 0)}${value === last ? '\u202fm' : ''}`;
  return (
    <g>
      {drawn && (
        <Path class="axis" d={`M${px(frame.left)},${px(frame.top)}V${px(frame.bottom)}H${px(frame.right)}`} />
      )}
      {xs.map((x) => (
        <g key={x}>
          <line
            class="tick"
            x1={px(plate.x(x))}
            x2={px(plate.x(x))}
            y1={px(frame.bottom)}
            y2={px(frame.bottom + 5)}
          />
          <text class="soft mid" x={px(plate.x(x))} y={px(frame.bottom + 8)} dy="0.85em">
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
            y1={px(plate.y(y))}
            y2={px(plate.y(y))}
          />
          <text class="soft end" x={px(frame.left - 8)} y={px(plate.y(y))} dy="0.35em">
            {text(y, ys[ys.length - 1])}
          </text>
        </g>
      ))}
    </g>
  );
}

/** A bar of round length with its metres, its right end at the given place. */
export function ScaleBar({ plate, x, y, most }: { plate: Plate; x: number; y: number; most: number }): VNode {
  const metres = roundLength(most / plate.scale);
  const length = metres * plate.scale;
  return (
    <g>
      <Path class="line" d={`M${px(x - length)},${px(y - 4)}v4h${px(length)}v-4`} />
      <text
        class="end"
        x={px(x - length - 6)}
        y={px(y)}
      >{`${fixed(metres, metres < 1 ? 1 : 0)}\u202fm`}</text>
    </g>
  );
}
