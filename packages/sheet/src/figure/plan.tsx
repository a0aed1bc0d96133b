// Draws the electrode in plan: metal as ink, assessed areas, places of injection.
import type { Outcome, PlanConductor } from '@ohmstead/study';
import type { VNode } from 'preact';
import { listed, wrapped } from '../format/words.ts';
import { about } from '../geometry/box.ts';
import { latticeExtent } from '../geometry/contours.ts';
import { occupancyOf } from '../geometry/occupancy.ts';
import { type Plate, type PlateSize, plateOf } from '../geometry/plate.ts';
import { insideEvenOdd } from '../geometry/polygon.ts';
import { Path } from './drawn.tsx';
import { Figure, PlanAxes } from './frame.tsx';
import { SIGN_COLUMNS, SIGN_ROW, type Sign, SignKey } from './key.tsx';
import { Injection, injections, Metal, metalLines, Rod } from './metal.tsx';
import { Note, placedNote } from './note.tsx';
import { polygonPath } from './path.ts';
import { PHONE_GROWTH, TEXT } from './style.ts';

export interface PlanFigureProps {
  readonly outcome: Outcome;
  readonly name: string;
  readonly title: string;
  readonly css?: string | undefined;
}

const MARGIN = { left: 56, right: 8, top: 8 };
const LINE = 'M-12,0H12';
/** Longest line of a note, characters. */
const NOTE_LINE = 22;

function signsOf(conductors: readonly PlanConductor[]): readonly Sign[] {
  const has = (test: (c: PlanConductor) => boolean): boolean => conductors.some(test);
  const signs: [boolean, Sign][] = [
    [true, { text: 'conductor', drawing: <Path class="metal" d={LINE} /> }],
    [has((c) => c.rod), { text: 'ground rod', drawing: <Rod x={0} y={0} /> }],
    [has((c) => c.insulated), { text: 'insulated', drawing: <Path class="metal insulated" d={LINE} /> }],
    [
      has((c) => c.role === 'floating'),
      { text: 'floating metal', drawing: <Path class="metal floating" d={LINE} /> },
    ],
    [true, { text: 'current enters', drawing: <Injection x={0} y={0} /> }],
    [true, { text: 'touch assessed', drawing: <Path class="area area-touch" d={LINE} /> }],
    [true, { text: 'step assessed', drawing: <Path class="area" d={LINE} /> }],
  ];
  return signs.filter(([shown]) => shown).map(([, sign]) => sign);
}

/** Names of the cases beside their place of injection. */
function InjectionNotes({ outcome, plate }: { outcome: Outcome; plate: Plate }): VNode {
  const places = injections(outcome);
  const shown = places.length > 1 ? places : [];
  const avoid = [
    ...outcome.plan.conductors.filter((c) => c.rod).map((c) => about(plate.x(c.x1), plate.y(c.y1), 12, 12)),
    ...places.map((p) => about(plate.x(p.x), plate.y(p.y), 14, 14)),
  ];
  const metal = occupancyOf(plate.width, plate.height, metalLines(plate, outcome.plan.conductors));
  const notes = shown.map(({ x, y, names }) => {
    const text = names.length > 2 ? `${names[0]} and ${names.length - 1} more` : listed(names);
    const note = placedNote({
      x: plate.x(x),
      y: plate.y(y),
      layouts: [wrapped(text, NOTE_LINE, 2)],
      fontSize: TEXT * PHONE_GROWTH,
      bounds: { left: plate.frame.left + 4, right: plate.width - 6, top: 4, bottom: plate.frame.bottom - 4 },
      avoid,
      cost: (x, y) => (insideEvenOdd(outcome.plan.stepArea, plate.east(x), plate.north(y)) ? 0.4 : 0),
      lines: metal,
    });
    avoid.push(note.callout.box);
    return note;
  });
  return (
    <g>
      {notes.map((note) => (
        <Note key={`${note.x} ${note.y}`} note={note} beyond={false} plain />
      ))}
    </g>
  );
}

/** Where the ground lies on the drawing of the electrode. */
export function planPlate(outcome: Outcome): Plate {
  const rows = Math.ceil((signsOf(outcome.plan.conductors).length + 1) / SIGN_COLUMNS);
  const size: PlateSize = {
    width: 760,
    most: 600,
    least: 120,
    margin: { ...MARGIN, bottom: 56 + rows * SIGN_ROW },
  };
  return plateOf(latticeExtent(outcome.cases[0].map), size);
}

/** The electrode in plan. */
export function PlanFigure({ outcome, name, title, css }: PlanFigureProps): VNode {
  const { plan, results } = outcome;
  const signs = signsOf(plan.conductors);
  const plate = planPlate(outcome);
  const floating = plan.conductors.some((c) => c.role === 'floating') ? ' Floating metal is dashed.' : '';
  const description = `Plan with ${results.electrode.conductor_count} conductors and ${results.electrode.rod_count} ground rods of the energised metal, places of injection and assessed areas.${floating}`;
  return (
    <Figure
      name={name}
      title={title}
      description={description}
      width={plate.width}
      height={plate.height}
      wide
      css={css}
    >
      <Path class="area-fill" d={polygonPath(plate, plan.touchArea)} fill-rule="evenodd" />
      <Path class="area" d={polygonPath(plate, plan.stepArea)} />
      <Path class="area area-touch" d={polygonPath(plate, plan.touchArea)} />
      <g class="plan">
        <Metal plate={plate} conductors={plan.conductors} />
      </g>
      <InjectionNotes outcome={outcome} plate={plate} />
      {injections(outcome).map((p) => (
        <Injection key={`${p.x} ${p.y}`} x={plate.x(p.x)} y={plate.y(p.y)} />
      ))}
      <PlanAxes plate={plate} drawn />
      <SignKey
        x={plate.frame.left}
        y={plate.frame.bottom + 56}
        width={plate.width - plate.frame.left}
        signs={signs}
        plate={plate}
      />
    </Figure>
  );
}
