// Draws how a map differs from the pinned one: strength of fill for how much, direction of hatch and sign for which way.
import type { Outcome, Point } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useUnits } from '../desk/use-units.ts';
import { place } from '../format/length.ts';
import { volts } from '../format/number.ts';
import { grown } from '../geometry/box.ts';
import { type Band, latticeExtent } from '../geometry/contours.ts';
import type { DifferenceDrawing } from '../geometry/difference.ts';
import { type LineLabel, labelIsolines } from '../geometry/isoline-labels.ts';
import { occupancyOf } from '../geometry/occupancy.ts';
import { type Plate, type PlateSize, plateOf } from '../geometry/plate.ts';
import { insideEvenOdd } from '../geometry/polygon.ts';
import { textWidth } from '../geometry/text-size.ts';
import { Path } from './drawn.tsx';
import { Figure, PlanAxes, ScaleBar } from './frame.tsx';
import { frameRing } from './frame-ring.ts';
import { RampKey, Signs } from './key.tsx';
import { isolinePath } from './map-fill.tsx';
import { Metal, metalLines } from './metal.tsx';
import { onPlate, polygonPath, px, ringPath } from './path.ts';

export interface DifferenceFigureProps {
  readonly outcome: Outcome;
  readonly drawing: DifferenceDrawing;
  readonly name: string;
  readonly title: string;
}

const SIZE: PlateSize = {
  width: 760,
  most: 600,
  least: 150,
  margin: { left: 56, right: 8, top: 10, bottom: 150 },
};
/** Strongest fill of a change: quieter than a map's, so that the hatch stays legible on it. */
const STRONGEST = 5;
/** Distance of hatch lines, drawing units. */
const SPACING = 7;
/** Size of the texts on lines, drawing units. */
const LINE_TEXT = 9.5;

/** Signed volts: `+20 V`, `−20 V`. */
export function signedVolts(value: number): string {
  return value > 0 ? `+${volts(value)}` : volts(value);
}

/** Lines rising to the right for more, falling for less. */
function Slant({ id, up }: { id: string; up: boolean }): VNode {
  return (
    <pattern
      id={id}
      width={SPACING}
      height={SPACING}
      patternUnits="userSpaceOnUse"
      patternTransform={`rotate(${up ? 45 : -45})`}
    >
      <line class="change-line" x1={SPACING / 2} x2={SPACING / 2} y1="0" y2={SPACING} />
    </pattern>
  );
}

function classes(count: number): readonly string[] {
  return Array.from({ length: count + 1 }, (_, k) => `r${Math.round((k * STRONGEST) / count)}`);
}

interface SideProps {
  readonly plate: Plate;
  readonly bands: readonly Band[];
  readonly fills: readonly string[];
  readonly hatch: string;
}

function Side({ plate, bands, fills, hatch }: SideProps): VNode {
  const outline = (band: Band): string => ringPath(band.rings.map((ring) => onPlate(plate, ring)));
  return (
    <g fill-rule="evenodd">
      {bands.map((band, k) => (
        <Path key={band.level} class={fills[k + 1]} d={outline(band)} />
      ))}
      {bands[0] !== undefined && <Path d={outline(bands[0])} fill={`url(#${hatch})`} />}
      <Path
        class="iso change-iso"
        d={isolinePath(
          plate,
          bands.flatMap((band) => band.lines),
        )}
      />
    </g>
  );
}

function labelsOf(plate: Plate, drawing: DifferenceDrawing, outcome: Outcome): readonly LineLabel[] {
  const area = outcome.plan.touchArea;
  const side = (bands: readonly Band[], sign: 1 | -1) =>
    bands.map((band) => {
      const text = signedVolts(sign * band.level);
      const lines = band.lines.map(({ points, closed }): readonly Point[] =>
        onPlate(plate, closed ? [...points, points[0]] : points),
      );
      return { text, width: textWidth(text, LINE_TEXT), lines };
    });
  return labelIsolines([...side(drawing.up, 1), ...side(drawing.down, -1)].reverse(), {
    bounds: grown(plate.frame, -3),
    avoid: [],
    height: LINE_TEXT * 1.1,
    allowed: ({ x, y }) => area.length === 0 || insideEvenOdd(area, plate.east(x), plate.north(y)),
    lines: occupancyOf(plate.width, plate.height, metalLines(plate, outcome.plan.conductors)),
  });
}

/** Change of touch voltage over the plan, on the ground that both maps cover. */
export function DifferenceFigure({ outcome, drawing, name, title }: DifferenceFigureProps): VNode {
  const units = useUnits();
  const { up, down, step, count, most, least } = drawing;
  const plate = plateOf(latticeExtent(drawing.lattice), SIZE);
  const fills = classes(count);
  const area = outcome.plan.touchArea;
  const { left, right, top, bottom } = plate.frame;
  const far = [most, least].filter((one) => one !== undefined);
  const description = `Filled contours of the change since the pinned state over the plan. Farthest: ${far
    .map(({ value, x, y }) => `${signedVolts(value)} at ${place(x, y, units)}`)
    .join(' and ')}.`;
  return (
    <Figure
      name={name}
      title={title}
      description={description}
      width={plate.width}
      height={plate.height}
      wide
    >
      <defs>
        <Slant id={`${name}-up`} up />
        <Slant id={`${name}-down`} up={false} />
      </defs>
      <rect class={fills[0]} x={px(left)} y={px(top)} width={px(right - left)} height={px(bottom - top)} />
      <Side plate={plate} bands={up} fills={fills} hatch={`${name}-up`} />
      <Side plate={plate} bands={down} fills={fills} hatch={`${name}-down`} />
      {area.length > 0 && (
        <g>
          <Path
            class="veil"
            fill-rule="evenodd"
            d={ringPath([frameRing(plate)]) + polygonPath(plate, area)}
          />
          <Path class="area" d={polygonPath(plate, area)} />
        </g>
      )}
      <Metal plate={plate} conductors={outcome.plan.conductors} />
      {labelsOf(plate, drawing, outcome).map((label) => (
        <text
          key={`${label.x} ${label.y}`}
          class="iso-label halo mid"
          transform={`translate(${px(label.x)},${px(label.y)})rotate(${px(label.turn)})`}
          dy="0.35em"
        >
          {label.text}
        </text>
      ))}
      <PlanAxes plate={plate} />
      <ScaleBar plate={plate} x={plate.width - 8} y={bottom + 60} most={110} />
      <RampKey
        x={left}
        y={bottom + 66}
        step={70}
        classes={fills}
        title="change, either way"
        edges={fills.slice(1).map((_, k) => ({ at: k + 1, share: volts((k + 1) * step), volts: '' }))}
      />
      <Signs
        x={left - 2}
        y={bottom + 130}
        column={220}
        columns={2}
        signs={[
          { text: 'higher than pinned', drawing: <Swatch fill={`url(#${name}-up)`} /> },
          { text: 'lower than pinned', drawing: <Swatch fill={`url(#${name}-down)`} /> },
        ]}
      />
    </Figure>
  );
}

function Swatch({ fill }: { fill: string }): VNode {
  return <rect class="edge-box" x="-12" y="-7" width="24" height="14" fill={fill} />;
}
