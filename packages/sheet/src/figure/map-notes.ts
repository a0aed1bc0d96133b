// Finds the places of the texts on a map: the note at the worst place, and the volts on the lines.
import type { DisplayUnits, Outcome, Polygon } from '@ohmstead/study';
import { place } from '../format/length.ts';
import { measured, volts } from '../format/number.ts';
import { about, type Box, grown } from '../geometry/box.ts';
import { type LineLabel, labelIsolines } from '../geometry/isoline-labels.ts';
import { assessedFor, type MapDrawing, type MapKind } from '../geometry/map-drawing.ts';
import type { Occupancy } from '../geometry/occupancy.ts';
import type { Plate } from '../geometry/plate.ts';
import { insideEvenOdd } from '../geometry/polygon.ts';
import { textWidth } from '../geometry/text-size.ts';
import { injections } from './metal.tsx';
import { type PlacedNote, placedNote } from './note.tsx';
import { onPlate } from './path.ts';
import { PHONE_GROWTH, TEXT } from './style.ts';

/** What is mapped. */
export interface MapSubject {
  readonly outcome: Outcome;
  readonly caseIndex: number;
  readonly kind: MapKind;
  /** one of several side by side, or full width */
  readonly small: boolean;
}

/** Size of the texts on contour lines, drawing units. */
const LINE_TEXT = 9.5;
/** Rods, injections and the like keep clear of notes by so much to each side, drawing units. */
const MARK = 14;

/** Ground that is dear to a note: assessed ground most, mapped ground a little, blank paper nothing. */
function groundCost(plate: Plate, area: readonly Polygon[]): (x: number, y: number) => number {
  return (x, y) => {
    if (y < plate.frame.top || x > plate.frame.right) return 0;
    return insideEvenOdd(area, plate.east(x), plate.north(y)) ? 1 : 0.12;
  };
}

function marks(outcome: Outcome, plate: Plate): readonly Box[] {
  const rods = outcome.plan.conductors
    .filter((c) => c.rod)
    .map((c) => about(plate.x(c.x1), plate.y(c.y1), MARK, MARK));
  return [...rods, ...injections(outcome).map((p) => about(plate.x(p.x), plate.y(p.y), MARK, MARK))];
}

/** Note at the worst voltage; none for the potential, nor where the place lies off the map. */
export function worstNote(
  props: MapSubject,
  plate: Plate,
  metal: Occupancy,
  units: DisplayUnits,
): PlacedNote | undefined {
  const { outcome, caseIndex, kind, small } = props;
  if (kind === 'potential') return undefined;
  const worst = outcome.results.cases[caseIndex][kind];
  const [x, y] = [plate.x(worst.x_m), plate.y(worst.y_m)];
  const { frame } = plate;
  if (!(x >= frame.left && x <= frame.right && y >= frame.top && y <= frame.bottom)) return undefined;
  const value = measured(worst.worst_V, worst.uncertainty_V, 'V');
  const where = place(worst.x_m, worst.y_m, units);
  return placedNote({
    x,
    y,
    layouts: small
      ? [[value, where], [`${value} at ${where}`]]
      : [
          [value, `worst ${kind}`, where],
          [value, `worst ${kind}, ${where}`],
        ],
    fontSize: small ? TEXT : TEXT * PHONE_GROWTH,
    bounds: { left: frame.left + 4, right: plate.width - 6, top: 4, bottom: frame.bottom - 4 },
    avoid: marks(outcome, plate),
    cost: groundCost(plate, assessedFor(outcome, kind)),
    lines: metal,
  });
}

/** What labels keep clear of. */
export interface Taken {
  readonly metal: Occupancy;
  readonly boxes: readonly Box[];
}

/** Volts on the lines, the highest level choosing first. */
export function lineLabels(
  props: MapSubject,
  plate: Plate,
  drawing: MapDrawing,
  taken: Taken,
): readonly LineLabel[] {
  const area = assessedFor(props.outcome, props.kind);
  const levels = [...drawing.lines].reverse().map((band) => {
    const text = volts(band.level * drawing.whole);
    const lines = band.lines.map(({ points, closed }) =>
      onPlate(plate, closed ? [...points, points[0]] : points),
    );
    return { text, width: textWidth(text, LINE_TEXT), lines };
  });
  return labelIsolines(levels, {
    bounds: grown(plate.frame, -3),
    avoid: [...taken.boxes, ...marks(props.outcome, plate)],
    height: LINE_TEXT * 1.1,
    allowed: ({ x, y }) => area.length === 0 || insideEvenOdd(area, plate.east(x), plate.north(y)),
    lines: taken.metal,
  });
}
