// Finds the places of the texts in a sounding: outliers by name, layers by their resistivity.
import type { Point } from '@ohmstead/study';
import { fitted, fittedQuantity } from '../format/fitted.ts';
import { about, type Box, overlap } from '../geometry/box.ts';
import type { Occupancy } from '../geometry/occupancy.ts';
import type { SoundingMark } from '../geometry/sounding-drawing.ts';
import { textWidth } from '../geometry/text-size.ts';
import { noteBoxes, type PlacedNote, placedNote } from './note.tsx';
import { PHONE_GROWTH, TEXT } from './style.ts';

/** Most outliers that are named in the figure; every one is ringed, and the table names them all. */
const MOST_NAMED = 4;
/** Ring about an outlier, drawing units: its mark is seen inside. */
export const OUTLIER_RING = 9;
/** Room of a mark, drawing units. */
const MARK = 13;
/** Greatest size of the text on any screen, drawing units. */
const LARGEST = TEXT * PHONE_GROWTH;

export interface SoundingSpace {
  readonly frame: Box;
  readonly x: (metres: number) => number;
  readonly y: (ohmMetres: number) => number;
  /** curve, band and staircase, drawing units */
  readonly lines: Occupancy;
}

/** Room of every mark. */
export function markBoxes(marks: readonly SoundingMark[], { x, y }: SoundingSpace): readonly Box[] {
  return marks.map(({ reading }) =>
    about(x(reading.spacing_m), y(reading.apparent_resistivity_ohm_m), MARK, MARK),
  );
}

/** Notes at the outliers that stand farthest off, each with its line, and what was read against the model. */
export function outlierNotes(
  marks: readonly SoundingMark[],
  space: SoundingSpace,
  taken: readonly Box[],
): readonly PlacedNote[] {
  const avoid = [...taken];
  const named = marks
    .filter(({ reading }) => reading.outlier)
    .sort((a, b) => Math.abs(b.reading.misfit_percent) - Math.abs(a.reading.misfit_percent))
    .slice(0, MOST_NAMED);
  return named.map(({ reading }) => {
    const [x, y] = [space.x(reading.spacing_m), space.y(reading.apparent_resistivity_ohm_m)];
    const against = `${fitted(reading.apparent_resistivity_ohm_m)} against ${fittedQuantity(reading.model_ohm_m, 'Ω·m')}`;
    const note = placedNote({
      x,
      y,
      layouts: [
        [`line ${reading.line}`, against],
        [`line ${reading.line}: ${against}`],
        [`line ${reading.line}`],
      ],
      fontSize: LARGEST,
      bounds: {
        left: space.frame.left + 4,
        right: space.frame.right - 4,
        top: space.frame.top + 2,
        bottom: space.frame.bottom - 4,
      },
      /* its own mark does not keep the note away */
      avoid: avoid.filter((box) => !(box.left < x && x < box.right && box.top < y && y < box.bottom)),
      cost: () => 0,
      lines: space.lines,
    });
    avoid.push(...noteBoxes(note));
    return note;
  });
}

export interface LayerLabel {
  readonly text: string;
  readonly x: number;
  readonly y: number;
}

/** From a step to the middle of the text on it or under it, drawing units. */
const OFF_STEP = 0.8 * LARGEST;
/** Height of a text that has to stay clear, drawing units. */
const HEIGHT = 1.1 * LARGEST;
/** Shifts along the step that are tried, share of the free length. */
const SHIFTS: readonly number[] = [0.5, 0.25, 0.75, 0, 1];

/** The resistivity of each layer on its step, where it finds room. */
export function layerLabels(
  stairs: readonly Point[],
  space: SoundingSpace,
  taken: readonly Box[],
): readonly LayerLabel[] {
  const { frame, x, y, lines } = space;
  const placed: Box[] = [...taken];
  const labels: LayerLabel[] = [];
  for (let k = 0; k + 1 < stairs.length; k += 2) {
    const [top, rho] = stairs[k];
    const text = fittedQuantity(rho, 'Ω·m');
    const width = textWidth(text, LARGEST);
    const [left, right] = [x(top), x(stairs[k + 1][0])];
    const free = right - left - width;
    if (free < 0) continue;
    const tried = [-OFF_STEP, OFF_STEP].flatMap((off) =>
      SHIFTS.map((shift) => about(left + width / 2 + shift * free, y(rho) + off, width, HEIGHT)),
    );
    const clear = tried.find(
      (box) =>
        box.top >= frame.top &&
        box.bottom <= frame.bottom &&
        lines(box) === 0 &&
        placed.every((other) => overlap(box, other) === 0),
    );
    if (clear === undefined) continue;
    placed.push(clear);
    labels.push({ text, x: (clear.left + clear.right) / 2, y: (clear.top + clear.bottom) / 2 });
  }
  return labels;
}
