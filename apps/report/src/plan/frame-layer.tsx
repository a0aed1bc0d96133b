// Ticks along the border of the plan and its scale bar, in the units displayed.
import { lengthUnit, roundLength, ticksIn } from '@ohmstead/sheet';
import type { DisplayUnits } from '@ohmstead/study';
import type { VNode } from 'preact';
import { type Size, toGround, toScreen, type View } from './view.ts';

const TICKS = 7;
const BAR_PX = 110;
/** Numbers along one border keep so far from those of the other, pixels. */
const CORNER_PX = 26;

export interface FrameLayerProps {
  readonly view: View;
  readonly size: Size;
  readonly units: DisplayUnits;
}

export function FrameLayer({ view, size, units }: FrameLayerProps): VNode {
  const { sign, metres } = lengthUnit(units);
  const [west, north] = toGround(view, size, [0, 0]);
  const [east, south] = toGround(view, size, [size.width, size.height]);
  const xs = ticksIn(west / metres, east / metres, TICKS);
  const step = xs.length > 1 ? xs[1]! - xs[0]! : 1;
  const ys = ticksIn(south / metres, north / metres, Math.max(2, (TICKS * size.height) / size.width));
  const digits = step < 1 ? 1 : 0;
  const bar = roundLength(BAR_PX / (view.scale * metres));
  const barPx = bar * metres * view.scale;
  return (
    <g class="frame-marks">
      {xs.map((x) => {
        const [px] = toScreen(view, size, [x * metres, 0]);
        if (px < CORNER_PX) return null;
        return (
          <g key={x}>
            <line class="tick" x1={px} x2={px} y1={size.height} y2={size.height - 5} />
            <text class="soft halo mid" x={px} y={size.height - 9}>
              {written(x, digits)}
            </text>
          </g>
        );
      })}
      {ys.map((y) => {
        const [, py] = toScreen(view, size, [0, y * metres]);
        if (py > size.height - CORNER_PX) return null;
        return (
          <g key={y}>
            <line class="tick" x1={0} x2={5} y1={py} y2={py} />
            <text class="soft halo" x={9} y={py} dy="0.35em">
              {written(y, digits)}
            </text>
          </g>
        );
      })}
      <path class="line" d={`M${size.width - 14 - barPx},18v6h${barPx}v-6`} />
      <text class="halo end" x={size.width - 14} y={14}>{`${bar}\u202f${sign}`}</text>
    </g>
  );
}

function written(value: number, digits: number): string {
  return value.toFixed(digits).replace('-', '\u2212');
}
