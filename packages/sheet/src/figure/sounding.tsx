// Draws the sounding on logarithmic axes: readings, fitted curve, band of the soils, and the layers of the fit.
import type { DisplayUnits, Point, SoilFit } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useUnits } from '../desk/use-units.ts';
import { fittedLength, surveyedLength, surveyedNumber } from '../format/fitted-length.ts';
import { lengthUnit } from '../format/length.ts';
import { tally } from '../format/words.ts';
import type { Box } from '../geometry/box.ts';
import { decades, logScale } from '../geometry/log-axis.ts';
import { occupancyOf } from '../geometry/occupancy.ts';
import { atLeastDecades, type SoundingDrawing, soundingDrawing } from '../geometry/sounding-drawing.ts';
import { Path } from './drawn.tsx';
import { Figure } from './frame.tsx';
import { SIGN_ROW, type Sign, Signs } from './key.tsx';
import { LogAxes } from './log-axes.tsx';
import { Note, noteBoxes } from './note.tsx';
import { linePath, px, ribbonPath, smoothPath } from './path.ts';
import { layerLabels, markBoxes, OUTLIER_RING, outlierNotes, type SoundingSpace } from './sounding-notes.ts';
import { OWN_MARKS, SurveyMark } from './survey-mark.tsx';

export interface SoundingFigureProps {
  readonly fit: SoilFit;
  /** of the electrode, m */
  readonly diagonal: number;
  readonly name: string;
  readonly title: string;
  readonly css?: string | undefined;
}

const WIDTH = 760;
const LEFT = 84;
const RIGHT = WIDTH - 12;
const TOP = 36;
/** Decades are as long upward as across, but the frame stays within these heights. */
const LEAST_HEIGHT = 260;
const MOST_HEIGHT = 430;
/** From the frame's lower edge to the first row of the key, and below the last. */
const KEY_TOP = 84;
const KEY_BOTTOM = 14;
const KEY_COLUMNS = 2;
/** Longest name of a traverse in the key, characters. */
const LONGEST_NAME = 24;
const LINE = 'M-12,0H12';

interface Layout extends SoundingSpace {
  readonly up: Point;
}

function layoutOf(drawing: SoundingDrawing): Layout {
  const across = decades(drawing.spacing[0], drawing.spacing[1]);
  const unit = (RIGHT - LEFT) / across;
  const up = atLeastDecades(drawing.resistivity, LEAST_HEIGHT / unit);
  const height = Math.min(MOST_HEIGHT, decades(up[0], up[1]) * unit);
  const frame: Box = { left: LEFT, right: RIGHT, top: TOP, bottom: TOP + height };
  const x = logScale(drawing.spacing, [frame.left, frame.right]);
  const y = logScale(up, [frame.bottom, frame.top]);
  const edge = (side: 1 | 2): readonly Point[] => drawing.band.map((p): Point => [p[0], p[side]]);
  const drawn = [drawing.curve, edge(1), edge(2), drawing.stairs].flatMap((points) => {
    const placed = points.map(([along, rho]): Point => [x(along), y(rho)]);
    return placed.slice(1).map((p, k): readonly [Point, Point] => [placed[k], p]);
  });
  return { frame, up, x, y, lines: occupancyOf(WIDTH, frame.bottom, drawn) };
}

function nameOf(traverse: string): string {
  if (traverse === '') return 'readings';
  return traverse.length > LONGEST_NAME ? `${traverse.slice(0, LONGEST_NAME - 1)}…` : traverse;
}

function signsOf(drawing: SoundingDrawing, units: DisplayUnits): readonly Sign[] {
  const own = drawing.traverses
    .slice(0, OWN_MARKS)
    .map((traverse, k): Sign => ({ text: nameOf(traverse), drawing: <SurveyMark traverse={k} /> }));
  const further = drawing.traverses.length - OWN_MARKS;
  const signs: [boolean, Sign][] = [
    [further > 0, { text: tally(further, 'further traverse'), drawing: <SurveyMark traverse={OWN_MARKS} /> }],
    [
      drawing.marks.some(({ reading }) => reading.outlier),
      { text: 'outlier', drawing: <circle class="ring" r={OUTLIER_RING} /> },
    ],
    [true, { text: 'fitted curve', drawing: <Path class="surface" d={LINE} /> }],
    [
      drawing.band.length > 0,
      {
        text: '5–95\u202f% of the soils',
        drawing: <rect class="soils" x="-12" y="-6" width="24" height="12" />,
      },
    ],
    [true, { text: 'layers of the fit', drawing: <Path class="stairs" d="M-12,4H0V-4H12" /> }],
    [
      true,
      {
        text: `resolved to ${fittedLength(drawing.resolved, units)}`,
        drawing: <Path class="resolved" d="M0,-9V9" />,
      },
    ],
    [
      drawing.diagonal !== undefined,
      {
        text: `diagonal ${fittedLength(drawing.diagonal ?? 0, units)}`,
        drawing: <Path class="diagonal" d="M0,-10V10" />,
      },
    ],
  ];
  return [...own, ...signs.filter(([shown]) => shown).map(([, sign]) => sign)];
}

