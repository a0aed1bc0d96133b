// Draws the profile through the worst place: metal above, surface below, the touch limit between them.
import type { DisplayUnits, Outcome, Point } from '@ohmstead/study';
import { scaleLinear } from 'd3-scale';
import type { VNode } from 'preact';
import { useUnits } from '../desk/use-units.ts';
import { fixedLength, lengthUnit, place } from '../format/length.ts';
import { fixed, measured, quantity, THIN_SPACE } from '../format/number.ts';
import { keptApart } from '../geometry/apart.ts';
import type { Box } from '../geometry/box.ts';
import { occupancyOf } from '../geometry/occupancy.ts';
import { type ProfileDrawing, profileDrawing } from '../geometry/profile-drawing.ts';
import { simplifyLine } from '../geometry/simplify.ts';
import { ticksIn } from '../geometry/ticks.ts';
import { voltageFinding } from '../verdict/finding.ts';
import { Path } from './drawn.tsx';
import { Figure } from './frame.tsx';
import { Hatch } from './hatch.tsx';
import { Note, type PlacedNote, placedNote } from './note.tsx';
import { linePath, px, ringPath } from './path.ts';
import { PHONE_GROWTH, TEXT } from './style.ts';

export interface ProfileFigureProps {
  readonly outcome: Outcome;
  readonly caseIndex: number;
  readonly name: string;
  readonly title: string;
  readonly css?: string | undefined;
}

const WIDTH = 760;
const HEIGHT = 360;
const FRAME: Box = { left: 76, right: WIDTH - 148, top: 30, bottom: HEIGHT - 66 };
/** Least distance between base lines of the labels at the right, drawing units, at the size they take on a phone. */
const LABEL_GAP = TEXT * PHONE_GROWTH * 1.2;

interface Scales {
  readonly x: (metres: number) => number;
  readonly y: (volts: number) => number;
}

function scalesOf(drawing: ProfileDrawing): Scales {
  const x = scaleLinear().domain(drawing.range).range([FRAME.left, FRAME.right]);
  const y = scaleLinear().domain(drawing.volts).range([FRAME.bottom, FRAME.top]);
  return { x: (metres) => x(metres), y: (volts) => y(volts) };
}

/** Lines may be drawn this far off, drawing units: not seen, and far fewer points. */
const TOLERANCE = 0.12;

function drawn(scales: Scales, points: readonly Point[]): readonly Point[] {
  return simplifyLine(
    points.map(([along, volts]): Point => [scales.x(along), scales.y(volts)]),
    TOLERANCE,
  );
}

/** Name of the axis along the profile: `x in metres, at y = 10.0 m`. */
export function profileAxisText(outcome: Outcome, caseIndex: number, units: DisplayUnits): string {
  const { profile } = outcome.cases[caseIndex];
  const { sign, words } = lengthUnit(units);
  const at = (metres: number): string => fixedLength(metres, 1, units) + THIN_SPACE + sign;
  switch (profileDrawing(outcome, caseIndex).axis.kind) {
    case 'x':
      return `x in ${words}, at y = ${at(profile.from[1])}`;
    case 'y':
      return `y in ${words}, at x = ${at(profile.from[0])}`;
    case 'distance':
      return `${words} from ${place(profile.from[0], profile.from[1], units)} to ${place(profile.to[0], profile.to[1], units)}`;
  }
}

function Axes({ drawing, scales, text }: { drawing: ProfileDrawing; scales: Scales; text: string }): VNode {
  const { metres } = lengthUnit(useUnits());
  const xs = ticksIn(drawing.range[0] / metres, drawing.range[1] / metres, 8);
  const ys = ticksIn(drawing.volts[0], drawing.volts[1], 5);
  return (
    <g>
      {ys.map((v) => (
        <g key={v}>
          <line class="gridline" x1={FRAME.left} x2={FRAME.right} y1={px(scales.y(v))} y2={px(scales.y(v))} />
          <text class="soft end" x={FRAME.left - 8} y={px(scales.y(v))} dy="0.35em">
            {fixed(v, v !== 0 && Math.abs(ys[1] - ys[0]) < 1 ? 1 : 0)}
          </text>
        </g>
      ))}
      <text class="soft end" x={FRAME.left - 8} y={FRAME.top - 12}>
        volts
      </text>
      {xs.map((d) => (
        <g key={d}>
          <line
            class="tick"
            x1={px(scales.x(d * metres))}
            x2={px(scales.x(d * metres))}
            y1={FRAME.bottom}
            y2={FRAME.bottom + 5}
          />
          <text class="soft mid" x={px(scales.x(d * metres))} y={FRAME.bottom + 9} dy="0.85em">
            {fixed(d, 0)}
          </text>
        </g>
      ))}
      <text class="soft" x={FRAME.left} y={HEIGHT - 8}>
        {text}
      </text>
      {drawing.crossings.map((d) => (
        <circle key={d} class="dot" cx={px(scales.x(d))} cy={FRAME.bottom} r="2.3" />
      ))}
    </g>
  );
}

