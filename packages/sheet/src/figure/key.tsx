// Keys of the figures: the ramp with its shares and volts, and the signs of a plan.
import type { ComponentChildren, VNode } from 'preact';
import { useUnits } from '../desk/use-units.ts';
import { lengthUnit } from '../format/length.ts';
import { fixed, THIN_SPACE } from '../format/number.ts';
import type { Plate } from '../geometry/plate.ts';
import { roundLength } from '../geometry/ticks.ts';
import { Path } from './drawn.tsx';
import { px } from './path.ts';

export interface RampKeyProps {
  readonly x: number;
  readonly y: number;
  /** of one band, drawing units */
  readonly step: number;
  /** classes of fill, from nothing upward */
  readonly classes: readonly string[];
  /** edges between bands that carry a text: place counted in bands, upper and lower text */
  readonly edges: readonly { readonly at: number; readonly share: string; readonly volts: string }[];
  readonly title: string;
  /** fill of what lies beyond the last band */
  readonly beyond?: string | undefined;
}

/** Height of the swatches, drawing units. */
const SWATCH = 12;

/** Bands side by side; shares of the limit and volts stand under their edges. */
export function RampKey({ x, y, step, classes, edges, title, beyond }: RampKeyProps): VNode {
  const end = x + classes.length * step;
  return (
    <g>
      <text x={px(x)} y={px(y - 7)}>
        {title}
      </text>
      {classes.map((name, k) => (
        <rect key={name} class={name} x={px(x + k * step)} y={px(y)} width={px(step)} height={SWATCH} />
      ))}
      <rect class="edge" x={px(x)} y={px(y)} width={px(classes.length * step)} height={SWATCH} />
      {beyond !== undefined && (
        <g>
          <rect x={px(end)} y={px(y)} width={px(step)} height={SWATCH} fill={beyond} />
          <Path class="limit" d={`M${px(end)},${px(y - 3)}v${SWATCH + 6}`} />
          <text class="warn" x={px(end + step + 6)} y={px(y + SWATCH / 2)} dy="0.36em">
            beyond
          </text>
        </g>
      )}
      {edges.map(({ at, share, volts }) => (
        <text key={at} class={at === 0 ? 'soft' : 'soft mid'} y={px(y + SWATCH + 3)}>
          <tspan x={px(x + at * step)} dy="1em">
            {share}
          </tspan>
          <tspan x={px(x + at * step)} dy="1.2em">
            {volts}
          </tspan>
        </text>
      ))}
    </g>
  );
}

export interface Sign {
  readonly text: string;
  /** drawn about the origin, at most 14 units to either side */
  readonly drawing: ComponentChildren;
}

/** Drawing units from one row of signs to the next. */
export const SIGN_ROW = 24;
/** Signs side by side. */
export const SIGN_COLUMNS = 3;

export interface SignsProps {
  readonly x: number;
  readonly y: number;
  /** of one column, drawing units */
  readonly column: number;
  readonly columns: number;
  readonly signs: readonly Sign[];
}

/** Signs with their meaning, row by row in columns. */
export function Signs({ x, y, column, columns, signs }: SignsProps): VNode {
  return (
    <g>
      {signs.map(({ text, drawing }, k) => {
        const left = x + (k % columns) * column;
        const middle = y + Math.floor(k / columns) * SIGN_ROW;
        return (
          <g key={text} transform={`translate(${px(left + 14)},${px(middle)})`}>
            {drawing}
            <text x="22" dy="0.36em">
              {text}
            </text>
          </g>
        );
      })}
    </g>
  );
}

export interface SignKeyProps {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly signs: readonly Sign[];
  /** the ground whose scale bar stands in the place after the last sign */
  readonly plate: Plate;
}

/** Longest scale bar in the key, drawing units. */
const LONGEST_BAR = 110;

/** Signs with their meaning, in columns, and the scale bar after them. */
export function SignKey({ x, y, width, signs, plate }: SignKeyProps): VNode {
  const column = width / SIGN_COLUMNS;
  const { metres, sign } = lengthUnit(useUnits());
  const round = roundLength(LONGEST_BAR / plate.scale / metres);
  const length = round * metres * plate.scale;
  const last = signs.length;
  return (
    <g>
      <Signs x={x} y={y} column={column} columns={SIGN_COLUMNS} signs={signs} />
      <g
        transform={`translate(${px(x + (last % SIGN_COLUMNS) * column + 2)},${px(y + Math.floor(last / SIGN_COLUMNS) * SIGN_ROW)})`}
      >
        <Path class="line" d={`M0,-4v7h${px(length)}v-7`} />
        <text x={px(length + 8)} dy="0.36em">
          {fixed(round, round < 1 ? 1 : 0) + THIN_SPACE + sign}
        </text>
      </g>
    </g>
  );
}
