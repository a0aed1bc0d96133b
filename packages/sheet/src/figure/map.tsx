// Draws a map of one case over the plan: bands of fill, lines in volts, what lies beyond the limit, the worst place.
import type { DisplayUnits } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useUnits } from '../desk/use-units.ts';
import { place } from '../format/length.ts';
import { measured, quantity } from '../format/number.ts';
import { latticeExtent } from '../geometry/contours.ts';
import { assessedFor, mapDrawing } from '../geometry/map-drawing.ts';
import { occupancyOf } from '../geometry/occupancy.ts';
import { type PlateSize, plateOf } from '../geometry/plate.ts';
import { voltageFinding } from '../verdict/finding.ts';
import { Path } from './drawn.tsx';
import { Figure, PlanAxes, ScaleBar } from './frame.tsx';
import { frameRing } from './frame-ring.ts';
import { Hatch } from './hatch.tsx';
import { MapGround } from './map-ground.tsx';
import { MapKey } from './map-key.tsx';
import { lineLabels, type MapSubject, type Taken, worstNote } from './map-notes.ts';
import { Metal, metalLines } from './metal.tsx';
import { Note, noteBoxes } from './note.tsx';
import { px, ringPath } from './path.ts';

export interface MapFigureProps extends MapSubject {
  readonly name: string;
  readonly title: string;
  readonly css?: string | undefined;
}

const WIDE: PlateSize = {
  width: 760,
  most: 600,
  least: 150,
  margin: { left: 56, right: 8, top: 10, bottom: 134 },
};
const SMALL: PlateSize = {
  width: 372,
  most: 330,
  least: 130,
  margin: { left: 2, right: 2, top: 4, bottom: 26 },
};

/** Sentence for readers who do not see the picture. */
function mapDescription(props: MapFigureProps, units: DisplayUnits): string {
  const { outcome, caseIndex, kind } = props;
  const of = outcome.results.cases[caseIndex];
  if (kind === 'potential') {
    return `Filled contours of the surface potential over the plan, as share of the rise of ${measured(of.gpr_V, of.gpr_uncertainty_V, 'V')}.`;
  }
  const worst = of[kind];
  return `Filled contours of ${kind} voltage over the plan, as share of the limit of ${quantity(worst.limit_V, 'V')}. The worst is ${measured(worst.worst_V, worst.uncertainty_V, 'V')} at ${place(worst.x_m, worst.y_m, units)}.`;
}

/** The map of one quantity of one case. */
export function MapFigure(props: MapFigureProps): VNode {
  const { outcome, caseIndex, kind, name, small } = props;
  const units = useUnits();
  const { map } = outcome.cases[caseIndex];
  const plate = plateOf(latticeExtent(map), small ? SMALL : WIDE);
  const drawing = mapDrawing(outcome, caseIndex, kind, small);
  const area = assessedFor(outcome, kind);
  const metal = occupancyOf(plate.width, plate.height, metalLines(plate, outcome.plan.conductors));
  const note = worstNote(props, plate, metal, units);
  const taken: Taken = { metal, boxes: note === undefined ? [] : noteBoxes(note) };
  const labels = small ? [] : lineLabels(props, plate, drawing, taken);
  const of = outcome.results.cases[caseIndex];
  const feet =
    kind === 'step' && !small
      ? [of.step.from, of.step.to].map((p) => [plate.x(p.x_m), plate.y(p.y_m)] as const)
      : undefined;
  const beyondLimit = kind !== 'potential' && voltageFinding(of[kind]) === 'beyond';
  return (
    <Figure
      name={name}
      title={props.title}
      description={mapDescription(props, units)}
      width={plate.width}
      height={plate.height}
      wide={!small}
      css={props.css}
    >
      <defs>
        <Hatch id={`${name}-hatch`} spacing={small ? 5 : 6.5} />
        <clipPath id={`${name}-frame`}>
          <Path d={ringPath([frameRing(plate)])} />
        </clipPath>
      </defs>
      <g clip-path={`url(#${name}-frame)`}>
        <MapGround name={name} plate={plate} drawing={drawing} area={area} />
      </g>
      <Metal plate={plate} conductors={outcome.plan.conductors} small={small} />
      <g>
        {labels.map((label) => (
          <text
            key={`${label.x} ${label.y}`}
            class="iso-label halo mid"
            transform={`translate(${px(label.x)},${px(label.y)})rotate(${px(label.turn)})`}
            dy="0.35em"
          >
            {label.text}
          </text>
        ))}
      </g>
      {note !== undefined && (
        <Note note={note} beyond={beyondLimit} {...(feet === undefined ? {} : { feet })} />
      )}
      {small ? (
        <ScaleBar plate={plate} x={plate.frame.right} y={plate.frame.bottom + 18} most={90} />
      ) : (
        <>
          <PlanAxes plate={plate} />
          <ScaleBar plate={plate} x={plate.width - 8} y={plate.frame.bottom + 60} most={110} />
          <MapKey name={name} plate={plate} drawing={drawing} />
        </>
      )}
    </Figure>
  );
}