function descriptionOf({ readings, layer_count, sounding }: SoilFit, units: DisplayUnits): string {
  const spacings = readings.map((r) => r.spacing_m);
  const range = `${surveyedNumber(Math.min(...spacings), units)} to ${surveyedLength(Math.max(...spacings), units)}`;
  const band = sounding.length > 0 ? ', with the band of the soils that fit as well' : '';
  return `Apparent resistivity against pin spacing on logarithmic axes: ${tally(readings.length, 'reading')} at spacings of ${range}, the curve of ${tally(layer_count, 'fitted layer')}${band}, and the resistivity of the layers against depth.`;
}

/** Readings and fit of a survey. */
export function SoundingFigure({ fit, diagonal, name, title, css }: SoundingFigureProps): VNode {
  const units = useUnits();
  const { metres, words } = lengthUnit(units);
  const drawing = soundingDrawing(fit, diagonal);
  const layout = layoutOf(drawing);
  const { frame, x, y } = layout;
  const marks = markBoxes(drawing.marks, layout);
  const notes = outlierNotes(drawing.marks, layout, marks);
  const labels = layerLabels(drawing.stairs, layout, [...marks, ...notes.flatMap(noteBoxes)]);
  const signs = signsOf(drawing, units);
  const rows = Math.ceil(signs.length / KEY_COLUMNS);
  const placed = (points: readonly Point[]): readonly Point[] =>
    points.map(([along, rho]): Point => [x(along), y(rho)]);
  const upright = (metres: number | undefined): string =>
    metres === undefined || metres > drawing.spacing[1]
      ? ''
      : `M${px(x(metres))},${px(frame.top)}V${px(frame.bottom)}`;
  return (
    <Figure
      name={name}
      title={title}
      description={descriptionOf(fit, units)}
      width={WIDTH}
      height={frame.bottom + KEY_TOP + (rows - 1) * SIGN_ROW + KEY_BOTTOM}
      wide
      css={css}
    >
      <defs>
        <clipPath id={`${name}-frame`}>
          <rect
            x={px(frame.left)}
            y={px(frame.top)}
            width={px(frame.right - frame.left)}
            height={px(frame.bottom - frame.top)}
          />
        </clipPath>
      </defs>
      <LogAxes
        frame={frame}
        across={drawing.spacing}
        up={layout.up}
        x={x}
        y={y}
        acrossUnit={metres}
        acrossName={`pin spacing, and depth of the layers, in ${words}`}
        upName="apparent resistivity, and that of the layers, in Ω·m"
      />
      <g clip-path={`url(#${name}-frame)`}>
        <Path class="resolved" d={upright(drawing.resolved)} />
        <Path class="diagonal" d={upright(drawing.diagonal)} />
        <Path
          class="soils"
          d={ribbonPath(drawing.band.map(([along, low, high]) => [x(along), y(low), y(high)]))}
        />
        <Path class="stairs" d={linePath(placed(drawing.stairs))} />
        <Path class="surface" d={smoothPath(placed(drawing.curve))} />
      </g>
      {labels.map((label) => (
        <text key={`${label.x} ${label.y}`} class="mid halo" x={px(label.x)} y={px(label.y)} dy="0.35em">
          {label.text}
        </text>
      ))}
      {notes.map((note) => (
        <Note key={`${note.x} ${note.y}`} note={note} beyond={false} plain radius={OUTLIER_RING} />
      ))}
      {drawing.marks.map(({ traverse, reading }) => {
        const [mx, my] = [px(x(reading.spacing_m)), px(y(reading.apparent_resistivity_ohm_m))];
        return (
          <g key={reading.line} transform={`translate(${mx},${my})`}>
            <SurveyMark traverse={traverse} />
            {reading.outlier && <circle class="ring" r={OUTLIER_RING} />}
          </g>
        );
      })}
      <Signs
        x={frame.left - 2}
        y={frame.bottom + KEY_TOP}
        column={(RIGHT - LEFT) / KEY_COLUMNS}
        columns={KEY_COLUMNS}
        signs={signs}
      />
    </Figure>
  );
}
