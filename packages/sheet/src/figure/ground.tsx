// Draws a section through the ground: layers, covering, and the depth at which the metal lies.
import type { Outcome, PlanConductor, Point } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useUnits } from '../desk/use-units.ts';
import { fittedQuantity } from '../format/fitted.ts';
import { lengthUnit } from '../format/length.ts';
import { fixed, givenQuantity, THIN_SPACE } from '../format/number.ts';
import { sectionLines } from '../geometry/section-lines.ts';
import { ticksIn } from '../geometry/ticks.ts';
import { Path } from './drawn.tsx';
import { Figure } from './frame.tsx';
import { linePath, px } from './path.ts';

export interface GroundFigureProps {
  readonly outcome: Outcome;
  readonly name: string;
  readonly title: string;
  readonly css?: string | undefined;
}

const WIDTH = 760;
const HEIGHT = 250;
const FRAME = { left: 64, right: WIDTH - 164, top: 40, bottom: HEIGHT - 34 };
/** The section reaches below the deepest metal or interface by this share. */
const BELOW = 1.25;

interface Side {
  /** coordinate of the plan that runs along the section */
  readonly along: 'x' | 'y';
  readonly from: number;
  readonly to: number;
  readonly deepest: number;
}

function depthsOfInterfaces(outcome: Outcome): readonly number[] {
  let depth = 0;
  return outcome.results.soil.layers.flatMap((layer) => {
    if (layer.thickness_m === null) return [];
    depth += layer.thickness_m;
    return [depth];
  });
}

function sideOf(outcome: Outcome, interfaces: readonly number[]): Side {
  const { conductors } = outcome.plan;
  const span = (read: (c: PlanConductor) => readonly [number, number]): readonly [number, number] => {
    const all = conductors.flatMap(read);
    return [all.reduce((a, b) => Math.min(a, b)), all.reduce((a, b) => Math.max(a, b))];
  };
  const x = span((c) => [c.x1, c.x2]);
  const y = span((c) => [c.y1, c.y2]);
  const along = x[1] - x[0] >= y[1] - y[0] ? 'x' : 'y';
  const [from, to] = along === 'x' ? x : y;
  const metal = span((c) => [c.depth1, c.depth2])[1];
  /* an interface far below the metal is named in words; drawing it would press the metal into a line */
  const near = interfaces.filter((depth) => depth <= 4 * metal);
  const edge = Math.max(1, 0.08 * (to - from));
  return { along, from: from - edge, to: to + edge, deepest: Math.max(metal, ...near) * BELOW };
}

/** The electrode seen from the side, in the layers of the soil; depth is stretched. */
export function GroundFigure({ outcome, name, title, css }: GroundFigureProps): VNode {
  const { metres, sign, words } = lengthUnit(useUnits());
  const { layers } = outcome.results.soil;
  const told = outcome.results.ground === null ? givenQuantity : fittedQuantity;
  const interfaces = depthsOfInterfaces(outcome);
  const side = sideOf(outcome, interfaces);
  const x = (m: number): number =>
    FRAME.left + ((m - side.from) / (side.to - side.from)) * (FRAME.right - FRAME.left);
  const y = (depth: number): number => FRAME.top + (depth / side.deepest) * (FRAME.bottom - FRAME.top);
  const shown = interfaces.filter((depth) => depth < side.deepest);
  const tops = [0, ...shown];
  const stretch = (y(1) - y(0)) / (x(1) - x(0));
  const lines = sectionLines(outcome.plan.conductors, side.along);
  const path = (floating: boolean): string =>
    lines
      .filter((line) => line.floating === floating)
      .map(({ from, to }) => linePath([from, to].map(([along, depth]): Point => [x(along), y(depth)])))
      .join('');
  const ticks = ticksIn(side.from / metres, side.to / metres, 8);
  const deepest = side.deepest / metres;
  const description = `Section through the ground with ${layers.length} ${layers.length === 1 ? 'layer' : 'layers'}; the metal is projected on the section. Depth is drawn ${fixed(stretch, 1)} times larger than length.`;
  return (
    <Figure name={name} title={title} description={description} width={WIDTH} height={HEIGHT} wide css={css}>
      {tops.map((depth, k) => (
        <g key={depth}>
          <rect
            class={`r${k % 2}`}
            x={FRAME.left}
            y={px(y(depth))}
            width={FRAME.right - FRAME.left}
            height={px(y(tops[k + 1] ?? side.deepest) - y(depth))}
          />
          {k > 0 && (
            <line class="layer-line" x1={FRAME.left} x2={FRAME.right} y1={px(y(depth))} y2={px(y(depth))} />
          )}
          <text x={FRAME.right + 8} y={px((y(depth) + y(tops[k + 1] ?? side.deepest)) / 2)} dy="0.35em">
            {told(layers[k].resistivity_ohm_m, 'Ω·m')}
          </text>
        </g>
      ))}
      <line class="ground-line" x1={FRAME.left} x2={FRAME.right} y1={FRAME.top} y2={FRAME.top} />
      <Path class="metal floating" d={path(true)} />
      <Path class="metal" d={path(false)} />
      {ticksIn(0, deepest, 4).map((depth) => (
        <text key={depth} class="soft end" x={FRAME.left - 8} y={px(y(depth * metres))} dy="0.35em">
          {fixed(depth, deepest < 4 ? 1 : 0)}
        </text>
      ))}
      <text class="soft" x={FRAME.left} y={FRAME.top - 16}>
        {`depth in ${words}, drawn ${fixed(stretch, stretch < 10 ? 1 : 0)} times larger`}
      </text>
      {ticks.map((m) => (
        <text key={m} class="soft mid" x={px(x(m * metres))} y={FRAME.bottom + 8} dy="0.85em">
          {fixed(m, 0) + (m === ticks[ticks.length - 1] ? THIN_SPACE + sign : '')}
        </text>
      ))}
    </Figure>
  );
}