interface EndLabel {
  readonly text: string;
  readonly tone: string;
  readonly volts: number;
}

function EndLabels({ labels, scales }: { labels: readonly EndLabel[]; scales: Scales }): VNode {
  const heights = keptApart(
    labels.map((l) => scales.y(l.volts)),
    LABEL_GAP,
    [FRAME.top, FRAME.bottom],
  );
  return (
    <g>
      {labels.map(({ text, tone }, k) => (
        <text key={text} class={tone} x={FRAME.right + 8} y={px(heights[k])} dy="0.35em">
          {text}
        </text>
      ))}
    </g>
  );
}

function worstNote(
  outcome: Outcome,
  caseIndex: number,
  drawing: ProfileDrawing,
  scales: Scales,
): PlacedNote | undefined {
  if (drawing.worst === undefined) return undefined;
  const { touch } = outcome.results.cases[caseIndex];
  const lines = [drawing.surface, drawing.metal, ...drawing.limit].map((points) => drawn(scales, points));
  const taken = occupancyOf(
    WIDTH,
    HEIGHT,
    lines.flatMap((points) => points.slice(1).map((p, k): readonly [Point, Point] => [points[k], p])),
  );
  return placedNote({
    x: scales.x(drawing.worst.along),
    y: scales.y(drawing.worst.surface),
    layouts: [
      [measured(touch.worst_V, touch.uncertainty_V, 'V'), 'worst touch'],
      [`${measured(touch.worst_V, touch.uncertainty_V, 'V')} worst touch`],
    ],
    fontSize: TEXT * PHONE_GROWTH,
    bounds: { left: FRAME.left + 4, right: FRAME.right - 4, top: FRAME.top, bottom: FRAME.bottom - 6 },
    avoid: [],
    cost: () => 0,
    lines: taken,
  });
}

/** Surface potential, metal and touch limit along the line through the worst place of a case. */
export function ProfileFigure({ outcome, caseIndex, name, title, css }: ProfileFigureProps): VNode {
  const units = useUnits();
  const drawing = profileDrawing(outcome, caseIndex);
  const scales = scalesOf(drawing);
  const of = outcome.results.cases[caseIndex];
  const note = worstNote(outcome, caseIndex, drawing, scales);
  const limitEnd = drawing.limit.at(-1)?.at(-1);
  const labels: EndLabel[] = [
    { text: 'metal', tone: 'metal-text', volts: drawing.metal[drawing.metal.length - 1][1] },
    { text: 'surface', tone: 'surface-text', volts: drawing.surface[drawing.surface.length - 1][1] },
  ];
  if (limitEnd !== undefined) labels.push({ text: 'touch limit', tone: 'warn', volts: limitEnd[1] });
  const path = (points: readonly Point[]): string => linePath(drawn(scales, points));
  const description = `Surface potential and metal potential along a line${drawing.worst === undefined ? '' : ' through the worst touch voltage'}. The metal rises to ${quantity(of.gpr_V, 'V')}; the touch limit lies ${quantity(of.touch.limit_V, 'V')} below the metal.`;
  const worst = drawing.worst;
  return (
    <Figure name={name} title={title} description={description} width={WIDTH} height={HEIGHT} wide css={css}>
      <defs>
        <Hatch id={`${name}-hatch`} />
      </defs>
      <Axes drawing={drawing} scales={scales} text={profileAxisText(outcome, caseIndex, units)} />
      {drawing.beyond.length > 0 && (
        <Path d={ringPath(drawing.beyond.map((ring) => drawn(scales, ring)))} fill={`url(#${name}-hatch)`} />
      )}
      <Path class="potential faint" d={path(drawing.metal)} />
      <Path class="potential" d={drawing.assessedMetal.map(path).join('')} />
      <Path class="limit dash" d={drawing.limit.map(path).join('')} />
      {limitEnd !== undefined && (
        <Path
          class="limit dash faint"
          d={`M${px(scales.x(limitEnd[0]))},${px(scales.y(limitEnd[1]))}H${FRAME.right}`}
        />
      )}
      <Path class="surface" d={path(drawing.surface)} />
      {worst !== undefined && (
        <Path
          class="leader"
          d={`M${px(scales.x(worst.along))},${px(scales.y(worst.surface))}V${px(scales.y(worst.metal))}`}
        />
      )}
      {note !== undefined && <Note note={note} beyond={voltageFinding(of.touch) === 'beyond'} />}
      <EndLabels labels={labels} scales={scales} />
    </Figure>
  );
}
